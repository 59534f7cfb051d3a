import Link from "next/link";
import { Sign } from "@/components/figures/sign";
import { stageTitles } from "@/lib/contracts/footing-words";
import type { FootingItem } from "@/lib/contracts/footings";
import { fixed, utilisationShown, whole } from "./shown";

type Props = {
  projectId: string;
  item: FootingItem;
  index: number;
  chosen: boolean;
  onChoose: (chosen: boolean, range: boolean) => void;
};

export const footingColumns = [
  { head: "Mark", unit: "", numeric: false },
  { head: "B × L", unit: "m", numeric: true },
  { head: "Founding level", unit: "m", numeric: true },
  { head: "Bearing value", unit: "", numeric: false },
  { head: "Net allowable", unit: "kPa", numeric: true },
  { head: "Required", unit: "kPa", numeric: true },
  { head: "Utilisation", unit: "", numeric: true },
  { head: "Verdict", unit: "", numeric: false },
  { head: "Standing", unit: "", numeric: false },
  { head: "Stage", unit: "", numeric: false },
  { head: "Owner", unit: "", numeric: false },
] as const;

/** One footing of the schedule. */
export function FootingRow({ projectId, item, index, chosen, onChoose }: Props) {
  const { value, check } = item;
  const affected = check?.standing === "affected";
  return (
    <tr
      aria-rowindex={index + 2}
      aria-selected={chosen}
      className="h-8 border-b border-rule aria-selected:bg-chosen"
    >
      <td className="pr-2 pl-1">
        <input
          type="checkbox"
          className="m-1 size-4"
          checked={chosen}
          aria-label={`Choose ${item.mark}`}
          onChange={(event) =>
            onChoose(
              event.target.checked,
              event.nativeEvent instanceof MouseEvent && event.nativeEvent.shiftKey,
            )
          }
        />
      </td>
      <th scope="row" className="pr-3 text-left font-normal whitespace-nowrap">
        <Link href={`/projects/${projectId}/footings/${item.id}`} className="underline">
          {item.mark}
        </Link>
        {item.gridReference && <span className="ml-2 text-ink-2">{item.gridReference}</span>}
      </th>
      <td className="pr-3 text-right tabular-nums whitespace-nowrap">
        {fixed(item.breadth_m, 2)} × {fixed(item.length_m, 2)}
      </td>
      <td className="pr-3 text-right tabular-nums">{fixed(item.foundingLevel_m, 2)}</td>
      <td className="pr-3 whitespace-nowrap">
        {value ? (
          <>
            <Link href={`/projects/${projectId}/values/${value.id}`} className="underline">
              {value.reference}
            </Link>{" "}
            {value.current?.code ?? <s>no revision in force</s>}
          </>
        ) : (
          <span className="text-ink-2">not linked</span>
        )}
      </td>
      <td className="pr-3 text-right tabular-nums">{whole(value?.current?.netAllowable_kPa)}</td>
      <td className="pr-3 text-right tabular-nums">{whole(check?.requiredNet_kPa)}</td>
      <td className="pr-3 text-right tabular-nums">{utilisationShown(check?.utilisation)}</td>
      <td className="pr-3">
        <Sign name={check?.verdict ?? "no check yet"} />
      </td>
      <td className="max-w-72 pr-3">
        {affected ? (
          <span className="flex items-center gap-1.5" title={check.reasons.join("; ")}>
            <Sign name="affected" revision={check.currentNumber ?? undefined} hideWord />
            <span className="truncate">{check.reasons.join("; ")}</span>
          </span>
        ) : check ? (
          <span className="text-ink-2">{check.code}</span>
        ) : null}
      </td>
      <td className="pr-3 whitespace-nowrap">{stageTitles[item.stage]}</td>
      <td className="pr-1 whitespace-nowrap">
        {item.owner?.name ?? <span className="text-ink-2">nobody</span>}
      </td>
    </tr>
  );
}
