import { readAuditInput } from "@/lib/contracts/projects";
import { read } from "@/lib/http/handle";
import { readAudit } from "@/lib/services/projects/read-audit";

/** The audit trail, newest first. */
export const GET = read({ query: readAuditInput, run: readAudit });
