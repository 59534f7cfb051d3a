import { z } from "zod";
import { choice, defineMethod, output, quantity } from "../define-method";
import { formula, line } from "../formula";

type Terms = { plateSettlement_mm: number; footingBreadth_m: number; plateBreadth_m: number };
const symbols = { s_p: "plateSettlement_mm", B: "footingBreadth_m", b: "plateBreadth_m" } as const;

/** Sand, same pressure: never more than four times the plate's settlement. */
export const onSand = formula({
  symbol: "s",
  unit: "mm",
  ref: "terzaghiPeck1948",
  shown: "s_p (2 B / (B + b))²",
  symbols,
  of: (q: Terms) =>
    q.plateSettlement_mm * ((2 * q.footingBreadth_m) / (q.footingBreadth_m + q.plateBreadth_m)) ** 2,
});

/** Clay, same pressure: in proportion to the breadth. */
export const onClay = formula({
  symbol: "s",
  unit: "mm",
  ref: "terzaghiPeck1948",
  shown: "s_p B / b",
  symbols,
  of: (q: Terms) => (q.plateSettlement_mm * q.footingBreadth_m) / q.plateBreadth_m,
});

export const plateLoad = defineMethod({
  id: "plate-load",
  version: "1",
  title: "Settlement of a footing from a plate test at the same pressure",
  source: ["terzaghiPeck1948"],
  limits: [
    "The plate feels about two of its breadths of ground: a weaker layer below is not in the test.",
    "Short-term settlement; consolidation of clay is calculated apart.",
  ],
  inputs: z.strictObject({
    soil: choice("Soil", ["sand", "clay"]),
    plateBreadth_m: quantity({ label: "Breadth of the plate", unit: "m", above: 0 }),
    plateSettlement_mm: quantity({ label: "Settlement of the plate", unit: "mm", min: 0 }),
    footingBreadth_m: quantity({ label: "Breadth of the footing", unit: "m", above: 0 }),
  }),
  outputs: z.object({ footingSettlement_mm: output("Settlement of the footing", "mm") }),
  compute: (q) => ({ footingSettlement_mm: (q.soil === "sand" ? onSand : onClay).of(q) }),
  lines: (q) => [line(q.soil === "sand" ? onSand : onClay, q)],
  findings: (q) =>
    q.footingBreadth_m > 10 * q.plateBreadth_m
      ? [
          {
            code: "small-plate",
            severity: "warning",
            message:
              "The footing is more than ten times as broad as the plate: the test says little of the ground it will load.",
          },
        ]
      : q.footingBreadth_m < q.plateBreadth_m
        ? [
            {
              code: "large-plate",
              severity: "outside",
              message: "The footing is narrower than the plate: the rule scales up, not down.",
            },
          ]
        : [],
});
