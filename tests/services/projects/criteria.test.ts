import { beforeAll, describe, expect, it } from "vitest";
import { changeCriteria } from "@/lib/services/projects/change-criteria";
import { listCriteria, projectFacts } from "@/lib/services/projects/project-facts";
import { freshDatabase } from "../../support/database";
import {
  auditVerbs,
  lookInto,
  makeSite,
  projectInput,
  refusalOf,
  type Site,
  stored,
} from "../../support/site";

let site: Site;
let neighbour: Site;
beforeAll(async () => {
  lookInto((await freshDatabase()).superuserUrl);
  site = await makeSite("K-01");
  neighbour = await makeSite("K-02");
});

const fields = (over: Record<string, unknown> = {}) => ({
  ...projectInput("", "").criteria,
  reason: "The code that governs asks for more against sliding",
  ...over,
});

describe("the criteria of a project", () => {
  it("come into force under the next number, and the earlier ones stay as they were", async () => {
    const [first] = (await listCriteria(site.reader)).criteria;
    const facts = await changeCriteria(site.lead, fields({ slidingFactor: 1.75, revision: 1 }));
    expect([facts.currentCriteria, facts.revision, facts.criteria.slidingFactor]).toEqual([2, 2, 1.75]);
    const { criteria } = await listCriteria(site.reader);
    expect(criteria.map(({ number }) => number)).toEqual([2, 1]);
    expect(criteria[1]).toEqual(first);
    expect((await projectFacts(neighbour.lead)).currentCriteria).toBe(1);
    const [event] = await stored<{ verb: string; subject: string; detail: string }>(
      "select verb, subject, detail from audit_event where project_id = $1 order by seq desc limit 1",
      [site.projectId],
    );
    expect([event?.verb, event?.subject, JSON.parse(event?.detail ?? "")]).toEqual([
      "criteria:change",
      "criteria/2",
      {
        before: { slidingFactor: 1.5 },
        after: { slidingFactor: 1.75 },
        reason: "The code that governs asks for more against sliding",
      },
    ]);
    expect(await auditVerbs(site.projectId)).toEqual(["project:create", "criteria:change"]);
  });

  it("are not changed without a reason, without a difference, or against an older revision", async () => {
    expect(
      (await refusalOf(changeCriteria(site.lead, fields({ revision: 2, reason: "  " })))).fields,
    ).toHaveProperty("reason");
    const same = fields({ slidingFactor: 1.75, revision: 2 });
    expect((await refusalOf(changeCriteria(site.lead, same))).status).toBe(400);
    expect((await refusalOf(changeCriteria(site.lead, fields({ revision: 1 })))).status).toBe(412);
    expect((await refusalOf(changeCriteria(site.lead, fields()))).status).toBe(428);
  });

  it("are figures within what is possible", async () => {
    for (const over of [
      { slidingFactor: 0.9 },
      { slidingFactor: Number.NaN },
      { overturningFactor: Number.POSITIVE_INFINITY },
      { interfaceAngle_deg: -1 },
      { interfaceAngle_deg: 51 },
      { interfaceAngle_deg: null },
      { adhesion_kPa: "10" },
      { transientMinContactRatio: 1.01 },
      { accidentalMinContactRatio: 0 },
      { permanentWithinMiddleThird: "yes" },
      { netAllowable_kPa: 300 },
    ])
      expect(
        Object.keys((await refusalOf(changeCriteria(site.lead, fields({ ...over, revision: 2 })))).fields),
      ).toEqual(Object.keys(over));
  });

  it("are the lead's to change, and nobody else's", async () => {
    for (const context of [site.geotechnical, site.structural, site.reader])
      expect((await refusalOf(changeCriteria(context, fields({ revision: 2 })))).status).toBe(403);
  });

  it("take one of two changes made at once", async () => {
    const outcomes = await Promise.allSettled(
      [1.8, 1.9].map((slidingFactor) => changeCriteria(site.lead, fields({ slidingFactor, revision: 2 }))),
    );
    expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    expect((await listCriteria(site.lead)).criteria.map(({ number }) => number)).toEqual([3, 2, 1]);
  });
});
