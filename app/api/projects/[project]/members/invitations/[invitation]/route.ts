import { write } from "@/lib/http/handle";
import { cancelInvitation } from "@/lib/services/members/cancel-invitation";

/** Withdraws an open invitation. */
export const DELETE = write({ status: 204, run: cancelInvitation });
