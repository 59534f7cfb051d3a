import { type SQL, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { CheckRow } from "@/lib/contracts/checks";
import type { Context } from "../context";
import { isoMoment } from "../iso-moment";

/** Checks `c` that a condition selects, the newest first, each with its standing. */
export async function selectChecks(
  tx: Transaction,
  context: Context,
  where: SQL,
  limit: number,
): Promise<CheckRow[]> {
  const { rows } = await tx.execute<CheckRow & { seq: string | number }>(sql`
    select c.id, c.seq, p.name as "runBy", ${isoMoment(sql`c.run_at`)} as "runAt", c.verdict, c.utilisation,
      c.utilisation_bearing as "utilisationBearing", c.required_net_kpa as "requiredNet_kPa",
      c.governing_combination as "governingCombination", c.value_id as "valueId", v.reference as "valueReference",
      c.value_revision_id as "valueRevisionId", r.code, c.net_allowable_kpa as "netAllowable_kPa",
      c.criteria_number as "criteriaNumber", c.engine_version as "engineVersion", s.standing, s.reasons
    from footing_check c
    join person p on p.id = c.run_by
    join bearing_value v on v.project_id = c.project_id and v.id = c.value_id
    join bearing_value_revision r on r.project_id = c.project_id and r.id = c.value_revision_id
    join check_standing s on s.project_id = c.project_id and s.check_id = c.id
    where c.project_id = ${context.projectId} and ${where}
    order by c.seq desc limit ${limit}`);
  return rows.map((row) => ({ ...row, seq: Number(row.seq) }));
}
