import { casesOf, type ReferenceCase } from "../reference-case";
import { FOOT_m, KIP_FOOT_kNm, KIP_kN, KSF_kPa } from "../source-units";

const DAS = "B. M. Das, Principles of Foundation Engineering";
const GEC6 = "FHWA-SA-02-054, Geotechnical Engineering Circular No. 6 (Kimmerling 2002)";

export const effectiveAreaCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "effective-area",
      citation: "EN 1997-1:2004 Annex D notation; numbers ours",
      status: "computed independently",
    },
    [
      {
        id: "area-two-axes",
        why: "takes twice the eccentricity off each side, which may leave the breadth the longer",
        inputs: { breadth_m: 2, length_m: 2.4, eccentricityB_m: 0.1, eccentricityL_m: 0.5 },
        expected: { effectiveBreadth_m: 1.8, effectiveLength_m: 1.4, effectiveArea_m2: 2.52 },
        tolerance: { abs: 1e-9 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "effective-area",
      citation:
        "Geometry of the rectangle cut by a line, after Highter and Anders 1985; Meyerhof's area beside it",
      status: "computed independently",
      tolerance: { rel: 1e-7 },
    },
    [
      {
        id: "area-tenth-tenth",
        why: "keeps 0.64 of the base at a tenth of both sides, less than the 0.712 of exact geometry",
        inputs: { breadth_m: 2, length_m: 3, eccentricityB_m: 0.2, eccentricityL_m: -0.3 },
        expected: { effectiveArea_m2: 0.64 * 6 },
      },
      {
        id: "area-sixth-sixth",
        why: "keeps 4/9 of the base at a sixth of both sides",
        inputs: { breadth_m: 3, length_m: 3, eccentricityB_m: 0.5, eccentricityL_m: 0.5 },
        expected: { effectiveArea_m2: 4 },
      },
      {
        id: "area-quarter-tenth",
        why: "keeps 0.4 of the base at a quarter and a tenth",
        inputs: { breadth_m: 2, length_m: 3, eccentricityB_m: 0.5, eccentricityL_m: 0.3 },
        expected: { effectiveArea_m2: 0.4 * 6 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "effective-area",
      citation: `B. M. Das, Principles of Geotechnical Engineering, 7th ed., Ex. 16.4 p. 601`,
      status: "read in a secondary copy",
      tolerance: { abs: 1e-9 },
    },
    [
      {
        id: "area-das",
        why: "narrows a base of 1 m with e = 0.1 m to 0.8 m",
        inputs: { breadth_m: 1, length_m: 1.5, eccentricityB_m: 0.1, eccentricityL_m: 0 },
        expected: { effectiveBreadth_m: 0.8, effectiveLength_m: 1.5 },
      },
    ],
  ),
];

export const slidingCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "sliding",
      citation: `${DAS}, Ex. 8.3 p. 370 (edition not stated in the copy read)`,
      status: "read in a secondary copy",
      tolerance: { abs: 0.005 },
    },
    [
      {
        id: "sliding-das-8-3",
        why: "holds a wall base of 10.3 ft with two thirds of friction and cohesion 1.94 times over",
        inputs: {
          vertical_kN: 21.531 * KIP_kN,
          horizontalB_kN: 6.17604 * KIP_kN,
          horizontalL_kN: 0,
          interfaceAngle_deg: (2 / 3) * 20,
          adhesion_kPa: (2 / 3) * KSF_kPa,
          contactArea_m2: 10.3 * FOOT_m * FOOT_m,
        },
        expected: { factorOfSafety: 1.94 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "sliding",
      citation: `${DAS}, Ex. 8.1 p. 366 (inputs and formula read, result computed)`,
      status: "computed independently",
      tolerance: { abs: 0.001 },
    },
    [
      {
        id: "sliding-das-8-1",
        why: "holds a wall base of 12.5 ft 1.59 times over",
        inputs: {
          vertical_kN: 24.986 * KIP_kN,
          horizontalB_kN: 8.0554 * KIP_kN,
          horizontalL_kN: 0,
          interfaceAngle_deg: 12,
          adhesion_kPa: 0.6 * KSF_kPa,
          contactArea_m2: 12.5 * FOOT_m * FOOT_m,
        },
        expected: { factorOfSafety: 1.5904 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "sliding",
      citation: `${GEC6}, Eq. 5-38 and 5-39; numbers ours`,
      status: "computed independently",
      tolerance: { abs: 1e-6 },
    },
    [
      {
        id: "sliding-gec6-friction",
        why: "resists with 600 kN times 0.45, passive resistance ignored",
        inputs: {
          vertical_kN: 600,
          horizontalB_kN: 150,
          horizontalL_kN: 0,
          interfaceAngle_deg: (Math.atan(0.45) * 180) / Math.PI,
        },
        expected: { resistance_kN: 270, factorOfSafety: 1.8 },
      },
      {
        id: "sliding-gec6-adhesion",
        why: "resists with adhesion on the area in contact alone",
        inputs: {
          vertical_kN: 200,
          horizontalB_kN: 0,
          horizontalL_kN: -50,
          adhesion_kPa: 40,
          contactArea_m2: 2,
        },
        expected: { resistance_kN: 80, applied_kN: 50, factorOfSafety: 1.6 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "sliding",
      citation: "EN 1997-1:2004, 6.5.3, partial factor on tan φ; numbers ours",
      status: "computed independently",
      tolerance: { abs: 0.01 },
    },
    [
      {
        id: "sliding-en-cast",
        why: "takes the whole design angle under concrete cast in place",
        inputs: {
          vertical_kN: 800,
          horizontalB_kN: 0,
          horizontalL_kN: 0,
          interfaceAngle_deg: (Math.atan(Math.tan(Math.PI / 6) / 1.25) * 180) / Math.PI,
        },
        expected: { resistance_kN: 369.504, factorOfSafety: null },
      },
      {
        id: "sliding-en-precast",
        why: "takes two thirds of the design angle, not of its tangent, under smooth precast concrete",
        inputs: {
          vertical_kN: 800,
          horizontalB_kN: 0,
          horizontalL_kN: 0,
          interfaceAngle_deg: (2 / 3) * ((Math.atan(Math.tan(Math.PI / 6) / 1.25) * 180) / Math.PI),
        },
        expected: { resistance_kN: 237.389 },
      },
    ],
  ),
];

export const overturningCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "overturning",
      citation: `${DAS}, Ex. 8.1 p. 366 and Ex. 8.4 p. 372 (edition not stated in the copy read)`,
      status: "read in a secondary copy",
      tolerance: { abs: 0.006 },
    },
    [
      {
        id: "overturning-das-8-1",
        why: "holds 58.557 kip ft with 203.162 kip ft 3.47 times over",
        inputs: {
          breadth_m: 2,
          length_m: 1,
          vertical_kN: 203.162 * KIP_FOOT_kNm,
          momentB_kNm: 58.557 * KIP_FOOT_kNm,
          momentL_kNm: 0,
        },
        expected: { factorOfSafety: 3.47 },
      },
      {
        id: "overturning-das-8-4",
        why: "holds 289.226 with 731.521 kNm 2.53 times over",
        inputs: { breadth_m: 1, length_m: 2, vertical_kN: 731.521, momentB_kNm: 0, momentL_kNm: -289.226 },
        expected: { factorOfSafety: 2.53, factorOfSafetyB: null },
      },
    ],
  ),
  ...casesOf(
    {
      method: "overturning",
      citation: "Statics: with all vertical load holding, F = (B/2) / e",
      status: "computed independently",
      tolerance: { abs: 1e-9 },
    },
    [
      {
        id: "overturning-third",
        why: "is 1.5 with the resultant at B/3",
        inputs: { breadth_m: 2.4, length_m: 2, vertical_kN: 500, momentB_kNm: 400, momentL_kNm: 0 },
        expected: { factorOfSafety: 1.5 },
      },
      {
        id: "overturning-sixth",
        why: "is 3 at the edge of the middle third, and the smaller of two edges governs",
        inputs: { breadth_m: 2.4, length_m: 3, vertical_kN: 500, momentB_kNm: 200, momentL_kNm: -500 },
        expected: { factorOfSafetyB: 3, factorOfSafetyL: 1.5, factorOfSafety: 1.5 },
      },
      {
        id: "overturning-none",
        why: "has no factor where no moment acts",
        inputs: { breadth_m: 2, length_m: 3, vertical_kN: 500, momentB_kNm: 0, momentL_kNm: 0 },
        expected: { factorOfSafety: null },
      },
    ],
  ),
];

export const upliftCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "uplift",
      citation:
        "EN 1997-1:2004, Annex A, Table A.15: 1.0 on permanent destabilising, 0.9 on stabilising; numbers ours",
      status: "computed independently",
      tolerance: { abs: 1e-9 },
    },
    [
      {
        id: "uplift-upl-limit",
        why: "stands at 1.111 where 0.9 of the weight just balances the water",
        inputs: { stabilising_kN: 1000, uplift_kN: 900 },
        expected: { factorOfSafety: 1000 / 900 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "uplift",
      citation: "Archimedes: 9.81 kN/m³ of water; numbers ours",
      status: "computed independently",
      tolerance: { abs: 1e-9 },
    },
    [
      {
        id: "uplift-pad",
        why: "floats a pad of 2 m by 2 m by 0.5 m of 24 kN/m³ under 1.5 m of water without anything on it",
        inputs: { stabilising_kN: 48, uplift_kN: 9.81 * 1.5 * 4 },
        expected: { factorOfSafety: 48 / 58.86 },
      },
      {
        id: "uplift-none",
        why: "has no factor where nothing lifts",
        inputs: { stabilising_kN: 48, uplift_kN: 0 },
        expected: { factorOfSafety: null },
      },
    ],
  ),
  ...casesOf(
    {
      method: "uplift",
      citation: "Global factors against flotation of 1.1 to 1.2",
      status: "common practice",
      tolerance: { abs: 1e-9 },
    },
    [
      {
        id: "uplift-practice",
        why: "is 1.1 at the limit that is commonly asked for",
        inputs: { stabilising_kN: 110, uplift_kN: 100 },
        expected: { factorOfSafety: 1.1 },
      },
    ],
  ),
];
