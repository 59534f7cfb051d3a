import { allowableOf } from "@/lib/methods/allowable-bearing/index";
import { bearingResistanceOf } from "@/lib/methods/bearing-resistance/index";
import { readTable } from "@/lib/methods/value-table/index";
import type { CheckedValue, FootingCheckInput } from "./input";

/** What a value of any kind allows one footing; a limit of the value that the footing is outside of is a sentence. */
export type Allowed = { netAllowable_kPa: number | null; outside: string | null };

/** The allowable pressure that is the same for every combination: single and table values. */
export function statedAllowable(value: CheckedValue, smallerSide_m: number, depth_m: number): Allowed {
  if (value.kind === "single") return { netAllowable_kPa: value.netAllowable_kPa, outside: null };
  if (value.kind === "parameters") return { netAllowable_kPa: null, outside: null };
  const reading = readTable(value.table, { breadth_m: smallerSide_m, depth_m });
  return reading.outside
    ? { netAllowable_kPa: null, outside: reading.limit }
    : { netAllowable_kPa: reading.netAllowable_kPa, outside: null };
}

/** The allowable pressure of a parameters value for one combination, on its effective area and load inclination. */
export function computedAllowable(
  parameters: Extract<CheckedValue, { kind: "parameters" }>["parameters"],
  footing: FootingCheckInput["footing"],
  value: Pick<CheckedValue, "groundwaterLevel_m" | "soilUnitWeight_kNm3">,
  situation: {
    effectiveBreadth_m: number;
    effectiveLength_m: number;
    vertical_kN: number;
    horizontalB_kN: number;
    horizontalL_kN: number;
    depth_m: number;
    overburden_kPa: number;
  },
): number | null {
  const { effectiveBreadth_m: alongB_m, effectiveLength_m: alongL_m, depth_m } = situation;
  if (!(alongB_m > 0 && alongL_m > 0)) return null;
  // The smaller side leads; the direction of the horizontal load stays with the side it acts along.
  const breadthFirst = alongB_m <= alongL_m;
  const alongLonger_kN = Math.abs(breadthFirst ? situation.horizontalL_kN : situation.horizontalB_kN);
  const alongShorter_kN = Math.abs(breadthFirst ? situation.horizontalB_kN : situation.horizontalL_kN);
  const undrained = parameters.drainage === "undrained";
  const total_kPa = value.soilUnitWeight_kNm3 * depth_m;
  const resistance = bearingResistanceOf({
    theory: parameters.theory,
    drainage: parameters.drainage,
    effectiveBreadth_m: Math.min(alongB_m, alongL_m),
    effectiveLength_m: Math.max(alongB_m, alongL_m),
    depth_m,
    cohesion_kPa: parameters.cohesion_kPa,
    frictionAngle_deg: parameters.frictionAngle_deg,
    surcharge_kPa: Math.max(0, undrained ? total_kPa : situation.overburden_kPa),
    unitWeightBelow_kNm3: parameters.unitWeightBelow_kNm3,
    vertical_kN: situation.vertical_kN,
    horizontal_kN: Math.hypot(situation.horizontalB_kN, situation.horizontalL_kN),
    horizontalAlong: (Math.atan2(alongShorter_kN, alongLonger_kN) * 180) / Math.PI,
    baseTilt_deg: 0,
    waterDepth_m:
      value.groundwaterLevel_m === null ? null : footing.foundingLevel_m - value.groundwaterLevel_m,
  });
  // Demand is effective net; in total stress the water's share stands on both sides of the comparison and cancels.
  const { netAllowable_kPa } = allowableOf({
    grossUltimate_kPa: resistance.ultimate_kPa,
    overburden_kPa: Math.max(0, undrained ? total_kPa : situation.overburden_kPa),
    factorOfSafety: parameters.factorOfSafety,
    convention: parameters.convention,
  });
  const cap_kPa = parameters.settlementCap_kPa;
  return cap_kPa === null ? netAllowable_kPa : Math.min(netAllowable_kPa, cap_kPa);
}

/** Head of water above the founding level (m). */
export const waterHead = (groundwaterLevel_m: number | null, foundingLevel_m: number): number =>
  groundwaterLevel_m === null ? 0 : Math.max(0, groundwaterLevel_m - foundingLevel_m);
