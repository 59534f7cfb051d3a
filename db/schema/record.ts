import { bigint, index, integer, jsonb, pgTable, primaryKey, text, uuid } from "drizzle-orm/pg-core";
import type { PersonId } from "@/lib/contracts/ids";
import { id, moment, projectKey } from "./columns";
import { person } from "./people";
import { project } from "./projects";

/** One thing that somebody did, written in the same transaction as what it records. A trigger chains the hashes. */
export const auditEvent = pgTable(
  "audit_event",
  {
    projectId: projectKey().references(() => project.id),
    seq: bigint("seq", { mode: "number" }).notNull(),
    at: moment("at").notNull(),
    actorId: id<PersonId>("actor_id").notNull(),
    roles: text("roles").notNull(),
    verb: text("verb").notNull(),
    subject: text("subject").notNull(),
    /** Canonical JSON as text, so that the hash stands on exactly these bytes. */
    detail: text("detail").notNull(),
    requestId: text("request_id").notNull(),
    previousHash: text("previous_hash").notNull(),
    hash: text("hash").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.seq] }),
    index("audit_event_subject").on(t.projectId, t.subject),
  ],
);

/** A message that must leave: written with what it tells, sent later by the relay, at least once under one Message-ID. */
export const outbox = pgTable(
  "outbox",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    projectId: uuid("project_id"),
    /** One message per person per event: the same key is never queued twice. */
    messageKey: text("message_key").notNull().unique(),
    recipientId: id<PersonId>("recipient_id").references(() => person.id),
    recipient: text("recipient").notNull(),
    subject: text("subject").notNull(),
    body: text("body").notNull(),
    createdAt: moment("created_at").notNull().defaultNow(),
    nextAttemptAt: moment("next_attempt_at").notNull().defaultNow(),
    attempts: integer("attempts").notNull().default(0),
    sentAt: moment("sent_at"),
    failure: text("failure"),
  },
  (t) => [index("outbox_waiting").on(t.sentAt, t.nextAttemptAt)],
);

/** The first answer to a keyed request, given again when the request is repeated. */
export const idempotentAnswer = pgTable(
  "idempotent_answer",
  {
    projectId: projectKey().references(() => project.id),
    key: text("key").notNull(),
    personId: id<PersonId>("person_id").notNull(),
    route: text("route").notNull(),
    bodyHash: text("body_hash").notNull(),
    status: integer("status").notNull(),
    body: jsonb("body").notNull(),
    at: moment("at").notNull().defaultNow(),
  },
  (t) => [primaryKey({ columns: [t.projectId, t.key] })],
);
