import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { Verdict } from "@/db/schema";
import type {
  CheckId,
  FootingId,
  FootingRevisionId,
  HoleRevisionId,
  LoadSetId,
  ValueId,
  ValueRevisionId,
  ZoneRevisionId,
} from "@/lib/contracts/ids";
import type { Context } from "../context";

/** A check that was made, with its pins, ready to be kept. Snapshot and result are JSON text already. */
export type MadeCheck = {
  id: CheckId;
  footingId: FootingId;
  footingRevisionId: FootingRevisionId;
  loadSetId: LoadSetId;
  valueId: ValueId;
  valueRevisionId: ValueRevisionId;
  valueKind: "single" | "table" | "parameters";
  netAllowable_kPa: number | null;
  criteriaNumber: number;
  zoneRevisionId: ZoneRevisionId;
  holeRevisionIds: readonly HoleRevisionId[];
  engineVersion: string;
  verdict: Verdict;
  utilisation: number | null;
  utilisationBearing: number | null;
  requiredNet_kPa: number | null;
  maxPressure_kPa: number | null;
  minContactRatio: number | null;
  factorSliding: number | null;
  factorOverturning: number | null;
  factorUplift: number | null;
  governingCombination: string;
  snapshot: string;
  result: string;
};

/** Stands in no JSON text, where control characters are written as escapes. */
const SEPARATOR = "\u001e";

/**
 * Keeps checks and moves each footing's latest check to its own: one statement for the whole batch. Narrow columns
 * travel as arrays; snapshot and result as ready-made JSON, because building JSON from numbers in SQL costs three times
 * as much, in one long text each, because the quotes of an array of texts have to be escaped one by one.
 */
export async function storeChecks(
  tx: Transaction,
  context: Context,
  checks: readonly MadeCheck[],
): Promise<void> {
  if (checks.length === 0) return;
  const column = <Name extends keyof MadeCheck>(name: Name) => sql.param(checks.map((check) => check[name]));
  const texts = (name: "snapshot" | "result") =>
    sql`string_to_array(${checks.map((check) => check[name]).join(SEPARATOR)}, ${SEPARATOR})`;
  const holes = sql.param(checks.map(({ holeRevisionIds }) => `{${holeRevisionIds.join(",")}}`));
  await tx.execute(sql`
    with kept as (
      insert into footing_check (project_id, run_by, id, footing_id, footing_revision_id, load_set_id, value_id,
        value_revision_id, value_kind, net_allowable_kpa, criteria_number, zone_revision_id, hole_revision_ids,
        engine_version, verdict, utilisation, utilisation_bearing, required_net_kpa, max_pressure_kpa,
        min_contact_ratio, factor_sliding, factor_overturning, factor_uplift, governing_combination, snapshot, result)
      select ${context.projectId}::uuid, ${context.person.id}::uuid, n.id, n.footing_id, n.footing_revision_id,
        n.load_set_id, n.value_id, n.value_revision_id, n.value_kind, n.net_allowable_kpa, n.criteria_number,
        n.zone_revision_id, n.holes::uuid[], n.engine_version, n.verdict, n.utilisation, n.utilisation_bearing,
        n.required_net_kpa, n.max_pressure_kpa, n.min_contact_ratio, n.factor_sliding, n.factor_overturning,
        n.factor_uplift, n.governing_combination, n.snapshot::jsonb, n.result::jsonb
      from unnest(${column("id")}::uuid[], ${column("footingId")}::uuid[], ${column("footingRevisionId")}::uuid[],
        ${column("loadSetId")}::uuid[], ${column("valueId")}::uuid[], ${column("valueRevisionId")}::uuid[],
        ${column("valueKind")}::text[], ${column("netAllowable_kPa")}::float8[], ${column("criteriaNumber")}::int[],
        ${column("zoneRevisionId")}::uuid[], ${holes}::text[], ${column("engineVersion")}::text[],
        ${column("verdict")}::text[], ${column("utilisation")}::float8[], ${column("utilisationBearing")}::float8[],
        ${column("requiredNet_kPa")}::float8[], ${column("maxPressure_kPa")}::float8[],
        ${column("minContactRatio")}::float8[], ${column("factorSliding")}::float8[],
        ${column("factorOverturning")}::float8[], ${column("factorUplift")}::float8[],
        ${column("governingCombination")}::text[], ${texts("snapshot")}, ${texts("result")})
        as n(id, footing_id, footing_revision_id, load_set_id, value_id, value_revision_id, value_kind,
          net_allowable_kpa, criteria_number, zone_revision_id, holes, engine_version, verdict, utilisation,
          utilisation_bearing, required_net_kpa, max_pressure_kpa, min_contact_ratio, factor_sliding,
          factor_overturning, factor_uplift, governing_combination, snapshot, result)
      returning id, footing_id)
    update footing f set latest_check_id = kept.id
    from kept where f.project_id = ${context.projectId} and f.id = kept.footing_id`);
}
