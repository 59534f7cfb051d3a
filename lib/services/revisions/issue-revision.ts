import { randomUUID } from "node:crypto";
import { and, eq } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import * as t from "@/db/schema";
import type { ChangeId } from "@/lib/contracts/ids";
import { type IssueRevisionInput, issueRevisionInput } from "@/lib/contracts/values";
import { audit } from "../audit";
import { announceChange, total } from "../changes/announce";
import { insertChange } from "../changes/record-change";
import { recordConsequences } from "../changes/record-consequences";
import { assertMay, type Context, inProject } from "../context";
import { Conflict, Forbidden } from "../errors";
import { faultPoint } from "../faults";
import { assertSeen, parse } from "../parse";
import {
  type LockedValue,
  lockValue,
  nameOf,
  pressureOf,
  type RevisionSeen,
  seeRevisions,
  when,
} from "./lock-revision";

/**
 * Issues a checked revision and records, in the same transaction, what it does to every linked footing: pointer,
 * consequences, change, letters, audit. A third person issues; of two who try at once, the second hears who was first.
 */
export async function issueRevision(context: Context, given: IssueRevisionInput) {
  assertMay(context, "revision:issue");
  const { valueId, revisionId, revision } = parse(issueRevisionInput, given);

  return inProject(context, async (tx) => {
    const value = await lockValue(tx, context, valueId);
    const { wanted, inForce } = await seeRevisions(tx, context, value, revisionId);
    assertIssuable(context, value, wanted);
    assertSeen(revision, value.revision, value.reference, {
      revision: value.revision,
      inForce: inForce?.code ?? null,
    });

    const next = await moveCurrentTo(tx, context, value, wanted);
    const changeId = randomUUID() as ChangeId;
    const byOwner = await recordConsequences(tx, context, { changeId, valueId });
    const counts = total(byOwner);
    await faultPoint("issue:consequences");
    const title = titleOf(value, wanted, inForce);
    await insertChange(tx, context, {
      id: changeId,
      kind: "value-issued",
      subjectId: valueId,
      title,
      reason: wanted.reason,
      valueId,
      fromRevisionId: inForce?.id ?? null,
      toRevisionId: revisionId,
      counts,
    });
    await faultPoint("issue:change");
    await announceChange(tx, context, { id: changeId, title, reason: wanted.reason, byOwner });
    await faultPoint("issue:letters");
    await audit(tx, context, {
      verb: "revision:issue",
      subject: `value/${valueId}`,
      detail: {
        revisionId,
        code: wanted.code,
        from: inForce?.code ?? null,
        reason: wanted.reason,
        changeId,
        counts,
      },
    });
    await faultPoint("issue:audit");
    return { valueId, revisionId, code: wanted.code, changeId, counts, revision: next };
  });
}

function assertIssuable(context: Context, value: LockedValue, wanted: RevisionSeen): void {
  const { code } = wanted;
  if (wanted.issuer && wanted.issuedAt)
    throw new Conflict(
      `${value.reference} ${code} was issued by ${wanted.issuer} at ${when(wanted.issuedAt)}.`,
      {
        issuedBy: wanted.issuer,
        issuedAt: new Date(wanted.issuedAt).toISOString(),
      },
    );
  if (wanted.later)
    throw new Conflict(`${wanted.later} came after ${code}. Issue that one, or revise again.`, {
      later: wanted.later,
    });
  if (wanted.preparedBy === context.person.id)
    throw new Forbidden(
      `You prepared ${code}. It is issued by a third person, after ${wanted.checker} has checked it.`,
    );
  if (wanted.checkedBy === context.person.id)
    throw new Forbidden(
      `You checked ${code}. It is issued by a third person, neither ${wanted.preparer} nor you.`,
    );
}

async function moveCurrentTo(
  tx: Transaction,
  context: Context,
  value: LockedValue,
  wanted: RevisionSeen,
): Promise<number> {
  await tx.insert(t.revisionIssue).values({
    projectId: context.projectId,
    valueRevisionId: wanted.id,
    valueId: value.id,
    preparedBy: wanted.preparedBy,
    checkedBy: wanted.checkedBy,
    issuedBy: context.person.id,
    replaces: value.currentRevisionId,
  });
  await faultPoint("issue:issue");
  const next = value.revision + 1;
  await tx
    .update(t.bearingValue)
    .set({ currentRevisionId: wanted.id, revision: next })
    .where(and(eq(t.bearingValue.projectId, context.projectId), eq(t.bearingValue.id, value.id)));
  await faultPoint("issue:pointer");
  return next;
}

function titleOf(value: LockedValue, wanted: RevisionSeen, inForce: RevisionSeen | null): string {
  if (!inForce) return `${nameOf(value)}: ${wanted.code} issued, ${pressureOf(wanted)} kPa net`;
  const same = inForce.netAllowable_kPa === wanted.netAllowable_kPa;
  const pressure = same
    ? `${pressureOf(wanted)} kPa net as before, conditions changed`
    : `${pressureOf(inForce)} → ${pressureOf(wanted)} kPa net`;
  return `${nameOf(value)}: ${inForce.code} → ${wanted.code}, ${pressure}`;
}
