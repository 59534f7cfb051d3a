import { assignStrataInput } from "@/lib/contracts/ground";
import { write } from "@/lib/http/handle";
import { assignStrata } from "@/lib/services/units/assign-strata";

/** Assigns strata to a ground unit. */
export const POST = write({ body: assignStrataInput, limit_bytes: 4_000_000, run: assignStrata });
