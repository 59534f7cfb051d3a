"use client";

import { useQueryClient } from "@tanstack/react-query";
import { type FormEvent, useState } from "react";
import { SoilSwatch } from "@/components/figures/soil-hatch";
import { Button } from "@/components/ui/button";
import { type Column, DataTable } from "@/components/ui/data-table";
import { Empty } from "@/components/ui/empty";
import { ErrorNote } from "@/components/ui/error-note";
import { Notice } from "@/components/ui/notice";
import { PageHead } from "@/components/ui/page-head";
import { Select } from "@/components/ui/select";
import { TextInput } from "@/components/ui/text-input";
import { fetchJson, Problem } from "@/lib/client/fetch-json";
import { useStrata, useUnits } from "@/lib/client/use-holes";
import type { StratumRow, UnitRow } from "@/lib/contracts/ground";
import { soils } from "@/lib/contracts/ground-words";

type Props = { projectId: string; initial: { units: UnitRow[] }; mayWrite: boolean };

/** The ground units of the project, and the strata that are assigned to them one by one or in bulk. */
export function UnitsSheet({ projectId, initial, mayWrite }: Props) {
  const { data } = useUnits(projectId, initial);
  const units = (data ?? initial).units;
  return (
    <>
      <PageHead title="Ground units" up={{ href: `/projects/${projectId}/holes`, label: "Holes" }}>
        Layers of the whole project. Assigning a stratum to a unit is the engineer's reading; the log stays as
        it was written.
      </PageHead>
      {units.length === 0 ? (
        <Empty title="No ground unit yet.">
          {mayWrite
            ? "Add the first below: a code, a name and its principal soil."
            : "A geotechnical engineer adds them."}
        </Empty>
      ) : (
        <ul className="max-w-4xl">
          {units.map((unit) => (
            <li
              key={unit.id}
              className="grid grid-cols-[3rem_3rem_14rem_1fr_6rem] items-center gap-3 border-b border-rule py-1"
            >
              <SoilSwatch soil={unit.soil} />
              <span>{unit.code}</span>
              <span className="font-semibold">{unit.name}</span>
              <span className="text-ink-2">{unit.description}</span>
              <span className="text-right">{unit.strata} strata</span>
            </li>
          ))}
        </ul>
      )}
      {mayWrite && <NewUnit projectId={projectId} position={units.length} />}
      <Assign projectId={projectId} units={units} mayWrite={mayWrite} />
    </>
  );
}

function NewUnit({ projectId, position }: { projectId: string; position: number }) {
  const client = useQueryClient();
  const [problem, setProblem] = useState<Problem | null>(null);
  const [busy, setBusy] = useState(false);
  const submit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    const form = event.currentTarget;
    const typed = Object.fromEntries(new FormData(form)) as Record<string, string>;
    setBusy(true);
    setProblem(null);
    try {
      await fetchJson(`/api/projects/${projectId}/units`, {
        method: "POST",
        body: { ...typed, soil: typed.soil || undefined, position },
      });
      form.reset();
      await client.invalidateQueries({ queryKey: ["project", projectId] });
    } catch (error) {
      if (error instanceof Problem) setProblem(error);
      else throw error;
    } finally {
      setBusy(false);
    }
  };
  const said = problem?.fields ?? {};
  return (
    <form method="post" noValidate onSubmit={(event) => void submit(event)} className="mt-4">
      <div className="grid max-w-4xl items-start gap-3 sm:grid-cols-[6rem_14rem_12rem_1fr]">
        <TextInput label="Code" name="code" error={said.code} />
        <TextInput label="Name" name="name" error={said.name} />
        <Select
          label="Principal soil"
          name="soil"
          defaultValue=""
          placeholder="Choose one"
          error={said.soil}
          options={soils.map((value) => ({ value, label: value.replace("-", " ") }))}
        />
        <TextInput label="Description" name="description" optional error={said.description} />
      </div>
      {problem && <ErrorNote problem={problem} fieldsShown={Object.keys(said)} />}
      <Button type="submit" busy={busy} className="mt-3">
        Add the unit
      </Button>
    </form>
  );
}

function Assign({ projectId, units, mayWrite }: { projectId: string; units: UnitRow[]; mayWrite: boolean }) {
  const client = useQueryClient();
  const { data, error, isLoading, refetch } = useStrata(projectId);
  const [words, setWords] = useState("");
  const [open, setOpen] = useState(true);
  const [chosen, setChosen] = useState<Set<string>>(new Set());
  const [unit, setUnit] = useState("");
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<Problem | null>(null);
  const [done, setDone] = useState<string | null>(null);
  const wanted = words.trim().toLowerCase();
  const shown = (data?.strata ?? []).filter(
    (row) =>
      (!open || row.groundUnitId === null) &&
      (wanted === "" ||
        row.description.toLowerCase().includes(wanted) ||
        row.geologyCode.toLowerCase() === wanted ||
        row.legendCode === wanted ||
        row.hole.toLowerCase() === wanted),
  );
  const columns: Column<StratumRow>[] = [
    {
      id: "hole",
      head: "Hole",
      kind: "words",
      namesRow: true,
      width_px: 110,
      sortBy: (row) => row.hole,
      cell: (row) => row.hole,
    },
    {
      id: "top",
      head: "Top",
      unit: "m",
      kind: "figure",
      width_px: 80,
      sortBy: (row) => row.top_m,
      cell: (row) => row.top_m.toFixed(2),
    },
    {
      id: "base",
      head: "Base",
      unit: "m",
      kind: "figure",
      width_px: 80,
      sortBy: (row) => row.base_m ?? 0,
      cell: (row) => row.base_m?.toFixed(2) ?? "—",
    },
    {
      id: "words",
      head: "Description",
      kind: "words",
      sortBy: (row) => row.description,
      cell: (row) => row.description,
    },
    {
      id: "legend",
      head: "Legend",
      kind: "words",
      width_px: 80,
      sortBy: (row) => row.legendCode,
      cell: (row) => row.legendCode,
    },
    {
      id: "geology",
      head: "Geology",
      kind: "words",
      width_px: 90,
      sortBy: (row) => row.geologyCode,
      cell: (row) => row.geologyCode,
    },
    {
      id: "unit",
      head: "Unit",
      kind: "words",
      width_px: 80,
      sortBy: (row) => row.groundUnit ?? "",
      cell: (row) => row.groundUnit ?? "none yet",
    },
  ];
  const assign = async () => {
    setBusy(true);
    setProblem(null);
    setDone(null);
    try {
      const { assigned } = await fetchJson<{ assigned: number }>(`/api/projects/${projectId}/strata/assign`, {
        method: "POST",
        body: { stratumIds: [...chosen], groundUnitId: unit || null },
      });
      setDone(`${assigned} ${assigned === 1 ? "stratum" : "strata"} assigned.`);
      setChosen(new Set());
      await client.invalidateQueries({ queryKey: ["project", projectId] });
    } catch (caught) {
      if (caught instanceof Problem) setProblem(caught);
      else throw caught;
    } finally {
      setBusy(false);
    }
  };
  return (
    <section className="mt-10">
      <h2 className="text-lg">Strata</h2>
      <div className="my-3 flex flex-wrap items-end gap-4">
        <TextInput
          label="Words of the description, a code or a hole"
          type="search"
          optional
          value={words}
          onChange={(event) => setWords(event.target.value)}
        />
        <label className="flex items-center gap-2 py-1.5">
          <input type="checkbox" checked={open} onChange={(event) => setOpen(event.target.checked)} />
          only those in no unit
        </label>
        {mayWrite && (
          <>
            <Select
              label={`Assign the ${chosen.size} chosen to`}
              value={unit}
              onChange={(event) => setUnit(event.target.value)}
              options={[
                { value: "", label: "no unit" },
                ...units.map(({ id, code, name }) => ({ value: id as string, label: `${code} ${name}` })),
              ]}
            />
            <Button
              busy={busy}
              unavailable={chosen.size === 0 ? "Choose strata in the table first." : undefined}
              onClick={() => void assign()}
            >
              Assign
            </Button>
          </>
        )}
      </div>
      {problem && <ErrorNote problem={problem} />}
      {done && <Notice kind="done">{done}</Notice>}
      <DataTable
        label="Strata of the current logs"
        columns={columns}
        rows={shown}
        rowKey={(row) => row.id}
        rowLabel={(row) => `${row.hole} at ${row.top_m} m`}
        loading={isLoading}
        chosen={mayWrite ? chosen : undefined}
        onChosen={mayWrite ? setChosen : undefined}
        error={
          error instanceof Problem ? <ErrorNote problem={error} onRetry={() => void refetch()} /> : undefined
        }
        empty={
          <p className="p-4 text-ink-2">
            {data?.strata.length === 0
              ? "No log has a stratum yet."
              : open && wanted === ""
                ? "Every stratum belongs to a unit."
                : "No stratum matches."}
          </p>
        }
      />
    </section>
  );
}
