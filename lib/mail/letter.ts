import { createHash } from "node:crypto";
import { normalEmail } from "@/lib/contracts/email-address";

/** A row of the outbox on its way. */
export type Waiting = {
  id: string;
  projectId: string | null;
  messageKey: string;
  recipientId: string | null;
  recipient: string;
  subject: string;
  body: string;
  attempts: number;
};

/** What is handed to the mail server: one envelope of one recipient, and headers on one line each. */
export type Letter = {
  from: string;
  to: { name: string; address: string };
  envelope: { from: string; to: string };
  subject: string;
  text: string;
  messageId: string;
  headers: Record<string, string>;
};

/** The address within "Name <address>", or the whole when there are no brackets. */
export const bareAddress = (from: string): string => /<([^<>]+)>\s*$/.exec(from)?.[1] ?? from.trim();

/**
 * Makes the letter of a row. Its Message-ID stands on the message key, so that a letter sent twice is known as one. Null
 * when the recipient is no address in the form in which addresses are kept: nothing is sent on a guess.
 */
export function letterOf(row: Waiting, from: string): Letter | null {
  const address = normalEmail(row.recipient);
  if (address === null || address !== row.recipient) return null;
  const sender = bareAddress(from);
  const domain = sender.split("@").at(-1) || "localhost";
  const key = createHash("sha256").update(row.messageKey).digest("hex").slice(0, 40);
  return {
    from,
    to: { name: "", address },
    envelope: { from: sender, to: address },
    subject: row.subject
      .replace(/[\s\p{Cc}]+/gu, " ")
      .trim()
      .slice(0, 250),
    text: row.body,
    messageId: `<${key}@${domain}>`,
    headers: { "Auto-Submitted": "auto-generated", "X-Auto-Response-Suppress": "All" },
  };
}
