import { formula } from "../formula";

/** Settlement of a base of smaller side B; I tells where and on what. */
export const elasticSettlement = formula({
  symbol: "s",
  unit: "mm",
  ref: "steinbrenner1934",
  shown: "1000 q B (1 − ν²) / E I",
  symbols: { q: "pressure_kPa", B: "smallerSide_m", ν: "poisson", E: "modulus_kPa", I: "influence" },
  of: (q: {
    pressure_kPa: number;
    smallerSide_m: number;
    poisson: number;
    modulus_kPa: number;
    influence: number;
  }) => (1000 * q.pressure_kPa * q.smallerSide_m * (1 - q.poisson * q.poisson) * q.influence) / q.modulus_kPa,
});

/** Under the corner of b by l on the half-space, in sides b; m = l / b. */
export const halfSpaceCorner = (m: number): number => (m * Math.asinh(1 / m) + Math.asinh(m)) / Math.PI;

/** Mean over the whole flexible rectangle on the half-space, in smaller sides; m = L / B. */
export function halfSpaceMean(m: number): number {
  const diagonal = Math.hypot(1, m);
  const sum =
    m * Math.log((diagonal + 1) / m) + Math.log(diagonal + m) - (diagonal ** 3 - m ** 3 - 1) / (3 * m);
  return (2 * sum) / Math.PI;
}

/** Steinbrenner: under the corner of b by l on a layer of thickness h, in sides b; m = l / b, n = h / b. */
export function layerCorner(m: number, n: number, poisson: number): number {
  if (n === 0) return 0;
  const mm = m * m;
  const nn = n * n;
  const all = Math.sqrt(mm + nn + 1);
  const a0 = m * Math.log(((1 + Math.sqrt(mm + 1)) * Math.sqrt(mm + nn)) / (m * (1 + all)));
  const a1 = Math.log(((m + Math.sqrt(mm + 1)) * Math.sqrt(1 + nn)) / (m + all));
  const f1 = (a0 + a1) / Math.PI;
  const f2 = (n / (2 * Math.PI)) * Math.atan(m / (n * all));
  return f1 + ((1 - 2 * poisson) / (1 - poisson)) * f2;
}

/** A rigid rectangle without friction over the flexible mean, by L / B; by a boundary-element solution of our own. */
const rigidInfluence: readonly [ratio: number, influence: number][] = [
  [1, 0.868],
  [2, 1.197],
  [3, 1.412],
  [5, 1.702],
  [10, 2.119],
];

/** Influence of the rigid rectangle on the half-space: between the solved shapes its share of the flexible mean is read. */
export function rigidHalfSpace(m: number): number {
  const shares = rigidInfluence.map(
    ([ratio, influence]) => [Math.log(ratio), influence / halfSpaceMean(ratio)] as const,
  );
  const at = Math.log(m);
  let share = shares[shares.length - 1]?.[1] ?? 1;
  for (let upper = 1; upper < shares.length; upper += 1) {
    const [x0, y0] = shares[upper - 1] as readonly [number, number];
    const [x1, y1] = shares[upper] as readonly [number, number];
    if (at <= x1) {
      share = y0 + ((at - x0) / (x1 - x0)) * (y1 - y0);
      break;
    }
  }
  return share * halfSpaceMean(m);
}

/** Bowles: a rigid base on a layer settles about 0.93 of the flexible centre. */
export const RIGID_SHARE_OF_CENTRE = 0.93;

/** Fox: mean settlement at a depth over that at the surface, for a rectangle b by l. */
export function foxDepthFactor(b: number, l: number, depth: number, poisson: number): number {
  if (depth === 0) return 1;
  const r = 2 * depth;
  const r1 = Math.hypot(l, r);
  const r2 = Math.hypot(b, r);
  const r3 = Math.hypot(l, b, r);
  const r4 = Math.hypot(l, b);
  const y1 =
    l * Math.log((r4 + b) / l) + b * Math.log((r4 + l) / b) - (r4 ** 3 - l ** 3 - b ** 3) / (3 * l * b);
  const y2 =
    l * Math.log((r3 + b) / r1) +
    b * Math.log((r3 + l) / r2) -
    (r3 ** 3 - r2 ** 3 - r1 ** 3 + r ** 3) / (3 * l * b);
  const y3 =
    ((r * r) / l) * Math.log(((b + r2) * r1) / ((b + r3) * r)) +
    ((r * r) / b) * Math.log(((l + r1) * r2) / ((l + r3) * r));
  const y4 = (r * r * (r1 + r2 - r3 - r)) / (l * b);
  const y5 = r * Math.atan((l * b) / (r * r3));
  const b1 = 3 - 4 * poisson;
  const b2 = 5 - 12 * poisson + 8 * poisson * poisson;
  const b3 = -4 * poisson * (1 - 2 * poisson);
  const b4 = -1 + 4 * poisson - 8 * poisson * poisson;
  const b5 = -4 * (1 - 2 * poisson) ** 2;
  return (b1 * y1 + b2 * y2 + b3 * y3 + b4 * y4 + b5 * y5) / ((b1 + b2) * y1);
}
