import { z } from "zod";
import { choice, defineMethod, type MethodFinding, output, quantity } from "../define-method";
import { formula, line } from "../formula";

/** Blow count at 60 % of the free-fall energy, standard borehole, sampler and rods. */
export const energyCorrection = formula({
  symbol: "N60",
  unit: "",
  ref: "skempton1986",
  shown: "N (ER / 0.6) C_B C_S C_R",
  symbols: {
    N: "blowCount",
    ER: "energyRatio",
    C_B: "boreholeFactor",
    C_S: "samplerFactor",
    C_R: "rodFactor",
  },
  of: (q: {
    blowCount: number;
    energyRatio: number;
    boreholeFactor: number;
    samplerFactor: number;
    rodFactor: number;
  }) => q.blowCount * (q.energyRatio / 0.6) * q.boreholeFactor * q.samplerFactor * q.rodFactor,
});

export const liaoWhitman = formula({
  symbol: "C_N",
  unit: "",
  ref: "liaoWhitman1986",
  shown: "√(p_a / σ′)",
  symbols: { p_a: "referencePressure_kPa", "σ′": "effectiveStress_kPa" },
  of: (q: { referencePressure_kPa: number; effectiveStress_kPa: number }) =>
    Math.sqrt(q.referencePressure_kPa / q.effectiveStress_kPa),
});

/** Peck, Hanson and Thornburn in kPa: 20 tsf are 1915 kPa. Holds from σ′ = 24 kPa. */
export const peck = formula({
  symbol: "C_N",
  unit: "",
  ref: "peck1974",
  shown: "0.77 log10(1915 / σ′)",
  symbols: { "σ′": "effectiveStress_kPa" },
  of: (q: { effectiveStress_kPa: number }) => 0.77 * Math.log10(1915 / q.effectiveStress_kPa),
});

export const overburdenCorrection = formula({
  symbol: "(N1)60",
  unit: "",
  ref: "skempton1986",
  shown: "N60 C_N",
  symbols: { N60: "n60", C_N: "cn" },
  of: (q: { n60: number; cn: number }) => q.n60 * q.cn,
});

const correction = (label: string) => quantity({ label, above: 0, max: 2 }).default(1);

export const sptCorrection = defineMethod({
  id: "spt-correction",
  version: "1",
  title: "Corrected SPT blow count",
  source: ["skempton1986", "liaoWhitman1986", "peck1974"],
  limits: [
    "Overburden corrections are for sand. No cap is applied unless given: 1.7 or 2 are common practice.",
    "Do not correct a count that a rule wants uncorrected, nor twice.",
  ],
  inputs: z.strictObject({
    blowCount: quantity({ label: "Blow count N", min: 0, max: 1000 }),
    energyRatio: quantity({ label: "Energy ratio", above: 0, max: 1 }).default(0.6),
    boreholeFactor: correction("Borehole factor"),
    samplerFactor: correction("Sampler factor"),
    rodFactor: correction("Rod length factor"),
    effectiveStress_kPa: quantity({ label: "Effective vertical stress", unit: "kPa", above: 0 }),
    overburdenRule: choice("Overburden rule", ["liao-whitman", "peck", "none"]),
    referencePressure_kPa: quantity({ label: "Reference pressure", unit: "kPa", min: 90, max: 110 }).default(
      100,
    ),
    cap: quantity({ label: "Largest overburden correction", min: 1 }).nullable().default(null),
  }),
  outputs: z.object({
    n60: output("N60"),
    cn: output("Overburden correction CN"),
    n160: output("(N1)60"),
  }),
  compute: (q) => {
    const n60 = energyCorrection.of(q);
    const free =
      q.overburdenRule === "liao-whitman"
        ? liaoWhitman.of(q)
        : q.overburdenRule === "peck"
          ? Math.max(0, peck.of(q))
          : 1;
    const cn = q.cap === null ? free : Math.min(free, q.cap);
    return { n60, cn, n160: overburdenCorrection.of({ n60, cn }) };
  },
  lines: (q, { n60, cn }) => [
    line(energyCorrection, q),
    ...(q.overburdenRule === "liao-whitman" ? [line(liaoWhitman, q)] : []),
    ...(q.overburdenRule === "peck" ? [line(peck, q)] : []),
    line(overburdenCorrection, { n60, cn }),
  ],
  findings: (q, { cn }) => {
    const found: MethodFinding[] = [];
    if (cn > 1.7)
      found.push({
        code: "large-correction",
        severity: "warning",
        message:
          "The overburden correction is above 1.7, the cap of common practice: shallow counts grow out of bounds.",
      });
    if (q.overburdenRule === "peck" && q.effectiveStress_kPa < 24)
      found.push({
        code: "shallow",
        severity: "outside",
        message: "This overburden rule holds from an effective stress of 24 kPa.",
      });
    if (q.blowCount > 50)
      found.push({
        code: "refusal",
        severity: "note",
        message: "Counts above 50 are refusals in most records: see how far the sampler went.",
      });
    return found;
  },
});
