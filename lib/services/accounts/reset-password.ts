import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { resetPasswordInput } from "@/lib/contracts/accounts";
import { throughDoor } from "../context";
import { Invalid, Refusal } from "../errors";
import { parse } from "../parse";
import { endEverySession } from "./end-sessions";
import { readLink, takeLink } from "./one-time-link";
import { hashPassword } from "./passwords";
import { siteEvent } from "./site-event";
import type { Visitor } from "./visitor";

/** Whether a link from a reset mail can still be used. Looking does not use it up. */
export async function isResetOpen(token: string): Promise<boolean> {
  try {
    await throughDoor("accounts", (tx) => readLink(tx, "password-reset", token));
    return true;
  } catch (error) {
    if (error instanceof Refusal) return false;
    throw error;
  }
}

/** Sets a new password with the link from the mail, and ends every session of the person. */
export async function resetPassword(visitor: Visitor, given: unknown): Promise<{ email: string }> {
  const { token, password } = parse(resetPasswordInput, given);
  return throughDoor("accounts", async (tx) => {
    const link = await takeLink(tx, "password-reset", token);
    const passwordHash = await hashPassword(password);
    const changed = await tx.execute(sql`
      update person set password_hash = ${passwordHash} where id = ${link.person_id} and disabled_at is null`);
    if (changed.rowCount !== 1 || !link.person_id) throw new Invalid("This account is shut.");
    await endEverySession(tx, link.person_id);
    // Whoever holds the mailbox is the rightful person: others' guessing does not slow them at this place from now on.
    await tx.execute(sql`insert into sign_in_attempt (account, address, succeeded)
      values (${link.email}, ${visitor.address}, true)`);
    await withdrawOtherLinks(tx, link.email);
    await siteEvent(tx, visitor, { verb: "account:reset-password", personId: link.person_id });
    return { email: link.email };
  });
}

/** Other reset links for the address end with the password that they would have replaced. */
async function withdrawOtherLinks(tx: Transaction, email: string): Promise<void> {
  await tx.execute(sql`
    update one_time_link set used_at = now()
    where email = ${email} and kind = 'password-reset' and used_at is null`);
}
