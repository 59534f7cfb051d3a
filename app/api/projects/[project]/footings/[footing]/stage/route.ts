import { recordStageInput } from "@/lib/contracts/footings";
import { write } from "@/lib/http/handle";
import { recordStage } from "@/lib/services/footings/record-stage";

/** Records that a footing has reached a stage on site; held while it does not stand on a current check that passes. */
export const POST = write({ body: recordStageInput, status: 201, ifMatch: true, run: recordStage });
