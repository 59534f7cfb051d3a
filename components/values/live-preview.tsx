"use client";

import Link from "next/link";
import { useDeferredValue, useId, useState } from "react";
import { Notice } from "@/components/account/notice";
import { NumberFailingCurve } from "@/components/figures/number-failing-curve";
import { OutcomeCountsLine } from "@/components/revisions/outcome-counts";
import { OutcomeSign } from "@/components/revisions/outcome-sign";
import { usePreview } from "@/lib/client/use-values";
import type { RevisionPreview } from "@/lib/contracts/changes";

type Props = { projectId: string; valueId: string; draftRevision: number };

/** What the draft, or a pressure tried out, would do to the linked footings. Follows what is typed; writes nothing. */
export function LivePreview({ projectId, valueId, draftRevision }: Props) {
  const [typed, setTyped] = useState("");
  const id = useId();
  const wanted = useDeferredValue(typed.trim());
  const trial_kPa = /^\d{1,6}(\.\d{1,4})?$/.test(wanted) && Number(wanted) > 0 ? Number(wanted) : null;
  const { data, error, isFetching } = usePreview(projectId, valueId, draftRevision, trial_kPa);
  return (
    <aside aria-labelledby={`${id}t`} aria-busy={isFetching} className="min-w-0">
      <h2 id={`${id}t`} className="text-lg">
        What it would do
      </h2>
      <label className="mt-2 block text-sm" htmlFor={`${id}p`}>
        Try another pressure (kPa net)
      </label>
      <input
        id={`${id}p`}
        inputMode="decimal"
        value={typed}
        onChange={(event) => setTyped(event.target.value)}
        className="mt-1 block w-32 border border-rule bg-sheet px-2 py-1.5"
      />
      {wanted !== "" && trial_kPa === null && (
        <p className="mt-1 text-sm text-fails-text">A number above zero, in kPa, as 180.</p>
      )}
      <p className="mt-1 text-sm text-ink-2">A trial is not approved and cannot be signed.</p>
      {error && <Notice kind="refused">{error.message}</Notice>}
      {data ? (
        <Told data={data} projectId={projectId} />
      ) : (
        !error && <p className="mt-4 h-40 text-ink-2">Reading …</p>
      )}
    </aside>
  );
}

function Told({ data, projectId }: { data: RevisionPreview; projectId: string }) {
  if (data.linked === 0) return <p className="mt-4">No footing is linked to this value yet.</p>;
  const { firstToFail, netAllowable_kPa, currentNet_kPa } = data;
  return (
    <>
      <p className="mt-4">
        {data.linked.toLocaleString("en-GB")} linked {data.linked === 1 ? "footing" : "footings"}
        {netAllowable_kPa !== null && ` at ${shown(netAllowable_kPa)} kPa net`}
        {data.unchecked > 0 && `, ${data.unchecked.toLocaleString("en-GB")} of them without a check`}:
      </p>
      {netAllowable_kPa === null ? (
        <p className="mt-1 text-ink-2">Give a pressure to see what it would do.</p>
      ) : (
        <div className="mt-1">
          <OutcomeCountsLine counts={data.counts} />
        </div>
      )}
      {(data.pouredAffected > 0 || data.excavatedAffected > 0) && (
        <p className="mt-2 border-l-4 border-fails pl-3">
          Of those that would not stand on it, {data.pouredAffected}{" "}
          {data.pouredAffected === 1 ? "is" : "are"} poured and {data.excavatedAffected} excavated.
        </p>
      )}
      {firstToFail && (
        <p className="mt-2">
          First to fail on the way down{currentNet_kPa !== null && ` from ${shown(currentNet_kPa)} kPa`}:{" "}
          <Link className="underline" href={`/projects/${projectId}/footings/${firstToFail.footingId}`}>
            {firstToFail.mark}
          </Link>
          , below {shown(firstToFail.requiredNet_kPa)} kPa.
        </p>
      )}
      {data.curve.length > 0 && (
        <div className="mt-4">
          <NumberFailingCurve
            points={data.curve}
            currentNet_kPa={currentNet_kPa}
            draftNet_kPa={netAllowable_kPa}
            checked={data.linked - data.unchecked}
          />
        </div>
      )}
      {data.worst.length > 0 && (
        <table className="mt-4 w-full text-sm">
          <caption className="text-left text-ink-2">Largest shortfall first</caption>
          <thead>
            <tr className="border-b border-rule text-left align-bottom">
              <th scope="col" className="py-1 pr-3 font-normal">
                Footing
              </th>
              <th scope="col" className="py-1 pr-3 font-normal">
                Stage
              </th>
              <th scope="col" className="py-1 pr-3 font-normal">
                Would be
              </th>
              <th scope="col" className="py-1 text-right font-normal">
                Short by (kPa)
              </th>
            </tr>
          </thead>
          <tbody>
            {data.worst.slice(0, 12).map((one) => (
              <tr key={one.footingId} className="border-b border-rule">
                <th scope="row" className="py-1 pr-3 text-left font-normal">
                  <Link className="underline" href={`/projects/${projectId}/footings/${one.footingId}`}>
                    {one.mark}
                  </Link>
                </th>
                <td className="py-1 pr-3">{one.stage.replace("-", " ")}</td>
                <td className="py-1 pr-3">
                  <OutcomeSign outcome={one.outcome} />
                </td>
                <td className="py-1 text-right tabular-nums">
                  {one.shortfall_kPa === null ? "—" : shown(one.shortfall_kPa)}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      <p className="mt-2 text-sm text-ink-2">
        {data.how === "stored required values"
          ? "From the required value stored with each check."
          : "From every check run again with the draft's terms."}
      </p>
    </>
  );
}

const shown = (pressure_kPa: number): string => String(Number(pressure_kPa.toPrecision(3))).replace("-", "−");
