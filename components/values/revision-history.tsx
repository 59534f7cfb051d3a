import Link from "next/link";
import type { ReactNode } from "react";
import { ScrollAcross } from "@/components/ui/scroll-across";
import { valueWords } from "@/lib/contracts/value-words";
import type { CitedSource, FieldDifference, Signature, ValueRevision } from "@/lib/contracts/values";
import { ConditionsList } from "./conditions-list";
import { StateSign } from "./value-sign";

type Props = {
  projectId: string;
  revisions: ValueRevision[];
  actions: (revision: ValueRevision) => ReactNode;
};

/** Every revision, newest first: what it changed against the one before, why, on what evidence, and who signed. */
export function RevisionHistory({ projectId, revisions, actions }: Props) {
  return (
    <section aria-labelledby="history-title" className="mt-10">
      <h2 id="history-title" className="text-lg">
        Revisions
      </h2>
      {revisions.length === 0 && (
        <p className="mt-2 text-ink-2">None yet: a draft becomes one when it is checked.</p>
      )}
      {revisions.map((revision) => (
        <article
          key={revision.id}
          aria-label={`Revision ${revision.code}`}
          className="mt-4 border-t border-rule pt-3"
        >
          <h3 className="flex flex-wrap items-baseline gap-x-4">
            <span className="text-base tabular-nums">{revision.code}</span>
            <span className="tabular-nums">
              {Number(revision.fields.netAllowable_kPa.toPrecision(4))} kPa net
            </span>
            <StateSign state={revision.state} />
          </h3>
          <p className="mt-1 max-w-prose">
            {valueWords.reasonCode[revision.reasonCode as keyof typeof valueWords.reasonCode] ??
              revision.reasonCode}
            : {revision.reason}
          </p>
          {revision.withdrawn && (
            <p className="mt-1 border-l-4 border-fails pl-3">
              Withdrawn by {revision.withdrawn.name} on {revision.withdrawn.at.slice(0, 10)}:{" "}
              {revision.withdrawn.reason}
            </p>
          )}
          <Differences differences={revision.differences} />
          <Signatures revision={revision} />
          {actions(revision)}
          <Sources projectId={projectId} sources={revision.sources} />
          <details className="mt-2">
            <summary>All that {revision.code} states</summary>
            <ConditionsList fields={revision.fields} />
            <p className="mt-2 text-sm break-all text-ink-2">
              SHA-256 of what was signed: {revision.contentHash}
            </p>
          </details>
        </article>
      ))}
    </section>
  );
}

function Differences({ differences }: { differences: FieldDifference[] }) {
  if (differences.length === 0) return null;
  return (
    <ScrollAcross label="Differences">
      <table className="mt-2 text-sm">
        <caption className="text-left text-ink-2">Changed against the revision before</caption>
        <thead>
          <tr className="border-b border-rule text-left">
            <th scope="col" className="py-1 pr-4 font-normal">
              What
            </th>
            <th scope="col" className="py-1 pr-4 font-normal">
              Before
            </th>
            <th scope="col" className="py-1 pr-4 font-normal">
              Now
            </th>
            <th scope="col" className="py-1 text-right font-normal">
              Change (%)
            </th>
          </tr>
        </thead>
        <tbody>
          {differences.map(({ name, label, unit, before, after, change_percent }) => (
            <tr key={name} className="border-b border-rule align-top">
              <th scope="row" className="py-1 pr-4 text-left font-normal">
                {unit ? `${label} (${unit})` : label}
              </th>
              <td className="py-1 pr-4 tabular-nums">{before}</td>
              <td className="py-1 pr-4 tabular-nums">{after}</td>
              <td className="py-1 text-right tabular-nums">
                {change_percent === null
                  ? ""
                  : `${change_percent > 0 ? "+" : "−"}${Math.abs(change_percent).toFixed(1)}`}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </ScrollAcross>
  );
}

function Signatures({ revision }: { revision: ValueRevision }) {
  const signed = (what: string, by: Signature | null) => (
    <div key={what} className="contents">
      <dt className="text-ink-2">{what}</dt>
      <dd>
        {by ? (
          <>
            {by.name}
            {by.qualification && `, ${by.qualification}`}
            <span className="text-ink-2 tabular-nums">
              {" "}
              {new Date(by.at).toISOString().slice(0, 16).replace("T", " ")} UTC
            </span>
          </>
        ) : (
          "not yet"
        )}
      </dd>
    </div>
  );
  return (
    <dl className="mt-2 grid grid-cols-[auto_1fr] gap-x-4 text-sm">
      {signed("Prepared", revision.prepared)}
      {signed("Checked", revision.checked)}
      {signed("Issued", revision.issued)}
    </dl>
  );
}

function Sources({ projectId, sources }: { projectId: string; sources: CitedSource[] }) {
  if (sources.length === 0) return <p className="mt-2 text-sm text-ink-2">No source is cited.</p>;
  return (
    <ul className="mt-2 text-sm" aria-label="Sources">
      {sources.map((source) => (
        <li key={`${source.documentRevisionId} ${source.page} ${source.clause}`}>
          <Link className="underline" href={`/projects/${projectId}/documents/${source.documentId}`}>
            {source.reference} {source.code}
          </Link>{" "}
          {source.title}
          {source.page !== null && `, page ${source.page}`}
          {source.clause && `, ${source.clause}`}
          {source.holes.length > 0 && `, ${source.holes.join(", ")}`}
          {source.supersededBy && (
            <span className="text-ink-2">
              {" "}
              (superseded by {source.supersededBy}
              {source.confirmed ? ", value confirmed as it is" : ""})
            </span>
          )}
        </li>
      ))}
    </ul>
  );
}
