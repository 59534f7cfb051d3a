import { formula } from "../formula";

/** The load spread at two down to one out on every side: a mean over a growing area, not a stress at a point. */
export const twoToOne = formula({
  symbol: "Δq",
  unit: "kPa",
  ref: "gec6",
  where: "Eq. 5-17",
  shown: "q B L / ((B + z) (L + z))",
  symbols: { q: "pressure_kPa", B: "breadth_m", L: "length_m", z: "depth_m" },
  of: (q: { pressure_kPa: number; breadth_m: number; length_m: number; depth_m: number }) =>
    (q.pressure_kPa * q.breadth_m * q.length_m) / ((q.breadth_m + q.depth_m) * (q.length_m + q.depth_m)),
});

/** An influence factor times the pressure. */
export const increase = formula({
  symbol: "Δσ",
  unit: "kPa",
  ref: "boussinesq1885",
  shown: "I q",
  symbols: { I: "influence", q: "pressure_kPa" },
  of: (q: { influence: number; pressure_kPa: number }) => q.influence * q.pressure_kPa,
});

/**
 * Vertical stress under the corner of a rectangle a by b on an elastic half-space, over the pressure. Written with
 * atan2, so that the branch below shallow points under large areas is right. Odd in a and in b: a side that lies on the
 * other side of the point takes its part away.
 */
export function boussinesqCorner(a_m: number, b_m: number, depth_m: number): number {
  if (a_m === 0 || b_m === 0) return 0;
  const r1 = a_m * a_m + depth_m * depth_m;
  const r2 = b_m * b_m + depth_m * depth_m;
  const r3 = Math.sqrt(a_m * a_m + b_m * b_m + depth_m * depth_m);
  const product = Math.abs(a_m * b_m);
  const size =
    (Math.atan2(product, depth_m * r3) + ((product * depth_m) / r3) * (1 / r1 + 1 / r2)) / (2 * Math.PI);
  return a_m * b_m < 0 ? -size : size;
}

/** The same in ground stiffened by thin level sheets (no lateral strain), Poisson's ratio zero. */
export function westergaardCorner(a_m: number, b_m: number, depth_m: number): number {
  if (a_m === 0 || b_m === 0) return 0;
  const root = Math.sqrt(0.5) * depth_m * Math.sqrt(a_m * a_m + b_m * b_m + 0.5 * depth_m * depth_m);
  const size = Math.atan2(Math.abs(a_m * b_m), root) / (2 * Math.PI);
  return a_m * b_m < 0 ? -size : size;
}

/** Influence at a point of the plan from the four rectangles that meet there. */
export function atPoint(
  corner: (a_m: number, b_m: number, depth_m: number) => number,
  q: { breadth_m: number; length_m: number; depth_m: number; x_m: number; y_m: number },
): number {
  const before = q.breadth_m / 2 - q.x_m;
  const behind = q.breadth_m / 2 + q.x_m;
  const left = q.length_m / 2 - q.y_m;
  const right = q.length_m / 2 + q.y_m;
  const { depth_m } = q;
  return (
    corner(before, left, depth_m) +
    corner(behind, left, depth_m) +
    corner(before, right, depth_m) +
    corner(behind, right, depth_m)
  );
}
