import { sql } from "drizzle-orm";
import { type Role, roleTitles } from "@/lib/access/policy";
import { inviteMemberInput } from "@/lib/contracts/members";
import { env } from "@/lib/env";
import { makeLink } from "../accounts/one-time-link";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { Conflict } from "../errors";
import { queueMail } from "../outbox";
import { parse } from "../parse";
import { lockMembership } from "./lock-membership";

/** Invites an address into the project with roles, by mail. An earlier open invitation to it is withdrawn. */
export async function inviteMember(context: Context, given: unknown) {
  assertMay(context, "member:change");
  const { email, roles } = parse(inviteMemberInput, given);

  return inProject(context, async (tx) => {
    await lockMembership(tx, context);
    const member = await tx.execute(sql`
      select 1 from membership m join person p on p.id = m.person_id
      where m.project_id = ${context.projectId} and p.email = ${email} limit 1`);
    if (member.rowCount)
      throw new Conflict("This person is a member already. Change the roles in the list of members.");
    await tx.execute(sql`
      update one_time_link set used_at = now()
      where project_id = ${context.projectId} and kind = 'invitation' and email = ${email} and used_at is null`);
    const { id, token } = await makeLink(tx, {
      kind: "invitation",
      email,
      projectId: context.projectId,
      roles,
      invitedBy: context.person.id,
    });
    const { rows } = await tx.execute<{ number: string; title: string }>(
      sql`select number, title from project where id = ${context.projectId}`,
    );
    await queueMail(tx, context, [
      {
        key: `invitation/${id}`,
        recipient: email,
        ...invitationLetter(rows[0], context.person.name, roles, token),
      },
    ]);
    await audit(tx, context, {
      verb: "member:invite",
      subject: `invitation/${id}`,
      detail: { email, roles },
    });
    return { id, email, roles };
  });
}

/** The letter that carries an invitation. */
export function invitationLetter(
  project: { number: string; title: string } | undefined,
  from: string,
  roles: readonly string[],
  token: string,
): { subject: string; body: string } {
  const name = `${project?.number ?? ""} ${project?.title ?? ""}`.trim();
  const titles = roles.map((role) => roleTitles[role as Role].toLowerCase()).join(", ");
  return {
    subject: `Invitation to ${name} in Holdground`,
    body: [
      `${from} invites you to the project ${name} as ${titles}.`,
      "",
      "The link works once, within seven days:",
      "",
      `${env().APP_ORIGIN}/invitation/${token}`,
      "",
      "If you do not know what this is about, leave it: nothing happens.",
    ].join("\n"),
  };
}
