import { Sign } from "@/components/figures/sign";
import type { FootingCounts } from "@/lib/contracts/footings";

/** How many footings stand how; what is affected stands beside the verdicts, because it does not replace them. */
export function CountsLine({ counts }: { counts: FootingCounts }) {
  const number = (count: number) => <span className="tabular-nums">{count.toLocaleString("en-GB")}</span>;
  return (
    <ul className="mt-3 flex flex-wrap gap-x-5 gap-y-1" aria-label="Footings by verdict">
      <li>{number(counts.total)} footings</li>
      <li className="inline-flex items-center gap-1.5">
        {number(counts.passes)} <Sign name="passes" />
      </li>
      <li className="inline-flex items-center gap-1.5">
        {number(counts.fails)} <Sign name="fails" />
      </li>
      <li className="inline-flex items-center gap-1.5">
        {number(counts.outside)} <Sign name="outside conditions" />
      </li>
      <li className="inline-flex items-center gap-1.5">
        {number(counts.unchecked)} <Sign name="no check yet" />
      </li>
      <li className={counts.affected > 0 ? "font-semibold" : "text-ink-2"}>
        {number(counts.affected)} affected
      </li>
      <li className={counts.unlinked > 0 ? "" : "text-ink-2"}>
        {number(counts.unlinked)} linked to no value
      </li>
    </ul>
  );
}
