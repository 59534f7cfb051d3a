import type { Line } from "@/lib/methods/formula";

/** Steps of a calculation as they would be written by hand: formula, numbers put in, result with its unit. */
export function FormulaLines({ lines }: { lines: readonly Line[] }) {
  return (
    <table className="font-formula">
      <thead className="sr-only">
        <tr>
          <th scope="col">Symbol</th>
          <th scope="col">Formula</th>
          <th scope="col">Numbers</th>
          <th scope="col">Result</th>
        </tr>
      </thead>
      <tbody>
        {lines.map(({ symbol, shown, numbers, value, unit, where }, index) => (
          // Steps have no identity but their place: the same formula stands for B and for L.
          // biome-ignore lint/suspicious/noArrayIndexKey: a calculation is a fixed sequence.
          <tr key={`${symbol} ${index}`}>
            <th scope="row" className="pr-2 text-right font-normal whitespace-nowrap">
              {symbol} =
            </th>
            <td className="pr-4">{shown}</td>
            <td className="pr-4 text-ink-2">= {numbers}</td>
            <td className="pr-2 text-right whitespace-nowrap tabular-nums">
              = {Number.isFinite(value) ? Number(value.toPrecision(5)) : "–"} {unit}
            </td>
            <td className="text-ink-2">{where}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
