import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { DocumentId, DocumentRevisionId } from "@/lib/contracts/ids";
import type { CitedSource, DraftFinding } from "@/lib/contracts/values";
import type { Context } from "../context";

type Citation = Pick<
  CitedSource,
  "documentRevisionId" | "documentId" | "reference" | "title" | "code" | "supersededBy"
>;

/** How document revisions of this project are cited; those that it does not hold are missing from the answer. */
export async function citeSources(
  tx: Transaction,
  context: Context,
  ids: DocumentRevisionId[],
): Promise<Map<DocumentRevisionId, Citation>> {
  const rows = await tx.execute<Citation & { documentId: DocumentId }>(sql`
    select r.id as "documentRevisionId", d.id as "documentId", d.reference, d.title, r.code,
      case when d.current_revision_id is distinct from r.id then n.code end as "supersededBy"
    from document_revision r
    join document d on d.project_id = r.project_id and d.id = r.document_id
    left join document_revision n on n.project_id = d.project_id and n.id = d.current_revision_id
    where r.project_id = ${context.projectId} and r.id = any(${sql.param(ids)}::uuid[])`);
  return new Map(rows.rows.map((row) => [row.documentRevisionId, row]));
}

/** Asks "sure?" of each cited revision that no longer counts. */
export function supersededSources(sources: CitedSource[]): DraftFinding[] {
  return sources
    .filter(({ supersededBy }) => supersededBy !== null)
    .map(({ reference, code, supersededBy }) => ({
      code: `superseded-source ${reference} ${code}`.slice(0, 60),
      field: "sources",
      sentence: `${reference} ${code} is cited, but ${supersededBy} has replaced it. Does the older one still hold?`,
      source: "the register of documents",
    }));
}
