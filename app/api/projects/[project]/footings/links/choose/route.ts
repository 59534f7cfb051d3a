import { chooseLinkInput } from "@/lib/contracts/footings";
import { write } from "@/lib/http/handle";
import { chooseLink } from "@/lib/services/links/choose-link";

/** Links footings to a chosen value, or takes their links away, with the reason. */
export const POST = write({ body: chooseLinkInput, limit_bytes: 2_000_000, run: chooseLink });
