import type { OutcomeCounts, OutcomeName } from "@/lib/contracts/changes";
import { OutcomeSign } from "./outcome-sign";

const order: OutcomeName[] = ["now fails", "still fails", "outside conditions", "recovers", "holds"];

/** How many footings a change did what to; nought is said too, so that nothing looks forgotten. */
export function OutcomeCountsLine({ counts }: { counts: OutcomeCounts }) {
  return (
    <ul className="flex flex-wrap gap-x-5 gap-y-1" aria-label="Footings by outcome">
      {order.map((outcome) => (
        <li
          key={outcome}
          className={`inline-flex items-center gap-1.5 ${counts[outcome] === 0 ? "text-ink-2" : ""}`}
        >
          <span className="tabular-nums">{counts[outcome].toLocaleString("en-GB")}</span>
          <OutcomeSign outcome={outcome} />
        </li>
      ))}
    </ul>
  );
}
