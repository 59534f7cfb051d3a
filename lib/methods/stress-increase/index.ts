import { z } from "zod";
import { choice, defineMethod, output, quantity } from "../define-method";
import { line } from "../formula";
import { atPoint, boussinesqCorner, increase, twoToOne, westergaardCorner } from "./formulas";

export const stressIncrease = defineMethod({
  id: "stress-increase",
  version: "1",
  title: "Increase of vertical stress under a loaded rectangle",
  source: ["boussinesq1885", "westergaard1938", "gec6"],
  limits: [
    "Uniform flexible load at the surface of elastic ground; Westergaard for thin alternating stiff layers.",
    "2:1 is a mean over the spread area: under the centre it is too low near the base, at an edge it means nothing.",
  ],
  inputs: z.strictObject({
    rule: choice("Rule", ["boussinesq", "westergaard", "two-to-one"]),
    breadth_m: quantity({ label: "Breadth B", unit: "m", above: 0 }),
    length_m: quantity({ label: "Length L", unit: "m", above: 0 }),
    pressure_kPa: quantity({ label: "Net pressure", unit: "kPa" }),
    depth_m: quantity({ label: "Depth below the base", unit: "m", min: 0 }),
    x_m: quantity({ label: "Point along B, from the centre", unit: "m" }).default(0),
    y_m: quantity({ label: "Point along L, from the centre", unit: "m" }).default(0),
  }),
  outputs: z.object({
    increase_kPa: output("Increase of vertical stress", "kPa"),
    influence: output("Share of the pressure"),
  }),
  compute: (q) => {
    const influence =
      q.rule === "two-to-one"
        ? twoToOne.of({ ...q, pressure_kPa: 1 })
        : atPoint(q.rule === "boussinesq" ? boussinesqCorner : westergaardCorner, q);
    return { increase_kPa: increase.of({ influence, pressure_kPa: q.pressure_kPa }), influence };
  },
  lines: (q, { influence }) =>
    q.rule === "two-to-one"
      ? [line(twoToOne, q)]
      : [
          {
            ...line(increase, { influence, pressure_kPa: q.pressure_kPa }),
            ref: q.rule === "boussinesq" ? "boussinesq1885" : "westergaard1938",
          },
        ],
  findings: (q) =>
    q.rule === "two-to-one" && (q.x_m !== 0 || q.y_m !== 0)
      ? [
          {
            code: "mean-only",
            severity: "outside",
            message: "2:1 gives one mean for the whole area: the point given has no influence on it.",
          },
        ]
      : [],
});
