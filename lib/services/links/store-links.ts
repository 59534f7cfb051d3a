import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { FootingId, ValueId } from "@/lib/contracts/ids";
import type { Context } from "../context";
import { NotFound } from "../errors";

export type Link = {
  footingId: FootingId;
  valueId: ValueId | null;
  how: "from-zone" | "chosen" | "removed";
  reason: string;
};

/** Locks the footings in the order of their ids, so that two who link the same ones cannot block each other. */
export async function lockFootings(
  tx: Transaction,
  context: Context,
  footingIds: readonly FootingId[],
): Promise<{ id: FootingId; mark: string; valueId: ValueId | null }[]> {
  const ids = [...new Set(footingIds)];
  const { rows } = await tx.execute<{ id: FootingId; mark: string; valueId: ValueId | null }>(sql`
    select id, mark, value_id as "valueId" from footing
    where project_id = ${context.projectId} and id = any(${sql.param(ids)}::uuid[])
    order by id for no key update`);
  if (rows.length < ids.length) throw new NotFound("One of these footings is not in this project.");
  return rows;
}

/** Writes the history of the links and moves each footing's own link: two statements whatever the number. */
export async function storeLinks(tx: Transaction, context: Context, links: readonly Link[]): Promise<void> {
  if (links.length === 0) return;
  const column = <Name extends keyof Link>(name: Name) => sql.param(links.map((link) => link[name]));
  await tx.execute(sql`
    insert into footing_link (project_id, footing_id, number, value_id, how, reason, linked_by)
    select ${context.projectId}::uuid, n.footing_id,
      (select coalesce(max(b.number), 0) + 1 from footing_link b
        where b.project_id = ${context.projectId}::uuid and b.footing_id = n.footing_id),
      n.value_id, n.how, n.reason, ${context.person.id}::uuid
    from unnest(${column("footingId")}::uuid[], ${column("valueId")}::uuid[], ${column("how")}::text[],
      ${column("reason")}::text[]) as n(footing_id, value_id, how, reason)`);
  await tx.execute(sql`
    update footing f set value_id = n.value_id, revision = f.revision + 1
    from unnest(${column("footingId")}::uuid[], ${column("valueId")}::uuid[]) as n(footing_id, value_id)
    where f.project_id = ${context.projectId} and f.id = n.footing_id`);
}
