import { createHoleInput } from "@/lib/contracts/ground";
import { read, write } from "@/lib/http/handle";
import { createHole } from "@/lib/services/holes/create-hole";
import { listHoles } from "@/lib/services/holes/list-holes";

/** Every exploratory hole. */
export const GET = read({ run: listHoles });

/** Records a hole with its log. */
export const POST = write({ body: createHoleInput, status: 201, run: createHole });
