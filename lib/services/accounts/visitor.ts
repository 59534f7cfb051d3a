import { Forbidden, SignedOut } from "../errors";
import type { SignedIn } from "./session-holder";

/** Who asks outside any project: perhaps nobody yet. Made once at the edge. */
export type Visitor = {
  person: SignedIn | null;
  sessionId: string | null;
  address: string;
  requestId: string;
};

/** The signed-in person, or a refusal. */
export function signedIn(visitor: Visitor): SignedIn {
  if (!visitor.person)
    throw new SignedOut("Please sign in; nobody is signed in here or the session has ended.");
  return visitor.person;
}

/** The signed-in site administrator, or a refusal. */
export function siteAdministrator(visitor: Visitor): SignedIn {
  const person = signedIn(visitor);
  if (!person.siteAdministrator) throw new Forbidden("Only a site administrator may do this.");
  return person;
}
