/** One pound per square foot in kPa. */
const PSF = 0.04788025898;

export type Presumed = { soilClass: string; label: string; min_kPa: number | null; max_kPa: number | null };

/** IBC 2012, Table 1806.2, printed in psf, by the table's own class numbers; read in a secondary copy. */
export const ibc: readonly Presumed[] = (
  [
    ["1", "Crystalline bedrock", 12000],
    ["2", "Sedimentary and foliated rock", 4000],
    ["3", "Sandy gravel and gravel (GW, GP)", 3000],
    ["4", "Sand, silty sand, clayey sand, silty gravel, clayey gravel (SW, SP, SM, SC, GM, GC)", 2000],
    ["5", "Clay, sandy clay, silty clay, clayey silt, silt, sandy silt (CL, ML, MH, CH)", 1500],
  ] as const
).map(([soilClass, label, psf]) => ({ soilClass, label, min_kPa: psf * PSF, max_kPa: psf * PSF }));

/** BS 8004:1986, Table 1: ranges, open where the table says more than or less than. Rocks from memory. */
export const bs8004: readonly Presumed[] = (
  [
    ["igneous-rock", "Strong igneous and gneissic rock, sound", 10000, 10000],
    ["limestone", "Strong limestone or strong sandstone", 4000, 4000],
    ["schist", "Schist and slate", 3000, 3000],
    ["mudstone", "Strong shale, mudstone, siltstone", 2000, 2000],
    ["dense-gravel", "Dense gravel or dense sand and gravel", 600, null],
    ["medium-dense-gravel", "Medium dense gravel or sand and gravel", 200, 600],
    ["loose-gravel", "Loose gravel or loose sand and gravel", null, 200],
    ["compact-sand", "Compact sand", 300, null],
    ["medium-dense-sand", "Medium dense sand", 100, 300],
    ["loose-sand", "Loose sand", null, 100],
    ["hard-clay", "Very stiff boulder clay, hard clay", 300, 600],
    ["stiff-clay", "Stiff clay", 150, 300],
    ["firm-clay", "Firm clay", 75, 150],
    ["soft-clay", "Soft clay and silt", null, 75],
  ] as const
).map(([soilClass, label, min_kPa, max_kPa]) => ({ soilClass, label, min_kPa, max_kPa }));
