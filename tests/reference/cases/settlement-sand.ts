import { casesOf, type ReferenceCase } from "../reference-case";
import { INCH_m, PSI_kPa } from "../source-units";

const DAS_PFE = "B. M. Das, Principles of Foundation Engineering";

export const schmertmannCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "settlement-schmertmann",
      citation: "Geometry of the 1978 diagram for a square: area B (0.025 + Izp)",
      status: "computed independently",
      tolerance: { rel: 1e-5 },
    },
    [
      {
        id: "schmertmann-square",
        why: "settles a square of 2 m on uniform sand by 20.56 mm",
        inputs: {
          breadth_m: 2,
          length_m: 2,
          netPressure_kPa: 150,
          overburden_kPa: 18,
          overburdenAtPeak_kPa: 36,
          layers: [{ thickness_m: 4, modulus_kPa: 10000 }],
          years: 0.1,
        },
        expected: {
          settlement_mm: 20.561,
          c1: 0.94,
          c2: 1,
          peakInfluence: 0.704124,
          "layers.0.area_m": 1.458248,
        },
        tolerance: { rel: 3e-5 },
      },
      {
        id: "schmertmann-sublayers",
        why: "comes to the same settlement however the layer is divided",
        inputs: {
          breadth_m: 2,
          length_m: 2,
          netPressure_kPa: 150,
          overburden_kPa: 18,
          overburdenAtPeak_kPa: 36,
          layers: [0.3, 0.9, 0.8, 1.7, 2.3].map((thickness_m) => ({ thickness_m, modulus_kPa: 10000 })),
          years: 0.1,
        },
        expected: { settlement_mm: 20.561 },
        tolerance: { rel: 3e-5 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "settlement-schmertmann",
      citation: `${DAS_PFE}, Ex. 5.6 p. 238, strip of 96 in with the diagram's peak at 0.5 (edition not stated in the copy read)`,
      status: "read in a secondary copy",
    },
    [
      {
        id: "schmertmann-das-strip",
        why: "gives C1 = 0.930, C2 = 1.4 and 2.54 in at ten years, once the peak is brought down to the example's 0.5",
        inputs: {
          breadth_m: 96 * INCH_m,
          length_m: 960 * INCH_m,
          netPressure_kPa: 25 * PSI_kPa - 3.06 * PSI_kPa,
          overburden_kPa: 3.06 * PSI_kPa,
          // So large a stress leaves the peak at 0.5, as the example has it.
          overburdenAtPeak_kPa: 1e15,
          layers: (
            [
              [48, 750],
              [48, 1250],
              [96, 1250],
              [48, 1000],
              [144, 2000],
            ] as const
          ).map(([inches, psi]) => ({ thickness_m: inches * INCH_m, modulus_kPa: psi * PSI_kPa })),
          years: 10,
        },
        expected: { c1: 0.9303, c2: 1.4, settlement_mm: 2.54 * 25.4, peakInfluence: 0.5 },
        // The example takes the diagram at the middle of each layer and rounds it to three figures.
        tolerance: {
          c1: { abs: 1e-4 },
          c2: { abs: 1e-9 },
          settlement_mm: { abs: 0.02 * 25.4 },
          peakInfluence: { abs: 1e-6 },
        },
      },
    ],
  ),
  ...casesOf(
    {
      method: "settlement-schmertmann",
      citation: "UFC 3-220-10 (2022), Eq. 5-8; numbers ours",
      status: "computed independently",
      tolerance: { abs: 1e-9 },
    },
    [
      {
        id: "schmertmann-floor",
        why: "never takes more than half off for embedment",
        inputs: {
          breadth_m: 2,
          length_m: 2,
          netPressure_kPa: 40,
          overburden_kPa: 60,
          overburdenAtPeak_kPa: 80,
          layers: [{ thickness_m: 4, modulus_kPa: 10000 }],
          years: 1,
        },
        expected: { c1: 0.5, c2: 1.2 },
      },
    ],
  ),
];

export const burlandCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "settlement-burland-burbidge",
      citation: `${DAS_PFE}, Ex. 5.7 p. 244, whose rounded constants come out 2.5 % lower (edition not stated in the copy read)`,
      status: "read in a secondary copy",
      tolerance: { rel: 0.03 },
    },
    [
      {
        id: "burland-das",
        why: "settles a pad of 1.75 m under 120 kPa on N60 = 10 by about 11.8 mm",
        inputs: { breadth_m: 1.75, length_m: 1.75, pressure_kPa: 120, averageN60: 10, loading: "static" },
        expected: { settlement_mm: 11.79 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "settlement-burland-burbidge",
      citation:
        "J. B. Burland and M. C. Burbidge, Proc. ICE 78(1) 1985; time factors R3 = 0.3, Rt = 0.2 and 0.7, 0.8",
      status: "from memory",
      tolerance: { abs: 2e-4 },
    },
    [
      {
        id: "burland-factors",
        why: "shapes a base ten times as long as broad by 1.487 and a static load of thirty years by 1.5",
        inputs: {
          breadth_m: 1,
          length_m: 10,
          pressure_kPa: 100,
          averageN60: 20,
          years: 30,
          loading: "static",
        },
        expected: { shapeFactor: 1.4872, timeFactor: 1.5 },
      },
      {
        id: "burland-fluctuating",
        why: "multiplies by 2.5 after thirty years of fluctuating load",
        inputs: {
          breadth_m: 1,
          length_m: 10,
          pressure_kPa: 100,
          averageN60: 20,
          years: 30,
          loading: "fluctuating",
        },
        expected: { timeFactor: 2.5 },
      },
      {
        id: "burland-strip",
        why: "comes to 1.5625 for a strip",
        inputs: { breadth_m: 1, length_m: 1e6, pressure_kPa: 100, averageN60: 20, loading: "static" },
        expected: { shapeFactor: 1.5625 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "settlement-burland-burbidge",
      citation:
        "UFC 3-220-10 (2022), section 5-4.1: (q − 2/3 σ) beyond the previous pressure, a third of q within it; numbers ours",
      status: "computed independently",
      tolerance: { abs: 1e-9 },
    },
    [
      {
        id: "burland-within",
        why: "counts a third of a pressure that the ground has borne before",
        inputs: {
          breadth_m: 2,
          length_m: 2,
          pressure_kPa: 90,
          previousPressure_kPa: 120,
          averageN60: 20,
          loading: "static",
        },
        expected: { counted_kPa: 30 },
      },
      {
        id: "burland-beyond",
        why: "takes two thirds of the previous pressure off a larger one",
        inputs: {
          breadth_m: 2,
          length_m: 2,
          pressure_kPa: 150,
          previousPressure_kPa: 120,
          averageN60: 20,
          loading: "static",
        },
        expected: { counted_kPa: 70 },
      },
    ],
  ),
];
