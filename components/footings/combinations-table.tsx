import type { CombinationResult } from "@/lib/check/input";
import { fixed, utilisationShown, whole } from "./shown";

type Props = {
  combinations: readonly CombinationResult[];
  governing: string;
  shown: number;
  onShow: (index: number) => void;
};

type Column = { head: string; unit?: string; of: (c: CombinationResult) => string };

const columns: Column[] = [
  { head: "V′", unit: "kN", of: (c) => whole(c.baseVertical_kN) },
  { head: "M_B", unit: "kNm", of: (c) => whole(c.momentB_kNm) },
  { head: "M_L", unit: "kNm", of: (c) => whole(c.momentL_kNm) },
  { head: "e_B", unit: "m", of: (c) => fixed(c.eccentricityB_m, 3) },
  { head: "e_L", unit: "m", of: (c) => fixed(c.eccentricityL_m, 3) },
  { head: "6e/B + 6e/L", of: (c) => fixed(c.kernSum, 2) },
  { head: "Contact", unit: "%", of: (c) => fixed(c.contactRatio * 100, 0) },
  { head: "q max", unit: "kPa", of: (c) => whole(c.maxPressure_kPa) },
  { head: "q min", unit: "kPa", of: (c) => whole(c.minPressure_kPa) },
  { head: "B′", unit: "m", of: (c) => fixed(c.effectiveBreadth_m, 2) },
  { head: "L′", unit: "m", of: (c) => fixed(c.effectiveLength_m, 2) },
  { head: "V′/(B′L′)", unit: "kPa", of: (c) => whole(c.effectivePressure_kPa) },
  { head: "Net demand", unit: "kPa", of: (c) => whole(c.demandNet_kPa) },
  { head: "Factor", of: (c) => fixed(c.durationFactor, 2) },
  { head: "Capacity", unit: "kPa", of: (c) => whole(c.capacityNet_kPa) },
  { head: "Required", unit: "kPa", of: (c) => whole(c.requiredNet_kPa) },
  { head: "Bearing", of: (c) => utilisationShown(c.utilisationBearing) },
  { head: "Eccentricity", of: (c) => utilisationShown(c.utilisationContact) },
  { head: "FoS sliding", of: (c) => fixed(c.factorSliding, 2) },
  { head: "Sliding", of: (c) => utilisationShown(c.utilisationSliding) },
  { head: "FoS overturning", of: (c) => fixed(c.factorOverturning, 2) },
  { head: "Overturning", of: (c) => utilisationShown(c.utilisationOverturning) },
  { head: "FoS uplift", of: (c) => fixed(c.factorUplift, 2) },
  { head: "Uplift", of: (c) => utilisationShown(c.utilisationUplift) },
  { head: "Utilisation", of: (c) => utilisationShown(c.utilisation) },
];

/** Every combination with every intermediate figure; a dash where there is none. The largest of each utilisation is marked. */
export function CombinationsTable({ combinations, governing, shown, onShow }: Props) {
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: a region that scrolls must be reachable by keyboard.
    <section tabIndex={0} aria-label="Combinations" className="mt-2 overflow-x-auto border border-rule">
      <table className="text-right tabular-nums">
        <thead className="text-ink-2">
          <tr>
            <th scope="col" className="sticky left-0 bg-sheet px-2 py-1 text-left font-normal">
              Combination
            </th>
            <th scope="col" className="px-2 text-left font-normal">
              Duration
            </th>
            {columns.map(({ head, unit }) => (
              <th key={head} scope="col" className="px-2 font-normal whitespace-nowrap">
                {head}
                {unit && ` (${unit})`}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {combinations.map((combination, index) => (
            <tr
              key={combination.name}
              className={`border-t border-rule ${index === shown ? "bg-chosen" : ""}`}
            >
              <th
                scope="row"
                className="sticky left-0 bg-sheet px-2 py-1 text-left font-normal whitespace-nowrap"
              >
                <button
                  type="button"
                  className="underline"
                  aria-pressed={index === shown}
                  onClick={() => onShow(index)}
                >
                  {combination.name}
                </button>
                {combination.name === governing && <span className="ml-1 font-semibold">governs</span>}
              </th>
              <td className="px-2 text-left">{combination.duration}</td>
              {columns.map(({ head, of }) => (
                <td key={head} className="px-2">
                  {of(combination)}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
