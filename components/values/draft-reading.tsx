import type { ValueDraft } from "@/lib/contracts/values";
import { draftGroups, reasonFields } from "./draft-fields";

/** A draft as another person reads it before checking it: every field as typed, with what is missing or odd. */
export function DraftReading({ draft }: { draft: ValueDraft }) {
  const fields = [...draftGroups.flatMap((group) => group.fields), ...reasonFields].filter(
    (field) => !field.when || field.when(draft.content),
  );
  return (
    <section aria-labelledby="reading-title" className="mt-8">
      <h2 id="reading-title" className="text-lg">
        Draft of the next revision
      </h2>
      <p className="text-sm text-ink-2">
        Written by {draft.preparedBy.name}, last changed{" "}
        <span className="tabular-nums">{draft.changedAt.slice(0, 16).replace("T", " ")} UTC</span>.
      </p>
      {draft.netAllowable_kPa !== null && (
        <p className="mt-2">
          Comes to{" "}
          <strong className="tabular-nums">{Number(draft.netAllowable_kPa.toPrecision(4))} kPa net</strong>.
        </p>
      )}
      <dl className="mt-3 grid max-w-4xl grid-cols-1 gap-x-6 gap-y-1 text-sm sm:grid-cols-[auto_1fr]">
        {fields.map((field) => {
          const value = draft.content[field.name];
          const typed = value === undefined || value === null ? "" : String(value);
          const words = field.options?.find(([option]) => option === typed)?.[1] ?? typed;
          const problem = draft.problems[field.name];
          return (
            <div key={field.name} className="contents">
              <dt className="text-ink-2">{field.unit ? `${field.label} (${field.unit})` : field.label}</dt>
              <dd className="whitespace-pre-wrap">
                {words || "not stated"}
                {problem && <span className="block text-fails-text">{problem}</span>}
              </dd>
            </div>
          );
        })}
        <dt className="text-ink-2">Sources</dt>
        <dd>
          {draft.sources.length === 0 && "none"}
          {draft.sources.map((source) => (
            <span key={`${source.documentRevisionId} ${source.page} ${source.clause}`} className="block">
              {source.reference} {source.code}, {source.title}
              {source.page !== null && `, page ${source.page}`}
              {source.clause && `, ${source.clause}`}
              {source.holes.length > 0 && `, ${source.holes.join(", ")}`}
            </span>
          ))}
          {draft.problems.sources && <span className="block text-fails-text">{draft.problems.sources}</span>}
        </dd>
      </dl>
    </section>
  );
}
