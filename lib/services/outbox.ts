import type { Transaction } from "@/db/client";
import * as t from "@/db/schema";
import type { PersonId } from "@/lib/contracts/ids";
import type { Context } from "./context";

export type Letter = {
  key: string;
  recipientId?: PersonId;
  recipient: string;
  subject: string;
  body: string;
};

/** Queues mail in the transaction that it tells of. The relay sends it after the commit, or never if there is none. */
export async function queueMail(
  tx: Transaction,
  context: Pick<Context, "projectId"> | null,
  letters: Letter[],
) {
  if (letters.length === 0) return;
  await tx
    .insert(t.outbox)
    .values(
      letters.map(({ key, ...letter }) => ({
        ...letter,
        messageKey: key,
        projectId: context?.projectId ?? null,
      })),
    )
    .onConflictDoNothing();
}
