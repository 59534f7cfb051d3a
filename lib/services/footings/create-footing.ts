import { randomUUID } from "node:crypto";
import * as t from "@/db/schema";
import { type CreateFootingInput, createFootingInput } from "@/lib/contracts/footings";
import type { FootingId, FootingRevisionId, LoadSetId } from "@/lib/contracts/ids";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { parse } from "../parse";
import { assertUsable } from "./lock-footing";

/** Registers a footing with its first size and place, and its loads where they are known. Linked to nothing yet. */
export async function createFooting(context: Context, given: CreateFootingInput) {
  assertMay(context, "footing:write");
  const { mark, gridReference, ownerId, loads, loadHeight_m, ...geometry } = parse(createFootingInput, given);

  return inProject(context, async (tx) => {
    await assertUsable(tx, context, { mark, ownerId, sourceRevisionId: geometry.sourceRevisionId });
    const { projectId, person } = context;
    const footingId = randomUUID() as FootingId;
    const revisionId = randomUUID() as FootingRevisionId;
    const loadSetId = loads ? (randomUUID() as LoadSetId) : null;
    await tx.insert(t.footing).values({
      projectId,
      id: footingId,
      mark,
      gridReference,
      ownerId: ownerId ?? person.id,
      currentRevisionId: revisionId,
      currentLoadSetId: loadSetId,
    });
    await tx.insert(t.footingRevision).values({
      projectId,
      id: revisionId,
      footingId,
      number: 1,
      ...geometry,
      loadHeight_m: loadHeight_m ?? geometry.thickness_m,
      recordedBy: person.id,
    });
    if (loads && loadSetId)
      await tx
        .insert(t.loadSet)
        .values({ projectId, id: loadSetId, footingId, number: 1, ...loads, recordedBy: person.id });
    await audit(tx, context, {
      verb: "footing:write",
      subject: `footing/${footingId}`,
      detail: { mark, gridReference, ...geometry, loadHeight_m: loadHeight_m ?? geometry.thickness_m, loads },
    });
    return { id: footingId, mark, revision: 1 };
  });
}
