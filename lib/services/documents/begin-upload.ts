import { randomUUID } from "node:crypto";
import { sql } from "drizzle-orm";
import * as t from "@/db/schema";
import { beginUploadInput, type UploadTicket } from "@/lib/contracts/documents";
import type { UploadId } from "@/lib/contracts/ids";
import { presignUpload, remove } from "@/lib/storage/client";
import { claimedKind, fileKinds } from "@/lib/storage/real-type";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { Invalid } from "../errors";
import { parse } from "../parse";

/** Uploads that were begun and left: after this long their request has expired and their object is taken away. */
const LEFT_HOURS = 2;

/** Hands out one presigned request for one file of this name and size, into the waiting area of the store. */
export async function beginUpload(context: Context, given: unknown): Promise<UploadTicket> {
  assertMay(context, "document:write");
  const { fileName, size_bytes } = parse(beginUploadInput, given);
  const kind = claimedKind(fileName);
  if (!kind)
    throw new Invalid("The register takes PDF, PNG, JPEG, XLSX, CSV, AGS and plain text files.", {
      fileName: "This kind of file is not taken.",
    });
  const uploadId = randomUUID() as UploadId;
  const objectKey = `incoming/${context.projectId}/${uploadId}/${randomUUID()}`;
  const { mediaType } = fileKinds[kind];
  const url = await presignUpload({ key: objectKey, mediaType, size_bytes });
  const left = await inProject(context, async (tx) => {
    await tx.insert(t.upload).values({
      projectId: context.projectId,
      id: uploadId,
      objectKey,
      fileName,
      mediaType,
      size_bytes,
      startedBy: context.person.id,
    });
    const swept = await tx.execute<{ object_key: string }>(sql`
      update upload set state = 'cancelled', finished_at = now()
      where project_id = ${context.projectId} and state = 'waiting'
        and started_at < now() - make_interval(hours => ${LEFT_HOURS})
      returning object_key`);
    await audit(tx, context, {
      verb: "upload:begin",
      subject: `upload/${uploadId}`,
      detail: { fileName, size_bytes },
    });
    return swept.rows.map((row) => row.object_key);
  });
  // What was left behind goes in its own time; a store that is away now is asked again at the next upload's sweep.
  for (const key of left) void remove(key).catch(() => {});
  return { uploadId, url, mediaType };
}
