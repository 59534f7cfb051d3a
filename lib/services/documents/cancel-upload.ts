import { and, eq } from "drizzle-orm";
import * as t from "@/db/schema";
import { uploadInput } from "@/lib/contracts/documents";
import { remove } from "@/lib/storage/client";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { NotFound } from "../errors";
import { parse } from "../parse";

/** Gives up an upload of one's own that is still waiting, and takes away what has arrived of it. */
export async function cancelUpload(context: Context, given: unknown): Promise<{ cancelled: true }> {
  assertMay(context, "document:write");
  const { uploadId } = parse(uploadInput, given);
  const key = await inProject(context, async (tx) => {
    const [row] = await tx
      .update(t.upload)
      .set({ state: "cancelled", finishedAt: new Date() })
      .where(
        and(
          eq(t.upload.projectId, context.projectId),
          eq(t.upload.id, uploadId),
          eq(t.upload.startedBy, context.person.id),
          eq(t.upload.state, "waiting"),
        ),
      )
      .returning({ objectKey: t.upload.objectKey });
    if (!row) throw new NotFound("There is no waiting upload of yours under this number.");
    await audit(tx, context, { verb: "upload:cancel", subject: `upload/${uploadId}` });
    return row.objectKey;
  });
  await remove(key).catch(() => {});
  return { cancelled: true };
}
