"use client";

import { useState } from "react";
import { PressureFigure } from "@/components/figures/pressure-figure";
import { Sign } from "@/components/figures/sign";
import { ScrollAcross } from "@/components/ui/scroll-across";
import type { CombinationResult, Severity } from "@/lib/check/input";
import type { CheckDetail } from "@/lib/contracts/checks";
import { CombinationsTable, governs } from "./combinations-table";
import { FormulaLines } from "./formula-lines";
import { fixed, momentShown, utilisationShown, whole } from "./shown";

/** A stored check: verdict, findings in sentences, the pressure under the base, every combination, every step. */
export function CheckResult({ check }: { check: CheckDetail }) {
  const { result, snapshot, explained, contactPolygons_m } = check;
  const governing = Math.max(
    0,
    result.combinations.findIndex(({ name }) => name === result.governingCombination),
  );
  const [chosen, setChosen] = useState<number | null>(null);
  const shown = chosen ?? governing;
  const combination = result.combinations[shown];
  const { footing, value } = snapshot.input;
  /** The combination that governs one requirement, in brackets; nothing where none does. */
  const governedBy = (share: (c: CombinationResult) => number | null): string => {
    const at = governs(result.combinations, share);
    return at === null ? "" : ` (${result.combinations[at]?.name})`;
  };
  const summary: [string, string][] = [
    ["Utilisation", `${utilisationShown(result.utilisation)} (${result.governingCombination})`],
    ["Bearing", `${utilisationShown(result.utilisationBearing)}${governedBy((c) => c.utilisationBearing)}`],
    ["Required value", `${whole(result.requiredNet_kPa)} kPa net`],
    ["Largest base pressure", `${whole(result.maxPressure_kPa)} kPa`],
    [
      "Smallest contact",
      `${fixed(result.minContactRatio * 100, 0)} %${governedBy((c) => c.utilisationContact)}`,
    ],
    [
      "Factor against sliding",
      `${factor(result.factorSliding, snapshot.input.criteria.slidingFactor)}${governedBy((c) => c.utilisationSliding)}`,
    ],
    [
      "Factor against overturning",
      `${factor(result.factorOverturning, snapshot.input.criteria.overturningFactor)}${governedBy((c) => c.utilisationOverturning)}`,
    ],
    [
      "Factor against uplift",
      `${factor(result.factorUplift, snapshot.input.criteria.upliftFactor)}${governedBy((c) => c.utilisationUplift)}`,
    ],
  ];

  return (
    <section aria-labelledby="check-title" className="mt-8">
      <h2 id="check-title" className="flex items-center gap-3 text-lg">
        Check {check.standing === "replaced" ? "(replaced)" : ""} <Sign name={result.verdict} size="large" />
      </h2>
      <p className="text-ink-2">
        By {check.runBy}, {momentShown(check.runAt)} UTC; criteria {check.criteriaNumber}; engine{" "}
        {check.engineVersion}
        {snapshot.register.holesNear &&
          `; holes within ${snapshot.register.nearestHoleLimit_m} m: ${snapshot.register.holesNear.join(", ") || "none"}`}
        .
      </p>
      <dl className="mt-3 grid max-w-4xl gap-x-8 sm:grid-cols-2">
        {summary.map(([label, text]) => (
          <div key={label} className="flex justify-between gap-4 border-b border-rule py-1">
            <dt className="text-ink-2">{label}</dt>
            <dd className="text-right tabular-nums">{text}</dd>
          </div>
        ))}
      </dl>
      <h3 className="mt-5 font-semibold">Findings</h3>
      {result.findings.length === 0 ? (
        <p>Every requirement is met in every combination.</p>
      ) : (
        <ul className="mt-1">
          {result.findings.map(({ code, severity, message, combination: where }) => (
            <li key={`${code} ${where} ${message}`} className="flex gap-2">
              <span className={`w-20 shrink-0 ${severity === "note" ? "text-ink-2" : "font-semibold"}`}>
                {severityWords[severity]}
              </span>
              <span>
                {message}
                {where !== null && <span className="text-ink-2"> ({where})</span>}
              </span>
            </li>
          ))}
        </ul>
      )}
      {combination && (
        <>
          <h3 className="mt-5 font-semibold">Base pressure: {combination.name}</h3>
          <ScrollAcross label="Pressure under the base" className="mt-2 max-w-full">
            <PressureFigure
              soil={check.value.soil}
              given={{
                breadth_m: footing.breadth_m,
                length_m: footing.length_m,
                thickness_m: footing.thickness_m,
                groundLevel_m: footing.groundLevel_m,
                foundingLevel_m: footing.foundingLevel_m,
                groundwaterLevel_m: value.groundwaterLevel_m,
                vertical_kN: combination.baseVertical_kN,
                eccentricityB_m: combination.eccentricityB_m ?? 0,
                eccentricityL_m: combination.eccentricityL_m ?? 0,
                distribution: combination.distribution,
                cornerPressures_kPa: combination.cornerPressures_kPa ?? [0, 0, 0, 0],
                maxPressure_kPa: combination.maxPressure_kPa ?? 0,
                minPressure_kPa: combination.minPressure_kPa ?? 0,
                contactRatio: combination.contactRatio,
                contactPolygon_m: contactPolygons_m[shown] ?? [],
              }}
            />
          </ScrollAcross>
        </>
      )}
      <h3 className="mt-5 font-semibold">Combinations</h3>
      <CombinationsTable
        combinations={result.combinations}
        governing={result.governingCombination}
        shown={shown}
        onShow={setChosen}
      />
      <details className="mt-5">
        <summary className="font-semibold">Every step, with its numbers</summary>
        <h4 className="mt-2 text-ink-2">For all combinations</h4>
        <FormulaLines lines={explained.common} />
        <h4 className="mt-2 text-ink-2">{explained.combinations[shown]?.name}</h4>
        <FormulaLines lines={explained.combinations[shown]?.lines ?? []} />
      </details>
    </section>
  );
}

const severityWords: Record<Severity, string> = {
  fails: "fails",
  outside: "outside",
  warning: "mind",
  note: "note",
};

/** A factor of safety beside its target; a dash where nothing acts. */
const factor = (figure: number | null, target: number): string =>
  figure === null ? `nothing acts, or no bound (${target} asked)` : `${fixed(figure, 2)} (${target} asked)`;
