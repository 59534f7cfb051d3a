"use client";

import Link from "next/link";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { DefinitionList } from "@/components/ui/definition-list";
import { ErrorNote } from "@/components/ui/error-note";
import { Notice } from "@/components/ui/notice";
import { PageHead } from "@/components/ui/page-head";
import { fetchJson, Problem } from "@/lib/client/fetch-json";
import { useDocument } from "@/lib/client/use-documents";
import { sizeInWords, statusMeanings } from "@/lib/contracts/document-words";
import type { Citation, DocumentPage, DocumentRevisionRow } from "@/lib/contracts/documents";
import { UploadPanel } from "./upload-panel";

type Props = { projectId: string; initial: DocumentPage; mayWrite: boolean };

const sheets: Record<Citation["kind"], string> = {
  "bearing value": "values",
  hole: "holes",
  footing: "footings",
  "footing loads": "footings",
};

/** One document: every revision with its file, and everything in the register that cites it. */
export function DocumentSheet({ projectId, initial, mayWrite }: Props) {
  const { data } = useDocument(projectId, initial.id, initial);
  const document = data ?? initial;
  const codeOf = new Map(document.revisionRows.map(({ id, code }) => [id, code]));
  return (
    <>
      <PageHead
        title={`${document.reference} ${document.title}`}
        up={{ href: `/projects/${projectId}/documents`, label: "Documents" }}
      >
        {document.kind}
        {document.author && `, by ${document.author}`}
      </PageHead>
      {mayWrite && <UploadPanel projectId={projectId} documents={[document]} documentId={document.id} />}
      <h2 className="mt-6 text-lg">Revisions</h2>
      {document.revisionRows.map((revision) => (
        <Revision
          key={revision.id}
          projectId={projectId}
          documentId={document.id}
          revision={revision}
          latest={document.code ?? ""}
        />
      ))}
      <h2 className="mt-8 text-lg">What cites it</h2>
      {document.citationRows.length === 0 ? (
        <p className="mt-1 text-ink-2">Nothing in the register cites it yet.</p>
      ) : (
        <ul className="mt-1">
          {document.citationRows.map((citation) => (
            <li
              key={`${citation.kind} ${citation.id} ${citation.code} ${citation.page} ${citation.documentRevisionId}`}
              className="border-b border-rule py-1"
            >
              <Link
                className="underline"
                href={`/projects/${projectId}/${sheets[citation.kind]}/${citation.id}`}
              >
                {citation.reference}
              </Link>{" "}
              {citation.kind === "hole"
                ? `log ${citation.code}`
                : `${citation.code}${citation.state ? `, ${citation.state}` : ""}`}
              {" rests on "}
              {codeOf.get(citation.documentRevisionId)}
              {citation.page !== null && `, page ${citation.page}`}
              {citation.clause && `, ${citation.clause}`}
            </li>
          ))}
        </ul>
      )}
    </>
  );
}

function Revision(props: {
  projectId: string;
  documentId: string;
  revision: DocumentRevisionRow;
  latest: string;
}) {
  const { projectId, documentId, revision, latest } = props;
  const [problem, setProblem] = useState<Problem | null>(null);
  const [busy, setBusy] = useState(false);
  const download = async () => {
    setBusy(true);
    setProblem(null);
    try {
      const { url } = await fetchJson<{ url: string }>(
        `/api/projects/${projectId}/documents/${documentId}/revisions/${revision.id}/download`,
      );
      window.location.assign(url);
    } catch (error) {
      if (error instanceof Problem) setProblem(error);
      else throw error;
    } finally {
      setBusy(false);
    }
  };
  return (
    <section aria-label={`Revision ${revision.code}`} className="mt-3 max-w-4xl border border-rule">
      {!revision.current && (
        <p className="border-b border-rule bg-chosen px-4 py-1 font-semibold">
          SUPERSEDED by {latest}. Do not use it for new work.
        </p>
      )}
      <div className="flex flex-wrap items-start justify-between gap-4 px-4 py-3">
        <DefinitionList
          facts={[
            { term: "Revision", value: revision.code },
            { term: "Status", value: `${revision.status}, ${statusMeanings[revision.status] ?? ""}` },
            { term: "Received", value: revision.receivedOn },
            { term: "File", value: `${revision.fileName}, ${sizeInWords(revision.size_bytes)}` },
            {
              term: "Uploaded",
              value: `${revision.uploadedBy}, ${revision.uploadedAt.slice(0, 16).replace("T", " ")} UTC`,
            },
            { term: "SHA-256", value: <span className="break-all">{revision.sha256}</span> },
          ]}
        />
        <Button onClick={() => void download()} busy={busy}>
          Download {revision.code}
        </Button>
      </div>
      {revision.limitations && (
        <div className="px-4 pb-3">
          <Notice kind="attention" title="Known limitations">
            {revision.limitations}
          </Notice>
        </div>
      )}
      {problem && <ErrorNote problem={problem} />}
    </section>
  );
}
