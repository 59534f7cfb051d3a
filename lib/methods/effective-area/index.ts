import { z } from "zod";
import { defineMethod, output, quantity } from "../define-method";
import { formula, line } from "../formula";

/** One effective side: the base narrowed until the load stands at its centre. Negative once the load is outside. */
export const effectiveSide = formula({
  symbol: "B′",
  unit: "m",
  ref: "meyerhof1953",
  where: "EN 1997-1:2004 Annex D.2 notation",
  shown: "B − 2 |e|",
  symbols: { B: "side_m", "|e|": "eccentricity_m" },
  of: (q: { side_m: number; eccentricity_m: number }) => q.side_m - 2 * q.eccentricity_m,
});

/** Effective sides and area; zero where the resultant is on or outside the edge. */
export function effectiveAreaOf(given: {
  breadth_m: number;
  length_m: number;
  eccentricityB_m: number;
  eccentricityL_m: number;
}) {
  const { breadth_m, length_m } = given;
  const eccentricityB_m = Math.abs(given.eccentricityB_m);
  const eccentricityL_m = Math.abs(given.eccentricityL_m);
  const effectiveBreadth_m = Math.max(
    0,
    effectiveSide.of({ side_m: breadth_m, eccentricity_m: eccentricityB_m }),
  );
  const effectiveLength_m = Math.max(
    0,
    effectiveSide.of({ side_m: length_m, eccentricity_m: eccentricityL_m }),
  );
  return { effectiveBreadth_m, effectiveLength_m, effectiveArea_m2: effectiveBreadth_m * effectiveLength_m };
}

export const effectiveArea = defineMethod({
  id: "effective-area",
  version: "1",
  title: "Effective area of an eccentrically loaded base",
  source: ["meyerhof1953", "en1997"],
  limits: [
    "For the resistance of the ground; the concrete section answers to the linear pressure.",
    "Swap the two sides where a method needs the smaller first, and keep the direction of the horizontal load.",
  ],
  inputs: z.strictObject({
    breadth_m: quantity({ label: "Breadth B", unit: "m", above: 0 }),
    length_m: quantity({ label: "Length L", unit: "m", above: 0 }),
    eccentricityB_m: quantity({ label: "Eccentricity along B", unit: "m" }),
    eccentricityL_m: quantity({ label: "Eccentricity along L", unit: "m" }),
  }),
  outputs: z.object({
    effectiveBreadth_m: output("Effective breadth B′", "m"),
    effectiveLength_m: output("Effective length L′", "m"),
    effectiveArea_m2: output("Effective area A′", "m²"),
  }),
  compute: effectiveAreaOf,
  lines: (q) => [
    line(effectiveSide, { side_m: q.breadth_m, eccentricity_m: Math.abs(q.eccentricityB_m) }),
    {
      ...line(effectiveSide, { side_m: q.length_m, eccentricity_m: Math.abs(q.eccentricityL_m) }),
      symbol: "L′",
    },
  ],
});
