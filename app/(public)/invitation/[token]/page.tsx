import type { Metadata } from "next";
import Link from "next/link";
import { AccountForm, type FieldOfForm } from "@/components/account/account-form";
import { Notice } from "@/components/account/notice";
import { PublicSheet } from "@/components/account/public-sheet";
import { type Role, roleTitles } from "@/lib/access/policy";
import { PASSWORD_MIN } from "@/lib/contracts/accounts";
import { currentPerson } from "@/lib/http/session";
import { readInvitation } from "@/lib/services/accounts/invitation";
import { Refusal } from "@/lib/services/errors";

export const metadata: Metadata = { title: "Invitation · Holdground", robots: { index: false } };

type Props = { params: Promise<{ token: string }>; searchParams: Promise<{ refused?: string }> };

const newAccount: FieldOfForm[] = [
  {
    name: "name",
    label: "Your name, as it stands under what you check and issue",
    autoComplete: "name",
    maxLength: 120,
  },
  {
    name: "password",
    label: "A password",
    type: "password",
    autoComplete: "new-password",
    minLength: PASSWORD_MIN,
    maxLength: 200,
    hint: `At least ${PASSWORD_MIN} characters. Several words are stronger than odd signs.`,
  },
];

/** Shows an invitation and takes its acceptance. Opening the page does not use the link up. */
export default async function InvitationPage({ params, searchParams }: Props) {
  const { token } = await params;
  const { refused } = await searchParams;
  const invitation = await readInvitation(token).catch((error) => {
    if (error instanceof Refusal) return null;
    throw error;
  });
  if (!invitation)
    return (
      <PublicSheet title="This invitation cannot be used">
        <p className="mt-4">
          It has been used already, was withdrawn, or is older than seven days. Please ask the project lead
          for a new one.
        </p>
      </PublicSheet>
    );
  const person = await currentPerson();
  const { email, project, roles, needsAccount, projectId } = invitation;
  const isForPerson = person?.email === email;
  return (
    <PublicSheet title={`Invitation to ${project}`}>
      <p className="mt-4">
        For {email}, as {roles.map((role) => roleTitles[role as Role].toLowerCase()).join(", ")}.
      </p>
      {refused && <Notice kind="refused">That was not taken. Please look at name and password again.</Notice>}
      {needsAccount ? (
        <AccountForm
          action="/api/account/invitations"
          submit="Make the account and join"
          hidden={{ token }}
          fields={newAccount}
          afterwards={{ kind: "sign-in", email, to: `/projects/${projectId}` }}
        />
      ) : isForPerson ? (
        <AccountForm
          action="/api/account/invitations"
          submit="Join the project"
          hidden={{ token }}
          fields={[]}
          afterwards={{ kind: "go", to: `/projects/${projectId}` }}
        />
      ) : (
        <p className="mt-4">
          {person
            ? `You are signed in as ${person.email}. Please sign out, and sign in as ${email}. `
            : `Please sign in as ${email} first. `}
          {!person && (
            <Link
              href={`/sign-in?callbackUrl=${encodeURIComponent(`/invitation/${token}`)}`}
              className="underline"
            >
              Sign in
            </Link>
          )}
        </p>
      )}
      {person && !isForPerson && (
        <form method="post" action="/api/auth/signout" className="mt-4">
          <input type="hidden" name="callbackUrl" value={`/invitation/${token}`} />
          <button type="submit" className="underline">
            Sign out
          </button>
        </form>
      )}
    </PublicSheet>
  );
}
