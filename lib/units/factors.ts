/**
 * Units and what one of each is in SI. All factors are exact, from definitions alone:
 * - 1 ft = 0.3048 m, 1 in = 25.4 mm and 1 lb = 0.453 592 37 kg: international yard and pound agreement, 1959.
 * - standard gravity 9.806 65 m/s²: 3rd CGPM, 1901; it makes a force of a mass (kgf, tonne-force, lbf).
 * - 1 kip = 1000 lbf; 1 short ton = 2000 lb, 1 long ton = 2240 lb, 1 tonne = 1000 kg: NIST Special Publication 811,
 *   2008, appendix B. 1 bar = 100 kPa: the same.
 */
const GRAVITY_MS2 = 9.80665;
const POUND_KG = 0.45359237;
const FOOT_M = 0.3048;
const INCH_M = 0.0254;

const LBF_KN = (POUND_KG * GRAVITY_MS2) / 1000;
const KIP_KN = POUND_KG * GRAVITY_MS2;
const SHORT_TON_KN = 2 * KIP_KN;
const LONG_TON_KN = 2.24 * KIP_KN;
const TONNE_KN = GRAVITY_MS2;
const SQUARE_FOOT_M2 = FOOT_M * FOOT_M;

/** What a number measures. The amount inside is in the unit named here. */
export type Kind = "pressure" | "force" | "moment" | "length" | "settlement" | "unitWeight";

/** The SI unit in which each kind is kept and computed. */
export const SI_UNIT: Record<Kind, string> = {
  pressure: "kPa",
  force: "kN",
  moment: "kNm",
  length: "m",
  settlement: "mm",
  unitWeight: "kN/m³",
};

/** One unit: how it is shown, what one of it is in the kind's SI unit, and the spellings that are read. */
export type Unit = { symbol: string; factor: number; spellings: readonly string[] };

const unit = (symbol: string, factor: number, ...spellings: string[]): Unit => ({
  symbol,
  factor,
  spellings: [symbol, ...spellings],
});

/** Every unit that is read, by kind. Spellings are compared without spaces, with ² and ³ written as 2 and 3. */
export const UNITS: Record<Kind, readonly Unit[]> = {
  pressure: [
    unit("kPa", 1, "kN/m2", "kN/sqm", "kNm-2"),
    unit("Pa", 0.001, "N/m2"),
    unit("MPa", 1000, "MN/m2", "N/mm2"),
    unit("bar", 100, "bars"),
    unit("kgf/cm²", GRAVITY_MS2 * 10, "kg/cm2"),
    unit("t/m²", TONNE_KN, "tf/m2", "tonne/m2", "tonnes/m2", "metricton/m2", "metrictons/m2"),
    unit("psf", LBF_KN / SQUARE_FOOT_M2, "lbf/ft2", "lb/ft2"),
    unit("ksf", KIP_KN / SQUARE_FOOT_M2, "kip/ft2", "kips/ft2"),
    unit("psi", LBF_KN / (INCH_M * INCH_M), "lbf/in2", "lb/in2"),
    unit("short ton/ft²", SHORT_TON_KN / SQUARE_FOOT_M2, "tsf", "shorttons/ft2"),
    unit("long ton/ft²", LONG_TON_KN / SQUARE_FOOT_M2, "longtons/ft2"),
  ],
  force: [
    unit("kN", 1),
    unit("N", 0.001),
    unit("MN", 1000),
    unit("t", TONNE_KN, "tf", "tonne", "tonnes", "metricton", "metrictons"),
    unit("kgf", GRAVITY_MS2 / 1000),
    unit("kip", KIP_KN, "kips"),
    unit("lbf", LBF_KN, "lb", "lbs"),
    unit("short ton", SHORT_TON_KN, "shorttons"),
    unit("long ton", LONG_TON_KN, "longtons"),
  ],
  moment: [
    unit("kNm", 1, "kN.m", "kN·m"),
    unit("MNm", 1000, "MN.m", "MN·m"),
    unit("t·m", TONNE_KN, "tm", "t.m", "tfm", "tf.m", "tf·m"),
    unit("kip·ft", KIP_KN * FOOT_M, "kip-ft", "kips-ft", "kipft", "kip.ft", "ft-kip", "ft-kips"),
  ],
  length: [
    unit("m", 1, "metre", "metres"),
    unit("mm", 0.001),
    unit("cm", 0.01),
    unit("ft", FOOT_M, "foot", "feet"),
    unit("in", INCH_M, "inch", "inches"),
  ],
  settlement: [
    unit("mm", 1),
    unit("cm", 10),
    unit("m", 1000),
    unit("in", INCH_M * 1000, "inch", "inches"),
    unit("ft", FOOT_M * 1000, "foot", "feet"),
  ],
  unitWeight: [
    unit("kN/m³", 1, "kNm-3"),
    unit("t/m³", TONNE_KN, "tf/m3", "tonne/m3", "tonnes/m3"),
    unit("pcf", LBF_KN / (SQUARE_FOOT_M2 * FOOT_M), "lbf/ft3", "lb/ft3"),
    unit("kcf", KIP_KN / (SQUARE_FOOT_M2 * FOOT_M), "kip/ft3", "kips/ft3"),
  ],
};
