/** The smallest step of 1, 2 or 5 times a power of ten that leaves no more than `most` steps in a span. */
export function niceStep(span: number, most: number): number {
  const least = span / Math.max(1, most);
  if (!(least > 0) || !Number.isFinite(least)) return 1;
  const power = 10 ** Math.floor(Math.log10(least));
  for (const times of [1, 2, 5]) if (times * power >= least * (1 - 1e-9)) return times * power;
  return 10 * power;
}

/** The multiples of a step from one number to another, both included where they are multiples. */
export function stepsBetween(from: number, to: number, step: number): number[] {
  const first = Math.ceil(from / step - 1e-9);
  const last = Math.floor(to / step + 1e-9);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index) => (first + index) * step);
}

/** Decimals that a multiple of a step needs. */
export const decimalsOf = (step: number): number => Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
