import { randomUUID } from "node:crypto";
import { sql } from "drizzle-orm";
import { beforeAll, beforeEach, describe, expect, it } from "vitest";
import type { FootingId, GroundUnitId, ValueId, ZoneId } from "@/lib/contracts/ids";
import { readFooting } from "@/lib/services/footings/read-footing";
import { chooseLink } from "@/lib/services/links/choose-link";
import { confirmLinks } from "@/lib/services/links/confirm-links";
import { suggestLinks } from "@/lib/services/links/suggest-links";
import { createValue } from "@/lib/services/values/create-value";
import { freshDatabase } from "../../support/database";
import { auditVerbs, lookInto, refusalOf } from "../../support/site";
import { buildWorld, countOf, inside, issuedRevision, openValue, type World } from "../values/register-world";
import { makeMany, makePad, statementsOf } from "./schedule";

const box = (west: number, south: number, east: number, north: number): [number, number][] => [
  [west, south],
  [east, south],
  [east, north],
  [west, north],
];

let world: World;
let neighbour: World;
beforeAll(async () => {
  lookInto((await freshDatabase()).superuserUrl);
});
beforeEach(async () => {
  world = await buildWorld(`W-${randomUUID().slice(0, 8)}`);
  neighbour = await buildWorld(`N-${randomUUID().slice(0, 8)}`);
});

const suggest = async (footingIds: FootingId[]) =>
  (await suggestLinks(world.reader, { footingIds })).suggestions;

/** Another zone of the world, east of 500, with a value of the same unit or of one of its own. */
async function zoneBeside(
  name: string,
  ring_m: [number, number][],
  given: string,
  unit: GroundUnitId = world.groundUnitId,
) {
  const [zoneId, drawn] = [randomUUID() as ZoneId, randomUUID()];
  await inside(world, async (tx) => {
    await tx.execute(
      sql`insert into zone (project_id, id, name, current_revision_id) values (${world.projectId}, ${zoneId}, ${name}, ${drawn})`,
    );
    await tx.execute(sql`insert into zone_revision (project_id, id, zone_id, number, ring_m, drawn_by)
      values (${world.projectId}, ${drawn}, ${zoneId}, 1, ${JSON.stringify(ring_m)}::jsonb, ${world.preparer.person.id})`);
    await tx.execute(
      sql`insert into zone_ground_unit (project_id, zone_id, ground_unit_id) values (${world.projectId}, ${zoneId}, ${unit})`,
    );
  });
  const { id } = await createValue(world.preparer, { zoneId, groundUnitId: unit });
  await issuedRevision(world, id, { given });
  return { zoneId, valueId: id };
}

async function anotherUnit(code: string, name: string): Promise<GroundUnitId> {
  const id = randomUUID() as GroundUnitId;
  await inside(world, (tx) =>
    tx.execute(
      sql`insert into ground_unit (project_id, id, code, name, soil) values (${world.projectId}, ${id}, ${code}, ${name}, 'clay')`,
    ),
  );
  return id;
}

describe("the value proposed for a footing", () => {
  it("is that of the zone its whole footprint lies in", async () => {
    const valueId = await openValue(world);
    await issuedRevision(world, valueId);
    const id = await makePad(world, "F1");
    const [suggestion] = await suggest([id]);
    expect(suggestion).toMatchObject({ mark: "F1", valueId, straddles: false, linkedTo: null });
    expect(suggestion?.sentence).toContain("whole footprint lies in Zone B");
    expect(suggestion?.candidates).toMatchObject([{ valueId, share: 1, netAllowable_kPa: 250 }]);
  });

  it("is the lower of two where it straddles, and says so with both parts", async () => {
    const upper = await openValue(world);
    await issuedRevision(world, upper, { given: "250 kPa" });
    const { valueId: lower } = await zoneBeside("Zone C", box(500, 0, 900, 500), "180 kPa");
    const straddling = await makePad(world, "F1", { easting_m: 499.5 });
    const touching = await makePad(world, "F2", { easting_m: 499 });
    const [first, second] = await suggest([straddling, touching]);
    expect(first).toMatchObject({ valueId: lower, straddles: true });
    expect(first?.sentence).toMatch(/Zone B \(75 %\) and Zone C \(25 %\).*lower value.*180 kPa/);
    expect(second).toMatchObject({ valueId: upper, straddles: false });
  });

  it("is none outside all zones, none half outside, and none where no revision is in force", async () => {
    const valueId = await openValue(world);
    const ids = [
      await makePad(world, "F1", { easting_m: 900 }),
      await makePad(world, "F2", { northing_m: 0 }),
      await makePad(world, "F3"),
    ];
    const unissued = await suggest(ids);
    expect(unissued.map((each) => each.valueId)).toEqual([null, null, null]);
    await issuedRevision(world, valueId);
    const issued = await suggest(ids);
    expect(issued.map((each) => each.valueId)).toEqual([null, null, valueId]);
    expect(issued[0]?.sentence).toBe("The footing lies in no zone.");
    expect(issued[1]?.sentence).toContain("50 % of it is in no zone");
  });

  it("is left to the engineer between two ground units, unless the founding level fits only one", async () => {
    const gravel = await openValue(world);
    await issuedRevision(world, gravel, { lowestFoundingLevel_m: 9.5 });
    const unit = await anotherUnit("3", "Stiff clay");
    await zoneBeside("Zone D", box(0, 0, 500, 500), "150 kPa", unit);
    const [above, below] = await suggest([
      await makePad(world, "F1", { foundingLevel_m: 10 }),
      await makePad(world, "F2", { foundingLevel_m: 9 }),
    ]);
    expect(above?.valueId).toBeNull();
    expect(above?.sentence).toContain("choose the ground unit at founding level");
    expect(above?.candidates).toHaveLength(2);
    expect(below?.sentence).toContain("Stiff clay");
  });
});

describe("linking", () => {
  it("confirms what was proposed, keeps how and why, and is one line in the audit trail", async () => {
    const valueId = await openValue(world);
    await issuedRevision(world, valueId);
    const [one, two] = [await makePad(world, "F1"), await makePad(world, "F2")];
    const before = (await auditVerbs(world.projectId)).length;
    const answer = await confirmLinks(world.structural, {
      links: [
        { footingId: one, valueId },
        { footingId: two, valueId },
      ],
    });
    expect(answer).toEqual({ linked: 2, unchanged: 0 });
    const footing = await readFooting(world.reader, { footingId: one });
    expect(footing.value).toMatchObject({ id: valueId, current: { netAllowable_kPa: 250 } });
    expect(footing.links).toMatchObject([{ number: 1, how: "from-zone", linkedBy: "Sara Brandt" }]);
    expect((await auditVerbs(world.projectId)).slice(before)).toEqual(["footing:link"]);
    expect(await confirmLinks(world.structural, { links: [{ footingId: one, valueId }] })).toEqual({
      linked: 0,
      unchanged: 1,
    });
  });

  it("refuses a proposal that no longer follows from the zones, and links none of the rest", async () => {
    const valueId = await openValue(world);
    await issuedRevision(world, valueId);
    const [inZone, outside] = [await makePad(world, "F1"), await makePad(world, "F2", { easting_m: 900 })];
    const refused = confirmLinks(world.structural, {
      links: [
        { footingId: inZone, valueId },
        { footingId: outside, valueId },
      ],
    });
    await expect(refused).rejects.toThrow("F2");
    expect(await countOf(world, "footing_link")).toBe(0);
  });

  it("takes a chosen value with its reason, takes it away again, and keeps both", async () => {
    const valueId = await openValue(world);
    const id = await makePad(world, "F1", { easting_m: 900 });
    expect(
      (await refusalOf(chooseLink(world.structural, { footingIds: [id], valueId, reason: "why" }))).fields,
    ).toHaveProperty("reason");
    await chooseLink(world.structural, {
      footingIds: [id],
      valueId,
      reason: "Trial pit TP4 shows the same gravel",
    });
    await chooseLink(world.structural, {
      footingIds: [id],
      valueId: null,
      reason: "TP4 was beside another footing",
    });
    const { links, value } = await readFooting(world.reader, { footingId: id });
    expect(value).toBeNull();
    expect(links.map(({ how }) => how)).toEqual(["removed", "chosen"]);
  });

  it("knows no footing and no value of another project, and no other role", async () => {
    const foreignValue = await openValue(neighbour);
    const foreign = await makePad(neighbour, "F1");
    const id = await makePad(world, "F1");
    const why = "Trial pit TP4 shows the same gravel";
    expect(
      (
        await refusalOf(
          chooseLink(world.structural, { footingIds: [id], valueId: foreignValue, reason: why }),
        )
      ).fields,
    ).toHaveProperty("valueId");
    expect(
      (
        await refusalOf(
          chooseLink(world.structural, { footingIds: [id, foreign], valueId: null, reason: why }),
        )
      ).status,
    ).toBe(404);
    expect(await suggest([foreign])).toEqual([]);
    for (const who of [world.preparer, world.lead, world.reader]) {
      expect((await refusalOf(chooseLink(who, { footingIds: [id], valueId: null, reason: why }))).code).toBe(
        "forbidden",
      );
      expect(
        (await refusalOf(confirmLinks(who, { links: [{ footingId: id, valueId: randomUUID() as ValueId }] })))
          .code,
      ).toBe("forbidden");
    }
    expect((await readFooting(neighbour.reader, { footingId: foreign })).links).toEqual([]);
  });

  it("takes ten thousand footings in at most thirty statements", async () => {
    const valueId = await openValue(world);
    await issuedRevision(world, valueId);
    await makeMany(world, 10_000, { combinations: 1 });
    const rows = await inside(world, (tx) => tx.execute<{ id: FootingId }>(sql`select id from footing`));
    const footingIds = rows.rows.map(({ id }) => id);
    const proposed = await suggest(footingIds);
    const links = proposed.flatMap(({ footingId, valueId }) => (valueId ? [{ footingId, valueId }] : []));
    expect(links).toHaveLength(10_000);
    const seen = await statementsOf(() => confirmLinks(world.structural, { links }));
    expect(seen.length).toBeLessThanOrEqual(30);
    expect(await countOf(world, "footing_link")).toBe(10_000);
  });
});
