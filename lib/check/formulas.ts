import { formula } from "@/lib/methods/formula";

/** Unit weight of water (kN/m³). */
export const WATER_kNm3 = 9.81;

/** Levels are told in millimetres; beyond a nanometre their difference is binary rounding: 10 − 8.8 is 1.2. */
const betweenLevels = (upper_m: number, lower_m: number): number =>
  Math.round((upper_m - lower_m) * 1e9) / 1e9;

export const foundingDepth = formula({
  symbol: "D",
  unit: "m",
  ref: "statics",
  shown: "GL − FL",
  symbols: { GL: "groundLevel_m", FL: "foundingLevel_m" },
  of: (q: { groundLevel_m: number; foundingLevel_m: number }) =>
    betweenLevels(q.groundLevel_m, q.foundingLevel_m),
});

/** Head of water above the founding level; none where no water is stated. */
export const waterHead = (groundwaterLevel_m: number | null, foundingLevel_m: number): number =>
  groundwaterLevel_m === null ? 0 : Math.max(0, betweenLevels(groundwaterLevel_m, foundingLevel_m));

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

/** The net allowable pressure that the combination asks for: the duration factor is granted by the value or is one. */
export const requiredNet = formula({
  symbol: "q_req",
  unit: "kPa",
  ref: "statics",
  shown: "q_net / f",
  symbols: { q_net: "demandNet_kPa", f: "durationFactor" },
  of: (q: { demandNet_kPa: number; durationFactor: number }) => q.demandNet_kPa / q.durationFactor,
});

export const bearingUtilisation = formula({
  symbol: "u_bearing",
  unit: "",
  ref: "statics",
  shown: "max(0, q_req / q_net,a)",
  symbols: { q_req: "requiredNet_kPa", "q_net,a": "netAllowable_kPa" },
  of: (q: { requiredNet_kPa: number; netAllowable_kPa: number }) =>
    Math.max(0, q.requiredNet_kPa / q.netAllowable_kPa),
});

/** Uniform pressure on the effective area. */
export const effectivePressure = formula({
  symbol: "q_eff",
  unit: "kPa",
  ref: "meyerhof1953",
  shown: "V′ / (B′ L′)",
  symbols: { "V′": "vertical_kN", "B′": "effectiveBreadth_m", "L′": "effectiveLength_m" },
  of: (q: { vertical_kN: number; effectiveBreadth_m: number; effectiveLength_m: number }) =>
    q.vertical_kN / (q.effectiveBreadth_m * q.effectiveLength_m),
});

export const contactArea = formula({
  symbol: "A_c",
  unit: "m²",
  ref: "statics",
  shown: "α B L",
  symbols: { α: "contactRatio", B: "breadth_m", L: "length_m" },
  of: (q: { contactRatio: number; breadth_m: number; length_m: number }) =>
    q.contactRatio * q.breadth_m * q.length_m,
});

/** What holds down: a column that pulls does not. */
export const stabilisingLoad = formula({
  symbol: "G_stb",
  unit: "kN",
  ref: "statics",
  shown: "max(0, N) + W_pad + W_fill",
  symbols: { N: "vertical_kN", W_pad: "padWeight_kN", W_fill: "backfillWeight_kN" },
  of: (q: { vertical_kN: number; padWeight_kN: number; backfillWeight_kN: number }) =>
    Math.max(0, q.vertical_kN) + q.padWeight_kN + q.backfillWeight_kN,
});

export const upliftLoad = formula({
  symbol: "U_dst",
  unit: "kN",
  ref: "statics",
  shown: "U + max(0, −N)",
  symbols: { U: "buoyancy_kN", N: "vertical_kN" },
  of: (q: { buoyancy_kN: number; vertical_kN: number }) => q.buoyancy_kN + Math.max(0, -q.vertical_kN),
});
