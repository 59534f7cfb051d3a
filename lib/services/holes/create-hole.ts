import { randomUUID } from "node:crypto";
import { and, eq } from "drizzle-orm";
import * as t from "@/db/schema";
import { createHoleInput } from "@/lib/contracts/ground";
import type { HoleId } from "@/lib/contracts/ids";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { Invalid } from "../errors";
import { parse } from "../parse";
import { keepLogs } from "./keep-logs";
import { logFromForm } from "./log-from-form";

/** Records an exploratory hole with the first revision of its log. */
export async function createHole(context: Context, given: unknown) {
  assertMay(context, "hole:write");
  const { name, ...typed } = parse(createHoleInput, given);
  const log = logFromForm(
    typed,
    { holeId: randomUUID() as HoleId, number: 1, newName: name },
    "First record of the hole.",
  );
  return inProject(context, async (tx) => {
    const [taken] = await tx
      .select({ id: t.hole.id })
      .from(t.hole)
      .where(and(eq(t.hole.projectId, context.projectId), eq(t.hole.name, name)));
    if (taken)
      throw new Invalid(`There is a hole ${name} already.`, {
        name: "Revise that hole, or give another name.",
      });
    await keepLogs(tx, context, [log]);
    await audit(tx, context, {
      verb: "hole:create",
      subject: `hole/${log.holeId}`,
      detail: { name, ...typed },
    });
    return { id: log.holeId, revisionId: log.revisionId, name, revision: 1 };
  });
}
