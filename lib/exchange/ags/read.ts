import { decodeText, kindOfBytes, largestText_bytes } from "../text/decode";
import { cellReader, editionFor } from "./dictionary";
import type { AgsEncoding, AgsFile, AgsFileKind, AgsGroup } from "./file-model";
import { FindingList } from "./finding-list";
import { reportForeignCharacters } from "./foreign-characters";
import { GroupBuilder, sortFindings } from "./group-builder";
import {
  beginsRow,
  type Descriptor,
  descriptors,
  lineAt,
  type ScannedRow,
  scanRow,
  splitAtSeparators,
} from "./row-scanner";

/** Limits of reading. */
export interface ReadAgsOptions {
  /** Files larger than this are refused with a finding. */
  readonly largest_bytes?: number;
}

const refusals: Readonly<Partial<Record<AgsFileKind, string>>> = {
  empty: "The file is empty: it has no group to read.",
  zip: "This is a ZIP archive, not an AGS file. Unpack it and give the .ags file inside.",
  "utf-16": "The file is saved as UTF-16 text. Save it again as plain text (ASCII or UTF-8).",
  binary: "This is not a text file, so it cannot be AGS data.",
  "too-large": "The file is too large to be read in one piece.",
};

const ags3Message =
  "This is an AGS 3 file: its groups start with ** and its headings with *. Ask for the data as AGS 4; " +
  "the older edition is not read.";

/**
 * Reads an AGS 4 file: bytes in, groups and findings out. Mends what can be mended, says what it mended, and never
 * throws whatever the bytes are. Time and memory grow in proportion to the file.
 */
export function readAgs(bytes: Uint8Array, options: ReadAgsOptions = {}): AgsFile {
  const kind = kindOfBytes(bytes, options.largest_bytes ?? largestText_bytes);
  if (kind !== "text") return refuse(kind, refusals[kind] ?? "The file cannot be read.");

  const { text: decoded, encoding } = decodeText(bytes);
  const findings = new FindingList();
  if (encoding === "utf-8-bom") {
    findings.add("1", "note", { line: 1 }, "The file starts with a byte order mark, which was passed over.");
  }
  const text = withoutStrayCharacters(decoded, findings);
  reportForeignCharacters(text, encoding, findings);
  return new FileReader(text, encoding, findings).read();
}

function refuse(kind: AgsFileKind, message: string, encoding: AgsEncoding = "ascii", lineCount = 0): AgsFile {
  const findings = new FindingList();
  findings.add("file", "error", { line: lineCount > 0 ? 1 : null }, message);
  return {
    kind,
    edition: editionFor(null).edition,
    statedEdition: null,
    encoding,
    lineEnds: "none",
    lineCount,
    stopped: message,
    groups: [],
    findings: findings.list(),
    counts: findings.counts(),
    countsByRule: findings.countsByRule(),
  };
}

function withoutStrayCharacters(text: string, findings: FindingList): string {
  let clean = text;
  if (clean.includes("\u0000")) {
    clean = clean.replaceAll("\u0000", "");
    findings.add("1", "error", {}, "The file has zero characters in it; they were taken out before reading.");
  }
  if (!clean.includes("\n") && clean.includes("\r")) {
    clean = clean.replaceAll("\r", "\n");
    findings.add("2a", "note", {}, "Lines end in CR alone; the format asks for CR LF.");
  }
  return clean;
}

/** Walks through a text line by line and builds the groups. */
class FileReader {
  private line = 0;
  private crlfCount = 0;
  private feedCount = 0;
  private firstFeedOnly = 0;
  private readonly groups: AgsGroup[] = [];
  private group: GroupBuilder | null = null;
  /** Items of the last HEADING line that could not be read, to compare the lines below it with (rule 4). */
  private unreadHeadingItems = 0;
  private brokenLine = 0;

  constructor(
    private readonly text: string,
    private readonly encoding: AgsEncoding,
    private readonly findings: FindingList,
  ) {}

  read(): AgsFile {
    const { text } = this;
    let at = 0;
    while (at < text.length) {
      const { end, next, crlf, last } = lineAt(text, at);
      this.startLine(crlf, last);
      const first = this.firstMark(at, end);
      if (first === end) at = next;
      else if (text.startsWith('"**', first) && this.groups.length === 0 && this.group === null) {
        return refuse("ags3", ags3Message, this.encoding, this.line);
      } else at = this.readLine(first, end, next);
    }
    this.closeGroup();
    return this.result();
  }

  private startLine(crlf: boolean, last: boolean): void {
    this.line += 1;
    if (last) return;
    if (crlf) this.crlfCount += 1;
    else {
      this.feedCount += 1;
      if (this.firstFeedOnly === 0) this.firstFeedOnly = this.line;
    }
  }

  private firstMark(at: number, end: number): number {
    let first = at;
    while (first < end && (this.text.charCodeAt(first) === 32 || this.text.charCodeAt(first) === 9))
      first += 1;
    return first;
  }

  private readLine(first: number, end: number, next: number): number {
    const known = beginsRow(this.text, first) || this.startsUnquoted(first, end);
    if (!known) {
      this.reportUnreadable(this.text.slice(first, Math.min(end, first + 400)));
      return next;
    }
    const row = scanRow(this.text, first);
    const line = this.line;
    this.skipContinued(first, row);
    this.acceptRow(row, line, first);
    return row.next;
  }

  /** A descriptor without quotes, as spreadsheets leave it: read all the same, and reported under rule 5. */
  private startsUnquoted(first: number, end: number): boolean {
    if (this.text.charCodeAt(first) === 34) return false;
    const word = this.text.slice(first, Math.min(end, first + 9));
    return descriptors.some(
      (name) => word.startsWith(name) && (first + name.length === end || word.charAt(name.length) === ","),
    );
  }

  private reportUnreadable(start: string): void {
    const { line } = this;
    const word = /^"?([A-Za-z]*)/.exec(start)?.[1] ?? "";
    const place = { line, group: this.group?.name ?? null };
    this.brokenLine = line;
    this.findings.add(
      "3",
      "error",
      place,
      'The line does not start with "GROUP", "HEADING", "UNIT", "TYPE" or "DATA", so it was not read.',
    );
    if (!start.startsWith('"'))
      this.findings.add("5", "error", place, "The items of this line are not in double quotes.");
    const items = start.split(",").length;
    if (word === "HEADING") {
      this.unreadHeadingItems = items;
      this.findings.add("19a", "error", place, "No heading names can be made out in this line.");
    } else if (this.unreadHeadingItems > 0 && items !== this.unreadHeadingItems && isDescriptor(word)) {
      this.findings.add(
        "4",
        "error",
        place,
        `At its commas this line falls into ${items} items, its heading line into ${this.unreadHeadingItems}.`,
      );
    }
  }

  private skipContinued(first: number, row: ScannedRow): void {
    if (row.continued === 0) return;
    const start = this.line;
    let at = lineAt(this.text, first).next;
    for (let count = 0; count < row.continued; count += 1) {
      const { next, crlf, last } = lineAt(this.text, at);
      this.startLine(crlf, last);
      at = next;
    }
    const place = { line: start, group: this.group?.name ?? null };
    this.findings.add(
      "6",
      "error",
      place,
      `An item of this row runs on over a line break; lines ${start} to ${this.line} were read as one row.`,
    );
    const below = { line: start + 1, group: this.group?.name ?? null };
    this.findings.add(
      "3",
      "error",
      below,
      `The line carries on an item from line ${start} instead of starting a row.`,
    );
    this.findings.add(
      "5",
      "error",
      place,
      "An item opened on this line has no closing quote before the line ends.",
    );
  }

  private acceptRow(row: ScannedRow, line: number, first: number): void {
    const [descriptor = "", ...rest] = row.items;
    let items = rest;
    const expected = this.group?.width ?? 0;
    const checked =
      isDescriptor(descriptor) && descriptor !== "GROUP" && descriptor !== "HEADING" && expected > 0;
    if (checked && items.length !== expected) {
      const other = splitAtSeparators(this.text, first, row.next);
      if (other && other.length === expected + 1) {
        items = other.slice(1);
        this.reportFault(line, "quote inside an item not doubled");
      }
    }
    for (const fault of row.faults) this.reportFault(line, fault);
    if (row.open) this.reportOpen(line);
    if (row.open || (checked && items.length !== expected)) this.brokenLine = this.line;

    if (descriptor === "GROUP") this.openGroup(items, line);
    else if (this.group === null) {
      this.findings.add("2", "error", { line }, "The row stands before the first group and was not read.");
    } else if (isDescriptor(descriptor)) this.group.add(descriptor, items, line);
  }

  private reportFault(line: number, fault: string): void {
    const severity = fault === "blanks outside quotes" ? "warning" : "error";
    const sentences: Record<string, string> = {
      "item without quotes": "An item of this row is not in double quotes.",
      "quote inside an item not doubled":
        "A double quote inside an item is not doubled; the row was read as best it can be.",
      "blanks outside quotes": "Blanks stand outside the quotes of an item.",
    };
    this.findings.add("5", severity, { line, group: this.group?.name ?? null }, sentences[fault] ?? fault);
  }

  private reportOpen(line: number): void {
    this.findings.add(
      "5",
      "error",
      { line, group: this.group?.name ?? null },
      "The last item of this row has no closing quote.",
    );
  }

  private openGroup(items: readonly string[], line: number): void {
    this.closeGroup();
    this.unreadHeadingItems = 0;
    const [raw = "", ...more] = items;
    const name = raw.trim();
    if (items.length !== 1 && (items.length === 0 || more.some((item) => item !== ""))) {
      const message = `A GROUP row has one name after it; this one has ${items.length} items.`;
      this.findings.add("4", "error", { line, group: name }, message);
    } else if (items.length > 1) {
      this.findings.add("4", "error", { line, group: name }, "The GROUP row is filled up with empty items.");
    }
    if (name !== raw) {
      this.findings.add(
        "19",
        "error",
        { line, group: name },
        `Blanks around the group name "${name}" were taken off.`,
      );
    }
    this.group = new GroupBuilder(name, line, this.findings);
  }

  private closeGroup(): void {
    if (!this.group) return;
    this.groups.push(this.group.finish());
    this.group = null;
  }

  private result(): AgsFile {
    const { findings, groups } = this;
    const lineEnds = this.reportLineEnds();
    if (this.brokenLine === this.line && this.line > 0 && !this.text.endsWith("\n")) {
      const message = `The file ends in the middle of line ${this.line}; it may have been cut off.`;
      findings.add("file", "warning", { line: this.line }, message);
    }
    const kind: AgsFileKind = groups.length === 0 ? "no-groups" : "ags4";
    const stopped =
      kind === "no-groups" ? "No group could be read: this does not look like an AGS 4 file." : null;
    if (stopped) findings.add("file", "error", {}, stopped);

    const statedEdition = kind === "ags4" ? statedEditionOf(groups) : null;
    const { edition, known } = editionFor(statedEdition);
    if (kind === "ags4" && !known) {
      const said =
        statedEdition === null
          ? "The file does not state its edition"
          : `"${statedEdition}" is no known edition`;
      findings.add(
        "file",
        "warning",
        { group: "TRAN", heading: "TRAN_AGS" },
        `${said}; it is judged by ${edition}.`,
      );
    }
    return {
      kind,
      edition,
      statedEdition,
      encoding: this.encoding,
      lineEnds,
      lineCount: this.line,
      stopped,
      groups,
      findings: sortFindings(findings.list()),
      counts: findings.counts(),
      countsByRule: findings.countsByRule(),
    };
  }

  private reportLineEnds(): AgsFile["lineEnds"] {
    const { crlfCount, feedCount, firstFeedOnly } = this;
    if (crlfCount + feedCount === 0) return "none";
    if (feedCount === 0) return "crlf";
    const all = crlfCount === 0;
    const message = all
      ? "Lines end in LF alone; the format asks for CR LF."
      : `${feedCount} of ${crlfCount + feedCount} lines end in LF alone; the format asks for CR LF.`;
    this.findings.add("2a", "note", { line: firstFeedOnly }, message);
    return all ? "lf" : "mixed";
  }
}

function isDescriptor(word: string): word is Descriptor {
  return (descriptors as readonly string[]).includes(word);
}

function statedEditionOf(groups: readonly AgsGroup[]): string | null {
  for (const group of groups) {
    if (group.name !== "TRAN") continue;
    const cell = cellReader(group);
    for (const { cells } of [...group.rows].reverse()) {
      const stated = cell(cells, "TRAN_AGS");
      if (stated !== "") return stated;
    }
  }
  return null;
}
