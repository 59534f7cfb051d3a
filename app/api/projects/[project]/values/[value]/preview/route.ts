import { previewRevisionInput } from "@/lib/contracts/values";
import { read } from "@/lib/http/handle";
import { previewRevision } from "@/lib/services/revisions/preview-revision";

/** What the draft would do to the linked footings. Writes nothing. */
export const GET = read({ query: previewRevisionInput, run: previewRevision });
