import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import * as t from "@/db/schema";
import type { PersonId, ProjectId } from "@/lib/contracts/ids";
import { createProjectInput } from "@/lib/contracts/projects";
import { env } from "@/lib/env";
import { makeLink } from "../accounts/one-time-link";
import { siteEvent } from "../accounts/site-event";
import { siteAdministrator, type Visitor } from "../accounts/visitor";
import { audit } from "../audit";
import { databaseCode, enter, throughDoor } from "../context";
import { Conflict, Invalid } from "../errors";
import { invitationLetter } from "../members/invite-member";
import { queueMail } from "../outbox";
import { parse } from "../parse";

/**
 * Opens a project with its grid, datum, units and first criteria, and makes somebody its lead. A lead without an account
 * gets one without a password, and a link to choose it. The administrator does not become a member.
 */
export async function createProject(visitor: Visitor, given: unknown) {
  const administrator = siteAdministrator(visitor);
  const { leadEmail, leadName, criteria, ...settings } = parse(createProjectInput, given);
  const projectId = crypto.randomUUID() as ProjectId;
  try {
    return await throughDoor("accounts", async (tx) => {
      await enter(tx, projectId, administrator.id);
      await tx.insert(t.project).values({ id: projectId, ...settings });
      await tx.insert(t.criteria).values({
        projectId,
        number: 1,
        ...criteria,
        reason: "Set when the project was opened",
        setBy: administrator.id,
      });
      const lead = await leadOf(tx, leadEmail, leadName);
      await tx
        .insert(t.membership)
        .values({ projectId, personId: lead.id, role: "lead", grantedBy: administrator.id });
      await tellLead(tx, projectId, settings, { ...lead, email: leadEmail }, administrator);
      await siteEvent(tx, visitor, {
        verb: "project:create",
        personId: administrator.id,
        detail: { projectId },
      });
      await audit(
        tx,
        { person: administrator, projectId, roles: [], requestId: visitor.requestId },
        {
          verb: "project:create",
          subject: `project/${projectId}`,
          detail: { ...settings, criteria, lead: lead.id },
        },
      );
      return { id: projectId, number: settings.number, title: settings.title };
    });
  } catch (error) {
    if (databaseCode(error) === "23505")
      throw new Invalid(
        "One field needs another look.",
        { number: "There is a project with this number already." },
        409,
      );
    throw error;
  }
}

type Lead = { id: PersonId; name: string; hasPassword: boolean };

async function leadOf(tx: Transaction, email: string, name: string): Promise<Lead> {
  const made = await tx.execute<Lead>(sql`
    insert into person (email, name) values (${email}, ${name}) on conflict (email) do nothing
    returning id, name, false as "hasPassword"`);
  if (made.rows[0]) return made.rows[0];
  const { rows } = await tx.execute<Lead & { disabled: boolean }>(sql`
    select id, name, password_hash is not null as "hasPassword", disabled_at is not null as disabled
    from person where email = ${email}`);
  const [found] = rows;
  if (!found || found.disabled) throw new Conflict("The account of this project lead is shut.");
  return found;
}

async function tellLead(
  tx: Transaction,
  projectId: ProjectId,
  project: { number: string; title: string },
  lead: Lead & { email: string },
  from: { id: PersonId; name: string },
): Promise<void> {
  if (lead.hasPassword) {
    const name = `${project.number} ${project.title}`;
    await queueMail(tx, { projectId }, [
      {
        key: `project/${projectId}/${lead.id}`,
        recipientId: lead.id,
        recipient: lead.email,
        subject: `You lead ${name} in Holdground`,
        body: `${lead.name},\n\n${from.name} opened the project ${name} and made you its project lead.\n\n${env().APP_ORIGIN}/projects/${projectId}`,
      },
    ]);
    return;
  }
  const roles = ["lead"];
  const { id, token } = await makeLink(tx, {
    kind: "invitation",
    email: lead.email,
    personId: lead.id,
    projectId,
    roles,
    invitedBy: from.id,
  });
  await queueMail(tx, { projectId }, [
    {
      key: `invitation/${id}`,
      recipientId: lead.id,
      recipient: lead.email,
      ...invitationLetter(project, from.name, roles, token),
    },
  ]);
}
