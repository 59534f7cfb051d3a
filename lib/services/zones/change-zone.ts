import { randomUUID } from "node:crypto";
import { and, eq, inArray } from "drizzle-orm";
import * as t from "@/db/schema";
import type { ZoneRevisionId } from "@/lib/contracts/ids";
import { changeZoneInput } from "@/lib/contracts/zones";
import { audit } from "../audit";
import { recordChange } from "../changes/record-change";
import { assertMay, type Context, inProject } from "../context";
import { Invalid, NotFound } from "../errors";
import { faultPoint } from "../faults";
import { assertSeen, parse } from "../parse";
import { boundaryOf, refuseOverlap } from "./boundaries";

/** Redraws, renames or re-reads a zone. A moved boundary is a new revision and affects the checks that rest on it. */
export async function changeZone(context: Context, given: unknown) {
  assertMay(context, "zone:write");
  const wanted = parse(changeZoneInput, given);
  const drawn = wanted.ring_m ? boundaryOf(wanted.ring_m as [number, number][]) : undefined;
  const { projectId } = context;
  const { zoneId } = wanted;
  return inProject(context, async (tx) => {
    const here = and(eq(t.zone.projectId, projectId), eq(t.zone.id, zoneId));
    const [zone] = await tx.select().from(t.zone).where(here).for("update");
    if (!zone?.currentRevisionId) throw new NotFound("There is no such zone in this project.");
    assertSeen(wanted.revision, zone.revision, `Zone ${zone.name}`, zone);
    const [before] = await tx
      .select()
      .from(t.zoneRevision)
      .where(and(eq(t.zoneRevision.projectId, projectId), eq(t.zoneRevision.id, zone.currentRevisionId)));
    if (!before) throw new NotFound("There is no such zone in this project.");
    const unitRows = await tx
      .select({ id: t.zoneGroundUnit.groundUnitId })
      .from(t.zoneGroundUnit)
      .where(and(eq(t.zoneGroundUnit.projectId, projectId), eq(t.zoneGroundUnit.zoneId, zoneId)));
    const unitsBefore = unitRows.map((row) => row.id);
    const unitsAfter = [...new Set(wanted.groundUnitIds ?? unitsBefore)];
    const ring = drawn ?? before.ring_m;
    const boundary = wanted.boundary ?? before.boundary;
    await refuseOverlap(tx, context, { zoneId, ring, groundUnitIds: unitsAfter });

    const gone = unitsBefore.filter((unit) => !unitsAfter.includes(unit));
    if (gone.length > 0) {
      const held = await tx
        .select({ reference: t.bearingValue.reference })
        .from(t.bearingValue)
        .where(
          and(
            eq(t.bearingValue.projectId, projectId),
            eq(t.bearingValue.zoneId, zoneId),
            inArray(t.bearingValue.groundUnitId, gone),
          ),
        );
      if (held.length > 0)
        throw new Invalid(
          `The register holds ${held.map((value) => value.reference).join(", ")} for a unit that would leave the zone.`,
          {
            groundUnitIds: "A unit with a bearing value stays in its zone.",
          },
        );
      await tx
        .delete(t.zoneGroundUnit)
        .where(
          and(
            eq(t.zoneGroundUnit.projectId, projectId),
            eq(t.zoneGroundUnit.zoneId, zoneId),
            inArray(t.zoneGroundUnit.groundUnitId, gone),
          ),
        );
    }
    const come = unitsAfter.filter((unit) => !unitsBefore.includes(unit));
    if (come.length > 0)
      await tx
        .insert(t.zoneGroundUnit)
        .values(come.map((groundUnitId) => ({ projectId, zoneId, groundUnitId })));

    const moved = drawn !== undefined && JSON.stringify(drawn) !== JSON.stringify(before.ring_m);
    let zoneRevisionId = zone.currentRevisionId;
    if (moved || boundary !== before.boundary) {
      zoneRevisionId = randomUUID() as ZoneRevisionId;
      await tx.insert(t.zoneRevision).values({
        projectId,
        id: zoneRevisionId,
        zoneId,
        number: before.number + 1,
        ring_m: ring,
        boundary,
        reason: wanted.reason,
        drawnBy: context.person.id,
      });
      await faultPoint("zone:redrawn");
    }
    const name = wanted.name ?? zone.name;
    await tx
      .update(t.zone)
      .set({ name, currentRevisionId: zoneRevisionId, revision: zone.revision + 1 })
      .where(here);
    if (zoneRevisionId !== zone.currentRevisionId)
      await recordChange(tx, context, {
        kind: "zone-redrawn",
        subjectId: zoneId,
        title: `Zone ${name} redrawn: boundary ${before.number} → ${before.number + 1}`,
        reason: wanted.reason || "The boundary was redrawn.",
        fromRevisionId: zone.currentRevisionId,
        toRevisionId: zoneRevisionId,
      });
    await audit(tx, context, {
      verb: "zone:change",
      subject: `zone/${zoneId}`,
      detail: {
        reason: wanted.reason,
        before: { name: zone.name, units: unitsBefore, ring_m: before.ring_m, boundary: before.boundary },
        after: { name, units: unitsAfter, ring_m: ring, boundary },
      },
    });
    return { id: zoneId, revisionId: zoneRevisionId, name, revision: zone.revision + 1 };
  });
}
