import { sql } from "drizzle-orm";
import { createTransport } from "nodemailer";
import type { ProjectId } from "@/lib/contracts/ids";
import { env } from "@/lib/env";
import { enter, throughDoor } from "@/lib/services/context";
import { type Letter, letterOf, type Waiting } from "./letter";

/** A claimed letter that nobody reported on is taken up again after this: the relay that held it is gone. */
const LEASE_S = 120;
const BATCH = 20;
const LOOK_EVERY_MS = 1000;
const GIVE_UP_AFTER_DAYS = 5;

/** What the relay needs of a mail server. */
export type MailServer = { sendMail: (letter: Letter) => Promise<unknown>; close: () => void };
export type Sent = { sent: number; delayed: number; failed: number };

/** Seconds until the next try: 5, 10, 20 … up to five minutes, so that mail leaves soon after the server is back. */
export const backOff_s = (attempts: number): number => Math.min(5 * 2 ** Math.max(0, attempts - 1), 300);

/** The mail server of the environment. Slow or silent ones are given up on, so that others' letters are not held up. */
export function mailServer(url = env().SMTP_URL): MailServer {
  return createTransport({
    url,
    pool: true as const,
    maxConnections: 4,
    // When to try again is decided by the outbox alone.
    maxRequeues: 0,
    connectionTimeout: 10_000,
    greetingTimeout: 10_000,
    socketTimeout: 30_000,
    disableFileAccess: true,
    disableUrlAccess: true,
  });
}

/**
 * Sends the letters that are due, once through. Each is claimed first (two relays never claim the same), sent outside
 * any transaction, then marked. A relay that dies in between leaves a letter that is sent again under the same
 * Message-ID: at least once, never lost. A refusal for good is recorded; anything else is tried again later.
 */
export async function sendWaiting(server: MailServer, from = env().MAIL_FROM): Promise<Sent> {
  const tally: Sent = { sent: 0, delayed: 0, failed: 0 };
  for (;;) {
    const claimed = await claim();
    if (claimed.length === 0) return tally;
    const outcomes = await Promise.all(claimed.map((row) => send(server, row, from)));
    for (const outcome of outcomes) tally[outcome] += 1;
    if (claimed.length < BATCH || outcomes.every((outcome) => outcome === "delayed")) return tally;
  }
}

async function claim(): Promise<Waiting[]> {
  return throughDoor("relay", async (tx) => {
    const { rows } = await tx.execute<Waiting>(sql`
      update outbox set attempts = attempts + 1, next_attempt_at = now() + make_interval(secs => ${LEASE_S})
      where id in (
        select id from outbox where sent_at is null and failure is null and next_attempt_at <= now()
        order by created_at, id limit ${BATCH} for update skip locked)
      returning id, project_id as "projectId", message_key as "messageKey", recipient_id as "recipientId", recipient,
        subject, body, attempts`);
    return rows;
  });
}

async function send(server: MailServer, row: Waiting, from: string): Promise<keyof Sent> {
  const letter = letterOf(row, from);
  if (!letter) return fail(row, "The address is not one that mail is sent to.");
  if (!(await mayStillRead(row)))
    return fail(row, "Not sent: the recipient has no access to the project any more.");
  try {
    await server.sendMail(letter);
  } catch (error) {
    const { responseCode, message } = error as { responseCode?: number; message?: string };
    const reason = (message ?? "unknown").replace(/\s+/g, " ").slice(0, 300);
    if (responseCode !== undefined && responseCode >= 500) return fail(row, reason);
    return delay(row, reason);
  }
  await throughDoor("relay", (tx) =>
    tx.execute(sql`update outbox set sent_at = now(), failure = null where id = ${row.id}`),
  );
  return "sent";
}

/** A letter about a project goes to members only, as it stands now; a shut account gets none. */
async function mayStillRead(row: Waiting): Promise<boolean> {
  if (!row.recipientId) return true;
  return throughDoor("relay", async (tx) => {
    await enter(tx, (row.projectId ?? "") as ProjectId | "", "");
    const { rowCount } = await tx.execute(sql`
      select 1 from person p where p.id = ${row.recipientId} and p.disabled_at is null
        and (${row.projectId}::uuid is null
          or exists (select from membership m where m.project_id = ${row.projectId} and m.person_id = p.id))`);
    return rowCount === 1;
  });
}

async function fail(row: Waiting, reason: string): Promise<"failed"> {
  await throughDoor("relay", (tx) =>
    tx.execute(sql`update outbox set failure = ${reason} where id = ${row.id}`),
  );
  return "failed";
}

async function delay(row: Waiting, reason: string): Promise<"delayed" | "failed"> {
  const { rows } = await throughDoor("relay", (tx) =>
    tx.execute<{ failure: string | null }>(sql`
      update outbox set next_attempt_at = now() + make_interval(secs => ${backOff_s(row.attempts)}),
        failure = case when created_at < now() - make_interval(days => ${GIVE_UP_AFTER_DAYS}) then ${reason} end
      where id = ${row.id} returning failure`),
  );
  return rows[0]?.failure ? "failed" : "delayed";
}

const kept = globalThis as { holdgroundRelay?: { stop: () => Promise<void> } };

/** Starts the relay of this process, once. Its failures are logged and never end the process. */
export function startRelay(): { stop: () => Promise<void> } {
  if (kept.holdgroundRelay) return kept.holdgroundRelay;
  const server = mailServer();
  let running = true;
  let round: Promise<unknown> = Promise.resolve();
  let complained = "";
  const look = async () => {
    try {
      await sendWaiting(server);
      complained = "";
    } catch (error) {
      const cause = String((error as Error).message);
      if (cause !== complained) {
        complained = cause;
        process.stderr.write(
          `${JSON.stringify({ at: new Date().toISOString(), event: "mail relay waits", cause })}\n`,
        );
      }
    }
    if (running) timer = setTimeout(go, LOOK_EVERY_MS).unref();
  };
  const go = () => {
    round = look();
  };
  let timer = setTimeout(go, 0).unref();
  kept.holdgroundRelay = {
    stop: async () => {
      running = false;
      clearTimeout(timer);
      await round;
      server.close();
      kept.holdgroundRelay = undefined;
    },
  };
  return kept.holdgroundRelay;
}
