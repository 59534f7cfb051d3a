import { type SQL, sql } from "drizzle-orm";
import type { z } from "zod";
import type { Transaction } from "@/db/client";
import type { selectFootingsInput } from "@/lib/contracts/footings";
import type { FootingId } from "@/lib/contracts/ids";
import type { Context } from "../context";
import { filterFootings } from "./footing-filter";
import { footingsAlone } from "./footing-rows";

/** Stretches of the schedule that are looked through before the whole is asked at once. */
const STRETCHES = [1, 8];

/**
 * The first footings in the order of their marks whose check stands so, found by going along the index stretch by stretch.
 * The standing of a check is derived, so that the planner cannot know how many stand how: it would work out all of a
 * million to show fifty. Null when those that are wanted are too few to be met on the way.
 */
export async function walkByMark(
  tx: Transaction,
  context: Context,
  given: {
    filter: z.output<typeof selectFootingsInput>;
    standing: "affected" | "current";
    beyond: SQL;
    order: SQL;
    need: number;
  },
): Promise<{ id: FootingId; mark: string; sortKey: null }[] | null> {
  const { standing, beyond, order, need } = given;
  const matching = filterFootings({ ...given.filter, standing: undefined });
  const found: { id: FootingId; mark: string; sortKey: null }[] = [];
  let passed = 0;
  for (const stretch of STRETCHES) {
    const length = need * stretch;
    const { rows } = await tx.execute<{ id: FootingId; mark: string; stands: boolean }>(sql`
      select f.id, f.mark, s.standing is not distinct from ${standing} as stands
      from (select f.project_id, f.id, f.mark, f.latest_check_id from ${footingsAlone}
        where f.project_id = ${context.projectId} and ${matching} and ${beyond}
        order by ${order} limit ${length} offset ${passed}) f
      left join check_standing s on s.project_id = f.project_id and s.check_id = f.latest_check_id
      order by ${order}`);
    for (const { id, mark, stands } of rows) if (stands) found.push({ id, mark, sortKey: null });
    if (found.length >= need || rows.length < length) return found.slice(0, need);
    passed += length;
  }
  return null;
}
