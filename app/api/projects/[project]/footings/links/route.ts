import { confirmLinksInput } from "@/lib/contracts/footings";
import { write } from "@/lib/http/handle";
import { confirmLinks } from "@/lib/services/links/confirm-links";

/** Links footings to the values proposed from their zones, after each proposal is made again. */
export const POST = write({ body: confirmLinksInput, limit_bytes: 4_000_000, run: confirmLinks });
