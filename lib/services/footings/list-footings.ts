import { type SQL, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { stages } from "@/lib/contracts/footing-words";
import {
  type FootingCounts,
  type FootingList,
  type FootingSort,
  type ListFootingsInput,
  listFootingsInput,
} from "@/lib/contracts/footings";
import type { FootingId } from "@/lib/contracts/ids";
import { assertMay, type Context, inProject } from "../context";
import { Invalid } from "../errors";
import { parse } from "../parse";
import { filterFootings } from "./footing-filter";
import { footingSources, selectFootings } from "./footing-rows";
import { walkByMark } from "./walk-by-mark";

/** A page of the footings that a filter selects, with how many of them stand how (on the first page). */
export async function listFootings(context: Context, given: ListFootingsInput): Promise<FootingList> {
  assertMay(context, "project:read");
  const { sort, descending, after, limit, counts, ...filter } = parse(listFootingsInput, given);
  const matching = filterFootings(filter);
  const key = sortKeys[sort];
  const down = descending === "yes";
  const beyond = after === undefined ? sql`true` : beyondCursor(key, down, cursorOf(after));

  return inProject(context, async (tx) => {
    const direction = down ? sql`desc` : sql`asc`;
    const order = key
      ? sql`${key} ${direction}, f.mark collate natural_order, f.id`
      : sql`f.mark collate natural_order ${direction}, f.id ${direction}`;
    const walked =
      !key && (filter.standing === "affected" || filter.standing === "current")
        ? await walkByMark(tx, context, { filter, standing: filter.standing, beyond, order, need: limit + 1 })
        : null;
    const rows =
      walked ??
      (await pageAtOnce(tx, context, {
        key,
        where: sql`${matching} and ${beyond}`,
        order,
        limit: limit + 1,
      }));
    const page = rows.slice(0, limit);
    const last = rows.length > limit ? page.at(-1) : undefined;
    return {
      items: await selectFootings(
        tx,
        context,
        page.map(({ id }) => id),
      ),
      next: last ? JSON.stringify([last.sortKey, last.mark, last.id]) : null,
      counts: after === undefined && counts === "yes" ? await count(tx, context, matching) : null,
    };
  });
}

type PageRow = { id: FootingId; mark: string; sortKey: unknown };

async function pageAtOnce(
  tx: Transaction,
  context: Context,
  page: { key: SQL | null; where: SQL; order: SQL; limit: number },
): Promise<PageRow[]> {
  const { rows } = await tx.execute<PageRow>(sql`
    select f.id, f.mark, ${page.key ?? sql`null`} as "sortKey"
    from ${footingSources}
    where f.project_id = ${context.projectId} and ${page.where}
    order by ${page.order} limit ${page.limit}`);
  return rows;
}

/** What each order goes by before the mark; a failing check without a figure is worse than any figure. */
const sortKeys: Record<FootingSort, SQL | null> = {
  mark: null,
  utilisation: sql`coalesce(k.utilisation, case when k.verdict = 'fails' then 1e9 else -1 end)`,
  required: sql`coalesce(k.required_net_kpa, -1e9)`,
  level: sql`g.founding_level_m`,
  stage: sql`array_position(${sql.param([...stages])}::text[], f.stage)`,
};

type Cursor = { key: number | null; mark: string; id: string };

function beyondCursor(key: SQL | null, down: boolean, at: Cursor): SQL {
  const tie = sql`(f.mark collate natural_order, f.id)`;
  const end = sql`(${at.mark}::text collate natural_order, ${at.id}::uuid)`;
  if (!key) return down ? sql`${tie} < ${end}` : sql`${tie} > ${end}`;
  const farther = down ? sql`${key} < ${at.key}::float8` : sql`${key} > ${at.key}::float8`;
  return sql`(${farther} or (${key} = ${at.key}::float8 and ${tie} > ${end}))`;
}

function cursorOf(text: string): Cursor {
  const refused = new Invalid("One field needs another look.", { after: "This is not the end of a page." });
  let read: unknown;
  try {
    read = JSON.parse(text);
  } catch {
    throw refused;
  }
  if (!Array.isArray(read) || read.length !== 3) throw refused;
  const [key, mark, id] = read as unknown[];
  if (key !== null && typeof key !== "number") throw refused;
  if (typeof mark !== "string" || typeof id !== "string" || !/^[0-9a-f-]{36}$/.test(id)) throw refused;
  return { key, mark, id };
}

async function count(tx: Transaction, context: Context, matching: SQL): Promise<FootingCounts> {
  const { rows } = await tx.execute<FootingCounts>(sql`
    select count(*)::int as total,
      (count(*) filter (where k.verdict = 'passes'))::int as passes,
      (count(*) filter (where k.verdict = 'fails'))::int as fails,
      (count(*) filter (where k.verdict = 'outside conditions'))::int as outside,
      (count(*) filter (where k.id is null))::int as unchecked,
      (count(*) filter (where s.standing = 'affected'))::int as affected,
      (count(*) filter (where f.value_id is null))::int as unlinked
    from ${footingSources}
    where f.project_id = ${context.projectId} and ${matching}`);
  const [counts] = rows;
  if (!counts) throw new Error("A count without a row.");
  return counts;
}
