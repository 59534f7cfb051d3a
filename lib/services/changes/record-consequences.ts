import { type SQL, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { Outcome, Verdict } from "@/db/schema";
import { checkFooting } from "@/lib/check/check-footing";
import type { ChangeId, CheckId, FootingId, ValueId, ValueRevisionId } from "@/lib/contracts/ids";
import type { Context } from "../context";
import { faultPoint } from "../faults";
import { type TallyByOwner, tally } from "./announce";
import { gatherLinked } from "./gather-linked";
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
 * store, a batch at a time, so that memory stays flat. Call it when the pointers have moved; nothing else is read.
 */
export async function recordConsequences(
  tx: Transaction,
  context: Context,
  given: { changeId: ChangeId } & (
    | { value: { valueId: ValueId; revisionId: ValueRevisionId } }
    | { footings: { where: SQL } }
  ),
): Promise<TallyByOwner> {
  const byOwner: TallyByOwner = new Map();
  const touched =
    "value" in given
      ? sql`f.value_id = ${given.value.valueId}`
      : sql`c.id is not null and ${given.footings.where}`;
  for await (const footings of gatherLinked(tx, context, touched)) {
    const batch = emptyBatch();
    for (const footing of footings) {
      const after = footing.input ? checkFooting(footing.input) : WITHOUT_VALUE;
      const outcome = outcomeOf(footing.before?.verdict ?? null, after.verdict);
      batch.footingId.push(footing.id);
      batch.checkId.push(footing.before?.id ?? null);
      batch.outcome.push(outcome);
      batch.verdictBefore.push(footing.before?.verdict ?? null);
      batch.verdictAfter.push(after.verdict);
      batch.utilisationBefore.push(footing.before?.utilisation ?? null);
      batch.utilisationAfter.push(after.utilisation);
      batch.requiredNet_kPa.push(after.requiredNet_kPa);
      batch.stage.push(footing.stage);
      tally(byOwner, footing.ownerId, outcome);
    }
    await store(tx, context, given.changeId, batch);
    await faultPoint("issue:batch");
  }
  return byOwner;
}

/** A footing whose value has no revision in force is inside nobody's conditions. */
const WITHOUT_VALUE = { verdict: "outside conditions", utilisation: null, requiredNet_kPa: null } as const;

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
