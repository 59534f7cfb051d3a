const quote = 34;
const comma = 44;
const blank = 32;
const tab = 9;

/** A text broken inside an item is joined over at most so many lines; longer, and the quote was never closed. */
const longestItem_lines = 200;

/** The row descriptors of the format. */
export const descriptors = ["GROUP", "HEADING", "UNIT", "TYPE", "DATA"] as const;
export type Descriptor = (typeof descriptors)[number];

const rowStart = /[ \t]*"(?:GROUP|HEADING|UNIT|TYPE|DATA)"/y;

/** What went against the quoting rules in one row. */
export type QuotingFault =
  | "item without quotes"
  | "quote inside an item not doubled"
  | "blanks outside quotes";

/** One row as scanned: its items, where the next line begins, and what was mended on the way. */
export interface ScannedRow {
  readonly items: string[];
  /** Position of the first character of the next line. */
  readonly next: number;
  /** Lines that the row runs on after its first. */
  readonly continued: number;
  readonly faults: ReadonlySet<QuotingFault>;
  /** True when the last item is never closed. */
  readonly open: boolean;
}

/** End of the line that begins at `from`, without its line break, and the start of the next one. */
export function lineAt(
  text: string,
  from: number,
): { end: number; next: number; crlf: boolean; last: boolean } {
  const feed = text.indexOf("\n", from);
  if (feed === -1) return { end: text.length, next: text.length, crlf: false, last: true };
  const crlf = feed > from && text.charCodeAt(feed - 1) === 13;
  return { end: crlf ? feed - 1 : feed, next: feed + 1, crlf, last: false };
}

/** True when a line that begins at `from` is the start of a properly quoted row. */
export function beginsRow(text: string, from: number): boolean {
  rowStart.lastIndex = from;
  return rowStart.test(text);
}

/**
 * Splits the row that begins at `from` into items, in time proportionate to its length. Mends what can be mended
 * (items without quotes, quotes not doubled, line breaks inside an item) and says so. Never throws.
 */
export function scanRow(text: string, from: number): ScannedRow {
  const items: string[] = [];
  const faults = new Set<QuotingFault>();
  let { end, next } = lineAt(text, from);
  let continued = 0;
  let nextQuote = -2;
  let at = from;

  const quoteFrom = (position: number): number => {
    if (nextQuote < position && nextQuote !== -1) nextQuote = text.indexOf('"', position);
    return nextQuote;
  };
  const finish = (open: boolean): ScannedRow => ({ items, next, continued, faults, open });
  const pastBlanks = (position: number): number => {
    let place = position;
    while (place < end && isBlank(text.charCodeAt(place))) place += 1;
    return place;
  };

  for (;;) {
    const begin = pastBlanks(at);
    if (begin >= end || text.charCodeAt(begin) !== quote) {
      faults.add("item without quotes");
      // Searched within the line only: a file without commas would otherwise be read to its end for every line.
      const inLine = text.slice(at, end).indexOf(",");
      const stop = inLine === -1 ? -1 : at + inLine;
      if (stop === -1) {
        items.push(text.slice(at, end).trim());
        return finish(false);
      }
      items.push(text.slice(at, stop).trim());
      at = stop + 1;
      continue;
    }
    if (begin !== at) faults.add("blanks outside quotes");

    let search = begin + 1;
    let doubled = false;
    for (;;) {
      const place = quoteFrom(search);
      if (place === -1 || place >= end) {
        const closedOff = next >= text.length || continued >= longestItem_lines || beginsRow(text, next);
        if (closedOff) {
          items.push(tidy(text.slice(begin + 1, end), doubled));
          return finish(true);
        }
        continued += 1;
        search = next;
        ({ end, next } = lineAt(text, next));
        continue;
      }
      const after = text.charCodeAt(place + 1);
      if (place + 1 >= end) {
        items.push(tidy(text.slice(begin + 1, place), doubled));
        return finish(false);
      }
      if (after === comma) {
        items.push(tidy(text.slice(begin + 1, place), doubled));
        at = place + 2;
        break;
      }
      if (after === quote) {
        doubled = true;
        search = place + 2;
        continue;
      }
      const beyond = pastBlanks(place + 1);
      if (beyond >= end) {
        faults.add("blanks outside quotes");
        items.push(tidy(text.slice(begin + 1, place), doubled));
        return finish(false);
      }
      if (beyond > place + 1 && text.charCodeAt(beyond) === comma) {
        faults.add("blanks outside quotes");
        items.push(tidy(text.slice(begin + 1, place), doubled));
        at = beyond + 1;
        break;
      }
      faults.add("quote inside an item not doubled");
      search = place + 1;
    }
  }
}

/** A second way to split a row whose quotes are not doubled: wherever `","` stands. Null when it cannot apply. */
export function splitAtSeparators(text: string, from: number, next: number): string[] | null {
  const row = text.slice(from, next).trim();
  if (row.length < 2 || !row.startsWith('"') || !row.endsWith('"')) return null;
  return row
    .slice(1, -1)
    .split('","')
    .map((item) => item.replaceAll('""', '"'));
}

function isBlank(code: number): boolean {
  return code === blank || code === tab;
}

function tidy(item: string, doubled: boolean): string {
  return doubled ? item.replaceAll('""', '"') : item;
}
