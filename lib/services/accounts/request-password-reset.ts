import { setTimeout as pause } from "node:timers/promises";
import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { requestResetInput } from "@/lib/contracts/accounts";
import type { PersonId } from "@/lib/contracts/ids";
import { env } from "@/lib/env";
import { throughDoor } from "../context";
import { Throttled } from "../errors";
import { queueMail } from "../outbox";
import { parse } from "../parse";
import { LINK_MINUTES, makeLink } from "./one-time-link";
import { siteEvent } from "./site-event";
import type { Visitor } from "./visitor";

/** The answer leaves no sooner than this after the request, so that its time tells nothing of the account. */
const ANSWER_AFTER_MS = 400;
const MAILS_AN_HOUR = 5;
const REQUESTS_A_QUARTER_HOUR = 30;

/** Mails a link to set a new password, if the address has an open account; the answer is the same either way. */
export async function requestPasswordReset(visitor: Visitor, given: unknown): Promise<{ detail: string }> {
  const { email } = parse(requestResetInput, given);
  const answerAt = performance.now() + ANSWER_AFTER_MS;
  await throughDoor("accounts", async (tx) => {
    await assertNotTooMany(tx, visitor.address);
    const { rows } = await tx.execute<{ id: PersonId; name: string }>(sql`
      select id, name from person p where email = ${email} and disabled_at is null
        and (select count(*) from one_time_link l where l.email = p.email and l.kind = 'password-reset'
          and l.created_at > now() - interval '1 hour') < ${MAILS_AN_HOUR}`);
    const [person] = rows;
    if (!person) return;
    const { id, token } = await makeLink(tx, { kind: "password-reset", email, personId: person.id });
    await siteEvent(tx, visitor, { verb: "account:ask-reset", personId: person.id });
    await queueMail(tx, null, [
      {
        key: `password-reset/${id}`,
        recipientId: person.id,
        recipient: email,
        subject: "Set a new password for Holdground",
        body: [
          `${person.name},`,
          "",
          "somebody, probably you, asked to set a new password for this address.",
          `The link works once, within ${LINK_MINUTES["password-reset"]} minutes:`,
          "",
          `${env().APP_ORIGIN}/reset/${token}`,
          "",
          "If you did not ask for it, leave it: nothing changes.",
        ].join("\n"),
      },
    ]);
  });
  await pause(Math.max(0, answerAt - performance.now()));
  return { detail: "If this address has an account, a link to set a new password is on its way to it." };
}

async function assertNotTooMany(tx: Transaction, address: string): Promise<void> {
  const { rows } = await tx.execute<{ count: number }>(sql`
    insert into sign_in_attempt (account, address, succeeded) values ('reset', ${`reset ${address}`}, false)
    returning (select count(*)::int from sign_in_attempt
      where address = ${`reset ${address}`} and at > now() - interval '15 minutes') as count`);
  if ((rows[0]?.count ?? 0) >= REQUESTS_A_QUARTER_HOUR)
    throw new Throttled("Too many links were asked for from here. Please wait a quarter of an hour.", 900);
}
