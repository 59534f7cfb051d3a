import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { AccountLine } from "@/components/account/account-line";
import { PeopleList } from "@/components/account/people-list";
import { pageVisitor } from "@/lib/http/page";
import { findPeople } from "@/lib/services/accounts/people";

export const metadata: Metadata = { title: "People · Holdground" };

/** Everybody with an account, for the site administrator: found by name or address, shut and opened. */
export default async function PeoplePage({
  searchParams,
}: {
  searchParams: Promise<{ search?: string | string[] }>;
}) {
  const visitor = await pageVisitor("/people");
  if (!visitor.person.siteAdministrator) notFound();
  const given = (await searchParams).search;
  const search = typeof given === "string" ? given.slice(0, 120) : "";
  const { people } = await findPeople(visitor, { search });
  return (
    <main className="mx-auto max-w-4xl p-6">
      <AccountLine name={visitor.person.name} siteAdministrator />
      <h1 className="mt-6 text-xl">People</h1>
      <search>
        <form className="mt-4 flex gap-3">
          <input
            type="search"
            name="search"
            aria-label="Name or address"
            defaultValue={search}
            className="border border-rule bg-sheet px-2 py-1.5"
          />
          <button type="submit" className="border border-rule px-3 py-1.5">
            Search
          </button>
        </form>
      </search>
      <PeopleList people={people} ownId={visitor.person.id} />
    </main>
  );
}
