import { z } from "zod";
import { bearingFactorsOf, type Theory, theories } from "../bearing-factors/index";
import { defineMethod, output, quantity } from "../define-method";
import { depthFactors, inclinationFactors, type Situation, shapeFactors } from "./factors";

const degree = Math.PI / 180;
const WATER_kNm3 = 9.81;

export type BearingCase = {
  theory: Theory;
  drainage: "drained" | "undrained";
  effectiveBreadth_m: number;
  effectiveLength_m: number;
  depth_m: number;
  cohesion_kPa: number;
  frictionAngle_deg: number;
  surcharge_kPa: number;
  unitWeightBelow_kNm3: number;
  vertical_kN: number | null;
  horizontal_kN: number;
  /** `breadth`, `length`, or the angle from the length axis in degrees. */
  horizontalAlong: "breadth" | "length" | number;
  baseTilt_deg: number;
  waterDepth_m: number | null;
};

/** Ultimate bearing pressure, gross and net, with every factor. Undrained counts no friction, whatever was given. */
export function bearingResistanceOf(given: BearingCase) {
  const undrained = given.drainage === "undrained";
  const frictionAngle_deg = undrained ? 0 : given.frictionAngle_deg;
  const { nc, nq, nGamma } = bearingFactorsOf(given.theory, frictionAngle_deg);
  const along = given.horizontalAlong;
  const situation: Situation = {
    theory: given.theory,
    undrained,
    breadth_m: given.effectiveBreadth_m,
    length_m: given.effectiveLength_m,
    depth_m: given.depth_m,
    cohesion_kPa: given.cohesion_kPa,
    frictionAngle_deg,
    vertical_kN: given.vertical_kN ?? 0,
    horizontal_kN: Math.abs(given.horizontal_kN),
    horizontalFromLength_deg: along === "breadth" ? 90 : along === "length" ? 0 : along,
    nc,
    nq,
  };
  const s = shapeFactors(situation);
  const d = depthFactors(situation);
  const i = inclinationFactors(situation);
  const b = baseFactors(given, nc, frictionAngle_deg, undrained);
  const unitWeight_kNm3 = weightBelow(given);
  const fromCohesion_kPa = given.cohesion_kPa * nc * s.c * d.c * i.c * b.c;
  const fromSurcharge_kPa = given.surcharge_kPa * nq * s.q * d.q * i.q * b.q;
  const fromWeight_kPa =
    0.5 * unitWeight_kNm3 * given.effectiveBreadth_m * nGamma * s.gamma * d.gamma * i.gamma * b.gamma;
  const ultimate_kPa = fromCohesion_kPa + fromSurcharge_kPa + fromWeight_kPa;
  return {
    nc,
    nq,
    nGamma,
    sc: s.c,
    sq: s.q,
    sGamma: s.gamma,
    dc: d.c,
    dq: d.q,
    dGamma: d.gamma,
    ic: i.c,
    iq: i.q,
    iGamma: i.gamma,
    bc: b.c,
    bq: b.q,
    bGamma: b.gamma,
    unitWeight_kNm3,
    fromCohesion_kPa,
    fromSurcharge_kPa,
    fromWeight_kPa,
    ultimate_kPa,
    netUltimate_kPa: ultimate_kPa - given.surcharge_kPa,
  };
}

/** Factors for a tilted underside; Terzaghi and Meyerhof give none. */
function baseFactors(given: BearingCase, nc: number, frictionAngle_deg: number, undrained: boolean) {
  const tilt = given.baseTilt_deg * degree;
  if (tilt === 0 || given.theory === "terzaghi" || given.theory === "meyerhof")
    return { c: 1, q: 1, gamma: 1 };
  if (undrained) return { c: 1 - (2 * tilt) / (Math.PI + 2), q: 1, gamma: 1 };
  const tangent = Math.tan(frictionAngle_deg * degree);
  if (given.theory === "hansen") {
    const q = Math.exp(-2 * tilt * tangent);
    return { c: 1 - given.baseTilt_deg / 147, q, gamma: Math.exp(-2.7 * tilt * tangent) };
  }
  const q = (1 - tilt * tangent) ** 2;
  return { c: tangent > 0 ? q - (1 - q) / (nc * tangent) : 1, q, gamma: q };
}

/** Between the founding level and one breadth below it water takes the weight down in proportion (effective weights). */
function weightBelow(given: BearingCase): number {
  const { unitWeightBelow_kNm3, waterDepth_m, effectiveBreadth_m } = given;
  if (waterDepth_m === null || waterDepth_m >= effectiveBreadth_m) return unitWeightBelow_kNm3;
  const submerged = Math.max(0, unitWeightBelow_kNm3 - WATER_kNm3);
  const share = Math.max(0, waterDepth_m) / effectiveBreadth_m;
  return submerged + share * (unitWeightBelow_kNm3 - submerged);
}

const inputs = z
  .strictObject({
    theory: z
      .enum(theories, { error: `Theory must be one of ${theories.join(", ")}.` })
      .meta({ label: "Theory", unit: "" }),
    drainage: z
      .enum(["drained", "undrained"], { error: "Drainage must be drained or undrained." })
      .meta({ label: "Drainage", unit: "" }),
    effectiveBreadth_m: quantity({ label: "Effective breadth B′", unit: "m", above: 0 }),
    effectiveLength_m: quantity({ label: "Effective length L′", unit: "m", above: 0 }),
    depth_m: quantity({ label: "Founding depth", unit: "m", min: 0 }),
    cohesion_kPa: quantity({ label: "Cohesion c′ or strength cu", unit: "kPa", min: 0 }),
    frictionAngle_deg: quantity({ label: "Angle of friction φ′", unit: "°", min: 0, max: 50 }),
    surcharge_kPa: quantity({ label: "Overburden at founding level", unit: "kPa", min: 0 }),
    unitWeightBelow_kNm3: quantity({ label: "Unit weight below", unit: "kN/m³", min: 0 }),
    vertical_kN: quantity({ label: "Vertical load", unit: "kN", min: 0 }).nullable().default(null),
    horizontal_kN: quantity({ label: "Horizontal load", unit: "kN", min: 0 }).default(0),
    horizontalAlong: z
      .union([
        z.enum(["breadth", "length"]),
        quantity({ label: "Direction of the horizontal load", unit: "°", min: 0, max: 90 }),
      ])
      .default("breadth")
      .meta({ label: "Direction of the horizontal load (degrees from the length axis)", unit: "" }),
    baseTilt_deg: quantity({ label: "Tilt of the base", unit: "°", min: 0, below: 45 }).default(0),
    waterDepth_m: quantity({ label: "Water below founding level", unit: "m" }).nullable().default(null),
  })
  .refine((q) => q.effectiveBreadth_m <= q.effectiveLength_m, {
    message: "The effective breadth is the smaller side: swap the two.",
    path: ["effectiveBreadth_m"],
  })
  .refine((q) => q.horizontal_kN === 0 || q.vertical_kN !== null, {
    message: "A horizontal load needs the vertical load beside it.",
    path: ["vertical_kN"],
  });

export const bearingResistance = defineMethod({
  id: "bearing-resistance",
  version: "1",
  title: "Bearing resistance of a shallow base",
  source: ["terzaghi1943", "meyerhof1963", "hansen1970", "vesic1973", "en1997"],
  limits: [
    "Homogeneous ground to about one breadth below the base, general shear, static load, level ground.",
    "EN 1997-1:2004 Annex D is informative and has no depth factor.",
  ],
  inputs,
  outputs: z.object({
    nc: output("Nc"),
    nq: output("Nq"),
    nGamma: output("Nγ"),
    sc: output("sc"),
    sq: output("sq"),
    sGamma: output("sγ"),
    dc: output("dc"),
    dq: output("dq"),
    dGamma: output("dγ"),
    ic: output("ic"),
    iq: output("iq"),
    iGamma: output("iγ"),
    bc: output("bc"),
    bq: output("bq"),
    bGamma: output("bγ"),
    unitWeight_kNm3: output("Unit weight used", "kN/m³"),
    fromCohesion_kPa: output("From cohesion", "kPa"),
    fromSurcharge_kPa: output("From overburden", "kPa"),
    fromWeight_kPa: output("From weight below", "kPa"),
    ultimate_kPa: output("Ultimate bearing pressure, gross", "kPa"),
    netUltimate_kPa: output("Ultimate bearing pressure, net", "kPa"),
  }),
  compute: bearingResistanceOf,
});
