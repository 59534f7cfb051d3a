import Link from "next/link";
import { Sign } from "@/components/figures/sign";
import type { RunChecksAnswer, VerdictWord } from "@/lib/contracts/checks";

const verdicts: VerdictWord[] = ["passes", "fails", "outside conditions"];

/** What a run of checks came to, and which footings could not be checked, each with why. */
export function CheckAnswer({ projectId, answer }: { projectId: string; answer: RunChecksAnswer }) {
  const count = (number: number) => number.toLocaleString("en-GB");
  return (
    <section role="status" aria-label="Result of the check" className="mt-3 border-l-4 border-rule py-1 pl-3">
      <p>
        {count(answer.checked)} {answer.checked === 1 ? "footing" : "footings"} checked
        {answer.answered > 0 && `, ${count(answer.answered)} open consequences answered`}.
      </p>
      <ul className="flex flex-wrap gap-x-5">
        {verdicts
          .filter((verdict) => answer.counts[verdict] > 0)
          .map((verdict) => (
            <li key={verdict} className="inline-flex items-center gap-1.5">
              {count(answer.counts[verdict])} <Sign name={verdict} />
            </li>
          ))}
      </ul>
      {answer.notCheckedCount > 0 && (
        <details className="mt-1" open={answer.notCheckedCount <= 5}>
          <summary>{count(answer.notCheckedCount)} could not be checked</summary>
          <ul className="mt-1 max-h-48 overflow-auto">
            {answer.notChecked.map(({ footingId, mark, reason }) => (
              <li key={footingId}>
                <Link href={`/projects/${projectId}/footings/${footingId}`} className="underline">
                  {mark}
                </Link>
                : {reason}
              </li>
            ))}
          </ul>
        </details>
      )}
    </section>
  );
}
