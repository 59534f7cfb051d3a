"use client";

import { type FormEvent, useState } from "react";
import { Notice } from "@/components/account/notice";
import { TextField } from "@/components/account/text-field";
import type { AuditPage, AuditRow } from "@/lib/contracts/projects";

type Props = { projectId: string; first: AuditPage };

/** Who did what and when, newest first: searched on the server, read on page by page, taken away as CSV. */
export function AuditPanel({ projectId, first }: Props) {
  // Nothing searched yet: the newest as the server last gave them, which a refresh of the page renews.
  const [found, setFound] = useState<AuditPage | null>(null);
  const page = found ?? first;
  const [search, setSearch] = useState("");
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState("");
  const path = `/api/projects/${projectId}/audit`;

  const load = async (query: { search: string; before?: number }, keep: AuditRow[]) => {
    setBusy(true);
    setProblem("");
    const asked = new URLSearchParams({ search: query.search });
    if (query.before) asked.set("before", String(query.before));
    const answer = await fetch(`${path}?${asked}`).catch(() => null);
    const body = await answer?.json().catch(() => null);
    setBusy(false);
    if (!answer?.ok)
      return setProblem(body?.detail ?? "The server cannot be reached just now. Please try again.");
    setFound({ events: [...keep, ...(body as AuditPage).events], next: body.next });
  };
  const onSubmit = (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    const wanted = String(new FormData(event.currentTarget).get("search") ?? "");
    setSearch(wanted);
    void load({ search: wanted }, []);
  };

  return (
    <section aria-labelledby="audit-title" className="mt-10">
      <h2 id="audit-title" className="text-lg">
        Audit trail
      </h2>
      <div className="flex flex-wrap items-end gap-4">
        <search>
          <form method="post" onSubmit={onSubmit} className="flex items-end gap-3">
            <TextField name="search" label="Search who, what and details" type="search" maxLength={200} />
            <button type="submit" aria-disabled={busy} className="border border-rule px-3 py-1.5">
              Search
            </button>
          </form>
        </search>
        <a href={`${path}/export`} className="py-1.5 underline" download>
          Take away as CSV
        </a>
      </div>
      {problem && <Notice kind="refused">{problem}</Notice>}
      {page.events.length === 0 ? (
        <p className="mt-4 text-ink-2">Nothing in the audit trail matches.</p>
      ) : (
        <table className="mt-4 w-full text-sm" aria-busy={busy}>
          <thead>
            <tr className="border-b border-rule text-left">
              {["No.", "When (UTC)", "Who", "What", "Of what", "Details"].map((head) => (
                <th key={head} scope="col" className="py-1 pr-3 font-normal">
                  {head}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {page.events.map((event) => (
              <tr key={event.seq} className="border-b border-rule align-top">
                <th scope="row" className="py-1 pr-3 text-left font-normal tabular-nums">
                  {event.seq}
                </th>
                <td className="py-1 pr-3 tabular-nums">{event.at.slice(0, 19).replace("T", " ")}</td>
                <td className="py-1 pr-3">{event.actor}</td>
                <td className="py-1 pr-3">{event.verb.replace(":", ": ")}</td>
                <td className="py-1 pr-3 break-all">{event.subject}</td>
                <td className="py-1">
                  <details>
                    <summary className="min-h-6 leading-6">
                      {String(event.detail.reason ?? "") || "Before and after"}
                    </summary>
                    <pre className="max-w-prose whitespace-pre-wrap break-all">
                      {JSON.stringify(event.detail, null, 2)}
                    </pre>
                    <p className="break-all text-ink-2">SHA-256 {event.hash}</p>
                  </details>
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      {page.next !== null && (
        <button
          type="button"
          aria-disabled={busy}
          className="mt-4 border border-rule px-3 py-1.5"
          onClick={() => void load({ search, before: page.next ?? undefined }, page.events)}
        >
          {busy ? "One moment …" : "Older events"}
        </button>
      )}
    </section>
  );
}
