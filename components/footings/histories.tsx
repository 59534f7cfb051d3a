"use client";

import { useState } from "react";
import { Sign } from "@/components/figures/sign";
import { ScrollAcross } from "@/components/ui/scroll-across";
import { loadBasisTitles, stageTitles } from "@/lib/contracts/footing-words";
import type { FootingDetail } from "@/lib/contracts/footings";
import { fixed, momentShown, utilisationShown, whole } from "./shown";

type Props = { footing: FootingDetail; shownCheck: string | null; onCheck: (checkId: string) => void };

/** Everything that was recorded of a footing, the newest first. Nothing of it is ever changed. */
export function Histories({ footing, shownCheck, onCheck }: Props) {
  const [all, setAll] = useState(false);
  const checks = all ? footing.checks : footing.checks.slice(0, 10);
  return (
    <section aria-labelledby="history-title" className="mt-10">
      <h2 id="history-title" className="text-lg">
        History
      </h2>
      <Table
        caption={`Checks (${footing.checks.length})`}
        heads={["When (UTC)", "By", "Value", "Net allowable (kPa)", "Utilisation", "Verdict", "Standing"]}
        empty="No check yet."
      >
        {checks.map((check) => (
          <tr key={check.id} className={`border-t border-rule ${check.id === shownCheck ? "bg-chosen" : ""}`}>
            <td className="py-1 pr-4 whitespace-nowrap tabular-nums">
              <button
                type="button"
                className="underline"
                aria-pressed={check.id === shownCheck}
                onClick={() => onCheck(check.id)}
              >
                {momentShown(check.runAt)}
              </button>
            </td>
            <td className="pr-4">{check.runBy}</td>
            <td className="pr-4">
              {check.valueReference} {check.code}
            </td>
            <td className="pr-4 text-right tabular-nums">{whole(check.netAllowable_kPa)}</td>
            <td className="pr-4 text-right tabular-nums">{utilisationShown(check.utilisation)}</td>
            <td className="pr-4">
              <Sign name={check.verdict} size="small" />
            </td>
            <td>
              {check.standing}
              {check.standing === "affected" && `: ${check.reasons.join("; ")}`}
            </td>
          </tr>
        ))}
      </Table>
      {footing.checks.length > 10 && !all && (
        <button type="button" className="underline" onClick={() => setAll(true)}>
          All {footing.checks.length} checks
        </button>
      )}
      <Table
        caption="Size and levels"
        heads={[
          "Rev.",
          "B × L × t (m)",
          "Ground (m)",
          "Founding (m)",
          "Position (m)",
          "By",
          "When (UTC)",
          "Note",
        ]}
      >
        {footing.geometry.map((each) => (
          <tr key={each.number} className="border-t border-rule align-top">
            <td className="py-1 pr-4 tabular-nums">{each.number}</td>
            <td className="pr-4 whitespace-nowrap tabular-nums">
              {fixed(each.breadth_m, 2)} × {fixed(each.length_m, 2)} × {fixed(each.thickness_m, 2)}
            </td>
            <td className="pr-4 text-right tabular-nums">{fixed(each.groundLevel_m, 2)}</td>
            <td className="pr-4 text-right tabular-nums">{fixed(each.foundingLevel_m, 2)}</td>
            <td className="pr-4 whitespace-nowrap tabular-nums">
              {fixed(each.easting_m, 2)}, {fixed(each.northing_m, 2)}
            </td>
            <td className="pr-4">{each.recordedBy}</td>
            <td className="pr-4 whitespace-nowrap tabular-nums">{momentShown(each.recordedAt)}</td>
            <td>{each.note}</td>
          </tr>
        ))}
      </Table>
      <Table
        caption="Loads"
        heads={["Set", "Combinations", "Basis", "Source", "By", "When (UTC)"]}
        empty="No loads yet."
      >
        {footing.loads.map((each) => (
          <tr key={each.id} className="border-t border-rule">
            <td className="py-1 pr-4 tabular-nums">{each.number}</td>
            <td className="pr-4 tabular-nums">{each.combinations.length}</td>
            <td className="pr-4">{loadBasisTitles[each.loadBasis]}</td>
            <td className="pr-4">{each.source}</td>
            <td className="pr-4">{each.recordedBy}</td>
            <td className="whitespace-nowrap tabular-nums">{momentShown(each.recordedAt)}</td>
          </tr>
        ))}
      </Table>
      <Table
        caption="Links to bearing values"
        heads={["No.", "Value", "How", "Reason", "By", "When (UTC)"]}
        empty="Not linked yet."
      >
        {footing.links.map((each) => (
          <tr key={each.number} className="border-t border-rule align-top">
            <td className="py-1 pr-4 tabular-nums">{each.number}</td>
            <td className="pr-4">{each.value?.reference ?? "none"}</td>
            <td className="pr-4 whitespace-nowrap">{howWords[each.how]}</td>
            <td className="pr-4">{each.reason}</td>
            <td className="pr-4">{each.linkedBy}</td>
            <td className="whitespace-nowrap tabular-nums">{momentShown(each.linkedAt)}</td>
          </tr>
        ))}
      </Table>
      <Table
        caption="Stages on site"
        heads={["No.", "Stage", "On", "Note", "By"]}
        empty="No stage recorded yet."
      >
        {footing.stageEvents.map((each) => (
          <tr key={each.number} className="border-t border-rule align-top">
            <td className="py-1 pr-4 tabular-nums">{each.number}</td>
            <td className="pr-4">{stageTitles[each.stage]}</td>
            <td className="pr-4 tabular-nums">{each.reachedOn}</td>
            <td className="pr-4">{each.note}</td>
            <td>{each.recordedBy}</td>
          </tr>
        ))}
      </Table>
    </section>
  );
}

const howWords = { "from-zone": "from its zone", chosen: "by choice", removed: "taken away" } as const;

function Table({
  caption,
  heads,
  empty = "",
  children,
}: {
  caption: string;
  heads: readonly string[];
  empty?: string;
  children: React.ReactNode[];
}) {
  return (
    <ScrollAcross label="History" className="mt-4">
      <table>
        <caption className="text-left font-semibold">{caption}</caption>
        {children.length > 0 ? (
          <thead className="text-left text-ink-2">
            <tr>
              {heads.map((head) => (
                <th key={head} scope="col" className="py-1 pr-4 font-normal whitespace-nowrap">
                  {head}
                </th>
              ))}
            </tr>
          </thead>
        ) : null}
        <tbody>
          {children.length > 0 ? (
            children
          ) : (
            <tr>
              <td className="text-ink-2">{empty}</td>
            </tr>
          )}
        </tbody>
      </table>
    </ScrollAcross>
  );
}
