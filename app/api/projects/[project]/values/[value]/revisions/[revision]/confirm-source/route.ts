import { confirmSourceInput } from "@/lib/contracts/values";
import { write } from "@/lib/http/handle";
import { confirmSource } from "@/lib/services/revisions/confirm-source";

/** Records that a newer revision of a source leaves the value as it is. */
export const POST = write({ body: confirmSourceInput, status: 201, run: confirmSource });
