"use client";

import { useRouter } from "next/navigation";
import { type FormEvent, useState } from "react";
import { Notice } from "@/components/account/notice";
import { TextField } from "@/components/account/text-field";
import { type Refused, send } from "@/lib/client/send";
import type { NewValueChoices } from "@/lib/contracts/values";

type Props = { projectId: string; places: NewValueChoices["places"] };

/** Opens the entry of a ground unit in a zone that has none yet, and goes to it. */
export function NewValueForm({ projectId, places }: Props) {
  const router = useRouter();
  const [busy, setBusy] = useState(false);
  const [refused, setRefused] = useState<Refused>();
  if (places.length === 0)
    return (
      <p className="mt-2 max-w-prose text-ink-2">
        Every ground unit of every zone has its value. A further one needs another zone, or another unit in a
        zone.
      </p>
    );

  const onSubmit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    if (busy) return;
    const typed = new FormData(event.currentTarget);
    const place = places[Number(typed.get("place"))];
    if (!place) return;
    const { zoneId, groundUnitId } = place;
    const reference = String(typed.get("reference") ?? "").trim();
    setBusy(true);
    const answer = await send<{ id: string }>(`/api/projects/${projectId}/values`, "POST", {
      zoneId,
      groundUnitId,
      ...(reference === "" ? {} : { reference }),
    });
    setBusy(false);
    setRefused(answer.done ? undefined : answer.refused);
    if (answer.done) router.push(`/projects/${projectId}/values/${answer.body.id}`);
  };
  const problem = refused?.fields.zoneId ?? refused?.fields.groundUnitId;

  return (
    <form method="post" onSubmit={onSubmit} className="flex flex-wrap items-end gap-x-6" noValidate>
      <div className="mt-4">
        <label className="block text-sm" htmlFor="place">
          Zone and ground unit
        </label>
        <select
          id="place"
          name="place"
          aria-invalid={problem ? true : undefined}
          aria-describedby={problem ? "place-note" : undefined}
          className="mt-1 block border border-rule bg-sheet px-2 py-1.5"
        >
          {places.map((place, at) => (
            <option key={`${place.zoneId} ${place.groundUnitId}`} value={at}>
              {place.zone}: {place.groundUnit}
            </option>
          ))}
        </select>
        {problem && (
          <p id="place-note" className="mt-1 text-sm text-fails-text">
            {problem}
          </p>
        )}
      </div>
      <TextField
        name="reference"
        label="Reference"
        hint="Left empty, the next BV number is taken."
        problem={refused?.fields.reference}
        maxLength={40}
        autoComplete="off"
      />
      <button type="submit" aria-disabled={busy} className="mt-4 bg-action px-4 py-1.5 text-on-action">
        {busy ? "One moment …" : "Open the value"}
      </button>
      {refused && !problem && !refused.fields.reference && <Notice kind="refused">{refused.detail}</Notice>}
    </form>
  );
}
