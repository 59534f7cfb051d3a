import { randomUUID } from "node:crypto";
import { beforeAll, beforeEach, describe, expect, it } from "vitest";
import type { FootingId } from "@/lib/contracts/ids";
import { runChecks } from "@/lib/services/checks/run-checks";
import { plantFault } from "@/lib/services/faults";
import { acceptFootingImport, previewFootingImport } from "@/lib/services/footings/import-footings";
import { listFootings } from "@/lib/services/footings/list-footings";
import { readFooting } from "@/lib/services/footings/read-footing";
import { chooseLink } from "@/lib/services/links/choose-link";
import { acceptLoadImport, previewLoadImport } from "@/lib/services/loads/import-loads";
import { freshDatabase } from "../../support/database";
import { auditVerbs, lookInto, refusalOf } from "../../support/site";
import { buildWorld, countOf, issuedRevision, openValue, type World } from "../values/register-world";
import { makePad, statementsOf } from "./schedule";

let world: World;
let neighbour: World;
beforeAll(async () => {
  lookInto((await freshDatabase()).superuserUrl);
});
beforeEach(async () => {
  world = await buildWorld(`W-${randomUUID().slice(0, 8)}`);
  neighbour = await buildWorld(`N-${randomUUID().slice(0, 8)}`);
});

const HEADINGS =
  "mark,easting_m,northing_m,breadth_m,length_m,thickness_m,groundLevel_m,foundingLevel_m,zone";
const footings = (...rows: string[]) => [HEADINGS, ...rows].join("\r\n");
const F1 = "F1,100,100,2,2.4,0.6,11.2,10,";
const F2 = "F2,110,100,2.2,2.2,0.6,11.2,10,Zone B";
const preview = (content: string) => previewFootingImport(world.structural, { content });
const accept = (content: string, fingerprint: string, leaveOutErrors = false) =>
  acceptFootingImport(world.structural, { content, fingerprint, leaveOutErrors, fileName: "footings.csv" });
const take = async (content: string) => accept(content, (await preview(content)).fingerprint);
const byMark = async (mark: string) => {
  const { items } = await listFootings(world.reader, { search: mark });
  return items.find((item) => item.mark === mark);
};

const LOADS =
  "mark,combination,duration,vertical_kN,momentB_kNm,momentL_kNm,horizontalB_kN,horizontalL_kN,loadBasis";
const loads = (...rows: string[]) => [LOADS, ...rows].join("\n");
const basis = { loadBasis: "characteristic-full", source: "Frame model, issue 3" } as const;
const previewLoads = (content: string) => previewLoadImport(world.structural, { content, ...basis });
const acceptLoads = (content: string, fingerprint: string) =>
  acceptLoadImport(world.structural, { content, fingerprint, ...basis });
const takeLoads = async (content: string) => acceptLoads(content, (await previewLoads(content)).fingerprint);

describe("a file of footings", () => {
  it("shows what would be new and writes nothing; accepted, it is all there under one line of the audit trail", async () => {
    const content = footings(F1, F2);
    const shown = await preview(content);
    expect(shown.counts).toEqual({ new: 2, changed: 0, unchanged: 0, inError: 0, missing: 0 });
    expect([await countOf(world, "footing"), await auditVerbs(world.projectId)]).toEqual([0, []]);
    expect(await accept(content, shown.fingerprint)).toEqual({
      new: 2,
      changed: 0,
      unchanged: 0,
      leftOut: 0,
    });
    expect(await byMark("F2")).toMatchObject({
      breadth_m: 2.2,
      foundingLevel_m: 10,
      revision: 1,
      owner: { name: "Sara Brandt" },
    });
    expect(await auditVerbs(world.projectId)).toEqual(["footing:import"]);
    expect(await countOf(neighbour, "footing")).toBe(0);
  });

  it("read again changes nothing; with one figure changed it revises that footing alone", async () => {
    await take(footings(F1, F2));
    expect((await preview(footings(F1, F2))).counts).toMatchObject({ unchanged: 2, new: 0, changed: 0 });
    const wider = footings(F1.replace(",2,2.4,", ",2.6,2.4,"), F2);
    const shown = await preview(wider);
    expect(shown.counts).toMatchObject({ changed: 1, unchanged: 1 });
    expect(shown.rows).toMatchObject([
      { mark: "F1", what: "changed", changes: [{ field: "breadth", unit: "m", before: "2", after: "2.6" }] },
    ]);
    await accept(wider, shown.fingerprint);
    const one = await readFooting(world.reader, { footingId: (await byMark("F1"))?.id as FootingId });
    expect(one.geometry.map(({ breadth_m }) => breadth_m)).toEqual([2.6, 2]);
    expect((await byMark("F2"))?.revision).toBe(1);
  });

  it("keeps what is registered where a cell is empty, and names the marks that the file does not have", async () => {
    await take(footings(F1, F2));
    const shown = await preview(footings("F1,,,2.6,,,,,"));
    expect(shown.rows).toMatchObject([{ mark: "F1", changes: [{ field: "breadth" }] }]);
    expect(shown.missing).toEqual(["F2"]);
  });

  it.each([
    ["a mark twice", footings(F1, "F1,120,100,2,2,0.6,11.2,10,"), 3, /F1/],
    ["a mark twice in other letters", footings(F1, "f1,120,100,2,2,0.6,11.2,10,"), 3, /F1|f1/],
    [
      "a zone that is not there",
      footings(F1, "F3,120,100,2,2,0.6,11.2,10,Zone Q"),
      3,
      /no zone named Zone Q/,
    ],
    ["a size that is missing", footings(F1, "F3,120,100,,2,0.6,11.2,10,"), 3, /breadth/],
    ["a size that is negative", footings(F1, "F3,120,100,-2,2,0.6,11.2,10,"), 3, /breadth/i],
    ["an absurd size", footings(F1, "F3,120,100,2000,2,0.6,11.2,10,"), 3, /breadth/i],
    ["no number", footings(F1, "F3,120,100,wide,2,0.6,11.2,10,"), 3, /./],
    ["a founding level above ground", footings(F1, "F3,120,100,2,2,0.6,11.2,12,"), 3, /above the ground/],
  ])(
    "says in which row and why: %s; and refuses the whole unless that row is left out",
    async (_, content, row, why) => {
      const shown = await preview(content);
      expect(shown.counts).toMatchObject({ new: 1, inError: 1 });
      const told = shown.findings.filter(({ severity }) => severity === "error");
      expect(told[0]).toMatchObject({ row });
      expect(told.map(({ message }) => message).join(" ")).toMatch(why);
      expect((await refusalOf(accept(content, shown.fingerprint))).status).toBe(400);
      expect(await countOf(world, "footing")).toBe(0);
      expect(await accept(content, shown.fingerprint, true)).toMatchObject({ new: 1, leftOut: 1 });
      expect(await countOf(world, "footing")).toBe(1);
    },
  );

  it("refuses a binary file that is named .csv, and one without the headings", async () => {
    for (const content of ["PK\u0003\u0004\u0000\u0000binary", "alpha,beta\n1,2\n"]) {
      const shown = await preview(content);
      expect(shown.refused).not.toBeNull();
      expect((await refusalOf(accept(content, shown.fingerprint))).status).toBe(400);
    }
    expect(await countOf(world, "footing")).toBe(0);
  });

  it("refuses to write what was not shown: the register or the file has changed since", async () => {
    const content = footings(F1);
    const { fingerprint } = await preview(content);
    expect((await refusalOf(accept(footings(F2), fingerprint))).status).toBe(409);
    await makePad(world, "F1", { breadth_m: 3 });
    expect((await refusalOf(accept(content, fingerprint))).status).toBe(409);
    expect((await byMark("F1"))?.breadth_m).toBe(3);
  });

  it("affects the check of a footing that it changes, and of no other", async () => {
    const valueId = await openValue(world);
    await issuedRevision(world, valueId);
    await take(footings(F1, F2));
    await takeLoads(loads("F1,G,permanent,400,0,0,0,0,", "F2,G,permanent,400,0,0,0,0,"));
    const ids = [(await byMark("F1"))?.id, (await byMark("F2"))?.id] as FootingId[];
    await chooseLink(world.structural, { footingIds: ids, valueId, reason: "The gravel is the same in TP4" });
    await runChecks(world.structural, { footingIds: ids });
    await take(footings(F1.replace(",2,2.4,", ",2.6,2.4,"), F2));
    expect((await byMark("F1"))?.check).toMatchObject({ standing: "affected", reasons: ["footing revised"] });
    expect((await byMark("F2"))?.check).toMatchObject({ standing: "current" });
    expect(await countOf(world, "consequence")).toBe(1);
  });

  it("leaves nothing behind when it fails half-way", async () => {
    const content = footings(F1, F2);
    const { fingerprint } = await preview(content);
    plantFault("import:footings", () => {
      throw new Error("power cut");
    });
    await expect(accept(content, fingerprint)).rejects.toThrow("power cut");
    expect([await countOf(world, "footing"), await countOf(world, "footing_revision")]).toEqual([0, 0]);
  });

  it("is for structural engineers", async () => {
    for (const who of [world.preparer, world.lead, world.reader]) {
      expect((await refusalOf(previewFootingImport(who, { content: footings(F1) }))).code).toBe("forbidden");
      expect(
        (await refusalOf(acceptFootingImport(who, { content: footings(F1), fingerprint: "0".repeat(64) })))
          .code,
      ).toBe("forbidden");
    }
  });

  it("of ten thousand rows takes at most thirty statements, new or changed", {
    timeout: 180_000,
  }, async () => {
    const rows = (breadth_m: number) =>
      footings(
        ...Array.from({ length: 10_000 }, (_, i) => `P${i},${i % 400},100,${breadth_m},2,0.6,11.2,10,`),
      );
    for (const content of [rows(2), rows(2.1)]) {
      const { fingerprint } = await preview(content);
      const seen = await statementsOf(() => accept(content, fingerprint));
      expect(seen.length).toBeLessThanOrEqual(30);
    }
    expect(await countOf(world, "footing_revision")).toBe(20_000);
  });
});

describe("a file of loads", () => {
  beforeEach(async () => {
    await take(footings(F1, F2));
  });
  const idOf = async (mark: string) => (await byMark(mark))?.id as FootingId;

  it("gives each footing its whole next set, keeps the basis that was chosen, and leaves the others alone", async () => {
    const content = loads("F1,G,permanent,400,10,0,5,0,", "F1,G + W,transient,380,60,0,20,0,service");
    const shown = await previewLoads(content);
    expect(shown.counts).toMatchObject({ new: 1, inError: 0, missing: 1 });
    expect(await countOf(world, "load_set")).toBe(0);
    await acceptLoads(content, shown.fingerprint);
    const { loads: sets } = await readFooting(world.reader, { footingId: await idOf("F1") });
    expect(sets).toMatchObject([
      { number: 1, loadBasis: "characteristic-full", source: "Frame model, issue 3" },
    ]);
    expect(sets[0]?.combinations.map(({ name }) => name)).toEqual(["G", "G + W"]);
    expect((await byMark("F2"))?.combinations).toBe(0);
    expect((await auditVerbs(world.projectId)).at(-1)).toBe("loads:import");
  });

  it("shows before and after of a combination that changes, and of one that goes", async () => {
    await takeLoads(loads("F1,G,permanent,400,0,0,0,0,", "F1,G + Q,permanent,600,0,0,0,0,"));
    const shown = await previewLoads(loads("F1,G,permanent,420,0,0,0,0,"));
    expect(shown.rows[0]?.changes.map(({ field, after }) => [field, after === ""])).toEqual([
      ["G", false],
      ["G + Q", true],
    ]);
    expect(shown.rows[0]?.changes[0]?.before).toContain("N 400");
  });

  it.each([
    ["a mark that is not registered", "F7,G,permanent,400,0,0,0,0,", /no footing F7/],
    ["a basis other than the one chosen", "F1,G + Q,permanent,400,0,0,0,0,ultimate", /ultimate/],
    ["a combination twice", "F1,G,transient,500,0,0,0,0,", /G/],
    ["an absurd load", "F1,G + Q,permanent,4e9,0,0,0,0,", /./],
  ])("is refused whole for a row with %s", async (_, bad, why) => {
    const content = loads("F1,G,permanent,400,0,0,0,0,", "F2,G,permanent,300,0,0,0,0,", bad);
    const shown = await previewLoads(content);
    expect(shown.counts.inError).toBeGreaterThan(0);
    expect(shown.findings.map(({ message }) => message).join(" ")).toMatch(why);
    expect((await refusalOf(acceptLoads(content, shown.fingerprint))).status).toBe(400);
    expect(await countOf(world, "load_set")).toBe(0);
  });

  it("needs a basis: there is no default", async () => {
    const refused = await refusalOf(previewLoadImport(world.structural, { content: loads() } as never));
    expect(refused.fields).toHaveProperty("loadBasis");
  });

  it("of another project's mark finds no footing", async () => {
    await makePad(neighbour, "N1");
    const shown = await previewLoads(loads("N1,G,permanent,400,0,0,0,0,"));
    expect(shown.findings[0]?.message).toContain("no footing N1");
  });
});
