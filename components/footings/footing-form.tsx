"use client";

import { useRouter } from "next/navigation";
import { type FormEvent, useRef, useState } from "react";
import { TextField } from "@/components/account/text-field";
import { Notice } from "@/components/ui/notice";
import type { Refused } from "@/lib/client/send";
import { useFootingChange } from "@/lib/client/use-footings";
import type { FootingDetail } from "@/lib/contracts/footings";
import { numberTyped } from "./shown";

type Props = {
  projectId: string;
  owners: { id: string; name: string }[];
  /** The footing that is changed; left out for a new one. */
  footing?: FootingDetail;
  datum: string;
  grid: string;
};

const numbers = [
  ["breadth_m", "Breadth B (m)", "Along the breadth axis."],
  ["length_m", "Length L (m)", "At right angles to it."],
  ["thickness_m", "Thickness (m)", ""],
  ["easting_m", "Easting of the centre (m)", ""],
  ["northing_m", "Northing of the centre (m)", ""],
  ["orientation_deg", "Orientation (°)", "Anticlockwise from grid east to the breadth axis; empty is 0."],
  ["groundLevel_m", "Ground level (m)", ""],
  ["foundingLevel_m", "Founding level (m)", "Underside of the pad."],
  ["loadHeight_m", "Height of the loads above founding level (m)", "Empty: at the top of the pad."],
  ["concreteUnitWeight_kNm3", "Unit weight of concrete (kN/m³)", "Empty is 24."],
  ["backfillUnitWeight_kNm3", "Unit weight of backfill (kN/m³)", "Empty is 18."],
] as const;

/** Size, place and levels of a footing. Keeps what was typed when it is refused, and says what is wrong where it is. */
export function FootingForm({ projectId, owners, footing, datum, grid }: Props) {
  const router = useRouter();
  const change = useFootingChange(projectId);
  const form = useRef<HTMLFormElement>(null);
  const [busy, setBusy] = useState(false);
  const [refused, setRefused] = useState<Refused>();
  const [said, setSaid] = useState("");
  const now = footing?.geometry[0];

  const onSubmit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    if (busy) return;
    const typed = new FormData(event.currentTarget);
    const text = (name: string) => String(typed.get(name) ?? "");
    const body: Record<string, unknown> = {
      mark: text("mark"),
      gridReference: text("gridReference"),
      note: text("note"),
      ownerId: text("ownerId") || null,
    };
    for (const [name] of numbers) body[name] = numberTyped(text(name));
    if (footing) body.reason = text("reason");
    setBusy(true);
    setSaid("");
    const answer = footing
      ? await change<{ id: string; number: number }>(`footings/${footing.id}`, "PUT", body, footing.revision)
      : await change<{ id: string }>("footings", "POST", body);
    setBusy(false);
    setRefused(answer.done ? undefined : answer.refused);
    if (!answer.done) {
      const [wrong] = Object.keys(answer.refused.fields);
      const field = wrong && form.current?.elements.namedItem(wrong);
      if (field instanceof HTMLElement) field.focus();
      return;
    }
    if (!footing) return router.push(`/projects/${projectId}/footings/${answer.body.id}`);
    setSaid(
      "The footing is changed. A check made before is affected where its size, place or levels have changed.",
    );
  };

  return (
    <form ref={form} onSubmit={onSubmit} noValidate className="max-w-4xl">
      <div className="grid gap-x-6 sm:grid-cols-3">
        <TextField
          name="mark"
          label="Mark"
          maxLength={40}
          defaultValue={footing?.mark}
          problem={refused?.fields.mark}
        />
        <TextField
          name="gridReference"
          label="Grid reference"
          hint="As C/4."
          maxLength={40}
          defaultValue={footing?.gridReference}
          problem={refused?.fields.gridReference}
        />
        <div className="mt-4">
          <label className="block text-sm" htmlFor="ownerId">
            Owner
          </label>
          <select
            id="ownerId"
            name="ownerId"
            defaultValue={footing?.owner?.id ?? ""}
            aria-invalid={refused?.fields.ownerId ? true : undefined}
            className="mt-1 block w-full border border-field bg-sheet px-2 py-1.5"
          >
            <option value="">{footing ? "nobody" : "whoever registers it"}</option>
            {owners.map(({ id, name }) => (
              <option key={id} value={id}>
                {name}
              </option>
            ))}
          </select>
          {refused?.fields.ownerId && (
            <p className="mt-1 text-sm text-fails-text">{refused.fields.ownerId}</p>
          )}
        </div>
        {numbers.map(([name, label, hint]) => (
          <TextField
            key={name}
            name={name}
            label={label}
            hint={hint || undefined}
            inputMode="decimal"
            autoComplete="off"
            defaultValue={now ? String(now[name]) : ""}
            problem={refused?.fields[name]}
          />
        ))}
      </div>
      <p className="mt-2 text-sm text-ink-2">
        Positions on {grid}; levels on {datum}.
      </p>
      <TextField name="note" label="Note" maxLength={2000} problem={refused?.fields.note} />
      {footing && (
        <TextField
          name="reason"
          label="Reason for the change"
          hint="Stands with the revision and in the letter to those whom it concerns."
          maxLength={1000}
          problem={refused?.fields.reason}
        />
      )}
      {refused && (
        <Notice kind="refused" className="mt-3">
          {refused.detail}
        </Notice>
      )}
      {said && (
        <Notice kind="done" className="mt-3">
          {said}
        </Notice>
      )}
      <button type="submit" aria-disabled={busy} className="mt-5 bg-action px-4 py-2 text-on-action">
        {busy ? "One moment …" : footing ? "Save as the next revision" : "Register the footing"}
      </button>
    </form>
  );
}
