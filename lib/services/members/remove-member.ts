import { sql } from "drizzle-orm";
import { removeMemberInput } from "@/lib/contracts/members";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { parse } from "../parse";
import { assertLeadRemains, lockMembership, memberNow } from "./lock-membership";

/** Takes a person out of the project, from the person's next request on. What the person did stays as it is. */
export async function removeMember(context: Context, given: unknown) {
  assertMay(context, "member:change");
  const { memberId } = parse(removeMemberInput, given);

  return inProject(context, async (tx) => {
    await lockMembership(tx, context);
    const before = await memberNow(tx, context, memberId);
    await tx.execute(
      sql`delete from membership where project_id = ${context.projectId} and person_id = ${memberId}`,
    );
    await assertLeadRemains(tx, context);
    await audit(tx, context, {
      verb: "member:remove",
      subject: `person/${memberId}`,
      detail: { before: before.roles, after: [] },
    });
    return null;
  });
}
