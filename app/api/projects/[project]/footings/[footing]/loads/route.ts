import { setLoadsInput } from "@/lib/contracts/footings";
import { write } from "@/lib/http/handle";
import { setLoads } from "@/lib/services/loads/set-loads";

/** Issues the load combinations of a footing anew. */
export const PUT = write({ body: setLoadsInput, ifMatch: true, run: setLoads });
