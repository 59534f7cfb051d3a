import { changeZoneInput } from "@/lib/contracts/zones";
import { write } from "@/lib/http/handle";
import { changeZone } from "@/lib/services/zones/change-zone";

/** Redraws, renames or re-reads a zone. */
export const PATCH = write({ body: changeZoneInput, ifMatch: true, run: changeZone });
