import { and, eq } from "drizzle-orm";
import * as t from "@/db/schema";
import { downloadInput } from "@/lib/contracts/documents";
import { head, presignDownload } from "@/lib/storage/client";
import { assertMay, type Context, inProject } from "../context";
import { NotFound, Unavailable } from "../errors";
import { parse } from "../parse";

/** A link to one stored file that lives two minutes. Says so when the store holds another file than was recorded. */
export async function downloadDocument(
  context: Context,
  given: unknown,
): Promise<{ url: string; fileName: string }> {
  assertMay(context, "project:read");
  const { documentId, documentRevisionId } = parse(downloadInput, given);
  const [found] = await inProject(context, (tx) =>
    tx
      .select()
      .from(t.documentRevision)
      .where(
        and(
          eq(t.documentRevision.projectId, context.projectId),
          eq(t.documentRevision.documentId, documentId),
          eq(t.documentRevision.id, documentRevisionId),
        ),
      ),
  );
  if (!found) throw new NotFound("There is no such revision of this document.");
  const stored = await head(found.objectKey);
  if (!stored || stored.size_bytes !== found.size_bytes)
    throw new Unavailable(
      "The stored file is missing or has another size than was recorded. Please tell the project lead.",
    );
  const { fileName, mediaType, objectKey } = found;
  return { url: await presignDownload({ key: objectKey, fileName, mediaType }), fileName };
}
