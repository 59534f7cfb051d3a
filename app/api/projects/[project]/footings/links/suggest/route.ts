import { suggestLinksInput } from "@/lib/contracts/footings";
import { write } from "@/lib/http/handle";
import { suggestLinks } from "@/lib/services/links/suggest-links";

/** Proposes a value for each of the footings named; a POST because the names may be thousands. Writes nothing. */
export const POST = write({ body: suggestLinksInput, limit_bytes: 2_000_000, run: suggestLinks });
