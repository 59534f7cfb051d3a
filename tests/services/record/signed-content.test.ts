import { beforeAll, describe, expect, it } from "vitest";
import type { ProjectId } from "@/lib/contracts/ids";
import { inEachProject } from "@/lib/services/record/audit-chain";
import { alteredRevisions } from "@/lib/services/record/signed-content";
import { freshDatabase } from "../../support/database";
import { asSuperuser, lookInto } from "../../support/site";
import { buildWorld, checkedRevision, openValue, type World } from "../values/register-world";

let world: World;
let revisionId: string;
beforeAll(async () => {
  lookInto((await freshDatabase()).superuserUrl);
  world = await buildWorld("S-01");
  const valueId = await openValue(world);
  ({ revisionId } = await checkedRevision(world, valueId, {
    conditions: "Not below the water table",
    minBreadth_m: 0.6,
  }));
});

const altered = async () =>
  (await inEachProject(async (tx, { id }: { id: ProjectId }) => alteredRevisions(tx, id))).flat();
const past = (query: string) =>
  asSuperuser(async (db) => {
    await db.query("set session_replication_role = replica");
    await db.query(query, [revisionId]);
  });

describe("what two people signed", () => {
  it("is found again in the stored fields and sources, digit for digit", async () => {
    expect(await altered()).toEqual([]);
  });

  for (const [what, change, back] of [
    [
      "the pressure",
      "update bearing_value_revision set net_allowable_kpa = net_allowable_kpa + 1e-9 where id = $1",
      "update bearing_value_revision set net_allowable_kpa = 250 where id = $1",
    ],
    [
      "a condition",
      "update bearing_value_revision set min_breadth_m = null where id = $1",
      "update bearing_value_revision set min_breadth_m = 0.6 where id = $1",
    ],
    [
      "the page of a source",
      "update value_source set page = 35 where value_revision_id = $1",
      "update value_source set page = 34 where value_revision_id = $1",
    ],
    [
      "the reason",
      "update bearing_value_revision set reason = 'Another' where id = $1",
      "update bearing_value_revision set reason = 'First value from the investigation report' where id = $1",
    ],
  ] as const)
    it(`is missed when ${what} was altered past every rule`, async () => {
      await past(change);
      expect(await altered()).toEqual([revisionId]);
      await past(back);
      expect(await altered()).toEqual([]);
    });
});
