import { casesOf, type ReferenceCase } from "../reference-case";
import { FOOT_m, KIP_kN, KSF_kPa } from "../source-units";

const SOLVERS =
  "Equilibrium of a rigid base that carries no tension: exact polygon integrals with Newton's method in 40-digit arithmetic, against a search over the angle and offset of the neutral axis with strip integration; both agree to 2e-15";

const method = "base-pressure";

/** Rows: eB/B, eL/L, q_max A/N, contact ratio, then the corners −B+L, +B−L, −B−L over the mean pressure. */
const twoAxes: [number, number, number, number, number, number, number][] = [
  [0, 0, 1, 1, 1, 1, 1],
  [0.05, 0, 1.3, 1, 0.7, 1.3, 0.7],
  [0.1, 0.05, 1.9, 1, 0.7, 1.3, 0.1],
  [0.125, 1 / 24, 2, 1, 0.5, 1.5, 0],
  [0.05, 0.15, 2.20595458, 0.98014622, 1.5990921, 0.3981453, 0],
  [0.1, 0.1, 2.20453364, 0.98532174, 0.9989894, 0.9989894, 0],
  [0.15, 0.1, 2.55310317, 0.92865195, 0.683103, 1.2892745, 0],
  [0.15, 0.15, 2.97109506, 0.85950362, 0.9498216, 0.9498216, 0],
  [0.2, 0, 2.22222222, 0.9, 0, 2.2222222, 0],
  [0.2, 0.05, 2.57713069, 0.88583009, 0.0521363, 1.9003175, 0],
  [0.2, 0.1, 2.99334407, 0.83737894, 0.3060993, 1.5731132, 0],
  [0.2, 0.15, 3.4995123, 0.77059245, 0.529339, 1.1999216, 0],
  [0.2, 0.2, 4.13728611, 0.68846127, 0.71987, 0.71987, 0],
  [0.25, 0.05, 3.09256006, 0.73883311, 0, 2.2804687, 0],
  [0.25, 0.1, 3.59364435, 0.70626999, 0, 1.8945774, 0],
  [0.25, 0.2, 4.98103727, 0.58644618, 0, 0.8885901, 0],
  [0.25, 0.25, 6, 0.5, 0, 0, 0],
  [0.3, 0.05, 3.86570008, 0.59106649, 0, 2.8505859, 0],
  [0.3, 0.1, 4.49205543, 0.56501599, 0, 2.3682217, 0],
  [0.3, 0.15, 5.25906673, 0.52374319, 0, 1.8222679, 0],
  [0.3, 0.2, 6.22629658, 0.46915694, 0, 1.1107376, 0],
  [0.3, 0.25, 7.5, 0.4, 0, 0, 0],
  [0.3, 0.3, 9.375, 0.32, 0, 0, 0],
  [0.35, 0.1, 5.98940725, 0.42376199, 0, 3.157629, 0],
  [0.35, 0.2, 8.30172878, 0.35186771, 0, 1.4809835, 0],
  [0.35, 0.35, 16.66666667, 0.18, 0, 0, 0],
  [0.4, 0.05, 7.73140015, 0.29553325, 0, 5.7011717, 0],
  [0.4, 0.2, 12.45259316, 0.23457847, 0, 2.2214752, 0],
  [0.4, 0.3, 18.75, 0.16, 0, 0, 0],
  [0.4, 0.4, 37.5, 0.08, 0, 0, 0],
  [0.1, 0.3, 4.49205543, 0.56501599, 2.3682217, 0, 0],
  [0.05, 0.4, 7.73140015, 0.29553325, 5.7011717, 0, 0],
];

/** A base of 2 m by 3 m under 600 kN: the mean pressure is 100 kPa. */
const onStandardBase = (alongB: number, alongL: number) => ({
  breadth_m: 2,
  length_m: 3,
  vertical_kN: 600,
  momentB_kNm: 600 * alongB * 2,
  momentL_kNm: 600 * alongL * 3,
});

export const basePressureCases: ReferenceCase[] = [
  ...casesOf({ method, citation: SOLVERS, status: "computed independently" }, [
    ...twoAxes.map(([alongB, alongL, peak, contact, acrossB, acrossL, far]) => ({
      id: `base-two-axes-${alongB.toFixed(3)}-${alongL.toFixed(3)}`,
      why: `carries a resultant at ${alongB.toFixed(3)} B and ${alongL.toFixed(3)} L with a peak of ${peak.toFixed(3)} times the mean`,
      inputs: onStandardBase(alongB, alongL),
      expected: {
        maxPressure_kPa: 100 * peak,
        contactRatio: contact,
        "cornerPressures_kPa.0": 100 * peak,
        "cornerPressures_kPa.1": 100 * acrossB,
        "cornerPressures_kPa.2": 100 * far,
        "cornerPressures_kPa.3": 100 * acrossL,
      },
      // Printed with eight figures; corners with seven decimals of the mean.
      tolerance: {
        maxPressure_kPa: { rel: 5e-9 },
        contactRatio: { abs: 6e-9 },
        "cornerPressures_kPa.0": { rel: 5e-9 },
        "cornerPressures_kPa.1": { abs: 6e-6 },
        "cornerPressures_kPa.2": { abs: 6e-6 },
        "cornerPressures_kPa.3": { abs: 6e-6 },
      },
    })),
    {
      id: "base-just-outside-diamond",
      why: "goes on without a jump just outside the middle third on both axes",
      inputs: onStandardBase(1 / 12 + 1e-6, 1 / 12),
      expected: { maxPressure_kPa: 200.0006, contactRatio: 0.999999999982, distribution: "partial" },
      tolerance: { rel: 1e-6 },
    },
    {
      id: "base-near-edge",
      why: "reports the absurd pressure of a resultant at 0.499 B and clips nothing",
      inputs: onStandardBase(0.499, 0),
      expected: { maxPressure_kPa: 66666.6666667, contactRatio: 0.003, distribution: "triangular" },
      tolerance: { rel: 1e-9 },
    },
    {
      id: "base-near-corner",
      why: "carries a resultant at 0.49 of both sides on a triangle of 0.08 % of the base",
      inputs: onStandardBase(0.49, 0.49),
      expected: { maxPressure_kPa: 375000, contactRatio: 0.0008, distribution: "partial" },
      tolerance: { rel: 1e-9 },
    },
    {
      id: "base-half-contact-ellipse",
      why: "has 53.6 % in contact where the second-core ellipse promises half",
      inputs: onStandardBase(0.2886751345948129, 1 / 6),
      expected: { contactRatio: 0.53567618, maxPressure_kPa: 525.783423 },
      tolerance: { rel: 1e-7 },
    },
  ]),
  ...casesOf(
    {
      method,
      citation:
        "FHWA-SA-02-054, Geotechnical Engineering Circular No. 6 (Kimmerling 2002), Eq. 6-9 to 6-13; numbers ours",
      status: "computed independently",
    },
    [
      {
        id: "base-trapezoid-one-axis",
        why: "spreads 600 kN at e = L/10 as a trapezoid of 160 and 40 kPa",
        inputs: { breadth_m: 2, length_m: 3, vertical_kN: 600, momentL_kNm: 180 },
        expected: {
          maxPressure_kPa: 160,
          minPressure_kPa: 40,
          distribution: "trapezoidal",
          withinMiddleThird: true,
        },
        tolerance: { rel: 1e-12 },
      },
      {
        id: "base-triangle-one-axis",
        why: "spreads 600 kN at e = L/4 over three quarters of the length with 266.7 kPa at the edge",
        inputs: { breadth_m: 2, length_m: 3, vertical_kN: 600, momentL_kNm: 450 },
        expected: {
          maxPressure_kPa: 800 / 3,
          minPressure_kPa: 0,
          contactRatio: 0.75,
          distribution: "triangular",
        },
        tolerance: { rel: 1e-12 },
      },
      {
        id: "base-edge-of-middle-third",
        why: "doubles the mean pressure at the edge of the middle third, e = B/6",
        inputs: { breadth_m: 2, length_m: 3, vertical_kN: 600, momentB_kNm: 200 },
        expected: {
          maxPressure_kPa: 200,
          minPressure_kPa: 0,
          contactRatio: 1,
          distribution: "triangular",
          withinMiddleThird: true,
        },
        tolerance: { abs: 1e-9 },
      },
      {
        id: "base-third-of-side",
        why: "has half the base in contact and four times the mean pressure at e = B/3",
        inputs: { breadth_m: 2, length_m: 3, vertical_kN: 600, momentB_kNm: 400 },
        expected: { maxPressure_kPa: 400, contactRatio: 0.5 },
        tolerance: { rel: 1e-12 },
      },
    ],
  ),
  ...casesOf(
    {
      method,
      citation:
        "B. M. Das, Principles of Foundation Engineering, Ex. 6.5 p. 296 (edition not stated in the copy read)",
      status: "read in a secondary copy",
      // Its coefficients are rounded to four decimals of kip/ft².
      tolerance: { abs: 0.003 * KSF_kPa },
    },
    [
      {
        id: "base-das-mat",
        why: "gives a mat of 76 by 96 ft the four corner pressures of the printed plane q = 1.2 + 0.0017 x − 0.0011 y",
        inputs: {
          breadth_m: 76 * FOOT_m,
          length_m: 96 * FOOT_m,
          vertical_kN: 1.2 * 76 * 96 * KIP_kN,
          momentB_kNm: ((0.0017 * 96 * 76 ** 3) / 12) * KIP_kN * FOOT_m,
          momentL_kNm: ((-0.0011 * 76 * 96 ** 3) / 12) * KIP_kN * FOOT_m,
        },
        expected: {
          "cornerPressures_kPa.0": 1.212 * KSF_kPa,
          "cornerPressures_kPa.1": 1.083 * KSF_kPa,
          "cornerPressures_kPa.2": 1.188 * KSF_kPa,
          distribution: "trapezoidal",
        },
      },
    ],
  ),
  ...casesOf(
    {
      method,
      citation:
        "B. M. Das, Principles of Foundation Engineering, Ex. 8.1 and 8.2 pp. 366 to 369 (edition not stated in the copy read)",
      status: "read in a secondary copy",
      tolerance: { abs: 0.005 * KSF_kPa },
    },
    [
      {
        id: "base-das-toe",
        why: "presses the toe of a wall base of 12.5 ft with 2.44 kip/ft²",
        inputs: {
          breadth_m: 12.5 * FOOT_m,
          length_m: FOOT_m,
          vertical_kN: 24.986 * KIP_kN,
          momentB_kNm: (24.986 * 6.25 - (203.162 - 58.557)) * KIP_kN * FOOT_m,
        },
        expected: { maxPressure_kPa: 2.44 * KSF_kPa, eccentricityB_m: 0.4626 * FOOT_m },
        tolerance: { maxPressure_kPa: { abs: 0.005 * KSF_kPa }, eccentricityB_m: { abs: 0.0005 * FOOT_m } },
      },
    ],
  ),
  ...casesOf({ method, citation: "Statics", status: "computed independently", tolerance: { abs: 0 } }, [
    {
      id: "base-outside",
      why: "finds no equilibrium outside the base, where 2N/(3L(B/2 − e)) would turn negative",
      inputs: onStandardBase(0.55, 0),
      expected: { equilibrium: false, distribution: "none", maxPressure_kPa: null, contactRatio: 0 },
    },
    {
      id: "base-on-edge",
      why: "finds no equilibrium with the resultant exactly on the edge",
      inputs: { breadth_m: 2, length_m: 3, vertical_kN: 600, momentL_kNm: -900 },
      expected: { equilibrium: false, distribution: "none" },
    },
    {
      id: "base-no-load",
      why: "gives no figure of NaN where nothing acts",
      inputs: { breadth_m: 2, length_m: 3, vertical_kN: 0 },
      expected: { equilibrium: false, distribution: "none", eccentricityB_m: null, contactRatio: 0 },
    },
    {
      id: "base-net-uplift",
      why: "finds no equilibrium under net uplift, however small the eccentricity looks",
      inputs: { breadth_m: 2, length_m: 3, vertical_kN: -600, momentL_kNm: 30 },
      expected: { equilibrium: false, distribution: "none" },
    },
  ]),
];
