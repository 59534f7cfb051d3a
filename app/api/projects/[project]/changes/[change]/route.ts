import { readChangeInput } from "@/lib/contracts/changes";
import { read } from "@/lib/http/handle";
import { readChange } from "@/lib/services/changes/read-change";

/** One change with a page of what it did to footings. */
export const GET = read({ query: readChangeInput, run: readChange });
