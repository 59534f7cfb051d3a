import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { PersonId, ValueId } from "@/lib/contracts/ids";
import type { DraftContent } from "@/lib/contracts/values";
import type { Context } from "../context";
import { NotFound } from "../errors";

/** What the draft's one jsonb column holds: the fields, and everyone who wrote in them and so cannot check them. */
export type DraftKept = { fields: DraftContent; editors: PersonId[] };

export type DraftRow = { kept: DraftKept; preparedBy: PersonId; revision: number; changedAt: Date };

/** Locks a value's entry and reads its draft, null when none is being written. */
export async function lockValueAndDraft(
  tx: Transaction,
  context: Context,
  valueId: ValueId,
): Promise<{ reference: string; revision: number; draft: DraftRow | null }> {
  const value = await tx.execute<{ reference: string; revision: number }>(sql`
    select reference, revision from bearing_value
    where project_id = ${context.projectId} and id = ${valueId} for update`);
  const found = value.rows[0];
  if (!found) throw new NotFound("There is no such bearing value in this project.");
  const draft = await tx.execute<Omit<DraftRow, "changedAt"> & { changedAt: string }>(sql`
    select content as kept, prepared_by as "preparedBy", revision, changed_at as "changedAt"
    from bearing_value_draft where project_id = ${context.projectId} and value_id = ${valueId} for update`);
  const row = draft.rows[0];
  return { ...found, draft: row ? { ...row, changedAt: new Date(row.changedAt) } : null };
}
