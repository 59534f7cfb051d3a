import { writeSite } from "@/lib/http/site";
import { signOutEverywhere } from "@/lib/services/accounts/end-sessions";

/** Signs out on every device. */
export const POST = writeSite({ form: { done: "/sign-in?done=everywhere" }, run: signOutEverywhere });
