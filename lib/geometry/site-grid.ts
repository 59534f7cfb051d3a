import type { GridPoint } from "./point";

/**
 * How a site grid lies on another grid: where its origin is there, how far its east axis is turned anticlockwise from
 * the other's, and how many metres there one of its metres measures.
 */
export type SiteGrid = {
  originEasting_m: number;
  originNorthing_m: number;
  rotation_deg: number;
  scale: number;
};

/** One point known on both grids. */
export type ControlPoint = { name: string; site: GridPoint; national: GridPoint };

/** What a fit leaves over at one control point: given less fitted, on the national grid. */
export type Residual = { name: string; easting_m: number; northing_m: number; distance_m: number };

/** A fitted grid with what it leaves over. Two points leave nothing over and so prove nothing: `checked` is false. */
export type SiteGridFit = {
  grid: SiteGrid;
  residuals: Residual[];
  rootMeanSquare_m: number;
  checked: boolean;
};

/** A point of the site grid on the other grid. */
export function toNational(grid: SiteGrid, site: GridPoint): GridPoint {
  const { cos, sin } = scaledTurn(grid);
  return [
    grid.originEasting_m + cos * site[0] - sin * site[1],
    grid.originNorthing_m + sin * site[0] + cos * site[1],
  ];
}

/** A point of the other grid on the site grid. */
export function toSite(grid: SiteGrid, national: GridPoint): GridPoint {
  const { cos, sin } = scaledTurn(grid);
  const square = cos * cos + sin * sin;
  const easting = national[0] - grid.originEasting_m;
  const northing = national[1] - grid.originNorthing_m;
  return [(cos * easting + sin * northing) / square, (cos * northing - sin * easting) / square];
}

function scaledTurn(grid: SiteGrid): { cos: number; sin: number } {
  const angle = (grid.rotation_deg * Math.PI) / 180;
  return { cos: grid.scale * Math.cos(angle), sin: grid.scale * Math.sin(angle) };
}

/**
 * Fits a similarity (shift, rotation, one scale) to control points by least squares (the four-parameter transform of
 * land surveying). Needs two points apart from each other; a problem is told in a sentence.
 */
export function fitSiteGrid(points: readonly ControlPoint[]): SiteGridFit | { problem: string } {
  if (points.length < 2)
    return { problem: "A site grid needs at least two control points known on both grids." };
  if (points.some(({ site, national }) => ![...site, ...national].every(Number.isFinite)))
    return { problem: "A control point lacks an easting or a northing." };
  const siteMean = meanOf(points.map(({ site }) => site));
  const nationalMean = meanOf(points.map(({ national }) => national));
  let spread = 0;
  let cos = 0;
  let sin = 0;
  for (const { site, national } of points) {
    const x = site[0] - siteMean[0];
    const y = site[1] - siteMean[1];
    const easting = national[0] - nationalMean[0];
    const northing = national[1] - nationalMean[1];
    spread += x * x + y * y;
    cos += x * easting + y * northing;
    sin += x * northing - y * easting;
  }
  if (spread < 1e-6) return { problem: "The control points are one and the same point of the site grid." };
  const scale = Math.hypot(cos, sin) / spread;
  if (!(scale > 1e-9))
    return { problem: "The control points are one and the same point of the national grid." };
  const angle = Math.atan2(sin, cos);
  const turned = (point: GridPoint): GridPoint => [
    scale * (Math.cos(angle) * point[0] - Math.sin(angle) * point[1]),
    scale * (Math.sin(angle) * point[0] + Math.cos(angle) * point[1]),
  ];
  const shift = turned(siteMean);
  const grid: SiteGrid = {
    originEasting_m: nationalMean[0] - shift[0],
    originNorthing_m: nationalMean[1] - shift[1],
    rotation_deg: (angle * 180) / Math.PI,
    scale,
  };
  const residuals = points.map(({ name, site, national }): Residual => {
    const fitted = toNational(grid, site);
    const easting_m = national[0] - fitted[0];
    const northing_m = national[1] - fitted[1];
    return { name, easting_m, northing_m, distance_m: Math.hypot(easting_m, northing_m) };
  });
  const squares = residuals.reduce((sum, residual) => sum + residual.distance_m ** 2, 0);
  return {
    grid,
    residuals,
    rootMeanSquare_m: Math.sqrt(squares / points.length),
    checked: points.length > 2,
  };
}

/**
 * A grid from one point and an angle, for want of a second point: it gets worse with the distance from that point, and
 * whoever uses it confirms it.
 */
export function siteGridFromAngle(given: {
  point: Omit<ControlPoint, "name">;
  rotation_deg: number;
  scale?: number;
}): SiteGrid {
  const { point, rotation_deg, scale = 1 } = given;
  const atOrigin: SiteGrid = { originEasting_m: 0, originNorthing_m: 0, rotation_deg, scale };
  const [easting, northing] = toNational(atOrigin, point.site);
  return {
    ...atOrigin,
    originEasting_m: point.national[0] - easting,
    originNorthing_m: point.national[1] - northing,
  };
}

function meanOf(points: readonly GridPoint[]): GridPoint {
  // From the first point, so that the mean of large coordinates keeps its digits.
  const [origin = [0, 0] as const] = points;
  let easting = 0;
  let northing = 0;
  for (const point of points) {
    easting += (point[0] - origin[0]) / points.length;
    northing += (point[1] - origin[1]) / points.length;
  }
  return [origin[0] + easting, origin[1] + northing];
}

/** A level datum tied to another: `zero_m` is the level of its zero on the other ("+0.00 = 21.350 mOD"). */
export type LevelDatum = { zero_m: number };

/** A level of the datum on the one that it is tied to, in metres. */
export const levelOnOther_m = (datum: LevelDatum, level_m: number): number => level_m + datum.zero_m;

/** A level of the other datum on this one, in metres. */
export const levelOnDatum_m = (datum: LevelDatum, other_m: number): number => other_m - datum.zero_m;
