import { z } from "zod";
import { choice, defineMethod, type MethodFinding, output, quantity, yesNo } from "../define-method";
import { line } from "../formula";
import {
  elasticSettlement,
  foxDepthFactor,
  halfSpaceCorner,
  layerCorner,
  RIGID_SHARE_OF_CENTRE,
  rigidHalfSpace,
} from "./formulas";

type Given = {
  breadth_m: number;
  length_m: number;
  poisson: number;
  layerThickness_m: number | null;
  depth_m: number;
  foxDepth: boolean;
  rigidity: "flexible-centre" | "flexible-corner" | "rigid";
};

/** Influence in smaller sides B: s = q B (1 − ν²) / E · I, before any depth factor. */
function influenceOf({ breadth_m, length_m, poisson, layerThickness_m, rigidity }: Given): number {
  const side_m = Math.min(breadth_m, length_m);
  const m = Math.max(breadth_m, length_m) / side_m;
  if (layerThickness_m === null) {
    if (rigidity === "rigid") return rigidHalfSpace(m);
    return rigidity === "flexible-corner" ? halfSpaceCorner(m) : 2 * halfSpaceCorner(m);
  }
  if (rigidity === "flexible-corner") return layerCorner(m, layerThickness_m / side_m, poisson);
  // The centre is the corner of four rectangles of half the sides.
  const centre = 2 * layerCorner(m, layerThickness_m / (side_m / 2), poisson);
  return rigidity === "rigid" ? RIGID_SHARE_OF_CENTRE * centre : centre;
}

const depthFactorOf = (q: Given): number =>
  q.foxDepth
    ? foxDepthFactor(
        Math.min(q.breadth_m, q.length_m),
        Math.max(q.breadth_m, q.length_m),
        q.depth_m,
        q.poisson,
      )
    : 1;

export const settlementElastic = defineMethod({
  id: "settlement-elastic",
  version: "1",
  title: "Elastic settlement of a rectangle",
  source: ["steinbrenner1934", "fox1948", "bowles1977", "statics"],
  limits: [
    "Uniform elastic ground; on clay in undrained state with ν = 0.5 only while the factor of safety is three or more.",
    "A rigid base on the half-space: boundary-element values of our own; on a layer 0.93 of the flexible centre, which is practice. The two do not meet for a very thick layer.",
    "The depth factor is off unless asked for, and is that of the mean of a flexible area in the half-space.",
  ],
  inputs: z.strictObject({
    breadth_m: quantity({ label: "Breadth B", unit: "m", above: 0 }),
    length_m: quantity({ label: "Length L", unit: "m", above: 0 }),
    pressure_kPa: quantity({ label: "Net pressure", unit: "kPa", min: 0 }),
    modulus_kPa: quantity({ label: "Modulus E", unit: "kPa", above: 0 }),
    poisson: quantity({ label: "Poisson's ratio ν", min: 0, max: 0.5 }).default(0.3),
    layerThickness_m: quantity({ label: "Thickness of the layer below the base", unit: "m", above: 0 })
      .nullable()
      .default(null),
    depth_m: quantity({ label: "Founding depth", unit: "m", min: 0 }).default(0),
    foxDepth: yesNo("Use the depth factor").default(false),
    rigidity: choice("Rigidity", ["flexible-centre", "flexible-corner", "rigid"]),
  }),
  outputs: z.object({
    settlement_mm: output("Settlement", "mm"),
    influence: output("Influence factor"),
    depthFactor: output("Depth factor"),
  }),
  compute: (q) => {
    const influence = influenceOf(q);
    const depthFactor = depthFactorOf(q);
    const smallerSide_m = Math.min(q.breadth_m, q.length_m);
    return {
      settlement_mm: elasticSettlement.of({ ...q, smallerSide_m, influence: influence * depthFactor }),
      influence,
      depthFactor,
    };
  },
  lines: (q, { influence, depthFactor }) => [
    line(elasticSettlement, {
      pressure_kPa: q.pressure_kPa,
      smallerSide_m: Math.min(q.breadth_m, q.length_m),
      poisson: q.poisson,
      modulus_kPa: q.modulus_kPa,
      influence: influence * depthFactor,
    }),
  ],
  findings: (q) => {
    const found: MethodFinding[] = [];
    const ratio = Math.max(q.breadth_m, q.length_m) / Math.min(q.breadth_m, q.length_m);
    if (q.rigidity === "rigid" && q.layerThickness_m === null && ratio > 10)
      found.push({
        code: "long-rigid",
        severity: "outside",
        message:
          "Rigid bases were solved to L/B = 10; beyond that the last share of the flexible mean is used.",
      });
    if (q.rigidity === "rigid" && q.layerThickness_m !== null)
      found.push({
        code: "rigid-by-practice",
        severity: "note",
        message:
          "A rigid base on a layer is taken as 0.93 of the flexible centre: practice, on the high side.",
      });
    if (q.depth_m > 0 && !q.foxDepth)
      found.push({
        code: "depth-not-used",
        severity: "note",
        message: "The depth factor was not asked for: the settlement is that of a base at the surface.",
      });
    return found;
  },
});
