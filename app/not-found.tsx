import type { Metadata } from "next";
import Link from "next/link";
import { PublicSheet } from "@/components/account/public-sheet";

export const metadata: Metadata = { title: "Not here · Holdground" };

/** What stands at an address where there is nothing, or nothing for this person: the two are not told apart. */
export default function NotFoundPage() {
  return (
    <PublicSheet title="There is nothing at this address">
      <p className="mt-4">
        It may have been mistyped, or it belongs to a project that you are not a member of.
      </p>
      <p className="mt-4">
        <Link href="/projects" className="underline">
          To your projects
        </Link>
      </p>
    </PublicSheet>
  );
}
