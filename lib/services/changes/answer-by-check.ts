import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { CheckId, FootingId } from "@/lib/contracts/ids";
import type { Context } from "../context";

/**
 * Records new checks as the answer to every open consequence of their footings: re-checked, or resized where the
 * footing's size or position is another than the one the change found. One statement; call it in the transaction that
 * stores the checks, before `audit`. Answers how many consequences it spoke to.
 */
export async function answerByCheck(
  tx: Transaction,
  context: Context,
  checks: readonly { footingId: FootingId; checkId: CheckId }[],
): Promise<number> {
  if (checks.length === 0) return 0;
  const rows = await tx.execute(sql`
    insert into disposition (project_id, consequence_id, number, kind, check_id, answered_by)
    select q.project_id, q.id,
      (select coalesce(max(d.number), 0) + 1 from disposition d
        where d.project_id = q.project_id and d.consequence_id = q.id),
      case when b.id is not null and b.footing_revision_id <> k.footing_revision_id then 'resized' else 're-checked' end,
      k.id, ${context.person.id}
    from unnest(${sql.param(checks.map(({ footingId }) => footingId))}::uuid[],
      ${sql.param(checks.map(({ checkId }) => checkId))}::uuid[]) as new(footing_id, check_id)
    join footing_check k on k.project_id = ${context.projectId} and k.id = new.check_id
    join consequence q on q.project_id = k.project_id and q.footing_id = new.footing_id
    left join footing_check b on b.project_id = q.project_id and b.id = q.check_id
    left join change_closure c on c.project_id = q.project_id and c.change_id = q.change_id
    left join lateral (
      select d.kind, v.verdict from disposition d
      left join footing_check v on v.project_id = d.project_id and v.id = d.check_id
      where d.project_id = q.project_id and d.consequence_id = q.id order by d.number desc limit 1
    ) a on true
    where c.change_id is null
      and (a.kind is null or (a.kind in ('re-checked', 'resized') and a.verdict <> 'passes'))`);
  return rows.rowCount ?? 0;
}
