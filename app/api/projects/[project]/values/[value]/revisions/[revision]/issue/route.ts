import { issueRevisionInput } from "@/lib/contracts/values";
import { write } from "@/lib/http/handle";
import { issueRevision } from "@/lib/services/revisions/issue-revision";

/** Issues a revision of a bearing value; answers with what it did to each linked footing, counted. */
export const POST = write({ body: issueRevisionInput, status: 201, ifMatch: true, run: issueRevision });
