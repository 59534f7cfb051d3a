import { randomUUID } from "node:crypto";
import { sql } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import type { DocumentRevisionId, GroundUnitId, ValueId } from "@/lib/contracts/ids";
import { plantFault } from "@/lib/services/faults";
import { checkDraft } from "@/lib/services/values/check-draft";
import { createValue } from "@/lib/services/values/create-value";
import { discardDraft } from "@/lib/services/values/discard-draft";
import { listValues } from "@/lib/services/values/list-values";
import { readValue } from "@/lib/services/values/read-value";
import { saveDraft } from "@/lib/services/values/save-draft";
import { startDraft } from "@/lib/services/values/start-draft";
import { freshDatabase } from "@/tests/support/database";
import {
  buildWorld,
  checkedRevision,
  completeDraft,
  countOf,
  freshPlace,
  inside,
  issuedRevision,
  openValue,
  type World,
} from "./register-world";

let here: World;
let neighbour: World;

beforeAll(async () => {
  await freshDatabase();
  here = await buildWorld("VAL-1");
  neighbour = await buildWorld("VAL-2");
  await issuedRevision(neighbour, await openValue(neighbour));
});

const freshValue = async (): Promise<ValueId> =>
  (await createValue(here.preparer, await freshPlace(here))).id;

async function draftOf(valueId: ValueId, over = {}) {
  const { revision } = await startDraft(here.preparer, { valueId });
  return saveDraft(here.preparer, { valueId, revision, content: completeDraft(here, over) });
}

describe("the entry for a ground unit in a zone", () => {
  it("takes the next reference of its own project, whatever the neighbour has used", async () => {
    const first = await createValue(here.preparer, await freshPlace(here));
    const second = await createValue(here.preparer, await freshPlace(here));
    const number = (reference: string) => Number(reference.slice(3));
    expect(number(second.reference)).toBe(number(first.reference) + 1);
  });

  it("is refused when the zone does not carry the unit", async () => {
    const { zoneId } = await freshPlace(here);
    await expect(
      createValue(here.preparer, { zoneId, groundUnitId: randomUUID() as GroundUnitId }),
    ).rejects.toMatchObject({
      fields: { groundUnitId: expect.any(String) },
    });
  });

  it("is refused in a neighbour's zone, by the words for a zone that does not exist", async () => {
    const before = await countOf(here, "bearing_value");
    await expect(
      createValue(here.preparer, { zoneId: neighbour.zoneId, groundUnitId: neighbour.groundUnitId }),
    ).rejects.toMatchObject({ fields: { zoneId: "There is no such zone in this project." } });
    expect(await countOf(here, "bearing_value")).toBe(before);
  });

  it("exists once: eight hands at the same moment make one entry and hear of it", async () => {
    const place = await freshPlace(here);
    const tried = await Promise.allSettled(
      Array.from({ length: 8 }, () => createValue(here.preparer, place)),
    );
    expect(tried.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
    for (const one of tried) if (one.status === "rejected") expect(one.reason).toMatchObject({ status: 409 });
  });

  it.each(["structural", "lead", "reader"] as const)("is not the %s's to make", async (role) => {
    const place = await freshPlace(here);
    await expect(createValue(here[role], place)).rejects.toMatchObject({ status: 403 });
  });
});

describe("a draft", () => {
  it("keeps what is typed word for word, complete or not, and says what is missing", async () => {
    const valueId = await freshValue();
    const { revision } = await startDraft(here.preparer, { valueId });
    await saveDraft(here.preparer, {
      valueId,
      revision,
      content: { given: "3 ksf-ish", minBreadth_m: "1,5" },
    });
    const { draft } = await readValue(here.reader, { valueId });
    expect(draft?.content).toEqual({ given: "3 ksf-ish", minBreadth_m: "1,5" });
    expect(draft?.problems).toMatchObject({
      given: expect.any(String),
      minBreadth_m: expect.stringContaining("1.5"),
    });
  });

  it("refuses the second of two who write on the same revision, with what the first wrote", async () => {
    const valueId = await freshValue();
    const { revision } = await startDraft(here.preparer, { valueId });
    await saveDraft(here.preparer, { valueId, revision, content: { given: "200 kPa" } });
    await expect(
      saveDraft(here.checker, { valueId, revision, content: { given: "300 kPa" } }),
    ).rejects.toMatchObject({
      status: 412,
      extra: { seen: 1, currentRevision: 2, current: { content: { given: "200 kPa" } } },
    });
  });

  it("asks which revision was seen", async () => {
    const valueId = await freshValue();
    await startDraft(here.preparer, { valueId });
    await expect(saveDraft(here.preparer, { valueId, content: {} })).rejects.toMatchObject({ status: 428 });
  });

  it.each([
    ["an unknown field", { netAllowable_kPa: 250 }],
    ["not a number", { given: Number.NaN }],
    ["infinity", { minBreadth_m: Number.POSITIVE_INFINITY }],
    ["a zero character", { conditions: "a\0b" }],
    ["half a character", { conditions: "\ud800" }],
    [
      "a page before the first",
      { sources: [{ documentRevisionId: randomUUID(), page: 0, clause: "", note: "", holes: [] }] },
    ],
  ])("refuses %s and keeps nothing of it", async (_, content) => {
    const valueId = await freshValue();
    const { revision } = await startDraft(here.preparer, { valueId });
    await expect(
      saveDraft(here.preparer, { valueId, revision, content: content as never }),
    ).rejects.toMatchObject({ status: 400 });
    expect((await readValue(here.reader, { valueId })).draft?.content).toEqual({});
  });

  it("of the next revision begins where the last one stood, with its reason to be given anew", async () => {
    const valueId = await freshValue();
    await checkedRevision(here, valueId, { minBreadth_m: "1.2 m" });
    const { content } = await startDraft(here.preparer, { valueId });
    expect(content).toMatchObject({ given: "250 kPa", minBreadth_m: 1.2, loadBasis: "characteristic-full" });
    expect(content.reason).toBeUndefined();
    expect(content.reasonCode).toBeUndefined();
    expect(content.sources).toHaveLength(1);
  });

  it("can be thrown away; the audit trail keeps its last content", async () => {
    const valueId = await freshValue();
    const { revision } = await draftOf(valueId);
    await discardDraft(here.preparer, { valueId, revision });
    expect((await readValue(here.reader, { valueId })).draft).toBeNull();
    const last = await inside(here, (tx) =>
      tx.execute<{ detail: string }>(
        sql`select detail from audit_event where subject = ${`value/${valueId}`} order by seq desc limit 1`,
      ),
    );
    expect(JSON.parse(last.rows[0]?.detail ?? "{}").discarded.given).toBe("250 kPa");
  });
});

describe("the check of a draft", () => {
  it("makes a numbered revision with its sources, hash and both names, and one audit row", async () => {
    const valueId = await freshValue();
    const { revision } = await draftOf(valueId);
    const before = await countOf(here, "audit_event");
    const { code, contentHash } = await checkDraft(here.checker, { valueId, revision });
    expect(code).toBe("P01");
    expect(await countOf(here, "audit_event")).toBe(before + 1);
    const [made] = (await readValue(here.reader, { valueId })).revisions;
    expect(made).toMatchObject({
      state: "checked",
      contentHash,
      prepared: { name: "Ines Halloran" },
      checked: { name: "Tom Okafor" },
      issued: null,
      fields: { netAllowable_kPa: 250, given: "250 kPa" },
      sources: [{ reference: "GIR-01", code: "P01", page: 34, holes: ["BH1", "BH2"] }],
    });
    expect(contentHash).toMatch(/^[0-9a-f]{64}$/);
  });

  it("numbers preliminary revisions P and those for design C, each from 01", async () => {
    const valueId = await freshValue();
    const codes = [];
    for (const purpose of ["preliminary", "preliminary", "for-design"] as const)
      codes.push((await checkedRevision(here, valueId, { purpose })).code);
    expect(codes).toEqual(["P01", "P02", "C01"]);
  });

  it("is refused to the one who prepared", async () => {
    const valueId = await freshValue();
    const { revision } = await draftOf(valueId);
    await expect(checkDraft(here.preparer, { valueId, revision })).rejects.toMatchObject({ status: 403 });
    expect((await readValue(here.reader, { valueId })).revisions).toEqual([]);
  });

  it("is refused to whoever wrote a single field of it, even if another wrote last", async () => {
    const valueId = await freshValue();
    const { revision } = await startDraft(here.checker, { valueId });
    const saved = await saveDraft(here.preparer, { valueId, revision, content: completeDraft(here) });
    await expect(checkDraft(here.checker, { valueId, revision: saved.revision })).rejects.toMatchObject({
      status: 403,
    });
    await expect(checkDraft(here.issuer, { valueId, revision: saved.revision })).resolves.toMatchObject({
      code: "P01",
    });
  });

  it("is refused by the database too when preparer and checker are one", async () => {
    const valueId = await freshValue();
    const { revisionId } = await checkedRevision(here, valueId);
    await expect(
      inside(here, (tx) =>
        tx.execute(sql`insert into bearing_value_revision
          select (jsonb_populate_record(r, jsonb_build_object('id', gen_random_uuid(), 'number', 99, 'code', 'P99',
            'checked_by', r.prepared_by))).* from bearing_value_revision r where r.id = ${revisionId}`),
      ),
    ).rejects.toMatchObject({ cause: { constraint: "checked_by_another" } });
  });

  it("is refused when the draft changed after the checker read it", async () => {
    const valueId = await freshValue();
    const { revision } = await draftOf(valueId);
    await saveDraft(here.preparer, { valueId, revision, content: completeDraft(here, { given: "260 kPa" }) });
    await expect(checkDraft(here.checker, { valueId, revision })).rejects.toMatchObject({ status: 412 });
  });

  it("names each missing choice: net or gross, load basis, transient increase", async () => {
    const valueId = await freshValue();
    const { revision } = await draftOf(valueId, {
      givenBasis: null,
      loadBasis: null,
      transientIncrease: null,
    });
    await expect(checkDraft(here.checker, { valueId, revision })).rejects.toMatchObject({
      status: 400,
      fields: {
        givenBasis: expect.any(String),
        loadBasis: expect.any(String),
        transientIncrease: expect.any(String),
      },
    });
  });

  it("waits until the checker has said yes to what is unusual", async () => {
    const valueId = await freshValue();
    const { revision } = await draftOf(valueId, { given: "3000 kPa" });
    await expect(checkDraft(here.checker, { valueId, revision })).rejects.toMatchObject({
      status: 409,
      extra: { findings: [{ code: "unusual-pressure" }] },
    });
    await expect(
      checkDraft(here.checker, { valueId, revision, confirmed: ["unusual-pressure"] }),
    ).resolves.toMatchObject({ code: "P01" });
  });

  it("refuses a source that belongs to a neighbour", async () => {
    const valueId = await freshValue();
    const sources = [
      { documentRevisionId: neighbour.documentRevisionId, page: 1, clause: "", note: "", holes: [] },
    ];
    const { revision } = await draftOf(valueId, { sources });
    await expect(checkDraft(here.checker, { valueId, revision })).rejects.toMatchObject({
      fields: { sources: expect.any(String) },
    });
  });

  it.each(["check:revision", "check:sources"])(
    "leaves nothing behind when it breaks at %s",
    async (point) => {
      const valueId = await freshValue();
      const { revision } = await draftOf(valueId);
      const audits = await countOf(here, "audit_event");
      plantFault(point, () => {
        throw new Error("power cut");
      });
      await expect(checkDraft(here.checker, { valueId, revision })).rejects.toThrow("power cut");
      const after = await readValue(here.reader, { valueId });
      expect(after.revisions).toEqual([]);
      expect(after.draft?.revision).toBe(revision);
      expect(await countOf(here, "audit_event")).toBe(audits);
    },
  );
});

describe("reading values", () => {
  it("tells field by field what a revision changed, with the change in percent", async () => {
    const valueId = await freshValue();
    await checkedRevision(here, valueId);
    await checkedRevision(here, valueId, {
      given: "200 kPa",
      maxBreadth_m: 3,
      reasonCode: "water",
      reason: "Water is higher than was met",
    });
    const [second, first] = (await readValue(here.reader, { valueId })).revisions;
    expect(first?.differences).toEqual([]);
    expect(second?.differences).toEqual([
      {
        name: "netAllowable_kPa",
        label: expect.any(String),
        unit: "kPa",
        before: "250",
        after: "200",
        change_percent: -20,
      },
      {
        name: "given",
        label: expect.any(String),
        unit: "",
        before: "250 kPa",
        after: "200 kPa",
        change_percent: null,
      },
      {
        name: "maxBreadth_m",
        label: expect.any(String),
        unit: "m",
        before: "not stated",
        after: "3",
        change_percent: null,
      },
    ]);
  });

  it("shows no value of the neighbour, by list or by id", async () => {
    const theirs = (await listValues(neighbour.reader, {})).items;
    expect(theirs).toHaveLength(1);
    const ours = (await listValues(here.reader, {})).items.map(({ id }) => id);
    expect(ours).not.toContain(theirs[0]?.id);
    await expect(readValue(here.reader, { valueId: theirs[0]?.id ?? "" })).rejects.toMatchObject({
      status: 404,
    });
  });

  it("finds by word, zone and state, and counts what it finds", async () => {
    const place = await freshPlace(here);
    const { id, reference } = await createValue(here.preparer, place);
    expect(await listValues(here.reader, { search: reference })).toMatchObject({
      total: 1,
      items: [{ id, state: "empty" }],
    });
    await startDraft(here.preparer, { valueId: id });
    expect((await listValues(here.reader, { zoneId: place.zoneId, state: "draft" })).items).toMatchObject([
      { id, hasDraft: true },
    ]);
    expect((await listValues(here.reader, { zoneId: place.zoneId, state: "issued" })).items).toEqual([]);
    expect((await listValues(here.reader, { search: "%" })).items).toEqual([]);
  });

  it("asks about a draft that cites a report which has been superseded", async () => {
    const valueId = await freshValue();
    await draftOf(valueId);
    const next = randomUUID() as DocumentRevisionId;
    await inside(here, async (tx) => {
      await tx.execute(sql`insert into document_revision
        select (jsonb_populate_record(r, jsonb_build_object('id', ${next}::text, 'number', 2, 'code', 'P02',
          'object_key', ${next}::text))).* from document_revision r where r.id = ${here.documentRevisionId}`);
      await tx.execute(sql`update document d set current_revision_id = ${next} from document_revision r
        where r.id = ${next} and d.id = r.document_id`);
    });
    const { draft } = await readValue(here.reader, { valueId });
    expect(draft?.findings.map(({ sentence }) => sentence)).toEqual([expect.stringContaining("GIR-01 P01")]);
  });
});
