import { loadavg } from "node:os";

export type Figure = { median: number; least: number; most: number };
export type Comparison = {
  what: string;
  unit: string;
  ours: Figure;
  bare: Figure;
  ratio: number;
  goal: string;
  repetitions: number;
  note: string;
};

const figureOf = (values: number[]): Figure => {
  const sorted = [...values].sort((one, other) => one - other);
  return {
    median: sorted[Math.floor(sorted.length / 2)] as number,
    least: sorted[0] as number,
    most: sorted.at(-1) as number,
  };
};

/** Times both sides alternately in this one process; a run whose bare side swings threefold is called void. */
export async function compare(given: {
  what: string;
  goal: string;
  repetitions?: number;
  warmUps?: number;
  before?: () => Promise<void> | void;
  ours: () => Promise<void> | void;
  bare: () => Promise<void> | void;
}): Promise<Comparison> {
  const repetitions = given.repetitions ?? 7;
  const timed = async (act: () => Promise<void> | void) => {
    await given.before?.();
    const from = performance.now();
    await act();
    return performance.now() - from;
  };
  for (let at = 0; at < (given.warmUps ?? 1); at += 1) {
    await timed(given.ours);
    await timed(given.bare);
  }
  const ours: number[] = [];
  const bare: number[] = [];
  for (let at = 0; at < repetitions; at += 1) {
    ours.push(await timed(given.ours));
    bare.push(await timed(given.bare));
  }
  const one = figureOf(ours);
  const other = figureOf(bare);
  return {
    what: given.what,
    unit: "ms",
    ours: one,
    bare: other,
    ratio: one.median / other.median,
    goal: given.goal,
    repetitions,
    note: other.most > 3 * other.least ? "void: the bare side swung more than threefold" : "",
  };
}

const shown = (figure: Figure) =>
  `${figure.median.toFixed(1)} (${figure.least.toFixed(1)}–${figure.most.toFixed(1)})`;

/** One line for each comparison, with the load of the machine beside it. */
export function report(results: Comparison[]): string {
  return results
    .map(
      ({ what, unit, ours, bare, ratio, goal, repetitions, note }) =>
        `${what}\n  ours ${shown(ours)} ${unit}, bare ${shown(bare)} ${unit}, ratio ${ratio.toFixed(2)} × (goal: ${goal}; n = ${repetitions}; load ${loadavg()[0]?.toFixed(1)})${note ? `\n  ${note}` : ""}`,
    )
    .join("\n");
}
