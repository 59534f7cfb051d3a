import { eq } from "drizzle-orm";
import { client } from "@/db/client";
import * as t from "@/db/schema";
import { type Account, changeAccountInput } from "@/lib/contracts/accounts";
import { NotFound } from "../errors";
import { parse } from "../parse";
import { siteEvent } from "./site-event";
import { signedIn, type Visitor } from "./visitor";

/** What the account says of the signed-in person. */
export async function ownAccount(visitor: Visitor): Promise<Account> {
  const { id } = signedIn(visitor);
  const [found] = await client()
    .database.select({
      id: t.person.id,
      name: t.person.name,
      email: t.person.email,
      qualification: t.person.qualification,
      siteAdministrator: t.person.siteAdministrator,
    })
    .from(t.person)
    .where(eq(t.person.id, id));
  if (!found) throw new NotFound("There is no such account.");
  return found;
}

/** Changes the person's name and qualification, as they stand beside what is prepared, checked and issued. */
export async function changeAccount(visitor: Visitor, given: unknown): Promise<Account> {
  const person = signedIn(visitor);
  const after = parse(changeAccountInput, given);
  const before = await ownAccount(visitor);
  await client().database.transaction(async (tx) => {
    await tx.update(t.person).set(after).where(eq(t.person.id, person.id));
    await siteEvent(tx, visitor, {
      verb: "account:change",
      personId: person.id,
      detail: { before: { name: before.name, qualification: before.qualification }, after },
    });
  });
  return { ...before, ...after };
}
