import { readValueInput } from "@/lib/contracts/values";
import { read } from "@/lib/http/handle";
import { readValue } from "@/lib/services/values/read-value";

/** One value with its draft, revisions, sources, signatures and what each revision changed. */
export const GET = read({ query: readValueInput, run: readValue });
