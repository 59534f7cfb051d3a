import { basePressureLines } from "@/lib/methods/base-pressure/index";
import { type Line, line } from "@/lib/methods/formula";
import { slidingApplied, slidingResistance } from "@/lib/methods/sliding/index";
import {
  backfillWeight,
  baseMoment,
  baseVertical,
  bearingDemand,
  bearingUtilisation,
  buoyancy,
  effectiveOverburden,
  foundingDepth,
  padWeight,
} from "./formulas";
import type { FootingCheckInput, FootingCheckResult } from "./input";

export type Explained = { common: Line[]; combinations: { name: string; lines: Line[] }[] };

/** Every step of a check with its numbers put in, from the same formulas that computed it; for the sheet. */
export function explainCheck(input: FootingCheckInput, result: FootingCheckResult): Explained {
  const { footing, value, criteria, loads } = input;
  const { depth_m, waterHead_m, padWeight_kN, backfillWeight_kN, buoyancy_kN, overburden_kPa } = result;
  const { breadth_m, length_m, loadHeight_m } = footing;
  const common = [
    line(foundingDepth, footing),
    line(padWeight, footing),
    line(backfillWeight, { ...footing, depth_m }),
    line(buoyancy, { waterHead_m, breadth_m, length_m }),
    line(effectiveOverburden, { soilUnitWeight_kNm3: value.soilUnitWeight_kNm3, depth_m, waterHead_m }),
  ];
  const combinations = loads.map((load, at) => {
    const figures = result.combinations[at];
    if (!figures) return { name: load.name, lines: [] };
    const { baseVertical_kN: vertical_kN, momentB_kNm, momentL_kNm } = figures;
    const lines = [
      line(baseVertical, { vertical_kN: load.vertical_kN, padWeight_kN, backfillWeight_kN, buoyancy_kN }),
      {
        ...line(baseMoment, {
          moment_kNm: load.momentB_kNm,
          horizontal_kN: load.horizontalB_kN,
          loadHeight_m,
        }),
        symbol: "M_B",
      },
      {
        ...line(baseMoment, {
          moment_kNm: load.momentL_kNm,
          horizontal_kN: load.horizontalL_kN,
          loadHeight_m,
        }),
        symbol: "M_L",
      },
      ...basePressureLines({ breadth_m, length_m, vertical_kN, momentB_kNm, momentL_kNm }),
    ];
    const pressure_kPa =
      value.comparedWith === "maximum" ? figures.maxPressure_kPa : figures.effectivePressure_kPa;
    const { demandNet_kPa, netAllowable_kPa, durationFactor } = figures;
    if (pressure_kPa !== null) lines.push(line(bearingDemand, { pressure_kPa, overburden_kPa }));
    if (demandNet_kPa !== null && netAllowable_kPa !== null)
      lines.push(line(bearingUtilisation, { demandNet_kPa, netAllowable_kPa, durationFactor }));
    lines.push(
      line(slidingResistance, {
        vertical_kN: Math.max(0, vertical_kN),
        interfaceAngle_deg: criteria.interfaceAngle_deg,
        adhesion_kPa: criteria.adhesion_kPa,
        contactArea_m2: figures.contactRatio * breadth_m * length_m,
        passive_kN: 0,
      }),
      line(slidingApplied, load),
    );
    return { name: load.name, lines };
  });
  return { common, combinations };
}
