import { drizzle } from "drizzle-orm/node-postgres";
import { migrate } from "drizzle-orm/node-postgres/migrator";
import pg from "pg";

/** Any number, always the same: it names this act among the advisory locks of the server. */
const MIGRATION_LOCK = 4_203_117;

/**
 * Brings the database that DATABASE_OWNER_URL names to the newest migration, one process at a time, and sees that the
 * application's role can sign in with the password that DATABASE_URL holds.
 */
export async function migrateDatabase(ownerUrl: string, appUrl?: string): Promise<void> {
  const client = new pg.Client({ connectionString: ownerUrl });
  await client.connect();
  try {
    await client.query("select pg_advisory_lock($1)", [MIGRATION_LOCK]);
    await client.query("set client_min_messages = warning");
    await migrate(drizzle({ client }), { migrationsFolder: `${import.meta.dirname}/../drizzle` });
    if (appUrl) await admitApplication(client, appUrl);
  } finally {
    await client.end();
  }
}

/** Sets the role's password only when it does not let the application in: other databases may share the role. */
async function admitApplication(owner: pg.Client, appUrl: string): Promise<void> {
  const { username, password } = new URL(appUrl);
  if (await letsIn(appUrl)) return;
  const role = decodeURIComponent(username);
  if (role !== "holdground_app")
    throw new Error(
      `The database does not let ${role} in; the migrations only look after the role holdground_app.`,
    );
  const quoted = owner.escapeLiteral(decodeURIComponent(password));
  await owner.query(`alter role holdground_app login nosuperuser nobypassrls password ${quoted}`);
  if (!(await letsIn(appUrl))) throw new Error("DATABASE_URL does not lead into the migrated database.");
}

async function letsIn(url: string): Promise<boolean> {
  const client = new pg.Client({ connectionString: url });
  try {
    await client.connect();
    await client.query("select 1");
    return true;
  } catch (error) {
    const code = (error as { code?: string }).code;
    // 28P01 wrong password, 28000 role may not sign in: ours to mend. Anything else is told as it is.
    if (code === "28P01" || code === "28000") return false;
    throw error;
  } finally {
    await client.end().catch(() => {});
  }
}

if (process.argv[1] && import.meta.filename === process.argv[1]) {
  const ownerUrl = process.env.DATABASE_OWNER_URL;
  if (!ownerUrl) {
    console.error(
      "DATABASE_OWNER_URL is not set: it names the database to migrate, as the role that owns its tables.",
    );
    process.exit(1);
  }
  await migrateDatabase(ownerUrl, process.env.DATABASE_URL);
}
