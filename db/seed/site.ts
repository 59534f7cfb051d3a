/** The demonstration's ground: an invented riverside site, drawn so that levels, logs and values agree with each other. */

export const project = {
  number: "HG-014",
  title: "Millrace Yard, print works and store",
  client: "Millrace Yard Building Trust",
  gridName: "Millrace Yard site grid 2025",
  datumName: "Site datum, +0.00 = 4.350 m above national datum",
  structuralZero_m: 12.6,
  unitSystem: "si" as const,
  reportingStandard: "EN 1997-1:2004 with national annex",
};

export const units = [
  {
    code: "1",
    name: "Made ground",
    soil: "made-ground" as const,
    description: "Brick, ash and clayey gravel fill of several ages.",
  },
  {
    code: "2",
    name: "Alluvium",
    soil: "clay" as const,
    description: "Soft grey CLAY with thin peat, west of the old mill race.",
  },
  {
    code: "3",
    name: "Terrace gravel",
    soil: "gravel" as const,
    description: "Medium dense to dense sandy fine to coarse GRAVEL.",
  },
  { code: "4", name: "Stiff clay", soil: "clay" as const, description: "Stiff to very stiff fissured CLAY." },
  {
    code: "5",
    name: "Weathered mudstone",
    soil: "mudstone" as const,
    description: "Extremely weak to very weak MUDSTONE.",
  },
];

/** Level of the ground (m on the site datum): a fall of 1.4 m from the road in the east to the river in the west. */
export const groundLevel_m = (easting_m: number, northing_m: number): number =>
  11.6 + (easting_m / 240) * 1.4 + 0.15 * Math.sin(northing_m / 31);

/** Thickness of each layer at a place, from the surface down; zero where the layer is absent. */
export function layers(easting_m: number, northing_m: number) {
  const east = easting_m / 240;
  const fill_m = 0.9 + 0.7 * Math.abs(Math.sin(easting_m / 37 + northing_m / 53));
  const alluvium_m = Math.max(0, 2.6 * (0.3 - east) * 3);
  const gravel_m =
    northing_m > 62
      ? 2.6 + 1.8 * Math.sin(Math.PI * Math.min(1, east + 0.25))
      : Math.max(0, (northing_m - 46) * 0.09);
  const clay_m = 5.2 + 1.6 * Math.cos(easting_m / 71);
  return { fill_m, alluvium_m, gravel_m, clay_m };
}

export type Place = {
  name: string;
  kind: string;
  easting_m: number;
  northing_m: number;
  depth_m: number;
  day: string;
};

/** Twenty holes: cable percussion boreholes, some with rotary follow-on, trial pits and two window samples. */
export const holes: Place[] = [
  { name: "BH01", kind: "CP", easting_m: 18, northing_m: 128, depth_m: 12, day: "2025-02-10" },
  { name: "BH02", kind: "CP+RC", easting_m: 62, northing_m: 141, depth_m: 16, day: "2025-02-11" },
  { name: "BH03", kind: "CP", easting_m: 104, northing_m: 132, depth_m: 12, day: "2025-02-12" },
  { name: "BH04", kind: "CP", easting_m: 151, northing_m: 138, depth_m: 12, day: "2025-02-13" },
  { name: "BH05", kind: "CP+RC", easting_m: 205, northing_m: 129, depth_m: 17, day: "2025-02-17" },
  { name: "BH06", kind: "CP", easting_m: 27, northing_m: 84, depth_m: 12, day: "2025-02-18" },
  { name: "BH07", kind: "CP", easting_m: 88, northing_m: 92, depth_m: 12, day: "2025-02-19" },
  { name: "BH08", kind: "CP+RC", easting_m: 133, northing_m: 87, depth_m: 16.5, day: "2025-02-20" },
  { name: "BH09", kind: "CP", easting_m: 192, northing_m: 91, depth_m: 12, day: "2025-02-24" },
  { name: "BH10", kind: "CP", easting_m: 21, northing_m: 33, depth_m: 12, day: "2025-02-25" },
  { name: "BH11", kind: "CP", easting_m: 74, northing_m: 28, depth_m: 12, day: "2025-02-26" },
  { name: "BH12", kind: "CP+RC", easting_m: 128, northing_m: 36, depth_m: 16, day: "2025-02-27" },
  { name: "BH13", kind: "CP", easting_m: 171, northing_m: 24, depth_m: 12, day: "2025-09-15" },
  { name: "BH14", kind: "CP", easting_m: 219, northing_m: 38, depth_m: 12, day: "2025-09-16" },
  { name: "TP01", kind: "TP", easting_m: 47, northing_m: 109, depth_m: 3.4, day: "2025-02-06" },
  { name: "TP02", kind: "TP", easting_m: 118, northing_m: 112, depth_m: 3.6, day: "2025-02-06" },
  { name: "TP03", kind: "TP", easting_m: 178, northing_m: 113, depth_m: 3.5, day: "2025-02-07" },
  { name: "TP04", kind: "TP", easting_m: 98, northing_m: 58, depth_m: 3.2, day: "2025-02-07" },
  { name: "WS01", kind: "WS", easting_m: 12, northing_m: 58, depth_m: 5, day: "2025-09-17" },
  { name: "WS02", kind: "WS", easting_m: 231, northing_m: 70, depth_m: 5, day: "2025-09-17" },
];

export type SeedZone = {
  name: string;
  unit: string;
  boundary: "proved" | "interpolated" | "inferred";
  ring_m: [number, number][];
  value: {
    reference: string;
    net_kPa: number;
    highest_m: number;
    lowest_m: number;
    minBreadth_m: number;
    maxBreadth_m: number;
    cover_m: number;
    drainage: "drained" | "undrained";
    governedBy: "strength" | "settlement";
    water_m: number | null;
    preliminary?: boolean;
    clause: string;
    page: number;
    holes: string[];
  };
};

/** Six zones that meet along shared edges. */
export const zones: SeedZone[] = [
  {
    name: "Zone A",
    unit: "3",
    boundary: "interpolated",
    ring_m: [
      [0, 66],
      [82, 68],
      [80, 156],
      [0, 156],
    ],
    value: {
      reference: "BV-01",
      net_kPa: 210,
      highest_m: 10.9,
      lowest_m: 8,
      minBreadth_m: 1,
      maxBreadth_m: 3.5,
      cover_m: 1,
      drainage: "drained",
      governedBy: "settlement",
      water_m: 8.6,
      clause: "8.3.1",
      page: 4,
      holes: ["BH01", "BH02", "BH06", "TP01"],
    },
  },
  {
    name: "Zone B",
    unit: "3",
    boundary: "proved",
    ring_m: [
      [82, 68],
      [162, 64],
      [160, 156],
      [80, 156],
    ],
    value: {
      reference: "BV-02",
      net_kPa: 260,
      highest_m: 11.2,
      lowest_m: 8.6,
      minBreadth_m: 1,
      maxBreadth_m: 3.5,
      cover_m: 1,
      drainage: "drained",
      governedBy: "settlement",
      water_m: 8.8,
      clause: "8.3.2",
      page: 4,
      holes: ["BH03", "BH04", "BH07", "BH08", "TP02"],
    },
  },
  {
    name: "Zone C",
    unit: "3",
    boundary: "interpolated",
    ring_m: [
      [162, 64],
      [240, 66],
      [240, 156],
      [160, 156],
    ],
    value: {
      reference: "BV-03",
      net_kPa: 300,
      highest_m: 11.7,
      lowest_m: 9,
      minBreadth_m: 1,
      maxBreadth_m: 3,
      cover_m: 1,
      drainage: "drained",
      governedBy: "settlement",
      water_m: 8.9,
      clause: "8.3.3",
      page: 4,
      holes: ["BH05", "BH09", "TP03"],
    },
  },
  {
    name: "Zone D",
    unit: "4",
    boundary: "inferred",
    ring_m: [
      [0, 4],
      [52, 4],
      [54, 66.7],
      [0, 66],
    ],
    value: {
      reference: "BV-04",
      net_kPa: 100,
      highest_m: 9.7,
      lowest_m: 6.8,
      minBreadth_m: 1,
      maxBreadth_m: 3.5,
      cover_m: 1.2,
      drainage: "undrained",
      governedBy: "settlement",
      water_m: 9,
      preliminary: true,
      clause: "8.4.1",
      page: 5,
      holes: ["BH10", "WS01"],
    },
  },
  {
    name: "Zone E",
    unit: "4",
    boundary: "interpolated",
    ring_m: [
      [52, 4],
      [148, 4],
      [148, 64.7],
      [82, 68],
      [54, 66.7],
    ],
    value: {
      reference: "BV-05",
      net_kPa: 150,
      highest_m: 11.2,
      lowest_m: 7.4,
      minBreadth_m: 1,
      maxBreadth_m: 4,
      cover_m: 1.2,
      drainage: "undrained",
      governedBy: "strength",
      water_m: 9.2,
      clause: "8.4.2",
      page: 5,
      holes: ["BH11", "BH12", "TP04"],
    },
  },
  {
    name: "Zone F",
    unit: "4",
    boundary: "interpolated",
    ring_m: [
      [148, 4],
      [240, 4],
      [240, 66],
      [162, 64],
      [148, 64.7],
    ],
    value: {
      reference: "BV-06",
      net_kPa: 165,
      highest_m: 11.8,
      lowest_m: 7.8,
      minBreadth_m: 1,
      maxBreadth_m: 4,
      cover_m: 1.2,
      drainage: "undrained",
      governedBy: "strength",
      water_m: 9.3,
      clause: "8.4.3",
      page: 5,
      holes: ["BH13", "BH14", "WS02"],
    },
  },
];

/** Rises and falls without chance: the same number for the same place on every machine. */
export const wobble = (seed: number): number => {
  const turned = Math.sin(seed * 12.9898 + 78.233) * 43758.5453;
  return turned - Math.floor(turned);
};
