import { randomUUID } from "node:crypto";
import { type GroundPreview, previewGroundInput } from "@/lib/contracts/ground";
import { assertMay, type Context, inProject } from "../context";
import { waitingUpload } from "../documents/finish-upload";
import { parse } from "../parse";
import { bytesOf, readGroundFile } from "./read-ground-file";

/** Says what an uploaded AGS file would do to the register, and what is wrong with it. Writes nothing. */
export async function previewGround(context: Context, given: unknown): Promise<GroundPreview> {
  assertMay(context, "hole:write");
  const { uploadId } = parse(previewGroundInput, given);
  const upload = await waitingUpload(context, uploadId);
  const bytes = await bytesOf(upload.objectKey, upload.size_bytes);
  return inProject({ ...context, keyed: undefined }, async (tx) => {
    const { preview } = await readGroundFile(tx, context, {
      bytes,
      fileName: upload.fileName,
      dataIssueId: randomUUID(),
    });
    return preview;
  });
}
