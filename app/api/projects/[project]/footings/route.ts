import { createFootingInput, listFootingsInput } from "@/lib/contracts/footings";
import { read, write } from "@/lib/http/handle";
import { createFooting } from "@/lib/services/footings/create-footing";
import { listFootings } from "@/lib/services/footings/list-footings";

/** A page of the footings that a filter selects, each with its value, last check and standing. */
export const GET = read({ query: listFootingsInput, run: listFootings });

/** Registers a footing, with its loads where they are known. */
export const POST = write({ body: createFootingInput, status: 201, run: createFooting });
