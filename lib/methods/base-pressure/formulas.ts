import { formula } from "../formula";

/** Eccentricity of the resultant along one axis; holds for a compressive vertical load. */
export const eccentricity = formula({
  symbol: "e",
  unit: "m",
  ref: "statics",
  shown: "M / N",
  symbols: { M: "moment_kNm", N: "vertical_kN" },
  of: (q: { moment_kNm: number; vertical_kN: number }) => q.moment_kNm / q.vertical_kN,
});

/** Whole base in contact: the resultant lies in the middle third, 6|eB|/B + 6|eL|/L ≤ 1. */
export const peakPressureFull = formula({
  symbol: "q_max",
  unit: "kPa",
  ref: "statics",
  shown: "N / (B L) · (1 + 6 |e_B| / B + 6 |e_L| / L)",
  symbols: {
    N: "vertical_kN",
    B: "breadth_m",
    L: "length_m",
    "|e_B|": "eccentricityB_m",
    "|e_L|": "eccentricityL_m",
  },
  of: (q: {
    vertical_kN: number;
    breadth_m: number;
    length_m: number;
    eccentricityB_m: number;
    eccentricityL_m: number;
  }) =>
    (q.vertical_kN / (q.breadth_m * q.length_m)) *
    (1 + (6 * q.eccentricityB_m) / q.breadth_m + (6 * q.eccentricityL_m) / q.length_m),
});

/** Triangular contact on one axis: the far edge has lifted, side/6 < e < side/2; `width` is the other side. */
export const peakPressurePartial = formula({
  symbol: "q_max",
  unit: "kPa",
  ref: "statics",
  shown: "2 N / (3 w (s / 2 − |e|))",
  symbols: { N: "vertical_kN", w: "width_m", s: "side_m", "|e|": "eccentricity_m" },
  of: (q: { vertical_kN: number; width_m: number; side_m: number; eccentricity_m: number }) =>
    (2 * q.vertical_kN) / (3 * q.width_m * (q.side_m / 2 - q.eccentricity_m)),
});

/** Partial contact on two axes: K is the peak over the mean pressure, from equilibrium of the clipped block. */
export const peakPressureTwoAxes = formula({
  symbol: "q_max",
  unit: "kPa",
  ref: "statics",
  shown: "K N / (B L)",
  symbols: { K: "peakFactor", N: "vertical_kN", B: "breadth_m", L: "length_m" },
  of: (q: { peakFactor: number; vertical_kN: number; breadth_m: number; length_m: number }) =>
    (q.peakFactor * q.vertical_kN) / (q.breadth_m * q.length_m),
});

/** Position in the middle third: 1 on its edge, more outside it. */
export const kernSum = formula({
  symbol: "k",
  unit: "",
  ref: "statics",
  shown: "6 |e_B| / B + 6 |e_L| / L",
  symbols: { B: "breadth_m", L: "length_m", "|e_B|": "eccentricityB_m", "|e_L|": "eccentricityL_m" },
  of: (q: { breadth_m: number; length_m: number; eccentricityB_m: number; eccentricityL_m: number }) =>
    (6 * q.eccentricityB_m) / q.breadth_m + (6 * q.eccentricityL_m) / q.length_m,
});
