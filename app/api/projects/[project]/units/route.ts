import { createUnitInput } from "@/lib/contracts/ground";
import { read, write } from "@/lib/http/handle";
import { createUnit } from "@/lib/services/units/create-unit";
import { listUnits } from "@/lib/services/units/list-units";

/** The ground units from the surface down. */
export const GET = read({ run: listUnits });

/** Adds a ground unit. */
export const POST = write({ body: createUnitInput, status: 201, run: createUnit });
