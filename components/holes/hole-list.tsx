"use client";

import Link from "next/link";
import { useState } from "react";
import { Button, ButtonLink } from "@/components/ui/button";
import { type Column, DataTable } from "@/components/ui/data-table";
import { Empty } from "@/components/ui/empty";
import { ErrorNote } from "@/components/ui/error-note";
import { PageHead } from "@/components/ui/page-head";
import { TextInput } from "@/components/ui/text-input";
import { Problem } from "@/lib/client/fetch-json";
import { useHoles } from "@/lib/client/use-holes";
import type { HoleRow } from "@/lib/contracts/ground";
import { holeKinds } from "@/lib/contracts/ground-words";
import { figure } from "@/lib/units/format-quantity";
import { ImportDialog } from "./import-dialog";

type Props = { projectId: string; initial: { holes: HoleRow[] }; mayWrite: boolean };

/** The exploratory holes of the project, with what hangs on each log. */
export function HoleList({ projectId, initial, mayWrite }: Props) {
  const { data, error, isLoading, refetch } = useHoles(projectId, initial);
  const [search, setSearch] = useState("");
  const [importing, setImporting] = useState(false);
  const holes = data?.holes ?? [];
  const wanted = search.trim().toLowerCase();
  const shown = holes.filter(
    (row) =>
      row.name.toLowerCase().includes(wanted) ||
      (holeKinds[row.kind] ?? row.kind).toLowerCase().includes(wanted) ||
      row.status.toLowerCase().includes(wanted),
  );
  const number = (
    id: string,
    head: string,
    unit: string | undefined,
    value: (row: HoleRow) => number | null,
    decimals?: number,
  ): Column<HoleRow> => ({
    id,
    head,
    unit,
    kind: "figure",
    sortBy: (row) => value(row) ?? Number.NEGATIVE_INFINITY,
    cell: (row) => {
      const found = value(row);
      return found === null ? "—" : decimals === undefined ? found : found.toFixed(decimals);
    },
  });
  const columns: Column<HoleRow>[] = [
    {
      id: "name",
      head: "Hole",
      kind: "words",
      namesRow: true,
      sortBy: (row) => row.name,
      cell: (row) => (
        <Link className="underline" href={`/projects/${projectId}/holes/${row.id}`}>
          {row.name}
        </Link>
      ),
    },
    {
      id: "kind",
      head: "Kind",
      kind: "words",
      sortBy: (row) => row.kind,
      cell: (row) => holeKinds[row.kind] ?? row.kind,
    },
    {
      id: "status",
      head: "Status",
      kind: "words",
      sortBy: (row) => row.status,
      cell: (row) => row.status.toLowerCase() || "not stated",
    },
    {
      id: "level",
      head: "Ground level",
      unit: "m",
      kind: "figure",
      sortBy: (row) => row.groundLevel_m ?? Number.NEGATIVE_INFINITY,
      cell: (row) => (row.groundLevel_m === null ? "—" : figure(row.groundLevel_m, "level")),
    },
    number("depth", "Final depth", "m", (row) => row.finalDepth_m, 2),
    number("easting", "Easting", "m", (row) => row.easting_m, 2),
    number("northing", "Northing", "m", (row) => row.northing_m, 2),
    number("strata", "Strata", undefined, (row) => row.strata),
    number("unassigned", "Not in a unit", undefined, (row) => row.unassigned),
    number("spts", "SPTs", undefined, (row) => row.spts),
    number("strikes", "Water strikes", undefined, (row) => row.strikes),
  ];
  return (
    <>
      <PageHead
        title="Holes"
        actions={
          <>
            <ButtonLink href={`/projects/${projectId}/holes/units`}>Ground units</ButtonLink>
            {mayWrite && (
              <>
                <ButtonLink href={`/projects/${projectId}/holes/new`}>New hole</ButtonLink>
                <Button kind="main" onClick={() => setImporting(true)}>
                  Import AGS data
                </Button>
              </>
            )}
          </>
        }
      >
        Ground between holes is interpreted: holes sample a tiny part of the site.
      </PageHead>
      <div className="mb-3 max-w-72">
        <TextInput
          label="Find by name, kind or status"
          type="search"
          optional
          value={search}
          onChange={(event) => setSearch(event.target.value)}
        />
      </div>
      <DataTable
        label="Exploratory holes"
        columns={columns}
        rows={shown}
        rowKey={(row) => row.id}
        rowLabel={(row) => row.name}
        loading={isLoading}
        error={
          error instanceof Problem ? <ErrorNote problem={error} onRetry={() => void refetch()} /> : undefined
        }
        empty={
          wanted ? (
            <p className="p-4 text-ink-2">No hole matches. Clear the search to see all.</p>
          ) : (
            <Empty title="No exploratory hole yet.">
              {mayWrite
                ? "Import the AGS file of the investigation, or record a hole by hand."
                : "A geotechnical engineer records them."}
            </Empty>
          )
        }
      />
      {mayWrite && (
        <ImportDialog projectId={projectId} open={importing} onClose={() => setImporting(false)} />
      )}
    </>
  );
}
