import { randomUUID } from "node:crypto";
import { sql } from "drizzle-orm";
import { beforeAll, beforeEach, describe, expect, it } from "vitest";
import type { CreateFootingInput } from "@/lib/contracts/footings";
import type { FootingId, ValueId } from "@/lib/contracts/ids";
import { runChecks } from "@/lib/services/checks/run-checks";
import { createFooting } from "@/lib/services/footings/create-footing";
import { editFooting } from "@/lib/services/footings/edit-footing";
import { listFootings } from "@/lib/services/footings/list-footings";
import { readFooting } from "@/lib/services/footings/read-footing";
import { recordStage } from "@/lib/services/footings/record-stage";
import { selectFootingIds } from "@/lib/services/footings/select-footings";
import { chooseLink } from "@/lib/services/links/choose-link";
import { setLoads } from "@/lib/services/loads/set-loads";
import { freshDatabase } from "../../support/database";
import { auditVerbs, lookInto, refusalOf } from "../../support/site";
import { buildWorld, countOf, inside, issuedRevision, openValue, type World } from "../values/register-world";
import { combination, makePad, padInput } from "./schedule";

let world: World;
let neighbour: World;
beforeAll(async () => {
  lookInto((await freshDatabase()).superuserUrl);
});
beforeEach(async () => {
  world = await buildWorld(`W-${randomUUID().slice(0, 8)}`);
  neighbour = await buildWorld(`N-${randomUUID().slice(0, 8)}`);
});

const reason = "The engineer's reading of the trial pit";
const link = (footingIds: FootingId[], valueId: ValueId | null, of = world) =>
  chooseLink(of.structural, { footingIds, valueId, reason });
const marks = async (given: Parameters<typeof listFootings>[1], of = world) =>
  (await listFootings(of.reader, given)).items.map(({ mark }) => mark);

describe("registering a footing", () => {
  it("keeps size and loads, owns it to whoever registered it, and writes one line in the audit trail", async () => {
    const id = await makePad(world, "F1", { note: "beside the lift pit" });
    const footing = await readFooting(world.reader, { footingId: id });
    expect(footing).toMatchObject({
      mark: "F1",
      stage: "designed",
      revision: 1,
      owner: { name: "Sara Brandt" },
      breadth_m: 2,
      combinations: 2,
      value: null,
      check: null,
    });
    expect(footing.geometry).toHaveLength(1);
    expect(footing.geometry[0]).toMatchObject({ number: 1, loadHeight_m: 0.6, note: "beside the lift pit" });
    expect(footing.loads[0]).toMatchObject({ number: 1, loadBasis: "characteristic-full" });
    expect(await auditVerbs(world.projectId)).toEqual(["footing:write"]);
  });

  it("refuses a mark that is taken, and takes the same mark in another project", async () => {
    await makePad(world, "F1");
    const refused = await refusalOf(createFooting(world.structural, padInput("F1")));
    expect(refused).toMatchObject({ status: 400, fields: { mark: "There is a footing F1 already." } });
    await makePad(neighbour, "F1");
    expect(await countOf(world, "footing")).toBe(1);
  });

  it.each([
    ["no number", { breadth_m: Number.NaN }, "breadth_m"],
    ["a number without end", { length_m: Number.POSITIVE_INFINITY }, "length_m"],
    ["a negative size", { breadth_m: -2 }, "breadth_m"],
    ["an absurd size", { breadth_m: 2000 }, "breadth_m"],
    ["a decimal comma", { thickness_m: "0,6" as never }, "thickness_m"],
    ["an empty mark", { mark: "  " }, "mark"],
    ["a founding level above ground", { foundingLevel_m: 12 }, "foundingLevel_m"],
    ["a founding level in millimetres", { foundingLevel_m: -10_000 }, "foundingLevel_m"],
    ["a field that nobody knows", { netAllowable_kPa: 300 } as never, "netAllowable_kPa"],
    ["an owner from nowhere", { ownerId: randomUUID() as never }, "ownerId"],
    [
      "a load that is no number",
      {
        loads: {
          loadBasis: "characteristic-full",
          combinations: [combination({ vertical_kN: Number.NaN })],
        } as never,
      },
      "loads.combinations.0.vertical_kN",
    ],
    ["loads without a basis", { loads: { combinations: [combination()] } as never }, "loads.loadBasis"],
    [
      "two combinations of one name",
      {
        loads: {
          loadBasis: "characteristic-full",
          combinations: [combination(), combination({ name: "g + q" })],
        },
      },
      "loads.combinations.1.name",
    ],
  ])("refuses %s at its field and writes nothing", async (_, over, field) => {
    const refused = await refusalOf(
      createFooting(world.structural, padInput("F1", over as Partial<CreateFootingInput>)),
    );
    expect(refused.status).toBe(400);
    expect(Object.keys(refused.fields)).toContain(field);
    expect(await countOf(world, "footing")).toBe(0);
    expect(await auditVerbs(world.projectId)).toEqual([]);
  });

  it("is for structural engineers: a geotechnical engineer, a lead and a reader are refused", async () => {
    for (const who of [world.preparer, world.lead, world.reader])
      expect((await refusalOf(createFooting(who, padInput("F1")))).code).toBe("forbidden");
    expect(await countOf(world, "footing")).toBe(0);
  });
});

describe("changing a footing", () => {
  it("makes the next revision and keeps the one before", async () => {
    const id = await makePad(world, "F1");
    const { loads: _, ...pad } = padInput("F1");
    const edited = await editFooting(world.structural, {
      ...pad,
      footingId: id,
      revision: 1,
      breadth_m: 2.4,
    });
    expect(edited).toMatchObject({ number: 2, revision: 2 });
    const footing = await readFooting(world.reader, { footingId: id });
    expect(footing.geometry.map(({ number, breadth_m }) => [number, breadth_m])).toEqual([
      [2, 2.4],
      [1, 2],
    ]);
    expect(await auditVerbs(world.projectId)).toEqual(["footing:write", "footing:write"]);
  });

  it("refuses a writer who saw an older revision, or said none, and leaves the footing as it was", async () => {
    const id = await makePad(world, "F1");
    const { loads: _, ...pad } = padInput("F1");
    await editFooting(world.structural, { ...pad, footingId: id, revision: 1, breadth_m: 2.4 });
    const late = await refusalOf(
      editFooting(world.structural, { ...pad, footingId: id, revision: 1, breadth_m: 3 }),
    );
    expect(late).toMatchObject({ status: 412, code: "superseded" });
    expect(
      (await refusalOf(editFooting(world.structural, { ...pad, footingId: id, breadth_m: 3 }))).status,
    ).toBe(428);
    expect((await readFooting(world.reader, { footingId: id })).breadth_m).toBe(2.4);
  });

  it("finds no footing of another project, to read or to change", async () => {
    const foreign = await makePad(neighbour, "F9");
    const { loads: _, ...pad } = padInput("F9");
    expect((await refusalOf(readFooting(world.reader, { footingId: foreign }))).status).toBe(404);
    expect(
      (await refusalOf(editFooting(world.structural, { ...pad, footingId: foreign, revision: 1 }))).status,
    ).toBe(404);
    const loads = { loadBasis: "characteristic-full", combinations: [combination()] } as const;
    expect(
      (
        await refusalOf(
          setLoads(world.structural, {
            footingId: foreign,
            revision: 1,
            ...loads,
            combinations: [combination()],
          }),
        )
      ).status,
    ).toBe(404);
    expect((await readFooting(neighbour.reader, { footingId: foreign })).revision).toBe(1);
  });

  it("affects a check that was made before, with a consequence that says so; another mark alone does not", async () => {
    const valueId = await openValue(world);
    await issuedRevision(world, valueId);
    const id = await makePad(world, "F1");
    await link([id], valueId);
    await runChecks(world.structural, { footingIds: [id] });
    const { loads: _, ...pad } = padInput("F1A");
    const renamed = await editFooting(world.structural, {
      ...pad,
      footingId: id,
      revision: 2,
      ownerId: world.structural.person.id,
    });
    expect((await readFooting(world.reader, { footingId: id })).check?.standing).toBe("current");
    const resized = await editFooting(world.structural, {
      ...pad,
      footingId: id,
      revision: renamed.revision,
      ownerId: world.structural.person.id,
      breadth_m: 1.2,
    });
    const footing = await readFooting(world.reader, { footingId: id });
    expect(footing.check).toMatchObject({ standing: "affected", reasons: ["footing revised"] });
    expect(footing.openConsequences).toHaveLength(1);
    await setLoads(world.structural, {
      footingId: id,
      revision: resized.revision,
      loadBasis: "characteristic-full",
      combinations: [combination({ vertical_kN: 300 })],
    });
    expect((await readFooting(world.reader, { footingId: id })).check?.reasons).toEqual([
      "loads changed",
      "footing revised",
    ]);
  });
});

describe("the list of footings", () => {
  it("goes by marks as people count, a page at a time, and shows no neighbour's", async () => {
    for (const mark of ["F10", "F2", "F1", "F20", "F3"]) await makePad(world, mark);
    await makePad(neighbour, "F4");
    expect(await marks({})).toEqual(["F1", "F2", "F3", "F10", "F20"]);
    const first = await listFootings(world.reader, { limit: 2 });
    expect(first.items.map(({ mark }) => mark)).toEqual(["F1", "F2"]);
    expect(first.counts).toMatchObject({ total: 5, unchecked: 5, unlinked: 5, passes: 0 });
    const second = await listFootings(world.reader, { limit: 2, after: first.next ?? "" });
    expect(second.items.map(({ mark }) => mark)).toEqual(["F3", "F10"]);
    const third = await listFootings(world.reader, { limit: 2, after: second.next ?? "" });
    expect([third.items.map(({ mark }) => mark), third.next]).toEqual([["F20"], null]);
    expect(await marks({ descending: "yes" })).toEqual(["F20", "F10", "F3", "F2", "F1"]);
  });

  it("filters by value, zone, unit, verdict, standing, stage, owner, utilisation and words", async () => {
    const valueId = await openValue(world);
    await issuedRevision(world, valueId, { given: "250 kPa" });
    const light = await makePad(world, "F1", { gridReference: "C/4" });
    const heavy = await makePad(world, "F2", { breadth_m: 1.2, length_m: 1.2 });
    const alone = await makePad(world, "F3");
    await link([light, heavy], valueId);
    await runChecks(world.structural, { footingIds: [light, heavy] });
    expect(await marks({ verdict: "fails" })).toEqual(["F2"]);
    expect(await marks({ verdict: "passes" })).toEqual(["F1"]);
    expect(await marks({ standing: "unchecked" })).toEqual(["F3"]);
    expect(await marks({ standing: "current" })).toEqual(["F1", "F2"]);
    expect(await marks({ standing: "affected" })).toEqual([]);
    expect(await marks({ linked: "no" })).toEqual(["F3"]);
    expect(await marks({ zoneId: world.zoneId })).toEqual(["F1", "F2"]);
    expect(await marks({ zoneId: neighbour.zoneId })).toEqual([]);
    expect(await marks({ groundUnitId: world.groundUnitId })).toEqual(["F1", "F2"]);
    expect(await marks({ valueId })).toEqual(["F1", "F2"]);
    expect(await marks({ utilisationFrom: "1" })).toEqual(["F2"]);
    expect(await marks({ utilisationTo: "1" })).toEqual(["F1"]);
    expect(await marks({ search: "c/4" })).toEqual(["F1"]);
    expect(await marks({ ownerId: world.lead.person.id })).toEqual([]);
    expect(await marks({ stage: "designed" })).toEqual(["F1", "F2", "F3"]);
    expect(await marks({ sort: "utilisation", descending: "yes" })).toEqual(["F2", "F1", "F3"]);
    const paged = await listFootings(world.reader, { sort: "utilisation", descending: "yes", limit: 1 });
    expect(await marks({ sort: "utilisation", descending: "yes", after: paged.next ?? "" })).toEqual([
      "F1",
      "F3",
    ]);
    expect(await selectFootingIds(world.reader, { linked: "no" })).toEqual({ footingIds: [alone] });
    await issuedRevision(world, valueId, {
      given: "240 kPa",
      reasonCode: "error",
      reason: "A slip in the first issue",
    });
    expect(await marks({ standing: "affected" })).toEqual(["F1", "F2"]);
    const { items, counts } = await listFootings(world.reader, { search: "F1" });
    expect(items[0]?.check?.reasons).toEqual(["bearing value revised P01 → P02"]);
    expect(counts).toMatchObject({ total: 1, affected: 1 });
  });

  it("refuses the end of a page that is none, and words that are no filter", async () => {
    expect((await refusalOf(listFootings(world.reader, { after: "x" }))).fields).toHaveProperty("after");
    expect((await refusalOf(listFootings(world.reader, { stage: "built" as never }))).fields).toHaveProperty(
      "stage",
    );
  });
});

describe("stages on site", () => {
  const today = "2026-04-30";
  const reach = (
    footingId: FootingId,
    revision: number,
    stage: Parameters<typeof recordStage>[1]["stage"],
    note = "",
  ) => recordStage(world.structural, { footingId, revision, stage, reachedOn: today, note });

  it("holds the formation and the concrete until a current check passes, and says why each time", async () => {
    const valueId = await openValue(world);
    await issuedRevision(world, valueId, { purpose: "for-design" });
    const id = await makePad(world, "F1");
    const hold = async (revision: number) => {
      try {
        await reach(id, revision, "formation-accepted");
        return "not held";
      } catch (error) {
        return (error as Error).message;
      }
    };
    expect(await hold(1)).toContain("has no check");
    await link([id], valueId);
    await runChecks(world.structural, { footingIds: [id] });
    await issuedRevision(world, valueId, {
      purpose: "for-design",
      given: "100 kPa",
      reasonCode: "water",
      reason: "Water stands higher than taken",
    });
    expect(await hold(2)).toContain("bearing value revised C01 → C02");
    await runChecks(world.structural, { footingIds: [id] });
    expect(await hold(2)).toContain("the last check fails");
    expect(await countOf(world, "stage_event")).toBe(0);
    await issuedRevision(world, valueId, {
      purpose: "for-design",
      given: "250 kPa",
      reasonCode: "error",
      reason: "The reading of water was in error",
    });
    await runChecks(world.structural, { footingIds: [id] });
    expect(await reach(id, 2, "formation-accepted")).toMatchObject({
      stage: "formation-accepted",
      number: 1,
      revision: 3,
    });
    expect((await readFooting(world.reader, { footingId: id })).hold).toBeNull();
  });

  it("holds issue for construction while the value is assumed or preliminary", async () => {
    const valueId = await openValue(world);
    await issuedRevision(world, valueId);
    const id = await makePad(world, "F1");
    await link([id], valueId);
    await expect(reach(id, 2, "issued")).rejects.toThrow("preliminary");
    expect((await readFooting(world.reader, { footingId: id })).stage).toBe("designed");
  });

  it("goes back only with a reason, and not to where it is", async () => {
    const id = await makePad(world, "F1");
    await reach(id, 1, "excavated");
    expect((await refusalOf(reach(id, 2, "designed"))).fields).toHaveProperty("note");
    expect((await refusalOf(reach(id, 2, "excavated"))).status).toBe(409);
    await reach(id, 2, "designed", "Filled in again after the layout moved");
    expect(
      (await readFooting(world.reader, { footingId: id })).stageEvents.map(({ stage }) => stage),
    ).toEqual(["designed", "excavated"]);
  });

  it("is not for readers", async () => {
    const id = await makePad(world, "F1");
    const given = { footingId: id, revision: 1, stage: "excavated", reachedOn: today } as const;
    expect((await refusalOf(recordStage(world.reader, given))).code).toBe("forbidden");
  });
});

describe("what is recorded of a footing", () => {
  it.each(["footing_revision", "load_set", "footing_link", "stage_event"])(
    "cannot be changed or removed: %s",
    async (table) => {
      const id = await makePad(world, "F1");
      await link([id], await openValue(world));
      await recordStage(world.structural, {
        footingId: id,
        revision: 2,
        stage: "excavated",
        reachedOn: "2026-04-30",
      });
      for (const act of [
        sql`update ${sql.identifier(table)} set number = 9`,
        sql`delete from ${sql.identifier(table)}`,
      ])
        await expect(inside(world, (tx) => tx.execute(act))).rejects.toThrow();
      expect(await countOf(world, table)).toBe(1);
    },
  );
});
