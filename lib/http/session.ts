import { cookies } from "next/headers";
import type { NextAuthOptions, Session } from "next-auth";
import { decode } from "next-auth/jwt";
import CredentialsProvider from "next-auth/providers/credentials";
import { cache } from "react";
import type { PersonId } from "@/lib/contracts/ids";
import { env } from "@/lib/env";
import { endSession } from "@/lib/services/accounts/end-sessions";
import { ABSOLUTE_SECONDS, type SignedIn, sessionHolder } from "@/lib/services/accounts/session-holder";
import { type NewSession, signIn } from "@/lib/services/accounts/sign-in";
import { ownPath } from "./own-address";
import { PEER_HEADER } from "./peer";

/** Sent over TLS and from this host only, unread by scripts. Browsers count loopback as safe and take them there too. */
export const SESSION_COOKIE = "__Host-holdground.session";
export const CSRF_COOKIE = "__Host-holdground.csrf";

/** What the cookie holds: ids and a version, nothing about the person. */
type Held = { personId: string; sessionVersion: number; sessionId: string };

const heldIn = (token: Record<string, unknown> | null | undefined): Held | null => {
  const { personId, sessionVersion, sessionId } = token ?? {};
  if (typeof personId !== "string" || typeof sessionVersion !== "number" || typeof sessionId !== "string")
    return null;
  return { personId, sessionVersion, sessionId };
};

/**
 * next-auth's settings: e-mail and password, an encrypted cookie. How long a session lasts is decided in the database,
 * at each request. `refused` hears why a sign-in was refused, which next-auth itself keeps to a word.
 */
export function authOptions(requestId = "", refused: (error: unknown) => void = () => {}): NextAuthOptions {
  const options = { httpOnly: true, sameSite: "lax" as const, path: "/", secure: true };
  return {
    secret: env().NEXTAUTH_SECRET,
    session: { strategy: "jwt", maxAge: ABSOLUTE_SECONDS },
    pages: { signIn: "/sign-in", signOut: "/sign-in", error: "/sign-in", verifyRequest: "/sign-in" },
    cookies: {
      sessionToken: { name: SESSION_COOKIE, options },
      csrfToken: { name: CSRF_COOKIE, options },
      callbackUrl: { name: "__Host-holdground.callback", options },
    },
    providers: [
      CredentialsProvider({
        name: "E-mail and password",
        credentials: { email: { type: "email" }, password: { type: "password" } },
        authorize: async (given, request) => {
          try {
            return await signIn({
              email: String(given?.email ?? ""),
              password: String(given?.password ?? ""),
              address: String(request.headers?.[PEER_HEADER] ?? "unknown"),
              requestId,
            });
          } catch (error) {
            refused(error);
            return null;
          }
        },
      }),
    ],
    callbacks: {
      jwt: async ({ token, user }) => {
        if (!user) return token;
        const { id, sessionVersion, sessionId } = user as NewSession;
        return { personId: id, sessionVersion, sessionId } satisfies Held;
      },
      // An ended session reads as nobody, whatever its cookie says.
      session: async ({ session, token }) => {
        const held = heldIn(token);
        const holder = held && (await sessionHolder(held));
        return (
          holder ? { expires: session.expires, user: { name: holder.name, email: holder.email } } : {}
        ) as Session;
      },
      redirect: async ({ url, baseUrl }) => new URL(ownPath(url, baseUrl), baseUrl).href,
    },
    events: {
      signOut: async ({ token }) => {
        const held = heldIn(token);
        if (held) await endSession(held.sessionId, held.personId as PersonId, requestId);
      },
    },
    logger: { error: () => {}, warn: () => {}, debug: () => {} },
  };
}

/** What the cookie of this request says; null when there is none or it was not made by this server. */
async function heldByRequest(): Promise<Held | null> {
  const cookie = (await cookies()).get(SESSION_COOKIE)?.value;
  if (!cookie) return null;
  const token = await decode({ token: cookie, secret: env().NEXTAUTH_SECRET }).catch(() => null);
  return heldIn(token);
}

/** The session behind this request and its person, read from the database each time; null when it has ended. */
export const currentSession = cache(async (): Promise<{ person: SignedIn; sessionId: string } | null> => {
  const held = await heldByRequest();
  const person = held && (await sessionHolder(held));
  return person ? { person, sessionId: held.sessionId } : null;
});

/** The person behind this request; null when nobody is signed in or the session has ended. */
export const currentPerson = async (): Promise<SignedIn | null> => (await currentSession())?.person ?? null;

/** A question that can be asked again later: is this request's session still open? Asking does not count as use. */
export async function sessionWatch(): Promise<() => Promise<boolean>> {
  const held = await heldByRequest();
  return async () => held !== null && (await sessionHolder(held, false)) !== null;
}
