import { and, asc, eq, getTableColumns } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import * as t from "@/db/schema";
import type { ProjectId } from "@/lib/contracts/ids";
import { contentHash } from "../values/content-hash";

const {
  projectId: _project,
  id: _id,
  valueId: _value,
  number: _number,
  code: _code,
  kind: _kind,
  table: _table,
  parameters: _parameters,
  derivation: _derivation,
  reason: _reason,
  preparedBy: _preparedBy,
  preparedAt: _preparedAt,
  checkedBy: _checkedBy,
  checkedAt: _checkedAt,
  contentHash: _contentHash,
  ...stated
} = getTableColumns(t.bearingValueRevision);

/**
 * The single-value revisions of a project whose fields, sources or reason are no longer those that two people signed:
 * the hash (in which the reason's code stands among the fields and beside them) is made again from the stored columns and compared with the one that was stored then.
 */
export async function alteredRevisions(tx: Transaction, projectId: ProjectId): Promise<string[]> {
  const r = t.bearingValueRevision;
  const revisions = await tx
    .select({
      fields: stated,
      id: r.id,
      valueId: r.valueId,
      number: r.number,
      code: r.code,
      reasonCode: r.reasonCode,
      reason: r.reason,
      contentHash: r.contentHash,
    })
    .from(r)
    .where(and(eq(r.projectId, projectId), eq(r.kind, "single")));
  const s = t.valueSource;
  const cited = await tx
    .select({
      valueRevisionId: s.valueRevisionId,
      source: {
        documentRevisionId: s.documentRevisionId,
        page: s.page,
        clause: s.clause,
        note: s.note,
        holes: s.holes,
      },
    })
    .from(s)
    .where(eq(s.projectId, projectId))
    .orderBy(asc(s.valueRevisionId), asc(s.ordinal));
  const sourcesOf = new Map<string, unknown[]>();
  for (const { valueRevisionId, source } of cited)
    sourcesOf.set(valueRevisionId, [...(sourcesOf.get(valueRevisionId) ?? []), source]);
  return revisions
    .filter(
      ({ id, contentHash: signed, ...content }) =>
        contentHash({ ...content, sources: sourcesOf.get(id) ?? [] }) !== signed,
    )
    .map(({ id }) => id);
}
