import { sql } from "drizzle-orm";
import * as t from "@/db/schema";
import { confirmSourceInput } from "@/lib/contracts/values";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { Conflict, NotFound } from "../errors";
import { parse } from "../parse";

/**
 * Records the geotechnical engineer's word that the newer revision of a cited document does not change the value: checks
 * on the value are no longer affected by that source. The document revision named is the newer one.
 */
export async function confirmSource(
  context: Context,
  given: { valueId: string; revisionId: string; documentRevisionId: string; reason: string },
) {
  assertMay(context, "source:confirm");
  const { valueId, revisionId, documentRevisionId, reason } = parse(confirmSourceInput, given);

  return inProject(context, async (tx) => {
    const rows = await tx.execute<{ cited: boolean; current: boolean; before: boolean }>(sql`
      select exists (select from value_source s
          join document_revision o on o.project_id = s.project_id and o.id = s.document_revision_id
          where s.project_id = n.project_id and s.value_revision_id = ${revisionId}
            and o.document_id = n.document_id and o.id <> n.id) as cited,
        d.current_revision_id = n.id as current,
        exists (select from source_confirmation k where k.project_id = n.project_id
          and k.value_revision_id = ${revisionId} and k.document_revision_id = n.id) as before
      from document_revision n
      join document d on d.project_id = n.project_id and d.id = n.document_id
      join bearing_value_revision r on r.project_id = n.project_id and r.id = ${revisionId} and r.value_id = ${valueId}
      where n.project_id = ${context.projectId} and n.id = ${documentRevisionId}`);
    const seen = rows.rows[0];
    if (!seen?.cited)
      throw new NotFound("This revision does not rest on an earlier revision of that document.");
    if (!seen.current) throw new Conflict("That document has a newer revision still. Look at that one.");
    if (seen.before) throw new Conflict("This source has been confirmed already.");
    await tx.insert(t.sourceConfirmation).values({
      projectId: context.projectId,
      valueRevisionId: revisionId,
      documentRevisionId,
      reason,
      confirmedBy: context.person.id,
    });
    await audit(tx, context, {
      verb: "source:confirm",
      subject: `value/${valueId}`,
      detail: { revisionId, documentRevisionId, reason },
    });
    return { valueId, revisionId, documentRevisionId };
  });
}
