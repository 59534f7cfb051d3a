"use client";

import { type FormEvent, useRef, useState } from "react";
import { TextField } from "@/components/account/text-field";
import { Notice } from "@/components/ui/notice";
import { ScrollAcross } from "@/components/ui/scroll-across";
import type { Refused } from "@/lib/client/send";
import { useFootingChange } from "@/lib/client/use-footings";
import { durations, loadBases, loadBasisTitles } from "@/lib/contracts/footing-words";
import type { FootingLoads } from "@/lib/contracts/footings";
import { numberTyped } from "./shown";

type Props = { projectId: string; footingId: string; revision: number; loads: FootingLoads | null };

const columns = [
  ["vertical_kN", "N", "kN"],
  ["momentB_kNm", "M along B", "kNm"],
  ["momentL_kNm", "M along L", "kNm"],
  ["horizontalB_kN", "H along B", "kN"],
  ["horizontalL_kN", "H along L", "kN"],
] as const;
type Typed = { key: number; name: string; duration: string } & Record<(typeof columns)[number][0], string>;

const emptyRow = (key: number): Typed => ({
  key,
  name: "",
  duration: "permanent",
  vertical_kN: "",
  momentB_kNm: "0",
  momentL_kNm: "0",
  horizontalB_kN: "0",
  horizontalL_kN: "0",
});

/** The load combinations of a footing, issued anew as one set. The basis is a choice that a person makes. */
export function LoadsForm({ projectId, footingId, revision, loads }: Props) {
  const change = useFootingChange(projectId);
  const nextKey = useRef(loads?.combinations.length ?? 1);
  const [rows, setRows] = useState<Typed[]>(() =>
    loads
      ? loads.combinations.map((each, key) => ({
          key,
          name: each.name,
          duration: each.duration,
          vertical_kN: String(each.vertical_kN),
          momentB_kNm: String(each.momentB_kNm),
          momentL_kNm: String(each.momentL_kNm),
          horizontalB_kN: String(each.horizontalB_kN),
          horizontalL_kN: String(each.horizontalL_kN),
        }))
      : [emptyRow(0)],
  );
  const [busy, setBusy] = useState(false);
  const [refused, setRefused] = useState<Refused>();
  const [said, setSaid] = useState("");

  const set = (key: number, name: string, value: string) =>
    setRows(rows.map((row) => (row.key === key ? { ...row, [name]: value } : row)));
  const add = () => {
    nextKey.current += 1;
    setRows([...rows, emptyRow(nextKey.current)]);
  };
  const onSubmit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    if (busy) return;
    const typed = new FormData(event.currentTarget);
    const basis = String(typed.get("loadBasis") ?? "");
    setBusy(true);
    setSaid("");
    const answer = await change<{ number: number }>(
      `footings/${footingId}/loads`,
      "PUT",
      {
        ...(basis ? { loadBasis: basis } : {}),
        source: String(typed.get("source") ?? ""),
        reason: String(typed.get("reason") ?? ""),
        combinations: rows.map(({ key: _, name, duration, ...figures }) => ({
          name,
          duration,
          ...Object.fromEntries(columns.map(([column]) => [column, numberTyped(figures[column])])),
        })),
      },
      revision,
    );
    setBusy(false);
    setRefused(answer.done ? undefined : answer.refused);
    if (answer.done) setSaid(`The loads are issued as set ${answer.body.number}.`);
  };
  const problems = Object.entries(refused?.fields ?? {}).filter(([path]) => path.startsWith("combinations."));

  return (
    <form onSubmit={onSubmit} noValidate>
      <div className="grid max-w-4xl gap-x-6 sm:grid-cols-2">
        <div className="mt-4">
          <label className="block text-sm" htmlFor="loadBasis">
            Basis of the loads
          </label>
          <select
            id="loadBasis"
            name="loadBasis"
            defaultValue={loads?.loadBasis ?? ""}
            aria-invalid={refused?.fields.loadBasis ? true : undefined}
            aria-describedby="loadBasis-note"
            className="mt-1 block w-full border border-field bg-sheet px-2 py-1.5 aria-invalid:border-fails"
          >
            <option value="">Choose</option>
            {loadBases.map((basis) => (
              <option key={basis} value={basis}>
                {loadBasisTitles[basis]}
              </option>
            ))}
          </select>
          <p
            id="loadBasis-note"
            className={`mt-1 text-sm ${refused?.fields.loadBasis ? "text-fails-text" : "text-ink-2"}`}
          >
            {refused?.fields.loadBasis ??
              "Allowable values go with characteristic loads, design resistances with factored loads. Never mix."}
          </p>
        </div>
        <TextField
          name="source"
          label="Where they come from"
          hint="Model and issue."
          maxLength={300}
          defaultValue={loads?.source}
          problem={refused?.fields.source}
        />
      </div>
      <ScrollAcross label="Load combinations" className="mt-4">
        <table>
          <caption className="text-left text-ink-2">
            N down is positive. A moment along B tips the pad towards +B; a horizontal load adds to it through
            the load height.
          </caption>
          <thead>
            <tr className="text-left text-ink-2">
              <th scope="col" className="pr-2 font-normal">
                Combination
              </th>
              <th scope="col" className="pr-2 font-normal">
                Duration
              </th>
              {columns.map(([name, label, unit]) => (
                <th key={name} scope="col" className="pr-2 text-right font-normal">
                  {label} ({unit})
                </th>
              ))}
              <th scope="col">
                <span className="sr-only">Take away</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {rows.map((row, index) => {
              const problem = (name: string) => refused?.fields[`combinations.${index}.${name}`];
              return (
                <tr key={row.key}>
                  <td className="pr-2 py-0.5">
                    <input
                      aria-label={`Name of combination ${index + 1}`}
                      value={row.name}
                      maxLength={60}
                      aria-invalid={problem("name") ? true : undefined}
                      onChange={(event) => set(row.key, "name", event.target.value)}
                      className="w-48 border border-field bg-sheet px-2 py-1 aria-invalid:border-fails"
                    />
                  </td>
                  <td className="pr-2">
                    <select
                      aria-label={`Duration of combination ${index + 1}`}
                      value={row.duration}
                      onChange={(event) => set(row.key, "duration", event.target.value)}
                      className="border border-field bg-sheet px-2 py-1"
                    >
                      {durations.map((duration) => (
                        <option key={duration}>{duration}</option>
                      ))}
                    </select>
                  </td>
                  {columns.map(([name, label, unit]) => (
                    <td key={name} className="pr-2">
                      <input
                        aria-label={`${label} of combination ${index + 1}, ${unit}`}
                        value={row[name]}
                        inputMode="decimal"
                        aria-invalid={problem(name) ? true : undefined}
                        onChange={(event) => set(row.key, name, event.target.value)}
                        className="w-24 border border-field bg-sheet px-2 py-1 text-right tabular-nums aria-invalid:border-fails"
                      />
                    </td>
                  ))}
                  <td>
                    <button
                      type="button"
                      className="underline"
                      aria-label={`take away combination ${index + 1}`}
                      onClick={() => setRows(rows.filter(({ key }) => key !== row.key))}
                    >
                      take away
                    </button>
                  </td>
                </tr>
              );
            })}
          </tbody>
        </table>
      </ScrollAcross>
      <button type="button" className="mt-1 underline" onClick={add}>
        Add a combination
      </button>
      {problems.length > 0 && (
        <ul className="mt-2 text-fails-text">
          {problems.map(([path, sentence]) => (
            <li key={path}>
              Combination {Number(path.split(".")[1]) + 1}: {sentence}
            </li>
          ))}
        </ul>
      )}
      <div className="max-w-4xl">
        <TextField
          name="reason"
          label="Reason for the change"
          maxLength={1000}
          problem={refused?.fields.reason}
        />
      </div>
      {refused && (
        <Notice kind="refused" className="mt-3">
          {[refused.detail, refused.fields.combinations].filter(Boolean).join(" ")}
        </Notice>
      )}
      {said && (
        <Notice kind="done" className="mt-3">
          {said}
        </Notice>
      )}
      <button type="submit" aria-disabled={busy} className="mt-4 bg-action px-4 py-2 text-on-action">
        {busy ? "One moment …" : "Issue the loads"}
      </button>
    </form>
  );
}
