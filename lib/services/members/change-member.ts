import { sql } from "drizzle-orm";
import { changeMemberInput } from "@/lib/contracts/members";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { Superseded } from "../errors";
import { parse } from "../parse";
import { assertLeadRemains, lockMembership, memberNow } from "./lock-membership";

/** Gives a member other roles, from the member's next request on. */
export async function changeMember(context: Context, given: unknown) {
  assertMay(context, "member:change");
  const { memberId, roles, seenRoles } = parse(changeMemberInput, given);

  return inProject(context, async (tx) => {
    await lockMembership(tx, context);
    const before = await memberNow(tx, context, memberId);
    if ([...seenRoles].sort().join() !== [...before.roles].sort().join())
      throw new Superseded("Somebody changed this member's roles meanwhile.", {
        current: { roles: before.roles },
      });
    await tx.execute(sql`
      delete from membership where project_id = ${context.projectId} and person_id = ${memberId}
        and role <> all(${sql.param(roles)}::text[])`);
    await tx.execute(sql`
      insert into membership (project_id, person_id, role, granted_by)
      select ${context.projectId}, ${memberId}, role, ${context.person.id} from unnest(${sql.param(roles)}::text[]) as role
      on conflict do nothing`);
    await assertLeadRemains(tx, context);
    await audit(tx, context, {
      verb: "member:change",
      subject: `person/${memberId}`,
      detail: { before: before.roles, after: roles },
    });
    return { id: memberId, roles };
  });
}
