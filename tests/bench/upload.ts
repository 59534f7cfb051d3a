import { randomBytes, randomUUID } from "node:crypto";
import { beginUpload } from "@/lib/services/documents/begin-upload";
import { finishUpload } from "@/lib/services/documents/finish-upload";
import { presignUpload, remove } from "@/lib/storage/client";
import { buildWorld } from "@/tests/services/values/register-world";
import { compare } from "./measure";

const SIZE = 100 * 1024 * 1024;

async function send(url: string, mediaType: string, bytes: Uint8Array<ArrayBuffer>) {
  const sent = await fetch(url, { method: "PUT", headers: { "content-type": mediaType }, body: bytes });
  if (!sent.ok) throw new Error(`The store answered ${sent.status}.`);
  await sent.arrayBuffer();
}

/** A 100 MB report: presigned upload, verification and registration against the bare PUT to the same store. */
export async function upload() {
  const world = await buildWorld("UPLOAD");
  const bytes = new Uint8Array(randomBytes(SIZE));
  const mark = Buffer.from("%PDF-1.7\n");
  bytes.set(mark, 0);
  bytes.set(Buffer.from("%%EOF"), SIZE - 5);
  let at = 0;
  let grown_MB = 0;
  const result = await compare({
    what: "upload of 100 MB with SHA-256, type check, move and registration against the bare PUT of the same bytes",
    goal: "at most 1.5 ×",
    ours: async () => {
      at += 1;
      // Another file each time: the register refuses the very same one.
      bytes.set(Buffer.from(String(at).padStart(8, "0")), 64);
      const ticket = await beginUpload(world.preparer, { fileName: `report-${at}.pdf`, size_bytes: SIZE });
      await send(ticket.url, ticket.mediaType, bytes);
      const before = process.memoryUsage().rss;
      await finishUpload(world.preparer, {
        uploadId: ticket.uploadId,
        reference: `R-${at}`,
        title: "Report",
        kind: "factual report",
        code: "P01",
        status: "S2",
        receivedOn: "2026-01-12",
      });
      grown_MB = Math.max(grown_MB, (process.memoryUsage().rss - before) / 1e6);
    },
    bare: async () => {
      const key = `incoming/bare/${randomUUID()}`;
      await send(
        await presignUpload({ key, mediaType: "application/pdf", size_bytes: SIZE }),
        "application/pdf",
        bytes,
      );
      await remove(key);
    },
  });
  return [
    {
      ...result,
      note: `${result.note} memory grew by at most ${grown_MB.toFixed(0)} MB while verifying`.trim(),
    },
  ];
}
