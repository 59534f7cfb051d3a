import { z } from "zod";
import { defineMethod, output, quantity } from "../define-method";
import { formula, line } from "../formula";
import { twoToOne } from "../stress-increase/formulas";

/** What the lower layer bears over what it allows; both net of the overburden there. */
export const lowerUtilisation = formula({
  symbol: "u",
  unit: "",
  ref: "gec6",
  shown: "Δq / q_net,a",
  symbols: { Δq: "pressureOnLower_kPa", "q_net,a": "lowerNetAllowable_kPa" },
  of: (q: { pressureOnLower_kPa: number; lowerNetAllowable_kPa: number }) =>
    q.pressureOnLower_kPa / q.lowerNetAllowable_kPa,
});

const atLower = (q: { breadth_m: number; length_m: number; pressure_kPa: number; thickness_m: number }) => ({
  pressure_kPa: q.pressure_kPa,
  breadth_m: q.breadth_m,
  length_m: q.length_m,
  depth_m: q.thickness_m,
});

export const layeredBearing = defineMethod({
  id: "layered-bearing",
  version: "1",
  title: "Stiff layer over a weaker one, by 2:1 spread",
  source: ["gec6"],
  limits: [
    "A mean pressure: on the axis at half a breadth below the base elastic theory gives 1.58 times as much.",
    "Net pressure against the lower layer's net allowable pressure at its own top. Punching through a thin stiff crust is another check.",
  ],
  inputs: z.strictObject({
    breadth_m: quantity({ label: "Breadth B", unit: "m", above: 0 }),
    length_m: quantity({ label: "Length L", unit: "m", above: 0 }),
    pressure_kPa: quantity({ label: "Net pressure at the base", unit: "kPa", min: 0 }),
    thickness_m: quantity({ label: "Stiff layer below the base", unit: "m", min: 0 }),
    lowerNetAllowable_kPa: quantity({
      label: "Net allowable pressure of the lower layer",
      unit: "kPa",
      above: 0,
    }),
  }),
  outputs: z.object({
    pressureOnLower_kPa: output("Pressure on the lower layer", "kPa"),
    utilisation: output("Utilisation"),
  }),
  compute: (q) => {
    const pressureOnLower_kPa = twoToOne.of(atLower(q));
    return {
      pressureOnLower_kPa,
      utilisation: lowerUtilisation.of({
        pressureOnLower_kPa,
        lowerNetAllowable_kPa: q.lowerNetAllowable_kPa,
      }),
    };
  },
  lines: (q, { pressureOnLower_kPa }) => [
    line(twoToOne, atLower(q)),
    line(lowerUtilisation, { pressureOnLower_kPa, lowerNetAllowable_kPa: q.lowerNetAllowable_kPa }),
  ],
  findings: (q) =>
    q.thickness_m < 0.5 * Math.min(q.breadth_m, q.length_m)
      ? [
          {
            code: "thin-crust",
            severity: "warning",
            message:
              "The stiff layer is thinner than half the breadth: check punching, and the pressure on the axis.",
          },
        ]
      : [],
});
