import { verify } from "@node-rs/argon2";
import { eq } from "drizzle-orm";
import { client } from "@/db/client";
import * as t from "@/db/schema";
import { SignedOut } from "../errors";
import type { SignedIn } from "./session-holder";

/** A hash of nothing anybody knows: verified against when the account does not exist, so that both take as long. */
const NOBODY =
  "$argon2id$v=19$m=19456,t=2,p=1$c29tZXNhbHRzb21lc2FsdA$Zk1p0kVnWl3y8sVwC6nT6mXo2cJ0yq2eYd6m1m3b3kE";

/** Checks e-mail and password; the answer to a wrong one does not tell which of the two was wrong. */
export async function signIn(given: {
  email: string;
  password: string;
  address: string;
}): Promise<SignedIn & { sessionVersion: number }> {
  const email = given.email.trim().toLowerCase().normalize("NFKC");
  const [found] = await client().database.select().from(t.person).where(eq(t.person.email, email));
  const good = await verify(found?.passwordHash ?? NOBODY, given.password).catch(() => false);
  if (!found || !good || found.disabledAt) throw new SignedOut("E-mail or password is not right.");
  const { id, name, siteAdministrator, sessionVersion } = found;
  return { id, name, email: found.email, siteAdministrator, sessionVersion };
}
