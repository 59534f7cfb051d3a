import { type SQL, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { Stage, Verdict } from "@/db/schema";
import type {
  CheckId,
  FootingId,
  FootingRevisionId,
  LoadSetId,
  PersonId,
  ValueId,
  ValueRevisionId,
  ZoneId,
  ZoneRevisionId,
} from "@/lib/contracts/ids";
import type { Context } from "../context";

/** What a check reads of one footing, with the identity of everything it would pin. */
export type GatheredFooting = {
  id: FootingId;
  mark: string;
  ownerId: PersonId | null;
  stage: Stage;
  footingRevisionId: FootingRevisionId;
  easting_m: number;
  northing_m: number;
  breadth_m: number;
  length_m: number;
  thickness_m: number;
  groundLevel_m: number;
  foundingLevel_m: number;
  loadHeight_m: number;
  concreteUnitWeight_kNm3: number;
  backfillUnitWeight_kNm3: number;
  /** Null while no loads have been given. */
  loadSetId: LoadSetId | null;
  /** The combinations as JSON text, so that they are parsed once, and only where they are needed. */
  combinations: string | null;
  loadBasis: string | null;
  /** Null while the footing is linked to no value. */
  valueId: ValueId | null;
  /** The revision in force: null before the first issue and after a withdrawal. */
  valueRevisionId: ValueRevisionId | null;
  zoneRevisionId: ZoneRevisionId | null;
  /** Its last check, whatever that stands on now. */
  checkId: CheckId | null;
  verdict: Verdict | null;
  utilisation: number | null;
};

/** What one issued revision states that a check reads or has to say. */
export type ValueTerms = {
  valueId: ValueId;
  valueRevisionId: ValueRevisionId;
  reference: string;
  code: string;
  zoneId: ZoneId;
  kind: "single" | "table" | "parameters";
  netAllowable_kPa: number | null;
  table: unknown;
  parameters: unknown;
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
  basis: "recommended" | "assumed" | "presumptive";
  purpose: "preliminary" | "for-design";
  confirmBy: string | null;
  confirmWho: string | null;
};

/** The project's criteria in force. */
export type GatheredCriteria = {
  number: number;
  slidingFactor: number;
  overturningFactor: number;
  upliftFactor: number;
  interfaceAngle_deg: number;
  adhesion_kPa: number;
  permanentWithinMiddleThird: boolean;
  transientMinContactRatio: number;
  accidentalMinContactRatio: number;
  nearestHoleLimit_m: number;
};

export type Gathered = {
  footings: GatheredFooting[];
  /** By value revision: shared by all footings that stand on it. */
  terms: Map<ValueRevisionId, ValueTerms>;
  criteria: GatheredCriteria;
};

/** All footings linked to a value, with all that a check of them needs. Three statements whatever the number. */
export async function gatherForValue(tx: Transaction, context: Context, valueId: ValueId): Promise<Gathered> {
  return gather(tx, context, sql`f.value_id = ${valueId}`);
}

/** The footings named, with all that a check of them needs; those of other projects are simply not there. */
export async function gatherForFootings(
  tx: Transaction,
  context: Context,
  footingIds: readonly FootingId[],
): Promise<Gathered> {
  return gather(tx, context, sql`f.id = any(${sql.param([...footingIds])}::uuid[])`);
}

/** All footings of the project, with all that a check of them needs. */
export async function gatherAll(tx: Transaction, context: Context): Promise<Gathered> {
  return gather(tx, context, sql`true`);
}

async function gather(tx: Transaction, context: Context, which: SQL): Promise<Gathered> {
  const criteria = await gatherCriteria(tx, context);
  const footings = await gatherFootings(tx, context, which);
  const revisions = new Set<ValueRevisionId>();
  for (const footing of footings) if (footing.valueRevisionId) revisions.add(footing.valueRevisionId);
  return { footings, criteria, terms: await gatherTerms(tx, context, [...revisions]) };
}

/**
 * One statement: footings `f` (last check `k`) that a condition selects, ordered by id. For batches, put
 * `f.id > …` in the condition and give a limit.
 */
export async function gatherFootings(
  tx: Transaction,
  context: Context,
  which: SQL,
  limit?: number,
): Promise<GatheredFooting[]> {
  const order = limit === undefined ? sql`order by f.id` : sql`order by f.id limit ${limit}`;
  const { rows } = await tx.execute<GatheredFooting>(sql`${footingsQuery(context, which)} ${order}`);
  return rows;
}

/** The query of `gatherFootings`, in no order: for a cursor that reads any number of footings in one pass. */
export function footingsQuery(context: Context, which: SQL): SQL {
  return sql`
    select f.id, f.mark, f.owner_id as "ownerId", f.stage, f.current_revision_id as "footingRevisionId",
      g.easting_m, g.northing_m, g.breadth_m, g.length_m, g.thickness_m, g.ground_level_m as "groundLevel_m",
      g.founding_level_m as "foundingLevel_m", g.load_height_m as "loadHeight_m",
      g.concrete_unit_weight_knm3 as "concreteUnitWeight_kNm3",
      g.backfill_unit_weight_knm3 as "backfillUnitWeight_kNm3",
      l.id as "loadSetId", l.combinations::text as combinations, l.load_basis as "loadBasis",
      f.value_id as "valueId", v.current_revision_id as "valueRevisionId", z.current_revision_id as "zoneRevisionId",
      f.latest_check_id as "checkId", k.verdict, k.utilisation
    from footing f
    join footing_revision g on g.project_id = f.project_id and g.id = f.current_revision_id
    left join load_set l on l.project_id = f.project_id and l.id = f.current_load_set_id
    left join bearing_value v on v.project_id = f.project_id and v.id = f.value_id
    left join zone z on z.project_id = v.project_id and z.id = v.zone_id
    left join footing_check k on k.project_id = f.project_id and k.id = f.latest_check_id
    where f.project_id = ${context.projectId} and ${which}`;
}

/** One statement: what each of these revisions states. */
export async function gatherTerms(
  tx: Transaction,
  context: Context,
  revisionIds: readonly ValueRevisionId[],
): Promise<Map<ValueRevisionId, ValueTerms>> {
  if (revisionIds.length === 0) return new Map();
  const { rows } = await tx.execute<ValueTerms>(sql`
    select r.value_id as "valueId", r.id as "valueRevisionId", v.reference, r.code, v.zone_id as "zoneId", r.kind,
      r.net_allowable_kpa as "netAllowable_kPa", r.value_table as "table", r.parameters,
      r.compared_with as "comparedWith", r.load_basis as "loadBasis",
      r.soil_unit_weight_knm3 as "soilUnitWeight_kNm3", r.groundwater_level_m as "groundwaterLevel_m",
      r.min_breadth_m as "minBreadth_m", r.max_breadth_m as "maxBreadth_m",
      r.min_founding_depth_m as "minFoundingDepth_m", r.highest_founding_level_m as "highestFoundingLevel_m",
      r.lowest_founding_level_m as "lowestFoundingLevel_m", r.transient_factor as "transientFactor",
      r.accidental_factor as "accidentalFactor", r.basis, r.purpose, r.confirm_by as "confirmBy",
      r.confirm_who as "confirmWho"
    from bearing_value_revision r
    join bearing_value v on v.project_id = r.project_id and v.id = r.value_id
    where r.project_id = ${context.projectId} and r.id = any(${sql.param([...revisionIds])}::uuid[])`);
  return new Map(rows.map((row) => [row.valueRevisionId, row]));
}

/** One statement: the criteria in force. */
export async function gatherCriteria(tx: Transaction, context: Context): Promise<GatheredCriteria> {
  const { rows } = await tx.execute<GatheredCriteria>(sql`
    select c.number, c.sliding_factor as "slidingFactor", c.overturning_factor as "overturningFactor",
      c.uplift_factor as "upliftFactor", c.interface_angle_deg as "interfaceAngle_deg",
      c.adhesion_kpa as "adhesion_kPa", c.permanent_within_middle_third as "permanentWithinMiddleThird",
      c.transient_min_contact_ratio as "transientMinContactRatio",
      c.accidental_min_contact_ratio as "accidentalMinContactRatio", c.nearest_hole_limit_m as "nearestHoleLimit_m"
    from project p join criteria c on c.project_id = p.id and c.number = p.current_criteria
    where p.id = ${context.projectId}`);
  const [criteria] = rows;
  if (!criteria) throw new Error("The project has no criteria in force.");
  return criteria;
}
