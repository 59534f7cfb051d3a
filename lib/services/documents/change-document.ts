import { and, eq } from "drizzle-orm";
import * as t from "@/db/schema";
import { changeDocumentInput } from "@/lib/contracts/documents";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { NotFound } from "../errors";
import { assertSeen, parse } from "../parse";

/** Corrects how a document is called; its files and their revisions stay as they are. */
export async function changeDocument(context: Context, given: unknown) {
  assertMay(context, "document:write");
  const { documentId, revision, title, kind, author } = parse(changeDocumentInput, given);
  return inProject(context, async (tx) => {
    const here = and(eq(t.document.projectId, context.projectId), eq(t.document.id, documentId));
    const [before] = await tx.select().from(t.document).where(here).for("update");
    if (!before) throw new NotFound("There is no such document in this project.");
    assertSeen(revision, before.revision, `${before.reference}`, before);
    const [after] = await tx
      .update(t.document)
      .set({ title, kind, author, revision: before.revision + 1 })
      .where(here)
      .returning();
    await audit(tx, context, {
      verb: "document:change",
      subject: `document/${documentId}`,
      detail: {
        before: { title: before.title, kind: before.kind, author: before.author },
        after: { title, kind, author },
      },
    });
    return after;
  });
}
