import { readCheckInput } from "@/lib/contracts/checks";
import { read } from "@/lib/http/handle";
import { readCheck } from "@/lib/services/checks/read-check";

/** One stored check whole: what it was given, every figure, how it stands. */
export const GET = read({ query: readCheckInput, run: readCheck });
