import type { CombinationResult } from "@/lib/check/input";
import { fixed, utilisationShown, whole } from "./shown";

type Props = {
  combinations: readonly CombinationResult[];
  governing: string;
  shown: number;
  onShow: (index: number) => void;
};

type Column = {
  head: string;
  unit?: string;
  of: (c: CombinationResult) => string;
  /** A share of a limit: its largest over the combinations is marked. */
  share?: (c: CombinationResult) => number | null;
};

const shareColumn = (head: string, share: (c: CombinationResult) => number | null): Column => ({
  head,
  share,
  of: (c) => utilisationShown(share(c)),
});

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
  shareColumn("Bearing", (c) => c.utilisationBearing),
  shareColumn("Eccentricity", (c) => c.utilisationContact),
  { head: "FoS sliding", of: (c) => fixed(c.factorSliding, 2) },
  shareColumn("Sliding", (c) => c.utilisationSliding),
  { head: "FoS overturning", of: (c) => fixed(c.factorOverturning, 2) },
  shareColumn("Overturning", (c) => c.utilisationOverturning),
  { head: "FoS uplift", of: (c) => fixed(c.factorUplift, 2) },
  shareColumn("Uplift", (c) => c.utilisationUplift),
  shareColumn("Utilisation", (c) => c.utilisation),
];

/** Every combination with every intermediate figure; a dash where there is none. The largest share of each limit stands out. */
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
              {columns.map(({ head, of, share }) => (
                <td
                  key={head}
                  className={`px-2 ${share && governs(combinations, share) === index ? "font-semibold" : ""}`}
                >
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

/**
 * The combination in which a share of a limit is largest; one without a bound is larger than any. None where the share is
 * nought throughout.
 */
export function governs(
  combinations: readonly CombinationResult[],
  share: (c: CombinationResult) => number | null,
): number | null {
  let most = 0;
  let at: number | null = null;
  combinations.forEach((combination, index) => {
    const here = share(combination) ?? Number.POSITIVE_INFINITY;
    if (here > most) {
      most = here;
      at = index;
    }
  });
  return at;
}
