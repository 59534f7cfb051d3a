import { randomUUID } from "node:crypto";
import { type SQL, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { ValueRevisionId } from "@/lib/contracts/ids";
import {
  footingsQuery,
  type GatheredCriteria,
  type GatheredFooting,
  gatherCriteria,
  gatherTerms,
  type ValueTerms,
} from "../checks/gather";
import type { Context } from "../context";

/** Ten thousand footings are five batches: few statements, and memory that does not grow with the site. */
const BATCH = 2000;

export type LinkedBatch = {
  footings: GatheredFooting[];
  criteria: GatheredCriteria;
  /** What a footing would be checked against now; null while its value has no revision in force. */
  termsOf: (footing: GatheredFooting) => ValueTerms | null;
};

/**
 * Footings `f` (their last check is `k`) that a condition selects, in batches, with all that a check made now would read.
 * Those without loads cannot be checked and are left out. One cursor reads them in one pass, as they stood when it was
 * opened; it is read to its end or closed with the transaction.
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
  const cursor = sql.identifier(`linked_${randomUUID()}`);
  await tx.execute(
    sql`declare ${cursor} no scroll cursor for ${footingsQuery(context, sql`l.id is not null and ${where}`)}`,
  );
  const fetch = async () => tx.execute<GatheredFooting>(sql`fetch ${sql.raw(String(BATCH))} from ${cursor}`);
  const begin = () => {
    const batch = fetch();
    // Awaited below; a caller that gives up first must not leave a rejection that nobody hears.
    batch.catch(() => {});
    return batch;
  };
  for (let batch = begin(), more = true; more; ) {
    const { rows: footings } = await batch;
    const unread = new Set<ValueRevisionId>();
    for (const { valueRevisionId } of footings)
      if (valueRevisionId && !terms.has(valueRevisionId)) unread.add(valueRevisionId);
    if (unread.size > 0)
      for (const [id, stated] of await gatherTerms(tx, context, [...unread])) terms.set(id, stated);
    more = footings.length === BATCH;
    // The server reads the next batch while this one is judged here. Never more than one statement waits behind another.
    if (more) batch = begin();
    if (footings.length > 0) yield { footings, criteria, termsOf };
  }
  await tx.execute(sql`close ${cursor}`);
}
