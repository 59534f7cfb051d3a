import { beforeAll, describe, expect, it } from "vitest";
import { audit } from "@/lib/services/audit";
import { inProject } from "@/lib/services/context";
import { changeProject } from "@/lib/services/projects/change-project";
import { projectFacts } from "@/lib/services/projects/project-facts";
import { inEachProject, verifyProject } from "@/lib/services/record/audit-chain";
import { brokenIn } from "@/lib/services/record/invariants";
import { freshDatabase } from "../../support/database";
import { asSuperuser, lookInto, makeSite, type Site, stored } from "../../support/site";

let site: Site;
let neighbour: Site;
beforeAll(async () => {
  lookInto((await freshDatabase()).superuserUrl);
  site = await makeSite("C-01");
  neighbour = await makeSite("C-02");
  for (const [n, client] of [
    "Harbour board",
    "Ligne brisée\nsur deux",
    'Quotes "and" \\ signs',
    "Σ ≤ √",
    "",
  ].entries())
    await changeProject(site.lead, { client: client.replace("\n", " "), revision: n + 1 });
  await inProject(site.lead, (tx) =>
    audit(tx, site.lead, { verb: "note", subject: "a\nb", detail: { text: "two\nlines" } }),
  );
});

const verified = async () =>
  Object.fromEntries(
    await inEachProject(
      async (tx, { id, number }) =>
        [number, (await verifyProject(tx, id)).broken?.what ?? "unbroken"] as const,
    ),
  );

/** Breaks the record as somebody with every right could, looks, and puts it back. */
async function broken(break_: string, mend: string, values: unknown[]): Promise<Record<string, string>> {
  const past = async (query: string) =>
    asSuperuser(async (db) => {
      await db.query("set session_replication_role = replica");
      await db.query(query, values);
    });
  await past(break_);
  const seen = await verified();
  await past(mend);
  return seen;
}

describe("the audit chain", () => {
  it("is recomputed outside the database to the same hashes", async () => {
    expect(await verified()).toEqual({ "C-01": "unbroken", "C-02": "unbroken" });
    expect(
      (await stored("select 1 from audit_event where project_id = $1", [site.projectId])).length,
    ).toBeGreaterThanOrEqual(6);
  });

  it("stays one chain when many write at once", async () => {
    await Promise.all(
      Array.from({ length: 30 }, (_, n) =>
        inProject(neighbour.lead, (tx) => audit(tx, neighbour.lead, { verb: "note", subject: `note/${n}` })),
      ),
    );
    expect((await verified())["C-02"]).toBe("unbroken");
  });

  for (const [what, break_, mend, said] of [
    [
      "a word of an event is altered",
      "update audit_event set detail = detail || ' ' where project_id = $1 and seq = 3",
      "update audit_event set detail = rtrim(detail) where project_id = $1 and seq = 3",
      "event 3 is not what was written",
    ],
    [
      "an event is put down to somebody else",
      "update audit_event set actor_id = project_id where project_id = $1 and seq = 2",
      "update audit_event set actor_id = (select actor_id from audit_event e where e.project_id = $1 and e.seq = 3) where project_id = $1 and seq = 2",
      "event 2 is not what was written",
    ],
    [
      "a moment is moved by a microsecond",
      "update audit_event set at = at + interval '1 microsecond' where project_id = $1 and seq = 4",
      "update audit_event set at = at - interval '1 microsecond' where project_id = $1 and seq = 4",
      "event 4 is not what was written",
    ],
    [
      "an event is taken out",
      "update audit_event set seq = -2 where project_id = $1 and seq = 2",
      "update audit_event set seq = 2 where project_id = $1 and seq = -2",
      "event 2 is missing: the next one is 3",
    ],
  ] as const)
    it(`shows where ${what}, and only in that project`, async () => {
      expect(await broken(break_, mend, [site.projectId])).toEqual({ "C-01": said, "C-02": "unbroken" });
      expect(await verified()).toEqual({ "C-01": "unbroken", "C-02": "unbroken" });
    });

  it("shows an event that was rewritten together with its own hash", async () => {
    const seen = await broken(
      "update audit_event set hash = repeat('a', 64) where project_id = $1 and seq = 2",
      "update audit_event set hash = (select previous_hash from audit_event e where e.project_id = $1 and e.seq = 3) where project_id = $1 and seq = 2",
      [site.projectId],
    );
    expect(seen["C-01"]).toBe("event 2 is not what was written");
  });
});

describe("the invariants", () => {
  const findings = async () =>
    Object.fromEntries(
      await inEachProject(
        async (tx, { id, number }) =>
          [number, (await brokenIn(tx, id)).map((finding) => finding.id)] as const,
      ),
    );

  it("hold in projects made by the verbs", async () => {
    expect(await findings()).toEqual({ "C-01": [], "C-02": [] });
    expect((await projectFacts(site.lead)).client).toBe("");
  });

  it("find a gap in numbers, an unwritten change of criteria and a letter about nothing", async () => {
    await asSuperuser(async (db) => {
      await db.query("set session_replication_role = replica");
      await db.query(
        `insert into criteria select project_id, 3, sliding_factor, overturning_factor, uplift_factor, interface_angle_deg,
          adhesion_kpa, permanent_within_middle_third, transient_min_contact_ratio, accidental_min_contact_ratio,
          nearest_hole_limit_m, reason, set_by, set_at from criteria where project_id = $1`,
        [site.projectId],
      );
      await db.query(
        "insert into outbox (project_id, message_key, recipient, subject, body) values ($1, 'change/' || gen_random_uuid() || '/x', 'a@example.test', '', '')",
        [site.projectId],
      );
    });
    expect(await findings()).toEqual({ "C-01": ["I1", "I6", "I7"], "C-02": [] });
  });
});
