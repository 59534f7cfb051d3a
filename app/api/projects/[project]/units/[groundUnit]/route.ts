import { changeUnitInput } from "@/lib/contracts/ground";
import { write } from "@/lib/http/handle";
import { changeUnit } from "@/lib/services/units/change-unit";

/** Changes how a ground unit is called, described or drawn. */
export const PATCH = write({ body: changeUnitInput, ifMatch: true, run: changeUnit });
