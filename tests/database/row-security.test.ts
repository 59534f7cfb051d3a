import { randomUUID } from "node:crypto";
import { sql } from "drizzle-orm";
import pg from "pg";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { client } from "@/db/client";
import { audit } from "@/lib/services/audit";
import { enter, inProject, throughDoor } from "@/lib/services/context";
import { queueMail } from "@/lib/services/outbox";
import { type FreshDatabase, freshDatabase } from "../support/database";
import { asSuperuser, lookInto, makeSite, type Site, stored } from "../support/site";

let database: FreshDatabase;
let site: Site;
let neighbour: Site;
let app: pg.Client;
let tables: string[];

beforeAll(async () => {
  database = await freshDatabase();
  lookInto(database.superuserUrl);
  site = await makeSite("R-01");
  neighbour = await makeSite("R-02");
  for (const { projectId } of [site, neighbour])
    await asSuperuser(async (db) => {
      await db.query("insert into hole (project_id, name) values ($1, 'BH1')", [projectId]);
      await db.query(
        "insert into ground_unit (project_id, code, name, soil) values ($1, '1', 'Clay', 'clay')",
        [projectId],
      );
    });
  app = new pg.Client({ connectionString: database.appUrl });
  await app.connect();
  tables = (
    await stored<{ relname: string }>(`
      select c.relname from pg_class c join pg_attribute a on a.attrelid = c.oid and a.attname = 'project_id'
      where c.relnamespace = 'public'::regnamespace and c.relkind in ('r', 'v') order by 1`)
  ).map(({ relname }) => relname);
});
afterAll(() => app.end());

/** Runs in a transaction of the application's role with these settings, and takes everything back. */
async function withSettings<Result>(
  settings: Record<string, string>,
  act: () => Promise<Result>,
): Promise<Result> {
  await app.query("begin");
  try {
    for (const [name, value] of Object.entries(settings))
      await app.query("select set_config($1, $2, true)", [name, value]);
    return await act();
  } finally {
    await app.query("rollback");
  }
}
const count = async (table: string) =>
  Number((await app.query(`select count(*) as n from ${table}`)).rows[0].n);

describe("the application's role", () => {
  it("sees no row of any project's table with no project set", async () => {
    expect(tables.length).toBeGreaterThan(35);
    for (const table of tables) expect([table, await count(table)]).toEqual([table, 0]);
    expect(await count("project")).toBe(0);
  });

  it("sees none with the project empty, unknown or of the wrong form", async () => {
    for (const table of [...tables, "project"]) {
      expect([table, await withSettings({ "app.project_id": "" }, () => count(table))]).toEqual([table, 0]);
      expect([table, await withSettings({ "app.project_id": randomUUID() }, () => count(table))]).toEqual([
        table,
        0,
      ]);
      for (const wrong of ["1", "all", "' or true --", "null"])
        expect([
          table,
          await withSettings({ "app.project_id": wrong }, () => count(table)).catch(() => 0),
        ]).toEqual([table, 0]);
    }
    await expect(withSettings({ "app.project_id": "all" }, () => count("hole"))).rejects.toThrow(
      /invalid input syntax for type uuid/,
    );
  });

  it("sees its own project's rows and none of the neighbour's", async () => {
    await withSettings({ "app.project_id": site.projectId }, async () => {
      for (const table of tables) {
        const { rows } = await app.query(`select distinct project_id from ${table}`);
        for (const { project_id } of rows) expect([table, project_id]).toEqual([table, site.projectId]);
      }
      expect(await count("hole")).toBe(1);
      expect(await count("project")).toBe(1);
    });
  });

  it("writes nothing into another project, changes nothing there, deletes nothing there", async () => {
    const inside = { "app.project_id": site.projectId };
    await expect(
      withSettings(inside, () =>
        app.query("insert into hole (project_id, name) values ($1, 'BH9')", [neighbour.projectId]),
      ),
    ).rejects.toThrow(/row-level security/);
    await expect(
      withSettings(inside, () => app.query("update hole set project_id = $1", [neighbour.projectId])),
    ).rejects.toThrow(/row-level security/);
    expect(
      (
        await withSettings(inside, () =>
          app.query("update hole set name = 'X' where project_id = $1", [neighbour.projectId]),
        )
      ).rowCount,
    ).toBe(0);
    expect(
      (
        await withSettings(inside, () =>
          app.query("delete from membership where project_id = $1", [neighbour.projectId]),
        )
      ).rowCount,
    ).toBe(0);
    await expect(
      withSettings(inside, () =>
        app.query("insert into membership (project_id, person_id, role) values ($1, $2, 'lead')", [
          neighbour.projectId,
          site.reader.person.id,
        ]),
      ),
    ).rejects.toThrow(/row-level security/);
  });

  it("links nothing of its project to a row of another, even past row security", async () => {
    const [unit] = await stored<{ id: string }>("select id from ground_unit where project_id = $1", [
      neighbour.projectId,
    ]);
    await asSuperuser(async (db) => {
      const zone = randomUUID();
      await db.query("insert into zone (project_id, id, name) values ($1, $2, 'Zone A')", [
        site.projectId,
        zone,
      ]);
      await expect(
        db.query("insert into zone_ground_unit (project_id, zone_id, ground_unit_id) values ($1, $2, $3)", [
          site.projectId,
          zone,
          unit?.id,
        ]),
      ).rejects.toThrow(/foreign key/);
    });
  });

  it("sees own memberships by person, and nobody else's", async () => {
    const { rows } = await withSettings({ "app.person_id": site.reader.person.id }, () =>
      app.query("select project_id, person_id from membership"),
    );
    expect(rows).toEqual([{ project_id: site.projectId, person_id: site.reader.person.id }]);
    await withSettings({ "app.person_id": site.reader.person.id }, async () => {
      expect(await count("project")).toBe(1);
      expect(await count("hole")).toBe(0);
    });
  });

  it("queues mail but reads none, and reads no link, but through their own doors", async () => {
    await inProject(site.lead, async (tx) => {
      await queueMail(tx, site.lead, [
        { key: `test/${randomUUID()}`, recipient: "a@example.test", subject: "s", body: "b" },
      ]);
      expect((await tx.execute(sql`select 1 from outbox`)).rowCount).toBe(0);
    });
    expect(
      await throughDoor(
        "relay",
        async (tx) =>
          (await tx.execute(sql`select 1 from outbox where recipient = 'a@example.test'`)).rowCount,
      ),
    ).toBe(1);
    expect(
      await throughDoor("accounts", async (tx) => (await tx.execute(sql`select 1 from outbox`)).rowCount),
    ).toBe(0);
    expect(
      await throughDoor("relay", async (tx) => (await tx.execute(sql`select 1 from one_time_link`)).rowCount),
    ).toBe(0);
    await expect(
      inProject(site.lead, (tx) =>
        queueMail(tx, neighbour.lead, [
          { key: `test/${randomUUID()}`, recipient: "a@example.test", subject: "s", body: "b" },
        ]),
      ),
    ).rejects.toThrow();
  });

  it("cannot switch row security off, become another role, or make or drop anything", async () => {
    for (const forbidden of [
      "set role holdground_owner",
      "set session authorization postgres",
      "alter table hole disable row level security",
      "alter table audit_event disable trigger append_only",
      "drop policy in_project on hole",
      "create table public.mine (a int)",
      "create function public.mine() returns int language sql security definer as 'select 1'",
      "drop table hole",
      "truncate hole",
      "copy hole to program 'cat'",
      "set session_replication_role = replica",
      "select pg_read_file('/etc/passwd')",
    ])
      await expect(
        withSettings({ "app.project_id": site.projectId }, () => app.query(forbidden)),
      ).rejects.toThrow(/permission denied|must be owner|must be superuser|pg_execute_server_program/);
    await withSettings({ row_security: "off", "app.project_id": site.projectId }, async () => {
      await expect(app.query("select 1 from hole")).rejects.toThrow(/row-level security/);
    });
  });
});

describe("a connection that many projects share", () => {
  it("never shows one project's rows to another, a thousand requests with failures in between", async () => {
    const pool = client().pool;
    const leak: string[] = [];
    const one = async (n: number) => {
      const [own, other] = n % 2 === 0 ? [site, neighbour] : [neighbour, site];
      await inProject(own.reader, async (tx) => {
        const { rows } = await tx.execute<{ project_id: string }>(sql`select project_id from hole`);
        for (const row of rows) if (row.project_id !== own.projectId) leak.push(row.project_id);
        if (rows.length !== 1) leak.push(`${rows.length} rows`);
        if (n % 3 === 0) throw new Error("mid-way");
        if (n % 5 === 0) await tx.execute(sql`select 1 / 0`);
        if (n % 7 === 0)
          await tx.execute(sql`insert into hole (project_id, name) values (${other.projectId}, 'BH2')`);
      }).catch(() => {});
    };
    for (let begin = 0; begin < 1000; begin += 50)
      await Promise.all(Array.from({ length: 50 }, (_, at) => one(begin + at)));
    expect(leak).toEqual([]);
    expect(pool.totalCount).toBeLessThanOrEqual(12);
    // Nothing of the last transaction stays on any connection.
    const left = await Promise.all(
      Array.from({ length: 12 }, () =>
        pool.query(
          "select current_setting('app.project_id', true) as p, (select count(*) from hole)::int as n",
        ),
      ),
    );
    for (const { rows } of left) expect([rows[0].p || "", rows[0].n]).toEqual(["", 0]);
    expect(await stored("select name from hole order by project_id, name")).toEqual([
      { name: "BH1" },
      { name: "BH1" },
    ]);
  });
});

describe("append-only tables", () => {
  it("refuse UPDATE, DELETE and TRUNCATE to the application and to their owner", async () => {
    const guarded = (
      await stored<{ relname: string }>(
        "select c.relname from pg_trigger g join pg_class c on c.oid = g.tgrelid where g.tgname = 'append_only' order by 1",
      )
    ).map(({ relname }) => relname);
    for (const wanted of [
      "audit_event",
      "bearing_value_revision",
      "footing_check",
      "consequence",
      "disposition",
      "document_revision",
      "inspection",
      "criteria",
      "site_event",
    ])
      expect(guarded).toContain(wanted);
    const owner = new pg.Client({ connectionString: database.ownerUrl });
    await owner.connect();
    try {
      for (const table of guarded) {
        for (const query of [
          `update ${table} set ${table === "site_event" ? "verb = verb" : "project_id = project_id"}`,
          `delete from ${table}`,
        ])
          await expect(
            withSettings({ "app.project_id": site.projectId }, () => app.query(query)),
          ).rejects.toThrow(/permission denied/);
        await expect(owner.query(`truncate ${table} cascade`)).rejects.toThrow(/append-only/);
      }
      await owner.query("begin");
      await owner.query("select set_config('app.project_id', $1, true)", [site.projectId]);
      await expect(owner.query("update audit_event set verb = 'x'")).rejects.toThrow(/append-only/);
      await owner.query("rollback");
      await owner.query("begin");
      await owner.query("select set_config('app.project_id', $1, true)", [site.projectId]);
      await expect(owner.query("delete from criteria")).rejects.toThrow(/append-only/);
      await owner.query("rollback");
    } finally {
      await owner.end();
    }
  });

  it("stay as they are when a superuser's statement meets the trigger", async () => {
    await asSuperuser(async (db) => {
      await expect(db.query("update audit_event set detail = '{}'")).rejects.toThrow(/append-only/);
      await expect(db.query("delete from criteria")).rejects.toThrow(/append-only/);
    });
  });
});

describe("a transaction that fails after its audit row", () => {
  it("leaves neither the change nor the audit row nor the letter", async () => {
    const before = await stored("select count(*)::int as n from audit_event");
    await inProject(site.lead, async (tx) => {
      await tx.execute(sql`insert into hole (project_id, name) values (${site.projectId}, 'BH7')`);
      await queueMail(tx, site.lead, [
        { key: "never", recipient: "a@example.test", subject: "s", body: "b" },
      ]);
      await audit(tx, site.lead, { verb: "hole:write", subject: "hole/BH7" });
      throw new Error("the lights go out");
    }).catch(() => {});
    expect(await stored("select count(*)::int as n from audit_event")).toEqual(before);
    expect(await stored("select 1 from hole where name = 'BH7'")).toEqual([]);
    expect(await stored("select 1 from outbox where message_key = 'never'")).toEqual([]);
  });
});

describe("a setting of one transaction", () => {
  it("ends with it, so that the next user of the connection begins with none", async () => {
    await client().database.transaction((tx) => enter(tx, site.projectId, site.lead.person.id));
    const { rows } = await client().pool.query(
      "select coalesce(current_setting('app.project_id', true), '') as p",
    );
    expect(rows[0].p).toBe("");
  });
});
