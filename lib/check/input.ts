import { z } from "zod";
import { theories } from "@/lib/methods/bearing-factors/index";
import { output, quantity } from "@/lib/methods/define-method";
import { tableFits, tableMisfit, tableShape } from "@/lib/methods/value-table/index";

export const durations = ["permanent", "transient", "accidental"] as const;
export type Duration = (typeof durations)[number];

const factor = (label: string) => quantity({ label, above: 0, max: 3 });
const nullable = (facts: Parameters<typeof quantity>[0]) => quantity(facts).nullable();

/** Size and levels of the pad. */
export const checkedFooting = z
  .strictObject({
    breadth_m: quantity({ label: "Breadth B", unit: "m", above: 0, max: 1000 }),
    length_m: quantity({ label: "Length L", unit: "m", above: 0, max: 1000 }),
    thickness_m: quantity({ label: "Thickness", unit: "m", above: 0, max: 100 }),
    groundLevel_m: quantity({ label: "Ground level", unit: "m", min: -12000, max: 10000 }),
    foundingLevel_m: quantity({ label: "Founding level", unit: "m", min: -12000, max: 10000 }),
    loadHeight_m: quantity({
      label: "Height of the loads above the underside",
      unit: "m",
      min: 0,
      max: 200,
    }).optional(),
    concreteUnitWeight_kNm3: quantity({
      label: "Unit weight of concrete",
      unit: "kN/m³",
      min: 0,
      max: 50,
    }).default(24),
    backfillUnitWeight_kNm3: quantity({
      label: "Unit weight of backfill",
      unit: "kN/m³",
      min: 0,
      max: 50,
    }).default(18),
  })
  .refine((f) => f.foundingLevel_m <= f.groundLevel_m, {
    message: "The founding level lies above the ground level.",
    path: ["foundingLevel_m"],
  })
  // The loads act on top of the pad unless said otherwise.
  .transform((f) => ({ ...f, loadHeight_m: f.loadHeight_m ?? f.thickness_m }));

const load = (label: string, unit: string) => quantity({ label, unit, min: -1e9, max: 1e9 });

/** Service loads at the column base: vertical down positive. */
export const checkedLoad = z.strictObject({
  name: z.string().min(1, "A combination needs a name.").max(200).meta({ label: "Combination", unit: "" }),
  duration: z
    .enum(durations, { error: "Duration must be permanent, transient or accidental." })
    .meta({ label: "Duration", unit: "" }),
  vertical_kN: load("Vertical load", "kN"),
  momentB_kNm: load("Moment along B", "kNm").default(0),
  momentL_kNm: load("Moment along L", "kNm").default(0),
  horizontalB_kN: load("Horizontal load along B", "kN").default(0),
  horizontalL_kN: load("Horizontal load along L", "kN").default(0),
});

/** A value that is computed for each footing: strength, theory and factor; a cap from settlement where one is stated. */
export const valueParameters = z.strictObject({
  theory: z.enum(theories).meta({ label: "Theory", unit: "" }),
  drainage: z.enum(["drained", "undrained"]).meta({ label: "Drainage", unit: "" }),
  cohesion_kPa: quantity({ label: "Cohesion c′ or strength cu", unit: "kPa", min: 0 }),
  frictionAngle_deg: quantity({ label: "Angle of friction φ′", unit: "°", min: 0, max: 50 }),
  /** Total unit weight below the founding level; water takes its part off. */
  unitWeightBelow_kNm3: quantity({ label: "Unit weight below", unit: "kN/m³", min: 0, max: 40 }),
  factorOfSafety: quantity({ label: "Factor of safety", min: 1 }),
  convention: z.enum(["net-over-factor", "gross-over-factor"]).meta({ label: "Convention", unit: "" }),
  settlementCap_kPa: nullable({
    label: "Net pressure at the settlement allowed",
    unit: "kPa",
    above: 0,
  }).default(null),
});

const conditions = {
  comparedWith: z
    .enum(["maximum", "effective-area"])
    .default("maximum")
    .meta({ label: "Pressure the value is compared with", unit: "" }),
  soilUnitWeight_kNm3: quantity({ label: "Unit weight of the soil above", unit: "kN/m³", min: 0, max: 40 }),
  groundwaterLevel_m: nullable({ label: "Groundwater level", unit: "m", min: -12000, max: 10000 }).default(
    null,
  ),
  minFoundingDepth_m: nullable({ label: "Smallest cover", unit: "m", min: 0 }).default(null),
  minBreadth_m: nullable({ label: "Smallest breadth", unit: "m", min: 0 }).default(null),
  maxBreadth_m: nullable({ label: "Largest breadth", unit: "m", above: 0 }).default(null),
  durationFactors: z
    .strictObject({
      transient: factor("Duration factor, transient").default(1),
      accidental: factor("Duration factor, accidental").default(1),
    })
    .default({ transient: 1, accidental: 1 })
    .meta({ label: "Duration factors that the value's revision grants", unit: "" }),
};

/** The bearing value as its revision states it. */
export const checkedValue = z.discriminatedUnion("kind", [
  z.strictObject({
    kind: z.literal("single"),
    netAllowable_kPa: quantity({ label: "Net allowable bearing pressure", unit: "kPa", above: 0, max: 1e6 }),
    ...conditions,
  }),
  z.strictObject({
    kind: z.literal("table"),
    table: z.strictObject(tableShape).refine(tableFits, tableMisfit),
    ...conditions,
  }),
  z.strictObject({ kind: z.literal("parameters"), parameters: valueParameters, ...conditions }),
]);

/** What the project asks of every footing. */
export const checkedCriteria = z.strictObject({
  slidingFactor: quantity({ label: "Factor against sliding", min: 0, max: 10 }).default(1.5),
  overturningFactor: quantity({ label: "Factor against overturning", min: 0, max: 10 }).default(1.5),
  upliftFactor: quantity({ label: "Factor against uplift", min: 0, max: 10 }).default(1.1),
  interfaceAngle_deg: quantity({ label: "Angle of friction under the base δ", unit: "°", min: 0, below: 90 }),
  adhesion_kPa: quantity({ label: "Adhesion under the base", unit: "kPa", min: 0 }).default(0),
  permanentWithinMiddleThird: z
    .boolean()
    .default(true)
    .meta({ label: "Permanent loads stay within the middle third", unit: "" }),
  transientMinContactRatio: quantity({ label: "Smallest contact, transient", min: 0, max: 1 }).default(0.5),
  accidentalMinContactRatio: quantity({ label: "Smallest contact, accidental", min: 0, max: 1 }).default(0.5),
});

export const footingCheckInput = z.strictObject({
  footing: checkedFooting,
  loads: z
    .array(checkedLoad)
    .min(1, "A check needs at least one load combination.")
    .max(200, "A check takes at most 200 load combinations."),
  value: checkedValue,
  criteria: checkedCriteria,
});

export type FootingCheckInput = z.output<typeof footingCheckInput>;
export type CheckedLoad = FootingCheckInput["loads"][number];
export type CheckedValue = FootingCheckInput["value"];
export type CheckVerdict = "passes" | "fails" | "outside conditions";
export type Severity = "fails" | "outside" | "warning" | "note";
/** What a combination is measured against; `equilibrium` where nothing else can be measured. */
export type Requirement =
  | "bearing"
  | "middle third"
  | "contact"
  | "sliding"
  | "overturning"
  | "uplift"
  | "equilibrium";

/** One thing to say about a check: a code to sort by, a sentence to read, the combination it is about. */
export type Finding = { code: string; severity: Severity; message: string; combination: string | null };

/** Every figure of one combination. A factor is null where nothing acts; a pressure where there is no equilibrium. */
export type CombinationResult = {
  name: string;
  duration: Duration;
  baseVertical_kN: number;
  momentB_kNm: number;
  momentL_kNm: number;
  eccentricityB_m: number | null;
  eccentricityL_m: number | null;
  kernSum: number | null;
  withinMiddleThird: boolean;
  distribution: "uniform" | "trapezoidal" | "triangular" | "partial" | "none";
  equilibrium: boolean;
  maxPressure_kPa: number | null;
  minPressure_kPa: number | null;
  cornerPressures_kPa: [number, number, number, number] | null;
  contactRatio: number;
  contactArea_m2: number;
  effectiveBreadth_m: number;
  effectiveLength_m: number;
  effectivePressure_kPa: number | null;
  demandNet_kPa: number | null;
  durationFactor: number;
  /** Gross ultimate bearing pressure, where the value is computed from soil parameters. */
  ultimate_kPa: number | null;
  netAllowable_kPa: number | null;
  capacityNet_kPa: number | null;
  requiredNet_kPa: number | null;
  utilisationBearing: number | null;
  utilisationContact: number | null;
  slidingResistance_kN: number;
  slidingApplied_kN: number;
  factorSliding: number | null;
  utilisationSliding: number | null;
  factorOverturningB: number | null;
  factorOverturningL: number | null;
  factorOverturning: number | null;
  utilisationOverturning: number | null;
  stabilising_kN: number;
  uplift_kN: number;
  factorUplift: number | null;
  utilisationUplift: number | null;
  /** Largest of the above; null where one of them has no bound. */
  utilisation: number | null;
  governedBy: Requirement;
};

/** The result of a check; figures that have no bound are null and the verdict says so. */
export type FootingCheckResult = {
  verdict: CheckVerdict;
  governingCombination: string;
  governedBy: Requirement;
  utilisation: number | null;
  utilisationBearing: number | null;
  requiredNet_kPa: number | null;
  maxPressure_kPa: number | null;
  minContactRatio: number;
  factorSliding: number | null;
  factorOverturning: number | null;
  factorUplift: number | null;
  depth_m: number;
  padWeight_kN: number;
  backfillWeight_kN: number;
  waterHead_m: number;
  buoyancy_kN: number;
  overburden_kPa: number;
  findings: Finding[];
  combinations: CombinationResult[];
};

const figureOrNull = (label: string, unit = "") => output(label, unit).nullable();

export const footingCheckOutput = z.looseObject({
  verdict: z.enum(["passes", "fails", "outside conditions"]).meta({ label: "Verdict", unit: "" }),
  governingCombination: z.string().meta({ label: "Governing combination", unit: "" }),
  governedBy: z.string().meta({ label: "Requirement that governs", unit: "" }),
  utilisation: figureOrNull("Utilisation"),
  utilisationBearing: figureOrNull("Utilisation in bearing"),
  requiredNet_kPa: figureOrNull("Required net allowable bearing pressure", "kPa"),
  maxPressure_kPa: figureOrNull("Largest base pressure", "kPa"),
  minContactRatio: output("Smallest contact area over B·L"),
  factorSliding: figureOrNull("Smallest factor against sliding"),
  factorOverturning: figureOrNull("Smallest factor against overturning"),
  factorUplift: figureOrNull("Smallest factor against uplift"),
  findings: z.array(z.looseObject({})).meta({ label: "Findings", unit: "" }),
  combinations: z.array(z.looseObject({})).meta({ label: "Combinations", unit: "" }),
});
