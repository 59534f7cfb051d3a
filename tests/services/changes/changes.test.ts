import { randomUUID } from "node:crypto";
import { sql } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import type { ChangeId, CheckId, ConsequenceId, FootingId } from "@/lib/contracts/ids";
import { answerByCheck } from "@/lib/services/changes/answer-by-check";
import { acceptConsequences, referConsequences } from "@/lib/services/changes/answer-consequences";
import { closeChange } from "@/lib/services/changes/close-change";
import { listChanges } from "@/lib/services/changes/list-changes";
import { readChange } from "@/lib/services/changes/read-change";
import { recordChange } from "@/lib/services/changes/record-change";
import { throughDoor } from "@/lib/services/context";
import { withdrawRevision } from "@/lib/services/revisions/withdraw-revision";
import { createValue } from "@/lib/services/values/create-value";
import { readValue } from "@/lib/services/values/read-value";
import { freshDatabase } from "@/tests/support/database";
import { addPads, checkPads } from "../values/footings-in-bulk";
import {
  buildWorld,
  countOf,
  freshPlace,
  inside,
  issuedRevision,
  type World,
} from "../values/register-world";

let here: World;
let neighbour: World;

beforeAll(async () => {
  await freshDatabase();
  here = await buildWorld("CHG-1");
  neighbour = await buildWorld("CHG-2");
});

const why = "The column load was taken too high; the built size carries it";
const lowered = {
  given: "200 kPa",
  reasonCode: "water",
  reason: "Groundwater is higher than was met in 2026",
} as const;

/** A value lowered from 250 to 200 kPa under four pads: one now fails, one now fails and is poured, two hold. */
async function lowering(world: World = here) {
  const valueId = (await createValue(world.preparer, await freshPlace(world))).id;
  await issuedRevision(world, valueId);
  const name = () => `M-${randomUUID().slice(0, 8)}`;
  const pads = await addPads(world, valueId, [
    { vertical_kN: 800, mark: name() },
    { vertical_kN: 900, mark: name(), stage: "poured" },
    { vertical_kN: 400, mark: name() },
    { vertical_kN: 300, mark: name() },
  ]);
  await checkPads(world, pads);
  const { changeId, revision, revisionId } = await issuedRevision(world, valueId, lowered);
  return { valueId, revisionId, revision, changeId, pads };
}
const consequenceOf = async (
  changeId: ChangeId,
  footingId: FootingId | undefined,
): Promise<ConsequenceId> => {
  const found = (await readChange(here.lead, { changeId })).items.find(
    (item) => item.footingId === footingId,
  );
  if (!found) throw new Error("no consequence");
  return found.id;
};

/** Checks pads again and lets the checks answer what is open, as the check verb does in one transaction. */
async function recheck(ids: FootingId[]): Promise<number> {
  await checkPads(here, ids);
  return inside(here, async (tx) => {
    const { rows } = await tx.execute<{ footingId: FootingId; checkId: CheckId }>(sql`
      select id as "footingId", latest_check_id as "checkId" from footing where id = any(${sql.param(ids)}::uuid[])`);
    return answerByCheck(tx, here.structural, rows);
  });
}

describe("the list of changes", () => {
  it("tells per change what it did and how much is open, newest first, page by page", async () => {
    const first = await lowering();
    const second = await lowering();
    const page = await listChanges(here.lead, { limit: 1 });
    expect(page.items).toMatchObject([
      { id: second.changeId, total: 4, open: 4, answered: 0, openPoured: 1, closed: null },
    ]);
    expect(page.items[0]?.counts).toMatchObject({ "now fails": 2, holds: 2 });
    const rest = await listChanges(here.lead, { before: page.next ?? 0, limit: 200 });
    expect(rest.items.map(({ id }) => id)).toContain(first.changeId);
    expect(rest.items.map(({ id }) => id)).not.toContain(second.changeId);
    const own = await listChanges(here.lead, { valueId: first.valueId, state: "open" });
    expect(own.items.map(({ id }) => id)).toEqual([first.changeId]);
  });

  it("shows a neighbour nothing", async () => {
    await lowering();
    expect((await listChanges(neighbour.lead, {})).items).toEqual([]);
  });
});

describe("one change", () => {
  it("pages through its consequences without losing or repeating one, the worst first", async () => {
    const { changeId } = await lowering();
    const seen: string[] = [];
    let after: string | undefined;
    for (;;) {
      const page = await readChange(here.lead, { changeId, limit: 1, after });
      expect(page.matching).toBe(4);
      seen.push(...page.items.map(({ outcome, id }) => `${outcome} ${id}`));
      if (page.next === null) break;
      after = page.next;
    }
    expect(new Set(seen).size).toBe(4);
    expect(seen.map((line) => line.slice(0, 5))).toEqual(["now f", "now f", "holds", "holds"]);
  });

  it("filters by outcome, by pouring and by mark", async () => {
    const { changeId, pads } = await lowering();
    expect((await readChange(here.lead, { changeId, outcome: "holds" })).matching).toBe(2);
    const poured = await readChange(here.lead, { changeId, poured: "yes" });
    expect(poured.items.map(({ footingId }) => footingId)).toEqual([pads[1]]);
    const mark = poured.items[0]?.mark ?? "";
    expect((await readChange(here.lead, { changeId, search: mark.toLowerCase() })).items).toHaveLength(1);
    await expect(readChange(here.lead, { changeId, after: "; drop" })).rejects.toMatchObject({ status: 400 });
  });
});

describe("answers", () => {
  it("by a new check: a pass answers, and so does the acknowledgement of one that held; a fail is recorded and stays open", async () => {
    const { changeId, pads } = await lowering();
    expect(await recheck([pads[0] as FootingId, pads[2] as FootingId])).toBe(2);
    const { items, change } = await readChange(here.lead, { changeId });
    expect(items.find(({ footingId }) => footingId === pads[0])).toMatchObject({
      open: true,
      answer: { kind: "re-checked", verdict: "fails" },
    });
    expect(items.find(({ footingId }) => footingId === pads[2])).toMatchObject({
      open: false,
      answer: { kind: "re-checked", verdict: "passes" },
    });
    expect(change).toMatchObject({ answered: 1, open: 3 });
  });

  it("by a wider pad count as resized", async () => {
    const { changeId, pads } = await lowering();
    await inside(here, (tx) =>
      tx.execute(sql`with wider as (
        insert into footing_revision select (jsonb_populate_record(r, jsonb_build_object('id', gen_random_uuid(), 'number', 2,
          'breadth_m', 3, 'length_m', 3))).* from footing_revision r where r.footing_id = ${pads[0] ?? ""} returning id, footing_id)
        update footing f set current_revision_id = wider.id from wider where f.id = wider.footing_id`),
    );
    await recheck([pads[0] as FootingId]);
    const { items } = await readChange(here.lead, { changeId });
    expect(items.find(({ footingId }) => footingId === pads[0])).toMatchObject({
      open: false,
      answer: { kind: "resized", verdict: "passes" },
    });
  });

  it("accepting as built is the project lead's, with a reason, once", async () => {
    const { changeId, pads } = await lowering();
    const consequenceIds = [await consequenceOf(changeId, pads[1])];
    for (const role of ["structural", "preparer", "reader"] as const)
      await expect(
        acceptConsequences(here[role], { changeId, consequenceIds, reason: why }),
      ).rejects.toMatchObject({ status: 403 });
    await expect(
      acceptConsequences(here.lead, { changeId, consequenceIds, reason: "ok" }),
    ).rejects.toMatchObject({ fields: { reason: expect.any(String) } });
    const before = await countOf(here, "audit_event");
    await acceptConsequences(here.lead, { changeId, consequenceIds, reason: why });
    expect(await countOf(here, "audit_event")).toBe(before + 1);
    await expect(
      acceptConsequences(here.lead, { changeId, consequenceIds, reason: why }),
    ).rejects.toMatchObject({ status: 409 });
    const { items } = await readChange(here.lead, { changeId, state: "answered" });
    expect(items).toMatchObject([
      { footingId: pads[1], answer: { kind: "accepted-as-built", reason: why, name: here.lead.person.name } },
    ]);
  });

  it("a poured footing that now fails is not answered by a check that passes", async () => {
    const { changeId, pads } = await lowering();
    await inside(here, (tx) =>
      tx.execute(sql`with lighter as (
        insert into load_set select (jsonb_populate_record(l, jsonb_build_object('id', gen_random_uuid(), 'number', 2,
          'combinations', jsonb_set(l.combinations, '{0,vertical_kN}', '100')))).* from load_set l where l.footing_id = ${pads[1] ?? ""}
          returning id, footing_id)
        update footing f set current_load_set_id = lighter.id from lighter where f.id = lighter.footing_id`),
    );
    await recheck([pads[1] as FootingId]);
    const { items } = await readChange(here.lead, { changeId });
    expect(items.find(({ footingId }) => footingId === pads[1])).toMatchObject({
      open: true,
      answer: { verdict: "passes" },
    });
  });

  it("referring back is the structural engineer's and asks every geotechnical engineer by mail", async () => {
    const { changeId, pads } = await lowering();
    const consequenceIds = [await consequenceOf(changeId, pads[0])];
    await expect(
      referConsequences(here.lead, { changeId, consequenceIds, reason: why }),
    ).rejects.toMatchObject({ status: 403 });
    await referConsequences(here.structural, { changeId, consequenceIds, reason: why });
    const { rows } = await throughDoor("relay", (tx) =>
      tx.execute<{ recipient: string; body: string }>(
        sql`select recipient, body from outbox where message_key like ${`referred/${changeId}/%`}`,
      ),
    );
    expect(rows.map(({ recipient }) => recipient).sort()).toEqual(
      [here.preparer, here.checker, here.issuer].map(({ person }) => person.email).sort(),
    );
    expect(rows[0]?.body).toContain(why);
  });

  it("refuses a footing of another change, and writes nothing for those beside it", async () => {
    const one = await lowering();
    const other = await lowering();
    const consequenceIds = [
      await consequenceOf(one.changeId, one.pads[0]),
      await consequenceOf(other.changeId, other.pads[0]),
    ];
    const before = await countOf(here, "disposition");
    await expect(
      acceptConsequences(here.lead, { changeId: one.changeId, consequenceIds, reason: why }),
    ).rejects.toMatchObject({ status: 404 });
    expect(await countOf(here, "disposition")).toBe(before);
  });

  it("two leads at once: one answer is recorded", async () => {
    const { changeId, pads } = await lowering();
    const consequenceIds = [await consequenceOf(changeId, pads[0])];
    const tried = await Promise.allSettled(
      Array.from({ length: 8 }, () =>
        acceptConsequences(here.lead, { changeId, consequenceIds, reason: why }),
      ),
    );
    expect(tried.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
  });
});

describe("closing a change", () => {
  it("is refused while one footing has no answer, then is the lead's, and takes no more answers", async () => {
    const { changeId, pads } = await lowering();
    await recheck([pads[2] as FootingId, pads[3] as FootingId]);
    await acceptConsequences(here.lead, {
      changeId,
      consequenceIds: [await consequenceOf(changeId, pads[1])],
      reason: why,
    });
    await expect(closeChange(here.lead, { changeId })).rejects.toMatchObject({
      status: 409,
      extra: { open: 1, total: 4 },
    });
    const last = [await consequenceOf(changeId, pads[0])];
    await referConsequences(here.structural, { changeId, consequenceIds: last, reason: why });
    await expect(closeChange(here.structural, { changeId })).rejects.toMatchObject({ status: 403 });
    await closeChange(here.lead, { changeId, note: "All four answered" });
    expect((await listChanges(here.lead, { state: "closed" })).items[0]).toMatchObject({
      id: changeId,
      closed: { name: here.lead.person.name, note: "All four answered" },
    });
    await expect(
      acceptConsequences(here.lead, { changeId, consequenceIds: last, reason: why }),
    ).rejects.toMatchObject({ status: 409 });
    await expect(closeChange(here.lead, { changeId })).rejects.toMatchObject({ status: 409 });
  });
});

describe("withdrawing a value", () => {
  it("puts every linked footing outside conditions, and the value out of force", async () => {
    const { valueId, revisionId, revision } = await lowering();
    const reason = "The laboratory has called back the strength tests";
    const { changeId, counts } = await withdrawRevision(here.lead, { valueId, revisionId, revision, reason });
    expect(counts).toEqual({
      "outside conditions": 4,
      "now fails": 0,
      "still fails": 0,
      recovers: 0,
      holds: 0,
    });
    const { items } = await readChange(here.lead, { changeId });
    expect(
      items.every(
        ({ verdictAfter, utilisationAfter }) =>
          verdictAfter === "outside conditions" && utilisationAfter === null,
      ),
    ).toBe(true);
    const value = await readValue(here.reader, { valueId });
    expect(value.currentRevisionId).toBeNull();
    expect(value.revisions[0]).toMatchObject({
      state: "withdrawn",
      withdrawn: { name: here.lead.person.name, reason },
    });
    expect(value.revisions[1]).toMatchObject({ state: "superseded" });
  });

  it("is refused without a reason, twice, for one not in force, and to the structural engineer", async () => {
    const { valueId, revisionId, revision } = await lowering();
    const first = (await readValue(here.reader, { valueId })).revisions[1]?.id as typeof revisionId;
    const reason = "The report has been called back by its author";
    await expect(
      withdrawRevision(here.lead, { valueId, revisionId, revision, reason: "" }),
    ).rejects.toMatchObject({ status: 400 });
    await expect(
      withdrawRevision(here.structural, { valueId, revisionId, revision, reason }),
    ).rejects.toMatchObject({ status: 403 });
    await expect(
      withdrawRevision(here.lead, { valueId, revisionId: first, revision, reason }),
    ).rejects.toMatchObject({ status: 409 });
    await withdrawRevision(here.lead, { valueId, revisionId, revision, reason });
    await expect(
      withdrawRevision(here.lead, { valueId, revisionId, revision: revision + 1, reason }),
    ).rejects.toMatchObject({ status: 409 });
  });
});

describe("other changes upstream", () => {
  const title = "GIR-01 superseded: P01 → P02";

  it("a superseded report touches the checks that rest on it, with the verdict that they had", async () => {
    const world = await buildWorld(`CHG-D${randomUUID().slice(0, 6)}`);
    const { pads } = await lowering(world);
    await checkPads(world, pads);
    const recorded = await inside(world, async (tx) => {
      const { rows } = await tx.execute<{ id: string }>(
        sql`select document_id as id from document_revision where id = ${world.documentRevisionId}`,
      );
      return recordChange(tx, world.preparer, {
        kind: "document-superseded",
        subjectId: rows[0]?.id ?? "",
        title,
        reason: "The author has issued a second edition",
      });
    });
    expect(recorded?.counts).toMatchObject({ holds: 2, "still fails": 2 });
  });

  it("changed criteria are told by running the checks again", async () => {
    const world = await buildWorld(`CHG-C${randomUUID().slice(0, 6)}`);
    const { valueId, pads } = await lowering(world);
    await checkPads(world, pads);
    const recorded = await inside(world, (tx) =>
      recordChange(tx, world.lead, {
        kind: "criteria-changed",
        subjectId: world.projectId,
        title: "Criteria 1 → 2",
        reason: "Sliding factor raised by the client",
      }),
    );
    expect(recorded?.counts).toMatchObject({ holds: 2, "still fails": 2 });
    expect(valueId).toBeTruthy();
  });

  it("leave no trace when no check rests on what changed", async () => {
    const before = await countOf(here, "change");
    const recorded = await inside(here, (tx) =>
      recordChange(tx, here.preparer, {
        kind: "zone-redrawn",
        subjectId: randomUUID(),
        title,
        reason: "Redrawn along the new holes",
      }),
    );
    expect(recorded).toBeNull();
    expect(await countOf(here, "change")).toBe(before);
  });

  it("touch the footings named and no others", async () => {
    const { pads } = await lowering();
    const recorded = await inside(here, (tx) =>
      recordChange(tx, here.structural, {
        kind: "loads-changed",
        subjectId: pads[0] ?? "",
        title: "Loads of one pad changed",
        reason: "Column schedule C02",
        footingIds: [pads[0] as FootingId],
      }),
    );
    expect(Object.values(recorded?.counts ?? {}).reduce((sum, count) => sum + count, 0)).toBe(1);
  });
});
