import { and, eq, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import * as t from "@/db/schema";
import type { ValueId, ValueRevisionId } from "@/lib/contracts/ids";
import {
  type CheckDraftInput,
  checkDraftInput,
  type DraftContent,
  type StatedFields,
} from "@/lib/contracts/values";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { Conflict, Forbidden, Invalid, NotFound } from "../errors";
import { faultPoint } from "../faults";
import { assertSeen, parse } from "../parse";
import { contentHash } from "./content-hash";
import { type DraftRow, lockValueAndDraft } from "./draft-row";
import { type DraftReading, readDraft } from "./read-draft";
import { citeSources, supersededSources } from "./sources";

/**
 * Signs a draft as checked by another person than wrote it: from here on it is a numbered revision that never changes.
 * Refused while a field is missing, while a finding is not confirmed, or when the draft changed since it was read.
 */
export async function checkDraft(context: Context, given: CheckDraftInput) {
  assertMay(context, "revision:check");
  const { valueId, revision, confirmed } = parse(checkDraftInput, given);

  return inProject(context, async (tx) => {
    const value = await lockValueAndDraft(tx, context, valueId);
    const draft = value.draft;
    if (!draft) throw new NotFound("No draft of this value waits for a check.");
    assertSeen(revision, draft.revision, "The draft", { content: draft.kept.fields });
    if (draft.preparedBy === context.person.id || draft.kept.editors.includes(context.person.id))
      throw new Forbidden(
        "You prepared this draft. Its check is another person's, so that two have looked at it.",
      );
    const { fields, reading } = await readComplete(tx, context, valueId, draft.kept.fields, confirmed);

    const revised = await insertRevision(tx, context, { valueId, draft, fields, reading });
    await faultPoint("check:revision");
    await insertSources(tx, context, revised.id, draft.kept.fields);
    await faultPoint("check:sources");
    await tx
      .delete(t.bearingValueDraft)
      .where(
        and(eq(t.bearingValueDraft.projectId, context.projectId), eq(t.bearingValueDraft.valueId, valueId)),
      );
    const next = value.revision + 1;
    await tx
      .update(t.bearingValue)
      .set({ revision: next })
      .where(and(eq(t.bearingValue.projectId, context.projectId), eq(t.bearingValue.id, valueId)));
    await audit(tx, context, {
      verb: "revision:check",
      subject: `value/${valueId}`,
      detail: { ...revised, reference: value.reference, confirmed, reason: reading.reason },
    });
    return {
      valueId,
      revisionId: revised.id,
      code: revised.code,
      contentHash: revised.contentHash,
      revision: next,
    };
  });
}

async function readComplete(
  tx: Transaction,
  context: Context,
  valueId: ValueId,
  content: DraftContent,
  confirmed: string[],
): Promise<{ fields: StatedFields; reading: DraftReading }> {
  const ground = await tx.execute<{ soil: string; today: string }>(sql`
    select u.soil, to_char(now() at time zone 'UTC', 'YYYY-MM-DD') as today
    from bearing_value v join ground_unit u on u.project_id = v.project_id and u.id = v.ground_unit_id
    where v.project_id = ${context.projectId} and v.id = ${valueId}`);
  const reading = readDraft(content, ground.rows[0] ?? { soil: "", today: "" });
  const ids = (content.sources ?? []).map(({ documentRevisionId }) => documentRevisionId);
  const cited = await citeSources(tx, context, ids);
  const problems = { ...reading.problems };
  if (ids.some((id) => !cited.has(id))) problems.sources = "A source is not a document of this project.";
  const count = Object.keys(problems).length;
  if (count > 0 || !reading.fields)
    throw new Invalid(
      count === 1 ? "One field needs another look." : `${count} fields need another look.`,
      problems,
    );
  const superseded = supersededSources(
    ids.flatMap((id) => {
      const source = cited.get(id);
      return source ? [{ ...source, confirmed: false, page: null, clause: "", note: "", holes: [] }] : [];
    }),
  );
  const open = [...reading.findings, ...superseded].filter(({ code }) => !confirmed.includes(code));
  if (open.length > 0)
    throw new Conflict("Some of this is unusual. Confirm each point, or send the draft back.", {
      findings: open,
    });
  return { fields: reading.fields, reading };
}

async function insertRevision(
  tx: Transaction,
  context: Context,
  given: { valueId: ValueId; draft: DraftRow; fields: StatedFields; reading: DraftReading },
) {
  const { valueId, draft, fields, reading } = given;
  const letter = fields.purpose === "preliminary" ? "P" : "C";
  const so = await tx.execute<{ number: number; ordinal: number }>(sql`
    select (coalesce(max(number), 0) + 1)::int as number,
      (count(*) filter (where code like ${`${letter}%`}) + 1)::int as ordinal
    from bearing_value_revision where project_id = ${context.projectId} and value_id = ${valueId}`);
  const { number, ordinal } = so.rows[0] ?? { number: 1, ordinal: 1 };
  const code = `${letter}${String(ordinal).padStart(2, "0")}`;
  const { reasonCode, reason } = reading;
  const signed = {
    valueId,
    number,
    code,
    fields,
    sources: draft.kept.fields.sources ?? [],
    reasonCode,
    reason,
  };
  const [row] = await tx
    .insert(t.bearingValueRevision)
    .values({
      ...fields,
      projectId: context.projectId,
      valueId,
      number,
      code,
      kind: "single",
      reasonCode,
      reason,
      preparedBy: draft.preparedBy,
      preparedAt: draft.changedAt,
      checkedBy: context.person.id,
      contentHash: contentHash(signed),
    })
    .returning({ id: t.bearingValueRevision.id, contentHash: t.bearingValueRevision.contentHash });
  if (!row) throw new Error("An inserted revision was not returned.");
  return { ...row, number, code };
}

async function insertSources(
  tx: Transaction,
  context: Context,
  valueRevisionId: ValueRevisionId,
  content: DraftContent,
): Promise<void> {
  const sources = content.sources ?? [];
  if (sources.length === 0) return;
  await tx.insert(t.valueSource).values(
    sources.map((source, at) => ({
      ...source,
      projectId: context.projectId,
      valueRevisionId,
      ordinal: at + 1,
    })),
  );
}
