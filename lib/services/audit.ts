import type { Transaction } from "@/db/client";
import * as t from "@/db/schema";
import type { Context } from "./context";

/**
 * Writes down what is being done, in the transaction that does it. `subject` names the row ("footing/…"); `detail`
 * holds before, after and reason. Call it last: it holds the project's audit lock until commit.
 */
export async function audit(
  tx: Transaction,
  context: Context,
  event: { verb: string; subject: string; detail?: Record<string, unknown> },
): Promise<void> {
  await tx.insert(t.auditEvent).values({
    projectId: context.projectId,
    // The trigger fills seq, at and the hashes; these stand in for not-null columns.
    seq: 0,
    at: new Date(0),
    previousHash: "",
    hash: "",
    actorId: context.person.id,
    roles: context.roles.join("+"),
    verb: event.verb,
    subject: event.subject,
    detail: JSON.stringify(event.detail ?? {}),
    requestId: context.requestId,
  });
}
