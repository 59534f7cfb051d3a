import { and, eq, ne } from "drizzle-orm";
import * as t from "@/db/schema";
import { changeUnitInput } from "@/lib/contracts/ground";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { Invalid, NotFound } from "../errors";
import { assertSeen, parse } from "../parse";

/** Changes how a ground unit is called, described or drawn. */
export async function changeUnit(context: Context, given: unknown) {
  assertMay(context, "unit:write");
  const { groundUnitId, revision, ...fields } = parse(changeUnitInput, given);
  const { projectId } = context;
  return inProject(context, async (tx) => {
    const here = and(eq(t.groundUnit.projectId, projectId), eq(t.groundUnit.id, groundUnitId));
    const [before] = await tx.select().from(t.groundUnit).where(here).for("update");
    if (!before) throw new NotFound("There is no such ground unit in this project.");
    assertSeen(revision, before.revision, `Unit ${before.code}`, before);
    const [taken] = await tx
      .select({ id: t.groundUnit.id })
      .from(t.groundUnit)
      .where(
        and(
          eq(t.groundUnit.projectId, projectId),
          eq(t.groundUnit.code, fields.code),
          ne(t.groundUnit.id, groundUnitId),
        ),
      );
    if (taken)
      throw new Invalid(`There is a unit ${fields.code} already.`, { code: "Give the unit another code." });
    const [after] = await tx
      .update(t.groundUnit)
      .set({ ...fields, revision: before.revision + 1 })
      .where(here)
      .returning();
    await audit(tx, context, {
      verb: "unit:change",
      subject: `unit/${groundUnitId}`,
      detail: { before, after: fields },
    });
    return after;
  });
}
