import { type SQL, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { ValueRevisionId } from "@/lib/contracts/ids";
import {
  type GatheredCriteria,
  type GatheredFooting,
  gatherCriteria,
  gatherFootings,
  gatherTerms,
  type ValueTerms,
} from "../checks/gather";
import type { Context } from "../context";

/** Ten thousand footings are four batches: few statements, and memory that does not grow with the site. */
const BATCH = 2500;

export type LinkedBatch = {
  footings: GatheredFooting[];
  criteria: GatheredCriteria;
  /** What a footing would be checked against now; null while its value has no revision in force. */
  termsOf: (footing: GatheredFooting) => ValueTerms | null;
};

/**
 * Footings `f` (their last check is `k`) that a condition selects, in batches, with all that a check made now would read.
 * Those without loads cannot be checked and are left out.
 */
export async function* gatherLinked(
  tx: Transaction,
  context: Context,
  where: SQL,
): AsyncGenerator<LinkedBatch> {
  const criteria = await gatherCriteria(tx, context);
  const terms = new Map<ValueRevisionId, ValueTerms>();
  const termsOf = ({ valueRevisionId }: GatheredFooting) =>
    (valueRevisionId && terms.get(valueRevisionId)) || null;
  let after = "00000000-0000-0000-0000-000000000000";
  for (;;) {
    const which = sql`f.id > ${after}::uuid and l.id is not null and ${where}`;
    const footings = await gatherFootings(tx, context, which, BATCH);
    const unread = new Set<ValueRevisionId>();
    for (const { valueRevisionId } of footings)
      if (valueRevisionId && !terms.has(valueRevisionId)) unread.add(valueRevisionId);
    if (unread.size > 0)
      for (const [id, stated] of await gatherTerms(tx, context, [...unread])) terms.set(id, stated);
    if (footings.length > 0) yield { footings, criteria, termsOf };
    const last = footings.at(-1);
    if (footings.length < BATCH || !last) return;
    after = last.id;
  }
}
