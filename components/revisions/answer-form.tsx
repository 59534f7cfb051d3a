"use client";

import { type FormEvent, useId, useState } from "react";
import { Notice } from "@/components/account/notice";
import { type Refused, send } from "@/lib/client/send";

type Props = {
  projectId: string;
  changeId: string;
  chosen: string[];
  mayAccept: boolean;
  mayRefer: boolean;
  onDone: () => Promise<void>;
};

/** The written answer to the footings that are ticked: accepted as built by the project lead, or referred back. */
export function AnswerForm({ projectId, changeId, chosen, mayAccept, mayRefer, onDone }: Props) {
  const id = useId();
  const [reason, setReason] = useState("");
  const [busy, setBusy] = useState(false);
  const [refused, setRefused] = useState<Refused>();
  const [said, setSaid] = useState("");
  const answer = async (how: "accept" | "refer") => {
    if (busy || chosen.length === 0) return;
    setBusy(true);
    setSaid("");
    const result = await send<{ answered: number }>(
      `/api/projects/${projectId}/changes/${changeId}/${how}`,
      "POST",
      { consequenceIds: chosen, reason },
    );
    setBusy(false);
    setRefused(result.done ? undefined : result.refused);
    if (!result.done) return;
    setReason("");
    setSaid(`${result.body.answered} ${how === "accept" ? "accepted as built" : "referred back"}.`);
    await onDone();
  };
  const problem = refused?.fields.reason;
  const nothing = busy || chosen.length === 0;
  return (
    <section aria-labelledby={`${id}t`} className="mt-8 max-w-prose">
      <h2 id={`${id}t`} className="text-lg">
        Answer for the chosen footings
      </h2>
      <p className="mt-1 text-sm text-ink-2">
        A new check that passes answers by itself; run it on the footing's sheet. A footing that stays as it
        is needs a written reason here, which is kept for ever.
      </p>
      <form method="post" onSubmit={(event: FormEvent) => event.preventDefault()} noValidate>
        <label className="mt-3 block text-sm" htmlFor={id}>
          {mayAccept ? "Reason, with the evidence it rests on" : "Question to the geotechnical engineer"}
        </label>
        <textarea
          id={id}
          rows={3}
          value={reason}
          onChange={(event) => setReason(event.target.value)}
          aria-invalid={problem ? true : undefined}
          aria-describedby={problem ? `${id}n` : undefined}
          className="mt-1 block w-full border border-rule bg-sheet px-2 py-1.5 aria-invalid:border-fails"
        />
        {problem && (
          <p id={`${id}n`} className="mt-1 text-sm text-fails-text">
            {problem}
          </p>
        )}
        <div className="mt-3 flex flex-wrap items-center gap-4">
          {mayAccept && (
            <button
              type="button"
              aria-disabled={nothing}
              className="bg-action px-4 py-2 text-on-action aria-disabled:opacity-60"
              onClick={() => void answer("accept")}
            >
              Accept {chosen.length} as built
            </button>
          )}
          {mayRefer && (
            <button
              type="button"
              aria-disabled={nothing}
              className="border border-rule px-4 py-2 aria-disabled:opacity-60"
              onClick={() => void answer("refer")}
            >
              Refer {chosen.length} back
            </button>
          )}
        </div>
      </form>
      {refused && !problem && <Notice kind="refused">{refused.detail}</Notice>}
      {said && <Notice kind="done">{said}</Notice>}
    </section>
  );
}
