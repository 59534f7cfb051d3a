"use client";

import Link from "next/link";
import { useMemo, useState } from "react";
import { Sign } from "@/components/figures/sign";
import { Notice } from "@/components/ui/notice";
import { useCheck, useRunChecks } from "@/lib/client/use-checks";
import { useFooting } from "@/lib/client/use-footings";
import type { CheckDetail, RunChecksAnswer } from "@/lib/contracts/checks";
import { stageTitles } from "@/lib/contracts/footing-words";
import type { FootingChoices, FootingDetail } from "@/lib/contracts/footings";
import { CheckCaution } from "./caution";
import { CheckAnswer } from "./check-answer";
import { CheckResult } from "./check-result";
import { FootingForm } from "./footing-form";
import { Histories } from "./histories";
import { LinkDialog } from "./link-dialog";
import { LoadsForm } from "./loads-form";
import { fixed, whole } from "./shown";
import { StagePanel } from "./stage-panel";
import { StandingBand } from "./standing-band";
import { ValueCard } from "./value-card";

type Props = {
  projectId: string;
  first: FootingDetail;
  firstCheck: CheckDetail | null;
  owners: FootingChoices["owners"];
  values: FootingChoices["values"];
  grid: string;
  datum: string;
  today: string;
  may: { write: boolean; link: boolean; check: boolean; stage: boolean };
};

/** One footing: what it is, what it relies on, whether that is still so, and the check that says whether it stands. */
export function FootingSheet({
  projectId,
  first,
  firstCheck,
  owners,
  values,
  grid,
  datum,
  today,
  may,
}: Props) {
  const query = useFooting(projectId, first.id, first);
  const footing = query.data ?? first;
  const own = useMemo(() => [footing.id], [footing.id]);
  const runChecks = useRunChecks(projectId);
  const [earlier, setEarlier] = useState<string | null>(null);
  const checkId = earlier ?? footing.check?.id ?? null;
  const check = useCheck(projectId, checkId, firstCheck ?? undefined);
  const [linking, setLinking] = useState(false);
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState("");
  const [answer, setAnswer] = useState<RunChecksAnswer | null>(null);

  const onCheck = async () => {
    if (busy) return;
    setBusy(true);
    setProblem("");
    const ran = await runChecks({ footingIds: own });
    setBusy(false);
    setEarlier(null);
    setAnswer(ran.done ? ran.body : null);
    if (!ran.done) setProblem(ran.refused.detail);
  };
  const now = footing.geometry[0];
  const facts: [string, string][] = [
    [
      "Size B × L × t",
      `${fixed(footing.breadth_m, 2)} × ${fixed(footing.length_m, 2)} × ${fixed(footing.thickness_m, 2)} m`,
    ],
    [
      "Position",
      `E ${fixed(footing.easting_m, 2)} m, N ${fixed(footing.northing_m, 2)} m, ${footing.orientation_deg}°`,
    ],
    [
      "Levels",
      `ground ${fixed(footing.groundLevel_m, 2)} m, founding ${fixed(footing.foundingLevel_m, 2)} m`,
    ],
    ["Loads", `${footing.combinations} combinations, ${fixed(now?.loadHeight_m, 2)} m above founding level`],
    [
      "Unit weights",
      `concrete ${now?.concreteUnitWeight_kNm3} kN/m³, backfill ${now?.backfillUnitWeight_kNm3} kN/m³`,
    ],
    ["Owner", footing.owner?.name ?? "nobody"],
    ["Stage", stageTitles[footing.stage]],
    [
      "Holes near",
      footing.holesNear.map(({ name, distance_m }) => `${name} (${fixed(distance_m, 0)} m)`).join(", ") ||
        "none within the limit",
    ],
  ];

  return (
    <div className="p-6">
      <p>
        <Link href={`/projects/${projectId}/footings`} className="underline">
          Footings
        </Link>
      </p>
      <div className="flex flex-wrap items-center gap-x-5 gap-y-2">
        <h1 className="text-xl">
          Footing {footing.mark}
          {footing.gridReference && <span className="ml-3 text-ink-2">{footing.gridReference}</span>}
        </h1>
        <Sign name={footing.check?.verdict ?? "no check yet"} size="large" />
      </div>
      <StandingBand projectId={projectId} footing={footing} />
      <div className="mt-3 flex flex-wrap items-center gap-3">
        <span>
          {footing.value ? (
            <>
              Linked to{" "}
              <Link href={`/projects/${projectId}/values/${footing.value.id}`} className="underline">
                {footing.value.reference}
              </Link>{" "}
              {footing.value.current
                ? `${footing.value.current.code}, ${whole(footing.value.current.netAllowable_kPa)} kPa net`
                : "(no revision in force)"}
              ; {footing.value.zone.name}, unit {footing.value.groundUnit.code}.
            </>
          ) : (
            "Linked to no bearing value."
          )}
        </span>
        {may.link && (
          <button type="button" className="border border-field px-3 py-1.5" onClick={() => setLinking(true)}>
            {footing.value ? "Change the link" : "Link to a value"}
          </button>
        )}
        {may.check && (
          <button
            type="button"
            aria-disabled={busy}
            className="bg-action px-4 py-1.5 text-on-action"
            onClick={() => void onCheck()}
          >
            {busy ? "One moment …" : footing.check ? "Check again" : "Check"}
          </button>
        )}
      </div>
      {problem && (
        <Notice kind="refused" className="mt-3">
          {problem}
        </Notice>
      )}
      {query.isError && (
        <Notice kind="refused" className="mt-3">
          {query.error.message}
        </Notice>
      )}
      {answer && answer.notCheckedCount > 0 && <CheckAnswer projectId={projectId} answer={answer} />}
      <dl className="mt-4 grid max-w-4xl gap-x-8 sm:grid-cols-2">
        {facts.map(([label, text]) => (
          <div key={label} className="flex justify-between gap-4 border-b border-rule py-1">
            <dt className="text-ink-2">{label}</dt>
            <dd className="text-right tabular-nums">{text}</dd>
          </div>
        ))}
      </dl>
      {may.write && (
        <>
          <details className="mt-3">
            <summary>Change size, place or levels</summary>
            <FootingForm
              key={footing.revision}
              projectId={projectId}
              owners={owners}
              footing={footing}
              grid={grid}
              datum={datum}
            />
          </details>
          <details className="mt-2" open={footing.combinations === 0}>
            <summary>{footing.combinations === 0 ? "Give the loads" : "Change the loads"}</summary>
            <LoadsForm
              key={footing.revision}
              projectId={projectId}
              footingId={footing.id}
              revision={footing.revision}
              loads={footing.loads[0] ?? null}
            />
          </details>
        </>
      )}
      {check.data && (
        <>
          {earlier !== null && earlier !== footing.check?.id && (
            <p className="mt-8 border-l-4 border-rule pl-3">
              An earlier check is shown.{" "}
              <button type="button" className="underline" onClick={() => setEarlier(null)}>
                Show the latest
              </button>
            </p>
          )}
          <ValueCard projectId={projectId} check={check.data} />
          <CheckResult key={check.data.id} check={check.data} />
        </>
      )}
      {checkId !== null && check.isPending && <p className="mt-8 h-96 text-ink-2">Reading the check …</p>}
      {check.isError && (
        <Notice kind="refused" className="mt-3">
          {check.error.message}
        </Notice>
      )}
      <StagePanel projectId={projectId} footing={footing} today={today} mayRecord={may.stage} />
      <Histories footing={footing} shownCheck={checkId} onCheck={setEarlier} />
      <CheckCaution />
      {linking && (
        <LinkDialog
          projectId={projectId}
          footingIds={own}
          values={values}
          onDone={() => setLinking(false)}
          onClose={() => setLinking(false)}
        />
      )}
    </div>
  );
}
