import { z } from "zod";
import { defineMethod, output, quantity } from "../define-method";
import { formula, line } from "../formula";

const degree = Math.PI / 180;

/** Resistance at the underside: friction on the effective load, adhesion on the area in contact, passive if counted. */
export const slidingResistance = formula({
  symbol: "R",
  unit: "kN",
  ref: "gec6",
  where: "Eq. 5-38",
  shown: "V tan δ + a A + P",
  symbols: {
    V: "vertical_kN",
    δ: "interfaceAngle_deg",
    a: "adhesion_kPa",
    A: "contactArea_m2",
    P: "passive_kN",
  },
  of: (q: {
    vertical_kN: number;
    interfaceAngle_deg: number;
    adhesion_kPa: number;
    contactArea_m2: number;
    passive_kN: number;
  }) =>
    q.vertical_kN * Math.tan(q.interfaceAngle_deg * degree) +
    q.adhesion_kPa * q.contactArea_m2 +
    q.passive_kN,
});

/** Both directions act at once: the vector sum. */
export const slidingApplied = formula({
  symbol: "H",
  unit: "kN",
  ref: "statics",
  shown: "√(H_B² + H_L²)",
  symbols: { H_B: "horizontalB_kN", H_L: "horizontalL_kN" },
  of: (q: { horizontalB_kN: number; horizontalL_kN: number }) =>
    Math.sqrt(q.horizontalB_kN * q.horizontalB_kN + q.horizontalL_kN * q.horizontalL_kN),
});

/** Factor of safety against sliding. */
export const slidingFactor = formula({
  symbol: "F",
  unit: "",
  ref: "statics",
  shown: "R / H",
  symbols: { R: "resistance_kN", H: "applied_kN" },
  of: (q: { resistance_kN: number; applied_kN: number }) => q.resistance_kN / q.applied_kN,
});

/** Resistance over what is applied; null when nothing is applied, or so little that the factor has no size. */
export function factorOver(capacity: number, demand: number): number | null {
  const factor = capacity / demand;
  return demand > 0 && factor < Number.POSITIVE_INFINITY ? factor : null;
}

const inputs = z.strictObject({
  vertical_kN: quantity({ label: "Effective vertical load", unit: "kN", min: 0 }),
  horizontalB_kN: quantity({ label: "Horizontal load along B", unit: "kN" }),
  horizontalL_kN: quantity({ label: "Horizontal load along L", unit: "kN" }),
  interfaceAngle_deg: quantity({
    label: "Angle of friction under the base δ",
    unit: "°",
    min: 0,
    below: 90,
  }).default(0),
  adhesion_kPa: quantity({ label: "Adhesion a", unit: "kPa", min: 0 }).default(0),
  contactArea_m2: quantity({ label: "Area in contact", unit: "m²", min: 0 }).default(0),
  passive_kN: quantity({ label: "Passive resistance counted", unit: "kN", min: 0 }).default(0),
});

export const sliding = defineMethod({
  id: "sliding",
  version: "1",
  title: "Sliding on the underside of the base",
  source: ["gec6", "en1997", "statics"],
  limits: [
    "Drained friction and undrained adhesion are alternatives for most ground; add them only where both are known to act.",
    "Passive resistance in front of the base is counted only where it will stay there.",
  ],
  inputs,
  outputs: z.object({
    resistance_kN: output("Resistance", "kN"),
    applied_kN: output("Applied", "kN"),
    factorOfSafety: output("Factor of safety").nullable(),
  }),
  compute: (q) => {
    const resistance_kN = slidingResistance.of(q);
    const applied_kN = slidingApplied.of(q);
    return { resistance_kN, applied_kN, factorOfSafety: factorOver(resistance_kN, applied_kN) };
  },
  lines: (q) => [line(slidingResistance, q), line(slidingApplied, q)],
});
