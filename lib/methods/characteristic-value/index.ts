import { z } from "zod";
import { choice, defineMethod, type MethodFinding, output, quantity } from "../define-method";
import { formula, line } from "../formula";
import { NORMAL_95, student95 } from "./student";

/** The mean lowered by k standard deviations, on the side where a low value is the cautious one. */
export const cautiousValue = formula({
  symbol: "X_k",
  unit: "",
  ref: "en1990",
  shown: "X_m − k s",
  symbols: { X_m: "mean", k: "k", s: "deviation" },
  of: (q: { mean: number; k: number; deviation: number }) => q.mean - q.k * q.deviation,
});

const rules = ["schneider", "student-95-mean", "student-5-fractile", "known-cov"] as const;
type Given = {
  values: number[];
  rule: (typeof rules)[number];
  cov: number | null;
  estimate: "mean" | "fractile";
};

/** How many standard deviations the rule takes off. */
function deviationsOff({ rule, estimate, values }: Given): number {
  const n = values.length;
  switch (rule) {
    case "schneider":
      return 0.5;
    case "student-95-mean":
      return student95(n - 1) * Math.sqrt(1 / n);
    case "student-5-fractile":
      return student95(n - 1) * Math.sqrt(1 + 1 / n);
    case "known-cov":
      return NORMAL_95 * Math.sqrt((estimate === "fractile" ? 1 : 0) + 1 / n);
  }
}

function statistics(given: Given) {
  const { values, cov } = given;
  const n = values.length;
  const mean = values.reduce((sum, value) => sum + value, 0) / n;
  const squares = values.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  const sampled = n > 1 ? Math.sqrt(squares / (n - 1)) : null;
  const usesCov = cov !== null && (given.rule === "known-cov" || given.rule === "schneider");
  const standardDeviation = usesCov ? cov * mean : sampled;
  const k = deviationsOff(given);
  const characteristic = cautiousValue.of({ mean, k, deviation: standardDeviation ?? 0 });
  return {
    mean,
    standardDeviation,
    cov: standardDeviation === null ? null : standardDeviation / mean,
    k,
    characteristic,
  };
}

export const characteristicValue = defineMethod({
  id: "characteristic-value",
  version: "1",
  title: "Characteristic value from measured ones, cautious low side",
  source: ["schneider1997", "en1990", "en1997"],
  limits: [
    "A mean governs where the ground averages over the slip; a low local value where a small pad stands on one spot.",
    "The values belong to one unit and show no trend with depth; normally distributed.",
    "With a known coefficient of variation the mean is estimated, unless the fractile is asked for.",
  ],
  inputs: z
    .strictObject({
      values: z
        .array(quantity({ label: "Value", above: 0 }), { error: "Values is a list of numbers." })
        .min(1, "At least one value is needed.")
        .max(10_000, "At most 10,000 values.")
        .meta({ label: "Measured values", unit: "" }),
      rule: choice("Rule", rules),
      cov: quantity({ label: "Coefficient of variation", min: 0, max: 1 }).nullable().default(null),
      estimate: choice("Estimate with a known coefficient of variation", ["mean", "fractile"]).default(
        "mean",
      ),
    })
    .superRefine((q, refinement) => {
      if (q.rule === "known-cov" && q.cov === null)
        refinement.addIssue({
          code: "custom",
          path: ["cov"],
          message: "The rule with a known coefficient of variation needs that coefficient.",
        });
      const estimated = q.rule !== "known-cov" && !(q.rule === "schneider" && q.cov !== null);
      if (q.values.length < 2 && estimated)
        refinement.addIssue({
          code: "custom",
          path: ["values"],
          message: "A scatter needs at least two values.",
        });
    }),
  outputs: z.object({
    mean: output("Mean"),
    standardDeviation: output("Standard deviation").nullable(),
    cov: output("Coefficient of variation").nullable(),
    k: output("Standard deviations taken off"),
    characteristic: output("Characteristic value"),
  }),
  compute: statistics,
  lines: (_, { mean, k, standardDeviation }) => [
    line(cautiousValue, { mean, k, deviation: standardDeviation ?? 0 }),
  ],
  findings: (q, { characteristic, cov }) => {
    const found: MethodFinding[] = [];
    if (q.values.length < 5 && q.rule !== "known-cov")
      found.push({
        code: "few-values",
        severity: "warning",
        message: `${q.values.length} values say little of the scatter: compare with experience of the same ground.`,
      });
    if (characteristic <= 0)
      found.push({
        code: "not-positive",
        severity: "outside",
        message: "The characteristic value is not positive: this rule cannot be used on such a scatter.",
      });
    if (cov !== null && cov > 0.5)
      found.push({
        code: "wide-scatter",
        severity: "warning",
        message: "The scatter is wide: see whether the values belong to one unit, or use logarithms.",
      });
    return found;
  },
});
