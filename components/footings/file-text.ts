/** Eight megabytes: more than any schedule of footings. */
const LIMIT_bytes = 8_000_000;

/**
 * Reads a file of the reader's own as text: UTF-8 where it is that, else the encoding of older spreadsheets. Gives a
 * sentence where it is too large, empty, or cannot be read (it was moved, or the disk is gone).
 */
export async function textOfFile(file: File): Promise<{ text: string } | { problem: string }> {
  if (file.size > LIMIT_bytes)
    return { problem: `${file.name} is larger than 8 MB. Split it, or leave out other columns.` };
  if (file.size === 0) return { problem: `${file.name} is empty.` };
  const bytes = await file.arrayBuffer().catch(() => null);
  if (!bytes)
    return { problem: `${file.name} cannot be read. Is it still where it was, and not open elsewhere?` };
  try {
    return { text: new TextDecoder("utf-8", { fatal: true }).decode(bytes) };
  } catch {
    return { text: new TextDecoder("windows-1252").decode(bytes) };
  }
}
