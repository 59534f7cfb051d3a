"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";
import { type ReactNode, useEffect, useState } from "react";
import { SignOut } from "@/components/account/account-line";
import { CAUTION } from "@/components/ui/caution";
import { usePrinting } from "@/components/ui/use-printing";
import { sheetAt } from "./sheets";

/** What the title block says of the project and its reader; words ready to be shown. */
export type TitleBlockFacts = {
  number: string;
  title: string;
  grid: string;
  datum: string;
  units: string;
  roles: readonly string[];
  person: string;
  siteAdministrator: boolean;
};

/** The title block at the lower right, as on a drawing: it stays while the sheet moves, and is printed on each page. */
export function TitleBlock({ facts }: { facts: TitleBlockFacts }) {
  const here = sheetAt(usePathname());
  const [open, setOpen] = useState(false);
  const sheet = here ? `${here.number} ${here.name}` : "—";
  const cells: { term: string; value: ReactNode; words?: string; className?: string }[] = [
    {
      term: "Project",
      value: (
        <Link href="/projects" title="To your projects" className="underline">
          {facts.number} {facts.title}
        </Link>
      ),
      className: "md:max-w-72",
    },
    { term: "Site grid", value: facts.grid, words: facts.grid, className: "md:max-w-60" },
    { term: "Units", value: facts.units },
    { term: "Role", value: facts.roles.join(", "), words: facts.roles.join(", "), className: "md:max-w-80" },
    { term: "Sheet", value: sheet },
    { term: "Datum", value: facts.datum, words: facts.datum, className: "md:max-w-60" },
    { term: "As of", value: <AsOf /> },
    { term: "Signed in", value: <SignedIn facts={facts} /> },
  ];

  return (
    <aside
      aria-label="Title block"
      className="title-block sticky bottom-0 z-20 flex items-stretch justify-between border-t border-frame bg-sheet md:bottom-2.5 md:-mx-px md:border md:shadow-[0_0.625rem_0_var(--paper)]"
    >
      <p className="max-w-80 self-end p-2.5 text-xs text-ink-2 max-xl:hidden print:block print:max-w-[46mm] print:self-center">
        {CAUTION}
      </p>
      <div className="min-w-0 max-xl:w-full print:flex-1">
        <button
          type="button"
          aria-expanded={open}
          aria-controls="title-block"
          onClick={() => setOpen(!open)}
          className="flex min-h-11 w-full items-center gap-3 px-3 text-left md:hidden print:hidden"
        >
          <span className="min-w-0 flex-1 truncate">
            <span className="font-semibold">{facts.number}</span> · {sheet} · {facts.datum}
          </span>
          <svg width="12" height="12" viewBox="0 0 12 12" aria-hidden="true" className="shrink-0">
            <path
              d={open ? "M2 4l4 4 4-4" : "M2 8l4-4 4 4"}
              fill="none"
              stroke="currentColor"
              strokeWidth="1.5"
            />
          </svg>
        </button>
        <dl
          id="title-block"
          className={`${open ? "grid" : "hidden"} grid-cols-2 max-md:border-t max-md:border-rule md:grid md:h-full md:grid-cols-[auto_auto_auto_auto] xl:border-l xl:border-frame print:grid print:grid-cols-[3fr_3fr_2fr_3fr] print:border-l`}
        >
          {cells.map(({ term, value, words, className = "" }) => (
            <div
              key={term}
              className={`min-w-0 border-rule px-2.5 py-1 md:border-l md:first:border-l-0 md:[&:nth-child(5)]:border-l-0 md:[&:nth-child(n+5)]:border-t ${className}`}
            >
              <dt className="text-xs text-ink-2">{term}</dt>
              <dd title={words} className="truncate max-md:whitespace-normal print:whitespace-normal">
                {value}
              </dd>
            </div>
          ))}
        </dl>
      </div>
    </aside>
  );
}

/** The moment that the sheet shows: now, and on paper the moment of printing. */
function AsOf() {
  const printing = usePrinting();
  const [moment, setMoment] = useState("");
  useEffect(() => {
    const set = () => setMoment(minuteOf(new Date()));
    set();
    const timer = setInterval(set, 30_000);
    return () => clearInterval(timer);
  }, []);
  if (printing && moment) return <time dateTime={moment.replace(" ", "T")}>{moment}</time>;
  return <>Now</>;
}

const two = (part: number): string => String(part).padStart(2, "0");

/** A moment to the minute in the reader's own time, year first. */
const minuteOf = (at: Date): string =>
  `${at.getFullYear()}-${two(at.getMonth() + 1)}-${two(at.getDate())} ${two(at.getHours())}:${two(at.getMinutes())}`;

function SignedIn({ facts }: { facts: TitleBlockFacts }) {
  return (
    <span className="flex flex-wrap gap-x-4">
      <Link href="/account" className="underline">
        {facts.person}
      </Link>
      {facts.siteAdministrator && (
        <Link href="/people" className="underline print:hidden">
          People
        </Link>
      )}
      <span className="print:hidden">
        <SignOut />
      </span>
    </span>
  );
}
