import { sql } from "drizzle-orm";

import { type CheckRow, type ReadCheckInput, readCheckInput } from "@/lib/contracts/checks";
import { assertMay, type Context, inProject } from "../context";
import { NotFound } from "../errors";
import { parse } from "../parse";
import { selectChecks } from "./check-rows";
import type { CheckResult, CheckSnapshot } from "./run-check";

export type CheckDetail = CheckRow & { snapshot: CheckSnapshot; result: CheckResult };

/** One stored check whole: what it was given, every figure it came to, and how it stands now. */
export async function readCheck(context: Context, given: ReadCheckInput): Promise<CheckDetail> {
  assertMay(context, "project:read");
  const { checkId } = parse(readCheckInput, given);
  return inProject(context, async (tx) => {
    const [row] = await selectChecks(tx, context, sql`c.id = ${checkId}`, 1);
    if (!row) throw new NotFound("There is no such check in this project.");
    const stored = await tx.execute<{ snapshot: CheckSnapshot; result: CheckResult }>(sql`
      select snapshot, result from footing_check where project_id = ${context.projectId} and id = ${checkId}`);
    const [whole] = stored.rows;
    if (!whole) throw new Error("A check that was listed is not stored.");
    return { ...row, ...whole };
  });
}
