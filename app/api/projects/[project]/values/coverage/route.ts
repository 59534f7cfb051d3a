import { read } from "@/lib/http/handle";
import { readCoverage } from "@/lib/services/values/read-coverage";

/** Where ground and footings do not meet. */
export const GET = read({ run: readCoverage });
