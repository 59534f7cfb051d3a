import { changeMemberInput } from "@/lib/contracts/members";
import { write } from "@/lib/http/handle";
import { changeMember } from "@/lib/services/members/change-member";
import { removeMember } from "@/lib/services/members/remove-member";

/** Gives a member other roles. */
export const PUT = write({ body: changeMemberInput, run: changeMember });
/** Takes a person out of the project. */
export const DELETE = write({ status: 204, run: removeMember });
