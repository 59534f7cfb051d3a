import { and, eq } from "drizzle-orm";
import * as t from "@/db/schema";
import { discardDraftInput } from "@/lib/contracts/values";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { NotFound } from "../errors";
import { assertSeen, parse } from "../parse";
import { lockValueAndDraft } from "./draft-row";

/** Throws away a draft that nobody has checked; its last content stays in the audit trail. */
export async function discardDraft(context: Context, given: { valueId: string; revision?: number }) {
  assertMay(context, "value:draft");
  const { valueId, revision } = parse(discardDraftInput, given);

  return inProject(context, async (tx) => {
    const { draft } = await lockValueAndDraft(tx, context, valueId);
    if (!draft) throw new NotFound("No draft of this value is being written.");
    assertSeen(revision, draft.revision, "The draft", { content: draft.kept.fields });
    await tx
      .delete(t.bearingValueDraft)
      .where(
        and(eq(t.bearingValueDraft.projectId, context.projectId), eq(t.bearingValueDraft.valueId, valueId)),
      );
    await audit(tx, context, {
      verb: "value:draft",
      subject: `value/${valueId}`,
      detail: { discarded: draft.kept.fields },
    });
    return { valueId };
  });
}
