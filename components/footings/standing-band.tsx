import Link from "next/link";
import { Sign } from "@/components/figures/sign";
import type { FootingDetail } from "@/lib/contracts/footings";

/** Whether the last check still stands, and if not, why: in sentences, with the change that did it. */
export function StandingBand({ projectId, footing }: { projectId: string; footing: FootingDetail }) {
  const { check, openConsequences } = footing;
  if (check?.standing !== "affected" && openConsequences.length === 0) return null;
  return (
    <section aria-label="Standing" className="mt-3 border-2 border-affected px-4 py-2">
      {check?.standing === "affected" && (
        <>
          <p className="flex items-center gap-2">
            <Sign name="affected" revision={check.currentNumber ?? undefined} hideWord size="large" />
            <span>
              <strong className="font-semibold">affected:</strong> {check.reasons.join("; ")}
            </span>
          </p>
          <p className="mt-1 text-ink-2">
            What is behind this check has changed. The footing is not approved until it is re-checked and
            acknowledged.
          </p>
        </>
      )}
      {openConsequences.length > 0 && (
        <ul className="mt-1">
          {openConsequences.map(({ id, changeId, title, outcome }) => (
            <li key={id}>
              <Link href={`/projects/${projectId}/revisions/${changeId}`} className="underline">
                {title}
              </Link>
              : {outcome}, waits for an answer
            </li>
          ))}
        </ul>
      )}
    </section>
  );
}
