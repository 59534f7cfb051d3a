/** A point on the site grid: easting and northing in metres. */
export type GridPoint = readonly [easting_m: number, northing_m: number];

export type Footprint = {
  easting_m: number;
  northing_m: number;
  orientation_deg: number;
  breadth_m: number;
  length_m: number;
};

/** Corners of a pad on plan, anticlockwise; the breadth axis lies `orientation_deg` anticlockwise from grid east. */
export function cornersOf(pad: Footprint): GridPoint[] {
  const angle = (pad.orientation_deg * Math.PI) / 180;
  const cos = Math.cos(angle);
  const sin = Math.sin(angle);
  const halfB = pad.breadth_m / 2;
  const halfL = pad.length_m / 2;
  const corner = (b: number, l: number): GridPoint => [
    pad.easting_m + b * cos - l * sin,
    pad.northing_m + b * sin + l * cos,
  ];
  return [corner(halfB, halfL), corner(-halfB, halfL), corner(-halfB, -halfL), corner(halfB, -halfL)];
}

/**
 * Part of a pad's footprint that lies inside a zone, 0 to 1. The zone's ring may have any simple shape: it is cut by
 * the four sides of the pad, which leaves the area right even where the cut falls into pieces.
 */
export function shareInside(pad: Footprint, ring_m: readonly GridPoint[]): number {
  // Everything is taken from the pad's centre, so that coordinates of a national grid lose no digits.
  const fromCentre = (points: readonly GridPoint[]): GridPoint[] =>
    points.map(([easting_m, northing_m]) => [easting_m - pad.easting_m, northing_m - pad.northing_m]);
  const corners = fromCentre(cornersOf(pad));
  let cut = fromCentre(ring_m);
  for (let side = 0; side < 4 && cut.length > 0; side += 1) {
    const from = corners[side] as GridPoint;
    const to = corners[(side + 1) % 4] as GridPoint;
    cut = cutLeftOf(cut, from, to);
  }
  const share = Math.abs(areaOf(cut)) / (pad.breadth_m * pad.length_m);
  // Within a billionth of the whole is the rounding of the cut.
  return share > 1 - 1e-9 ? 1 : share;
}

/** The part of a ring on the left of the line from `from` to `to`. */
function cutLeftOf(ring: readonly GridPoint[], from: GridPoint, to: GridPoint): GridPoint[] {
  const side = ([easting, northing]: GridPoint): number =>
    (to[0] - from[0]) * (northing - from[1]) - (to[1] - from[1]) * (easting - from[0]);
  const kept: GridPoint[] = [];
  ring.forEach((point, index) => {
    const next = ring[(index + 1) % ring.length] as GridPoint;
    const here = side(point);
    const there = side(next);
    if (here >= 0) kept.push(point);
    if ((here > 0 && there < 0) || (here < 0 && there > 0)) {
      const part = here / (here - there);
      kept.push([point[0] + part * (next[0] - point[0]), point[1] + part * (next[1] - point[1])]);
    }
  });
  return kept;
}

function areaOf(ring: readonly GridPoint[]): number {
  let twice = 0;
  ring.forEach(([easting, northing], index) => {
    const [nextEasting, nextNorthing] = ring[(index + 1) % ring.length] as GridPoint;
    twice += easting * nextNorthing - nextEasting * northing;
  });
  return twice / 2;
}
