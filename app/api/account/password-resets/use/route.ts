import { writeSite } from "@/lib/http/site";
import { resetPassword } from "@/lib/services/accounts/reset-password";

/** Sets a new password with the link from the mail. */
export const POST = writeSite({ form: { done: "/sign-in?done=reset" }, run: resetPassword });
