import { readSite, writeSite } from "@/lib/http/site";
import { createProject } from "@/lib/services/projects/create-project";
import { myProjects } from "@/lib/services/projects/my-projects";

/** The own projects. */
export const GET = readSite(myProjects);
/** Opens a project. */
export const POST = writeSite({ status: 201, run: createProject });
