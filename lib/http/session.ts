import type { NextAuthOptions, Session } from "next-auth";
import { getServerSession } from "next-auth";
import CredentialsProvider from "next-auth/providers/credentials";
import { cache } from "react";
import { env } from "@/lib/env";
import { type SignedIn, sessionHolder } from "@/lib/services/accounts/session-holder";
import { signIn } from "@/lib/services/accounts/sign-in";

/** A session ends after this long without a request, and in any case after the second. */
const IDLE_SECONDS = 8 * 3600;
const ABSOLUTE_SECONDS = 24 * 3600;

type HeldSession = Session & { personId?: string; sessionVersion?: number; signedInAt?: number };

/** next-auth's settings: e-mail and password, a signed cookie that holds an id and a session version and nothing else. */
export function authOptions(): NextAuthOptions {
  const secure = { httpOnly: true, sameSite: "lax" as const, path: "/", secure: true };
  return {
    secret: env().NEXTAUTH_SECRET,
    session: { strategy: "jwt", maxAge: IDLE_SECONDS, updateAge: 300 },
    pages: { signIn: "/sign-in", error: "/sign-in" },
    cookies: {
      sessionToken: { name: "__Host-holdground.session", options: secure },
      csrfToken: { name: "__Host-holdground.csrf", options: secure },
      callbackUrl: { name: "__Host-holdground.callback", options: secure },
    },
    providers: [
      CredentialsProvider({
        name: "E-mail and password",
        credentials: { email: { type: "email" }, password: { type: "password" } },
        authorize: async (given, request) => {
          const forwarded = request.headers?.["x-forwarded-for"];
          const address = typeof forwarded === "string" ? (forwarded.split(",").pop()?.trim() ?? "") : "";
          const person = await signIn({
            email: given?.email ?? "",
            password: given?.password ?? "",
            address: address || "unknown",
          });
          return { id: person.id, name: person.name, email: person.email, sessionVersion: person.sessionVersion };
        },
      }),
    ],
    callbacks: {
      jwt: async ({ token, user }) => {
        if (user) {
          const { id, sessionVersion } = user as { id: string; sessionVersion?: number };
          return { personId: id, sessionVersion, signedInAt: Math.floor(Date.now() / 1000) };
        }
        return token;
      },
      session: async ({ session, token }) => {
        const holder = await holderOf(token as Partial<Record<"personId" | "sessionVersion" | "signedInAt", unknown>>);
        if (!holder) return { expires: session.expires } as HeldSession;
        const held = token as { personId: string; sessionVersion: number; signedInAt: number };
        return {
          expires: session.expires,
          user: { name: holder.name, email: holder.email },
          personId: held.personId,
          sessionVersion: held.sessionVersion,
          signedInAt: held.signedInAt,
        } as HeldSession;
      },
      // Only addresses of this site; anything else ends at the start page.
      redirect: async ({ url, baseUrl }) => {
        try {
          const wanted = new URL(url, baseUrl);
          return wanted.origin === new URL(baseUrl).origin && !/[\\\r\n]/.test(url) ? wanted.href : baseUrl;
        } catch {
          return baseUrl;
        }
      },
    },
  };
}

async function holderOf(token: Partial<Record<"personId" | "sessionVersion" | "signedInAt", unknown>>) {
  const { personId, sessionVersion, signedInAt } = token;
  if (typeof personId !== "string" || typeof sessionVersion !== "number" || typeof signedInAt !== "number") return null;
  if (Date.now() / 1000 - signedInAt > ABSOLUTE_SECONDS) return null;
  return sessionHolder(personId, sessionVersion);
}

/** The person behind this request, read from the database each time; null when the session has ended. */
export const currentPerson = cache(async (): Promise<SignedIn | null> => {
  const session = (await getServerSession(authOptions())) as HeldSession | null;
  if (!session?.personId || session.sessionVersion === undefined) return null;
  return sessionHolder(session.personId, session.sessionVersion);
});
