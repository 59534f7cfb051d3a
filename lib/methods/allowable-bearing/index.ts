import { z } from "zod";
import { defineMethod, output, quantity } from "../define-method";
import { formula, line } from "../formula";

type Terms = { grossUltimate_kPa: number; overburden_kPa: number; factorOfSafety: number };
const symbols = { q_ult: "grossUltimate_kPa", σ0: "overburden_kPa", F: "factorOfSafety" } as const;

/** The factor on the net ultimate pressure. */
export const netOverFactor = formula({
  symbol: "q_net,a",
  unit: "kPa",
  ref: "gec6",
  shown: "(q_ult − σ0) / F",
  symbols,
  of: (q: Terms) => (q.grossUltimate_kPa - q.overburden_kPa) / q.factorOfSafety,
});

/** The factor on the gross ultimate pressure. */
export const grossOverFactor = formula({
  symbol: "q_gross,a",
  unit: "kPa",
  ref: "gec6",
  shown: "q_ult / F",
  symbols,
  of: (q: Terms) => q.grossUltimate_kPa / q.factorOfSafety,
});

/** Net and gross allowable pressure under the named convention. */
export function allowableOf(q: Terms & { convention: "net-over-factor" | "gross-over-factor" }) {
  if (q.convention === "net-over-factor") {
    const netAllowable_kPa = netOverFactor.of(q);
    return { netAllowable_kPa, grossAllowable_kPa: netAllowable_kPa + q.overburden_kPa };
  }
  const grossAllowable_kPa = grossOverFactor.of(q);
  return { netAllowable_kPa: grossAllowable_kPa - q.overburden_kPa, grossAllowable_kPa };
}

export const allowableBearing = defineMethod({
  id: "allowable-bearing",
  version: "1",
  title: "Allowable bearing pressure from the ultimate",
  source: ["gec6", "practice"],
  limits: [
    "The two conventions differ by tens of kPa on the same ground: a value always carries its own.",
    "Strength only; settlement may ask for less.",
  ],
  inputs: z.strictObject({
    grossUltimate_kPa: quantity({ label: "Gross ultimate bearing pressure", unit: "kPa", above: 0 }),
    overburden_kPa: quantity({ label: "Overburden at founding level", unit: "kPa", min: 0 }),
    factorOfSafety: quantity({ label: "Factor of safety", min: 1 }),
    convention: z
      .enum(["net-over-factor", "gross-over-factor"], {
        error: "Convention must be net-over-factor or gross-over-factor.",
      })
      .meta({ label: "Convention", unit: "" }),
  }),
  outputs: z.object({
    netAllowable_kPa: output("Net allowable bearing pressure", "kPa"),
    grossAllowable_kPa: output("Gross allowable bearing pressure", "kPa"),
  }),
  compute: allowableOf,
  lines: (q) => [line(q.convention === "net-over-factor" ? netOverFactor : grossOverFactor, q)],
});
