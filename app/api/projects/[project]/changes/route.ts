import { listChangesInput } from "@/lib/contracts/changes";
import { read } from "@/lib/http/handle";
import { listChanges } from "@/lib/services/changes/list-changes";

/** What changed upstream of checks, newest first. */
export const GET = read({ query: listChangesInput, run: listChanges });
