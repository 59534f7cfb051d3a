import { writeSite } from "@/lib/http/site";
import { acceptInvitation } from "@/lib/services/accounts/invitation";

/** Accepts an invitation to a project. */
export const POST = writeSite({ form: { done: "/sign-in?done=joined" }, run: acceptInvitation });
