import { beforeAll, describe, expect, it } from "vitest";
import { freshDatabase } from "../support/database";
import { lookInto, stored } from "../support/site";

/** Tables of people and mail, whose rows no project owns; each has its own policy or none, and says why. */
const REVIEWED_POLICIES: Record<string, string[]> = {
  membership: ["in_project", "own_memberships"],
  project: ["in_project", "own_projects", "verifier"],
  outbox: ["queue", "relay"],
  one_time_link: ["accounts", "in_project"],
};
const REVIEWED_UNIQUE: Record<string, string> = {
  // A random key that nobody can guess, or one that only site administrators try.
  outbox_message_key_unique: "holds random ids, so that a clash tells nothing",
  outbox_pkey: "random",
  one_time_link_token_hash_unique: "256 random bits",
  one_time_link_pkey: "random",
};
const WITHOUT_PROJECT = ["person", "person_session", "project", "sign_in_attempt", "site_event"];
/** Functions that run with their owner's rights. There is none; one that is added is reviewed here. */
const REVIEWED_DEFINERS: string[] = [];

beforeAll(async () => lookInto((await freshDatabase()).superuserUrl));

describe("the catalogue of the database", () => {
  it("has row security enabled and forced on every table that carries a project", async () => {
    const rows = await stored<{ relname: string }>(`
      select c.relname from pg_class c join pg_attribute a on a.attrelid = c.oid and a.attname = 'project_id'
      where c.relnamespace = 'public'::regnamespace and c.relkind in ('r', 'p')
        and not (c.relrowsecurity and c.relforcerowsecurity)`);
    expect(rows).toEqual([]);
    const known = await stored<{ relname: string }>(`
      select relname from pg_class c where relnamespace = 'public'::regnamespace and relkind = 'r' and not exists (
        select from pg_attribute a where a.attrelid = c.oid and a.attname = 'project_id') order by 1`);
    expect(known.map(({ relname }) => relname)).toEqual(WITHOUT_PROJECT);
  });

  it("has policies with USING and WITH CHECK on the current project, and no others but the reviewed ones", async () => {
    const rows = await stored<{
      tablename: string;
      policyname: string;
      cmd: string;
      qual: string;
      with_check: string;
    }>(
      "select tablename, policyname, cmd, qual, with_check from pg_policies where schemaname = 'public' order by 1, 2",
    );
    const byTable = new Map<string, typeof rows>();
    for (const row of rows) byTable.set(row.tablename, [...(byTable.get(row.tablename) ?? []), row]);
    for (const [table, policies] of byTable) {
      const names = policies.map(({ policyname }) => policyname);
      expect([table, names]).toEqual([table, REVIEWED_POLICIES[table] ?? ["in_project"]]);
      if (table === "outbox") continue;
      const own = policies.find(({ policyname }) => policyname === "in_project");
      expect([table, own?.cmd, own?.qual, own?.with_check].join("\n")).toMatch(
        /^\w+\nALL\n\((project_id|id) = \( SELECT current_project\(\).*\)\)\n\((project_id|id) = \( SELECT current_project\(\).*\)\)$/,
      );
    }
    const tables = await stored<{ relname: string }>(`
      select c.relname from pg_class c join pg_attribute a on a.attrelid = c.oid and a.attname = 'project_id'
      where c.relnamespace = 'public'::regnamespace and c.relkind = 'r'`);
    for (const { relname } of tables) expect([relname, byTable.has(relname)]).toEqual([relname, true]);
  });

  it("gives the application's role no table, no way round row security, no TRUNCATE and no DDL", async () => {
    expect(
      await stored(
        "select rolsuper, rolbypassrls, rolcreaterole, rolcreatedb from pg_roles where rolname = 'holdground_app'",
      ),
    ).toEqual([{ rolsuper: false, rolbypassrls: false, rolcreaterole: false, rolcreatedb: false }]);
    expect(await stored("select relname from pg_class where relowner = 'holdground_app'::regrole")).toEqual(
      [],
    );
    expect(
      await stored(`
        select c.relname from pg_class c where c.relnamespace = 'public'::regnamespace and c.relkind = 'r'
          and (has_table_privilege('holdground_app', c.oid, 'TRUNCATE')
            or has_table_privilege('holdground_app', c.oid, 'TRIGGER')
            or has_table_privilege('holdground_app', c.oid, 'REFERENCES'))`),
    ).toEqual([]);
    expect(await stored("select has_schema_privilege('holdground_app', 'public', 'CREATE') as may")).toEqual([
      { may: false },
    ]);
    expect(await stored("select 1 from pg_auth_members where member = 'holdground_app'::regrole")).toEqual(
      [],
    );
  });

  it("lets the application change or delete no append-only table, by grant as well as by trigger", async () => {
    const rows = await stored(`
      select c.relname, has_table_privilege('holdground_app', c.oid, 'UPDATE') as update,
        has_table_privilege('holdground_app', c.oid, 'DELETE') as delete
      from pg_class c join pg_trigger g on g.tgrelid = c.oid and g.tgname = 'append_only'
      where has_table_privilege('holdground_app', c.oid, 'UPDATE') or has_table_privilege('holdground_app', c.oid, 'DELETE')
        or has_any_column_privilege('holdground_app', c.oid, 'UPDATE')`);
    expect(rows).toEqual([]);
    const guarded = await stored<{ n: number }>(
      "select count(*)::int as n from pg_trigger where tgname in ('append_only', 'append_only_whole') and tgenabled <> 'D'",
    );
    expect(guarded[0]?.n).toBeGreaterThanOrEqual(50);
  });

  it("has only views that see with the eyes of who asks", async () => {
    const rows = await stored(`
      select relname from pg_class where relnamespace = 'public'::regnamespace and relkind in ('v', 'm')
        and not coalesce('security_invoker=true' = any(reloptions), false)`);
    expect(rows).toEqual([]);
    expect(await stored("select count(*)::int as n from pg_views where schemaname = 'public'")).toEqual([
      { n: 2 },
    ]);
  });

  it("has no function that runs with its owner's rights but the reviewed ones", async () => {
    const rows = await stored<{ proname: string }>(`
      select proname from pg_proc where prosecdef and pronamespace = 'public'::regnamespace`);
    expect(rows.map(({ proname }) => proname)).toEqual(REVIEWED_DEFINERS);
  });

  it("carries the project in every foreign key between two tables of projects", async () => {
    const rows = await stored(`
      with tenant as (select attrelid, attnum from pg_attribute a join pg_class c on c.oid = a.attrelid
        where a.attname = 'project_id' and c.relkind = 'r' and c.relnamespace = 'public'::regnamespace)
      select k.conname from pg_constraint k
      join tenant a on a.attrelid = k.conrelid join tenant b on b.attrelid = k.confrelid
      where k.contype = 'f' and not exists (
        select from unnest(k.conkey, k.confkey) as pair(here, there) where pair.here = a.attnum and pair.there = b.attnum)`);
    expect(rows).toEqual([]);
  });

  it("begins every unique key of a project's table with the project", async () => {
    const rows = await stored<{ name: string }>(`
      select i.indexrelid::regclass::text as name from pg_index i
      join pg_attribute a on a.attrelid = i.indrelid and a.attname = 'project_id'
      where i.indisunique and i.indkey[0] <> a.attnum and i.indrelid::regclass::text !~ '^pg_' order by 1`);
    expect(rows.map(({ name }) => name).filter((name) => !(name in REVIEWED_UNIQUE))).toEqual([]);
  });
});
