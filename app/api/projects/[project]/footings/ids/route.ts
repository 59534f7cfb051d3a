import { selectFootingsInput } from "@/lib/contracts/footings";
import { read } from "@/lib/http/handle";
import { selectFootingIds } from "@/lib/services/footings/select-footings";

/** The ids of all footings that a filter selects. */
export const GET = read({ query: selectFootingsInput, run: selectFootingIds });
