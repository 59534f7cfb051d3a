import Link from "next/link";

/** Who is signed in, the way to the account, and the way out. */
export function AccountLine({ name, siteAdministrator }: { name: string; siteAdministrator: boolean }) {
  return (
    <div className="flex flex-wrap items-center gap-x-5 gap-y-1 text-sm">
      <Link href="/projects" className="underline">
        Projects
      </Link>
      <Link href="/account" className="underline">
        {name}
      </Link>
      {siteAdministrator && (
        <Link href="/people" className="underline">
          People
        </Link>
      )}
      <SignOut />
    </div>
  );
}

/** Signs out in this browser. A plain form, so that it works at any moment. */
export function SignOut() {
  return (
    <form method="post" action="/api/auth/signout">
      <input type="hidden" name="callbackUrl" value="/sign-in" />
      <button type="submit" className="underline">
        Sign out
      </button>
    </form>
  );
}
