import type { FootingCheckInput } from "@/lib/check/input";
import type { GatheredCriteria, GatheredFooting, ValueTerms } from "./gather";

/** The size and levels that a check reads; a gathered footing has them, and so has a form. */
export type CheckedSize = Pick<
  GatheredFooting,
  | "breadth_m"
  | "length_m"
  | "thickness_m"
  | "groundLevel_m"
  | "foundingLevel_m"
  | "loadHeight_m"
  | "concreteUnitWeight_kNm3"
  | "backfillUnitWeight_kNm3"
>;

/** What a check reads of a value; its pressure is that of the revision, from nowhere else. */
export type CheckedTerms = Pick<
  ValueTerms,
  | "kind"
  | "netAllowable_kPa"
  | "comparedWith"
  | "soilUnitWeight_kNm3"
  | "groundwaterLevel_m"
  | "minFoundingDepth_m"
  | "minBreadth_m"
  | "maxBreadth_m"
  | "transientFactor"
  | "accidentalFactor"
> & { table?: unknown; parameters?: unknown };

export type CheckedCriteria = Omit<GatheredCriteria, "number" | "nearestHoleLimit_m">;

/** Brings a stored footing, its combinations, a value revision and the criteria into the form that `footing-check` takes. */
export function toCheckInput(
  footing: CheckedSize & { combinations: string | FootingCheckInput["loads"] },
  terms: CheckedTerms,
  criteria: CheckedCriteria,
): FootingCheckInput {
  const loads =
    typeof footing.combinations === "string"
      ? (JSON.parse(footing.combinations) as FootingCheckInput["loads"])
      : footing.combinations;
  return {
    footing: {
      breadth_m: footing.breadth_m,
      length_m: footing.length_m,
      thickness_m: footing.thickness_m,
      groundLevel_m: footing.groundLevel_m,
      foundingLevel_m: footing.foundingLevel_m,
      loadHeight_m: footing.loadHeight_m,
      concreteUnitWeight_kNm3: footing.concreteUnitWeight_kNm3,
      backfillUnitWeight_kNm3: footing.backfillUnitWeight_kNm3,
    },
    loads,
    value: checkedValueOf(terms),
    criteria: {
      slidingFactor: criteria.slidingFactor,
      overturningFactor: criteria.overturningFactor,
      upliftFactor: criteria.upliftFactor,
      interfaceAngle_deg: criteria.interfaceAngle_deg,
      adhesion_kPa: criteria.adhesion_kPa,
      permanentWithinMiddleThird: criteria.permanentWithinMiddleThird,
      transientMinContactRatio: criteria.transientMinContactRatio,
      accidentalMinContactRatio: criteria.accidentalMinContactRatio,
    },
  };
}

/** Ten thousand footings stand on one revision: its terms are brought into form once and shared, never changed. */
const formed = new WeakMap<CheckedTerms, FootingCheckInput["value"]>();

function checkedValueOf(terms: CheckedTerms): FootingCheckInput["value"] {
  const known = formed.get(terms);
  if (known) return known;
  const value = toCheckedValue(terms);
  formed.set(terms, value);
  return value;
}

function toCheckedValue(terms: CheckedTerms): FootingCheckInput["value"] {
  const conditions = {
    comparedWith: terms.comparedWith,
    soilUnitWeight_kNm3: terms.soilUnitWeight_kNm3,
    groundwaterLevel_m: terms.groundwaterLevel_m,
    minFoundingDepth_m: terms.minFoundingDepth_m,
    minBreadth_m: terms.minBreadth_m,
    maxBreadth_m: terms.maxBreadth_m,
    durationFactors: { transient: terms.transientFactor, accidental: terms.accidentalFactor },
  };
  // The database holds kind and content together, so that exactly one of the three is there.
  const stated =
    terms.kind === "single"
      ? { kind: terms.kind, netAllowable_kPa: terms.netAllowable_kPa }
      : terms.kind === "table"
        ? { kind: terms.kind, table: terms.table }
        : { kind: terms.kind, parameters: terms.parameters };
  return { ...stated, ...conditions } as FootingCheckInput["value"];
}
