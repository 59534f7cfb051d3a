"use client";

import { useQueryClient } from "@tanstack/react-query";
import { type FormEvent, useState } from "react";
import { Button } from "@/components/ui/button";
import { Choice } from "@/components/ui/choice";
import { ErrorNote } from "@/components/ui/error-note";
import { TextInput } from "@/components/ui/text-input";
import { fetchJson, Problem } from "@/lib/client/fetch-json";
import type { UnitRow } from "@/lib/contracts/ground";
import type { Boundary, ZoneRow } from "@/lib/contracts/zones";

type Props = {
  projectId: string;
  units: UnitRow[];
  /** The zone that is reshaped or renamed; null while a new one is drawn. */
  zone: ZoneRow | null;
  ring_m: [number, number][] | null;
  onDone: () => void;
};

/** Names a drawn zone and says what it speaks for; a refusal stands here and the drawing stays for correction. */
export function ZonePanel({ projectId, units, zone, ring_m, onDone }: Props) {
  const client = useQueryClient();
  const [name, setName] = useState(zone?.name ?? "");
  const [reason, setReason] = useState("");
  const [chosen, setChosen] = useState<string[]>(zone?.groundUnitIds ?? []);
  const [boundary, setBoundary] = useState<Boundary | null>(zone?.boundary ?? null);
  const [problem, setProblem] = useState<Problem | null>(null);
  const [busy, setBusy] = useState(false);
  const said = problem?.fields ?? {};
  const submit = async (event: FormEvent) => {
    event.preventDefault();
    setBusy(true);
    setProblem(null);
    const fields = { name, groundUnitIds: chosen, boundary: boundary ?? undefined, reason };
    try {
      if (zone)
        await fetchJson(`/api/projects/${projectId}/zones/${zone.id}`, {
          method: "PATCH",
          ifMatch: zone.revision,
          body: { ...fields, ...(ring_m ? { ring_m } : {}) },
        });
      else
        await fetchJson(`/api/projects/${projectId}/zones`, {
          method: "POST",
          body: { ...fields, ring_m: ring_m ?? [] },
        });
      await client.invalidateQueries({ queryKey: ["project", projectId] });
      onDone();
    } catch (error) {
      if (error instanceof Problem) setProblem(error);
      else throw error;
    } finally {
      setBusy(false);
    }
  };
  return (
    <form
      method="post"
      noValidate
      onSubmit={(event) => void submit(event)}
      className="border border-rule p-4"
    >
      <h2 className="text-lg">{zone ? `Change ${zone.name}` : "New zone"}</h2>
      <p className="mt-1 text-ink-2">
        {zone
          ? "Drag the corners on the plan. A moved boundary affects the checks that rest on the zone."
          : ring_m
            ? "Drag corners until the boundary is right, then name it."
            : "Press the corners on the plan, the first once more to close."}
      </p>
      <TextInput
        label="Name"
        value={name}
        error={said.name}
        onChange={(event) => setName(event.target.value)}
        className="mt-3"
      />
      <fieldset className="mt-3">
        <legend>Speaks for these ground units</legend>
        {units.map((unit) => (
          <label key={unit.id} className="mt-1 flex items-baseline gap-2">
            <input
              type="checkbox"
              checked={chosen.includes(unit.id)}
              onChange={(event) =>
                setChosen(event.target.checked ? [...chosen, unit.id] : chosen.filter((id) => id !== unit.id))
              }
            />
            {unit.code} {unit.name}
          </label>
        ))}
        {units.length === 0 && <p className="text-ink-2">Add ground units first, on the sheet of holes.</p>}
        {said.groundUnitIds && <p className="text-fails-text">{said.groundUnitIds}</p>}
      </fieldset>
      <Choice<Boundary>
        label="How well the boundary is known"
        value={boundary}
        onChange={setBoundary}
        error={said.boundary}
        className="mt-3"
        answers={[
          { value: "proved", label: "Proved by holes along it" },
          { value: "interpolated", label: "Interpolated between holes" },
          { value: "inferred", label: "Inferred" },
        ]}
      />
      {zone && (
        <TextInput
          label="Reason"
          optional
          value={reason}
          onChange={(event) => setReason(event.target.value)}
          className="mt-3"
        />
      )}
      {said.ring_m && <p className="mt-3 text-fails-text">{said.ring_m}</p>}
      {problem && <ErrorNote problem={problem} fieldsShown={Object.keys(said)} />}
      <div className="mt-4 flex gap-3">
        <Button
          kind="main"
          type="submit"
          busy={busy}
          unavailable={!zone && !ring_m ? "Draw the boundary on the plan first." : undefined}
        >
          {zone ? "Keep the change" : "Keep the zone"}
        </Button>
        <Button kind="text" type="button" onClick={onDone}>
          Leave it
        </Button>
      </div>
    </form>
  );
}
