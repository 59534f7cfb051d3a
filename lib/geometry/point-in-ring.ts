import type { GridPoint, Ring } from "./point";
import { containsPoint } from "./polygon";

/** Whether a point lies in a ring; one on its boundary does. */
export const pointInRing = (point: GridPoint, ring: Ring): boolean => containsPoint(ring, point);
