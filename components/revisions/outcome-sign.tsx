import { Sign, type SignName } from "@/components/figures/sign";
import type { OutcomeName } from "@/lib/contracts/changes";

const signs: Record<OutcomeName, SignName> = {
  "now fails": "fails",
  "still fails": "fails",
  "outside conditions": "outside conditions",
  recovers: "passes",
  holds: "passes",
};

/** What a change did to a footing: the sign of the verdict after it, with the word for how it got there. */
export const OutcomeSign = ({ outcome }: { outcome: OutcomeName }) => (
  <Sign name={signs[outcome]} word={outcome} size="normal" />
);
