import { reviseHoleInput } from "@/lib/contracts/ground";
import { read, write } from "@/lib/http/handle";
import { readHole } from "@/lib/services/holes/read-hole";
import { reviseHole } from "@/lib/services/holes/revise-hole";

/** One hole with its log and where it came from. */
export const GET = read({ run: readHole });

/** Records a corrected log as a new revision. */
export const PATCH = write({ body: reviseHoleInput, ifMatch: true, run: reviseHole });
