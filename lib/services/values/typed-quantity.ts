/** What was typed, read: an amount in the field's unit (null when nothing was typed), or what is wrong with it. */
export type Read = { amount: number | null } | { problem: string };

const DECIMAL = /^[+-]?\d{1,12}(\.\d{1,12})?$/;

/** Reads a number that may repeat its field's unit ("1.5", "1.5 m"); a decimal comma or another unit is not guessed at. */
export function plainNumber(typed: string | number | null | undefined, unit: string): Read {
  if (typed === null || typed === undefined) return { amount: null };
  if (typeof typed === "number")
    return Number.isFinite(typed) ? { amount: typed } : { problem: "This is not a number." };
  const text = typed.trim().replace(/[−–]/g, "-");
  if (text === "") return { amount: null };
  const bare = unit !== "" && endsInUnit(text, unit) ? text.slice(0, -unit.length).trim() : text;
  if (DECIMAL.test(bare)) return { amount: Number(bare) };
  if (/^[+-]?\d+,\d+$/.test(bare))
    return { problem: `Write the decimal with a point: ${bare.replace(",", ".")}.` };
  return { problem: unit === "" ? "Give a number, as 3 or 2.5." : `Give a number in ${unit}, as 2.5.` };
}

const plain = (unit: string): string => unit.toLowerCase().replace("³", "3").replace("²", "2");

const endsInUnit = (text: string, unit: string): boolean => plain(text).endsWith(plain(unit));

// replaced when lib/units arrives
export function pressure_kPa(typed: string | number | null | undefined): Read {
  return plainNumber(typed, "kPa");
}
