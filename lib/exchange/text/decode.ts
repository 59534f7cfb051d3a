/** How bytes were turned into text. */
export type TextEncodingFound = "ascii" | "utf-8" | "utf-8-bom" | "windows-1252";

/** What bytes look like before they are read as text; "text" when nothing speaks against it. */
export type ByteKind = "text" | "empty" | "zip" | "utf-16" | "binary" | "too-large";

/** Text of a file and the encoding that was taken for it. */
export interface DecodedText {
  readonly text: string;
  readonly encoding: TextEncodingFound;
}

/** One character is kept in one or two bytes and a string ends near 536 million: stay well below. */
export const largestText_bytes = 400 * 1024 * 1024;

/** Windows-1252 where it differs from Latin-1: bytes 128 to 159. Unassigned bytes keep their own number. */
const windows1252 = [
  0x20ac, 0x81, 0x201a, 0x0192, 0x201e, 0x2026, 0x2020, 0x2021, 0x02c6, 0x2030, 0x0160, 0x2039, 0x0152, 0x8d,
  0x017d, 0x8f, 0x90, 0x2018, 0x2019, 0x201c, 0x201d, 0x2022, 0x2013, 0x2014, 0x02dc, 0x2122, 0x0161, 0x203a,
  0x0153, 0x9d, 0x017e, 0x0178,
];

/** Says what kind of bytes these are, from their first 64 kB. */
export function kindOfBytes(bytes: Uint8Array, largest_bytes = largestText_bytes): ByteKind {
  if (bytes.length === 0) return "empty";
  if (bytes.length > largest_bytes) return "too-large";
  const [a, b, c, d] = bytes;
  if (a === 0x50 && b === 0x4b && ((c === 3 && d === 4) || (c === 5 && d === 6))) return "zip";
  if ((a === 0xff && b === 0xfe) || (a === 0xfe && b === 0xff)) return "utf-16";
  const start = bytes.subarray(0, 65536);
  let zeros = 0;
  let zerosOdd = 0;
  let control = 0;
  for (let index = 0; index < start.length; index += 1) {
    const byte = start[index] ?? 0;
    if (byte === 0) {
      zeros += 1;
      if (index % 2 === 1) zerosOdd += 1;
    } else if (byte < 9 || (byte > 13 && byte < 32 && byte !== 26 && byte !== 27)) control += 1;
  }
  const mostlyEveryOther = zeros > start.length * 0.3 && (zerosOdd > zeros * 0.95 || zerosOdd < zeros * 0.05);
  if (mostlyEveryOther) return "utf-16";
  if (a === 0x25 && b === 0x50 && c === 0x44 && d === 0x46) return "binary";
  if (zeros > 0 && (zeros > start.length * 0.001 || control > 0)) return "binary";
  if (control > start.length * 0.05) return "binary";
  return "text";
}

/**
 * Turns bytes into text: a byte order mark or strictly valid UTF-8 is read as UTF-8, everything else as
 * windows-1252, which gives every byte a character. Never throws.
 */
export function decodeText(bytes: Uint8Array): DecodedText {
  const marked = bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf;
  const body = marked ? bytes.subarray(3) : bytes;
  const text = decodeUtf8(body);
  if (text === null) return { text: decodeWindows1252(body), encoding: "windows-1252" };
  if (marked) return { text, encoding: "utf-8-bom" };
  return { text, encoding: text.length === body.length ? "ascii" : "utf-8" };
}

function decodeUtf8(bytes: Uint8Array): string | null {
  try {
    return new TextDecoder("utf-8", { fatal: true, ignoreBOM: true }).decode(bytes);
  } catch {
    return null;
  }
}

// Written out because some runtimes decode the label "windows-1252" as Latin-1.
function decodeWindows1252(bytes: Uint8Array): string {
  const parts: string[] = [];
  const step = 16384;
  const units = new Uint16Array(step);
  for (let from = 0; from < bytes.length; from += step) {
    const count = Math.min(step, bytes.length - from);
    for (let index = 0; index < count; index += 1) {
      const byte = bytes[from + index] ?? 0;
      units[index] = byte >= 128 && byte < 160 ? (windows1252[byte - 128] ?? byte) : byte;
    }
    parts.push(String.fromCharCode(...units.subarray(0, count)));
  }
  return parts.join("");
}
