import { drizzle, type NodePgDatabase } from "drizzle-orm/node-postgres";
import pg from "pg";
import { env } from "@/lib/env";
import * as schema from "./schema";

export type Database = NodePgDatabase<typeof schema>;
export type Transaction = Parameters<Parameters<Database["transaction"]>[0]>[0];

type Kept = { url: string; pool: pg.Pool; database: Database };
const kept = globalThis as { holdgroundDatabase?: Kept };

/** The pool of the application's role. Kept across reloads; a changed DATABASE_URL (tests) opens another. */
export function client(): { pool: pg.Pool; database: Database } {
  const url = env().DATABASE_URL;
  if (kept.holdgroundDatabase?.url !== url) {
    const pool = new pg.Pool({ connectionString: url, max: 12, connectionTimeoutMillis: 5_000 });
    // An idle connection that the server ends is replaced at the next use; without a listener it would end the process.
    pool.on("error", () => {});
    // One that is cut while a transaction has it: the next query fails and tells; the bare event would end the process.
    pool.on("connect", (connection) => connection.on("error", () => {}));
    kept.holdgroundDatabase = { url, pool, database: drizzle({ client: pool, schema }) };
  }
  return kept.holdgroundDatabase;
}

/** Ends the pool: for scripts and tests that want to exit. */
export async function closeClient(): Promise<void> {
  const { holdgroundDatabase } = kept;
  kept.holdgroundDatabase = undefined;
  await holdgroundDatabase?.pool.end();
}
