import { createZoneInput } from "@/lib/contracts/zones";
import { read, write } from "@/lib/http/handle";
import { createZone } from "@/lib/services/zones/create-zone";
import { listZones } from "@/lib/services/zones/list-zones";

/** Every zone with its boundary and its values. */
export const GET = read({ run: listZones });

/** Draws a zone. */
export const POST = write({ body: createZoneInput, status: 201, run: createZone });
