"use client";

import { useQueryClient } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { type FormEvent, useState } from "react";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { NumberInput } from "@/components/ui/number-input";
import { Select } from "@/components/ui/select";
import { TextInput } from "@/components/ui/text-input";
import { Textarea } from "@/components/ui/textarea";
import { fetchJson, Problem } from "@/lib/client/fetch-json";
import type { HolePage, UnitRow } from "@/lib/contracts/ground";
import { holeKinds, holeStatuses } from "@/lib/contracts/ground-words";

type Stratum = {
  key: number;
  top_m: number | null;
  base_m: number | null;
  description: string;
  groundUnitId: string;
};
type Spt = {
  key: number;
  depth_m: number | null;
  blowCount: number | null;
  blows: number | null;
  drive_mm: number | null;
};
type Strike = { key: number; depth_m: number | null; remarks: string };
type Props = { projectId: string; units: UnitRow[]; hole: HolePage | null };

let nextKey = 1;
const key = () => nextKey++;

/** Records a hole by hand, or corrects a log as a new revision. What was typed stays when the register refuses it. */
export function HoleForm({ projectId, units, hole }: Props) {
  const router = useRouter();
  const client = useQueryClient();
  const [facts, setFacts] = useState({
    name: hole?.name ?? "",
    kind: hole?.kind ?? "CP",
    status: hole?.status ?? "",
    easting_m: hole?.easting_m ?? null,
    northing_m: hole?.northing_m ?? null,
    groundLevel_m: hole?.groundLevel_m ?? null,
    finalDepth_m: hole?.finalDepth_m ?? null,
    startedOn: hole?.startedOn ?? "",
    endedOn: hole?.endedOn ?? "",
    loggedBy: hole?.loggedBy ?? "",
    remarks: hole?.remarks ?? "",
    reason: "",
  });
  const [strata, setStrata] = useState<Stratum[]>(
    (hole?.strataRows ?? []).map((row) => ({ ...row, key: key(), groundUnitId: row.groundUnitId ?? "" })),
  );
  const [spts, setSpts] = useState<Spt[]>(
    (hole?.sptRows ?? []).map((row) => ({
      key: key(),
      depth_m: row.depth_m,
      blowCount: row.blowCount,
      blows: row.refusal ? row.mainBlows : null,
      drive_mm: row.refusal ? row.mainPenetration_mm : null,
    })),
  );
  const [strikes, setStrikes] = useState<Strike[]>(
    (hole?.strikeRows ?? []).map((row) => ({ ...row, key: key() })),
  );
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<Problem | null>(null);
  const said = problem?.fields ?? {};
  const fact = <Name extends keyof typeof facts>(name: Name, value: (typeof facts)[Name]) =>
    setFacts((before) => ({ ...before, [name]: value }));
  const kinds = Object.entries(holeKinds).map(([value, label]) => ({ value, label: `${value}, ${label}` }));

  const submit = async (event: FormEvent) => {
    event.preventDefault();
    setBusy(true);
    setProblem(null);
    const { name, reason, ...log } = facts;
    const body = {
      ...log,
      sourceRevisionId: hole?.source?.documentRevisionId ?? null,
      sourcePage: hole?.source?.page ?? null,
      strata: strata.map(({ key: _, groundUnitId, top_m, base_m, description }) => ({
        top_m,
        base_m,
        description,
        groundUnitId: groundUnitId || null,
      })),
      spts: spts.map(({ depth_m, blowCount, blows, drive_mm }) => ({
        depth_m,
        blowCount,
        refusal: blows !== null || drive_mm !== null,
        mainBlows: blows,
        mainPenetration_mm: drive_mm,
      })),
      strikes: strikes.map(({ depth_m, remarks }) => ({ depth_m, remarks })),
    };
    try {
      const kept = hole
        ? await fetchJson<{ id: string }>(`/api/projects/${projectId}/holes/${hole.id}`, {
            method: "PATCH",
            ifMatch: hole.revision,
            body: { ...body, reason },
          })
        : await fetchJson<{ id: string }>(`/api/projects/${projectId}/holes`, {
            method: "POST",
            body: { ...body, name },
          });
      await client.invalidateQueries({ queryKey: ["project", projectId] });
      router.push(`/projects/${projectId}/holes/${kept.id}`);
    } catch (error) {
      if (error instanceof Problem) setProblem(error);
      else throw error;
    } finally {
      setBusy(false);
    }
  };
  const shownFields = Object.keys(said);
  const change = <Row extends { key: number }>(
    set: (act: (rows: Row[]) => Row[]) => void,
    row: Row,
    part: Partial<Row>,
  ) => set((rows) => rows.map((each) => (each.key === row.key ? { ...each, ...part } : each)));

  return (
    <form method="post" noValidate onSubmit={(event) => void submit(event)}>
      <div className="grid max-w-4xl gap-x-6 gap-y-3 sm:grid-cols-3">
        {!hole && (
          <TextInput
            label="Hole"
            value={facts.name}
            error={said.name}
            onChange={(e) => fact("name", e.target.value)}
          />
        )}
        <Select
          label="Kind"
          value={facts.kind}
          error={said.kind}
          options={kinds}
          onChange={(e) => fact("kind", e.target.value)}
        />
        <Select
          label="Status"
          optional
          value={facts.status}
          options={holeStatuses.map((value) => ({ value, label: value.toLowerCase() || "not stated" }))}
          onChange={(e) => fact("status", e.target.value)}
        />
        <NumberInput
          label="Easting"
          unit="m"
          value={facts.easting_m}
          error={said.easting_m}
          onChange={(v) => fact("easting_m", v)}
        />
        <NumberInput
          label="Northing"
          unit="m"
          value={facts.northing_m}
          error={said.northing_m}
          onChange={(v) => fact("northing_m", v)}
        />
        <NumberInput
          label="Ground level"
          unit="m"
          optional
          value={facts.groundLevel_m}
          error={said.groundLevel_m}
          onChange={(v) => fact("groundLevel_m", v)}
        />
        <NumberInput
          label="Final depth"
          unit="m"
          value={facts.finalDepth_m}
          error={said.finalDepth_m}
          onChange={(v) => fact("finalDepth_m", v)}
        />
        <TextInput
          label="Begun"
          type="date"
          optional
          value={facts.startedOn}
          onChange={(e) => fact("startedOn", e.target.value)}
        />
        <TextInput
          label="Ended"
          type="date"
          optional
          value={facts.endedOn}
          onChange={(e) => fact("endedOn", e.target.value)}
        />
        <TextInput
          label="Logged by"
          optional
          value={facts.loggedBy}
          onChange={(e) => fact("loggedBy", e.target.value)}
        />
        <div className="sm:col-span-2">
          <Textarea
            label="Remarks"
            optional
            value={facts.remarks}
            onChange={(e) => fact("remarks", e.target.value)}
          />
        </div>
        {hole && (
          <div className="sm:col-span-3">
            <Textarea
              label="Reason for the correction"
              value={facts.reason}
              error={said.reason}
              onChange={(e) => fact("reason", e.target.value)}
            />
          </div>
        )}
      </div>
      <h2 className="mt-6 text-lg">Strata, from the surface down</h2>
      {strata.map((row, at) => (
        <div
          key={row.key}
          className="mt-2 grid max-w-5xl items-start gap-3 sm:grid-cols-[7rem_7rem_1fr_12rem_auto]"
        >
          <NumberInput
            label="Top"
            unit="m"
            value={row.top_m}
            error={said[`strata.${at}.top_m`]}
            onChange={(v) => change(setStrata, row, { top_m: v })}
          />
          <NumberInput
            label="Base"
            unit="m"
            value={row.base_m}
            error={said[`strata.${at}.base_m`]}
            onChange={(v) => change(setStrata, row, { base_m: v })}
          />
          <TextInput
            label="Description"
            value={row.description}
            error={said[`strata.${at}.description`]}
            onChange={(e) => change(setStrata, row, { description: e.target.value })}
          />
          <Select
            label="Ground unit"
            optional
            value={row.groundUnitId}
            options={[
              { value: "", label: "none yet" },
              ...units.map(({ id, code, name }) => ({ value: id as string, label: `${code} ${name}` })),
            ]}
            onChange={(e) => change(setStrata, row, { groundUnitId: e.target.value })}
          />
          <Button
            kind="text"
            type="button"
            onClick={() => setStrata((all) => all.filter((each) => each !== row))}
          >
            Take away stratum {at + 1}
          </Button>
        </div>
      ))}
      <Button
        type="button"
        className="mt-2"
        onClick={() =>
          setStrata((all) => [
            ...all,
            { key: key(), top_m: all.at(-1)?.base_m ?? 0, base_m: null, description: "", groundUnitId: "" },
          ])
        }
      >
        Add a stratum
      </Button>
      <h2 className="mt-6 text-lg">Standard penetration tests</h2>
      {spts.map((row, at) => (
        <div
          key={row.key}
          className="mt-2 grid max-w-4xl items-start gap-3 sm:grid-cols-[8rem_8rem_10rem_10rem_auto]"
        >
          <NumberInput
            label="Depth"
            unit="m"
            value={row.depth_m}
            error={said[`spts.${at}.depth_m`]}
            onChange={(v) => change(setSpts, row, { depth_m: v })}
          />
          <NumberInput
            label="N"
            optional
            value={row.blowCount}
            error={said[`spts.${at}.blowCount`]}
            onChange={(v) => change(setSpts, row, { blowCount: v })}
          />
          <NumberInput
            label="On refusal, blows"
            optional
            value={row.blows}
            error={said[`spts.${at}.mainBlows`]}
            onChange={(v) => change(setSpts, row, { blows: v })}
          />
          <NumberInput
            label="for"
            unit="mm"
            optional
            value={row.drive_mm}
            error={said[`spts.${at}.mainPenetration_mm`]}
            onChange={(v) => change(setSpts, row, { drive_mm: v })}
          />
          <Button
            kind="text"
            type="button"
            onClick={() => setSpts((all) => all.filter((each) => each !== row))}
          >
            Take away test {at + 1}
          </Button>
        </div>
      ))}
      <Button
        type="button"
        className="mt-2"
        onClick={() =>
          setSpts((all) => [
            ...all,
            { key: key(), depth_m: null, blowCount: null, blows: null, drive_mm: null },
          ])
        }
      >
        Add a test
      </Button>
      <h2 className="mt-6 text-lg">Water strikes</h2>
      {strikes.map((row, at) => (
        <div key={row.key} className="mt-2 grid max-w-4xl items-start gap-3 sm:grid-cols-[8rem_1fr_auto]">
          <NumberInput
            label="Depth"
            unit="m"
            value={row.depth_m}
            error={said[`strikes.${at}.depth_m`]}
            onChange={(v) => change(setStrikes, row, { depth_m: v })}
          />
          <TextInput
            label="Remarks"
            optional
            value={row.remarks}
            onChange={(e) => change(setStrikes, row, { remarks: e.target.value })}
          />
          <Button
            kind="text"
            type="button"
            onClick={() => setStrikes((all) => all.filter((each) => each !== row))}
          >
            Take away strike {at + 1}
          </Button>
        </div>
      ))}
      <Button
        type="button"
        className="mt-2"
        onClick={() => setStrikes((all) => [...all, { key: key(), depth_m: null, remarks: "" }])}
      >
        Add a strike
      </Button>
      {problem && <ErrorNote problem={problem} fieldsShown={shownFields} />}
      <div className="mt-6">
        <Button kind="main" type="submit" busy={busy}>
          {hole ? "Keep as a new revision of the log" : "Record the hole"}
        </Button>
      </div>
    </form>
  );
}
