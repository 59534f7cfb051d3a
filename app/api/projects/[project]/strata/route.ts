import { read } from "@/lib/http/handle";
import { listStrata } from "@/lib/services/holes/list-strata";

/** Every stratum of the current logs. */
export const GET = read({ run: listStrata });
