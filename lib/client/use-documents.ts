"use client";

import { useQuery } from "@tanstack/react-query";
import type { DocumentPage, DocumentRow } from "@/lib/contracts/documents";
import { fetchJson } from "./fetch-json";

/** The project's documents, each with the revision that counts. */
export function useDocuments(projectId: string, initial?: { documents: DocumentRow[] }) {
  return useQuery({
    queryKey: ["project", projectId, "documents"],
    queryFn: ({ signal }) =>
      fetchJson<{ documents: DocumentRow[] }>(`/api/projects/${projectId}/documents`, signal),
    initialData: initial,
  });
}

/** One document with its revisions and what cites them. */
export function useDocument(projectId: string, documentId: string, initial?: DocumentPage) {
  return useQuery({
    queryKey: ["project", projectId, "document", documentId],
    queryFn: ({ signal }) =>
      fetchJson<DocumentPage>(`/api/projects/${projectId}/documents/${documentId}`, signal),
    initialData: initial,
  });
}
