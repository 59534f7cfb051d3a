import { z } from "zod";
import { choice, defineMethod, type MethodFinding, output, quantity } from "../define-method";
import { formula, line } from "../formula";

export const compressibility = formula({
  symbol: "I_c",
  unit: "",
  ref: "burlandBurbidge1985",
  shown: "1.71 / N^1.4",
  symbols: { N: "averageN60" },
  of: (q: { averageN60: number }) => 1.71 / q.averageN60 ** 1.4,
});

/** L is the longer side: one for a square, 1.56 for a strip. */
export const shapeFactor = formula({
  symbol: "f_s",
  unit: "",
  ref: "burlandBurbidge1985",
  shown: "(1.25 r / (r + 0.25))²",
  symbols: { r: "ratio" },
  of: (q: { ratio: number }) => ((1.25 * q.ratio) / (q.ratio + 0.25)) ** 2,
});

/** Depth of influence (m) for a breadth in metres. */
export const influenceDepth = formula({
  symbol: "z_I",
  unit: "m",
  ref: "burlandBurbidge1985",
  shown: "B^0.75",
  symbols: { B: "smallerSide_m" },
  of: (q: { smallerSide_m: number }) => q.smallerSide_m ** 0.75,
});

/** A compressible layer thinner than the depth of influence. */
export const thicknessFactor = formula({
  symbol: "f_l",
  unit: "",
  ref: "burlandBurbidge1985",
  shown: "(H / z_I) (2 − H / z_I)",
  symbols: { H: "layerThickness_m", z_I: "influenceDepth_m" },
  of: (q: { layerThickness_m: number; influenceDepth_m: number }) => {
    const share = Math.min(1, q.layerThickness_m / q.influenceDepth_m);
    return share * (2 - share);
  },
});

/** From three years on. */
export const timeFactor = formula({
  symbol: "f_t",
  unit: "",
  ref: "burlandBurbidge1985",
  shown: "1 + R3 + R_t log10(t / 3)",
  symbols: { R3: "r3", R_t: "rt", t: "years" },
  of: (q: { r3: number; rt: number; years: number }) => 1 + q.r3 + q.rt * Math.log10(q.years / 3),
});

/** Pressure that compresses: the part within what the ground has borne before counts a third. */
export const countedPressure = formula({
  symbol: "q_c",
  unit: "kPa",
  ref: "burlandBurbidge1985",
  shown: "q − 2/3 min(q, σ_p)",
  symbols: { q: "pressure_kPa", σ_p: "previousPressure_kPa" },
  of: (q: { pressure_kPa: number; previousPressure_kPa: number }) =>
    q.pressure_kPa - (2 / 3) * Math.min(q.pressure_kPa, q.previousPressure_kPa),
});

export const burlandBurbidge = formula({
  symbol: "s",
  unit: "mm",
  ref: "burlandBurbidge1985",
  shown: "f_s f_l f_t q_c B^0.7 I_c",
  symbols: {
    f_s: "shapeFactor",
    f_l: "thicknessFactor",
    f_t: "timeFactor",
    q_c: "counted_kPa",
    B: "smallerSide_m",
    I_c: "compressibility",
  },
  of: (q: {
    shapeFactor: number;
    thicknessFactor: number;
    timeFactor: number;
    counted_kPa: number;
    smallerSide_m: number;
    compressibility: number;
  }) =>
    q.shapeFactor *
    q.thicknessFactor *
    q.timeFactor *
    q.counted_kPa *
    q.smallerSide_m ** 0.7 *
    q.compressibility,
});

/** R3 and R_t by the kind of loading. */
const creep = { static: { r3: 0.3, rt: 0.2 }, fluctuating: { r3: 0.7, rt: 0.8 } } as const;

export const settlementBurlandBurbidge = defineMethod({
  id: "settlement-burland-burbidge",
  version: "1",
  title: "Settlement on sand and gravel from SPT (1985)",
  source: ["burlandBurbidge1985"],
  limits: [
    "The count is the mean over the depth of influence, not corrected for overburden; gravel 1.25 N, silty sand below water 15 + (N − 15)/2.",
    "A mean: about half of measured settlements are larger. The time factors are from memory and begin at three years.",
  ],
  inputs: z.strictObject({
    breadth_m: quantity({ label: "Breadth B", unit: "m", above: 0 }),
    length_m: quantity({ label: "Length L", unit: "m", above: 0 }),
    pressure_kPa: quantity({ label: "Mean effective pressure at the base", unit: "kPa", min: 0 }),
    previousPressure_kPa: quantity({
      label: "Largest effective pressure borne before",
      unit: "kPa",
      min: 0,
    }).default(0),
    averageN60: quantity({ label: "Average N60", min: 1, max: 200 }),
    layerThickness_m: quantity({ label: "Thickness of the compressible layer", unit: "m", above: 0 })
      .nullable()
      .default(null),
    years: quantity({ label: "Time", unit: "years", min: 0, max: 1000 }).default(0),
    loading: choice("Loading", ["static", "fluctuating"]),
  }),
  outputs: z.object({
    settlement_mm: output("Settlement", "mm"),
    compressibility: output("Compressibility Ic"),
    shapeFactor: output("Shape factor"),
    thicknessFactor: output("Thickness factor"),
    timeFactor: output("Time factor"),
    influenceDepth_m: output("Depth of influence", "m"),
    counted_kPa: output("Pressure that counts", "kPa"),
  }),
  compute: (q) => {
    const smallerSide_m = Math.min(q.breadth_m, q.length_m);
    const influenceDepth_m = influenceDepth.of({ smallerSide_m });
    const factors = {
      compressibility: compressibility.of(q),
      shapeFactor: shapeFactor.of({ ratio: Math.max(q.breadth_m, q.length_m) / smallerSide_m }),
      thicknessFactor:
        q.layerThickness_m === null
          ? 1
          : thicknessFactor.of({ layerThickness_m: q.layerThickness_m, influenceDepth_m }),
      timeFactor: q.years < 3 ? 1 : timeFactor.of({ ...creep[q.loading], years: q.years }),
      counted_kPa: countedPressure.of(q),
    };
    return { settlement_mm: burlandBurbidge.of({ ...factors, smallerSide_m }), influenceDepth_m, ...factors };
  },
  lines: (q, r) => {
    const smallerSide_m = Math.min(q.breadth_m, q.length_m);
    const { layerThickness_m } = q;
    return [
      line(compressibility, q),
      line(shapeFactor, { ratio: Math.max(q.breadth_m, q.length_m) / smallerSide_m }),
      line(influenceDepth, { smallerSide_m }),
      ...(layerThickness_m === null
        ? []
        : [line(thicknessFactor, { layerThickness_m, influenceDepth_m: r.influenceDepth_m })]),
      ...(q.years < 3 ? [] : [line(timeFactor, { ...creep[q.loading], years: q.years })]),
      line(countedPressure, q),
      line(burlandBurbidge, { ...r, smallerSide_m }),
    ];
  },
  findings: (q) => {
    const found: MethodFinding[] = [];
    if (q.years > 0 && q.years < 3)
      found.push({
        code: "before-three-years",
        severity: "note",
        message: "The time factor begins at three years: none is counted before.",
      });
    if (q.averageN60 > 60)
      found.push({
        code: "refusal",
        severity: "warning",
        message: "An average above 60 lies beyond the counts that the method was made from.",
      });
    return found;
  },
});
