import type { OutcomeCounts } from "./changes";

const words = [
  ["now fails", "now fail"],
  ["still fails", "still fail"],
  ["outside conditions", "outside conditions"],
  ["recovers", "recover"],
  ["holds", "hold"],
] as const;

/** "3 now fail, 116 hold": the outcomes that occur, in the order of concern. */
export function countsInWords(counts: OutcomeCounts): string {
  const said = words
    .filter(([outcome]) => counts[outcome] > 0)
    .map(([outcome, many]) => `${counts[outcome]} ${counts[outcome] === 1 ? outcome : many}`);
  return said.length === 0 ? "no linked footing" : said.join(", ");
}
