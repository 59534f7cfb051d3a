import pg from "pg";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { freshDatabase } from "@/tests/support/database";

describe("the two roles of the database", async () => {
  const { appUrl, ownerUrl } = await freshDatabase();
  const app = new pg.Client({ connectionString: appUrl });
  const owner = new pg.Client({ connectionString: ownerUrl });

  beforeAll(async () => {
    await app.connect();
    await owner.connect();
  });
  afterAll(async () => {
    await app.end();
    await owner.end();
  });

  it("gives the application a role that owns nothing and bypasses nothing", async () => {
    const { rows } = await app.query(`
      select rolsuper, rolbypassrls, rolcreatedb, rolcreaterole,
        (select count(*)::int from pg_class where relowner = r.oid) as owned
      from pg_roles r where rolname = current_user`);
    expect(rows).toEqual([
      { rolsuper: false, rolbypassrls: false, rolcreatedb: false, rolcreaterole: false, owned: 0 },
    ]);
  });

  it("lets the owner's role own every table, and makes nobody a superuser", async () => {
    const { rows } = await owner.query(`
      select tableowner, count(*)::int > 20 as many from pg_tables where schemaname = 'public' group by tableowner`);
    expect(rows).toEqual([{ tableowner: "holdground_owner", many: true }]);
    const own = await owner.query("select rolsuper, rolbypassrls from pg_roles where rolname = current_user");
    expect(own.rows).toEqual([{ rolsuper: false, rolbypassrls: false }]);
  });

  it("refuses the application a table of its own, and the emptying of one", async () => {
    await expect(app.query("create table mine (id int)")).rejects.toThrow(/permission denied/);
    await expect(app.query("truncate audit_event")).rejects.toThrow(/permission denied/);
    await expect(app.query("create database another")).rejects.toThrow(/permission denied/);
  });

  it("refuses the application with a wrong password", async () => {
    const wrong = new pg.Client({
      connectionString: Object.assign(new URL(appUrl), { password: "guess" }).href,
    });
    await expect(wrong.connect()).rejects.toMatchObject({ code: "28P01" });
  });

  it("writes to disk what it has acknowledged", async () => {
    const { rows } = await app.query(
      "select current_setting('fsync') as f, current_setting('synchronous_commit') as s",
    );
    expect(rows).toEqual([{ f: "on", s: "on" }]);
  });
});
