import { referConsequencesInput } from "@/lib/contracts/changes";
import { write } from "@/lib/http/handle";
import { referConsequences } from "@/lib/services/changes/answer-consequences";

/** The structural engineer sends footings back to the geotechnical engineer with a question. */
export const POST = write({ body: referConsequencesInput, status: 201, run: referConsequences });
