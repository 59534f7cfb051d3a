import { and, eq, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import * as t from "@/db/schema";
import { stages, stageTitles } from "@/lib/contracts/footing-words";
import { type RecordStageInput, recordStageInput } from "@/lib/contracts/footings";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { Conflict, Invalid } from "../errors";
import { assertSeen, parse } from "../parse";
import { holdsOf } from "./hold";
import { type LockedFooting, lockFooting } from "./lock-footing";

/**
 * Records that a footing has reached a stage on site. Accepting a formation and pouring are held while the footing does
 * not stand on a current check that passes; issuing for construction while its value is unconfirmed.
 */
export async function recordStage(context: Context, given: RecordStageInput) {
  assertMay(context, "stage:record");
  const { footingId, revision, stage, reachedOn, note } = parse(recordStageInput, given);

  return inProject(context, async (tx) => {
    const footing = await lockFooting(tx, context, footingId);
    assertSeen(revision, footing.revision, `Footing ${footing.mark}`, {
      revision: footing.revision,
      stage: footing.stage,
    });
    if (stage === footing.stage)
      throw new Conflict(`Footing ${footing.mark} is ${stageTitles[stage]} already.`);
    if (stages.indexOf(stage) < stages.indexOf(footing.stage) && note.length < 10)
      throw new Invalid("One field needs another look.", {
        note: `Say in a sentence why the footing goes back from ${stageTitles[footing.stage]} to ${stageTitles[stage]}.`,
      });
    await assertNotHeld(tx, context, footing, stage);

    const last = await tx.execute<{ number: number }>(sql`
      select coalesce(max(number), 0)::int as number from stage_event
      where project_id = ${context.projectId} and footing_id = ${footingId}`);
    const number = (last.rows[0]?.number ?? 0) + 1;
    await tx.insert(t.stageEvent).values({
      projectId: context.projectId,
      footingId,
      number,
      stage,
      reachedOn,
      note,
      recordedBy: context.person.id,
    });
    const next = footing.revision + 1;
    await tx
      .update(t.footing)
      .set({ stage, revision: next })
      .where(and(eq(t.footing.projectId, context.projectId), eq(t.footing.id, footingId)));
    await audit(tx, context, {
      verb: "stage:record",
      subject: `footing/${footingId}`,
      detail: { mark: footing.mark, from: footing.stage, to: stage, reachedOn, note },
    });
    return { id: footingId, stage, number, revision: next };
  });
}

/** The value's entry is locked first, so that a revision issued at this moment is either seen or comes after. */
async function assertNotHeld(
  tx: Transaction,
  context: Context,
  footing: LockedFooting,
  stage: t.Stage,
): Promise<void> {
  const goesBack = stages.indexOf(stage) < stages.indexOf(footing.stage);
  if (goesBack || stage === "designed" || stage === "excavated") return;
  if (footing.valueId)
    await tx.execute(sql`
      select 1 from bearing_value where project_id = ${context.projectId} and id = ${footing.valueId} for share`);
  const holds = await holdsOf(tx, context, footing.id);
  const hold = stage === "issued" ? holds.issue : (holds.concrete ?? holds.issue);
  if (hold) throw new Conflict(`Footing ${footing.mark}: ${hold}`, { hold });
}
