import { runChecksInput } from "@/lib/contracts/checks";
import { write } from "@/lib/http/handle";
import { runChecks } from "@/lib/services/checks/run-checks";

/** Checks one footing, a selection, or all that are linked, each against its value's revision in force. */
export const POST = write({ body: runChecksInput, status: 201, limit_bytes: 2_000_000, run: runChecks });
