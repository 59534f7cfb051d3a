import polygonClipping from "polygon-clipping";
import { boundingBox, boxesTouch, type GridPoint, type Ring } from "./point";
import { area_m2, perimeter_m, sidesOf, signedArea_m2 } from "./polygon";

/**
 * Area in m² that two simple rings have in common. Each ring is the signed sum of the strips under its sides, so the
 * common area is the sum over pairs of sides of the strip under the lower of the two: no clipping, nothing that can
 * fail on a shared side or a shared corner.
 */
export function overlapArea_m2(first: Ring, second: Ring): number {
  const a = boundingBox(first);
  const b = boundingBox(second);
  if (!a || !b || !boxesTouch(a, b)) return 0;
  // Strips reach down to just below both rings and no farther, so that few digits cancel.
  const floor = Math.min(a.minNorthing_m, b.minNorthing_m);
  const left = Math.max(a.minEasting_m, b.minEasting_m);
  const place = (point: GridPoint): GridPoint => [point[0] - left, point[1] - floor];
  const ringA = first.map(place);
  const ringB = second.map(place);
  let sum = 0;
  for (const sideA of sidesOf(ringA)) for (const sideB of sidesOf(ringB)) sum += commonStrip_m2(sideA, sideB);
  const signs = Math.sign(signedArea_m2(ringA)) * Math.sign(signedArea_m2(ringB));
  return Math.max(0, Math.min(sum * signs, area_m2(ringA), area_m2(ringB)));
}

/** Area under the lower of two sides where both stand over the same eastings, signed by the way that each runs. */
function commonStrip_m2([a, b]: [GridPoint, GridPoint], [c, d]: [GridPoint, GridPoint]): number {
  const from = Math.max(Math.min(a[0], b[0]), Math.min(c[0], d[0]));
  const to = Math.min(Math.max(a[0], b[0]), Math.max(c[0], d[0]));
  if (to <= from) return 0;
  const sign = Math.sign(b[0] - a[0]) * Math.sign(d[0] - c[0]);
  const heightAt = (p: GridPoint, q: GridPoint, x: number): number =>
    p[1] + ((x - p[0]) / (q[0] - p[0])) * (q[1] - p[1]);
  const a0 = heightAt(a, b, from);
  const a1 = heightAt(a, b, to);
  const b0 = heightAt(c, d, from);
  const b1 = heightAt(c, d, to);
  const width = to - from;
  const gap0 = a0 - b0;
  const gap1 = a1 - b1;
  if (gap0 * gap1 >= 0) return (sign * width * (Math.min(a0, b0) + Math.min(a1, b1))) / 2;
  const share = gap0 / (gap0 - gap1);
  const middle = a0 + share * (a1 - a0);
  return (
    (sign * width * (share * (Math.min(a0, b0) + middle) + (1 - share) * (middle + Math.min(a1, b1)))) / 2
  );
}

/** Part of `ring` that lies inside `inside`, 0 to 1. */
export function shareInside(ring: Ring, inside: Ring): number {
  const whole = area_m2(ring);
  return whole === 0 ? 0 : Math.min(1, overlapArea_m2(ring, inside) / whole);
}

/** Whether `outer` contains the whole of `inner`, but for a strip along its boundary no wider than the tolerance. */
export function containsRing(outer: Ring, inner: Ring, tolerance_m = 1e-3): boolean {
  return area_m2(inner) - overlapArea_m2(inner, outer) <= tolerance_m * perimeter_m(inner);
}

/** One piece that two rings have in common: its boundary, and the holes in it. */
export type Piece = { ring: GridPoint[]; holes: GridPoint[][] };

/**
 * The pieces that two rings have in common, to be drawn; corners are first brought to a tenth of a millimetre. Null
 * when the clipping library cannot follow the boundaries: the area is known even then, from `overlapArea_m2`.
 */
export function overlapPieces(first: Ring, second: Ring): Piece[] | null {
  const [origin] = first;
  if (!origin || second.length === 0) return [];
  const snap = (value: number): number => Math.round(value * 1e4) / 1e4;
  const near = (ring: Ring): [number, number][] =>
    ring.map((point) => [snap(point[0] - origin[0]), snap(point[1] - origin[1])]);
  const back = (ring: [number, number][]): GridPoint[] =>
    ring.slice(0, -1).map(([easting, northing]) => [easting + origin[0], northing + origin[1]]);
  try {
    return polygonClipping
      .intersection([near(first)], [near(second)])
      .map(([ring, ...holes]) => ({ ring: back(ring ?? []), holes: holes.map(back) }));
  } catch {
    return null;
  }
}

/**
 * Whether two rings overlap: some common piece is wider than the tolerance, its width taken as twice its area over
 * its perimeter. Neighbours that share a side, drawn a few millimetres apart or over each other, do not overlap.
 */
export function ringsOverlap(first: Ring, second: Ring, tolerance_m = 0.01): boolean {
  const area = overlapArea_m2(first, second);
  // No piece is wider than the whole common area allows: most neighbours end here.
  if (area <= tolerance_m * tolerance_m) return false;
  const pieces = overlapPieces(first, second);
  if (!pieces) return area > (tolerance_m * Math.min(perimeter_m(first), perimeter_m(second))) / 2;
  return pieces.some(({ ring }) => (2 * area_m2(ring)) / perimeter_m(ring) > tolerance_m);
}
