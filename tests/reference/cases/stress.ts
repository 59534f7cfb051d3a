import { casesOf, type ReferenceCase } from "../reference-case";

const DAS_PFE = "B. M. Das, Principles of Foundation Engineering";

const NEWMARK = "N. M. Newmark 1935, corner factors";

const INTEGRATED =
  "The point load integrated over the rectangle by Gauss quadrature, and Newmark's algebraic form with atan2: both agree to 1e-14";

const OWN = "Closed form of elastic theory, against numerical integration of the point load";

/** The corner of a rectangle m z by n z at depth z: a quarter of the rectangle of twice the sides, at its centre. */
const underCorner = (rule: string, m: number, n: number) => ({
  rule,
  breadth_m: m,
  length_m: n,
  pressure_kPa: 1,
  depth_m: 1,
  x_m: m / 2,
  y_m: n / 2,
});

export const stressCases: ReferenceCase[] = [
  ...casesOf(
    { method: "stress-increase", citation: NEWMARK, status: "from memory", tolerance: { abs: 6e-5 } },
    (
      [
        [0.1, 0.1, 0.0047],
        [1, 2, 0.19994],
        [2, 2, 0.23247],
      ] as const
    ).map(([m, n, influence]) => ({
      id: `stress-newmark-${m}-${n}`,
      why: `brings ${influence} of the pressure under the corner for m = ${m}, n = ${n}`,
      inputs: underCorner("boussinesq", m, n),
      expected: { influence },
    })),
  ),
  ...casesOf(
    {
      method: "stress-increase",
      citation: INTEGRATED,
      status: "computed independently",
      tolerance: { abs: 1e-9 },
    },
    (
      [
        [0.5, 1, 0.12017533318],
        [3, 3, 0.24393961996],
        [10, 10, 0.2498148273],
      ] as const
    ).map(([m, n, influence]) => ({
      id: `stress-integrated-${m}-${n}`,
      why: `brings ${influence.toFixed(5)} of the pressure under the corner for m = ${m}, n = ${n}, with the branch of the arctangent right`,
      inputs: underCorner("boussinesq", m, n),
      expected: { influence },
    })),
  ),
  ...casesOf(
    {
      method: "stress-increase",
      citation:
        "H. M. Westergaard 1938, Poisson's ratio zero; formula from memory, confirmed by integrating the point load",
      status: "computed independently",
      tolerance: { abs: 2e-6 },
    },
    (
      [
        [0.5, 0.5, 0.054087],
        [1, 1, 0.11614],
        [1, 2, 0.139822],
        [2, 2, 0.174261],
        [1e6, 1e6, 0.25],
      ] as const
    ).map(([m, n, influence]) => ({
      id: `stress-westergaard-${m}-${n}`,
      why: `brings ${influence} under the corner by Westergaard for m = ${m}, n = ${n}`,
      inputs: underCorner("westergaard", m, n),
      expected: { influence },
    })),
  ),
  ...casesOf(
    {
      method: "stress-increase",
      citation: `${DAS_PFE}, Ex. 5.1 p. 212 and Ex. 5.10 p. 256 (edition not stated in the copy read)`,
      status: "read in a secondary copy",
      tolerance: { abs: 6e-4 },
    },
    (
      [
        [5, 0.131],
        [4, 0.19],
        [9, 0.045],
      ] as const
    ).map(([halves, influence]) => ({
      id: `stress-das-${halves}`,
      why: `brings ${influence} under the centre of a base twice as long as broad at ${halves} half breadths`,
      inputs: { rule: "boussinesq", breadth_m: 2, length_m: 4, pressure_kPa: 100, depth_m: halves },
      expected: { influence },
    })),
  ),
  ...casesOf(
    {
      method: "stress-increase",
      citation:
        "G. N. and I. G. N. Smith, Elements of Soil Mechanics, example with Fig. 4.7: the exact difference, where the chart reading is 5 % low",
      status: "computed independently",
      tolerance: { abs: 0.01 },
    },
    [
      {
        id: "stress-smith",
        why: "brings 22.71 kPa to a point 4 m from the centre of a square of 4.5 m, outside the loaded area",
        inputs: { rule: "boussinesq", breadth_m: 4.5, length_m: 4.5, pressure_kPa: 200, depth_m: 3, x_m: 4 },
        expected: { increase_kPa: 22.71 },
      },
    ],
  ),
  ...casesOf(
    { method: "stress-increase", citation: OWN, status: "computed independently", tolerance: { rel: 2e-4 } },
    (
      [
        [0.5, 0.444444, 0.700886],
        [1, 0.25, 0.336108],
        [2, 0.111111, 0.108083],
        [3, 0.0625, 0.050702],
      ] as const
    ).flatMap(([depth_m, spread, centre]) => [
      {
        id: `stress-spread-${depth_m}`,
        why: `spreads to ${spread} at ${depth_m} breadths below a square`,
        inputs: { rule: "two-to-one", breadth_m: 1, length_m: 1, pressure_kPa: 100, depth_m },
        expected: { influence: spread },
      },
      {
        id: `stress-centre-${depth_m}`,
        why: `brings ${centre} under the centre of the same square`,
        inputs: { rule: "boussinesq", breadth_m: 1, length_m: 1, pressure_kPa: 100, depth_m },
        expected: { influence: centre },
      },
    ]),
  ),
];
