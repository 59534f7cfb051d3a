import { sql } from "drizzle-orm";
import { may } from "@/lib/access/policy";
import type { Invitation, Member, MemberList } from "@/lib/contracts/members";
import { assertMay, type Context, inProject, throughDoor } from "../context";
import { isoMoment } from "../iso-moment";

/** The project's members with their roles; for those who may change them also the addresses and open invitations. */
export async function listMembers(context: Context): Promise<MemberList> {
  assertMay(context, "project:read");
  const leads = may(context.roles, "member:change");
  const { members, open } = await inProject(context, async (tx) => {
    const members = await tx.execute<Member>(sql`
      select p.id, p.name, p.qualification,
        case when ${leads} or p.id = ${context.person.id} then p.email end as email,
        array_agg(m.role order by m.role) as roles, p.disabled_at is not null as disabled
      from membership m join person p on p.id = m.person_id
      where m.project_id = ${context.projectId} group by p.id order by p.name, p.id`);
    if (!leads) return { members: members.rows, open: [] };
    const open = await tx.execute<Omit<Invitation, "mail" | "mailFailure">>(sql`
      select l.id, l.email, l.roles, coalesce(p.name, '') as "invitedBy", ${isoMoment(sql`l.created_at`)} as "createdAt",
        ${isoMoment(sql`l.expires_at`)} as "expiresAt"
      from one_time_link l left join person p on p.id = l.invited_by
      where l.project_id = ${context.projectId} and l.kind = 'invitation' and l.used_at is null
      order by l.created_at desc limit 500`);
    return { members: members.rows, open: open.rows };
  });
  const mail = await mailOf(
    context,
    open.map(({ id }) => `invitation/${id}`),
  );
  return {
    members,
    invitations: open.map((invitation) => ({
      ...invitation,
      ...(mail.get(`invitation/${invitation.id}`) ?? { mail: "waiting", mailFailure: null }),
    })),
  };
}

/** How far the letters of these keys have come. Only the relay's door sees letters, so these are read through it. */
async function mailOf(
  context: Context,
  keys: string[],
): Promise<Map<string, Pick<Invitation, "mail" | "mailFailure">>> {
  if (keys.length === 0) return new Map();
  const { rows } = await throughDoor("relay", (tx) =>
    tx.execute<{ key: string; sent: boolean; failure: string | null }>(sql`
      select message_key as key, sent_at is not null as sent, failure from outbox
      where project_id = ${context.projectId} and message_key = any(${sql.param(keys)}::text[])`),
  );
  return new Map(
    rows.map(({ key, sent, failure }) => [
      key,
      { mail: failure !== null ? "failed" : sent ? "sent" : "waiting", mailFailure: failure },
    ]),
  );
}
