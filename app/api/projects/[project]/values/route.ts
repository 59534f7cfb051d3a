import { createValueInput, listValuesInput } from "@/lib/contracts/values";
import { read, write } from "@/lib/http/handle";
import { createValue } from "@/lib/services/values/create-value";
import { listValues } from "@/lib/services/values/list-values";

/** The project's bearing values, each with what is in force and how many footings rest on it. */
export const GET = read({ query: listValuesInput, run: listValues });

/** Opens the entry for one ground unit in one zone. */
export const POST = write({ body: createValueInput, status: 201, run: createValue });
