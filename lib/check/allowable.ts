import { allowableOf, grossOverFactor, netOverFactor } from "@/lib/methods/allowable-bearing/index";
import {
  type BearingCase,
  bearingResistanceOf,
  resistanceLines,
} from "@/lib/methods/bearing-resistance/index";
import { type Line, line } from "@/lib/methods/formula";
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

type Situation = {
  effectiveBreadth_m: number;
  effectiveLength_m: number;
  vertical_kN: number;
  horizontalB_kN: number;
  horizontalL_kN: number;
  depth_m: number;
  overburden_kPa: number;
};
type Computed = Extract<CheckedValue, { kind: "parameters" }>;
type Levels = Pick<FootingCheckInput["footing"], "foundingLevel_m">;

/** What a parameters value puts before the bearing-resistance method; null where no area is left to bear on. */
function bearingCase(value: Computed, footing: Levels, situation: Situation): BearingCase | null {
  const { parameters } = value;
  const { effectiveBreadth_m: alongB_m, effectiveLength_m: alongL_m, depth_m } = situation;
  if (!(alongB_m > 0 && alongL_m > 0)) return null;
  // The smaller side leads; the direction of the horizontal load stays with the side it acts along.
  const breadthFirst = alongB_m <= alongL_m;
  const alongLonger_kN = Math.abs(breadthFirst ? situation.horizontalL_kN : situation.horizontalB_kN);
  const alongShorter_kN = Math.abs(breadthFirst ? situation.horizontalB_kN : situation.horizontalL_kN);
  return {
    theory: parameters.theory,
    drainage: parameters.drainage,
    effectiveBreadth_m: Math.min(alongB_m, alongL_m),
    effectiveLength_m: Math.max(alongB_m, alongL_m),
    depth_m,
    cohesion_kPa: parameters.cohesion_kPa,
    frictionAngle_deg: parameters.frictionAngle_deg,
    surcharge_kPa: overburdenFor(value, situation),
    unitWeightBelow_kNm3: parameters.unitWeightBelow_kNm3,
    vertical_kN: situation.vertical_kN,
    horizontal_kN: Math.hypot(situation.horizontalB_kN, situation.horizontalL_kN),
    horizontalAlong: (Math.atan2(alongShorter_kN, alongLonger_kN) * 180) / Math.PI,
    baseTilt_deg: 0,
    waterDepth_m:
      value.groundwaterLevel_m === null ? null : footing.foundingLevel_m - value.groundwaterLevel_m,
  };
}

/** Total where undrained, effective where drained. In total stress the water stands on both sides and cancels. */
const overburdenFor = (value: Computed, situation: Pick<Situation, "depth_m" | "overburden_kPa">): number =>
  Math.max(
    0,
    value.parameters.drainage === "undrained"
      ? value.soilUnitWeight_kNm3 * situation.depth_m
      : situation.overburden_kPa,
  );

const allowableCase = (value: Computed, situation: Situation, grossUltimate_kPa: number) => ({
  grossUltimate_kPa,
  overburden_kPa: overburdenFor(value, situation),
  factorOfSafety: value.parameters.factorOfSafety,
  convention: value.parameters.convention,
});

/** The allowable pressure of a parameters value for one combination, on its effective area and load inclination. */
export function computedAllowable(
  value: Computed,
  footing: Levels,
  situation: Situation,
): { netAllowable_kPa: number; ultimate_kPa: number } | null {
  const given = bearingCase(value, footing, situation);
  if (given === null) return null;
  const { ultimate_kPa } = bearingResistanceOf(given);
  const { netAllowable_kPa } = allowableOf(allowableCase(value, situation, ultimate_kPa));
  return { netAllowable_kPa, ultimate_kPa };
}

/** The steps by which a parameters value comes to its allowable pressure; none for a value that states one. */
export function allowableLines(value: CheckedValue, footing: Levels, situation: Situation): Line[] {
  if (value.kind !== "parameters") return [];
  const given = bearingCase(value, footing, situation);
  if (given === null) return [];
  const resistance = bearingResistanceOf(given);
  const allowed = allowableCase(value, situation, resistance.ultimate_kPa);
  return [
    ...resistanceLines(given, resistance),
    line(allowed.convention === "net-over-factor" ? netOverFactor : grossOverFactor, allowed),
  ];
}
