/** What was typed into a field for a number: empty, a number, or a sentence saying what would be right. */
export type TypedNumber = { value: number | null } | { problem: string };

/**
 * Reads a number as engineers type it: `150`, `-2.4`, `−2.4`, `1 250.5`, `2e-4`. A comma is refused rather than guessed,
 * because 1,250 is twelve hundred and fifty to one reader and one and a quarter to the next.
 */
export function readNumber(typed: string): TypedNumber {
  const text = typed
    .trim()
    .replaceAll("−", "-")
    .replace(/[\u00a0\u2009\u202f]/g, " ");
  if (text === "") return { value: null };
  if (text.includes(","))
    return { problem: "Write the decimal with a point and large numbers without commas, such as 1250.5." };
  const plain = /^[+-]?\d{1,3}( \d{3})+(\.\d*)?$/.test(text) ? text.replaceAll(" ", "") : text;
  if (!/^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d{1,3})?$/i.test(plain))
    return { problem: "This is not a number. Type figures alone, such as 150 or −2.4." };
  const value = Number(plain);
  return Number.isFinite(value) ? { value } : { problem: "This number is too large to be meant." };
}

/** A number as it stands in a field that can be edited: every figure of it, with a true minus. */
export const typedForm = (value: number | null): string =>
  value === null ? "" : String(value).replace(/^-/, "−");
