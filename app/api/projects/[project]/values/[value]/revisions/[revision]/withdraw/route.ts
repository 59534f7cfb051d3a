import { withdrawRevisionInput } from "@/lib/contracts/values";
import { write } from "@/lib/http/handle";
import { withdrawRevision } from "@/lib/services/revisions/withdraw-revision";

/** Takes the revision in force out of use. */
export const POST = write({ body: withdrawRevisionInput, status: 201, ifMatch: true, run: withdrawRevision });
