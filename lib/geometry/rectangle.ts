import { containsRing } from "./overlap";
import { distanceToSegment_m, type GridPoint, type Ring } from "./point";
import { sidesOf } from "./polygon";

/**
 * A pad on plan. `orientation_deg` is the bearing of the breadth axis, measured anticlockwise from grid east; the
 * length axis lies 90° further anticlockwise.
 */
export type Rectangle = {
  easting_m: number;
  northing_m: number;
  breadth_m: number;
  length_m: number;
  orientation_deg: number;
};

/** Sine and cosine of an angle in degrees, exact at the quarter turns where most footings stand. */
function turn(angle_deg: number): { cos: number; sin: number } {
  const within = ((angle_deg % 360) + 360) % 360;
  const quarters: Record<number, [number, number]> = { 0: [1, 0], 90: [0, 1], 180: [-1, 0], 270: [0, -1] };
  const [cos, sin] = quarters[within] ?? [
    Math.cos((within * Math.PI) / 180),
    Math.sin((within * Math.PI) / 180),
  ];
  return { cos, sin };
}

/** The point of the grid that lies `alongB_m` and `alongL_m` from the centre on the pad's own axes. */
export function pointOnPad(pad: Rectangle, alongB_m: number, alongL_m: number): GridPoint {
  const { cos, sin } = turn(pad.orientation_deg);
  return [pad.easting_m + alongB_m * cos - alongL_m * sin, pad.northing_m + alongB_m * sin + alongL_m * cos];
}

/** Distances in metres along the pad's own axes from its centre to a point of the grid. */
export function padAxesOf(pad: Rectangle, point: GridPoint): { alongB_m: number; alongL_m: number } {
  const { cos, sin } = turn(pad.orientation_deg);
  const easting = point[0] - pad.easting_m;
  const northing = point[1] - pad.northing_m;
  return { alongB_m: easting * cos + northing * sin, alongL_m: northing * cos - easting * sin };
}

/** Corners of a pad, anticlockwise from +B+L: +B+L, −B+L, −B−L, +B−L, the order of the corner pressures. */
export function cornersOf(pad: Rectangle): [GridPoint, GridPoint, GridPoint, GridPoint] {
  const b = pad.breadth_m / 2;
  const l = pad.length_m / 2;
  return [pointOnPad(pad, b, l), pointOnPad(pad, -b, l), pointOnPad(pad, -b, -l), pointOnPad(pad, b, -l)];
}

/** Whether a ring contains the whole of a pad, but for a strip along its edge no wider than the tolerance. */
export const containsRectangle = (ring: Ring, pad: Rectangle, tolerance_m = 1e-3): boolean =>
  containsRing(ring, cornersOf(pad), tolerance_m);

/** Least clear distance in metres between two pads on plan; 0 when they touch or overlap. */
export function clearGap_m(first: Rectangle, second: Rectangle): number {
  const a = cornersOf(first);
  const b = cornersOf(second);
  if (a.some((corner) => holds(second, corner)) || b.some((corner) => holds(first, corner))) return 0;
  let least = Number.POSITIVE_INFINITY;
  for (const [p, q] of sidesOf(a)) {
    for (const [r, s] of sidesOf(b)) {
      if (cross(p, q, r, s)) return 0;
      for (const [point, from, to] of [
        [p, r, s],
        [q, r, s],
        [r, p, q],
        [s, p, q],
      ] as const)
        least = Math.min(least, distanceToSegment_m(point, from, to));
    }
  }
  return least;
}

function holds(pad: Rectangle, point: GridPoint): boolean {
  const { alongB_m, alongL_m } = padAxesOf(pad, point);
  return Math.abs(alongB_m) <= pad.breadth_m / 2 && Math.abs(alongL_m) <= pad.length_m / 2;
}

function cross(p: GridPoint, q: GridPoint, r: GridPoint, s: GridPoint): boolean {
  const side = (a: GridPoint, b: GridPoint, c: GridPoint): number =>
    Math.sign((b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]));
  return side(p, q, r) * side(p, q, s) < 0 && side(r, s, p) * side(r, s, q) < 0;
}
