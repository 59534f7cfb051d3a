import { acceptConsequencesInput } from "@/lib/contracts/changes";
import { write } from "@/lib/http/handle";
import { acceptConsequences } from "@/lib/services/changes/answer-consequences";

/** The project lead accepts footings as built. */
export const POST = write({ body: acceptConsequencesInput, status: 201, run: acceptConsequences });
