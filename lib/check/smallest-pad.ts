import { checkFooting } from "./check-footing";
import type { FootingCheckInput, FootingCheckResult } from "./input";

/** What a resize may do: keep the proportion of the sides, keep one of them, or make the pad square. */
export type Resize = "proportion" | "breadth" | "length" | "square";

export type PadOffer = { breadth_m: number; length_m: number; result: FootingCheckResult };

/** Sides are offered in steps that are set out on site. */
const STEP_m = 0.05;
const LARGEST_m = 20;

/**
 * The smallest pad, in steps of 5 cm, that passes with everything else as it is; null where none up to 20 m does (the
 * value's largest breadth may forbid it). Sizes are tried upwards one by one: more pad is more weight, so that passing is
 * not monotone and halving could miss the smallest. Sizes that lie below the value's smallest breadth do not pass.
 */
export function smallestPad(input: FootingCheckInput, resize: Resize = "proportion"): PadOffer | null {
  const { breadth_m: b, length_m: l } = input.footing;
  const steps = Math.round(LARGEST_m / STEP_m);
  for (let step = 4; step <= steps; step += 1) {
    const size_m = sized(step);
    const [breadth_m, length_m] = sidesFor(resize, size_m, b, l);
    if (Math.max(breadth_m, length_m) > LARGEST_m) return null;
    const result = checkFooting({ ...input, footing: { ...input.footing, breadth_m, length_m } });
    if (result.verdict === "passes") return { breadth_m, length_m, result };
  }
  return null;
}

/** A number of steps in metres, without the digits that 0.05 has not. */
const sized = (steps: number): number => Math.round(steps * STEP_m * 100) / 100;

function sidesFor(resize: Resize, size_m: number, b: number, l: number): [number, number] {
  switch (resize) {
    case "square":
      return [size_m, size_m];
    case "breadth":
      return [b, size_m];
    case "length":
      return [size_m, l];
    case "proportion": {
      // The smaller side leads; the other follows, rounded up to a step.
      const other_m = sized(Math.ceil((size_m * Math.max(b, l)) / Math.min(b, l) / STEP_m - 1e-9));
      return b <= l ? [size_m, other_m] : [other_m, size_m];
    }
  }
}
