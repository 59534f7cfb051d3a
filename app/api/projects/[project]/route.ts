import { changeProjectInput } from "@/lib/contracts/projects";
import { read, write } from "@/lib/http/handle";
import { changeProject } from "@/lib/services/projects/change-project";
import { projectFacts } from "@/lib/services/projects/project-facts";

/** Grid, datum, units and criteria of the project. */
export const GET = read({ run: projectFacts });
/** Changes settings of the project. */
export const PATCH = write({ body: changeProjectInput, ifMatch: true, run: changeProject });
