import { randomUUID } from "node:crypto";
import { sql } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import type { RevisionPreview } from "@/lib/contracts/changes";
import type { FootingId, ValueId } from "@/lib/contracts/ids";
import type { DraftContent } from "@/lib/contracts/values";
import { issueRevision } from "@/lib/services/revisions/issue-revision";
import { previewRevision } from "@/lib/services/revisions/preview-revision";
import { createValue } from "@/lib/services/values/create-value";
import { readCoverage } from "@/lib/services/values/read-coverage";
import { saveDraft } from "@/lib/services/values/save-draft";
import { startDraft } from "@/lib/services/values/start-draft";
import { freshDatabase } from "@/tests/support/database";
import { addPads, checkPads } from "../values/footings-in-bulk";
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
} from "../values/register-world";

let here: World;

beforeAll(async () => {
  await freshDatabase();
  here = await buildWorld("PRE-1");
});

const lowered = { reasonCode: "water", reason: "Groundwater is higher than was met in 2026" } as const;

/** Pads under 250 kPa that require 103, 153, 203, 228 (poured) and 303 kPa; the last fails already, one has no check. */
async function fivePads(): Promise<{ valueId: ValueId; pads: FootingId[]; marks: string[] }> {
  const valueId = (await createValue(here.preparer, await freshPlace(here))).id;
  await issuedRevision(here, valueId);
  const marks = ["A", "B", "C", "D", "E", "F"].map((letter) => `${letter}-${randomUUID().slice(0, 8)}`);
  const loads = [400, 600, 800, 900, 1200, 500];
  const stages = ["designed", "excavated", "designed", "poured", "designed", "designed"];
  const pads = await addPads(
    here,
    valueId,
    loads.map((vertical_kN, at) => ({ vertical_kN, mark: marks[at], stage: stages[at] })),
  );
  await checkPads(here, pads.slice(0, 5));
  return { valueId, pads, marks };
}

async function draft(valueId: ValueId, over: Partial<DraftContent>): Promise<void> {
  const { revision } = await startDraft(here.preparer, { valueId });
  await saveDraft(here.preparer, {
    valueId,
    revision,
    content: completeDraft(here, { ...lowered, ...over }),
  });
}

describe("a preview", () => {
  it("tells how many hold and fail at the draft's value, who is poured, and who fails first on the way down", async () => {
    const { valueId, marks, pads } = await fivePads();
    await draft(valueId, { given: "200 kPa" });
    const seen = await previewRevision(here.preparer, { valueId });
    expect(seen).toMatchObject({
      netAllowable_kPa: 200,
      currentNet_kPa: 250,
      how: "stored required values",
      linked: 6,
      unchecked: 1,
    });
    expect(seen.counts).toEqual({
      holds: 2,
      "now fails": 2,
      "still fails": 1,
      recovers: 0,
      "outside conditions": 0,
    });
    expect(seen).toMatchObject({ pouredAffected: 1, excavatedAffected: 0 });
    expect(seen.firstToFail).toMatchObject({ footingId: pads[3], mark: marks[3] });
    expect(seen.firstToFail?.requiredNet_kPa).toBeCloseTo(228, 9);
    expect(seen.worst.map(({ mark }) => mark)).toEqual([marks[4], marks[3], marks[2]]);
    expect(seen.worst[1]?.shortfall_kPa).toBeCloseTo(28, 9);
  });

  it("draws the number failing against the value: at 203 kPa the two that require more, at 103 kPa four", async () => {
    const { valueId } = await fivePads();
    const { curve } = await previewRevision(here.preparer, { valueId });
    const rounded = curve.map(({ netAllowable_kPa, failing }) => [Math.round(netAllowable_kPa), failing]);
    expect(rounded).toEqual([
      [303, 0],
      [228, 1],
      [203, 2],
      [153, 3],
      [103, 4],
    ]);
  });

  it("takes a pressure to try instead of the draft's", async () => {
    const { valueId } = await fivePads();
    const seen = await previewRevision(here.preparer, { valueId, netAllowable_kPa: "320" });
    expect(seen.counts).toEqual({
      holds: 4,
      recovers: 1,
      "now fails": 0,
      "still fails": 0,
      "outside conditions": 0,
    });
    for (const netAllowable_kPa of ["0", "-5", "abc", "1e9"])
      await expect(previewRevision(here.preparer, { valueId, netAllowable_kPa })).rejects.toMatchObject({
        status: 400,
      });
  });

  it("names those outside a breadth or a founding level that the draft states", async () => {
    const { valueId } = await fivePads();
    await draft(valueId, { given: "250 kPa", minBreadth_m: "2.5" });
    expect((await previewRevision(here.preparer, { valueId })).counts["outside conditions"]).toBe(5);
    const other = await fivePads();
    await draft(other.valueId, { given: "250 kPa", highestFoundingLevel_m: 9.9 });
    expect(
      (await previewRevision(here.preparer, { valueId: other.valueId })).counts["outside conditions"],
    ).toBe(5);
  });

  it("runs the checks again when the draft states another water level, and counts the difference", async () => {
    const { valueId } = await fivePads();
    // Water 0.5 m above founding level: uplift lowers the demand, and so does the overburden: N/4 + 3 stays N/4 + 3.
    await draft(valueId, { given: "200 kPa", groundwaterLevel_m: 10.5 });
    const seen = await previewRevision(here.preparer, { valueId });
    expect(seen.how).toBe("checks run again");
    expect(seen.counts).toMatchObject({ "now fails": 2, "still fails": 1, holds: 3 });
  });

  it.each([120, 200, 250, 320])(
    "comes to what issuing %d kPa then does, footing by footing counted",
    async (kPa) => {
      const { valueId } = await fivePads();
      const forecast = await previewRevision(here.preparer, { valueId, netAllowable_kPa: kPa });
      const { revisionId, revision } = await checkedRevision(here, valueId, { ...lowered, given: kPa });
      const { counts } = await issueRevision(here.issuer, { valueId, revisionId, revision });
      // The one without a check is counted when it is issued and cannot be foretold from a stored required value.
      const all = (given: RevisionPreview["counts"]) =>
        Object.values(given).reduce((sum, count) => sum + count, 0);
      expect(all(counts)).toBe(all(forecast.counts) + forecast.unchecked);
      expect(counts["now fails"] - forecast.counts["now fails"]).toBe(kPa < 128 ? 1 : 0);
      expect(counts["still fails"]).toBe(forecast.counts["still fails"]);
      expect(counts.recovers).toBe(forecast.counts.recovers);
    },
  );

  it("writes nothing", async () => {
    const { valueId } = await fivePads();
    await draft(valueId, { given: "200 kPa", soilUnitWeight_kNm3: 20 });
    const tables = ["audit_event", "change", "consequence", "footing_check", "bearing_value_revision"];
    const before = await Promise.all(tables.map((table) => countOf(here, table)));
    await previewRevision(here.preparer, { valueId });
    expect(await Promise.all(tables.map((table) => countOf(here, table)))).toEqual(before);
  });

  it("works before a first value is issued and for an empty draft, and finds nothing of a neighbour", async () => {
    const valueId = (await createValue(here.preparer, await freshPlace(here))).id;
    await startDraft(here.preparer, { valueId });
    expect(await previewRevision(here.reader, { valueId })).toMatchObject({
      netAllowable_kPa: null,
      linked: 0,
      curve: [],
    });
    const neighbour = await buildWorld(`PRE-${randomUUID().slice(0, 6)}`);
    await expect(previewRevision(neighbour.preparer, { valueId })).rejects.toMatchObject({ status: 404 });
  });
});

describe("the coverage report", () => {
  it("names footings without a value, values without a footing, zones without a hole and units without a value", async () => {
    const world = await buildWorld(`COV-${randomUUID().slice(0, 6)}`);
    const empty = await readCoverage(world.reader);
    expect(empty).toMatchObject({
      zonesWithoutHole: { total: 1, first: [{ name: "Zone B" }] },
      unitsWithoutValue: { total: 1, first: [{ code: "2" }] },
      valuesWithoutFooting: { total: 0 },
    });
    const valueId = await openValue(world);
    await issuedRevision(world, valueId, {
      basis: "assumed",
      confirmBy: "2027-01-31",
      confirmWho: "Ines Halloran",
      sources: [],
    });
    expect(await readCoverage(world.reader)).toMatchObject({
      unitsWithoutValue: { total: 0, first: [] },
      valuesWithoutFooting: { total: 1, first: [{ id: valueId, reference: "BV-01" }] },
    });
    await addPads(world, valueId, [{ vertical_kN: 400, mark: "F1" }]);
    await addPads(world, null, [{ vertical_kN: 400, mark: "F2" }]);
    await inside(world, async (tx) => {
      const [hole, revision] = [randomUUID(), randomUUID()];
      await tx.execute(
        sql`insert into hole (project_id, id, name, current_revision_id) values (${world.projectId}, ${hole}, 'BH1', ${revision})`,
      );
      await tx.execute(sql`insert into hole_revision (project_id, id, hole_id, number, kind, easting_m, northing_m, recorded_by)
        values (${world.projectId}, ${revision}, ${hole}, 1, 'CP', 250, 250, ${world.preparer.person.id})`);
    });
    expect(await readCoverage(world.reader)).toMatchObject({
      footingsWithoutValue: { total: 1, first: [{ mark: "F2" }] },
      footingsOnUnconfirmed: { total: 1, first: [{ mark: "F1" }] },
      valuesWithoutFooting: { total: 0 },
      zonesWithoutHole: { total: 0 },
    });
  });
});
