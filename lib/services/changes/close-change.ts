import { sql } from "drizzle-orm";
import * as t from "@/db/schema";
import { type CloseChangeInput, closeChangeInput } from "@/lib/contracts/changes";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { Conflict } from "../errors";
import { parse } from "../parse";
import { lockChange } from "./answer-consequences";
import { selectChanges } from "./list-changes";

/** The project lead closes a change, once every footing that it touched has its answer. */
export async function closeChange(context: Context, given: CloseChangeInput) {
  assertMay(context, "change:close");
  const { changeId, note } = parse(closeChangeInput, given);

  return inProject(context, async (tx) => {
    const { title } = await lockChange(tx, context, changeId);
    const [change] = await selectChanges(tx, context, sql`h.id = ${changeId}`, 1);
    if (change && change.open > 0)
      throw new Conflict(
        `${change.open} of ${change.total} footings ${change.open === 1 ? "has" : "have"} no answer yet.`,
        { open: change.open, total: change.total },
      );
    await tx
      .insert(t.changeClosure)
      .values({ projectId: context.projectId, changeId, note, closedBy: context.person.id });
    await audit(tx, context, {
      verb: "change:close",
      subject: `change/${changeId}`,
      detail: { title, note },
    });
    return { changeId };
  });
}
