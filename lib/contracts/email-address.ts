// Without the signs by which old mail servers route a message on: ! % / | and their like.
const LOCAL = /^[a-z0-9#$&'*+=?^_~-]+(\.[a-z0-9#$&'*+=?^_~-]+)*$/;
const DOMAIN = /^([a-z0-9]([a-z0-9-]{0,61}[a-z0-9])?\.)+[a-z][a-z0-9-]{0,61}[a-z0-9]$/;

/**
 * The one form in which an address is kept, compared and written to: NFKC, lower case, plain ASCII. Null for anything
 * that a mail server could read as another address or as two: quotes, commas, comments, line breaks, a second @ in any
 * script. A domain with other letters is written in its xn-- form.
 */
export function normalEmail(typed: string): string | null {
  if (typed.length > 320 || /[\p{Cc}\p{Cf}\p{Zl}\p{Zp}]/u.test(typed)) return null;
  const trimmed = typed.replace(/^ +| +$/g, "");
  const email = trimmed.normalize("NFKC").toLowerCase();
  // The @ must have been an @ before the normal form, and the only one.
  if (trimmed.split("@").length !== 2 || email.split("@").length !== 2) return null;
  const [local = "", domain = ""] = email.split("@");
  if (local.length > 64 || email.length > 254) return null;
  return LOCAL.test(local) && DOMAIN.test(domain) ? email : null;
}
