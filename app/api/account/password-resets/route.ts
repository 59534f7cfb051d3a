import { writeSite } from "@/lib/http/site";
import { requestPasswordReset } from "@/lib/services/accounts/request-password-reset";

/** Asks for a link to set a new password. */
export const POST = writeSite({ form: { done: "/reset?sent=yes" }, run: requestPasswordReset });
