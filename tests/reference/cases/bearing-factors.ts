import { casesOf, type ReferenceCase } from "../reference-case";

const GEC6_TABLE =
  "FHWA-SA-02-054, Geotechnical Engineering Circular No. 6 (Kimmerling 2002), Table 5-1 (AASHTO 1996)";

const SPANISH_TABLE =
  "Ministerio de Fomento, Guía de cimentaciones en obras de carretera, 2002, table p. 101, the same expression";

export const bearingFactorCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "bearing-factors",
      citation: GEC6_TABLE,
      status: "read in a secondary copy",
      tolerance: { abs: 0.051 },
    },
    (
      [
        [0, 5.14, 1, 0],
        [20, 14.8, 6.4, 5.4],
        [30, 30.1, 18.4, 22.4],
        [32, 35.5, 23.2, 30.2],
        [38, 61.4, 48.9, 78.0],
        [40, 75.3, 64.2, 109.4],
        [45, 133.9, 134.9, 271.8],
      ] as const
    ).map(([angle, nc, nq, nGamma]) => ({
      id: `factors-vesic-${angle}`,
      why: `gives Vesić's factors at ${angle}° as the highway table prints them`,
      inputs: { theory: "vesic", frictionAngle_deg: angle },
      expected: { nc, nq, nGamma },
      tolerance: { abs: angle === 45 ? 0.06 : 0.051 },
    })),
  ),
  ...casesOf(
    {
      method: "bearing-factors",
      citation: SPANISH_TABLE,
      status: "read in a secondary copy",
      tolerance: { abs: 0.051 },
    },
    (
      [
        [25, 20.7, 10.7, 9.0],
        [33, 38.6, 26.1, 32.6],
      ] as const
    ).map(([angle, nc, nq, nGamma]) => ({
      id: `factors-en1997-${angle}`,
      why: `gives the EN 1997-1 factors at ${angle}° of a rough base`,
      inputs: { theory: "en1997", frictionAngle_deg: angle },
      expected: { nc, nq, nGamma },
    })),
  ),
  ...casesOf(
    {
      method: "bearing-factors",
      citation: "B. M. Das, Principles of Geotechnical Engineering, 7th ed., Ex. 16.3 p. 595",
      status: "read in a secondary copy",
      tolerance: { abs: 0.006 },
    },
    [
      {
        id: "factors-meyerhof-32",
        why: "gives Meyerhof's factors at 32°",
        inputs: { theory: "meyerhof", frictionAngle_deg: 32 },
        expected: { nq: 23.18, nGamma: 22.02 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "bearing-factors",
      citation: "K. Terzaghi 1943 with Nγ of Kumbhojkar 1993, as printed in B. M. Das",
      status: "read in a secondary copy",
      tolerance: { abs: 0.006 },
    },
    [
      {
        id: "factors-terzaghi-30",
        why: "gives Terzaghi's factors at 30°, Nγ from the numerical table",
        inputs: { theory: "terzaghi", frictionAngle_deg: 30 },
        expected: { nc: 37.16, nq: 22.46, nGamma: 19.13 },
      },
      {
        id: "factors-terzaghi-20",
        why: "gives Terzaghi's factors at 20° as the worked example uses them",
        inputs: { theory: "terzaghi", frictionAngle_deg: 20 },
        expected: { nc: 17.69, nq: 7.44, nGamma: 3.64 },
      },
      {
        id: "factors-terzaghi-0",
        why: "comes to 5.7 without friction, where tables round 3π/2 + 1",
        inputs: { theory: "terzaghi", frictionAngle_deg: 0 },
        expected: { nc: 5.71, nq: 1, nGamma: 0 },
        tolerance: { abs: 0.02 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "bearing-factors",
      citation: "K. Terzaghi 1943, local shear by two thirds of tan φ; computed from the closed forms",
      status: "computed independently",
      tolerance: { abs: 0.006 },
    },
    [
      {
        id: "factors-terzaghi-local",
        why: "gives the factors of local shear for 20°, read at 13.64°",
        inputs: {
          theory: "terzaghi",
          frictionAngle_deg: (Math.atan((2 / 3) * Math.tan(Math.PI / 9)) * 180) / Math.PI,
        },
        expected: { nc: 11.85, nq: 3.875 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "bearing-factors",
      citation: "J. Brinch Hansen 1970, 1.5 (Nq − 1) tan φ; computed from the closed form",
      status: "computed independently",
      tolerance: { abs: 0.06 },
    },
    [
      {
        id: "factors-hansen-35",
        why: "gives Hansen's Nγ of 33.9 at 35°, the lowest of the five authors",
        inputs: { theory: "hansen", frictionAngle_deg: 35 },
        expected: { nGamma: 33.9 },
      },
    ],
  ),
];
