import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { Verdict } from "@/db/schema";
import type { FootingCheckInput } from "@/lib/check/input";
import type { CheckId, FootingId, PersonId, ValueRevisionId } from "@/lib/contracts/ids";
import type { Context } from "../context";

export type FootingRow = {
  id: FootingId;
  mark: string;
  ownerId: PersonId | null;
  stage: string;
  valueRevisionId: ValueRevisionId | null;
  breadth_m: number;
  length_m: number;
  thickness_m: number;
  groundLevel_m: number;
  foundingLevel_m: number;
  loadHeight_m: number;
  concreteUnitWeight_kNm3: number;
  backfillUnitWeight_kNm3: number;
  combinations: FootingCheckInput["loads"];
  loadBasis: string;
  checkId: CheckId | null;
  verdict: Verdict;
  utilisation: number | null;
};

/** What a value revision states that a check reads. */
export type TermsRow = {
  netAllowable_kPa: number | null;
  comparedWith: "maximum" | "effective-area";
  loadBasis: string;
  soilUnitWeight_kNm3: number;
  groundwaterLevel_m: number | null;
  minBreadth_m: number | null;
  maxBreadth_m: number | null;
  minFoundingDepth_m: number | null;
  highestFoundingLevel_m: number | null;
  lowestFoundingLevel_m: number | null;
  transientFactor: number;
  accidentalFactor: number;
};

export type CriteriaRow = FootingCheckInput["criteria"];

/** Brings the rows of one footing, the value's terms and the criteria to what the check is given. */
export function toCheckInput(footing: FootingRow, value: TermsRow, criteria: CriteriaRow): FootingCheckInput {
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
    loads: footing.combinations,
    value: {
      kind: "single",
      comparedWith: value.comparedWith,
      netAllowable_kPa: value.netAllowable_kPa,
      soilUnitWeight_kNm3: value.soilUnitWeight_kNm3,
      groundwaterLevel_m: value.groundwaterLevel_m,
      minFoundingDepth_m: value.minFoundingDepth_m,
      minBreadth_m: value.minBreadth_m,
      maxBreadth_m: value.maxBreadth_m,
      durationFactors: { transient: value.transientFactor, accidental: value.accidentalFactor },
    },
    criteria,
  };
}

/** The criteria in force. */
export async function readCriteria(tx: Transaction, context: Context): Promise<CriteriaRow> {
  const { rows } = await tx.execute<CriteriaRow>(sql`
    select c.sliding_factor as "slidingFactor", c.overturning_factor as "overturningFactor",
      c.uplift_factor as "upliftFactor", c.interface_angle_deg as "interfaceAngle_deg", c.adhesion_kpa as "adhesion_kPa",
      c.permanent_within_middle_third as "permanentWithinMiddleThird",
      c.transient_min_contact_ratio as "transientMinContactRatio",
      c.accidental_min_contact_ratio as "accidentalMinContactRatio"
    from project p join criteria c on c.project_id = p.id and c.number = p.current_criteria
    where p.id = ${context.projectId}`);
  const criteria = rows[0];
  if (!criteria) throw new Error("A project without criteria.");
  return criteria;
}

/** Reads the terms of the value revisions that a batch stands on and that were not read before. */
export async function readTerms(
  tx: Transaction,
  context: Context,
  footings: FootingRow[],
  known: Map<string, TermsRow | null>,
): Promise<void> {
  const wanted = new Set<string>();
  for (const { valueRevisionId } of footings)
    if (valueRevisionId && !known.has(valueRevisionId)) wanted.add(valueRevisionId);
  if (wanted.size === 0) return;
  const { rows } = await tx.execute<TermsRow & { id: string }>(sql`
    select id, net_allowable_kpa as "netAllowable_kPa", compared_with as "comparedWith", load_basis as "loadBasis",
      soil_unit_weight_knm3 as "soilUnitWeight_kNm3", groundwater_level_m as "groundwaterLevel_m",
      min_breadth_m as "minBreadth_m", max_breadth_m as "maxBreadth_m", min_founding_depth_m as "minFoundingDepth_m",
      highest_founding_level_m as "highestFoundingLevel_m", lowest_founding_level_m as "lowestFoundingLevel_m",
      transient_factor as "transientFactor", accidental_factor as "accidentalFactor"
    from bearing_value_revision
    where project_id = ${context.projectId} and id = any(${sql.param([...wanted])}::uuid[])`);
  for (const { id, ...terms } of rows) known.set(id, terms);
}
