import { bigint, boolean, index, integer, pgTable, text, uuid } from "drizzle-orm/pg-core";
import type { PersonId, ProjectId } from "@/lib/contracts/ids";
import { id, moment } from "./columns";

/** Somebody who can sign in. The address is stored in its normal form and is unique in it. */
export const person = pgTable("person", {
  id: id<PersonId>("id").primaryKey().defaultRandom(),
  email: text("email").notNull().unique(),
  name: text("name").notNull(),
  qualification: text("qualification").notNull().default(""),
  passwordHash: text("password_hash"),
  /** Raised to end every session of this person at once; compared at every request. */
  sessionVersion: integer("session_version").notNull().default(1),
  siteAdministrator: boolean("site_administrator").notNull().default(false),
  disabledAt: moment("disabled_at"),
  createdAt: moment("created_at").notNull().defaultNow(),
});

/** One sign-in that is still open or has ended. A cookie names it; ending the row ends the cookie at once. */
export const personSession = pgTable(
  "person_session",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    personId: id<PersonId>("person_id")
      .notNull()
      .references(() => person.id),
    startedAt: moment("started_at").notNull().defaultNow(),
    /** When it was last used, to the minute; an idle session ends. */
    seenAt: moment("seen_at").notNull().defaultNow(),
    address: text("address").notNull(),
    endedAt: moment("ended_at"),
  },
  (t) => [index("person_session_open").on(t.personId, t.endedAt)],
);

/** One attempt to sign in, kept to slow down guessing by account and by address. */
export const signInAttempt = pgTable(
  "sign_in_attempt",
  {
    seq: bigint("seq", { mode: "number" }).primaryKey().generatedAlwaysAsIdentity(),
    account: text("account").notNull(),
    address: text("address").notNull(),
    succeeded: boolean("succeeded").notNull(),
    at: moment("at").notNull().defaultNow(),
  },
  (t) => [
    index("sign_in_attempt_account").on(t.account, t.at),
    index("sign_in_attempt_address").on(t.address, t.at),
  ],
);

/** A single-use link sent by mail: an invitation to a project or a password reset. Only its hash is stored. */
export const oneTimeLink = pgTable("one_time_link", {
  id: uuid("id").primaryKey().defaultRandom(),
  kind: text("kind").$type<"invitation" | "password-reset">().notNull(),
  tokenHash: text("token_hash").notNull().unique(),
  email: text("email").notNull(),
  personId: id<PersonId>("person_id").references(() => person.id),
  projectId: id<ProjectId>("project_id"),
  roles: text("roles").array().notNull().default([]),
  invitedBy: id<PersonId>("invited_by").references(() => person.id),
  createdAt: moment("created_at").notNull().defaultNow(),
  expiresAt: moment("expires_at").notNull(),
  usedAt: moment("used_at"),
});

/** What happens outside any project: sign-ins, resets, people made or disabled. */
export const siteEvent = pgTable("site_event", {
  seq: bigint("seq", { mode: "number" }).primaryKey().generatedAlwaysAsIdentity(),
  at: moment("at").notNull().defaultNow(),
  personId: id<PersonId>("person_id"),
  verb: text("verb").notNull(),
  detail: text("detail").notNull().default("{}"),
  requestId: text("request_id").notNull(),
});
