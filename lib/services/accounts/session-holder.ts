import { and, eq, isNull } from "drizzle-orm";
import { client } from "@/db/client";
import * as t from "@/db/schema";
import type { PersonId } from "@/lib/contracts/ids";

export type SignedIn = { id: PersonId; name: string; email: string; siteAdministrator: boolean };

/** The person of a session if the account is open and the session has not been ended since; else null. */
export async function sessionHolder(personId: string, sessionVersion: number): Promise<SignedIn | null> {
  const [found] = await client()
    .database.select({
      id: t.person.id,
      name: t.person.name,
      email: t.person.email,
      siteAdministrator: t.person.siteAdministrator,
    })
    .from(t.person)
    .where(
      and(
        eq(t.person.id, personId as PersonId),
        eq(t.person.sessionVersion, sessionVersion),
        isNull(t.person.disabledAt),
      ),
    );
  return found ?? null;
}
