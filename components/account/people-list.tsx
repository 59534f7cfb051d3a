"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { send } from "@/lib/client/send";
import type { PersonRow } from "@/lib/contracts/accounts";
import { Notice } from "./notice";

/** People with the state of their accounts, and the act that changes it. */
export function PeopleList({ people, ownId }: { people: PersonRow[]; ownId: string }) {
  const router = useRouter();
  const [problem, setProblem] = useState("");
  const setOpen = async (person: PersonRow, open: boolean) => {
    const answer = await send(`/api/people/${person.id}`, "PATCH", { open });
    setProblem(answer.done ? "" : answer.refused.detail);
    if (answer.done) router.refresh();
  };
  if (people.length === 0) return <p className="mt-4 text-ink-2">Nobody matches.</p>;
  return (
    <>
      {problem && <Notice kind="refused">{problem}</Notice>}
      <ul className="mt-4 divide-y divide-rule border-y border-rule">
        {people.map((person) => (
          <li key={person.id} className="flex flex-wrap items-center gap-x-6 gap-y-1 py-2">
            <span className="min-w-64">
              {person.name}
              <span className="block text-sm text-ink-2">{person.email}</span>
            </span>
            <span>{person.siteAdministrator ? "Site administrator" : ""}</span>
            <span>
              {person.disabledAt ? `Account shut since ${person.disabledAt.slice(0, 10)}` : "Account open"}
            </span>
            {person.id !== ownId && (
              <button
                type="button"
                className="underline"
                onClick={() => void setOpen(person, person.disabledAt !== null)}
              >
                {person.disabledAt ? "Open the account" : "Shut the account"}
              </button>
            )}
          </li>
        ))}
      </ul>
    </>
  );
}
