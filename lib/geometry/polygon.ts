import { distance_m, distanceToSegment_m, type GridPoint, type Ring } from "./point";

/** Each side of a ring as its two ends, the last side closing it. */
export function sidesOf(ring: Ring): [from: GridPoint, to: GridPoint][] {
  return ring.map((from, index) => [from, ring[(index + 1) % ring.length] as GridPoint]);
}

/**
 * Area of a ring in m², positive when its corners run anticlockwise. Taken from the first corner, so that the large
 * coordinates of a national grid lose no digits.
 */
export function signedArea_m2(ring: Ring): number {
  const [origin] = ring;
  if (!origin) return 0;
  let twice = 0;
  for (const [from, to] of sidesOf(ring))
    twice += (from[0] - origin[0]) * (to[1] - origin[1]) - (to[0] - origin[0]) * (from[1] - origin[1]);
  return twice / 2;
}

/** Area of a ring in m², whichever way its corners run. */
export const area_m2 = (ring: Ring): number => Math.abs(signedArea_m2(ring));

/** Length of a ring's boundary in metres. */
export const perimeter_m = (ring: Ring): number =>
  sidesOf(ring).reduce((sum, [from, to]) => sum + distance_m(from, to), 0);

/** Which way a ring's corners run; `none` when it encloses nothing. */
export function orientationOf(ring: Ring): "anticlockwise" | "clockwise" | "none" {
  const area = signedArea_m2(ring);
  if (area === 0) return "none";
  return area > 0 ? "anticlockwise" : "clockwise";
}

/** The same ring with its corners running anticlockwise, as zones are stored. */
export const anticlockwise = (ring: Ring): GridPoint[] =>
  signedArea_m2(ring) < 0 ? [...ring].reverse() : [...ring];

/** Centre of the area of a ring; of its corners when it encloses nothing; null without corners. */
export function centroidOf(ring: Ring): GridPoint | null {
  const [origin] = ring;
  if (!origin) return null;
  const area = signedArea_m2(ring);
  let easting = 0;
  let northing = 0;
  if (area === 0) {
    for (const point of ring) {
      easting += (point[0] - origin[0]) / ring.length;
      northing += (point[1] - origin[1]) / ring.length;
    }
    return [origin[0] + easting, origin[1] + northing];
  }
  for (const [from, to] of sidesOf(ring)) {
    const a: GridPoint = [from[0] - origin[0], from[1] - origin[1]];
    const b: GridPoint = [to[0] - origin[0], to[1] - origin[1]];
    const cross = a[0] * b[1] - b[0] * a[1];
    easting += (a[0] + b[0]) * cross;
    northing += (a[1] + b[1]) * cross;
  }
  return [origin[0] + easting / (6 * area), origin[1] + northing / (6 * area)];
}

/** Where a point lies: within a micrometre of a side it is on the boundary. */
export function placeOf(
  point: GridPoint,
  ring: Ring,
  tolerance_m = 1e-6,
): "inside" | "on the boundary" | "outside" {
  let inside = false;
  for (const [from, to] of sidesOf(ring)) {
    if (distanceToSegment_m(point, from, to) <= tolerance_m) return "on the boundary";
    // A ray to the east: a side counts when its ends lie on both sides of it, the lower end included once.
    if (from[1] > point[1] !== to[1] > point[1]) {
      const share = (point[1] - from[1]) / (to[1] - from[1]);
      if (from[0] + share * (to[0] - from[0]) > point[0]) inside = !inside;
    }
  }
  return inside ? "inside" : "outside";
}

/** Whether a ring contains a point; a point on its boundary is contained. */
export const containsPoint = (ring: Ring, point: GridPoint): boolean => placeOf(point, ring) !== "outside";
