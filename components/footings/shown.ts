/** A figure with so many decimals, or a dash where there is none. */
export const fixed = (figure: number | null | undefined, decimals: number): string =>
  figure === null || figure === undefined || !Number.isFinite(figure) ? "–" : figure.toFixed(decimals);

/** A pressure or force as engineers write it: whole units, one decimal below ten. */
export const whole = (figure: number | null | undefined): string =>
  fixed(figure, figure !== null && figure !== undefined && Math.abs(figure) < 10 ? 1 : 0);

/** A utilisation to two decimals; one just above the limit keeps the digits that show it is above. */
export function utilisationShown(utilisation: number | null | undefined): string {
  if (utilisation === null || utilisation === undefined || !Number.isFinite(utilisation)) return "–";
  for (let decimals = 2; decimals < 8; decimals += 1) {
    const shown = utilisation.toFixed(decimals);
    if (utilisation <= 1 || Number(shown) > 1) return shown;
  }
  return "above 1";
}

/** "2026-04-30 14:05" in UTC. */
export const momentShown = (moment: string): string => moment.slice(0, 16).replace("T", " ");

/** What was typed into a field of numbers: a number where it is one, else the text, so that the server says what is wrong. */
export function numberTyped(text: string): number | string | undefined {
  const typed = text.trim().replace(/\u2212/g, "-");
  if (typed === "") return undefined;
  return /^[-+]?(\d+\.?\d*|\.\d+)(e[-+]?\d+)?$/i.test(typed) ? Number(typed) : typed;
}
