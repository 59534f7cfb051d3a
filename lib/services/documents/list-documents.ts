import { sql } from "drizzle-orm";
import type { DocumentRow } from "@/lib/contracts/documents";
import { assertMay, type Context, inProject } from "../context";

/** Every document of the project with the revision that counts, by reference. */
export async function listDocuments(context: Context): Promise<{ documents: DocumentRow[] }> {
  assertMay(context, "project:read");
  return inProject(context, async (tx) => {
    const found = await tx.execute<DocumentRow>(sql`
      select d.id, d.revision, d.reference, d.title, d.kind, d.author,
        d.current_revision_id as "currentRevisionId", r.code, r.status, r.received_on as "receivedOn",
        r.file_name as "fileName", r.media_type as "mediaType", r.size_bytes::float8 as "size_bytes",
        (select count(*)::int from document_revision x where x.project_id = d.project_id and x.document_id = d.id)
          as revisions,
        (select count(distinct s.value_revision_id)::int from value_source s join document_revision x
          on x.project_id = s.project_id and x.id = s.document_revision_id
          where s.project_id = d.project_id and x.document_id = d.id) as citations
      from document d
      left join document_revision r on r.project_id = d.project_id and r.id = d.current_revision_id
      where d.project_id = ${context.projectId}
      order by d.reference`);
    return { documents: found.rows };
  });
}
