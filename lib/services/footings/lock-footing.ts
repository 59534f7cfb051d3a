import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { Stage } from "@/db/schema";
import type {
  CheckId,
  FootingId,
  FootingRevisionId,
  LoadSetId,
  PersonId,
  ValueId,
} from "@/lib/contracts/ids";
import type { Context } from "../context";
import { Invalid, NotFound } from "../errors";

export type LockedFooting = {
  id: FootingId;
  mark: string;
  gridReference: string;
  ownerId: PersonId | null;
  stage: Stage;
  revision: number;
  currentRevisionId: FootingRevisionId;
  currentLoadSetId: LoadSetId | null;
  valueId: ValueId | null;
  latestCheckId: CheckId | null;
};

/** Locks a footing until commit: of two who change it, the second waits and then hears what the first has done. */
export async function lockFooting(
  tx: Transaction,
  context: Context,
  footingId: FootingId,
): Promise<LockedFooting> {
  const { rows } = await tx.execute<LockedFooting>(sql`
    select id, mark, grid_reference as "gridReference", owner_id as "ownerId", stage, revision,
      current_revision_id as "currentRevisionId", current_load_set_id as "currentLoadSetId", value_id as "valueId",
      latest_check_id as "latestCheckId"
    from footing where project_id = ${context.projectId} and id = ${footingId} for no key update`);
  const [footing] = rows;
  if (!footing) throw new NotFound("There is no such footing in this project.");
  return footing;
}

/** Refuses a mark that another footing bears, an owner who is no member, a source that is not in this project. */
export async function assertUsable(
  tx: Transaction,
  context: Context,
  given: { footingId?: FootingId; mark: string; ownerId: PersonId | null; sourceRevisionId: string | null },
): Promise<void> {
  const { rows } = await tx.execute<{ taken: boolean; member: boolean; source: boolean }>(sql`
    select exists (select from footing where project_id = ${context.projectId} and mark = ${given.mark}
        and id is distinct from ${given.footingId ?? null}::uuid) as taken,
      exists (select from membership where project_id = ${context.projectId}
        and person_id = ${given.ownerId}::uuid) as member,
      exists (select from document_revision where project_id = ${context.projectId}
        and id = ${given.sourceRevisionId}::uuid) as source`);
  const [seen] = rows;
  const fields: Record<string, string> = {};
  if (seen?.taken) fields.mark = `There is a footing ${given.mark} already.`;
  if (given.ownerId && !seen?.member) fields.ownerId = "The owner is a member of this project.";
  if (given.sourceRevisionId && !seen?.source)
    fields.sourceRevisionId = "There is no such document revision here.";
  if (Object.keys(fields).length > 0) throw new Invalid("A field needs another look.", fields);
}
