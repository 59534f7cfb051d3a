import { editFootingInput, readFootingInput } from "@/lib/contracts/footings";
import { read, write } from "@/lib/http/handle";
import { editFooting } from "@/lib/services/footings/edit-footing";
import { readFooting } from "@/lib/services/footings/read-footing";

/** One footing with its whole history. */
export const GET = read({ query: readFootingInput, run: readFooting });

/** Changes a footing; another size, place or level is its next revision. */
export const PUT = write({ body: editFootingInput, ifMatch: true, run: editFooting });
