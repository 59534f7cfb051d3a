import { read } from "@/lib/http/handle";
import { readPlan } from "@/lib/services/plan/read-plan";

/** What the plan draws beside the zones. */
export const GET = read({ run: readPlan });
