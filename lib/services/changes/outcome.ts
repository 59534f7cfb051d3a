import type { Outcome, Verdict } from "@/db/schema";
import type { OutcomeCounts } from "@/lib/contracts/changes";

/** What a change did to a footing: its verdict before (null when it had no check) against the one after. */
export function outcomeOf(before: Verdict | null, after: Verdict): Outcome {
  if (after === "outside conditions") return "outside conditions";
  if (after === "fails") return before === "fails" ? "still fails" : "now fails";
  return before === null || before === "passes" ? "holds" : "recovers";
}

/** Outcomes after which somebody has to act: the footing does not stand on a value that covers it. */
export const needsAction = (outcome: Outcome): boolean =>
  outcome === "now fails" || outcome === "still fails" || outcome === "outside conditions";

/** A tally with every outcome at nought. */
export const noCounts = (): OutcomeCounts => ({
  "now fails": 0,
  "still fails": 0,
  "outside conditions": 0,
  recovers: 0,
  holds: 0,
});

/** "3 now fail, 1 outside conditions, 116 hold": the outcomes that occur, in the order of concern. */
export function countsInWords(counts: OutcomeCounts): string {
  const parts = [
    [counts["now fails"], "now fails", "now fail"],
    [counts["still fails"], "still fails", "still fail"],
    [counts["outside conditions"], "outside conditions", "outside conditions"],
    [counts.recovers, "recovers", "recover"],
    [counts.holds, "holds", "hold"],
  ] as const;
  const said = parts
    .filter(([count]) => count > 0)
    .map(([count, one, many]) => `${count} ${count === 1 ? one : many}`);
  return said.length === 0 ? "no linked footing" : said.join(", ");
}
