import { and, eq, sql } from "drizzle-orm";
import * as t from "@/db/schema";
import { type DraftContent, type SaveDraftInput, saveDraftInput } from "@/lib/contracts/values";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { NotFound } from "../errors";
import { assertSeen, parse } from "../parse";
import { type DraftKept, lockValueAndDraft } from "./draft-row";

/** Keeps a draft as typed so far, complete or not. Whoever writes in it is its preparer and cannot check it. */
export async function saveDraft(context: Context, given: SaveDraftInput) {
  assertMay(context, "value:draft");
  const { valueId, content, revision } = parse(saveDraftInput, given);

  return inProject(context, async (tx) => {
    const { draft } = await lockValueAndDraft(tx, context, valueId);
    if (!draft)
      throw new NotFound("No draft of this value is being written; it may have been checked meanwhile.");
    assertSeen(revision, draft.revision, "The draft", { content: draft.kept.fields });
    const editors = [...new Set([...draft.kept.editors, context.person.id])];
    const kept: DraftKept = { fields: content, editors };
    const next = draft.revision + 1;
    await tx
      .update(t.bearingValueDraft)
      .set({ content: kept, preparedBy: context.person.id, revision: next, changedAt: sql`now()` })
      .where(
        and(eq(t.bearingValueDraft.projectId, context.projectId), eq(t.bearingValueDraft.valueId, valueId)),
      );
    await audit(tx, context, {
      verb: "value:draft",
      subject: `value/${valueId}`,
      detail: { revision: next, changed: changedFields(draft.kept.fields, content) },
    });
    return { valueId, revision: next };
  });
}

function changedFields(before: DraftContent, after: DraftContent): string[] {
  const names = new Set([...Object.keys(before), ...Object.keys(after)]) as Set<keyof DraftContent>;
  return [...names]
    .filter((name) => JSON.stringify(before[name] ?? null) !== JSON.stringify(after[name] ?? null))
    .sort();
}
