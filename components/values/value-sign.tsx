import type { RevisionState, ValueState } from "@/lib/contracts/values";

const words: Record<RevisionState | ValueState, string> = {
  empty: "no revision yet",
  draft: "draft",
  checked: "checked, not issued",
  issued: "issued",
  superseded: "superseded",
  withdrawn: "withdrawn",
};

/** State of a value or of one of its revisions: a shape and the word. A withdrawn one is struck through. */
export function StateSign({ state }: { state: RevisionState | ValueState }) {
  const inForce = state === "issued";
  return (
    <span className={`inline-flex items-center gap-1.5 whitespace-nowrap ${inForce ? "" : "text-ink-2"}`}>
      <svg width="12" height="12" viewBox="0 0 12 12" aria-hidden="true">
        {inForce ? (
          <path d="M2 6.5 5 9.5 10 3" fill="none" stroke="currentColor" strokeWidth="1.75" />
        ) : state === "checked" ? (
          <path
            d="M2 6.5 5 9.5 10 3"
            fill="none"
            stroke="currentColor"
            strokeWidth="1.5"
            strokeDasharray="2 1.5"
          />
        ) : state === "draft" ? (
          <path d="M2 10 3 7 8 2 10 4 5 9Z" fill="none" stroke="currentColor" strokeWidth="1.25" />
        ) : state === "withdrawn" ? (
          <path d="M2 6H10" stroke="currentColor" strokeWidth="1.75" />
        ) : (
          <circle cx="6" cy="6" r="4.25" fill="none" stroke="currentColor" strokeWidth="1.25" />
        )}
      </svg>
      {state === "withdrawn" ? <s>{words[state]}</s> : words[state]}
    </span>
  );
}

/** Amber wherever it stands: a value that no investigation has confirmed. */
export function UnconfirmedSign({ basis }: { basis: "assumed" | "presumptive" }) {
  return (
    <span className="inline-flex items-center gap-1.5 whitespace-nowrap">
      <svg width="12" height="12" viewBox="0 0 12 12" className="text-affected" aria-hidden="true">
        <path d="M6 1 11 11H1Z" fill="none" stroke="currentColor" strokeWidth="1.5" />
        <path d="M6 4.5V7.5M6 9V9.75" stroke="currentColor" strokeWidth="1.25" />
      </svg>
      {basis === "assumed" ? "assumed, to be confirmed" : "presumed, to be confirmed"}
    </span>
  );
}
