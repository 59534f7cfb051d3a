import { z } from "zod";
import { defineMethod, output, quantity } from "../define-method";
import { formula, line } from "../formula";
import { factorOver } from "../sliding/index";

/** What holds down over what lifts. */
export const upliftFactor = formula({
  symbol: "F",
  unit: "",
  ref: "statics",
  shown: "G / U",
  symbols: { G: "stabilising_kN", U: "uplift_kN" },
  of: (q: { stabilising_kN: number; uplift_kN: number }) => q.stabilising_kN / q.uplift_kN,
});

export const uplift = defineMethod({
  id: "uplift",
  version: "1",
  title: "Uplift by water and by pull",
  source: ["statics"],
  limits: [
    "Weights count either total against full water pressure or submerged without it, never a mixture.",
  ],
  inputs: z.strictObject({
    stabilising_kN: quantity({ label: "Weight and load that hold down", unit: "kN", min: 0 }),
    uplift_kN: quantity({ label: "Water pressure and pull that lift", unit: "kN", min: 0 }),
  }),
  outputs: z.object({ factorOfSafety: output("Factor of safety").nullable() }),
  compute: (q) => ({ factorOfSafety: factorOver(q.stabilising_kN, q.uplift_kN) }),
  lines: (q) => (q.uplift_kN > 0 ? [line(upliftFactor, q)] : []),
});
