import { and, eq, sql } from "drizzle-orm";
import * as t from "@/db/schema";
import { reviseHoleInput } from "@/lib/contracts/ground";
import { audit } from "../audit";
import { recordChange } from "../changes/record-change";
import { assertMay, type Context, inProject } from "../context";
import { NotFound } from "../errors";
import { assertSeen, parse } from "../parse";
import { keepLogs } from "./keep-logs";
import { logFromForm } from "./log-from-form";

/** Records a corrected log as a new revision of the hole; checks of footings near it become affected. */
export async function reviseHole(context: Context, given: unknown) {
  assertMay(context, "hole:write");
  const { holeId, revision, reason, ...typed } = parse(reviseHoleInput, given);
  const { projectId } = context;
  return inProject(context, async (tx) => {
    const [hole] = await tx
      .select()
      .from(t.hole)
      .where(and(eq(t.hole.projectId, projectId), eq(t.hole.id, holeId)))
      .for("update");
    if (!hole) throw new NotFound("There is no such hole in this project.");
    assertSeen(revision, hole.revision, `Hole ${hole.name}`, hole);
    const [last] = await tx
      .select({ number: sql<number>`max(number)::int` })
      .from(t.holeRevision)
      .where(and(eq(t.holeRevision.projectId, projectId), eq(t.holeRevision.holeId, holeId)));
    const number = (last?.number ?? 0) + 1;
    const log = logFromForm(typed, { holeId, number, newName: null }, reason);
    await keepLogs(tx, context, [log]);
    await recordChange(tx, context, {
      kind: "hole-revised",
      subjectId: holeId,
      title: `Log of ${hole.name} revised: ${number - 1} → ${number}`,
      reason,
      fromRevisionId: hole.currentRevisionId,
      toRevisionId: log.revisionId,
    });
    await audit(tx, context, {
      verb: "hole:revise",
      subject: `hole/${holeId}`,
      detail: { number, reason, ...typed },
    });
    return { id: holeId, revisionId: log.revisionId, name: hole.name, revision: hole.revision + 1 };
  });
}
