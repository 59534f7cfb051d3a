import { groundLevel_m, layers, type Place, wobble } from "./site";

const level = (value: number) => Math.round(value * 100) / 100;
const tenth = (value: number) => Math.round(value * 20) / 20;

/** The log of one hole, read off the same ground that the values are drawn from; N grows with depth and scatters. */
export function logOf(place: Place, unitIds: ReadonlyMap<string, string>) {
  const { easting_m, northing_m, depth_m } = place;
  const ground_m = level(groundLevel_m(easting_m, northing_m));
  const { fill_m, alluvium_m, gravel_m, clay_m } = layers(easting_m, northing_m);
  const pick = (seed: number, ...words: string[]) => words[Math.floor(wobble(seed) * words.length)] as string;
  const parts = [
    {
      unit: "1",
      thick_m: fill_m,
      legendCode: "102",
      text: `MADE GROUND: ${pick(easting_m, "dark grey ashy sandy gravel of brick and concrete", "brown clayey gravelly sand with brick and slag", "grey sandy gravel of brick with pockets of soft clay")}.`,
    },
    {
      unit: "2",
      thick_m: alluvium_m,
      legendCode: "203",
      text: `Soft ${pick(northing_m, "grey", "bluish grey", "dark grey")} slightly organic silty CLAY with thin beds of fibrous peat.`,
    },
    {
      unit: "3",
      thick_m: gravel_m,
      legendCode: "507",
      text: `${pick(easting_m + 3, "Medium dense", "Medium dense becoming dense", "Dense")} ${pick(northing_m + 2, "orange brown", "brown")} sandy fine to coarse subrounded flint and quartzite GRAVEL.`,
    },
    {
      unit: "4",
      thick_m: clay_m,
      legendCode: "201",
      text: `${pick(easting_m + 9, "Stiff", "Stiff becoming very stiff", "Firm to stiff becoming stiff")} closely fissured ${pick(northing_m + 5, "brown mottled grey", "dark grey")} CLAY with occasional shell fragments.`,
    },
    {
      unit: "5",
      thick_m: 50,
      legendCode: "801",
      text: "Extremely weak dark grey thinly laminated MUDSTONE, distinctly weathered. Recovered as very stiff gravelly clay.",
    },
  ];
  const strata = [];
  let top_m = 0;
  for (const part of parts) {
    const base_m = Math.min(depth_m, tenth(top_m + part.thick_m));
    if (part.thick_m < 0.15 || base_m - top_m < 0.1) continue;
    strata.push({
      top_m,
      base_m,
      description: part.text,
      legendCode: part.legendCode,
      groundUnitId: unitIds.get(part.unit) ?? null,
      unit: part.unit,
    });
    top_m = base_m;
    if (top_m >= depth_m) break;
  }
  const last = strata.at(-1);
  if (last) last.base_m = depth_m;
  const spts = [];
  if (place.kind.startsWith("CP"))
    for (let at = 1.5; at < depth_m - 0.4; at += at < 6 ? 1 : 1.5) {
      const unit = strata.find((s) => s.top_m <= at && at < s.base_m)?.unit ?? "5";
      const scatter = wobble(at * 7 + easting_m);
      if (unit === "5") {
        const penetration_mm = 120 + Math.round(scatter * 14) * 10;
        spts.push({
          depth_m: at,
          refusal: true,
          blowCount: null,
          mainBlows: 50,
          mainPenetration_mm: penetration_mm,
          reportText: `N=50 (12,13/50 for ${penetration_mm}mm)`,
        });
      } else {
        const mean = { 1: 7, 2: 4, 3: 24 + at * 1.8, 4: 11 + at * 1.7 }[Number(unit)] ?? 10;
        const blowCount = Math.max(2, Math.round(mean * (0.82 + 0.36 * scatter)));
        spts.push({
          depth_m: at,
          refusal: false,
          blowCount,
          mainBlows: null,
          mainPenetration_mm: null,
          reportText: `N=${blowCount}`,
        });
      }
    }
  const water_m = tenth(Math.max(1.2, ground_m - (8.5 + 0.3 * wobble(easting_m))));
  const strikes =
    place.kind === "TP" || water_m >= depth_m - 0.3
      ? []
      : [
          {
            depth_m: water_m,
            remarks:
              gravel_m > 0.4
                ? "Fast inflow; rose 0.3 m in 20 minutes."
                : "Slow seepage; no rise in 20 minutes.",
          },
        ];
  return {
    name: place.name,
    kind: place.kind,
    status: "FINAL",
    easting_m,
    northing_m,
    groundLevel_m: ground_m,
    finalDepth_m: depth_m,
    startedOn: place.day,
    endedOn: place.day,
    loggedBy: "I. Quill",
    remarks: place.kind === "TP" ? "Sides stood for the time of logging. No groundwater met." : "",
    strata: strata.map(({ unit, ...stratum }) => stratum),
    spts,
    strikes,
  };
}
