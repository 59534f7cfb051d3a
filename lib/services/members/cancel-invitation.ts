import { sql } from "drizzle-orm";
import { cancelInvitationInput } from "@/lib/contracts/members";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { NotFound } from "../errors";
import { parse } from "../parse";

/** Withdraws an open invitation: its link cannot be used any more. */
export async function cancelInvitation(context: Context, given: unknown) {
  assertMay(context, "member:change");
  const { invitationId } = parse(cancelInvitationInput, given);

  return inProject(context, async (tx) => {
    const { rows } = await tx.execute<{ email: string }>(sql`
      update one_time_link set used_at = now()
      where id = ${invitationId} and project_id = ${context.projectId} and kind = 'invitation' and used_at is null
      returning email`);
    if (!rows[0]) throw new NotFound("There is no such open invitation.");
    await audit(tx, context, {
      verb: "member:cancel-invitation",
      subject: `invitation/${invitationId}`,
      detail: { email: rows[0].email },
    });
    return null;
  });
}
