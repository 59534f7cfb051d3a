import { type SQL, sql } from "drizzle-orm";
import {
  type ChangeDetail,
  type ConsequenceItem,
  type ReadChangeInput,
  readChangeInput,
} from "@/lib/contracts/changes";
import { assertMay, type Context, inProject } from "../context";
import { Invalid, NotFound } from "../errors";
import { parse } from "../parse";
import { isAnswered, lastAnswer } from "./answered";
import { selectChanges } from "./list-changes";

/** One change with a page of its consequences: what asks for action first, then by mark. */
export async function readChange(context: Context, given: ReadChangeInput): Promise<ChangeDetail> {
  assertMay(context, "project:read");
  const { changeId, outcome, state, poured, search, after, limit } = parse(readChangeInput, given);
  const conditions: SQL[] = [sql`true`];
  if (outcome) conditions.push(sql`outcome = ${outcome}`);
  if (state) conditions.push(sql`open = ${state === "open"}`);
  if (poured) conditions.push(sql`("stageNow" = 'poured') = ${poured === "yes"}`);
  if (search?.trim()) conditions.push(sql`strpos(lower(mark), ${search.trim().toLowerCase()}) > 0`);
  const filter = sql.join(conditions, sql` and `);
  const cursor = after === undefined ? null : cursorOf(after);
  const beyond = cursor ? sql`(rank, mark) > (${cursor.rank}, ${cursor.mark})` : sql`true`;

  return inProject(context, async (tx) => {
    const [change] = await selectChanges(tx, context, sql`h.id = ${changeId}`, 1);
    if (!change) throw new NotFound("There is no such change in this project.");
    const rows = await tx.execute<ConsequenceItem & { rank: number; matching: number }>(sql`
      with told as (
        select q.id, q.footing_id as "footingId", f.mark, f.grid_reference as "gridReference",
          case when o.id is not null then json_build_object('id', o.id, 'name', o.name) end as owner,
          q.stage as "stageThen", f.stage as "stageNow", q.outcome, q.verdict_before as "verdictBefore",
          q.verdict_after as "verdictAfter", q.utilisation_before as "utilisationBefore",
          q.utilisation_after as "utilisationAfter", q.required_net_kpa as "requiredNet_kPa",
          not ${isAnswered} as open,
          case when a.kind is not null then json_build_object('kind', a.kind, 'reason', a.reason, 'name', w.name,
            'at', a.answered_at, 'verdict', a.verdict) end as answer,
          array_position(array['now fails', 'still fails', 'outside conditions', 'recovers', 'holds'], q.outcome) as rank
        from consequence q
        join footing f on f.project_id = q.project_id and f.id = q.footing_id
        left join person o on o.id = f.owner_id
        ${lastAnswer}
        left join person w on w.id = a.answered_by
        where q.project_id = ${context.projectId} and q.change_id = ${changeId}),
      chosen as (select * from told where ${filter})
      select *, (select count(*)::int from chosen) as matching from chosen
      where ${beyond} order by rank, mark limit ${limit + 1}`);
    const items = rows.rows.slice(0, limit);
    const last = rows.rows.length > limit ? items.at(-1) : undefined;
    return {
      change,
      items: items.map(({ rank: _, matching: __, ...item }) => item),
      next: last ? `${last.rank}.${last.mark}` : null,
      matching: rows.rows[0]?.matching ?? 0,
    };
  });
}

function cursorOf(text: string): { rank: number; mark: string } {
  const read = /^([1-5])\.(.+)$/s.exec(text);
  if (!read?.[1] || !read[2])
    throw new Invalid("One field needs another look.", { after: "This is not the end of a page." });
  return { rank: Number(read[1]), mark: read[2] };
}
