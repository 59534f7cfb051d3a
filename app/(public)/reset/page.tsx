import type { Metadata } from "next";
import Link from "next/link";
import { AccountForm } from "@/components/account/account-form";
import { Notice } from "@/components/account/notice";
import { PublicSheet } from "@/components/account/public-sheet";

export const metadata: Metadata = { title: "Set a new password · Holdground" };

const SENT =
  "If this address has an account, a link to set a new password is on its way to it. It works for ten minutes.";

/** Asks for a link to set a new password. */
export default async function AskResetPage({
  searchParams,
}: {
  searchParams: Promise<{ sent?: string; refused?: string }>;
}) {
  const { sent, refused } = await searchParams;
  return (
    <PublicSheet title="Set a new password">
      {sent && <Notice kind="done">{SENT}</Notice>}
      {refused && (
        <Notice kind="refused">That did not work. Please look at the address, or wait a while.</Notice>
      )}
      <AccountForm
        action="/api/account/password-resets"
        submit="Send the link"
        afterwards={{ kind: "say", sentence: SENT }}
        fields={[{ name: "email", label: "E-mail", type: "email", autoComplete: "username", maxLength: 254 }]}
      />
      <p className="mt-6 text-sm">
        <Link href="/sign-in" className="underline">
          Back to sign in
        </Link>
      </p>
    </PublicSheet>
  );
}
