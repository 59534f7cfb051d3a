"use client";

import { useQueryClient } from "@tanstack/react-query";
import { useState } from "react";
import { Notice } from "@/components/account/notice";
import { send } from "@/lib/client/send";
import type { DraftChoices, DraftContent, ValueDraft } from "@/lib/contracts/values";
import { DraftFieldInput } from "./draft-field";
import { type DraftField, draftGroups, reasonFields } from "./draft-fields";
import { DraftSources } from "./draft-sources";
import { LivePreview } from "./live-preview";
import { NetGrossFigure } from "./net-gross-figure";
import { type Saving, useDraft } from "./use-draft";

type Props = {
  projectId: string;
  valueId: string;
  draft: ValueDraft;
  documents: DraftChoices["documents"];
};

const savingWords: Record<Saving, string> = {
  saved: "Everything typed is saved.",
  typing: "Saved in a moment …",
  saving: "Saving …",
  "not saved": "Not saved.",
};

/** The draft of the next revision: saves itself, says beside each field what is missing, and previews what it would do. */
export function DraftEditor({ projectId, valueId, draft, documents }: Props) {
  const { content, change, save, saving, refused, revision } = useDraft(projectId, valueId, draft);
  const queries = useQueryClient();
  const [asked, setAsked] = useState(false);
  const [discarding, setDiscarding] = useState("");
  // Problems belong to the draft as it was last saved; while a field is still empty they are asked for, not shouted.
  const problemOf = (field: DraftField["name"] | "sources"): string | undefined => {
    const sentence = refused?.fields[`content.${field}`] ?? draft.problems[field];
    const given = content[field] !== undefined && content[field] !== null && content[field] !== "";
    return sentence && (asked || given) ? sentence : undefined;
  };
  const missing = Object.keys(draft.problems).length;

  const discard = async () => {
    const answer = await send(`/api/projects/${projectId}/values/${valueId}/draft`, "DELETE", {}, revision);
    if (!answer.done) return setDiscarding(answer.refused.detail);
    await queries.invalidateQueries({ queryKey: ["project", projectId] });
  };
  const field = (one: DraftField) =>
    one.when && !one.when(content) ? null : (
      <DraftFieldInput
        key={one.name}
        field={one}
        value={textOf(content[one.name])}
        problem={problemOf(one.name)}
        findings={draft.findings.filter((finding) => finding.field === one.name)}
        onChange={(value) => change({ [one.name]: value } as Partial<DraftContent>)}
      />
    );

  return (
    <section aria-labelledby="draft-title" className="mt-8 grid gap-8 xl:grid-cols-[minmax(0,1fr)_26rem]">
      <form method="post" onSubmit={(event) => event.preventDefault()} noValidate>
        <h2 id="draft-title" className="text-lg">
          Draft of the next revision
        </h2>
        <p role="status" className="text-sm text-ink-2">
          {savingWords[saving]} Last written by {draft.preparedBy.name}.
        </p>
        {refused && (
          <Notice kind="refused">
            {refused.detail}
            {refused.status === 412 &&
              " What you typed stays on this page; copy what you need, then load the page again."}
          </Notice>
        )}
        {draftGroups.map((group) => (
          <fieldset key={group.title} className="mt-6 max-w-3xl">
            <legend className="text-sm font-semibold">{group.title}</legend>
            {group.note && <p className="mt-1 text-sm text-ink-2">{group.note}</p>}
            {group.title === "The figure" && <NetGrossFigure basis={content.givenBasis ?? null} />}
            <div className="grid gap-x-6 sm:grid-cols-2">{group.fields.map(field)}</div>
            {group.title === "The figure" && draft.netAllowable_kPa !== null && (
              <p className="mt-3">
                Comes to <strong className="tabular-nums">{figure(draft.netAllowable_kPa)} kPa net</strong>.
              </p>
            )}
          </fieldset>
        ))}
        <DraftSources
          sources={content.sources ?? []}
          documents={documents}
          problem={problemOf("sources")}
          onChange={(sources) => change({ sources })}
        />
        {draft.findings
          .filter((finding) => finding.field === "sources")
          .map((finding) => (
            <p key={finding.code} className="mt-1 border-l-4 border-affected pl-2 text-sm">
              {finding.sentence}
            </p>
          ))}
        <fieldset className="mt-6 max-w-3xl">
          <legend className="text-sm font-semibold">Why</legend>
          {reasonFields.map(field)}
        </fieldset>
        <div className="mt-6 flex flex-wrap gap-4">
          <button
            type="button"
            className="bg-action px-4 py-2 text-on-action"
            onClick={() => {
              setAsked(true);
              void save();
            }}
          >
            What is still missing?
          </button>
          <button type="button" className="border border-rule px-4 py-2" onClick={() => void discard()}>
            Throw this draft away
          </button>
        </div>
        {asked && (
          <Notice kind={missing === 0 ? "done" : "refused"}>
            {missing === 0
              ? "Nothing is missing. Another geotechnical engineer can check it now."
              : `${missing} ${missing === 1 ? "field needs" : "fields need"} another look; each says so in its place.`}
          </Notice>
        )}
        {discarding && <Notice kind="refused">{discarding}</Notice>}
      </form>
      <LivePreview projectId={projectId} valueId={valueId} draftRevision={draft.revision} />
    </section>
  );
}

const textOf = (value: unknown): string => (value === undefined || value === null ? "" : String(value));
const figure = (pressure_kPa: number): string => String(Number(pressure_kPa.toPrecision(4)));
