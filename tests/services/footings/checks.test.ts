import { randomUUID } from "node:crypto";
import { sql } from "drizzle-orm";
import { beforeAll, beforeEach, describe, expect, it } from "vitest";
import { client } from "@/db/client";
import type { FootingId, ValueId } from "@/lib/contracts/ids";
import { readChange } from "@/lib/services/changes/read-change";
import { readCheck } from "@/lib/services/checks/read-check";
import { replayCheck } from "@/lib/services/checks/replay";
import { replayProject } from "@/lib/services/checks/replay-project";
import { runChecks } from "@/lib/services/checks/run-checks";
import { plantFault } from "@/lib/services/faults";
import { readFooting } from "@/lib/services/footings/read-footing";
import { chooseLink } from "@/lib/services/links/choose-link";
import { issueRevision } from "@/lib/services/revisions/issue-revision";
import { withdrawRevision } from "@/lib/services/revisions/withdraw-revision";
import { freshDatabase } from "../../support/database";
import { asSuperuser, auditVerbs, lookInto, refusalOf, stored } from "../../support/site";
import {
  buildWorld,
  checkedRevision,
  countOf,
  inside,
  issuedRevision,
  openValue,
  type World,
} from "../values/register-world";
import { combination, makeMany, makePad, statementsOf } from "./schedule";

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
const check = (footingIds: FootingId[], of = world) => runChecks(of.structural, { footingIds });
const standingOf = async (footingId: FootingId) => (await readFooting(world.reader, { footingId })).check;

const seen = ({ valueId, revisionId, revision }: Awaited<ReturnType<typeof checkedRevision>>) => ({
  valueId,
  revisionId,
  revision,
});

/** A value in force and one pad linked to it. */
async function linkedPad(
  given: Parameters<typeof issuedRevision>[2] = {},
  pad: Parameters<typeof makePad>[2] = {},
) {
  const valueId = await openValue(world);
  await issuedRevision(world, valueId, given);
  const footingId = await makePad(world, "F1", pad);
  await link([footingId], valueId);
  return { valueId, footingId };
}

async function placeHole(of: World, name: string, easting_m: number, northing_m: number): Promise<string> {
  const [holeId, revisionId] = [randomUUID(), randomUUID()];
  await inside(of, async (tx) => {
    await tx.execute(sql`insert into hole (project_id, id, name, current_revision_id)
      values (${of.projectId}, ${holeId}, ${name}, ${revisionId})`);
    await tx.execute(sql`insert into hole_revision (project_id, id, hole_id, number, kind, easting_m, northing_m, recorded_by)
      values (${of.projectId}, ${revisionId}, ${holeId}, 1, 'CP', ${easting_m}, ${northing_m}, ${of.preparer.person.id})`);
  });
  return revisionId;
}

describe("a check", () => {
  it("reads its pressure from the revision in force, pins all that it used, and becomes the footing's latest", async () => {
    const { valueId, footingId } = await linkedPad({ given: "250 kPa" });
    const near = await placeHole(world, "BH1", 110, 100);
    await placeHole(world, "BH2", 126, 100);
    await placeHole(neighbour, "BH1", 100, 100);
    const answer = await check([footingId]);
    expect(answer).toMatchObject({ checked: 1, notCheckedCount: 0, counts: { passes: 1 } });
    const kept = await readCheck(world.reader, { checkId: answer.checkId as never });
    expect(kept).toMatchObject({
      valueId,
      netAllowable_kPa: 250,
      criteriaNumber: 1,
      standing: "current",
      reasons: [],
      verdict: "passes",
    });
    expect(kept.snapshot.input.value).toMatchObject({ kind: "single", netAllowable_kPa: 250 });
    expect(kept.snapshot.input.loads).toHaveLength(2);
    expect(kept.snapshot.register.holesNear).toEqual(["BH1"]);
    expect(kept.result.combinations).toHaveLength(2);
    const [row] = await stored<{ hole_revision_ids: string[]; latest: string }>(
      "select c.hole_revision_ids, f.latest_check_id as latest from footing_check c join footing f on f.id = c.footing_id where c.id = $1",
      [answer.checkId],
    );
    expect(row).toEqual({ hole_revision_ids: [near], latest: answer.checkId });
    expect((await auditVerbs(world.projectId)).at(-1)).toBe("check:run");
  });

  it("is replaced by the next one; both stay", async () => {
    const { footingId } = await linkedPad();
    await check([footingId]);
    await check([footingId]);
    const { checks } = await readFooting(world.reader, { footingId });
    expect(checks.map(({ standing }) => standing)).toEqual(["current", "replaced"]);
  });

  it("has no field for a pressure: one that is sent is refused by name and nothing is checked", async () => {
    const { footingId } = await linkedPad();
    for (const field of ["netAllowable_kPa", "pressure", "valueRevisionId", "value"]) {
      const refused = await refusalOf(
        runChecks(world.structural, { footingIds: [footingId], [field]: 400 } as never),
      );
      expect(refused).toMatchObject({ status: 400, fields: { [field]: "This field is not known here." } });
    }
    expect(await countOf(world, "footing_check")).toBe(0);
  });

  it("is for structural engineers, of this project's footings only", async () => {
    const { footingId } = await linkedPad();
    for (const who of [world.preparer, world.lead, world.reader])
      expect((await refusalOf(runChecks(who, { footingIds: [footingId] }))).code).toBe("forbidden");
    const foreign = await makePad(neighbour, "F1");
    expect((await refusalOf(check([footingId, foreign]))).status).toBe(404);
    expect(await countOf(world, "footing_check")).toBe(0);
    expect(
      (await refusalOf(runChecks(world.structural, { footingIds: [footingId], all: true }))).status,
    ).toBe(400);
    expect((await refusalOf(runChecks(world.structural, {}))).status).toBe(400);
  });

  it("of another project cannot be read by its id", async () => {
    const { footingId } = await linkedPad();
    const { checkId } = await check([footingId]);
    expect((await refusalOf(readCheck(neighbour.reader, { checkId: checkId as never }))).status).toBe(404);
  });
});

describe("a check of several footings", () => {
  it("names those that have no applicable value or no loads, each with why, and checks the others", async () => {
    const { valueId, footingId } = await linkedPad();
    const unlinked = await makePad(world, "F2");
    const unloaded = await makePad(world, "F3", { loads: null });
    await link([unloaded], valueId);
    const answer = await check([footingId, unlinked, unloaded]);
    expect(answer.checked).toBe(1);
    expect(Object.fromEntries(answer.notChecked.map(({ mark, reason }) => [mark, reason]))).toEqual({
      F2: "No applicable value: the footing is linked to no bearing value.",
      F3: "The footing has no load combinations yet.",
    });
    expect(await countOf(world, "footing_check")).toBe(1);
  });

  it("refuses a value that was never issued and one that was withdrawn", async () => {
    const { valueId, footingId } = await linkedPad();
    const [issued] = await stored<{ current: string; revision: number }>(
      "select current_revision_id as current, revision from bearing_value where id = $1",
      [valueId],
    );
    await check([footingId]);
    await withdrawRevision(world.issuer, {
      valueId,
      revisionId: issued?.current as never,
      revision: issued?.revision,
      reason: "The plate test was on the wrong stratum",
    });
    const answer = await check([footingId]);
    expect(answer.checked).toBe(0);
    expect(answer.notChecked[0]?.reason).toContain("no revision in force");
    expect(await standingOf(footingId)).toMatchObject({ standing: "affected" });
  });

  it("checks all that are linked, and says so where none is", async () => {
    expect((await refusalOf(runChecks(world.structural, { all: true }))).status).toBe(409);
    const { footingId } = await linkedPad();
    await makePad(world, "F2");
    const answer = await runChecks(world.structural, { all: true });
    expect([answer.checked, answer.notCheckedCount]).toEqual([1, 0]);
    expect(await standingOf(footingId)).toMatchObject({ standing: "current" });
  });
});

describe("the conditions of a value", () => {
  it("put loads on another basis outside conditions, whatever the figures", async () => {
    const { footingId } = await linkedPad(
      {},
      {
        loads: { loadBasis: "design-factored", combinations: [combination({ vertical_kN: 100 })] },
      },
    );
    const { checkId, counts } = await check([footingId]);
    expect(counts["outside conditions"]).toBe(1);
    const { result } = await readCheck(world.reader, { checkId: checkId as never });
    expect(result.findings.find(({ code }) => code === "load-basis")?.message).toContain("never mixed");
  });

  it("put a founding level outside the value's range outside conditions, and not one at its limit", async () => {
    const { footingId } = await linkedPad({ highestFoundingLevel_m: 10, lowestFoundingLevel_m: 9 });
    const high = await makePad(world, "F2", { foundingLevel_m: 10.2 });
    await link([high], (await readFooting(world.reader, { footingId })).value?.id ?? null);
    expect((await check([footingId])).counts.passes).toBe(1);
    expect((await check([high])).counts["outside conditions"]).toBe(1);
  });

  it.each([
    [
      "assumed",
      { basis: "assumed", confirmBy: "2099-09-01", confirmWho: "Ines Halloran" },
      "unconfirmed-value",
    ],
    ["preliminary", { purpose: "preliminary" }, "preliminary-value"],
  ] as const)("say so in the findings where the value is %s", async (_, given, code) => {
    const { footingId } = await linkedPad(given);
    const { checkId } = await check([footingId]);
    const { result } = await readCheck(world.reader, { checkId: checkId as never });
    expect(result.findings.map((finding) => finding.code)).toContain(code);
  });

  it("say so where no hole lies near, and are silent about it where one does", async () => {
    const { footingId } = await linkedPad();
    const codes = async () => {
      const { checkId } = await check([footingId]);
      return (await readCheck(world.reader, { checkId: checkId as never })).result.findings.map(
        ({ code }) => code,
      );
    };
    expect(await codes()).toContain("no-hole-near");
    await placeHole(world, "BH1", 100, 124);
    expect(await codes()).not.toContain("no-hole-near");
  });
});

describe("a check after a revision", () => {
  it("answers the open consequence of its footing and of no other, and makes it current again", async () => {
    const { valueId, footingId } = await linkedPad();
    const other = await makePad(world, "F2");
    await link([other], valueId);
    await check([footingId, other]);
    const { changeId } = await issuedRevision(world, valueId, {
      given: "240 kPa",
      reasonCode: "error",
      reason: "A slip in the first issue",
    });
    expect((await readFooting(world.reader, { footingId })).openConsequences).toHaveLength(1);
    const answer = await check([footingId]);
    expect(answer.answered).toBe(1);
    expect(await standingOf(footingId)).toMatchObject({ standing: "current" });
    expect(await standingOf(other)).toMatchObject({ standing: "affected" });
    const { items } = await readChange(world.lead, { changeId });
    expect(Object.fromEntries(items.map(({ mark, open }) => [mark, open]))).toEqual({ F1: false, F2: true });
    expect(items.find(({ mark }) => mark === "F1")?.answer).toMatchObject({
      kind: "re-checked",
      verdict: "passes",
    });
  });

  it("waits for a revision that is being issued at the same moment, and reads the new one", async () => {
    const { valueId, footingId } = await linkedPad({ given: "250 kPa" });
    await check([footingId]);
    const next = await checkedRevision(world, valueId, {
      given: "240 kPa",
      reasonCode: "error",
      reason: "A slip in the first issue",
    });
    let checking: Promise<unknown> = Promise.resolve();
    plantFault("issue:consequences", async () => {
      checking = check([footingId]);
      await new Promise((resolve) => setTimeout(resolve, 300));
    });
    await issueRevision(world.issuer, seen(next));
    await checking;
    expect(await standingOf(footingId)).toMatchObject({ standing: "current", code: next.code });
  });

  it("that was made first is among the consequences of a revision issued at the same moment", async () => {
    const { valueId, footingId } = await linkedPad({ given: "250 kPa" });
    const next = await checkedRevision(world, valueId, {
      given: "240 kPa",
      reasonCode: "error",
      reason: "A slip in the first issue",
    });
    let issuing: Promise<{ counts: Record<string, number> }> | undefined;
    plantFault("check:gathered", async () => {
      issuing = issueRevision(world.issuer, seen(next));
      await new Promise((resolve) => setTimeout(resolve, 300));
    });
    await check([footingId]);
    expect((await issuing)?.counts.holds).toBe(1);
    expect(await standingOf(footingId)).toMatchObject({ standing: "affected" });
    expect((await readFooting(world.reader, { footingId })).openConsequences).toHaveLength(1);
  });
});

describe("a check that fails half-way", () => {
  it.each(["check:gathered", "check:batch", "check:answered"])(
    "leaves nothing behind at %s",
    async (point) => {
      const { footingId } = await linkedPad();
      plantFault(point, () => {
        throw new Error("power cut");
      });
      await expect(check([footingId])).rejects.toThrow("power cut");
      expect(await countOf(world, "footing_check")).toBe(0);
      expect(await standingOf(footingId)).toBeNull();
      expect(await auditVerbs(world.projectId)).not.toContain("check:run");
    },
  );
});

describe("the database", () => {
  const copy = (set: string) => `
    insert into footing_check (project_id, footing_id, footing_revision_id, load_set_id, value_id, value_revision_id,
      value_kind, net_allowable_kpa, criteria_number, zone_revision_id, engine_version, verdict, snapshot, result, run_by)
    select project_id, footing_id, footing_revision_id, load_set_id, value_id, value_revision_id,
      ${set}, criteria_number, zone_revision_id, engine_version, verdict, snapshot, result, run_by
    from footing_check limit 1`;

  it("takes a check that copies the revision's own pressure, and none with another, none, or another kind", async () => {
    const { footingId } = await linkedPad();
    await check([footingId]);
    await inside(world, (tx) => tx.execute(sql.raw(copy("value_kind, net_allowable_kpa"))));
    for (const set of [
      "value_kind, net_allowable_kpa + 50",
      "value_kind, null",
      "'table', null",
      "'table', net_allowable_kpa",
    ])
      await expect(inside(world, (tx) => tx.execute(sql.raw(copy(set))))).rejects.toThrow();
    expect(await countOf(world, "footing_check")).toBe(2);
  });

  it("takes no check on a revision that was checked but never issued", async () => {
    const { valueId, footingId } = await linkedPad();
    await check([footingId]);
    const { revisionId } = await checkedRevision(world, valueId, {
      reasonCode: "error",
      reason: "A slip in the first issue",
    });
    const never = copy("value_kind, net_allowable_kpa").replace(
      "value_id, value_revision_id,\n      value_kind, net_allowable_kpa, criteria",
      `value_id, '${revisionId}', value_kind, net_allowable_kpa, criteria`,
    );
    expect(never).toContain(revisionId);
    await expect(inside(world, (tx) => tx.execute(sql.raw(never)))).rejects.toThrow();
  });

  it("lets no check be changed or removed", async () => {
    const { footingId } = await linkedPad();
    await check([footingId]);
    for (const act of [sql`update footing_check set verdict = 'passes'`, sql`delete from footing_check`])
      await expect(inside(world, (tx) => tx.execute(act))).rejects.toThrow();
  });
});

describe("replay", () => {
  it("comes to every digit again from what was stored, and finds one digit that was altered", async () => {
    const { footingId } = await linkedPad(
      {},
      { easting_m: 100.123456789, breadth_m: 2.1, length_m: 1.7000000000000002 },
    );
    const { checkId } = await check([footingId]);
    const kept = await readCheck(world.reader, { checkId: checkId as never });
    expect(replayCheck(kept)).toEqual([]);
    const first = kept.result.combinations[0] as { maxPressure_kPa: number };
    first.maxPressure_kPa *= 1 + 2 ** -52;
    expect(replayCheck(kept)).toMatchObject([{ at: "combinations.0.maxPressure_kPa" }]);
  });

  it("goes through a whole project, and calls a record broken that was altered past every rule", async () => {
    const { footingId } = await linkedPad();
    await check([footingId]);
    const replay = () =>
      client().database.transaction(async (tx) => {
        await tx.execute(sql`select set_config('app.project_id', ${world.projectId}, true)`);
        return replayProject(tx, world.projectId);
      });
    expect(await replay()).toMatchObject({ checks: 1, broken: 0, altered: 0 });
    await asSuperuser(async (db) => {
      await db.query("set session_replication_role = replica");
      await db.query("update footing_check set utilisation = utilisation * 0.9 where project_id = $1", [
        world.projectId,
      ]);
    });
    expect(await replay()).toMatchObject({ checks: 1, broken: 1, named: [{ mark: "F1" }] });
  });
});

describe("checking ten thousand footings", () => {
  it("takes at most thirty statements", { timeout: 180_000 }, async () => {
    const valueId = await openValue(world);
    await issuedRevision(world, valueId);
    await makeMany(world, 10_000, { valueId });
    const seen = await statementsOf(() => runChecks(world.structural, { all: true }));
    expect(await countOf(world, "footing_check")).toBe(10_000);
    expect(seen.length).toBeGreaterThan(5);
    expect(seen.length).toBeLessThanOrEqual(30);
  });
});
