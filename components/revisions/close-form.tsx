"use client";

import { type FormEvent, useState } from "react";
import { Notice } from "@/components/account/notice";
import { TextField } from "@/components/account/text-field";
import { type Refused, send } from "@/lib/client/send";

type Props = { projectId: string; changeId: string; open: number; onDone: () => Promise<void> };

/** The project lead's word that a change is answered. Says what is in the way while something is. */
export function CloseForm({ projectId, changeId, open, onDone }: Props) {
  const [busy, setBusy] = useState(false);
  const [refused, setRefused] = useState<Refused>();
  if (open > 0)
    return (
      <p className="mt-8 text-ink-2">
        It can be closed when {open === 1 ? "the last footing has" : `the ${open} open footings have`} an
        answer.
      </p>
    );
  const onSubmit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    if (busy) return;
    const note = String(new FormData(event.currentTarget).get("note") ?? "");
    setBusy(true);
    const answer = await send(`/api/projects/${projectId}/changes/${changeId}/close`, "POST", { note });
    setBusy(false);
    setRefused(answer.done ? undefined : answer.refused);
    if (answer.done) await onDone();
  };
  return (
    <form method="post" onSubmit={onSubmit} noValidate className="mt-8 max-w-prose">
      <TextField name="note" label="Note on closing" problem={refused?.fields.note} autoComplete="off" />
      <button type="submit" aria-disabled={busy} className="mt-3 bg-action px-4 py-2 text-on-action">
        {busy ? "One moment …" : "Close the change"}
      </button>
      {refused && <Notice kind="refused">{refused.detail}</Notice>}
    </form>
  );
}
