"use client";

import Link from "next/link";
import { useState } from "react";
import { type Column, DataTable } from "@/components/ui/data-table";
import { Empty } from "@/components/ui/empty";
import { ErrorNote } from "@/components/ui/error-note";
import { PageHead } from "@/components/ui/page-head";
import { TextInput } from "@/components/ui/text-input";
import { Problem } from "@/lib/client/fetch-json";
import { useDocuments } from "@/lib/client/use-documents";
import { sizeInWords, statusMeanings } from "@/lib/contracts/document-words";
import type { DocumentRow } from "@/lib/contracts/documents";
import { UploadPanel } from "./upload-panel";

type Props = { projectId: string; initial: { documents: DocumentRow[] }; mayWrite: boolean };

/** The project's documents: what each is, the revision that counts, and how many value revisions cite it. */
export function DocumentList({ projectId, initial, mayWrite }: Props) {
  const { data, error, isLoading, refetch } = useDocuments(projectId, initial);
  const [search, setSearch] = useState("");
  const documents = data?.documents ?? [];
  const wanted = search.trim().toLowerCase();
  const shown = documents.filter((row) =>
    [row.reference, row.title, row.kind, row.author, row.fileName ?? ""].some((text) =>
      text.toLowerCase().includes(wanted),
    ),
  );
  const columns: Column<DocumentRow>[] = [
    {
      id: "reference",
      head: "Reference",
      kind: "words",
      namesRow: true,
      sortBy: (row) => row.reference,
      cell: (row) => (
        <Link className="underline" href={`/projects/${projectId}/documents/${row.id}`}>
          {row.reference}
        </Link>
      ),
    },
    { id: "title", head: "Title", kind: "words", sortBy: (row) => row.title, cell: (row) => row.title },
    { id: "kind", head: "Kind", kind: "words", sortBy: (row) => row.kind, cell: (row) => row.kind },
    { id: "author", head: "Author", kind: "words", sortBy: (row) => row.author, cell: (row) => row.author },
    { id: "code", head: "Revision", kind: "words", sortBy: (row) => row.code ?? "", cell: (row) => row.code },
    {
      id: "status",
      head: "Status",
      kind: "words",
      sortBy: (row) => row.status ?? "",
      cell: (row) => (row.status ? `${row.status}, ${statusMeanings[row.status] ?? ""}` : ""),
    },
    {
      id: "received",
      head: "Received",
      kind: "words",
      sortBy: (row) => row.receivedOn ?? "",
      cell: (row) => row.receivedOn,
    },
    {
      id: "size",
      head: "Size",
      kind: "figure",
      sortBy: (row) => row.size_bytes ?? 0,
      cell: (row) => (row.size_bytes === null ? "" : sizeInWords(row.size_bytes)),
    },
    {
      id: "citations",
      head: "Cited by",
      kind: "figure",
      sortBy: (row) => row.citations,
      cell: (row) => row.citations,
    },
  ];
  return (
    <>
      <PageHead title="Documents">
        Reports, logs, letters and drawings. Each file is kept as it came; a new revision supersedes the last.
      </PageHead>
      {mayWrite && <UploadPanel projectId={projectId} documents={documents} />}
      <div className="mt-6 mb-3 max-w-72">
        <TextInput
          label="Find by reference, title, kind or author"
          type="search"
          optional
          value={search}
          onChange={(event) => setSearch(event.target.value)}
        />
      </div>
      <DataTable
        label="Documents"
        columns={columns}
        rows={shown}
        rowKey={(row) => row.id}
        rowLabel={(row) => row.reference}
        loading={isLoading}
        height="whole"
        error={
          error instanceof Problem ? <ErrorNote problem={error} onRetry={() => void refetch()} /> : undefined
        }
        empty={
          wanted ? (
            <p className="p-4 text-ink-2">No document matches. Clear the search to see all.</p>
          ) : (
            <Empty title="No document yet.">
              {mayWrite
                ? "Drop a report, a log or a letter above: bearing values rest on them."
                : "An engineer of the project uploads them."}
            </Empty>
          )
        }
      />
    </>
  );
}
