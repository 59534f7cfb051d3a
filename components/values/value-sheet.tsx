"use client";

import { useQueryClient } from "@tanstack/react-query";
import { useState } from "react";
import { Notice } from "@/components/account/notice";
import { type Refused, send } from "@/lib/client/send";
import { useValue } from "@/lib/client/use-values";
import type { DraftChoices, ValueDetail } from "@/lib/contracts/values";
import { ConditionsList } from "./conditions-list";
import { DraftEditor } from "./draft-editor";
import { DraftReading } from "./draft-reading";
import { LivePreview } from "./live-preview";
import { RevisionHistory } from "./revision-history";
import { CheckAction, RevisionActions, type Rights } from "./sign-actions";
import { UnconfirmedSign } from "./value-sign";

type Props = {
  projectId: string;
  initial: ValueDetail;
  rights: Rights;
  documents: DraftChoices["documents"];
};

/** One bearing value: what is in force under which conditions, the draft of what comes next, and all that was before. */
export function ValueSheet({ projectId, initial, rights, documents }: Props) {
  const { data, error } = useValue(projectId, initial.id, initial);
  const value = data ?? initial;
  const current = value.revisions.find(({ id }) => id === value.currentRevisionId);
  const { draft, footings } = value;
  const [takesOver, setTakesOver] = useState(false);
  // Whoever writes in a draft cannot check it: another's draft opens for reading until one says otherwise.
  const writes = rights.draft && draft !== null && (draft.preparedBy.id === rights.personId || takesOver);
  const total = footings.notPoured + footings.poured;
  return (
    <>
      <h1 className="text-xl">
        {value.reference} {value.groundUnit.name}, {value.zone.name}
      </h1>
      {error && <Notice kind="refused">{error.message}</Notice>}
      {current ? (
        <section aria-label="In force" className="mt-3">
          <p className="text-lg tabular-nums">
            {Number(current.fields.netAllowable_kPa.toPrecision(4))} kPa net allowable, {current.code},{" "}
            {current.fields.purpose.replace("-", " ")}
          </p>
          {current.fields.basis !== "recommended" && (
            <p className="mt-1 border-l-4 border-affected pl-3">
              <UnconfirmedSign basis={current.fields.basis} />
              {`. No investigation has confirmed it. Not for construction before ${current.fields.confirmWho ?? "somebody"} has confirmed it on site, by ${current.fields.confirmBy ?? "a day to be set"}.`}
            </p>
          )}
          <p className="mt-1 text-ink-2">
            {total === 0
              ? "No footing is linked to it."
              : `${total.toLocaleString("en-GB")} linked ${total === 1 ? "footing" : "footings"}, ${footings.poured.toLocaleString("en-GB")} of them poured.`}{" "}
            Outside the conditions below there is no value.
          </p>
          <ConditionsList fields={current.fields} />
        </section>
      ) : (
        <p className="mt-3">No revision is in force: no footing can be checked against this value.</p>
      )}
      {writes && draft ? (
        <DraftEditor {...{ projectId, draft, documents }} valueId={value.id} />
      ) : (
        <StartDraft projectId={projectId} value={value} rights={rights} />
      )}
      {draft && !writes && <DraftReading draft={draft} />}
      {draft && !writes && rights.draft && (
        <p className="mt-3">
          <button type="button" className="border border-rule px-3 py-1.5" onClick={() => setTakesOver(true)}>
            Write in this draft
          </button>{" "}
          <span className="text-sm text-ink-2">You can then no longer be the one who checks it.</span>
        </p>
      )}
      {draft && <CheckAction {...{ projectId, value, rights, draft }} />}
      {!writes && total > 0 && current && (
        <div className="mt-8 max-w-xl">
          <LivePreview projectId={projectId} valueId={value.id} draftRevision={draft?.revision ?? 0} />
        </div>
      )}
      <RevisionHistory
        projectId={projectId}
        revisions={value.revisions}
        actions={(revision) => <RevisionActions {...{ projectId, value, rights, revision }} />}
      />
    </>
  );
}

function StartDraft({ projectId, value, rights }: { projectId: string; value: ValueDetail; rights: Rights }) {
  const queries = useQueryClient();
  const [busy, setBusy] = useState(false);
  const [refused, setRefused] = useState<Refused>();
  if (value.draft) return null;
  if (!rights.draft)
    return <p className="mt-6 text-ink-2">A geotechnical engineer writes the next revision.</p>;
  const start = async () => {
    if (busy) return;
    setBusy(true);
    const answer = await send(`/api/projects/${projectId}/values/${value.id}/draft`, "POST");
    setRefused(answer.done ? undefined : answer.refused);
    await queries.invalidateQueries({ queryKey: ["project", projectId] });
    setBusy(false);
  };
  return (
    <div className="mt-6">
      <button
        type="button"
        aria-disabled={busy}
        onClick={() => void start()}
        className="bg-action px-4 py-2 text-on-action"
      >
        {busy
          ? "One moment …"
          : value.revisions.length === 0
            ? "Write the first revision"
            : "Revise the value"}
      </button>
      {refused && <Notice kind="refused">{refused.detail}</Notice>}
    </div>
  );
}
