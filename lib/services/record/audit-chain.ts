import { sql } from "drizzle-orm";
import { client, type Transaction } from "@/db/client";
import type { ProjectId } from "@/lib/contracts/ids";
import { enter, sha256 } from "../context";

/** A row of the audit trail as the hash stands on it: the moment to the microsecond, ids as text. */
export type ChainedEvent = {
  projectId: string;
  seq: number;
  at: string;
  actorId: string;
  roles: string;
  verb: string;
  subject: string;
  requestId: string;
  detail: string;
  previousHash: string;
  hash: string;
};

export const CHAIN_BEGINS = "0".repeat(64);

/** The hash that the database's trigger gave this event: over the previous hash and every column, a line each. */
export const chainHash = (e: Omit<ChainedEvent, "hash">): string =>
  sha256(
    [
      e.previousHash,
      e.projectId,
      e.seq,
      e.at,
      e.actorId,
      e.roles,
      e.verb,
      e.subject,
      e.requestId,
      e.detail,
    ].join("\n"),
  );

export type Break = { seq: number; what: string };

/** Continues a chain over further events; answers with its new end, or with the first link that does not hold. */
export function followChain(
  end: { seq: number; hash: string },
  events: readonly ChainedEvent[],
): { end: { seq: number; hash: string }; broken?: Break } {
  let last = end;
  for (const event of events) {
    const broken = (what: string) => ({ end: last, broken: { seq: event.seq, what } });
    if (event.seq !== last.seq + 1)
      return broken(`event ${last.seq + 1} is missing: the next one is ${event.seq}`);
    if (event.previousHash !== last.hash)
      return broken(`event ${event.seq} does not follow from the one before it`);
    if (chainHash(event) !== event.hash) return broken(`event ${event.seq} is not what was written`);
    last = { seq: event.seq, hash: event.hash };
  }
  return { end: last };
}

const PAGE = 5000;

/** Verifies the whole chain of one project, a page at a time. `end` is its head, to be kept outside the database. */
export async function verifyProject(
  tx: Transaction,
  projectId: ProjectId,
): Promise<{ end: { seq: number; hash: string }; broken?: Break }> {
  let end = { seq: 0, hash: CHAIN_BEGINS };
  for (;;) {
    const { rows } = await tx.execute<Omit<ChainedEvent, "seq"> & { seq: string }>(sql`
      select project_id as "projectId", seq, to_char(at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.US"Z"') as at,
        actor_id as "actorId", roles, verb, subject, request_id as "requestId", detail,
        previous_hash as "previousHash", hash
      from audit_event where project_id = ${projectId} and seq > ${end.seq} order by seq limit ${PAGE}`);
    const followed = followChain(
      end,
      rows.map((row) => ({ ...row, seq: Number(row.seq) })),
    );
    if (followed.broken || rows.length < PAGE) return followed;
    end = followed.end;
  }
}

/** Does something inside each project in turn, as the scripts that verify the record do: it reads, whoever is a member. */
export async function inEachProject<Result>(
  act: (tx: Transaction, project: { id: ProjectId; number: string }) => Promise<Result>,
): Promise<Result[]> {
  const { database } = client();
  const projects = await database.transaction(async (tx) => {
    await tx.execute(sql`select set_config('app.door', 'verifier', true)`);
    return (
      await tx.execute<{ id: ProjectId; number: string }>(sql`select id, number from project order by number`)
    ).rows;
  });
  const results: Result[] = [];
  for (const project of projects)
    results.push(
      await database.transaction(
        async (tx) => {
          await enter(tx, project.id, "");
          return act(tx, project);
        },
        { isolationLevel: "repeatable read", accessMode: "read only" },
      ),
    );
  return results;
}
