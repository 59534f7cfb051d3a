import { eq } from "drizzle-orm";
import { client } from "@/db/client";
import * as t from "@/db/schema";
import { changePasswordInput } from "@/lib/contracts/accounts";
import { Invalid } from "../errors";
import { parse } from "../parse";
import { endOpenSessions } from "./end-sessions";
import { hashPassword, isPassword } from "./passwords";
import { siteEvent } from "./site-event";
import { attemptSucceeded, beginAttempt } from "./throttle";
import { signedIn, type Visitor } from "./visitor";

/** Changes the own password, asked for once more; every other session of the person ends, this one stays. */
export async function changePassword(visitor: Visitor, given: unknown): Promise<{ changed: true }> {
  const person = signedIn(visitor);
  const { currentPassword, password } = parse(changePasswordInput, given);
  const attempt = await beginAttempt(person.email, visitor.address);
  const [found] = await client().database.select().from(t.person).where(eq(t.person.id, person.id));
  if (!(await isPassword(found?.passwordHash, currentPassword)))
    throw new Invalid("One field needs another look.", {
      currentPassword: "This is not the current password.",
    });
  if (password === currentPassword)
    throw new Invalid("One field needs another look.", {
      password: "This is the password that you have now.",
    });
  await attemptSucceeded(attempt);
  const passwordHash = await hashPassword(password);
  await client().database.transaction(async (tx) => {
    await tx.update(t.person).set({ passwordHash }).where(eq(t.person.id, person.id));
    await endOpenSessions(tx, person.id, visitor.sessionId ?? undefined);
    await siteEvent(tx, visitor, { verb: "account:change-password", personId: person.id });
  });
  return { changed: true };
}
