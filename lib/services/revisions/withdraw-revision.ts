import { randomUUID } from "node:crypto";
import { and, eq, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import * as t from "@/db/schema";
import type { ChangeId, PersonId, ValueId } from "@/lib/contracts/ids";
import { type WithdrawRevisionInput, withdrawRevisionInput } from "@/lib/contracts/values";
import { audit } from "../audit";
import { announceChange, type TallyByOwner, tally, total } from "../changes/announce";
import { insertChange } from "../changes/record-change";
import { assertMay, type Context, inProject } from "../context";
import { Conflict } from "../errors";
import { faultPoint } from "../faults";
import { assertSeen, parse } from "../parse";
import { lockValue, nameOf, seeRevisions } from "./lock-revision";

/** Takes the revision in force out of use: no check can rest on the value until another is issued. */
export async function withdrawRevision(context: Context, given: WithdrawRevisionInput) {
  assertMay(context, "revision:withdraw");
  const { valueId, revisionId, revision, reason } = parse(withdrawRevisionInput, given);

  return inProject(context, async (tx) => {
    const value = await lockValue(tx, context, valueId);
    const { wanted, inForce } = await seeRevisions(tx, context, value, revisionId);
    if (wanted.withdrawer)
      throw new Conflict(`${wanted.code} was withdrawn by ${wanted.withdrawer} already.`);
    if (inForce?.id !== wanted.id)
      throw new Conflict(`${wanted.code} is not in force; there is nothing to withdraw.`);
    assertSeen(revision, value.revision, value.reference, {
      revision: value.revision,
      inForce: inForce.code,
    });

    await tx.insert(t.revisionWithdrawal).values({
      projectId: context.projectId,
      valueRevisionId: revisionId,
      reason,
      withdrawnBy: context.person.id,
    });
    const next = value.revision + 1;
    await tx
      .update(t.bearingValue)
      .set({ currentRevisionId: null, revision: next })
      .where(and(eq(t.bearingValue.projectId, context.projectId), eq(t.bearingValue.id, valueId)));
    await faultPoint("withdraw:pointer");
    const changeId = randomUUID() as ChangeId;
    const byOwner = await leaveWithoutValue(tx, context, changeId, valueId);
    const counts = total(byOwner);
    await faultPoint("withdraw:consequences");
    const title = `${nameOf(value)}: ${wanted.code} withdrawn, no value in force`;
    await insertChange(tx, context, {
      id: changeId,
      kind: "value-withdrawn",
      subjectId: valueId,
      title,
      reason,
      valueId,
      fromRevisionId: revisionId,
      toRevisionId: null,
      counts,
    });
    await announceChange(tx, context, { id: changeId, title, reason, byOwner });
    await audit(tx, context, {
      verb: "revision:withdraw",
      subject: `value/${valueId}`,
      detail: { revisionId, code: wanted.code, reason, changeId, counts },
    });
    return { valueId, revisionId, code: wanted.code, changeId, counts, revision: next };
  });
}

/** Without a value no footing has conditions that it could be inside of: one statement for all. */
async function leaveWithoutValue(
  tx: Transaction,
  context: Context,
  changeId: ChangeId,
  valueId: ValueId,
): Promise<TallyByOwner> {
  const rows = await tx.execute<{ owner: PersonId | null; count: number }>(sql`
    with written as (
      insert into consequence (project_id, change_id, footing_id, check_id, outcome, verdict_before, verdict_after,
        utilisation_before, utilisation_after, required_net_kpa, stage)
      select f.project_id, ${changeId}, f.id, c.id, 'outside conditions', c.verdict, 'outside conditions',
        c.utilisation, null, c.required_net_kpa, f.stage
      from footing f
      left join footing_check c on c.project_id = f.project_id and c.id = f.latest_check_id
      where f.project_id = ${context.projectId} and f.value_id = ${valueId}
      returning footing_id)
    select f.owner_id as owner, count(*)::int as count
    from written w join footing f on f.project_id = ${context.projectId} and f.id = w.footing_id
    group by 1`);
  const byOwner: TallyByOwner = new Map();
  for (const { owner, count } of rows.rows) tally(byOwner, owner, "outside conditions", count);
  return byOwner;
}
