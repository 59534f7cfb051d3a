import { type SQL, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import {
  type ChangeItem,
  type ChangeList,
  type ListChangesInput,
  listChangesInput,
} from "@/lib/contracts/changes";
import { assertMay, type Context, inProject } from "../context";
import { parse } from "../parse";
import { isAnswered, lastAnswer } from "./answered";
import { noCounts } from "./outcome";

/** Changes of the project, newest first, each with what it did and how much of it is still unanswered. */
export async function listChanges(context: Context, given: ListChangesInput): Promise<ChangeList> {
  assertMay(context, "project:read");
  const { state, valueId, before, limit } = parse(listChangesInput, given);
  const conditions: SQL[] = [sql`true`];
  if (valueId) conditions.push(sql`h.value_id = ${valueId}`);
  if (before !== undefined) conditions.push(sql`h.seq < ${before}`);
  if (state === "open") conditions.push(sql`c.change_id is null and n.answered < n.total`);
  if (state === "answered") conditions.push(sql`c.change_id is null and n.answered = n.total`);
  if (state === "closed") conditions.push(sql`c.change_id is not null`);

  return inProject(context, async (tx) => {
    const rows = await selectChanges(tx, context, sql.join(conditions, sql` and `), limit + 1);
    const items = rows.slice(0, limit);
    return { items, next: rows.length > limit ? (items.at(-1)?.seq ?? null) : null };
  });
}

/** Changes `h` that a condition selects, newest first. */
export async function selectChanges(
  tx: Transaction,
  context: Context,
  where: SQL,
  limit: number,
): Promise<ChangeItem[]> {
  const rows = await tx.execute<ChangeItem & { seq: string }>(sql`
    select h.id, h.seq, h.kind, h.title, h.reason, h.value_id as "valueId",
      json_build_object('id', m.id, 'name', m.name) as "madeBy", h.made_at as "madeAt", h.counts,
      n.total, n.answered, n.total - n.answered as open, n.open_poured as "openPoured",
      case when c.change_id is not null then
        json_build_object('name', p.name, 'at', c.closed_at, 'note', c.note) end as closed
    from change h
    join person m on m.id = h.made_by
    left join change_closure c on c.project_id = h.project_id and c.change_id = h.id
    left join person p on p.id = c.closed_by
    cross join lateral (
      select count(*)::int as total, (count(*) filter (where ${isAnswered}))::int as answered,
        (count(*) filter (where not ${isAnswered} and f.stage = 'poured'))::int as open_poured
      from consequence q
      join footing f on f.project_id = q.project_id and f.id = q.footing_id
      ${lastAnswer}
      where q.project_id = h.project_id and q.change_id = h.id) n
    where h.project_id = ${context.projectId} and ${where}
    order by h.seq desc limit ${limit}`);
  return rows.rows.map((row) => ({
    ...row,
    seq: Number(row.seq),
    madeAt: new Date(row.madeAt).toISOString(),
    counts: { ...noCounts(), ...row.counts },
  }));
}
