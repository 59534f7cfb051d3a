import { beforeAll, describe, expect, it } from "vitest";
import { runChecks } from "@/lib/services/checks/run-checks";
import { brokenIn } from "@/lib/services/record/invariants";
import { issueRevision } from "@/lib/services/revisions/issue-revision";
import { withdrawRevision } from "@/lib/services/revisions/withdraw-revision";
import { freshDatabase } from "@/tests/support/database";
import { addPads } from "../values/footings-in-bulk";
import {
  buildWorld,
  checkedRevision,
  freshPlace,
  inside,
  issuedRevision,
  openValue,
  type World,
} from "../values/register-world";

const ROUNDS = 40;
let here: World;

beforeAll(async () => {
  await freshDatabase();
  here = await buildWorld("MIX-1");
});

describe("issuing while footings are checked", () => {
  it(`leaves the register true after ${ROUNDS} rounds of two issuers and three checkers at the same moment`, async () => {
    const valueId = await openValue(here);
    await issuedRevision(here, valueId);
    const pads = await addPads(
      here,
      valueId,
      [400, 700, 800, 900, 1200].map((vertical_kN, at) => ({ vertical_kN, mark: `M${at}` })),
    );
    await runChecks(here.structural, { footingIds: pads });
    for (let round = 0; round < ROUNDS; round += 1) {
      const { revisionId, revision } = await checkedRevision(here, valueId, {
        given: round % 2 === 0 ? "200 kPa" : "250 kPa",
        reasonCode: "water",
        reason: "Groundwater read again at the standpipe",
      });
      const acts = await Promise.allSettled([
        issueRevision(here.issuer, { valueId, revisionId, revision }),
        runChecks(here.structural, { footingIds: pads }),
        issueRevision(here.lead, { valueId, revisionId, revision }),
        runChecks(here.structural, { all: true }),
        runChecks(here.structural, { footingIds: pads.slice(0, 2) }),
      ]);
      const issues = [acts[0], acts[2]].filter(({ status }) => status === "fulfilled");
      expect(issues).toHaveLength(1);
      for (const at of [1, 3, 4]) expect(acts[at]).toMatchObject({ status: "fulfilled" });
    }
    expect(await inside(here, (tx) => brokenIn(tx, here.projectId))).toEqual([]);
  });

  it("and after a withdrawal no check is made against the value", async () => {
    const valueId = await openValue(await inPlace());
    const { revisionId, revision } = await issuedRevision(here, valueId);
    const pads = await addPads(here, valueId, [{ vertical_kN: 400, mark: "W1" }]);
    await withdrawRevision(here.lead, {
      valueId,
      revisionId,
      revision,
      reason: "Called back by the author of the report",
    });
    expect(await runChecks(here.structural, { footingIds: pads })).toMatchObject({
      checked: 0,
      notCheckedCount: 1,
    });
    expect(await inside(here, (tx) => brokenIn(tx, here.projectId))).toEqual([]);
  });
});

/** The same project with another zone, so that a second value can be opened in it. */
async function inPlace(): Promise<World> {
  return { ...here, ...(await freshPlace(here)) };
}
