import { and, eq, isNull, ne, sql } from "drizzle-orm";
import { client, type Transaction } from "@/db/client";
import * as t from "@/db/schema";
import type { PersonId } from "@/lib/contracts/ids";
import { siteEvent } from "./site-event";
import { signedIn, type Visitor } from "./visitor";

/** Ends one session: its cookie is worth nothing from the next request on. */
export async function endSession(sessionId: string, personId: PersonId, requestId: string): Promise<void> {
  await client().database.transaction(async (tx) => {
    const ended = await tx
      .update(t.personSession)
      .set({ endedAt: sql`now()` })
      .where(
        and(
          eq(t.personSession.id, sessionId),
          eq(t.personSession.personId, personId),
          isNull(t.personSession.endedAt),
        ),
      )
      .returning({ address: t.personSession.address });
    const [session] = ended;
    if (session)
      await siteEvent(tx, { address: session.address, requestId }, { verb: "account:sign-out", personId });
  });
}

/** Ends the open sessions of a person, all or all but one. */
export async function endOpenSessions(tx: Transaction, personId: PersonId, except?: string): Promise<void> {
  await tx
    .update(t.personSession)
    .set({ endedAt: sql`now()` })
    .where(
      and(
        eq(t.personSession.personId, personId),
        isNull(t.personSession.endedAt),
        except ? ne(t.personSession.id, except) : undefined,
      ),
    );
}

/** Raises the session version, which ends every cookie ever given out for this person, and closes the sessions. */
export async function endEverySession(tx: Transaction, personId: PersonId): Promise<void> {
  await tx
    .update(t.person)
    .set({ sessionVersion: sql`session_version + 1` })
    .where(eq(t.person.id, personId));
  await endOpenSessions(tx, personId);
}

/** Signs the person out on every device, this one included. */
export async function signOutEverywhere(visitor: Visitor): Promise<{ ended: true }> {
  const person = signedIn(visitor);
  await client().database.transaction(async (tx) => {
    await endEverySession(tx, person.id);
    await siteEvent(tx, visitor, { verb: "account:sign-out-everywhere", personId: person.id });
  });
  return { ended: true };
}
