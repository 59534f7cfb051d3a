"use client";

import { useQueryClient } from "@tanstack/react-query";
import Link from "next/link";
import { type FormEvent, useId, useState } from "react";
import { Notice } from "@/components/account/notice";
import { type Refused, send } from "@/lib/client/send";
import type { OutcomeCounts } from "@/lib/contracts/changes";
import { countsInWords } from "@/lib/contracts/counts-in-words";
import type { DraftFinding, ValueDetail, ValueDraft, ValueRevision } from "@/lib/contracts/values";

export type Rights = { personId: string; draft: boolean; check: boolean; issue: boolean; withdraw: boolean };
type Common = { projectId: string; value: ValueDetail; rights: Rights };

/** The check of a draft: by another person than its preparer, who says yes to each point that is unusual. */
export function CheckAction({ projectId, value, rights, draft }: Common & { draft: ValueDraft }) {
  const { act, busy, refused } = useAct(projectId);
  const [confirmed, setConfirmed] = useState<string[]>([]);
  if (!rights.check) return null;
  if (draft.preparedBy.id === rights.personId)
    return (
      <p className="mt-4 text-ink-2">You prepared this draft: another geotechnical engineer checks it.</p>
    );
  const missing = Object.keys(draft.problems).length;
  const open = draft.findings.filter(({ code }) => !confirmed.includes(code));
  return (
    <section aria-labelledby="check-title" className="mt-6 border-l-4 border-action pl-4">
      <h2 id="check-title" className="text-lg">
        Check the draft
      </h2>
      {missing > 0 ? (
        <p>
          {missing} {missing === 1 ? "field needs" : "fields need"} another look before it can be checked.
        </p>
      ) : (
        <>
          <p className="max-w-prose">
            With your check the draft becomes a numbered revision under both names. It never changes after
            that; a third person issues it.
          </p>
          {draft.findings.map((finding) => (
            <Confirm
              key={finding.code}
              finding={finding}
              confirmed={confirmed.includes(finding.code)}
              onChange={(yes) =>
                setConfirmed(
                  yes ? [...confirmed, finding.code] : confirmed.filter((code) => code !== finding.code),
                )
              }
            />
          ))}
          <button
            type="button"
            aria-disabled={busy || open.length > 0}
            className="mt-3 bg-action px-4 py-2 text-on-action aria-disabled:opacity-60"
            onClick={() =>
              open.length === 0 && void act(`values/${value.id}/check`, { confirmed }, draft.revision)
            }
          >
            {busy ? "One moment …" : `Check ${value.reference}`}
          </button>
        </>
      )}
      {refused && <Notice kind="refused">{refused.detail}</Notice>}
    </section>
  );
}

function Confirm(props: { finding: DraftFinding; confirmed: boolean; onChange: (yes: boolean) => void }) {
  const { finding, confirmed, onChange } = props;
  return (
    <label className="mt-2 flex max-w-prose items-baseline gap-2">
      <input type="checkbox" checked={confirmed} onChange={(event) => onChange(event.target.checked)} />
      <span>
        {finding.sentence} <span className="text-ink-2">Source: {finding.source}.</span> Yes, it is so.
      </span>
    </label>
  );
}

/** What may be done with a revision now, or a sentence on who may do it. */
export function RevisionActions({
  projectId,
  value,
  rights,
  revision,
}: Common & { revision: ValueRevision }) {
  const { act, busy, refused, done } = useAct(projectId);
  const newest = value.revisions[0]?.id === revision.id;
  if (revision.state === "checked" && newest) {
    const signedIt = [revision.prepared.personId, revision.checked.personId].some(
      (id) => id === rights.personId,
    );
    if (!rights.issue || signedIt)
      return (
        <p className="mt-2 text-ink-2">
          {signedIt ? "You have signed this revision already: " : ""}a geotechnical engineer or the project
          lead who neither prepared nor checked it issues it.
        </p>
      );
    return (
      <div className="mt-3">
        <p className="max-w-prose">
          Issuing puts {revision.code} in force at once. Every check on an earlier revision is affected from
          then on, and the owners of the linked footings and the project lead are told by mail.
        </p>
        <button
          type="button"
          aria-disabled={busy}
          className="mt-2 bg-action px-4 py-2 text-on-action"
          onClick={() => void act(`values/${value.id}/revisions/${revision.id}/issue`, {}, value.revision)}
        >
          {busy ? "One moment …" : `Issue ${value.reference} ${revision.code}`}
        </button>
        {refused && <Notice kind="refused">{refused.detail}</Notice>}
      </div>
    );
  }
  if (revision.state !== "issued") return null;
  return (
    <>
      {done && (
        <Notice kind="done">
          {revision.code} is in force: {countsInWords(done.counts)}.{" "}
          <Link className="underline" href={`/projects/${projectId}/revisions/${done.changeId}`}>
            What it did to each footing
          </Link>
        </Notice>
      )}
      {rights.withdraw && <WithdrawForm {...{ projectId, value, revision }} />}
    </>
  );
}

function WithdrawForm({ projectId, value, revision }: Omit<Common, "rights"> & { revision: ValueRevision }) {
  const { act, busy, refused } = useAct(projectId);
  const id = useId();
  const onSubmit = (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    const reason = String(new FormData(event.currentTarget).get("reason") ?? "");
    void act(`values/${value.id}/revisions/${revision.id}/withdraw`, { reason }, value.revision);
  };
  const problem = refused?.fields.reason;
  return (
    <details className="mt-2">
      <summary>Withdraw {revision.code}</summary>
      <form method="post" onSubmit={onSubmit} noValidate className="max-w-prose">
        <p className="mt-2">
          Withdrawn, the value is out of use until another revision is issued: every check on it is affected,
          and no new check can be made. Nothing is erased.
        </p>
        <label className="mt-2 block text-sm" htmlFor={id}>
          Reason
        </label>
        <textarea
          id={id}
          name="reason"
          rows={2}
          aria-invalid={problem ? true : undefined}
          aria-describedby={problem ? `${id}n` : undefined}
          className="mt-1 block w-full border border-rule bg-sheet px-2 py-1.5 aria-invalid:border-fails"
        />
        {problem && (
          <p id={`${id}n`} className="mt-1 text-sm text-fails-text">
            {problem}
          </p>
        )}
        <button type="submit" aria-disabled={busy} className="mt-2 border border-rule px-4 py-2">
          {busy ? "One moment …" : `Withdraw ${value.reference} ${revision.code}`}
        </button>
        {refused && !problem && <Notice kind="refused">{refused.detail}</Notice>}
      </form>
    </details>
  );
}

type Acted = { changeId: string; counts: OutcomeCounts };

/** Does one signing act, once however often it is pressed, and reads everything again afterwards. */
function useAct(projectId: string) {
  const queries = useQueryClient();
  const [busy, setBusy] = useState(false);
  const [refused, setRefused] = useState<Refused>();
  const [done, setDone] = useState<Acted>();
  const act = async (path: string, body: Record<string, unknown>, revision: number) => {
    if (busy) return;
    setBusy(true);
    const answer = await send<Acted>(`/api/projects/${projectId}/${path}`, "POST", body, revision);
    setRefused(answer.done ? undefined : answer.refused);
    if (answer.done && answer.body.changeId) setDone(answer.body);
    await queries.invalidateQueries({ queryKey: ["project", projectId] });
    setBusy(false);
  };
  return { act, busy, refused, done };
}
