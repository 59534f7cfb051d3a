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
