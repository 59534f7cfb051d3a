import { discardDraftInput, readValueInput, saveDraftInput } from "@/lib/contracts/values";
import { write } from "@/lib/http/handle";
import { discardDraft } from "@/lib/services/values/discard-draft";
import { saveDraft } from "@/lib/services/values/save-draft";
import { startDraft } from "@/lib/services/values/start-draft";

/** Begins the next revision. */
export const POST = write({ body: readValueInput, status: 201, run: startDraft });

/** Keeps the draft as typed so far. */
export const PUT = write({ body: saveDraftInput, ifMatch: true, run: saveDraft });

/** Throws the draft away. */
export const DELETE = write({ body: discardDraftInput, ifMatch: true, run: discardDraft });
