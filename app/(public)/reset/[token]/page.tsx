import type { Metadata } from "next";
import Link from "next/link";
import { AccountForm } from "@/components/account/account-form";
import { Notice } from "@/components/account/notice";
import { PublicSheet } from "@/components/account/public-sheet";
import { PASSWORD_MIN } from "@/lib/contracts/accounts";
import { isResetOpen } from "@/lib/services/accounts/reset-password";

export const metadata: Metadata = { title: "Set a new password · Holdground", robots: { index: false } };

type Props = { params: Promise<{ token: string }>; searchParams: Promise<{ refused?: string }> };

/** Sets a new password with the link from the mail. Opening the page does not use the link up. */
export default async function ResetPage({ params, searchParams }: Props) {
  const { token } = await params;
  const { refused } = await searchParams;
  if (!(await isResetOpen(token)))
    return (
      <PublicSheet title="This link cannot be used">
        <p className="mt-4">It has been used already or is older than ten minutes.</p>
        <p className="mt-4">
          <Link href="/reset" className="underline">
            Ask for a new link
          </Link>
        </p>
      </PublicSheet>
    );
  return (
    <PublicSheet title="Set a new password">
      {refused && (
        <Notice kind="refused">
          This password was not taken: at least {PASSWORD_MIN} characters, and none of the usual ones.
        </Notice>
      )}
      <AccountForm
        action="/api/account/password-resets/use"
        submit="Set the password"
        hidden={{ token }}
        afterwards={{ kind: "go", to: "/sign-in?done=reset" }}
        fields={[
          {
            name: "password",
            label: "New password",
            type: "password",
            autoComplete: "new-password",
            minLength: PASSWORD_MIN,
            maxLength: 200,
            hint: `At least ${PASSWORD_MIN} characters. Several words are stronger than odd signs.`,
          },
        ]}
      />
    </PublicSheet>
  );
}
