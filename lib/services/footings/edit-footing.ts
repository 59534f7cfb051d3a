import { randomUUID } from "node:crypto";
import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import * as t from "@/db/schema";
import { type EditFootingInput, editFootingInput } from "@/lib/contracts/footings";
import type { FootingRevisionId } from "@/lib/contracts/ids";
import { audit } from "../audit";
import { recordChange } from "../changes/record-change";
import { assertMay, type Context, inProject } from "../context";
import { Invalid } from "../errors";
import { assertSeen, parse } from "../parse";
import { assertUsable, type LockedFooting, lockFooting } from "./lock-footing";

/**
 * Changes a footing. Another size, place or level is its next revision, and a check made before is affected from then
 * on; another mark, grid reference or owner leaves the checks as they are.
 */
export async function editFooting(context: Context, given: EditFootingInput) {
  assertMay(context, "footing:write");
  const {
    footingId,
    revision,
    reason,
    mark,
    gridReference,
    ownerId,
    note,
    sourceRevisionId,
    loadHeight_m,
    ...sizes
  } = parse(editFootingInput, given);
  const geometry = { ...sizes, loadHeight_m: loadHeight_m ?? sizes.thickness_m };

  return inProject(context, async (tx) => {
    const footing = await lockFooting(tx, context, footingId);
    const before = await geometryOf(tx, context, footing);
    const label = { mark: footing.mark, gridReference: footing.gridReference, ownerId: footing.ownerId };
    assertSeen(revision, footing.revision, `Footing ${footing.mark}`, {
      revision: footing.revision,
      ...label,
      ...before,
    });
    await assertUsable(tx, context, { footingId, mark, ownerId, sourceRevisionId });

    const changed = (Object.keys(geometry) as (keyof typeof geometry)[]).filter(
      (name) => geometry[name] !== before[name],
    );
    const relabelled =
      mark !== label.mark || gridReference !== label.gridReference || ownerId !== label.ownerId;
    if (changed.length === 0 && !relabelled) throw new Invalid("Nothing is different from what is recorded.");

    const revisionId = changed.length > 0 ? (randomUUID() as FootingRevisionId) : footing.currentRevisionId;
    const number = before.number + (changed.length > 0 ? 1 : 0);
    if (changed.length > 0)
      await tx.insert(t.footingRevision).values({
        projectId: context.projectId,
        id: revisionId,
        footingId,
        number,
        ...geometry,
        note: note || reason,
        sourceRevisionId,
        recordedBy: context.person.id,
      });
    const next = footing.revision + 1;
    await tx
      .update(t.footing)
      .set({ mark, gridReference, ownerId, currentRevisionId: revisionId, revision: next })
      .where(and(eq(t.footing.projectId, context.projectId), eq(t.footing.id, footingId)));
    const differences = Object.fromEntries(
      changed.map((name) => [name, { before: before[name], after: geometry[name] }]),
    );
    if (changed.length > 0 && footing.latestCheckId)
      await recordChange(tx, context, {
        kind: "footing-changed",
        subjectId: footingId,
        title:
          `Footing ${mark} revised: ${changed.map((name) => sentenceOf(name, before[name], geometry[name])).join(", ")}`.slice(
            0,
            400,
          ),
        reason: reason || note || "Changed on the footing's sheet.",
        fromRevisionId: footing.currentRevisionId,
        toRevisionId: revisionId,
        footingIds: [footingId],
      });
    await audit(tx, context, {
      verb: "footing:write",
      subject: `footing/${footingId}`,
      detail: {
        before: label,
        after: { mark, gridReference, ownerId },
        number,
        differences,
        reason,
      },
    });
    return { id: footingId, mark, number, revision: next };
  });
}

const words: Record<string, [word: string, unit: string]> = {
  easting_m: ["easting", "m"],
  northing_m: ["northing", "m"],
  orientation_deg: ["orientation", "°"],
  breadth_m: ["breadth", "m"],
  length_m: ["length", "m"],
  thickness_m: ["thickness", "m"],
  groundLevel_m: ["ground level", "m"],
  foundingLevel_m: ["founding level", "m"],
  loadHeight_m: ["load height", "m"],
  concreteUnitWeight_kNm3: ["concrete", "kN/m³"],
  backfillUnitWeight_kNm3: ["backfill", "kN/m³"],
};

function sentenceOf(name: string, before: number, after: number): string {
  const [word, unit] = words[name] ?? [name, ""];
  return `${word} ${before} → ${after} ${unit}`.trimEnd();
}

async function geometryOf(tx: Transaction, context: Context, footing: LockedFooting) {
  const [row] = await tx
    .select()
    .from(t.footingRevision)
    .where(
      and(
        eq(t.footingRevision.projectId, context.projectId),
        eq(t.footingRevision.id, footing.currentRevisionId),
      ),
    );
  if (!row) throw new Error("A footing without its revision.");
  const { number, easting_m, northing_m, orientation_deg, breadth_m, length_m, thickness_m, groundLevel_m } =
    row;
  const { foundingLevel_m, loadHeight_m, concreteUnitWeight_kNm3, backfillUnitWeight_kNm3 } = row;
  return {
    number,
    easting_m,
    northing_m,
    orientation_deg,
    breadth_m,
    length_m,
    thickness_m,
    groundLevel_m,
    foundingLevel_m,
    loadHeight_m,
    concreteUnitWeight_kNm3,
    backfillUnitWeight_kNm3,
  };
}
