import { randomBytes } from "node:crypto";
import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import * as t from "@/db/schema";
import type { PersonId, ProjectId } from "@/lib/contracts/ids";
import { sha256 } from "../context";
import { Invalid } from "../errors";

export type Link = {
  id: string;
  kind: "invitation" | "password-reset";
  email: string;
  person_id: PersonId | null;
  project_id: ProjectId | null;
  roles: string[];
  invited_by: PersonId | null;
};

/** How long a link can be used. */
export const LINK_MINUTES = { invitation: 7 * 24 * 60, "password-reset": 10 } as const;

/** Writes a link and answers with its token, which is kept nowhere. */
export async function makeLink(
  tx: Transaction,
  link: {
    kind: Link["kind"];
    email: string;
    personId?: PersonId | null;
    projectId?: ProjectId;
    roles?: string[];
    invitedBy?: PersonId;
  },
): Promise<{ id: string; token: string }> {
  const token = randomBytes(32).toString("base64url");
  const id = crypto.randomUUID();
  await tx.insert(t.oneTimeLink).values({
    ...link,
    id,
    tokenHash: sha256(token),
    expiresAt: sql`now() + make_interval(mins => ${LINK_MINUTES[link.kind]})`,
  });
  return { id, token };
}

const refused = () =>
  new Invalid(
    "This link cannot be used: it has been used already, was withdrawn or is too old. Please ask for a new one.",
    {
      token: "This link cannot be used any more.",
    },
  );

/** Reads a link without using it up: mail scanners open links too. Refuses one that cannot be used. */
export async function readLink(tx: Transaction, kind: Link["kind"], token: string): Promise<Link> {
  const { rows } = await tx.execute<Link>(sql`
    select id, kind, email, person_id, project_id, roles, invited_by from one_time_link
    where token_hash = ${sha256(token)} and kind = ${kind} and used_at is null and expires_at > now()`);
  if (!rows[0]) throw refused();
  return rows[0];
}

/** Uses a link up; of two that try at once one wins. Refuses one that cannot be used. */
export async function takeLink(tx: Transaction, kind: Link["kind"], token: string): Promise<Link> {
  const { rows } = await tx.execute<Link>(sql`
    update one_time_link set used_at = now()
    where token_hash = ${sha256(token)} and kind = ${kind} and used_at is null and expires_at > now()
    returning id, kind, email, person_id, project_id, roles, invited_by`);
  if (!rows[0]) throw refused();
  return rows[0];
}
