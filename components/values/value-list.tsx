"use client";

import Link from "next/link";
import { useDeferredValue, useState } from "react";
import { Notice } from "@/components/account/notice";
import { ScrollAcross } from "@/components/ui/scroll-across";
import { useValues } from "@/lib/client/use-values";
import type { ValueItem, ValueState, ValueList as Values } from "@/lib/contracts/values";
import { StateSign, UnconfirmedSign } from "./value-sign";

type Props = { projectId: string; initial: Values; mayDraft: boolean };

const states: [ValueState | "", string][] = [
  ["", "any state"],
  ["issued", "issued"],
  ["checked", "checked, not issued"],
  ["draft", "draft"],
  ["withdrawn", "withdrawn"],
  ["empty", "no revision yet"],
];

/** The register of bearing values: what is in force for each ground unit in each zone, and what rests on it. */
export function ValueList({ projectId, initial, mayDraft }: Props) {
  const [search, setSearch] = useState("");
  const [state, setState] = useState<ValueState | "">("");
  const wanted = useDeferredValue(search.trim());
  const { data, error, isFetching } = useValues(
    projectId,
    { search: wanted || undefined, state: state || undefined },
    initial,
  );
  const items = data?.items ?? [];
  const filtered = wanted !== "" || state !== "";

  if (!filtered && data && data.total === 0)
    return (
      <p className="mt-6 max-w-prose">
        No bearing value has been entered yet.{" "}
        {mayDraft
          ? "Draw a zone, give it its ground units, then open the value of a unit in a zone below."
          : "A geotechnical engineer enters them, one for each ground unit in each zone."}
      </p>
    );

  return (
    <section aria-label="Bearing values" aria-busy={isFetching}>
      <search className="mt-4 flex flex-wrap items-end gap-4">
        <label className="block text-sm">
          Find by reference, zone or ground unit
          <input
            type="search"
            value={search}
            maxLength={100}
            onChange={(event) => setSearch(event.target.value)}
            className="mt-1 block border border-rule bg-sheet px-2 py-1.5"
          />
        </label>
        <label className="block text-sm">
          State
          <select
            value={state}
            onChange={(event) => setState(event.target.value as ValueState | "")}
            className="mt-1 block border border-rule bg-sheet px-2 py-1.5"
          >
            {states.map(([value, title]) => (
              <option key={value} value={value}>
                {title}
              </option>
            ))}
          </select>
        </label>
        <p role="status" className="py-1.5 text-sm text-ink-2">
          {data
            ? `${data.total.toLocaleString("en-GB")} ${data.total === 1 ? "value" : "values"}`
            : "Reading …"}
        </p>
      </search>
      {error && <Notice kind="refused">{error.message}</Notice>}
      {data && items.length === 0 ? (
        <p className="mt-4 text-ink-2">No value matches. Clear the search or choose any state.</p>
      ) : (
        <ScrollAcross label="Values in the register" className="mt-4">
          <table className="w-full text-sm">
            <thead>
              <tr className="border-b border-rule text-left align-bottom">
                <Head>Reference</Head>
                <Head>Ground unit</Head>
                <Head>Zone</Head>
                <Head>State</Head>
                <Head>Revision</Head>
                <Head right>Net allowable (kPa)</Head>
                <Head>In force since</Head>
                <Head right>Footings not poured</Head>
                <Head right>Poured</Head>
                <Head right>On an earlier revision</Head>
              </tr>
            </thead>
            <tbody>
              {items.map((item) => (
                <Row key={item.id} item={item} projectId={projectId} />
              ))}
            </tbody>
          </table>
        </ScrollAcross>
      )}
      {data && data.total > items.length && items.length > 0 && (
        <p className="mt-2 text-sm text-ink-2">
          The first {items.length} of {data.total} are shown. Narrow the search to see the others.
        </p>
      )}
    </section>
  );
}

function Head({ right, children }: { right?: boolean; children: string }) {
  return (
    <th scope="col" className={`py-1 pr-4 font-normal ${right ? "text-right" : ""}`}>
      {children}
    </th>
  );
}

function Row({ item, projectId }: { item: ValueItem; projectId: string }) {
  const { current, footings } = item;
  const figure = "py-1.5 pr-4 text-right tabular-nums";
  return (
    <tr className="border-b border-rule align-top">
      <th scope="row" className="py-1.5 pr-4 text-left font-normal">
        <Link href={`/projects/${projectId}/values/${item.id}`} className="underline">
          {item.reference}
        </Link>
      </th>
      <td className="py-1.5 pr-4">
        {item.groundUnit.code} {item.groundUnit.name}
      </td>
      <td className="py-1.5 pr-4">{item.zone.name}</td>
      <td className="py-1.5 pr-4">
        <StateSign state={item.state} />
        {item.hasDraft && item.state !== "draft" && (
          <span className="block text-ink-2">a draft is being written</span>
        )}
        {current && current.basis !== "recommended" && (
          <span className="block">
            <UnconfirmedSign basis={current.basis} />
            {current.confirmBy && ` by ${current.confirmBy}`}
          </span>
        )}
      </td>
      <td className="py-1.5 pr-4 tabular-nums">
        {current ? `${current.code}, ${current.purpose.replace("-", " ")}` : "—"}
      </td>
      <td className={figure}>
        {current?.netAllowable_kPa == null ? "—" : Math.round(current.netAllowable_kPa)}
      </td>
      <td className="py-1.5 pr-4 tabular-nums">{current ? current.issuedAt.slice(0, 10) : "—"}</td>
      <td className={figure}>{footings.notPoured.toLocaleString("en-GB")}</td>
      <td className={figure}>{footings.poured.toLocaleString("en-GB")}</td>
      <td className={figure}>{footings.onEarlierRevision.toLocaleString("en-GB")}</td>
    </tr>
  );
}
