import { sql } from "drizzle-orm";
import { type SelectFootingsInput, selectFootingsInput } from "@/lib/contracts/footings";
import type { FootingId } from "@/lib/contracts/ids";
import { assertMay, type Context, inProject } from "../context";
import { parse } from "../parse";
import { filterFootings } from "./footing-filter";
import { footingSources } from "./footing-rows";

/** More footings than this are not acted on at once. */
const LIMIT = 20_000;

/** The ids of all footings that a filter selects, so that all of them can be linked or checked at once. */
export async function selectFootingIds(
  context: Context,
  given: SelectFootingsInput,
): Promise<{ footingIds: FootingId[] }> {
  assertMay(context, "project:read");
  const matching = filterFootings(parse(selectFootingsInput, given));
  return inProject(context, async (tx) => {
    const { rows } = await tx.execute<{ id: FootingId }>(sql`
      select f.id from ${footingSources} where f.project_id = ${context.projectId} and ${matching}
      order by f.mark collate natural_order, f.id limit ${LIMIT}`);
    return { footingIds: rows.map(({ id }) => id) };
  });
}
