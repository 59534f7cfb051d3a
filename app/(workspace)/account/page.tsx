import type { Metadata } from "next";
import { AccountForm } from "@/components/account/account-form";
import { AccountLine } from "@/components/account/account-line";
import { PASSWORD_MIN } from "@/lib/contracts/accounts";
import { pageVisitor } from "@/lib/http/page";
import { ownAccount } from "@/lib/services/accounts/own-account";

export const metadata: Metadata = { title: "Your account · Holdground" };

/** The own name and qualification, the password, and the way out of every device. */
export default async function AccountPage() {
  const visitor = await pageVisitor("/account");
  const account = await ownAccount(visitor);
  return (
    <main className="mx-auto max-w-4xl p-6">
      <AccountLine name={account.name} siteAdministrator={account.siteAdministrator} />
      <h1 className="mt-6 text-xl">Your account</h1>
      <p className="mt-1 text-ink-2">{account.email}</p>
      <section aria-labelledby="who" className="mt-6">
        <h2 id="who" className="text-lg">
          How you sign
        </h2>
        <AccountForm
          action="/api/account"
          method="PATCH"
          submit="Save"
          afterwards={{ kind: "go", to: "/account" }}
          fields={[
            { name: "name", label: "Name", autoComplete: "name", maxLength: 120, defaultValue: account.name },
            {
              name: "qualification",
              label: "Qualification and licence",
              maxLength: 200,
              defaultValue: account.qualification,
              optional: true,
              hint: "As it is to stand under what you check and issue.",
            },
          ]}
        />
      </section>
      <section aria-labelledby="password-title" className="mt-8">
        <h2 id="password-title" className="text-lg">
          Password
        </h2>
        <AccountForm
          action="/api/account/password"
          submit="Change the password"
          afterwards={{
            kind: "say",
            sentence: "The password is changed. You are signed out on every other device.",
          }}
          fields={[
            {
              name: "currentPassword",
              label: "Current password",
              type: "password",
              autoComplete: "current-password",
              maxLength: 200,
            },
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
      </section>
      <section aria-labelledby="devices" className="mt-8">
        <h2 id="devices" className="text-lg">
          Other devices
        </h2>
        <AccountForm
          action="/api/account/sessions/end"
          submit="Sign out on every device"
          afterwards={{ kind: "go", to: "/sign-in?done=everywhere" }}
          fields={[]}
        />
      </section>
    </main>
  );
}
