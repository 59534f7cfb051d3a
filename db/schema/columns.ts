import { type AnyPgColumn, doublePrecision, timestamp, uuid } from "drizzle-orm/pg-core";
import type { PersonId, ProjectId } from "@/lib/contracts/ids";

/** A moment with time zone, kept to the microsecond, always UTC on the wire. */
export const moment = (name: string) => timestamp(name, { withTimezone: true, mode: "date" });

/** A physical quantity in the SI unit that the column's name ends in. */
export const quantity = (name: string) => doublePrecision(name);

/** A uuid column branded with the id type that it holds. */
export const id = <Brand extends string>(name: string) => uuid(name).$type<Brand>();

/** The first column of every project table: row security and every key begin with it. */
export const projectKey = () => id<ProjectId>("project_id").notNull();

/** The person who did what the row records. */
export const personKey = (name: string, target: () => AnyPgColumn) => id<PersonId>(name).references(target);
