import type { Transaction } from "@/db/client";
import * as t from "@/db/schema";
import type { PersonId } from "@/lib/contracts/ids";
import type { Visitor } from "./visitor";

/** Writes down what happens to accounts, outside any project, in the transaction that does it. */
export async function siteEvent(
  tx: Transaction,
  visitor: Pick<Visitor, "address" | "requestId">,
  event: { verb: string; personId: PersonId | null; detail?: Record<string, unknown> },
): Promise<void> {
  await tx.insert(t.siteEvent).values({
    personId: event.personId,
    verb: event.verb,
    detail: JSON.stringify({ address: visitor.address, ...event.detail }),
    requestId: visitor.requestId,
  });
}
