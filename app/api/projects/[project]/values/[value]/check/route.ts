import { checkDraftInput } from "@/lib/contracts/values";
import { write } from "@/lib/http/handle";
import { checkDraft } from "@/lib/services/values/check-draft";

/** Signs the draft as checked by a second person: it becomes a numbered revision. */
export const POST = write({ body: checkDraftInput, status: 201, ifMatch: true, run: checkDraft });
