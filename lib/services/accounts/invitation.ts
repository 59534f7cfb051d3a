import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { acceptInvitationInput } from "@/lib/contracts/accounts";
import type { PersonId, ProjectId } from "@/lib/contracts/ids";
import { audit } from "../audit";
import { enter, throughDoor } from "../context";
import { Conflict, Forbidden, Invalid, SignedOut } from "../errors";
import { parse } from "../parse";
import { type Link, readLink, takeLink } from "./one-time-link";
import { hashPassword } from "./passwords";
import { siteEvent } from "./site-event";
import type { Visitor } from "./visitor";

type Holder = { id: PersonId; hasPassword: boolean; disabled: boolean };

/** What the page of an invitation shows. Reading does not use the link up. */
export type InvitationShown = {
  email: string;
  projectId: ProjectId | null;
  project: string;
  roles: string[];
  needsAccount: boolean;
};

/** Reads an invitation by its token; refuses one that cannot be used. */
export async function readInvitation(token: string): Promise<InvitationShown> {
  return throughDoor("accounts", async (tx) => {
    const link = await readLink(tx, "invitation", token);
    const holder = await holderOf(tx, link.email);
    const project = await projectOf(tx, link);
    return {
      email: link.email,
      projectId: link.project_id,
      project,
      roles: link.roles,
      needsAccount: !holder?.hasPassword,
    };
  });
}

/**
 * Accepts an invitation. The link proves the address; so an address without a password chooses one here, and an
 * address with an account must be the one that is signed in.
 */
export async function acceptInvitation(
  visitor: Visitor,
  given: unknown,
): Promise<{ projectId: ProjectId; email: string; signIn: boolean }> {
  const { token, name, password } = parse(acceptInvitationInput, given);
  return throughDoor("accounts", async (tx) => {
    const link = await takeLink(tx, "invitation", token);
    if (!link.project_id) throw new Invalid("This invitation names no project.");
    const holder = await holderOf(tx, link.email);
    if (holder?.disabled) throw new Conflict("This account is shut. Please ask the site administrator.");
    const personId = holder?.hasPassword
      ? assertIsHolder(visitor, holder, link)
      : await makeAccount(tx, holder, link, { name, password });

    await enter(tx, link.project_id, personId);
    await tx.execute(sql`
      insert into membership (project_id, person_id, role, granted_by)
      select ${link.project_id}, ${personId}, role, ${link.invited_by} from unnest(${sql.param(link.roles)}::text[]) as role
      on conflict do nothing`);
    if (!holder?.hasPassword) await siteEvent(tx, visitor, { verb: "account:make", personId });
    await audit(
      tx,
      {
        person: { id: personId, name: name ?? "", email: link.email },
        projectId: link.project_id,
        roles: [],
        requestId: visitor.requestId,
      },
      {
        verb: "member:join",
        subject: `person/${personId}`,
        detail: { invitation: link.id, roles: link.roles },
      },
    );
    return { projectId: link.project_id, email: link.email, signIn: !holder?.hasPassword };
  });
}

async function holderOf(tx: Transaction, email: string): Promise<Holder | undefined> {
  const { rows } = await tx.execute<Holder>(sql`
    select id, password_hash is not null as "hasPassword", disabled_at is not null as disabled
    from person where email = ${email}`);
  return rows[0];
}

async function projectOf(tx: Transaction, link: Link): Promise<string> {
  await enter(tx, link.project_id ?? "", "");
  const { rows } = await tx.execute<{ name: string }>(
    sql`select number || ' ' || title as name from project where id = ${link.project_id}`,
  );
  return rows[0]?.name ?? "";
}

function assertIsHolder(visitor: Visitor, holder: Holder, link: Link): PersonId {
  if (!visitor.person) throw new SignedOut(`Please sign in as ${link.email} to accept this invitation.`);
  if (visitor.person.id !== holder.id)
    throw new Forbidden(
      `This invitation is for ${link.email}. Please sign out and sign in with that address.`,
    );
  return holder.id;
}

async function makeAccount(
  tx: Transaction,
  holder: Holder | undefined,
  link: Link,
  given: { name?: string; password?: string },
): Promise<PersonId> {
  const missing: Record<string, string> = {};
  if (given.name === undefined) missing.name = "A name is needed.";
  if (given.password === undefined) missing.password = "A password is needed.";
  if (given.name === undefined || given.password === undefined)
    throw new Invalid("Name and password are needed to make the account.", missing);
  const passwordHash = await hashPassword(given.password);
  const { rows } = await tx.execute<{ id: PersonId }>(
    holder
      ? sql`update person set name = ${given.name}, password_hash = ${passwordHash} where id = ${holder.id} returning id`
      : sql`insert into person (email, name, password_hash) values (${link.email}, ${given.name}, ${passwordHash}) returning id`,
  );
  if (!rows[0]) throw new Error("A person just written has an id.");
  return rows[0].id;
}
