import { createHash } from "node:crypto";
import { sql } from "drizzle-orm";
import { client, type Transaction } from "@/db/client";
import * as t from "@/db/schema";
import { may, type Role, type Verb } from "@/lib/access/policy";
import { ENGINE_VERSION } from "@/lib/check/version";
import type { PersonId, ProjectId } from "@/lib/contracts/ids";
import { Conflict, Forbidden, Invalid, NotFound, Unavailable } from "./errors";

/** Who asks, where, in which roles, under which request. Made once at the edge; verbs take nothing else on trust. */
export type Context = {
  person: { id: PersonId; name: string; email: string };
  projectId: ProjectId;
  roles: readonly Role[];
  requestId: string;
  /** A keyed request: its answer is stored with its effect, and given again when the key comes back. */
  keyed?: { key: string; route: string; bodyHash: string; status: number };
};

/** Thrown when a keyed request has been answered before; carries that answer. */
export class AnsweredBefore extends Error {
  constructor(
    readonly status: number,
    readonly body: unknown,
  ) {
    super("This request was answered before.");
  }
}

/** Refuses unless one of the context's roles may do the act. */
export function assertMay(context: Context, verb: Verb): void {
  if (!may(context.roles, verb))
    throw new Forbidden(`Your role in this project does not allow this (${verb.replace(":", ": ")}).`);
}

/**
 * The only door to a project's rows: one transaction, the project and the actor set, membership read again inside it.
 * Repeats the whole on a serialisation failure or a deadlock.
 */
export async function inProject<Result>(
  context: Context,
  act: (tx: Transaction) => Promise<Result>,
): Promise<Result> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await client().database.transaction(async (tx) => {
        await enter(tx, context.projectId, context.person.id);
        const seat = await tx.execute(sql`
          select 1 from membership m join person p on p.id = m.person_id
          where m.project_id = ${context.projectId} and m.person_id = ${context.person.id} and p.disabled_at is null
          limit 1`);
        if (seat.rowCount === 0) throw new NotFound("There is no such project among yours.");
        if (context.keyed) await answerIfRepeated(tx, context);
        const result = await act(tx);
        if (context.keyed) await keepAnswer(tx, context, result);
        return result;
      });
    } catch (error) {
      const code = databaseCode(error);
      if ((code === "40001" || code === "40P01") && attempt < 5) continue;
      throw translated(error, code);
    }
  }
}

/** Sets project, person and engine for the rest of this transaction; row security reads them. */
export async function enter(
  tx: Transaction,
  projectId: ProjectId | "",
  personId: PersonId | "",
): Promise<void> {
  await tx.execute(sql`select set_config('app.project_id', ${projectId}, true),
    set_config('app.person_id', ${personId}, true), set_config('app.engine', ${ENGINE_VERSION}, true)`);
}

/** A transaction outside any project, for accounts and the mail relay; the door names which rows it may see. */
export async function throughDoor<Result>(
  door: "accounts" | "relay",
  act: (tx: Transaction) => Promise<Result>,
): Promise<Result> {
  return client().database.transaction(async (tx) => {
    await tx.execute(sql`select set_config('app.door', ${door}, true)`);
    return act(tx);
  });
}

/** The five-letter state that PostgreSQL gives an error, wherever Drizzle has wrapped it. */
export function databaseCode(error: unknown): string | undefined {
  for (let at = error; at instanceof Error; at = at.cause) {
    const code = (at as { code?: unknown }).code;
    if (typeof code === "string") return code;
  }
  return undefined;
}

/** The name of the constraint that an error broke, if any. */
export function brokenConstraint(error: unknown): string | undefined {
  for (let at = error; at instanceof Error; at = at.cause) {
    const name = (at as { constraint?: unknown }).constraint;
    if (typeof name === "string") return name;
  }
  return undefined;
}

function translated(error: unknown, code: string | undefined): unknown {
  if (code === "ECONNREFUSED" || code === "57P01" || code === "57P03" || code === "53300")
    return new Unavailable("The database does not answer just now. Nothing was changed; please try again.");
  if (code === "23505")
    return new Conflict("Something with this name or number exists already.", {
      constraint: brokenConstraint(error),
    });
  return error;
}

async function answerIfRepeated(tx: Transaction, context: Context): Promise<void> {
  const keyed = context.keyed;
  if (!keyed) return;
  const lock = await tx.execute<{ got: boolean }>(
    sql`select pg_try_advisory_xact_lock(hashtextextended(${`key ${context.projectId} ${keyed.key}`}, 0)) as got`,
  );
  if (!lock.rows[0]?.got) throw new Conflict("A request with this key is still running.");
  const [before] = await tx
    .select()
    .from(t.idempotentAnswer)
    .where(sql`project_id = ${context.projectId} and key = ${keyed.key}`);
  if (!before) return;
  if (before.personId !== context.person.id)
    throw new Forbidden("This key belongs to another person's request.");
  if (before.bodyHash !== keyed.bodyHash || before.route !== keyed.route)
    throw new Invalid("This key was used for another request.", {}, 422);
  throw new AnsweredBefore(before.status, before.body);
}

async function keepAnswer(tx: Transaction, context: Context, result: unknown): Promise<void> {
  if (!context.keyed) return;
  const { key, route, bodyHash, status } = context.keyed;
  await tx.insert(t.idempotentAnswer).values({
    projectId: context.projectId,
    key,
    personId: context.person.id,
    route,
    bodyHash,
    status,
    body: result ?? null,
  });
}

/** SHA-256 of a text or bytes, as 64 hexadecimal digits. */
export const sha256 = (content: string | Uint8Array): string =>
  createHash("sha256").update(content).digest("hex");
