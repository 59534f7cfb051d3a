import { casesOf, type ReferenceCase } from "../reference-case";

const DAS_PFE = "B. M. Das, Principles of Foundation Engineering";

const WINTERKORN = "FHWA-SA-02-054, Geotechnical Engineering Circular No. 6 (Kimmerling 2002), Table 5-12";

const BOUNDARY =
  "Boundary elements with a graded mesh, three refinements; the printed 0.99 for a rigid square is more than the flexible mean and cannot be right";

/** Settlement is B I with these: q B (1 − ν²) / E = B · 1000 mm per metre. */
const unitGround = { pressure_kPa: 1, modulus_kPa: 1, poisson: 0 };

export const elasticCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "settlement-elastic",
      citation: WINTERKORN,
      status: "read in a secondary copy",
      tolerance: { abs: 0.02 },
    },
    (
      [
        [1, 1.12, 0.56],
        [1.5, 1.36, 0.67],
        [3, 1.78, 0.88],
        [5, 2.1, 1.05],
        [10, 2.53, 1.26],
      ] as const
    ).flatMap(([length_m, centre, corner]) => [
      {
        id: `elastic-centre-${length_m}`,
        why: `has ${centre} under the flexible centre for L/B = ${length_m}`,
        inputs: { ...unitGround, breadth_m: 1, length_m, rigidity: "flexible-centre" },
        expected: { influence: centre },
      },
      {
        id: `elastic-corner-${length_m}`,
        why: `has ${corner} under the flexible corner for L/B = ${length_m}`,
        inputs: { ...unitGround, breadth_m: 1, length_m, rigidity: "flexible-corner" },
        expected: { influence: corner },
      },
    ]),
  ),
  ...casesOf(
    {
      method: "settlement-elastic",
      citation: BOUNDARY,
      status: "computed independently",
      tolerance: { abs: 0.006 },
    },
    (
      [
        [1, 0.868],
        [2, 1.196],
        [3, 1.412],
        [5, 1.702],
        [10, 2.119],
      ] as const
    ).map(([length_m, influence]) => ({
      id: `elastic-rigid-${length_m}`,
      why: `settles a rigid base of L/B = ${length_m} by ${influence}, less than the flexible mean`,
      inputs: { ...unitGround, breadth_m: 1, length_m, rigidity: "rigid" },
      expected: { influence },
    })),
  ),
  ...casesOf(
    {
      method: "settlement-elastic",
      citation: `${DAS_PFE}, Ex. 5.4 p. 228: F1 = 0.641, F2 = 0.031, If = 0.709 (edition not stated in the copy read)`,
      status: "read in a secondary copy",
      tolerance: { rel: 0.002 },
    },
    [
      {
        id: "elastic-das-centre",
        why: "has twice 0.641 + (1 − 2ν)/(1 − ν) 0.031 under the centre of 1 m by 2 m on 5 m of ground",
        inputs: {
          breadth_m: 1,
          length_m: 2,
          pressure_kPa: 150,
          modulus_kPa: 10400,
          poisson: 0.3,
          layerThickness_m: 5,
          depth_m: 1,
          foxDepth: true,
          rigidity: "flexible-centre",
        },
        expected: { influence: 2 * (0.641 + (0.4 / 0.7) * 0.031), depthFactor: 0.709 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "settlement-elastic",
      citation: `${DAS_PFE}, inputs of Ex. 5.4; with (1 − 2ν), where one companion prints 12.4 mm from (2 − ν)`,
      status: "computed independently",
      tolerance: { abs: 0.03 },
    },
    [
      {
        id: "elastic-das-rigid",
        why: "settles the rigid base by 11.40 mm, not by the 12.4 mm of a slip in Steinbrenner's second term",
        inputs: {
          breadth_m: 1,
          length_m: 2,
          pressure_kPa: 150,
          modulus_kPa: 10400,
          poisson: 0.3,
          layerThickness_m: 5,
          depth_m: 1,
          foxDepth: true,
          rigidity: "rigid",
        },
        expected: { settlement_mm: 11.4 },
      },
    ],
  ),
];
