import { type SQL, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { Verdict } from "@/db/schema";
import type { FootingCheckInput } from "@/lib/check/input";
import type { CheckId, FootingId, PersonId } from "@/lib/contracts/ids";
import type { Context } from "../context";
import { type FootingRow, readCriteria, readTerms, type TermsRow, toCheckInput } from "./to-check-input";

/** A footing with the check that it last had and all that a check made now would be given. */
export type LinkedFooting = {
  id: FootingId;
  mark: string;
  ownerId: PersonId | null;
  stage: string;
  before: { id: CheckId; verdict: Verdict; utilisation: number | null } | null;
  /** Null when its value has no revision in force. */
  input: FootingCheckInput | null;
};

/** Ten thousand footings are four batches: few statements, and memory that does not grow with the site. */
const BATCH = 2500;

/**
 * Footings `f` (their last check is `c`) that a condition selects, in batches, as they would be checked with what counts
 * now: current size, loads, criteria and value. Footings without size or loads cannot be checked and are left out. `trial`
 * stands in for the revision in force of every value.
 */
export async function* gatherLinked(
  tx: Transaction,
  context: Context,
  where: SQL,
  trial?: TermsRow,
): AsyncGenerator<LinkedFooting[]> {
  const criteria = await readCriteria(tx, context);
  const terms = new Map<string, TermsRow | null>();
  let after = "00000000-0000-0000-0000-000000000000";
  for (;;) {
    const { rows } = await tx.execute<FootingRow>(sql`
      select f.id, f.mark, f.owner_id as "ownerId", f.stage, v.current_revision_id as "valueRevisionId",
        g.breadth_m, g.length_m, g.thickness_m, g.ground_level_m as "groundLevel_m",
        g.founding_level_m as "foundingLevel_m", g.load_height_m as "loadHeight_m",
        g.concrete_unit_weight_knm3 as "concreteUnitWeight_kNm3", g.backfill_unit_weight_knm3 as "backfillUnitWeight_kNm3",
        l.combinations, l.load_basis as "loadBasis", c.id as "checkId", c.verdict, c.utilisation
      from footing f
      join footing_revision g on g.project_id = f.project_id and g.id = f.current_revision_id
      join load_set l on l.project_id = f.project_id and l.id = f.current_load_set_id
      left join bearing_value v on v.project_id = f.project_id and v.id = f.value_id
      left join footing_check c on c.project_id = f.project_id and c.id = f.latest_check_id
      where f.project_id = ${context.projectId} and f.id > ${after} and ${where}
      order by f.id limit ${BATCH}`);
    if (!trial) await readTerms(tx, context, rows, terms);
    if (rows.length > 0)
      yield rows.map((row) => {
        const stated = trial ?? (row.valueRevisionId ? terms.get(row.valueRevisionId) : null) ?? null;
        return {
          id: row.id,
          mark: row.mark,
          ownerId: row.ownerId,
          stage: row.stage,
          before: row.checkId
            ? { id: row.checkId, verdict: row.verdict, utilisation: row.utilisation }
            : null,
          input: stated ? toCheckInput(row, stated, criteria) : null,
        };
      });
    const last = rows.at(-1);
    if (rows.length < BATCH || !last) return;
    after = last.id;
  }
}
