import { randomUUID } from "node:crypto";
import { and, eq, sql } from "drizzle-orm";
import * as t from "@/db/schema";
import { type SetLoadsInput, setLoadsInput } from "@/lib/contracts/footings";
import type { LoadSetId } from "@/lib/contracts/ids";
import { audit } from "../audit";
import { recordChange } from "../changes/record-change";
import { assertMay, type Context, inProject } from "../context";
import { lockFooting } from "../footings/lock-footing";
import { assertSeen, parse } from "../parse";

/** Issues the load combinations of a footing anew; a check made with the ones before is affected from then on. */
export async function setLoads(context: Context, given: SetLoadsInput) {
  assertMay(context, "footing:write");
  const { footingId, revision, loadBasis, source, combinations, reason } = parse(setLoadsInput, given);

  return inProject(context, async (tx) => {
    const footing = await lockFooting(tx, context, footingId);
    assertSeen(revision, footing.revision, `Footing ${footing.mark}`, {
      revision: footing.revision,
      mark: footing.mark,
    });
    const last = await tx.execute<{ number: number }>(sql`
      select coalesce(max(number), 0)::int as number from load_set
      where project_id = ${context.projectId} and footing_id = ${footingId}`);
    const number = (last.rows[0]?.number ?? 0) + 1;
    const loadSetId = randomUUID() as LoadSetId;
    await tx.insert(t.loadSet).values({
      projectId: context.projectId,
      id: loadSetId,
      footingId,
      number,
      combinations,
      loadBasis,
      source,
      recordedBy: context.person.id,
    });
    const next = footing.revision + 1;
    await tx
      .update(t.footing)
      .set({ currentLoadSetId: loadSetId, revision: next })
      .where(and(eq(t.footing.projectId, context.projectId), eq(t.footing.id, footingId)));
    if (footing.latestCheckId)
      await recordChange(tx, context, {
        kind: "loads-changed",
        subjectId: footingId,
        title: `Loads of footing ${footing.mark} changed: issue ${number}, ${combinations.length} combinations`,
        reason: reason || source || "Changed on the footing's sheet.",
        fromRevisionId: footing.currentLoadSetId,
        toRevisionId: loadSetId,
        footingIds: [footingId],
      });
    await audit(tx, context, {
      verb: "footing:write",
      subject: `footing/${footingId}`,
      detail: { loadSet: number, loadBasis, source, combinations, reason },
    });
    return { id: footingId, number, revision: next };
  });
}
