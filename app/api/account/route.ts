import { readSite, writeSite } from "@/lib/http/site";
import { changeAccount, ownAccount } from "@/lib/services/accounts/own-account";

/** The own account. */
export const GET = readSite(ownAccount);
/** Changes name and qualification. */
export const PATCH = writeSite({ run: changeAccount });
