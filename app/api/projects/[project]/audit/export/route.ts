import { read } from "@/lib/http/handle";
import { exportAudit } from "@/lib/services/projects/read-audit";

/** The whole audit trail as CSV. */
export const GET = read({ run: exportAudit });
