/** The kinds of file that the register takes: how each is called, named and declared. */
export const fileKinds = {
  pdf: { title: "PDF", mediaType: "application/pdf", endings: ["pdf"] },
  png: { title: "PNG image", mediaType: "image/png", endings: ["png"] },
  jpeg: { title: "JPEG image", mediaType: "image/jpeg", endings: ["jpg", "jpeg"] },
  xlsx: {
    title: "XLSX workbook",
    mediaType: "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet",
    endings: ["xlsx"],
  },
  ags: { title: "AGS data", mediaType: "text/x-ags", endings: ["ags"] },
  csv: { title: "CSV table", mediaType: "text/csv", endings: ["csv"] },
  text: { title: "plain text", mediaType: "text/plain", endings: ["txt"] },
} as const;
export type FileKind = keyof typeof fileKinds;

/** The kind that a file name claims by its last ending; null when the register takes no such file. */
export function claimedKind(fileName: string): FileKind | null {
  const ending = /\.([a-z0-9]{1,8})$/i.exec(fileName)?.[1]?.toLowerCase();
  const found = Object.entries(fileKinds).find(([, kind]) =>
    (kind.endings as readonly string[]).includes(ending ?? ""),
  );
  return found ? (found[0] as FileKind) : null;
}

const begins = (bytes: Uint8Array, signature: number[]): boolean =>
  signature.every((byte, at) => bytes[at] === byte);
const asLatin = (bytes: Uint8Array): string => Buffer.from(bytes).toString("latin1");

/**
 * Says why a file's first and last bytes are not of the kind that its name claims; null when they are. Nothing that a
 * browser could run as a page passes under any name.
 */
export function contradiction(claimed: FileKind, first: Uint8Array, last: Uint8Array): string | null {
  const title = fileKinds[claimed].title;
  const other = `This is not a ${title}: its content is of another kind than its name says.`;
  switch (claimed) {
    case "pdf":
      return asLatin(first.subarray(0, 5)) === "%PDF-" && asLatin(last).includes("%%EOF")
        ? null
        : `This is not a whole PDF: ${asLatin(first.subarray(0, 5)) === "%PDF-" ? "its end is missing" : "it does not begin as one"}.`;
    case "png":
      return begins(first, [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]) && asLatin(last).includes("IEND")
        ? null
        : other;
    case "jpeg":
      return begins(first, [0xff, 0xd8, 0xff]) ? null : other;
    case "xlsx":
      // A zip whose directory, at the end, names a workbook.
      return begins(first, [0x50, 0x4b, 0x03, 0x04]) && asLatin(last).includes("xl/workbook.xml")
        ? null
        : other;
    default:
      return textContradiction(claimed, first, title);
  }
}

function textContradiction(claimed: "ags" | "csv" | "text", first: Uint8Array, title: string): string | null {
  if (first.includes(0)) return `This is not ${title}: it holds binary data.`;
  const binary = [...first].filter(
    (byte) => byte < 32 && byte !== 9 && byte !== 10 && byte !== 13 && byte !== 12,
  ).length;
  if (binary > first.length / 200) return `This is not ${title}: it holds binary data.`;
  const text = asLatin(first).replace(/^\u00ef\u00bb\u00bf/, "");
  if (text.startsWith("%PDF-") || text.startsWith("PK\u0003\u0004") || text.startsWith("\u0089PNG"))
    return `This is not ${title}: its content is of another kind than its name says.`;
  if (/^\s*<(!doctype|html|svg|script|\?xml|body|head|iframe)\b/i.test(text))
    return `This is a web page or XML under the name of ${title}.`;
  if (claimed === "ags" && !/^\s*"(GROUP|PROJ|\*\*)/m.test(text))
    return "This is not AGS data: no group begins in it.";
  return null;
}
