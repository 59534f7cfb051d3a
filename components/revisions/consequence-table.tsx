import Link from "next/link";
import { ScrollAcross } from "@/components/ui/scroll-across";
import type { ConsequenceItem } from "@/lib/contracts/changes";
import { OutcomeSign } from "./outcome-sign";

type Props = {
  items: ConsequenceItem[];
  projectId: string;
  busy: boolean;
  /** Ids that are ticked; null where nobody may answer. */
  chosen: ReadonlySet<string> | null;
  onChoose: (id: string, on: boolean) => void;
};

const answers = {
  "re-checked": "checked again",
  resized: "resized and checked",
  "accepted-as-built": "accepted as built",
  "referred-back": "referred back",
} as const;

/** What the change did to each footing, before and after, on whose desk it is and how it was answered. */
export function ConsequenceTable({ items, projectId, busy, chosen, onChoose }: Props) {
  if (items.length === 0)
    return <p className="mt-4 text-ink-2">{busy ? "Reading …" : "No footing matches."}</p>;
  const heads = [
    "Footing",
    "Outcome",
    "Utilisation before",
    "after",
    "Required (kPa)",
    "On site",
    "Owner",
    "Answer",
  ];
  const right = new Set(["Utilisation before", "after", "Required (kPa)"]);
  return (
    <ScrollAcross label="Consequences" className="mt-4">
      <table className="w-full text-sm" aria-busy={busy}>
        <thead>
          <tr className="border-b border-rule text-left align-bottom">
            {chosen && (
              <th scope="col" className="py-1 pr-3 font-normal">
                Choose
              </th>
            )}
            {heads.map((head) => (
              <th
                key={head}
                scope="col"
                className={`py-1 pr-4 font-normal ${right.has(head) ? "text-right" : ""}`}
              >
                {head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {items.map((item) => (
            <tr key={item.id} className="border-b border-rule align-top">
              {chosen && (
                <td className="py-1.5 pr-3">
                  {item.open && (
                    <input
                      type="checkbox"
                      aria-label={`Choose ${item.mark}`}
                      checked={chosen.has(item.id)}
                      onChange={(event) => onChoose(item.id, event.target.checked)}
                    />
                  )}
                </td>
              )}
              <th scope="row" className="py-1.5 pr-4 text-left font-normal">
                <Link className="underline" href={`/projects/${projectId}/footings/${item.footingId}`}>
                  {item.mark}
                </Link>
                {item.gridReference && <span className="text-ink-2"> {item.gridReference}</span>}
              </th>
              <td className="py-1.5 pr-4">
                <OutcomeSign outcome={item.outcome} />
              </td>
              <td className="py-1.5 pr-4 text-right tabular-nums">{ratio(item.utilisationBefore)}</td>
              <td className="py-1.5 pr-4 text-right tabular-nums">{ratio(item.utilisationAfter)}</td>
              <td className="py-1.5 pr-4 text-right tabular-nums">
                {item.requiredNet_kPa === null ? "—" : Math.ceil(item.requiredNet_kPa - 1e-9)}
              </td>
              <td className="py-1.5 pr-4">
                {item.stageNow === "poured" ? <strong>poured</strong> : item.stageNow.replace("-", " ")}
                {item.stageThen !== item.stageNow && (
                  <span className="text-ink-2"> ({item.stageThen.replace("-", " ")} then)</span>
                )}
              </td>
              <td className="py-1.5 pr-4">
                {item.owner?.name ?? <span className="text-ink-2">nobody</span>}
              </td>
              <td className="py-1.5 pr-4">{answerOf(item)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </ScrollAcross>
  );
}

// A utilisation just over the limit must not be rounded to it: 1.0004 shows as 1.01.
function ratio(utilisation: number | null): string {
  if (utilisation === null) return "—";
  return (
    utilisation > 1 ? Math.ceil(utilisation * 100 - 1e-9) / 100 : Math.round(utilisation * 100) / 100
  ).toFixed(2);
}

function answerOf(item: ConsequenceItem): string {
  if (!item.answer) return "none yet";
  const { kind, name, at, reason, verdict } = item.answer;
  const verb = `${answers[kind]}${verdict && verdict !== "passes" ? `, ${verdict}` : ""} by ${name} on ${at.slice(0, 10)}`;
  return `${verb}${reason && `: ${reason}`}${item.open ? " (still open)" : ""}`;
}
