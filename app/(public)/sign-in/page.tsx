import type { Metadata } from "next";
import Link from "next/link";
import { redirect } from "next/navigation";
import { AccountForm } from "@/components/account/account-form";
import { Notice } from "@/components/account/notice";
import { PublicSheet } from "@/components/account/public-sheet";
import { ownPath } from "@/lib/http/own-address";
import { siteOrigin } from "@/lib/http/page";
import { currentPerson } from "@/lib/http/session";

export const metadata: Metadata = { title: "Sign in · Holdground" };

const done: Record<string, string> = {
  reset: "The new password is set. Please sign in with it.",
  joined: "You are in the project. Please sign in.",
  everywhere: "You are signed out on every device.",
};

type Query = Partial<Record<"callbackUrl" | "refused" | "wait" | "done" | "error", string | string[]>>;
const one = (given: string | string[] | undefined): string =>
  Array.isArray(given) ? (given[0] ?? "") : (given ?? "");

/** Sign in with e-mail and password, then back to the page that was asked for. */
export default async function SignInPage({ searchParams }: { searchParams: Promise<Query> }) {
  const query = await searchParams;
  const callbackUrl = ownPath(one(query.callbackUrl), siteOrigin());
  if (await currentPerson()) redirect(callbackUrl === "/" ? "/projects" : callbackUrl);
  return (
    <PublicSheet title="Sign in">
      {done[one(query.done)] && <Notice kind="done">{done[one(query.done)]}</Notice>}
      {(one(query.refused) || one(query.error)) && (
        <Notice kind="refused">{whyRefused(one(query.refused), one(query.wait))}</Notice>
      )}
      <AccountForm
        action="/api/auth/callback/credentials"
        submit="Sign in"
        hidden={{ callbackUrl: callbackUrl === "/" ? "/projects" : callbackUrl }}
        afterwards={{ kind: "enter" }}
        fields={[
          { name: "email", label: "E-mail", type: "email", autoComplete: "username", maxLength: 254 },
          {
            name: "password",
            label: "Password",
            type: "password",
            autoComplete: "current-password",
            maxLength: 200,
          },
        ]}
      />
      <p className="mt-6 text-sm">
        <Link href="/reset" className="underline">
          Set a new password
        </Link>
      </p>
    </PublicSheet>
  );
}

function whyRefused(code: string, wait: string): string {
  if (code === "throttled")
    return `Too many attempts. Please wait ${/^\d{1,4}$/.test(wait) ? wait : "60"} seconds and try again.`;
  if (code === "signed-out") return "E-mail or password is not right.";
  return "That did not work. Please try again.";
}
