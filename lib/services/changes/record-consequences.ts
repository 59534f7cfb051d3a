import { type SQL, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { Outcome, Verdict } from "@/db/schema";
import type { ChangeId, CheckId, FootingId, ValueId } from "@/lib/contracts/ids";
import type { Context } from "../context";
import { faultPoint } from "../faults";
import { type TallyByOwner, tally } from "./announce";
import { gatherLinked } from "./gather-linked";
import { judge, WITHOUT_VALUE } from "./judge";
import { outcomeOf } from "./outcome";

/** The columns of the consequences of one batch, each an array: what goes to the database in one statement. */
type Batch = {
  footingId: FootingId[];
  checkId: (CheckId | null)[];
  outcome: Outcome[];
  verdictBefore: (Verdict | null)[];
  verdictAfter: Verdict[];
  utilisationBefore: (number | null)[];
  utilisationAfter: (number | null)[];
  requiredNet_kPa: (number | null)[];
  stage: string[];
};

/**
 * Runs the check of every footing that a change touches with what is new, and stores what it did to each: load, think,
 * store, a batch at a time, so that memory stays flat. Call it when the pointers have moved; nothing else is read. Either
 * the footings linked to a value, checked before or not, or those with a check that a condition on `f` and `k` selects.
 */
export async function recordConsequences(
  tx: Transaction,
  context: Context,
  given: { changeId: ChangeId } & ({ valueId: ValueId } | { checked: SQL }),
): Promise<TallyByOwner> {
  const byOwner: TallyByOwner = new Map();
  const touched =
    "valueId" in given ? sql`f.value_id = ${given.valueId}` : sql`k.id is not null and ${given.checked}`;
  // Stored by the server while the next batch is judged here.
  let storing: Promise<void> = Promise.resolve();
  for await (const { footings, criteria, termsOf } of gatherLinked(tx, context, touched)) {
    const batch = emptyBatch();
    for (const footing of footings) {
      const terms = termsOf(footing);
      const after = terms ? judge(footing, terms, criteria) : WITHOUT_VALUE;
      const outcome = outcomeOf(footing.verdict, after.verdict);
      batch.footingId.push(footing.id);
      batch.checkId.push(footing.checkId);
      batch.outcome.push(outcome);
      batch.verdictBefore.push(footing.verdict);
      batch.verdictAfter.push(after.verdict);
      batch.utilisationBefore.push(footing.utilisation);
      batch.utilisationAfter.push(after.utilisation);
      batch.requiredNet_kPa.push(after.requiredNet_kPa);
      batch.stage.push(footing.stage);
      tally(byOwner, footing.ownerId, outcome);
    }
    await storing;
    storing = store(tx, context, given.changeId, batch);
    storing.catch(() => {});
    await faultPoint("consequences:batch");
  }
  await storing;
  return byOwner;
}

const emptyBatch = (): Batch => ({
  footingId: [],
  checkId: [],
  outcome: [],
  verdictBefore: [],
  verdictAfter: [],
  utilisationBefore: [],
  utilisationAfter: [],
  requiredNet_kPa: [],
  stage: [],
});

async function store(tx: Transaction, context: Context, changeId: ChangeId, batch: Batch): Promise<void> {
  await tx.execute(sql`
    insert into consequence (project_id, change_id, footing_id, check_id, outcome, verdict_before, verdict_after,
      utilisation_before, utilisation_after, required_net_kpa, stage)
    select ${context.projectId}::uuid, ${changeId}::uuid, q.* from unnest(
      ${sql.param(batch.footingId)}::uuid[], ${sql.param(batch.checkId)}::uuid[], ${sql.param(batch.outcome)}::text[],
      ${sql.param(batch.verdictBefore)}::text[], ${sql.param(batch.verdictAfter)}::text[],
      ${sql.param(batch.utilisationBefore)}::float8[], ${sql.param(batch.utilisationAfter)}::float8[],
      ${sql.param(batch.requiredNet_kPa)}::float8[], ${sql.param(batch.stage)}::text[]) as q`);
}
