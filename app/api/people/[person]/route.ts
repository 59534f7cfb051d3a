import { writeSite } from "@/lib/http/site";
import { setAccountOpen } from "@/lib/services/accounts/people";

/** Opens or shuts an account. */
export const PATCH = writeSite({ run: setAccountOpen });
