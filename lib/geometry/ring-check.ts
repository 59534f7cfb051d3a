import { distance_m, distanceToSegment_m, type GridPoint, type Ring } from "./point";
import { anticlockwise, sidesOf } from "./polygon";

/** Where a boundary meets itself: the point, and the two sides counted from 1. */
export type Crossing = { at: GridPoint; sides: [number, number] };

/**
 * Takes away the corners that say nothing: the first repeated at the end, a corner repeated at once, and a spike that
 * runs out and straight back. What stays keeps its order.
 */
export function cleanRing(points: readonly GridPoint[], tolerance_m = 1e-3): GridPoint[] {
  let ring = points.map((point): GridPoint => [point[0], point[1]]);
  for (let changed = true; changed && ring.length > 1; ) {
    changed = false;
    const kept: GridPoint[] = [];
    for (const point of ring) {
      const last = kept.at(-1);
      const beforeLast = kept.at(-2);
      if (last && distance_m(last, point) <= tolerance_m) changed = true;
      else if (last && beforeLast && distance_m(beforeLast, point) <= tolerance_m) {
        kept.pop();
        changed = true;
      } else kept.push(point);
    }
    const first = kept[0];
    const last = kept.at(-1);
    if (kept.length > 1 && first && last && distance_m(first, last) <= tolerance_m) {
      kept.pop();
      changed = true;
    }
    ring = kept;
  }
  return ring;
}

/** The first place where a boundary crosses or touches itself; null for a simple one. */
export function selfCrossing(ring: Ring, tolerance_m = 1e-6): Crossing | null {
  const sides = sidesOf(ring);
  const count = sides.length;
  for (let i = 0; i < count; i += 1) {
    for (let j = i + 1; j < count; j += 1) {
      const a = sides[i] as [GridPoint, GridPoint];
      const b = sides[j] as [GridPoint, GridPoint];
      const next = j === i + 1;
      const closing = i === 0 && j === count - 1;
      const at =
        next || closing
          ? foldedBack(closing ? b : a, closing ? a : b, tolerance_m)
          : meeting(a, b, tolerance_m);
      if (at) return { at, sides: [i + 1, j + 1] };
    }
  }
  return null;
}

/** Sides in succession share a corner; they meet elsewhere only where one runs back over the other. */
function foldedBack(
  [from, corner]: [GridPoint, GridPoint],
  [, to]: [GridPoint, GridPoint],
  tolerance_m: number,
): GridPoint | null {
  const back = (from[0] - corner[0]) * (to[0] - corner[0]) + (from[1] - corner[1]) * (to[1] - corner[1]);
  if (back <= 0) return null;
  if (distanceToSegment_m(to, from, corner) <= tolerance_m) return to;
  if (distanceToSegment_m(from, corner, to) <= tolerance_m) return from;
  return null;
}

/** The point where two separate sides cross or touch. */
function meeting(
  [a, b]: [GridPoint, GridPoint],
  [c, d]: [GridPoint, GridPoint],
  tolerance_m: number,
): GridPoint | null {
  for (const [point, from, to] of [
    [c, a, b],
    [d, a, b],
    [a, c, d],
    [b, c, d],
  ] as const)
    if (distanceToSegment_m(point, from, to) <= tolerance_m) return point;
  const first: GridPoint = [b[0] - a[0], b[1] - a[1]];
  const second: GridPoint = [d[0] - c[0], d[1] - c[1]];
  const cross = first[0] * second[1] - first[1] * second[0];
  if (cross === 0) return null;
  const across: GridPoint = [c[0] - a[0], c[1] - a[1]];
  const onFirst = (across[0] * second[1] - across[1] * second[0]) / cross;
  const onSecond = (across[0] * first[1] - across[1] * first[0]) / cross;
  if (onFirst < 0 || onFirst > 1 || onSecond < 0 || onSecond > 1) return null;
  return [a[0] + onFirst * first[0], a[1] + onFirst * first[1]];
}

/** A boundary fit to be kept, or what is wrong with it and where. */
export type ReadRing = { ring: GridPoint[] } | { problem: string; at: GridPoint | null };

/** Reads a drawn or imported boundary: cleaned, anticlockwise, simple, with an area; or says what is wrong. */
export function readRing(points: readonly GridPoint[], tolerance_m = 1e-3): ReadRing {
  const strange = points.findIndex((point) => !Number.isFinite(point[0]) || !Number.isFinite(point[1]));
  if (strange >= 0) return { problem: `Corner ${strange + 1} has no easting or no northing.`, at: null };
  const ring = cleanRing(points, tolerance_m);
  if (ring.length < 3)
    return { problem: "A boundary needs at least three different corners.", at: ring[0] ?? null };
  if (onOneLine(ring, tolerance_m))
    return { problem: "The corners lie on one line: the boundary encloses nothing.", at: ring[0] ?? null };
  const crossing = selfCrossing(ring);
  if (crossing) {
    const [easting, northing] = crossing.at;
    const sides = `sides ${crossing.sides[0]} and ${crossing.sides[1]}`;
    return {
      problem: `The boundary meets itself at ${easting.toFixed(2)} E, ${northing.toFixed(2)} N (${sides}).`,
      at: crossing.at,
    };
  }
  return { ring: anticlockwise(ring) };
}

/** Whether all corners lie within the tolerance of the line from the first to the one farthest from it. */
function onOneLine(ring: Ring, tolerance_m: number): boolean {
  const first = ring[0] as GridPoint;
  const farthest = ring.reduce(
    (best, p) => (distance_m(first, p) > distance_m(first, best) ? p : best),
    first,
  );
  return ring.every((point) => distanceToSegment_m(point, first, farthest) <= tolerance_m);
}
