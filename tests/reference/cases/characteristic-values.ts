import { casesOf, type ReferenceCase } from "../reference-case";

/** n values of mean zero about 100, with a standard deviation of 10: half of them up, half of them down. */
function scattered(n: number): number[] {
  const deviation = 10 * Math.sqrt((n - 1) / (n - (n % 2)));
  return Array.from({ length: n }, (_, at) =>
    n % 2 === 1 && at === n - 1 ? 100 : 100 + (at % 2 === 0 ? deviation : -deviation),
  );
}

export const characteristicCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "characteristic-value",
      citation: "EN 1990:2002, Annex D, Table D.1, coefficient of variation unknown",
      status: "from memory",
      tolerance: { abs: 0.012 },
    },
    (
      [
        [3, 3.37],
        [4, 2.63],
        [5, 2.33],
        [6, 2.18],
        [8, 2.0],
        [10, 1.92],
        [30, 1.73],
      ] as const
    ).map(([n, k]) => ({
      id: `fractile-${n}`,
      why: `takes ${k} standard deviations off for the 5 % fractile of ${n} values`,
      inputs: { values: scattered(n), rule: "student-5-fractile" },
      expected: { k, mean: 100, standardDeviation: 10, characteristic: 100 - 10 * k },
      tolerance: {
        k: { abs: 0.012 },
        mean: { abs: 1e-9 },
        standardDeviation: { abs: 1e-9 },
        characteristic: { abs: 0.12 },
      },
    })),
  ),
  ...casesOf(
    {
      method: "characteristic-value",
      citation: "EN 1990:2002, Annex D, Table D.1, coefficient of variation known",
      status: "from memory",
      tolerance: { abs: 0.012 },
    },
    (
      [
        [3, 1.89],
        [5, 1.8],
        [10, 1.72],
      ] as const
    ).map(([n, k]) => ({
      id: `fractile-known-${n}`,
      why: `takes ${k} known deviations off for the 5 % fractile of ${n} values`,
      inputs: { values: scattered(n), rule: "known-cov", cov: 0.1, estimate: "fractile" },
      expected: { k, cov: 0.1 },
    })),
  ),
  ...casesOf(
    {
      method: "characteristic-value",
      citation: "Student's t at 95 % over √n; 1.645 over √n with a known coefficient of variation",
      status: "computed independently",
      tolerance: { abs: 0.001 },
    },
    (
      [
        [3, 1.686, 0.95],
        [4, 1.177, 0.822],
        [5, 0.953, 0.736],
        [6, 0.823, 0.672],
        [10, 0.58, 0.52],
        [20, 0.387, 0.368],
        [30, 0.31, 0.3],
      ] as const
    ).flatMap(([n, unknown, known]) => [
      {
        id: `mean-${n}`,
        why: `takes ${unknown} standard deviations off for a 95 % cautious mean of ${n} values`,
        inputs: { values: scattered(n), rule: "student-95-mean" },
        expected: { k: unknown },
      },
      {
        id: `mean-known-${n}`,
        why: `takes ${known} known deviations off for the same`,
        inputs: { values: scattered(n), rule: "known-cov", cov: 0.15 },
        expected: { k: known },
      },
    ]),
  ),
  ...casesOf(
    {
      method: "characteristic-value",
      citation: "H. R. Schneider, Proc. 14th ICSMFE 1997; coefficient of variation 0.1 for φ",
      status: "from memory",
      tolerance: { abs: 1e-9 },
    },
    [
      {
        id: "schneider-phi",
        why: "takes half a standard deviation off 34°",
        inputs: { values: [33, 34, 35], rule: "schneider", cov: 0.1 },
        expected: { characteristic: 32.3 },
      },
      {
        id: "schneider-cohesion",
        why: "takes a fifth off a cohesion that varies by 0.4",
        inputs: { values: [8, 10, 12], rule: "schneider", cov: 0.4 },
        expected: { characteristic: 8 },
      },
    ],
  ),
];
