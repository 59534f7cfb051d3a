import { z } from "zod";
import { bearingFactorsOf, type Theory, theories } from "../bearing-factors/index";
import { defineMethod, type MethodFinding, output, quantity } from "../define-method";
import { formula, type Line, line } from "../formula";
import { depthFactors, inclinationFactors, type Situation, shapeFactors, type Triple } from "./factors";

const degree = Math.PI / 180;
const WATER_kNm3 = 9.81;

export const fromCohesion = formula({
  symbol: "q_c",
  unit: "kPa",
  ref: "terzaghi1943",
  shown: "c N_c k_c",
  symbols: { c: "cohesion_kPa", N_c: "nc", k_c: "share" },
  of: (q: { cohesion_kPa: number; nc: number; share: number }) => q.cohesion_kPa * q.nc * q.share,
});

export const fromSurcharge = formula({
  symbol: "q_q",
  unit: "kPa",
  ref: "terzaghi1943",
  shown: "σ0 N_q k_q",
  symbols: { σ0: "surcharge_kPa", N_q: "nq", k_q: "share" },
  of: (q: { surcharge_kPa: number; nq: number; share: number }) => q.surcharge_kPa * q.nq * q.share,
});

export const fromWeight = formula({
  symbol: "q_γ",
  unit: "kPa",
  ref: "terzaghi1943",
  shown: "0.5 γ B′ N_γ k_γ",
  symbols: { γ: "unitWeight_kNm3", "B′": "breadth_m", N_γ: "nGamma", k_γ: "share" },
  of: (q: { unitWeight_kNm3: number; breadth_m: number; nGamma: number; share: number }) =>
    0.5 * q.unitWeight_kNm3 * q.breadth_m * q.nGamma * q.share,
});

/** Gross: overburden is in it. Each k is the product of shape, depth, inclination and base factors of one author. */
export const ultimatePressure = formula({
  symbol: "q_ult",
  unit: "kPa",
  ref: "terzaghi1943",
  shown: "q_c + q_q + q_γ",
  symbols: { q_c: "fromCohesion_kPa", q_q: "fromSurcharge_kPa", q_γ: "fromWeight_kPa" },
  of: (q: { fromCohesion_kPa: number; fromSurcharge_kPa: number; fromWeight_kPa: number }) =>
    q.fromCohesion_kPa + q.fromSurcharge_kPa + q.fromWeight_kPa,
});

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
  const c = cohesionShare(given.theory, undrained, s, d, i, b);
  const q = s.q * d.q * i.q * b.q;
  const gamma = s.gamma * d.gamma * i.gamma * b.gamma;
  const fromCohesion_kPa = fromCohesion.of({ cohesion_kPa: given.cohesion_kPa, nc, share: c });
  const fromSurcharge_kPa = fromSurcharge.of({ surcharge_kPa: given.surcharge_kPa, nq, share: q });
  const fromWeight_kPa = fromWeight.of({
    unitWeight_kNm3,
    breadth_m: given.effectiveBreadth_m,
    nGamma,
    share: gamma,
  });
  const ultimate_kPa = ultimatePressure.of({ fromCohesion_kPa, fromSurcharge_kPa, fromWeight_kPa });
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
    shareC: c,
    shareQ: q,
    shareGamma: gamma,
    unitWeight_kNm3,
    fromCohesion_kPa,
    fromSurcharge_kPa,
    fromWeight_kPa,
    ultimate_kPa,
    netUltimate_kPa: ultimate_kPa - given.surcharge_kPa,
  };
}

/** All factors on the cohesion term. Hansen adds his undrained corrections where the others multiply. */
function cohesionShare(
  theory: Theory,
  undrained: boolean,
  s: Triple,
  d: Triple,
  i: Triple,
  b: Triple,
): number {
  if (undrained && theory === "hansen") return Math.max(0, s.c + d.c + i.c + b.c - 3);
  return s.c * d.c * i.c * b.c;
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
    "Hansen's depth factor, also in Vesić's set, steps down at D/B = 1, where the source goes over to the arctangent.",
    "A horizontal load given as an angle is measured from the longer side.",
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
    shareC: output("All factors on cohesion k_c"),
    shareQ: output("All factors on overburden k_q"),
    shareGamma: output("All factors on weight k_γ"),
    unitWeight_kNm3: output("Unit weight used", "kN/m³"),
    fromCohesion_kPa: output("From cohesion", "kPa"),
    fromSurcharge_kPa: output("From overburden", "kPa"),
    fromWeight_kPa: output("From weight below", "kPa"),
    ultimate_kPa: output("Ultimate bearing pressure, gross", "kPa"),
    netUltimate_kPa: output("Ultimate bearing pressure, net", "kPa"),
  }),
  compute: bearingResistanceOf,
  lines: resistanceLines,
  findings: resistanceFindings,
});

export type BearingResistance = ReturnType<typeof bearingResistanceOf>;

/** The steps of a resistance, for the sheet. */
export function resistanceLines(given: BearingCase, r: BearingResistance): Line[] {
  return [
    line(fromCohesion, { cohesion_kPa: given.cohesion_kPa, nc: r.nc, share: r.shareC }),
    line(fromSurcharge, { surcharge_kPa: given.surcharge_kPa, nq: r.nq, share: r.shareQ }),
    line(fromWeight, {
      unitWeight_kNm3: r.unitWeight_kNm3,
      breadth_m: given.effectiveBreadth_m,
      nGamma: r.nGamma,
      share: r.shareGamma,
    }),
    line(ultimatePressure, r),
  ];
}

function resistanceFindings(given: BearingCase, r: BearingResistance): MethodFinding[] {
  const found: MethodFinding[] = [];
  const { theory, horizontal_kN, drainage } = given;
  if (theory === "terzaghi" && horizontal_kN > 0)
    found.push({
      code: "no-inclination",
      severity: "outside",
      message: "Terzaghi gives no inclination factors: the horizontal load is not in this resistance.",
    });
  if ((theory === "terzaghi" || theory === "meyerhof") && given.baseTilt_deg > 0)
    found.push({
      code: "no-tilt",
      severity: "outside",
      message: "This theory gives no factors for a tilted base: the tilt is not in this resistance.",
    });
  if (horizontal_kN > 0 && theory !== "terzaghi" && (r.ic === 0 || (drainage === "drained" && r.iq === 0)))
    found.push({
      code: "sliding-governs",
      severity: "outside",
      message: "The horizontal load is more than the base can hold: it slides before it bears.",
    });
  if (drainage === "drained" && given.frictionAngle_deg > 45)
    found.push({
      code: "high-friction",
      severity: "warning",
      message: "Above 45° the factors grow so fast that the angle has to be proved for this stress.",
    });
  if (drainage === "undrained" && given.frictionAngle_deg > 0)
    found.push({
      code: "friction-not-used",
      severity: "note",
      message: "Undrained resistance counts no friction: the angle given was not used.",
    });
  if (
    (theory === "hansen" || theory === "vesic" || theory === "meyerhof") &&
    given.depth_m > 2.5 * given.effectiveBreadth_m
  )
    found.push({
      code: "deep",
      severity: "warning",
      message: "The depth is more than 2.5 times the breadth: these are factors for shallow bases.",
    });
  return found;
}
