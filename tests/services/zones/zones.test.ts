import { randomUUID } from "node:crypto";
import { sql } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { signedArea_m2 } from "@/lib/geometry/polygon";
import { createUnit } from "@/lib/services/units/create-unit";
import { changeZone } from "@/lib/services/zones/change-zone";
import { createZone } from "@/lib/services/zones/create-zone";
import { listZones } from "@/lib/services/zones/list-zones";
import { freshDatabase } from "@/tests/support/database";
import { addPads, checkPads } from "../values/footings-in-bulk";
import { buildWorld, countOf, inside, issuedRevision, openValue, type World } from "../values/register-world";

let world: World;
let neighbour: World;
let clay: string;

beforeAll(async () => {
  await freshDatabase();
  world = await buildWorld("ZONES");
  neighbour = await buildWorld("ZONES-2");
  clay = (await createUnit(world.preparer, { code: "4", name: "Stiff clay", soil: "clay" })).id;
});

const square = (x: number, y: number, side = 10): [number, number][] => [
  [x, y],
  [x + side, y],
  [x + side, y + side],
  [x, y + side],
];
const zone = (over: Record<string, unknown> = {}) => ({
  name: `Z ${randomUUID().slice(0, 8)}`,
  groundUnitIds: [clay],
  ring_m: square(1000, 0),
  boundary: "interpolated",
  ...over,
});

describe("a zone that is drawn", () => {
  it("is kept anticlockwise with its units, and written down once", async () => {
    const before = await countOf(world, "audit_event");
    const made = await createZone(world.preparer, zone({ ring_m: square(1000, 0).reverse() }));
    expect(await countOf(world, "audit_event")).toBe(before + 1);
    const kept = (await listZones(world.reader)).zones.find(({ id }) => id === made.id);
    expect(kept?.groundUnitIds).toEqual([clay]);
    expect(signedArea_m2(kept?.ring_m ?? [])).toBeCloseTo(100, 9);
  });

  it("may not cross itself; the sentence says where", async () => {
    const bow: [number, number][] = [
      [2000, 0],
      [2010, 10],
      [2010, 0],
      [2000, 10],
    ];
    await expect(createZone(world.preparer, zone({ ring_m: bow }))).rejects.toMatchObject({
      fields: { ring_m: expect.stringContaining("2005.00 E, 5.00 N") },
    });
  });

  it("may not overlap another zone of the same unit, but may share an edge with it or lie over another unit's", async () => {
    await createZone(world.preparer, zone({ name: "First", ring_m: square(3000, 0) }));
    await expect(createZone(world.preparer, zone({ ring_m: square(3005, 5) }))).rejects.toMatchObject({
      fields: { ring_m: expect.stringContaining("First") },
    });
    await createZone(world.preparer, zone({ name: "Beside", ring_m: square(3010, 0) }));
    await createZone(
      world.preparer,
      zone({ name: "Over", groundUnitIds: [world.groundUnitId], ring_m: square(3005, 5) }),
    );
  });

  it.each([
    [
      "two corners",
      [
        [0, 0],
        [1, 1],
      ],
    ],
    [
      "a corner that is no number",
      [
        [0, 0],
        [1, Number.NaN],
        [2, 2],
      ],
    ],
    [
      "no area",
      [
        [4000, 0],
        [4001, 1],
        [4002, 2],
      ],
    ],
  ])("with %s is refused at its boundary", async (_name, ring_m) => {
    await expect(createZone(world.preparer, zone({ ring_m }))).rejects.toMatchObject({ status: 400 });
  });

  it("is drawn by a geotechnical engineer of the project and by nobody else", async () => {
    for (const context of [world.structural, world.lead, world.reader])
      await expect(createZone(context, zone({ ring_m: square(5000, 0) }))).rejects.toMatchObject({
        status: 403,
      });
    expect((await listZones(neighbour.reader)).zones.map(({ name }) => name)).toEqual(["Zone B"]);
  });
});

describe("a zone that is redrawn", () => {
  it("affects the checks that rest on it, and leaves the others alone", async () => {
    const made = await createZone(world.preparer, zone({ ring_m: square(6000, 0, 100) }));
    const other = await createZone(world.preparer, zone({ ring_m: square(7000, 0, 100) }));
    const place = { ...world, groundUnitId: clay as never };
    const here = await openValue({ ...place, zoneId: made.id });
    const there = await openValue({ ...place, zoneId: other.id });
    await issuedRevision(world, here);
    await issuedRevision(world, there);
    const [pad] = await addPads(world, here, [{ vertical_kN: 500, mark: "HERE" }]);
    const [left] = await addPads(world, there, [{ vertical_kN: 500, mark: "THERE" }]);
    await checkPads(world, [pad, left] as never);

    await changeZone(world.preparer, {
      zoneId: made.id,
      revision: 1,
      ring_m: square(6000, 0, 90),
      reason: "BH21 shows the edge nearer.",
    });
    const standing = await inside(world, (tx) =>
      tx.execute<{ footing_id: string; standing: string; reasons: string[] }>(
        sql`select footing_id, standing, reasons from check_standing`,
      ),
    );
    const of = new Map(standing.rows.map((row) => [row.footing_id, row]));
    expect(of.get(pad as string)).toMatchObject({ standing: "affected", reasons: ["zone boundary moved"] });
    expect(of.get(left as string)).toMatchObject({ standing: "current", reasons: [] });
    const changes = await inside(world, (tx) =>
      tx.execute(sql`select 1 from change where kind = 'zone-redrawn'`),
    );
    expect(changes.rowCount).toBe(1);
  });

  it("is refused to a writer who saw an older one; both are in the answer", async () => {
    const made = await createZone(world.preparer, zone({ ring_m: square(8000, 0) }));
    await changeZone(world.preparer, { zoneId: made.id, revision: 1, name: "Renamed" });
    await expect(
      changeZone(world.checker, { zoneId: made.id, revision: 1, name: "Lost" }),
    ).rejects.toMatchObject({ status: 412, extra: { seen: 1, currentRevision: 2 } });
  });

  it("of another project is not found", async () => {
    const made = await createZone(world.preparer, zone({ ring_m: square(9000, 0) }));
    await expect(
      changeZone(neighbour.preparer, { zoneId: made.id, revision: 1, name: "Theirs" }),
    ).rejects.toMatchObject({ status: 404 });
  });
});
