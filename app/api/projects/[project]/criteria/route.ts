import { changeCriteriaInput } from "@/lib/contracts/projects";
import { read, write } from "@/lib/http/handle";
import { changeCriteria } from "@/lib/services/projects/change-criteria";
import { listCriteria } from "@/lib/services/projects/project-facts";

/** Every set of criteria that the project has had. */
export const GET = read({ run: listCriteria });
/** Puts new criteria in force. */
export const POST = write({ body: changeCriteriaInput, status: 201, ifMatch: true, run: changeCriteria });
