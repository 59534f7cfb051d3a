"use client";

import { type FormEvent, useState } from "react";
import { TextField } from "@/components/account/text-field";
import { Notice } from "@/components/ui/notice";
import type { Refused } from "@/lib/client/send";
import { useFootingChange } from "@/lib/client/use-footings";
import { stages, stageTitles } from "@/lib/contracts/footing-words";
import type { FootingDetail } from "@/lib/contracts/footings";

type Props = { projectId: string; footing: FootingDetail; today: string; mayRecord: boolean };

/** Where the footing stands on site, and the record of its next stage. A hold says why the concrete has to wait. */
export function StagePanel({ projectId, footing, today, mayRecord }: Props) {
  const change = useFootingChange(projectId);
  const [busy, setBusy] = useState(false);
  const [refused, setRefused] = useState<Refused>();
  const at = stages.indexOf(footing.stage);
  const next = stages[at + 1] ?? footing.stage;

  const onSubmit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    if (busy) return;
    const typed = new FormData(event.currentTarget);
    setBusy(true);
    const answer = await change(
      `footings/${footing.id}/stage`,
      "POST",
      {
        stage: String(typed.get("stage")),
        reachedOn: String(typed.get("reachedOn")),
        note: String(typed.get("note") ?? ""),
      },
      footing.revision,
    );
    setBusy(false);
    setRefused(answer.done ? undefined : answer.refused);
  };

  return (
    <section aria-labelledby="stage-title" className="mt-8">
      <h2 id="stage-title" className="text-lg">
        On site
      </h2>
      <ol className="mt-2 flex flex-wrap gap-x-2" aria-label="Stages">
        {stages.map((stage, index) => (
          <li
            key={stage}
            aria-current={index === at ? "step" : undefined}
            className={index === at ? "font-semibold" : "text-ink-2"}
          >
            {stageTitles[stage]}
            {index < stages.length - 1 && <span aria-hidden="true"> →</span>}
          </li>
        ))}
      </ol>
      {footing.hold && <p className="mt-3 border-2 border-fails px-3 py-2 font-semibold">{footing.hold}</p>}
      {footing.stage === "poured" && footing.check && footing.check.standing !== "current" && (
        <p className="mt-2">
          Poured and affected: do not load it further before an engineer has reviewed it. What to do is a
          decision of engineers, not a click.
        </p>
      )}
      {mayRecord && (
        <form
          key={footing.revision}
          onSubmit={onSubmit}
          noValidate
          className="grid max-w-4xl gap-x-6 sm:grid-cols-3"
        >
          <div className="mt-4">
            <label className="block text-sm" htmlFor="stage">
              Stage reached
            </label>
            <select
              id="stage"
              name="stage"
              defaultValue={next}
              className="mt-1 block w-full border border-field bg-sheet px-2 py-1.5"
            >
              {stages
                .filter((stage) => stage !== footing.stage)
                .map((stage) => (
                  <option key={stage} value={stage}>
                    {stageTitles[stage]}
                  </option>
                ))}
            </select>
          </div>
          <TextField
            name="reachedOn"
            label="On (date)"
            type="date"
            defaultValue={today}
            problem={refused?.fields.reachedOn}
          />
          <TextField
            name="note"
            label="Note"
            hint="Needed when a footing goes back."
            maxLength={2000}
            problem={refused?.fields.note}
          />
          <div className="sm:col-span-3">
            {refused && (
              <Notice kind="refused" className="mt-3">
                {refused.detail}
              </Notice>
            )}
            <button type="submit" aria-disabled={busy} className="mt-4 border border-field px-4 py-2">
              {busy ? "One moment …" : "Record the stage"}
            </button>
          </div>
        </form>
      )}
    </section>
  );
}
