import { basePressureLines } from "@/lib/methods/base-pressure/index";
import { effectiveSide } from "@/lib/methods/effective-area/index";
import { type Line, line } from "@/lib/methods/formula";
import { holdingMoment, overturningFactor } from "@/lib/methods/overturning/index";
import { slidingApplied, slidingFactor, slidingResistance } from "@/lib/methods/sliding/index";
import { upliftFactor } from "@/lib/methods/uplift/index";
import { allowableLines } from "./allowable";
import {
  backfillWeight,
  baseMoment,
  baseVertical,
  bearingDemand,
  bearingUtilisation,
  buoyancy,
  contactArea,
  effectiveOverburden,
  effectivePressure,
  foundingDepth,
  padWeight,
  requiredNet,
  stabilisingLoad,
  upliftLoad,
} from "./formulas";
import type { CheckedLoad, CombinationResult, FootingCheckInput, FootingCheckResult } from "./input";

export type Explained = { common: Line[]; combinations: { name: string; lines: Line[] }[] };

/** Every step of a check with its numbers put in, from the same formulas that computed it; for the sheet. */
export function explainCheck(input: FootingCheckInput, result: FootingCheckResult): Explained {
  const { footing, value, loads } = input;
  const { depth_m, waterHead_m } = result;
  const { breadth_m, length_m } = footing;
  const common = [
    line(foundingDepth, footing),
    line(padWeight, footing),
    line(backfillWeight, { ...footing, depth_m }),
    line(buoyancy, { waterHead_m, breadth_m, length_m }),
    line(effectiveOverburden, { soilUnitWeight_kNm3: value.soilUnitWeight_kNm3, depth_m, waterHead_m }),
  ];
  const combinations = loads.map((load, at) => {
    const figures = result.combinations[at];
    return { name: load.name, lines: figures ? combinationLines(input, result, load, figures) : [] };
  });
  return { common, combinations };
}

/** A line of one axis: the same formula, said for B or for L. */
const named = (symbol: string, step: Line): Line => ({ ...step, symbol });

function combinationLines(
  input: FootingCheckInput,
  result: FootingCheckResult,
  load: CheckedLoad,
  figures: CombinationResult,
): Line[] {
  const { breadth_m, length_m, loadHeight_m } = input.footing;
  const { padWeight_kN, backfillWeight_kN, buoyancy_kN } = result;
  const { baseVertical_kN: vertical_kN, momentB_kNm, momentL_kNm } = figures;
  return [
    line(baseVertical, { vertical_kN: load.vertical_kN, padWeight_kN, backfillWeight_kN, buoyancy_kN }),
    named(
      "M_B",
      line(baseMoment, { moment_kNm: load.momentB_kNm, horizontal_kN: load.horizontalB_kN, loadHeight_m }),
    ),
    named(
      "M_L",
      line(baseMoment, { moment_kNm: load.momentL_kNm, horizontal_kN: load.horizontalL_kN, loadHeight_m }),
    ),
    ...basePressureLines({ breadth_m, length_m, vertical_kN, momentB_kNm, momentL_kNm }),
    ...bearingLines(input, result, load, figures),
    ...stabilityLines(input, result, load, figures),
  ];
}

function bearingLines(
  { footing, value }: FootingCheckInput,
  result: FootingCheckResult,
  load: CheckedLoad,
  figures: CombinationResult,
): Line[] {
  if (!figures.equilibrium) return [];
  const { effectiveBreadth_m, effectiveLength_m, demandNet_kPa, netAllowable_kPa, durationFactor } = figures;
  const lines: Line[] = [];
  if (value.comparedWith === "effective-area" || value.kind === "parameters")
    lines.push(
      line(effectiveSide, {
        side_m: footing.breadth_m,
        eccentricity_m: Math.abs(figures.eccentricityB_m ?? 0),
      }),
      named(
        "L′",
        line(effectiveSide, {
          side_m: footing.length_m,
          eccentricity_m: Math.abs(figures.eccentricityL_m ?? 0),
        }),
      ),
    );
  if (value.comparedWith === "effective-area")
    lines.push(
      line(effectivePressure, {
        vertical_kN: figures.baseVertical_kN,
        effectiveBreadth_m,
        effectiveLength_m,
      }),
    );
  lines.push(
    ...allowableLines(value, footing, {
      effectiveBreadth_m,
      effectiveLength_m,
      vertical_kN: figures.baseVertical_kN,
      horizontalB_kN: load.horizontalB_kN,
      horizontalL_kN: load.horizontalL_kN,
      depth_m: result.depth_m,
      overburden_kPa: result.overburden_kPa,
    }),
  );
  const pressure_kPa =
    value.comparedWith === "maximum" ? figures.maxPressure_kPa : figures.effectivePressure_kPa;
  if (pressure_kPa === null || demandNet_kPa === null) return lines;
  lines.push(
    line(bearingDemand, { pressure_kPa, overburden_kPa: result.overburden_kPa }),
    line(requiredNet, { demandNet_kPa, durationFactor }),
  );
  if (netAllowable_kPa !== null && netAllowable_kPa > 0 && figures.requiredNet_kPa !== null)
    lines.push(line(bearingUtilisation, { requiredNet_kPa: figures.requiredNet_kPa, netAllowable_kPa }));
  return lines;
}

function stabilityLines(
  { footing, criteria }: FootingCheckInput,
  { padWeight_kN, backfillWeight_kN, buoyancy_kN }: FootingCheckResult,
  load: CheckedLoad,
  figures: CombinationResult,
): Line[] {
  const { breadth_m, length_m } = footing;
  const { contactRatio, contactArea_m2, slidingResistance_kN, slidingApplied_kN } = figures;
  const vertical_kN = Math.max(0, figures.baseVertical_kN);
  const lines: Line[] = [];
  if (slidingApplied_kN > 0) {
    lines.push(
      line(contactArea, { contactRatio, breadth_m, length_m }),
      line(slidingResistance, {
        vertical_kN,
        interfaceAngle_deg: criteria.interfaceAngle_deg,
        adhesion_kPa: criteria.adhesion_kPa,
        contactArea_m2,
        passive_kN: 0,
      }),
      line(slidingApplied, load),
      line(slidingFactor, { resistance_kN: slidingResistance_kN, applied_kN: slidingApplied_kN }),
    );
  }
  for (const [axis, side_m, moment_kNm] of [
    ["B", breadth_m, Math.abs(figures.momentB_kNm)],
    ["L", length_m, Math.abs(figures.momentL_kNm)],
  ] as const) {
    if (moment_kNm === 0) continue;
    const holding = line(holdingMoment, { vertical_kN, side_m });
    lines.push(
      named(`M_stb,${axis}`, holding),
      named(`F_${axis}`, line(overturningFactor, { holding_kNm: holding.value, moment_kNm })),
    );
  }
  if (figures.uplift_kN > 0)
    lines.push(
      line(stabilisingLoad, { vertical_kN: load.vertical_kN, padWeight_kN, backfillWeight_kN }),
      line(upliftLoad, { buoyancy_kN, vertical_kN: load.vertical_kN }),
      line(upliftFactor, { stabilising_kN: figures.stabilising_kN, uplift_kN: figures.uplift_kN }),
    );
  return lines;
}
