import { eq } from "drizzle-orm";
import { client } from "@/db/client";
import * as t from "@/db/schema";
import { normalEmail } from "@/lib/contracts/email-address";
import { SignedOut } from "../errors";
import { isPassword } from "./passwords";
import type { SignedIn } from "./session-holder";
import { siteEvent } from "./site-event";
import { attemptSucceeded, beginAttempt } from "./throttle";

/** What a new session's cookie holds. */
export type NewSession = SignedIn & { sessionVersion: number; sessionId: string };

/**
 * Checks e-mail and password and opens a session. A wrong password, an absent account, a shut one and an address that
 * is none get the same answer after the same work. Refuses with `Throttled` as `throttle.ts` says.
 */
export async function signIn(given: {
  email: string;
  password: string;
  address: string;
  requestId: string;
}): Promise<NewSession> {
  const email = normalEmail(given.email);
  const attempt = await beginAttempt(email ?? "not an address", given.address);
  const [found] = await client()
    .database.select()
    .from(t.person)
    .where(eq(t.person.email, email ?? ""));
  const right = await isPassword(found?.passwordHash, given.password.slice(0, 200));
  if (!found || !right || found.disabledAt) throw new SignedOut("E-mail or password is not right.");

  await attemptSucceeded(attempt);
  const { id, name, siteAdministrator, sessionVersion } = found;
  const sessionId = await client().database.transaction(async (tx) => {
    const [session] = await tx
      .insert(t.personSession)
      .values({ personId: id, address: given.address })
      .returning({ id: t.personSession.id });
    await siteEvent(tx, given, { verb: "account:sign-in", personId: id });
    return session?.id ?? "";
  });
  return { id, name, email: found.email, siteAdministrator, sessionVersion, sessionId };
}
