import { sql } from "drizzle-orm";
import {
  type Citation,
  type DocumentPage,
  type DocumentRevisionRow,
  type DocumentRow,
  readDocumentInput,
} from "@/lib/contracts/documents";
import { assertMay, type Context, inProject } from "../context";
import { NotFound } from "../errors";
import { parse } from "../parse";

/** One document with all its revisions, newest first, and everything that cites one of them. */
export async function readDocument(context: Context, given: unknown): Promise<DocumentPage> {
  assertMay(context, "project:read");
  const { documentId } = parse(readDocumentInput, given);
  return inProject(context, async (tx) => {
    const here = sql`d.project_id = ${context.projectId} and d.id = ${documentId}`;
    const [document] = (
      await tx.execute<Omit<DocumentRow, "revisions" | "citations">>(sql`
      select d.id, d.revision, d.reference, d.title, d.kind, d.author,
        d.current_revision_id as "currentRevisionId", r.code, r.status, r.received_on as "receivedOn",
        r.file_name as "fileName", r.media_type as "mediaType", r.size_bytes::float8 as "size_bytes"
      from document d left join document_revision r on r.project_id = d.project_id and r.id = d.current_revision_id
      where ${here}`)
    ).rows;
    if (!document) throw new NotFound("There is no such document in this project.");
    const revisions = await tx.execute<DocumentRevisionRow>(sql`
      select r.id, r.number, r.code, r.status, r.received_on as "receivedOn", r.file_name as "fileName",
        r.media_type as "mediaType", r.size_bytes::float8 as "size_bytes", r.sha256, r.limitations,
        p.name as "uploadedBy", to_char(r.uploaded_at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS"Z"') as "uploadedAt",
        d.current_revision_id is not distinct from r.id as current
      from document_revision r join document d on d.project_id = r.project_id and d.id = r.document_id
      join person p on p.id = r.uploaded_by
      where ${here} order by r.number desc`);
    const citations = await tx.execute<Citation>(sql`
      select 'bearing value' as kind, v.id, v.reference, b.code, s.page, s.clause,
        s.document_revision_id as "documentRevisionId", b.id as "valueRevisionId", x.state
      from value_source s
      join document_revision r on r.project_id = s.project_id and r.id = s.document_revision_id
      join document d on d.project_id = r.project_id and d.id = r.document_id
      join bearing_value_revision b on b.project_id = s.project_id and b.id = s.value_revision_id
      join bearing_value v on v.project_id = b.project_id and v.id = b.value_id
      join bearing_value_revision_state x on x.project_id = b.project_id and x.value_revision_id = b.id
      where ${here}
      union all
      select 'hole', h.id, h.name, hr.number::text, hr.source_page, '', hr.source_revision_id, null, null
      from hole_revision hr
      join hole h on h.project_id = hr.project_id and h.id = hr.hole_id
      join document_revision r on r.project_id = hr.project_id and r.id = hr.source_revision_id
      join document d on d.project_id = r.project_id and d.id = r.document_id
      where ${here}
      order by 1, 3, 4`);
    return {
      ...document,
      revisions: revisions.rows.length,
      citations: citations.rows.length,
      revisionRows: revisions.rows,
      citationRows: citations.rows,
    };
  });
}
