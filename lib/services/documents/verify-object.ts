import { createHash } from "node:crypto";
import { open } from "@/lib/storage/client";
import { contradiction, type FileKind } from "@/lib/storage/real-type";
import { Conflict, Invalid } from "../errors";

const ENDS_BYTES = 65_536;

/**
 * Reads a stored object once, whatever its size in flat memory, and refuses it unless size, hash and real type are as
 * declared. The store is not trusted for any of the three.
 */
export async function verifyObject(
  key: string,
  declared: { kind: FileKind; size_bytes: number; sha256?: string },
): Promise<{ sha256: string; etag: string }> {
  const object = await open(key);
  if (!object) throw new Conflict("The file has not arrived in the store. Please send it again.");
  const hash = createHash("sha256");
  let size = 0;
  let first: Buffer = Buffer.alloc(0);
  let last: Buffer = Buffer.alloc(0);
  for await (const chunk of object.bytes) {
    hash.update(chunk);
    size += chunk.byteLength;
    if (size > declared.size_bytes) break;
    if (first.length < ENDS_BYTES) first = Buffer.concat([first, chunk]).subarray(0, ENDS_BYTES);
    last = (chunk.byteLength >= ENDS_BYTES ? Buffer.from(chunk) : Buffer.concat([last, chunk])).subarray(
      -ENDS_BYTES,
    );
  }
  if (size !== declared.size_bytes)
    throw new Invalid("The file that arrived has another size than the one announced.", {
      file: `${declared.size_bytes} bytes were announced, ${size > declared.size_bytes ? "more" : size} arrived.`,
    });
  const sha256 = hash.digest("hex");
  if (declared.sha256 !== undefined && declared.sha256 !== sha256)
    throw new Invalid(
      "The file was changed on its way: its SHA-256 is not the one that the browser worked out.",
      {
        file: "Please send it again.",
      },
    );
  const other = contradiction(declared.kind, first, last);
  if (other) throw new Invalid(other, { file: other });
  return { sha256, etag: object.etag };
}
