import { formula } from "@/lib/methods/formula";

/** Unit weight of water (kN/m³). */
export const WATER_kNm3 = 9.81;

export const foundingDepth = formula({
  symbol: "D",
  unit: "m",
  ref: "statics",
  shown: "GL − FL",
  symbols: { GL: "groundLevel_m", FL: "foundingLevel_m" },
  of: (q: { groundLevel_m: number; foundingLevel_m: number }) => q.groundLevel_m - q.foundingLevel_m,
});

export const padWeight = formula({
  symbol: "W_pad",
  unit: "kN",
  ref: "statics",
  shown: "B L t γ_c",
  symbols: { B: "breadth_m", L: "length_m", t: "thickness_m", γ_c: "concreteUnitWeight_kNm3" },
  of: (q: { breadth_m: number; length_m: number; thickness_m: number; concreteUnitWeight_kNm3: number }) =>
    q.breadth_m * q.length_m * q.thickness_m * q.concreteUnitWeight_kNm3,
});

/** Soil on the pad; the column's own area is neglected. */
export const backfillWeight = formula({
  symbol: "W_fill",
  unit: "kN",
  ref: "statics",
  shown: "B L max(0, D − t) γ_b",
  symbols: { B: "breadth_m", L: "length_m", D: "depth_m", t: "thickness_m", γ_b: "backfillUnitWeight_kNm3" },
  of: (q: {
    breadth_m: number;
    length_m: number;
    depth_m: number;
    thickness_m: number;
    backfillUnitWeight_kNm3: number;
  }) => q.breadth_m * q.length_m * Math.max(0, q.depth_m - q.thickness_m) * q.backfillUnitWeight_kNm3,
});

export const buoyancy = formula({
  symbol: "U",
  unit: "kN",
  ref: "statics",
  shown: "9.81 h B L",
  symbols: { h: "waterHead_m", B: "breadth_m", L: "length_m" },
  of: (q: { waterHead_m: number; breadth_m: number; length_m: number }) =>
    WATER_kNm3 * q.waterHead_m * q.breadth_m * q.length_m,
});

export const effectiveOverburden = formula({
  symbol: "σ′",
  unit: "kPa",
  ref: "statics",
  shown: "γ D − 9.81 h",
  symbols: { γ: "soilUnitWeight_kNm3", D: "depth_m", h: "waterHead_m" },
  of: (q: { soilUnitWeight_kNm3: number; depth_m: number; waterHead_m: number }) =>
    q.soilUnitWeight_kNm3 * q.depth_m - WATER_kNm3 * q.waterHead_m,
});

export const baseVertical = formula({
  symbol: "V′",
  unit: "kN",
  ref: "statics",
  shown: "N + W_pad + W_fill − U",
  symbols: { N: "vertical_kN", W_pad: "padWeight_kN", W_fill: "backfillWeight_kN", U: "buoyancy_kN" },
  of: (q: { vertical_kN: number; padWeight_kN: number; backfillWeight_kN: number; buoyancy_kN: number }) =>
    q.vertical_kN + q.padWeight_kN + q.backfillWeight_kN - q.buoyancy_kN,
});

export const baseMoment = formula({
  symbol: "M_base",
  unit: "kNm",
  ref: "statics",
  shown: "M + H z",
  symbols: { M: "moment_kNm", H: "horizontal_kN", z: "loadHeight_m" },
  of: (q: { moment_kNm: number; horizontal_kN: number; loadHeight_m: number }) =>
    q.moment_kNm + q.horizontal_kN * q.loadHeight_m,
});

export const bearingDemand = formula({
  symbol: "q_net",
  unit: "kPa",
  ref: "statics",
  shown: "q − σ′",
  symbols: { q: "pressure_kPa", "σ′": "overburden_kPa" },
  of: (q: { pressure_kPa: number; overburden_kPa: number }) => q.pressure_kPa - q.overburden_kPa,
});

export const bearingUtilisation = formula({
  symbol: "u_bearing",
  unit: "",
  ref: "statics",
  shown: "q_net / (q_net,a f)",
  symbols: { q_net: "demandNet_kPa", "q_net,a": "netAllowable_kPa", f: "durationFactor" },
  of: (q: { demandNet_kPa: number; netAllowable_kPa: number; durationFactor: number }) =>
    Math.max(0, q.demandNet_kPa / (q.netAllowable_kPa * q.durationFactor)),
});
