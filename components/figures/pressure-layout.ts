/** A point of the base from its centre: along B, along L, in metres. */
export type BasePoint = readonly [alongB_m: number, alongL_m: number];

/** What the base pressure of one load combination is, as the method `base-pressure` gives it, and the pad that it is under. */
export type PressureGiven = {
  breadth_m: number;
  length_m: number;
  thickness_m: number;
  groundLevel_m: number;
  foundingLevel_m: number;
  groundwaterLevel_m?: number | null;
  /** Column on plan; drawn a third of the breadth when not known. */
  column?: { breadth_m: number; length_m: number } | null;
  /** Load at the base, downwards positive. */
  vertical_kN: number;
  eccentricityB_m: number;
  eccentricityL_m: number;
  distribution: "uniform" | "trapezoidal" | "triangular" | "partial" | "none";
  /** Order +B+L, −B+L, −B−L, +B−L. */
  cornerPressures_kPa: readonly number[];
  maxPressure_kPa: number;
  minPressure_kPa: number;
  contactRatio: number;
  contactPolygon_m: readonly BasePoint[];
};

/** Pressure along one side of the pad from −B to +B; `from_m` to `to_m` is where the base is in contact. */
export type EdgeProfile = {
  side: "+L" | "−L";
  from_m: number;
  to_m: number;
  fromPressure_kPa: number;
  toPressure_kPa: number;
};

const NEAR = 1e-6;

/** The pressure along that side of the pad that carries the highest pressure; null without contact. */
export function edgeProfile(given: PressureGiven): EdgeProfile | null {
  const [plusPlus = 0, minusPlus = 0, minusMinus = 0, plusMinus = 0] = given.cornerPressures_kPa;
  const onPlus = Math.max(plusPlus, minusPlus) >= Math.max(plusMinus, minusMinus);
  const toPressure_kPa = onPlus ? plusPlus : plusMinus;
  const fromPressure_kPa = onPlus ? minusPlus : minusMinus;
  if (given.distribution === "none" || Math.max(toPressure_kPa, fromPressure_kPa) <= 0) return null;
  const half_m = given.breadth_m / 2;
  const edge_m = (onPlus ? 1 : -1) * (given.length_m / 2);
  const onEdge = given.contactPolygon_m
    .filter(([, along]) => Math.abs(along - edge_m) <= NEAR * given.length_m)
    .map(([across]) => across);
  const from_m = fromPressure_kPa > 0 || onEdge.length === 0 ? -half_m : Math.min(...onEdge);
  const to_m = toPressure_kPa > 0 || onEdge.length === 0 ? half_m : Math.max(...onEdge);
  return { side: onPlus ? "+L" : "−L", from_m, to_m, fromPressure_kPa, toPressure_kPa };
}

/** The line where the contact ends, as its two ends on the sides of the pad; null in full contact or without any. */
export function contactLimit(given: PressureGiven): [BasePoint, BasePoint] | null {
  const { contactPolygon_m: polygon, breadth_m, length_m } = given;
  const along = (a: BasePoint, b: BasePoint, axis: 0 | 1, half_m: number): boolean =>
    [half_m, -half_m].some(
      (edge) => Math.abs(a[axis] - edge) <= NEAR * half_m && Math.abs(b[axis] - edge) <= NEAR * half_m,
    );
  for (const [index, from] of polygon.entries()) {
    const to = polygon[(index + 1) % polygon.length];
    if (!to || Math.hypot(to[0] - from[0], to[1] - from[1]) <= NEAR * breadth_m) continue;
    if (!along(from, to, 0, breadth_m / 2) && !along(from, to, 1, length_m / 2)) return [from, to];
  }
  return null;
}

/** Pixels per metre of plan and elevation, one for both; `broken` where the depth is too great to be drawn to it. */
export function scaleOf(given: PressureGiven): { pxPerM: number; broken: boolean } {
  const depth_m = Math.max(given.groundLevel_m - given.foundingLevel_m, given.thickness_m);
  const byPlan = Math.min(PLAN_PX / given.breadth_m, PLAN_PX / given.length_m);
  const byDepth = DEPTH_PX / depth_m;
  const least = LEAST_PLAN_PX / Math.max(given.breadth_m, given.length_m);
  const pxPerM = Math.min(byPlan, Math.max(byDepth, least));
  return { pxPerM, broken: depth_m * pxPerM > DEPTH_PX * 1.001 };
}

/** Greatest size of the pad and of its depth in the drawing, and the least that the pad is made for the depth's sake. */
const PLAN_PX = 270;
const LEAST_PLAN_PX = 170;
export const DEPTH_PX = 150;
