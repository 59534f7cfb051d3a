import { z } from "zod";
import { defineMethod, output, quantity } from "../define-method";
import { formula, line } from "../formula";
import { factorOver } from "../sliding/index";

/** Moment that holds the base down, about the edge it would turn over. */
export const holdingMoment = formula({
  symbol: "M_stb",
  unit: "kNm",
  ref: "statics",
  shown: "V s / 2",
  symbols: { V: "vertical_kN", s: "side_m" },
  of: (q: { vertical_kN: number; side_m: number }) => (q.vertical_kN * q.side_m) / 2,
});

/** Factor of safety about one edge. */
export const overturningFactor = formula({
  symbol: "F",
  unit: "",
  ref: "statics",
  shown: "M_stb / |M|",
  symbols: { M_stb: "holding_kNm", "|M|": "moment_kNm" },
  of: (q: { holding_kNm: number; moment_kNm: number }) => q.holding_kNm / q.moment_kNm,
});

/** Factors about the edges that the moments press down, and the smaller; null where no moment acts. */
export function overturningFactors(q: {
  breadth_m: number;
  length_m: number;
  vertical_kN: number;
  momentB_kNm: number;
  momentL_kNm: number;
}) {
  const { vertical_kN } = q;
  const factorOfSafetyB = factorOver(
    holdingMoment.of({ vertical_kN, side_m: q.breadth_m }),
    Math.abs(q.momentB_kNm),
  );
  const factorOfSafetyL = factorOver(
    holdingMoment.of({ vertical_kN, side_m: q.length_m }),
    Math.abs(q.momentL_kNm),
  );
  const factorOfSafety =
    factorOfSafetyB === null
      ? factorOfSafetyL
      : factorOfSafetyL === null
        ? factorOfSafetyB
        : Math.min(factorOfSafetyB, factorOfSafetyL);
  return { factorOfSafetyB, factorOfSafetyL, factorOfSafety };
}

export const overturning = defineMethod({
  id: "overturning",
  version: "1",
  title: "Overturning about the edges of the base",
  source: ["statics"],
  limits: [
    "Rotation about a rigid edge; on soil the bearing at that edge governs before.",
    "The moments are those at the underside, with the moment of horizontal loads in them.",
  ],
  inputs: z.strictObject({
    breadth_m: quantity({ label: "Breadth B", unit: "m", above: 0 }),
    length_m: quantity({ label: "Length L", unit: "m", above: 0 }),
    vertical_kN: quantity({ label: "Effective vertical load", unit: "kN" }),
    momentB_kNm: quantity({ label: "Moment along B at the base", unit: "kNm" }),
    momentL_kNm: quantity({ label: "Moment along L at the base", unit: "kNm" }),
  }),
  outputs: z.object({
    factorOfSafetyB: output("Factor of safety along B").nullable(),
    factorOfSafetyL: output("Factor of safety along L").nullable(),
    factorOfSafety: output("Smaller factor of safety").nullable(),
  }),
  compute: overturningFactors,
  lines: (q) => [
    { ...line(holdingMoment, { vertical_kN: q.vertical_kN, side_m: q.breadth_m }), symbol: "M_stb,B" },
    { ...line(holdingMoment, { vertical_kN: q.vertical_kN, side_m: q.length_m }), symbol: "M_stb,L" },
  ],
});
