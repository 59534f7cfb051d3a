"use client";

import { useId } from "react";
import type { DraftChoices, DraftContent } from "@/lib/contracts/values";

type Source = NonNullable<DraftContent["sources"]>[number];
type Props = {
  sources: Source[];
  documents: DraftChoices["documents"];
  problem?: string;
  onChange: (sources: Source[]) => void;
};

/** The pages that a draft rests on: document, page, clause and the holes that they name. */
export function DraftSources({ sources, documents, problem, onChange }: Props) {
  const change = (at: number, over: Partial<Source>) =>
    onChange(sources.map((source, index) => (index === at ? { ...source, ...over } : source)));
  const add = () => {
    const [first] = documents;
    if (first)
      onChange([
        ...sources,
        { documentRevisionId: first.documentRevisionId, page: null, clause: "", note: "", holes: [] },
      ]);
  };
  return (
    <fieldset className="mt-6" aria-describedby={problem ? "sources-note" : undefined}>
      <legend className="text-sm font-semibold">Sources</legend>
      {documents.length === 0 && sources.length === 0 && (
        <p className="mt-1 text-sm text-ink-2">
          No document has been registered. Upload the report on the documents sheet first.
        </p>
      )}
      {sources.map((source, at) => (
        <SourceLine
          // biome-ignore lint/suspicious/noArrayIndexKey: lines have no other identity than their place
          key={at}
          number={at + 1}
          source={source}
          documents={documents}
          onChange={(over) => change(at, over)}
          onRemove={() => onChange(sources.filter((_, index) => index !== at))}
        />
      ))}
      {problem && (
        <p id="sources-note" className="mt-1 text-sm text-fails-text">
          {problem}
        </p>
      )}
      {documents.length > 0 && (
        <button type="button" onClick={add} className="mt-3 border border-rule px-3 py-1.5">
          Add a source
        </button>
      )}
    </fieldset>
  );
}

type LineProps = {
  number: number;
  source: Source;
  documents: DraftChoices["documents"];
  onChange: (over: Partial<Source>) => void;
  onRemove: () => void;
};

function SourceLine({ number, source, documents, onChange, onRemove }: LineProps) {
  const id = useId();
  const known = documents.some(({ documentRevisionId }) => documentRevisionId === source.documentRevisionId);
  const box = "mt-1 block border border-rule bg-sheet px-2 py-1.5";
  return (
    <div className="mt-3 flex flex-wrap items-end gap-3 border-b border-rule pb-3">
      <div>
        <label className="block text-sm" htmlFor={`${id}d`}>
          Source {number}: document
        </label>
        <select
          id={`${id}d`}
          value={source.documentRevisionId}
          className={box}
          onChange={(event) =>
            onChange({ documentRevisionId: event.target.value as Source["documentRevisionId"] })
          }
        >
          {!known && <option value={source.documentRevisionId}>an earlier revision, as cited</option>}
          {documents.map(({ documentRevisionId, reference, code, title }) => (
            <option key={documentRevisionId} value={documentRevisionId}>
              {reference} {code}, {title}
            </option>
          ))}
        </select>
      </div>
      <div>
        <label className="block text-sm" htmlFor={`${id}p`}>
          Page
        </label>
        <input
          id={`${id}p`}
          inputMode="numeric"
          value={source.page ?? ""}
          className={`${box} w-20`}
          onChange={(event) => {
            const digits = event.target.value.replace(/\D/g, "").slice(0, 5);
            onChange({ page: digits === "" || Number(digits) === 0 ? null : Number(digits) });
          }}
        />
      </div>
      <div>
        <label className="block text-sm" htmlFor={`${id}c`}>
          Clause
        </label>
        <input
          id={`${id}c`}
          value={source.clause}
          maxLength={200}
          className={`${box} w-32`}
          onChange={(event) => onChange({ clause: event.target.value })}
        />
      </div>
      <div>
        <label className="block text-sm" htmlFor={`${id}h`}>
          Holes, with commas between
        </label>
        <input
          id={`${id}h`}
          defaultValue={source.holes.join(", ")}
          maxLength={1000}
          className={box}
          onBlur={(event) => onChange({ holes: namesIn(event.target.value) })}
        />
      </div>
      <button type="button" onClick={onRemove} className="border border-rule px-3 py-1.5">
        Remove source {number}
      </button>
    </div>
  );
}

const namesIn = (text: string): string[] =>
  text
    .split(",")
    .map((name) => name.trim().slice(0, 60))
    .filter((name) => name !== "");
