import { checkFooting } from "@/lib/check/check-footing";
import type { FootingCheckInput } from "@/lib/check/input";
import { containsPoint } from "@/lib/geometry/polygon";
import { groundLevel_m, layers, type SeedZone, wobble, zones } from "./site";

const round = (value: number, step: number) => Math.round(Math.round(value / step) * step * 1000) / 1000;

export type SeedFooting = {
  mark: string;
  gridReference: string;
  zone: SeedZone | null;
  fields: {
    easting_m: number;
    northing_m: number;
    orientation_deg: number;
    breadth_m: number;
    length_m: number;
    thickness_m: number;
    groundLevel_m: number;
    foundingLevel_m: number;
    loadHeight_m: number;
  };
  combinations: FootingCheckInput["loads"];
};

/** A hundred and twenty pads on a column grid of twelve by ten, each sized for the first issue of its value. */
export function footings(criteria: FootingCheckInput["criteria"]): SeedFooting[] {
  const made: SeedFooting[] = [];
  for (let row = 0; row < 10; row += 1)
    for (let column = 0; column < 12; column += 1) {
      const seed = row * 12 + column + 1;
      const easting_m = round(15 + column * 18.6, 0.005);
      const northing_m = round(16 + row * 14.4, 0.005);
      const zone =
        zones.find((candidate) => containsPoint(candidate.ring_m, [easting_m, northing_m])) ?? null;
      made.push(padAt(seed, `${"ABCDEFGHJKLM"[column]}/${row + 1}`, easting_m, northing_m, zone, criteria));
    }
  return made;
}

function padAt(
  seed: number,
  gridReference: string,
  easting_m: number,
  northing_m: number,
  zone: SeedZone | null,
  criteria: FootingCheckInput["criteria"],
): SeedFooting {
  const ground_m = round(groundLevel_m(easting_m, northing_m), 0.05);
  const { fill_m, alluvium_m, gravel_m } = layers(easting_m, northing_m);
  const top_m = zone?.unit === "4" ? fill_m + alluvium_m + gravel_m : fill_m + alluvium_m;
  const depth_m = round(Math.max(1.25, top_m + 0.3), 0.05);
  const combinations = loadsOf(seed);
  const thickness_m = round(0.5 + 0.25 * wobble(seed + 400), 0.05);
  const target = 0.66 + 0.3 * wobble(seed + 900);
  const oblong = seed % 5 === 0 ? 1.3 : 1;
  const fields = (breadth_m: number) => ({
    easting_m,
    northing_m,
    orientation_deg: seed % 17 === 0 ? 15 : 0,
    breadth_m,
    length_m: round(breadth_m * oblong, 0.05),
    thickness_m,
    groundLevel_m: ground_m,
    foundingLevel_m: round(ground_m - depth_m, 0.005),
    loadHeight_m: thickness_m,
  });
  let breadth_m = 1.2;
  if (zone)
    // The smallest pad in steps of 100 mm that stays below its own target, as a designer would have drawn it.
    for (; breadth_m < 5; breadth_m = round(breadth_m + 0.1, 0.05)) {
      const { utilisation } = checkFooting({
        footing: { ...fields(breadth_m), concreteUnitWeight_kNm3: 24, backfillUnitWeight_kNm3: 18 },
        loads: combinations,
        value: {
          kind: "single",
          netAllowable_kPa: zone.value.net_kPa,
          comparedWith: "maximum",
          soilUnitWeight_kNm3: 18,
          groundwaterLevel_m: zone.value.water_m,
          minFoundingDepth_m: null,
          minBreadth_m: null,
          maxBreadth_m: null,
          durationFactors: { transient: 1, accidental: 1 },
        },
        criteria,
      });
      if (utilisation !== null && utilisation <= target) break;
    }
  return { mark: `F${seed}`, gridReference, zone, fields: fields(breadth_m), combinations };
}

/** Six service combinations of one column: dead, dead with live, and wind four ways; every eleventh column is braced. */
function loadsOf(seed: number): FootingCheckInput["loads"] {
  const dead_kN = Math.round(190 + 330 * wobble(seed));
  const live_kN = Math.round(90 + 220 * wobble(seed + 200));
  const braced = seed % 11 === 0 ? 2.1 : 1;
  const wind_kN = Math.round((7 + 9 * wobble(seed + 300)) * braced);
  const height_m = 1.35;
  const combination = (
    name: string,
    duration: "permanent" | "transient",
    vertical_kN: number,
    alongB_kN: number,
    alongL_kN: number,
  ) => ({
    name,
    duration,
    vertical_kN: Math.round(vertical_kN),
    momentB_kNm: Math.round(alongB_kN * height_m * 10) / 10,
    momentL_kNm: Math.round(alongL_kN * height_m * 10) / 10,
    horizontalB_kN: alongB_kN,
    horizontalL_kN: alongL_kN,
  });
  return [
    combination("G", "permanent", dead_kN, 0, 0),
    combination("G + Q", "permanent", dead_kN + live_kN, 2, 0),
    combination("G + Q + W(+B)", "transient", dead_kN + 0.7 * live_kN, wind_kN, 0),
    combination("G + Q + W(−B)", "transient", dead_kN + 0.7 * live_kN, -wind_kN, 0),
    combination("G + Q + W(+L)", "transient", dead_kN + 0.7 * live_kN, 0, Math.round(0.8 * wind_kN)),
    combination(
      "G + W(skew)",
      "transient",
      0.9 * dead_kN,
      Math.round(0.7 * wind_kN),
      Math.round(0.6 * wind_kN),
    ),
  ];
}
