import { randomUUID } from "node:crypto";
import { sql } from "drizzle-orm";
import pg from "pg";
import { beforeAll, describe, expect, it } from "vitest";
import { client } from "@/db/client";
import type { FootingId, ValueId } from "@/lib/contracts/ids";
import { readChange } from "@/lib/services/changes/read-change";
import { throughDoor } from "@/lib/services/context";
import { plantFault } from "@/lib/services/faults";
import { issueRevision } from "@/lib/services/revisions/issue-revision";
import { createValue } from "@/lib/services/values/create-value";
import { readValue } from "@/lib/services/values/read-value";
import { freshDatabase } from "@/tests/support/database";
import { addPads, checkPads } from "../values/footings-in-bulk";
import {
  buildWorld,
  checkedRevision,
  countOf,
  freshPlace,
  inside,
  issuedRevision,
  openValue,
  type World,
} from "../values/register-world";

let here: World;
let neighbour: World;

beforeAll(async () => {
  await freshDatabase();
  here = await buildWorld("ISS-1");
  neighbour = await buildWorld("ISS-2");
  const theirs = await openValue(neighbour);
  await issuedRevision(neighbour, theirs);
  await checkPads(neighbour, await addPads(neighbour, theirs, [{ vertical_kN: 400 }]));
});

const freshValue = async (): Promise<ValueId> =>
  (await createValue(here.preparer, await freshPlace(here))).id;
const lowered = {
  given: "200 kPa",
  reasonCode: "water",
  reason: "Groundwater is higher than was met in 2026",
} as const;
const marksOf = (name: string) => `${name}-${randomUUID().slice(0, 8)}`;

/** A value at 250 kPa with pads that need 203 (holds at 250, not at 200), 103 (holds at both) and 303 kPa (fails at both). */
async function threePads() {
  const valueId = await freshValue();
  await issuedRevision(here, valueId);
  const marks = { falls: marksOf("A"), stays: marksOf("B"), failed: marksOf("C") };
  const pads = await addPads(here, valueId, [
    { vertical_kN: 800, mark: marks.falls },
    { vertical_kN: 400, mark: marks.stays, stage: "poured" },
    { vertical_kN: 1200, mark: marks.failed },
  ]);
  await checkPads(here, pads);
  return { valueId, marks, pads };
}

const standings = (ids: FootingId[]) =>
  inside(here, (tx) =>
    tx.execute<{ footing_id: FootingId; standing: string; reasons: string[] }>(sql`
      select footing_id, standing, reasons from check_standing where footing_id = any(${sql.param(ids)}::uuid[])`),
  ).then(({ rows }) => rows);

const letters = (changeId: string) =>
  throughDoor("relay", (tx) =>
    tx.execute<{ recipient: string; body: string }>(
      sql`select recipient, body from outbox where message_key like ${`change/${changeId}/%`} order by recipient`,
    ),
  ).then(({ rows }) => rows);

describe("issuing a revision", () => {
  it("tells what the lower value did to each linked footing, and their checks are affected from then on", async () => {
    const { valueId, marks, pads } = await threePads();
    const { changeId, counts, code } = await issuedRevision(here, valueId, lowered);
    expect(code).toBe("P02");
    expect(counts).toEqual({
      "now fails": 1,
      "still fails": 1,
      "outside conditions": 0,
      recovers: 0,
      holds: 1,
    });

    const { change, items } = await readChange(here.lead, { changeId });
    expect(change).toMatchObject({ total: 3, open: 3, answered: 0, openPoured: 1, reason: lowered.reason });
    expect(change.title).toContain("P01 → P02, 250 → 200 kPa net");
    expect(items.map(({ mark, outcome }) => [mark, outcome])).toEqual([
      [marks.falls, "now fails"],
      [marks.failed, "still fails"],
      [marks.stays, "holds"],
    ]);
    // N/4 + 3 kPa over 250 and over 200, worked by hand for 2 m pads.
    expect(items[0]?.utilisationBefore).toBeCloseTo(203 / 250, 9);
    expect(items[0]?.utilisationAfter).toBeCloseTo(203 / 200, 9);
    expect(items[0]?.requiredNet_kPa).toBeCloseTo(203, 9);
    for (const { standing, reasons } of await standings(pads)) {
      expect(standing).toBe("affected");
      expect(reasons).toEqual(["bearing value revised P01 → P02"]);
    }
  });

  it("lets a footing recover when the value rises, and names those outside new conditions", async () => {
    const { valueId } = await threePads();
    const raised = await issuedRevision(here, valueId, { ...lowered, given: "320 kPa" });
    expect(raised.counts).toMatchObject({ recovers: 1, holds: 2 });
    const wider = await issuedRevision(here, valueId, { ...lowered, minBreadth_m: 2.5 });
    expect(wider.counts).toMatchObject({ "outside conditions": 3 });
  });

  it("leaves alone the footings, checks and value of others, and the neighbour's project", async () => {
    const other = await threePads();
    const before = await countOf(neighbour, "consequence");
    const { valueId } = await threePads();
    const { changeId } = await issuedRevision(here, valueId, lowered);
    expect((await readChange(here.lead, { changeId })).items.map(({ footingId }) => footingId)).not.toEqual(
      expect.arrayContaining([other.pads[0]]),
    );
    for (const { standing } of await standings(other.pads)) expect(standing).toBe("current");
    expect((await readValue(here.reader, { valueId: other.valueId })).revisions).toHaveLength(1);
    expect(await countOf(neighbour, "consequence")).toBe(before);
    await expect(readChange(neighbour.lead, { changeId })).rejects.toMatchObject({ status: 404 });
  });

  it("works for a first value without any footing, and for linked footings that have no check yet", async () => {
    const bare = await issuedRevision(here, await freshValue());
    expect(Object.values(bare.counts)).toEqual([0, 0, 0, 0, 0]);
    const valueId = await freshValue();
    await addPads(here, valueId, [{ vertical_kN: 400, mark: marksOf("N") }]);
    const { counts, changeId } = await issuedRevision(here, valueId);
    expect(counts).toMatchObject({ holds: 1 });
    expect((await readChange(here.lead, { changeId })).items[0]).toMatchObject({
      verdictBefore: null,
      utilisationBefore: null,
    });
  });

  it("writes one audit row, and one letter each to the owner and the project lead", async () => {
    const { valueId } = await threePads();
    const { revisionId, revision } = await checkedRevision(here, valueId, lowered);
    const before = await countOf(here, "audit_event");
    const { changeId } = await issueRevision(here.issuer, { valueId, revisionId, revision });
    expect(await countOf(here, "audit_event")).toBe(before + 1);
    const sent = await letters(changeId);
    expect(sent.map(({ recipient }) => recipient)).toEqual([
      here.lead.person.email,
      here.structural.person.email,
    ]);
    expect(sent[0]?.body).toContain("All footings of the project: 1 now fails, 1 still fails, 1 holds.");
    expect(sent[1]?.body).toContain("Your footings: 1 now fails, 1 still fails, 1 holds.");
  });
});

describe("who may issue", () => {
  it("is neither the preparer nor the checker", async () => {
    const valueId = await freshValue();
    const { revisionId, revision } = await checkedRevision(here, valueId);
    for (const person of [here.preparer, here.checker])
      await expect(issueRevision(person, { valueId, revisionId, revision })).rejects.toMatchObject({
        status: 403,
      });
    await expect(issueRevision(here.lead, { valueId, revisionId, revision })).resolves.toMatchObject({
      code: "P01",
    });
  });

  it.each(["structural", "reader"] as const)("is not the %s", async (role) => {
    const valueId = await freshValue();
    const { revisionId, revision } = await checkedRevision(here, valueId);
    await expect(issueRevision(here[role], { valueId, revisionId, revision })).rejects.toMatchObject({
      status: 403,
    });
  });

  it("is held by the database too: an issue signed by preparer or checker breaks a constraint", async () => {
    const valueId = await freshValue();
    const { revisionId } = await checkedRevision(here, valueId);
    for (const signer of ["prepared_by", "checked_by"])
      await expect(
        inside(here, (tx) =>
          tx.execute(sql`insert into revision_issue (project_id, value_revision_id, value_id, prepared_by, checked_by, issued_by)
            select project_id, id, value_id, prepared_by, checked_by, ${sql.identifier(signer)}
            from bearing_value_revision where id = ${revisionId}`),
        ),
      ).rejects.toMatchObject({ cause: { constraint: "issued_by_a_third" } });
  });

  it("cannot be got round by naming another preparer than the revision's", async () => {
    const valueId = await freshValue();
    const { revisionId } = await checkedRevision(here, valueId);
    await expect(
      inside(here, (tx) =>
        tx.execute(sql`insert into revision_issue (project_id, value_revision_id, value_id, prepared_by, checked_by, issued_by)
          select project_id, id, value_id, ${here.reader.person.id}::uuid, checked_by, prepared_by
          from bearing_value_revision where id = ${revisionId}`),
      ),
    ).rejects.toMatchObject({ cause: { code: "23503" } });
  });
});

describe("an issued revision", () => {
  it.each(["update", "delete"])("refuses %s by the application's role", async (act) => {
    const valueId = await freshValue();
    const { revisionId } = await issuedRevision(here, valueId);
    const statement =
      act === "update"
        ? sql`update bearing_value_revision set net_allowable_kpa = 999 where id = ${revisionId}`
        : sql`delete from bearing_value_revision where id = ${revisionId}`;
    await expect(inside(here, (tx) => tx.execute(statement))).rejects.toMatchObject({
      cause: { code: "42501" },
    });
    expect((await readValue(here.reader, { valueId })).revisions[0]?.fields.netAllowable_kPa).toBe(250);
  });

  it("refuses both to the tables' owner as well", async () => {
    const { revisionId } = await issuedRevision(here, await freshValue());
    const owner = new pg.Client({ connectionString: process.env.DATABASE_OWNER_URL });
    await owner.connect();
    try {
      await owner.query("select set_config('app.project_id', $1, false)", [here.projectId]);
      await expect(
        owner.query("update bearing_value_revision set reason = 'x' where id = $1", [revisionId]),
      ).rejects.toMatchObject({ code: "23001" });
      await expect(
        owner.query("delete from revision_issue where value_revision_id = $1", [revisionId]),
      ).rejects.toMatchObject({ code: "23001" });
    } finally {
      await owner.end();
    }
  });

  it("is not issued again, and an older one not after a newer", async () => {
    const valueId = await freshValue();
    const first = await checkedRevision(here, valueId);
    const second = await checkedRevision(here, valueId, lowered);
    await expect(
      issueRevision(here.issuer, { valueId, revisionId: first.revisionId, revision: second.revision }),
    ).rejects.toMatchObject({
      status: 409,
      extra: { later: "P02" },
    });
    const issued = await issueRevision(here.issuer, {
      valueId,
      revisionId: second.revisionId,
      revision: second.revision,
    });
    await expect(
      issueRevision(here.lead, { valueId, revisionId: second.revisionId, revision: issued.revision }),
    ).rejects.toMatchObject({ status: 409, extra: { issuedBy: here.issuer.person.name } });
  });

  it("of a neighbour cannot be issued by its id", async () => {
    const valueId = await freshValue();
    const { revisionId, revision } = await checkedRevision(here, valueId);
    await expect(issueRevision(neighbour.issuer, { valueId, revisionId, revision })).rejects.toMatchObject({
      status: 404,
    });
    expect((await readValue(here.reader, { valueId })).currentRevisionId).toBeNull();
  });
});

describe("two at once", () => {
  it("issue the same revision: one wins and the other hears who was first, twenty times over", async () => {
    const valueId = await freshValue();
    await issuedRevision(here, valueId);
    await checkPads(here, await addPads(here, valueId, [{ vertical_kN: 800, mark: marksOf("T") }]));
    for (let round = 0; round < 20; round += 1) {
      const { revisionId, revision } = await checkedRevision(here, valueId, lowered);
      const tried = await Promise.allSettled(
        Array.from({ length: 8 }, (_, at) =>
          issueRevision(at % 2 === 0 ? here.issuer : here.lead, { valueId, revisionId, revision }),
        ),
      );
      expect(tried.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
      for (const one of tried)
        if (one.status === "rejected") {
          expect(one.reason).toMatchObject({ status: 409 });
          expect(one.reason.message).toMatch(/was issued by (Greta Lind|Paul Varga) at \d\d:\d\d UTC/);
        }
    }
    const { rows } = await inside(here, (tx) =>
      tx.execute<{ issues: number; changes: number; consequences: number }>(sql`select
        (select count(*)::int from revision_issue where value_id = ${valueId}) as issues,
        (select count(*)::int from change where value_id = ${valueId}) as changes,
        (select count(*)::int from consequence q join change h on h.id = q.change_id where h.value_id = ${valueId}) as consequences`),
    );
    expect(rows[0]).toEqual({ issues: 21, changes: 21, consequences: 20 });
  });

  it("a newer revision checked meanwhile: the issuer of the older is told", async () => {
    const valueId = await freshValue();
    const { revisionId, revision } = await checkedRevision(here, valueId);
    await checkedRevision(here, valueId, lowered);
    await expect(issueRevision(here.issuer, { valueId, revisionId, revision })).rejects.toMatchObject({
      status: 409,
    });
  });

  it("one who saw the value before another's change is refused with 412", async () => {
    const valueId = await freshValue();
    const { revisionId, revision } = await checkedRevision(here, valueId);
    await expect(
      issueRevision(here.issuer, { valueId, revisionId, revision: revision - 1 }),
    ).rejects.toMatchObject({ status: 412 });
    await expect(issueRevision(here.issuer, { valueId, revisionId })).rejects.toMatchObject({ status: 428 });
  });

  it("a footing linked while the issue runs waits for it, and no check of it can be current on the older value", async () => {
    const { valueId } = await threePads();
    const { revisionId, revision } = await checkedRevision(here, valueId, lowered);
    const [late] = await addPads(here, null, [{ vertical_kN: 400, mark: marksOf("L") }]);
    let linked = "not yet";
    let linking: Promise<unknown> | undefined;
    plantFault("issue:pointer", async () => {
      linking = inside(here, (tx) =>
        tx.execute(
          sql`update footing set value_id = ${valueId} where project_id = ${here.projectId} and id = ${late ?? ""}`,
        ),
      ).then(() => {
        linked = "done";
      });
      await new Promise((resolve) => setTimeout(resolve, 150));
      linked = linked === "done" ? "before the issue" : "waits";
    });
    const { changeId } = await issueRevision(here.issuer, { valueId, revisionId, revision });
    expect(linked).toBe("waits");
    await linking;
    expect(linked).toBe("done");
    expect((await readChange(here.lead, { changeId })).change.total).toBe(3);
    await checkPads(here, [late as FootingId]);
    expect((await standings([late as FootingId]))[0]).toMatchObject({ standing: "current" });
  });
});

describe("an issue that breaks half-way", () => {
  const points = [
    "issue:issue",
    "issue:pointer",
    "consequences:batch",
    "issue:consequences",
    "issue:change",
    "issue:letters",
    "issue:audit",
  ];

  it.each(points)("leaves nothing behind at %s, and the same request succeeds afterwards", async (point) => {
    const { valueId, pads } = await threePads();
    const { revisionId, revision } = await checkedRevision(here, valueId, lowered);
    const tables = ["revision_issue", "change", "consequence", "audit_event"];
    const before = await Promise.all(tables.map((table) => countOf(here, table)));
    const waiting = await throughDoor("relay", (tx) => tx.execute(sql`select id from outbox`));
    plantFault(point, () => {
      throw new Error("power cut");
    });
    await expect(issueRevision(here.issuer, { valueId, revisionId, revision })).rejects.toThrow("power cut");
    expect(await Promise.all(tables.map((table) => countOf(here, table)))).toEqual(before);
    expect((await throughDoor("relay", (tx) => tx.execute(sql`select id from outbox`))).rowCount).toBe(
      waiting.rowCount,
    );
    for (const { standing } of await standings(pads)) expect(standing).toBe("current");
    await expect(issueRevision(here.issuer, { valueId, revisionId, revision })).resolves.toMatchObject({
      code: "P02",
    });
  });

  it("leaves nothing behind when its connection is cut by the server", async () => {
    const { valueId } = await threePads();
    const { revisionId, revision } = await checkedRevision(here, valueId, lowered);
    const before = await countOf(here, "consequence");
    plantFault("issue:change", async () => {
      // Whoever is idle in a transaction now is the issue: this connection asks and is not.
      await client().pool.query(`select pg_terminate_backend(pid) from pg_stat_activity
        where datname = current_database() and state = 'idle in transaction' and usename = current_user`);
    });
    await expect(issueRevision(here.issuer, { valueId, revisionId, revision })).rejects.toThrow();
    expect(await countOf(here, "consequence")).toBe(before);
    await expect(issueRevision(here.issuer, { valueId, revisionId, revision })).resolves.toMatchObject({
      code: "P02",
    });
  });
});
