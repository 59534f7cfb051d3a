/** A point on a grid: easting and northing in metres. */
export type GridPoint = readonly [easting_m: number, northing_m: number];

/** A closed boundary as its corners in order, the first not repeated at the end. */
export type Ring = readonly GridPoint[];

/** A box on plan in metres. */
export type Box = {
  minEasting_m: number;
  minNorthing_m: number;
  maxEasting_m: number;
  maxNorthing_m: number;
};

/** Distance between two points, in metres. */
export const distance_m = (a: GridPoint, b: GridPoint): number => Math.hypot(b[0] - a[0], b[1] - a[1]);

/** The smallest box, square to the grid, that holds all the points; null when there is none. */
export function boundingBox(points: readonly GridPoint[]): Box | null {
  const [first] = points;
  if (!first) return null;
  const box = {
    minEasting_m: first[0],
    minNorthing_m: first[1],
    maxEasting_m: first[0],
    maxNorthing_m: first[1],
  };
  for (const [easting_m, northing_m] of points) {
    box.minEasting_m = Math.min(box.minEasting_m, easting_m);
    box.maxEasting_m = Math.max(box.maxEasting_m, easting_m);
    box.minNorthing_m = Math.min(box.minNorthing_m, northing_m);
    box.maxNorthing_m = Math.max(box.maxNorthing_m, northing_m);
  }
  return box;
}

/** Whether two boxes touch or overlap: a quick first question before two boundaries are compared. */
export const boxesTouch = (a: Box, b: Box): boolean =>
  a.minEasting_m <= b.maxEasting_m &&
  b.minEasting_m <= a.maxEasting_m &&
  a.minNorthing_m <= b.maxNorthing_m &&
  b.minNorthing_m <= a.maxNorthing_m;

/** Distance in metres from a point to the straight piece between two others. */
export function distanceToSegment_m(point: GridPoint, from: GridPoint, to: GridPoint): number {
  const along: GridPoint = [to[0] - from[0], to[1] - from[1]];
  const square = along[0] * along[0] + along[1] * along[1];
  if (square === 0) return distance_m(point, from);
  const share = ((point[0] - from[0]) * along[0] + (point[1] - from[1]) * along[1]) / square;
  const held = Math.min(1, Math.max(0, share));
  return distance_m(point, [from[0] + held * along[0], from[1] + held * along[1]]);
}
