import { inviteMemberInput } from "@/lib/contracts/members";
import { read, write } from "@/lib/http/handle";
import { inviteMember } from "@/lib/services/members/invite-member";
import { listMembers } from "@/lib/services/members/list-members";

/** Members and open invitations. */
export const GET = read({ run: listMembers });
/** Invites somebody by mail. */
export const POST = write({ body: inviteMemberInput, status: 201, run: inviteMember });
