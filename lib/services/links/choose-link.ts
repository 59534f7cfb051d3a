import { sql } from "drizzle-orm";
import { type ChooseLinkInput, chooseLinkInput } from "@/lib/contracts/footings";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { Invalid } from "../errors";
import { parse } from "../parse";
import { type Link, lockFootings, storeLinks } from "./store-links";

/** Links footings to a value that an engineer has chosen, or takes their links away; the reason is kept with each. */
export async function chooseLink(context: Context, given: ChooseLinkInput) {
  assertMay(context, "footing:link");
  const { footingIds, valueId, reason } = parse(chooseLinkInput, given);

  return inProject(context, async (tx) => {
    if (valueId) {
      const { rows } = await tx.execute(sql`
        select 1 from bearing_value where project_id = ${context.projectId} and id = ${valueId}`);
      if (rows.length === 0)
        throw new Invalid("One field needs another look.", {
          valueId: "There is no such bearing value in this project.",
        });
    }
    const footings = await lockFootings(tx, context, footingIds);
    const links: Link[] = footings
      .filter((footing) => footing.valueId !== valueId)
      .map(({ id }) => ({ footingId: id, valueId, how: valueId ? "chosen" : "removed", reason }));
    await storeLinks(tx, context, links);
    await audit(tx, context, {
      verb: "footing:link",
      subject: valueId ? `value/${valueId}` : `project/${context.projectId}`,
      detail: {
        how: valueId ? "chosen" : "removed",
        valueId,
        reason,
        footingIds: links.map(({ footingId }) => footingId),
      },
    });
    return { linked: links.length, unchanged: footings.length - links.length };
  });
}
