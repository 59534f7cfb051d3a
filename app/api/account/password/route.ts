import { writeSite } from "@/lib/http/site";
import { changePassword } from "@/lib/services/accounts/change-password";

/** Changes the own password; other sessions end. */
export const POST = writeSite({ run: changePassword });
