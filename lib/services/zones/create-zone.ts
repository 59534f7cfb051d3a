import { randomUUID } from "node:crypto";
import { and, eq } from "drizzle-orm";
import * as t from "@/db/schema";
import type { ZoneId, ZoneRevisionId } from "@/lib/contracts/ids";
import { createZoneInput } from "@/lib/contracts/zones";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { Invalid } from "../errors";
import { parse } from "../parse";
import { boundaryOf, refuseOverlap } from "./boundaries";

/** Draws a zone: a name, the ground units it speaks for, a boundary that overlaps no other zone of those units. */
export async function createZone(context: Context, given: unknown) {
  assertMay(context, "zone:write");
  const { name, groundUnitIds, ring_m, boundary, reason } = parse(createZoneInput, given);
  const ring = boundaryOf(ring_m as [number, number][]);
  const { projectId } = context;
  return inProject(context, async (tx) => {
    const [taken] = await tx
      .select({ id: t.zone.id })
      .from(t.zone)
      .where(and(eq(t.zone.projectId, projectId), eq(t.zone.name, name)));
    if (taken) throw new Invalid(`There is a zone ${name} already.`, { name: "Give the zone another name." });
    await refuseOverlap(tx, context, { zoneId: null, ring, groundUnitIds });
    const zoneId = randomUUID() as ZoneId;
    const zoneRevisionId = randomUUID() as ZoneRevisionId;
    await tx.insert(t.zone).values({ projectId, id: zoneId, name, currentRevisionId: zoneRevisionId });
    await tx.insert(t.zoneRevision).values({
      projectId,
      id: zoneRevisionId,
      zoneId,
      number: 1,
      ring_m: ring,
      boundary,
      reason,
      drawnBy: context.person.id,
    });
    await tx
      .insert(t.zoneGroundUnit)
      .values([...new Set(groundUnitIds)].map((groundUnitId) => ({ projectId, zoneId, groundUnitId })));
    await audit(tx, context, {
      verb: "zone:create",
      subject: `zone/${zoneId}`,
      detail: { name, groundUnitIds, boundary, ring_m: ring, reason },
    });
    return { id: zoneId, revisionId: zoneRevisionId, name, revision: 1 };
  });
}
