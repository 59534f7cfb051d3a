import { existsSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { sql } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import type { Context } from "@/lib/services/context";
import { beginUpload } from "@/lib/services/documents/begin-upload";
import { plantFault } from "@/lib/services/faults";
import { acceptGround } from "@/lib/services/holes/accept-ground";
import { createHole } from "@/lib/services/holes/create-hole";
import { listHoles } from "@/lib/services/holes/list-holes";
import { listStrata } from "@/lib/services/holes/list-strata";
import { previewGround } from "@/lib/services/holes/preview-ground";
import { readHole } from "@/lib/services/holes/read-hole";
import { reviseHole } from "@/lib/services/holes/revise-hole";
import { assignStrata } from "@/lib/services/units/assign-strata";
import { createUnit } from "@/lib/services/units/create-unit";
import { freshDatabase } from "@/tests/support/database";
import { buildWorld, countOf, inside, type World } from "../values/register-world";

const shared = process.env.HOLDGROUND_SHARED ?? join(import.meta.dirname, "../../../../shared");
const real = join(shared, "ags/real");
const present = existsSync(real);
if (!present)
  console.warn("No folder named shared lies beside this checkout: the real AGS files are left out here.");

let number = 0;
let world: World;
const fresh = async () => {
  number += 1;
  return buildWorld(`GROUND-${number}`);
};
beforeAll(async () => {
  await freshDatabase();
  world = await fresh();
});

async function sent(context: Context, fileName: string, bytes: Uint8Array): Promise<string> {
  const ticket = await beginUpload(context, { fileName, size_bytes: bytes.byteLength });
  const answer = await fetch(ticket.url, {
    method: "PUT",
    headers: { "content-type": ticket.mediaType },
    body: new Uint8Array(bytes),
  });
  if (!answer.ok) throw new Error(`the store answered ${answer.status}`);
  return ticket.uploadId;
}

/** Two holes with strata, tests and water, as an AGS 4 file says it. */
const file = (over: { base?: string; second?: boolean; project?: string; status?: string } = {}) => {
  const { base = "3.20", second = true, project = "P-1", status = "FINAL" } = over;
  const lines = [
    [
      '"GROUP","PROJ"',
      '"HEADING","PROJ_ID","PROJ_NAME"',
      '"UNIT","",""',
      '"TYPE","ID","X"',
      `"DATA","${project}","Weir depot"`,
    ],
    [
      '"GROUP","TRAN"',
      '"HEADING","TRAN_ISNO","TRAN_DATE","TRAN_PROD","TRAN_STAT","TRAN_AGS","TRAN_RECV","TRAN_DLIM","TRAN_RCON"',
      '"UNIT","","yyyy-mm-dd","","","","","",""',
      '"TYPE","X","DT","X","X","X","X","X","X"',
      `"DATA","1","2026-02-01","Someone","${status}","4.1.1","Somebody","|","+"`,
    ],
    [
      '"GROUP","LOCA"',
      '"HEADING","LOCA_ID","LOCA_TYPE","LOCA_STAT","LOCA_NATE","LOCA_NATN","LOCA_GL","LOCA_FDEP"',
      '"UNIT","","","","m","m","m","m"',
      '"TYPE","ID","PA","PA","2DP","2DP","2DP","2DP"',
      '"DATA","BH1","CP","FINAL","100.00","200.00","11.50","8.00"',
      ...(second ? ['"DATA","BH2","CP","FINAL","130.00","205.00","Null","6.00"'] : []),
    ],
    [
      '"GROUP","GEOL"',
      '"HEADING","LOCA_ID","GEOL_TOP","GEOL_BASE","GEOL_DESC","GEOL_LEG","GEOL_GEOL"',
      '"UNIT","","m","m","","",""',
      '"TYPE","ID","2DP","2DP","X","PA","PA"',
      `"DATA","BH1","0.00","${base}","MADE GROUND: brick and ash","102","MG"`,
      `"DATA","BH1","${base}","8.00","Stiff brown CLAY","201","LC"`,
      ...(second ? ['"DATA","BH2","0.00","6.00","Stiff grey CLAY","201","LC"'] : []),
    ],
    [
      '"GROUP","ISPT"',
      '"HEADING","LOCA_ID","ISPT_TOP","ISPT_NVAL","ISPT_REP"',
      '"UNIT","","m","",""',
      '"TYPE","ID","2DP","0DP","X"',
      '"DATA","BH1","4.50","","N=50 (7,14/50 for 215mm)"',
      '"DATA","BH1","2.00","8","N=8 (1,2/2,2,2,2)"',
    ],
  ];
  return Buffer.from(`${lines.map((group) => group.join("\r\n")).join("\r\n\r\n")}\r\n`);
};
let reference = 0;
async function taken(where: World, bytes: Uint8Array, confirmed: string[] = []) {
  const uploadId = await sent(where.preparer, "ground.ags", bytes);
  const { sha256 } = await previewGround(where.preparer, { uploadId });
  reference += 1;
  return acceptGround(where.preparer, {
    uploadId,
    reference: `AGS-${reference}`,
    title: "Ground data",
    confirmed,
    sha256,
  });
}

describe("an AGS file", () => {
  it("is previewed without a word written, then taken in whole with its file", async () => {
    const here = await fresh();
    const uploadId = await sent(here.preparer, "ground.ags", file());
    const preview = await previewGround(here.preparer, { uploadId });
    expect(preview).toMatchObject({
      refused: null,
      counts: { holes: 2, strata: 3, spts: 2 },
      holes: { added: ["BH1", "BH2"], changed: [], unchanged: 0, withoutLevel: 1 },
    });
    expect(await countOf(here, "hole")).toBe(0);
    await acceptGround(here.preparer, { uploadId, reference: "AGS", title: "Data", sha256: preview.sha256 });
    const { holes } = await listHoles(here.reader);
    expect(holes.map(({ name, groundLevel_m, strata, spts }) => [name, groundLevel_m, strata, spts])).toEqual(
      [
        ["BH1", 11.5, 2, 2],
        ["BH2", null, 1, 0],
      ],
    );
    const first = await readHole(here.reader, { holeId: holes[0]?.id });
    expect(first.sptRows).toMatchObject([
      { depth_m: 2, blowCount: 8, refusal: false },
      { depth_m: 4.5, blowCount: null, refusal: true, mainBlows: 50, mainPenetration_mm: 215 },
    ]);
    expect(first.strataRows[0]).toMatchObject({
      madeGround: true,
      description: "MADE GROUND: brick and ash",
    });
    expect(first.source?.reference).toBe("AGS");
  });

  it("changes nothing when it comes again; a corrected log is a new revision; what it leaves out stays", async () => {
    const here = await fresh();
    await taken(here, file());
    const again = await sent(here.preparer, "again.ags", Buffer.concat([file(), Buffer.from("\r\n")]));
    const preview = await previewGround(here.preparer, { uploadId: again });
    expect(preview.holes).toMatchObject({ added: [], changed: [], unchanged: 2, missing: [] });

    const answer = await taken(here, file({ base: "3.40", second: false }));
    expect(answer).toMatchObject({ added: 0, changed: 1, unchanged: 0 });
    const { holes } = await listHoles(here.reader);
    expect(holes.map(({ name, number: log }) => [name, log])).toEqual([
      ["BH1", 2],
      ["BH2", 1],
    ]);
  });

  it("of another project, or of preliminary data, is not taken before that is confirmed", async () => {
    const here = await fresh();
    await taken(here, file());
    const strange = file({ base: "3.30", project: "P-9", status: "Preliminary" });
    await expect(taken(here, strange)).rejects.toMatchObject({
      fields: { confirmed: expect.stringContaining("P-9") },
    });
    await expect(taken(here, strange, ["other-project"])).rejects.toMatchObject({ status: 400 });
    expect(await taken(here, strange, ["other-project", "not-final"])).toMatchObject({ changed: 1 });
  });

  it("leaves no row when the import is broken off half-way", async () => {
    const here = await fresh();
    plantFault("ground:kept", () => {
      throw new Error("broken off");
    });
    await expect(taken(here, file())).rejects.toThrow("broken off");
    // The world has one report of its own.
    for (const table of ["hole", "hole_revision", "stratum", "spt", "data_issue", "document"])
      expect(await countOf(here, table), table).toBe(table === "document" ? 1 : 0);
  });

  it.each([
    ["cut in the middle of a row", file().subarray(0, 700)],
    ["binary", Buffer.from([1, 2, 0, 255, 7, 0, 0])],
    ["empty but for a line", Buffer.from("\r\n")],
  ])("that is %s never leaves a half import", async (_name, bytes) => {
    const here = await fresh();
    await taken(here, bytes).catch(() => undefined);
    const holes = await countOf(here, "hole");
    expect(await countOf(here, "hole_revision")).toBe(holes);
  });

  it("is imported by a geotechnical engineer alone", async () => {
    const uploadId = await sent(world.structural, "x.ags", file());
    await expect(previewGround(world.structural, { uploadId })).rejects.toMatchObject({ status: 403 });
  });
});

describe.runIf(present)("the real files", () => {
  it("of 31 holes come in with levels, 121 tests and water", async () => {
    const here = await fresh();
    const bytes = readFileSync(join(real, "31-holes-spt-water.ags"));
    const uploadId = await sent(here.preparer, "31.ags", bytes);
    const preview = await previewGround(here.preparer, { uploadId });
    expect(preview.counts).toMatchObject({ holes: 31, spts: 121 });
    expect(preview.counts.strikes).toBeGreaterThan(0);
    await acceptGround(here.preparer, {
      uploadId,
      reference: "REAL",
      title: "Real file",
      sha256: preview.sha256,
      confirmed: preview.questions.map(({ code }) => code),
    });
    expect(await countOf(here, "hole")).toBe(31);
    expect(await countOf(here, "spt")).toBe(121);
  });

  it("of 1,788 holes and 5,728 strata come in, in one transaction", async () => {
    const here = await fresh();
    const bytes = readFileSync(join(real, "1788-holes-no-levels.ags"));
    const uploadId = await sent(here.preparer, "1788.ags", bytes);
    const preview = await previewGround(here.preparer, { uploadId });
    expect(preview.counts).toMatchObject({ holes: 1788, strata: 5728 });
    await acceptGround(here.preparer, {
      uploadId,
      reference: "REAL",
      title: "Real file",
      sha256: preview.sha256,
      confirmed: preview.questions.map(({ code }) => code),
    });
    expect(await countOf(here, "hole")).toBe(1788);
    expect(await countOf(here, "stratum")).toBe(5728);
    const transactions = await inside(here, (tx) =>
      tx.execute<{ n: number }>(sql`select count(distinct xmin::text)::int as n from stratum`),
    );
    expect(transactions.rows[0]?.n).toBe(1);
  });

  it("of the older edition is refused with what it is", async () => {
    const here = await fresh();
    const uploadId = await sent(here.preparer, "old.ags", readFileSync(join(real, "older-edition-3.ags")));
    const preview = await previewGround(here.preparer, { uploadId });
    expect(preview.refused).toMatch(/edition 3/);
    await expect(
      acceptGround(here.preparer, { uploadId, reference: "OLD", title: "Old", sha256: preview.sha256 }),
    ).rejects.toMatchObject({ status: 400 });
    expect(await countOf(here, "hole")).toBe(0);
  });

  it("named as the second issue of another project is asked about before it is taken", async () => {
    const here = await fresh();
    const first = await sent(here.preparer, "1.ags", readFileSync(join(real, "final-1.ags")));
    const one = await previewGround(here.preparer, { uploadId: first });
    const codes = one.questions.map(({ code }) => code);
    await acceptGround(here.preparer, {
      uploadId: first,
      reference: "F1",
      title: "First",
      sha256: one.sha256,
      confirmed: codes,
    });
    const second = await sent(
      here.preparer,
      "2.ags",
      readFileSync(join(real, "final-2-is-another-project.ags")),
    );
    const two = await previewGround(here.preparer, { uploadId: second });
    expect(two.questions.map(({ code }) => code)).toEqual(
      expect.arrayContaining(["other-project", "far-away"]),
    );
  });
});

describe("a hole by hand", () => {
  const hole = (over: Record<string, unknown> = {}) => ({
    name: `TP${Math.random().toString(36).slice(2, 8)}`,
    kind: "TP",
    easting_m: 10,
    northing_m: 20,
    groundLevel_m: 11.2,
    finalDepth_m: 3,
    strata: [
      { top_m: 0, base_m: 1.2, description: "MADE GROUND" },
      { top_m: 1.2, base_m: 3, description: "Dense GRAVEL" },
    ],
    ...over,
  });

  it("is kept with its strata, read by machine for the hatch alone", async () => {
    const made = await createHole(world.preparer, hole());
    const page = await readHole(world.reader, { holeId: made.id });
    expect(page.strataRows.map(({ soil, madeGround }) => [soil, madeGround])).toEqual([
      ["made-ground", true],
      ["gravel", false],
    ]);
  });

  it.each([
    [
      "a gap between strata",
      {
        strata: [
          { top_m: 0, base_m: 1, description: "A" },
          { top_m: 1.5, base_m: 3, description: "B" },
        ],
      },
      "strata.1.top_m",
    ],
    [
      "an overlap",
      {
        strata: [
          { top_m: 0, base_m: 2, description: "A" },
          { top_m: 1.5, base_m: 3, description: "B" },
        ],
      },
      "strata.1.top_m",
    ],
    ["a base above its top", { strata: [{ top_m: 2, base_m: 1, description: "A" }] }, "strata.0.base_m"],
    [
      "a stratum below the final depth",
      { strata: [{ top_m: 0, base_m: 9, description: "A" }] },
      "strata.0.base_m",
    ],
    ["a coordinate that is no number", { easting_m: Number.NaN }, "easting_m"],
    ["no name", { name: " " }, "name"],
    ["a refusal without its blows", { spts: [{ depth_m: 1, refusal: true }] }, "spts.0.mainBlows"],
    ["a field that is not known", { netAllowable_kPa: 200 }, "netAllowable_kPa"],
  ])("with %s is refused at that field", async (_name, over, field) => {
    await expect(createHole(world.preparer, hole(over))).rejects.toMatchObject({
      fields: { [field]: expect.any(String) },
    });
  });

  it("is corrected by a new revision; a writer who saw an older one is refused", async () => {
    const { name, ...log } = hole();
    const made = await createHole(world.preparer, { name, ...log });
    const revised = await reviseHole(world.preparer, {
      ...log,
      holeId: made.id,
      revision: 1,
      finalDepth_m: 3.4,
      reason: "Depth misread.",
    });
    expect(revised.revision).toBe(2);
    await expect(
      reviseHole(world.checker, { ...log, holeId: made.id, revision: 1, reason: "Lost." }),
    ).rejects.toMatchObject({ status: 412 });
    const page = await readHole(world.reader, { holeId: made.id });
    expect(page).toMatchObject({ number: 2, finalDepth_m: 3.4 });
    expect(page.revisions).toHaveLength(2);
  });

  it("is recorded by no other role", async () => {
    for (const context of [world.structural, world.lead, world.reader])
      await expect(createHole(context, hole())).rejects.toMatchObject({ status: 403 });
  });
});

describe("strata and ground units", () => {
  it("are assigned in bulk by words and code, leaving the rest and the neighbour alone", async () => {
    const here = await fresh();
    const beside = await fresh();
    await taken(here, file());
    await taken(beside, file());
    const clay = await createUnit(here.preparer, { code: "4", name: "Clay", soil: "clay" });
    const { assigned } = await assignStrata(here.preparer, {
      groundUnitId: clay.id,
      matching: { description: "stiff", geologyCode: "LC" },
    });
    expect(assigned).toBe(2);
    const units = (await listStrata(here.reader)).strata.map(({ groundUnit }) => groundUnit);
    expect(units).toEqual([null, "4", "4"]);
    expect((await listStrata(beside.reader)).strata.every(({ groundUnit }) => groundUnit === null)).toBe(
      true,
    );
    await expect(
      assignStrata(beside.preparer, { groundUnitId: clay.id, matching: { description: "stiff" } }),
    ).rejects.toMatchObject({ status: 404 });
  });
});
