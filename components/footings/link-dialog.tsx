"use client";

import { type FormEvent, useEffect, useState } from "react";
import { Dialog } from "@/components/ui/dialog";
import { Notice } from "@/components/ui/notice";
import { suggestions as readSuggestions, useFootingChange } from "@/lib/client/use-footings";
import type { FootingChoices, LinkSuggestion } from "@/lib/contracts/footings";
import { whole } from "./shown";

type Props = {
  projectId: string;
  footingIds: readonly string[];
  values: FootingChoices["values"];
  onDone: (sentence: string) => void;
  onClose: () => void;
};

/** More rows than this are counted, not listed: nobody reads them, and all are linked alike. */
const LISTED = 300;

/** Links footings to bearing values: as their zones propose, confirmed by the engineer, or to one chosen with a reason. */
export function LinkDialog({ projectId, footingIds, values, onDone, onClose }: Props) {
  const change = useFootingChange(projectId);
  const [rows, setRows] = useState<LinkSuggestion[] | null>(null);
  const [left, setLeft] = useState<ReadonlySet<string>>(new Set());
  const [problem, setProblem] = useState("");
  const [fields, setFields] = useState<Record<string, string>>({});
  const [busy, setBusy] = useState(false);

  useEffect(() => {
    let here = true;
    void readSuggestions(projectId, footingIds).then((answer) => {
      if (!here) return;
      if (answer.done) setRows(answer.body.suggestions);
      else setProblem(answer.refused.detail);
    });
    return () => {
      here = false;
    };
  }, [projectId, footingIds]);

  const proposed = rows?.filter(({ valueId, linkedTo }) => valueId !== null && valueId !== linkedTo) ?? [];
  const standing =
    rows?.filter(({ valueId, linkedTo }) => valueId !== null && valueId === linkedTo).length ?? 0;
  const open = rows?.filter(({ valueId }) => valueId === null) ?? [];
  const confirmed = proposed.filter(({ footingId }) => !left.has(footingId));

  const act = async (path: string, body: Record<string, unknown>, what: string) => {
    if (busy) return;
    setBusy(true);
    const answer = await change<{ linked: number }>(path, "POST", body);
    setBusy(false);
    setProblem(answer.done ? "" : answer.refused.detail);
    setFields(answer.done ? {} : answer.refused.fields);
    if (answer.done)
      onDone(`${answer.body.linked} ${answer.body.linked === 1 ? "footing" : "footings"} ${what}.`);
  };
  const onChoose = (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    const typed = new FormData(event.currentTarget);
    const valueId = String(typed.get("valueId") ?? "");
    if (valueId === "") return setFields({ valueId: "Choose a bearing value, or to take the link away." });
    void act(
      "footings/links/choose",
      { footingIds, valueId: valueId === "none" ? null : valueId, reason: String(typed.get("reason") ?? "") },
      valueId === "none" ? "linked to no value now" : "linked",
    );
  };

  return (
    <Dialog
      title={`Link ${footingIds.length === 1 ? "a footing" : `${footingIds.length} footings`} to a bearing value`}
      open
      width="wide"
      held={busy}
      onClose={onClose}
    >
      {problem && (
        <Notice kind="refused" className="mt-3">
          {problem}
        </Notice>
      )}
      <h3 className="mt-4 font-semibold">As the zones propose</h3>
      {rows === null ? (
        <p className="mt-2 h-40 text-ink-2">{problem ? "" : "Looking which zones the footings lie in …"}</p>
      ) : (
        <>
          <p className="mt-1 text-ink-2">
            {proposed.length} to confirm
            {standing > 0 && `, ${standing} linked as proposed already`}
            {open.length > 0 && `, ${open.length} without a proposal`}.
          </p>
          {proposed.length > 0 && (
            <SuggestionTable rows={proposed.slice(0, LISTED)} left={left} onLeft={setLeft} />
          )}
          {proposed.length > LISTED && <p>and {proposed.length - LISTED} more, all confirmed alike.</p>}
          {proposed.length > 0 && (
            <button
              type="button"
              aria-disabled={busy || confirmed.length === 0}
              className="mt-3 bg-action px-4 py-2 text-on-action aria-disabled:opacity-60"
              onClick={() =>
                confirmed.length > 0 &&
                void act(
                  "footings/links",
                  { links: confirmed.map(({ footingId, valueId }) => ({ footingId, valueId })) },
                  "linked",
                )
              }
            >
              Confirm {confirmed.length} {confirmed.length === 1 ? "link" : "links"}
            </button>
          )}
          {open.length > 0 && (
            <details className="mt-4" open={open.length <= 10}>
              <summary>{open.length} without a proposal</summary>
              <ul className="mt-1 max-h-48 overflow-auto">
                {open.slice(0, LISTED).map(({ footingId, mark, sentence, candidates }) => (
                  <li key={footingId}>
                    <strong className="font-semibold">{mark}</strong>: {sentence}
                    {candidates.length > 0 &&
                      ` Values there: ${candidates.map((each) => `${each.reference} (${each.groundUnit}${each.code ? `, ${whole(each.netAllowable_kPa)} kPa net` : ", none in force"})`).join("; ")}.`}
                  </li>
                ))}
              </ul>
            </details>
          )}
        </>
      )}
      <h3 className="mt-6 font-semibold">By explicit choice</h3>
      <form onSubmit={onChoose} noValidate className="mt-1 grid gap-3 sm:grid-cols-2">
        <label className="block">
          <span className="block">Bearing value</span>
          <select
            name="valueId"
            aria-invalid={fields.valueId ? true : undefined}
            className="mt-1 w-full border border-field bg-sheet px-2 py-1.5 aria-invalid:border-fails"
          >
            <option value="">Choose</option>
            {values.map(({ id, label }) => (
              <option key={id} value={id}>
                {label}
              </option>
            ))}
            <option value="none">take the link away</option>
          </select>
          {fields.valueId && <span className="mt-1 block text-fails-text">{fields.valueId}</span>}
        </label>
        <label className="block">
          <span className="block">Reason</span>
          <input
            name="reason"
            maxLength={1000}
            aria-invalid={fields.reason ? true : undefined}
            className="mt-1 w-full border border-field bg-sheet px-2 py-1.5 aria-invalid:border-fails"
          />
          {fields.reason && <span className="mt-1 block text-fails-text">{fields.reason}</span>}
        </label>
        <button
          type="submit"
          aria-disabled={busy}
          className="justify-self-start border border-field px-4 py-2"
        >
          Link by choice
        </button>
      </form>
    </Dialog>
  );
}

function SuggestionTable({
  rows,
  left,
  onLeft,
}: {
  rows: readonly LinkSuggestion[];
  left: ReadonlySet<string>;
  onLeft: (left: Set<string>) => void;
}) {
  return (
    <div className="mt-2 max-h-72 overflow-auto border border-rule">
      <table className="w-full">
        <thead className="sticky top-0 bg-sheet text-left text-ink-2">
          <tr>
            {["", "Mark", "Proposed value", "Net allowable (kPa)", "Why"].map((head) => (
              <th key={head} scope="col" className="px-2 py-1 font-normal">
                {head || <span className="sr-only">Confirm</span>}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map(({ footingId, mark, valueId, straddles, sentence, candidates }) => {
            const value = candidates.find((candidate) => candidate.valueId === valueId);
            return (
              <tr key={footingId} className="border-t border-rule align-top">
                <td className="px-2 py-1">
                  <input
                    type="checkbox"
                    aria-label={`Confirm the link of ${mark}`}
                    checked={!left.has(footingId)}
                    onChange={(event) => {
                      const next = new Set(left);
                      if (event.target.checked) next.delete(footingId);
                      else next.add(footingId);
                      onLeft(next);
                    }}
                  />
                </td>
                <th scope="row" className="px-2 py-1 text-left font-normal">
                  {mark}
                </th>
                <td className="px-2 py-1">
                  {value?.reference} {value?.code}, {value?.groundUnit}
                </td>
                <td className="px-2 py-1 text-right tabular-nums">{whole(value?.netAllowable_kPa)}</td>
                <td className={`px-2 py-1 ${straddles ? "font-semibold" : "text-ink-2"}`}>{sentence}</td>
              </tr>
            );
          })}
        </tbody>
      </table>
    </div>
  );
}
