"use client";

import { useQueryClient } from "@tanstack/react-query";
import Link from "next/link";
import { useState } from "react";
import { StripLog } from "@/components/figures/strip-log";
import { ButtonLink } from "@/components/ui/button";
import { DefinitionList } from "@/components/ui/definition-list";
import { ErrorNote } from "@/components/ui/error-note";
import { PageHead } from "@/components/ui/page-head";
import { ScrollAcross } from "@/components/ui/scroll-across";
import { fetchJson, Problem } from "@/lib/client/fetch-json";
import { useHole, useUnits } from "@/lib/client/use-holes";
import type { HolePage, SptRow, StratumRow, UnitRow } from "@/lib/contracts/ground";
import { holeKinds } from "@/lib/contracts/ground-words";

type Props = { projectId: string; initial: HolePage; units: { units: UnitRow[] }; mayWrite: boolean };

/** One hole: its log drawn and in words, where it came from, and which ground unit each stratum belongs to. */
export function HoleSheet({ projectId, initial, units, mayWrite }: Props) {
  const { data } = useHole(projectId, initial.id, initial);
  const { data: unitList } = useUnits(projectId, units);
  const hole = data ?? initial;
  const unitOf = new Map((unitList ?? units).units.map((unit) => [unit.id, unit]));
  const place =
    hole.easting_m === null || hole.northing_m === null
      ? "no place on plan"
      : `E ${hole.easting_m.toFixed(2)} m, N ${hole.northing_m.toFixed(2)} m`;
  return (
    <>
      <PageHead
        title={`Hole ${hole.name}`}
        up={{ href: `/projects/${projectId}/holes`, label: "Holes" }}
        actions={
          mayWrite ? (
            <ButtonLink href={`/projects/${projectId}/holes/new?of=${hole.id}`}>Correct the log</ButtonLink>
          ) : undefined
        }
      >
        {holeKinds[hole.kind] ?? hole.kind}
        {hole.status && `, ${hole.status.toLowerCase()}`}
      </PageHead>
      <DefinitionList
        facts={[
          { term: "Place on the site grid", value: place },
          {
            term: "As the source gave it",
            value:
              hole.givenEasting_m === null
                ? "on the site grid"
                : `E ${hole.givenEasting_m}, N ${hole.givenNorthing_m} ${hole.givenGrid || "(grid not named)"}`,
          },
          {
            term: "Ground level",
            value:
              hole.groundLevel_m === null
                ? "not stated"
                : `${hole.groundLevel_m.toFixed(2)} m${hole.givenDatum ? `, ${hole.givenDatum}` : ""}`,
          },
          {
            term: "Final depth",
            value: hole.finalDepth_m === null ? "not stated" : `${hole.finalDepth_m.toFixed(2)} m`,
          },
          {
            term: "Made",
            value: [hole.startedOn, hole.endedOn].filter(Boolean).join(" to ") || "not stated",
          },
          { term: "Logged by", value: hole.loggedBy || "not stated" },
          {
            term: "Source",
            value: hole.source ? (
              <Link className="underline" href={`/projects/${projectId}/documents/${hole.source.documentId}`}>
                {hole.source.reference} {hole.source.code}
                {hole.source.page !== null && `, page ${hole.source.page}`}
                {hole.dataIssue?.line != null && `, line ${hole.dataIssue.line}`}
              </Link>
            ) : (
              "recorded by hand"
            ),
          },
          {
            term: "Log",
            value: `revision ${hole.number}, ${hole.recordedBy}, ${hole.recordedAt.slice(0, 10)}`,
          },
        ]}
      />
      {hole.remarks && <p className="mt-2 max-w-prose">{hole.remarks}</p>}
      <ScrollAcross label="Strip log" className="mt-6">
        <StripLog
          hole={{
            name: hole.name,
            groundLevel_m: hole.groundLevel_m,
            finalDepth_m: hole.finalDepth_m,
            strata: hole.strataRows.map((row) => {
              const unit = row.groundUnitId ? unitOf.get(row.groundUnitId) : undefined;
              return { ...row, unit: unit ? { code: unit.code, name: unit.name } : null };
            }),
            spts: hole.sptRows,
            strikes: hole.strikeRows,
          }}
        />
      </ScrollAcross>
      <StrataTable
        projectId={projectId}
        strata={hole.strataRows}
        units={[...unitOf.values()]}
        mayWrite={mayWrite}
      />
      <TestsTable spts={hole.sptRows} />
      {hole.strikeRows.length > 0 && (
        <section className="mt-8">
          <h2 className="text-lg">Water while boring</h2>
          <ul>
            {hole.strikeRows.map((strike) => (
              <li key={`${strike.depth_m} ${strike.at}`}>
                Struck at {strike.depth_m.toFixed(2)} m{strike.at && `, ${strike.at}`}
                {strike.rises
                  .map((rise) => `; after ${rise.minutes} min ${rise.text || rise.depth_m}`)
                  .join("")}
                {strike.remarks && `. ${strike.remarks}`}
              </li>
            ))}
          </ul>
          <p className="mt-1 text-ink-2">
            Levels vary with the season; a hole that is dry at drilling does not prove a low water table.
          </p>
        </section>
      )}
      {hole.revisions.length > 1 && (
        <section className="mt-8">
          <h2 className="text-lg">Revisions of the log</h2>
          <ul>
            {hole.revisions.map((revision) => (
              <li key={revision.id}>
                {revision.number}: {revision.reason || "first record"} ({revision.recordedBy},{" "}
                {revision.recordedAt.slice(0, 10)})
              </li>
            ))}
          </ul>
        </section>
      )}
    </>
  );
}

function StrataTable(props: {
  projectId: string;
  strata: StratumRow[];
  units: UnitRow[];
  mayWrite: boolean;
}) {
  const { projectId, strata, units, mayWrite } = props;
  const client = useQueryClient();
  const [problem, setProblem] = useState<Problem | null>(null);
  const assign = async (stratumId: string, groundUnitId: string) => {
    setProblem(null);
    try {
      await fetchJson(`/api/projects/${projectId}/strata/assign`, {
        method: "POST",
        body: { stratumIds: [stratumId], groundUnitId: groundUnitId || null },
      });
    } catch (error) {
      if (error instanceof Problem) setProblem(error);
      else throw error;
    }
    await client.invalidateQueries({ queryKey: ["project", projectId] });
  };
  return (
    <section className="mt-8">
      <h2 className="text-lg">Strata</h2>
      {problem && <ErrorNote problem={problem} />}
      <ScrollAcross label="Strata">
        <table className="w-full">
          <thead>
            <tr className="border-b border-rule text-left">
              <th className="py-1 pr-4 text-right font-normal">Top (m)</th>
              <th className="py-1 pr-4 text-right font-normal">Base (m)</th>
              <th className="py-1 pr-4 font-normal">Description</th>
              <th className="py-1 pr-4 font-normal">Codes</th>
              <th className="py-1 font-normal">Ground unit</th>
            </tr>
          </thead>
          <tbody>
            {strata.map((row) => (
              <tr key={row.id} className="border-b border-rule align-top">
                <td className="py-1 pr-4 text-right">{row.top_m.toFixed(2)}</td>
                <td className="py-1 pr-4 text-right">{row.base_m === null ? "—" : row.base_m.toFixed(2)}</td>
                <td className="max-w-prose py-1 pr-4">{row.description}</td>
                <td className="py-1 pr-4">{[row.legendCode, row.geologyCode].filter(Boolean).join(" ")}</td>
                <td className="py-1">
                  {mayWrite ? (
                    <select
                      aria-label={`Ground unit of the stratum at ${row.top_m.toFixed(2)} m`}
                      value={row.groundUnitId ?? ""}
                      onChange={(event) => void assign(row.id, event.target.value)}
                      className="border border-field bg-sheet px-2 py-1"
                    >
                      <option value="">none yet</option>
                      {units.map((unit) => (
                        <option key={unit.id} value={unit.id}>
                          {unit.code} {unit.name}
                        </option>
                      ))}
                    </select>
                  ) : (
                    (row.groundUnit ?? "none yet")
                  )}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </ScrollAcross>
    </section>
  );
}

/** N, or on refusal the blows and how far they drove: never one for the other. */
const outcomeOf = (spt: SptRow): string =>
  spt.refusal
    ? `${spt.mainBlows ?? "?"} for ${spt.mainPenetration_mm ?? "?"} mm`
    : spt.blowCount === null
      ? "not stated"
      : String(spt.blowCount);

function TestsTable({ spts }: { spts: SptRow[] }) {
  if (spts.length === 0) return null;
  return (
    <section className="mt-8">
      <h2 className="text-lg">Standard penetration tests</h2>
      <table>
        <thead>
          <tr className="border-b border-rule text-left">
            <th className="py-1 pr-6 text-right font-normal">Depth (m)</th>
            <th className="py-1 pr-6 text-right font-normal">N, or refusal</th>
            <th className="py-1 font-normal">As the log says</th>
          </tr>
        </thead>
        <tbody>
          {spts.map((spt) => (
            <tr key={`${spt.depth_m} ${spt.reportText}`} className="border-b border-rule">
              <td className="py-1 pr-6 text-right">{spt.depth_m.toFixed(2)}</td>
              <td className="py-1 pr-6 text-right">{outcomeOf(spt)}</td>
              <td className="py-1">{spt.reportText}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
