import { type SQL, sql } from "drizzle-orm";

/** A moment of the database as ISO 8601 text in UTC, to the millisecond; null stays null. */
export const isoMoment = (moment: SQL): SQL =>
  sql`to_char(${moment} at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"')`;
