import { type Kind, SI_UNIT } from "@/lib/units/factors";
import { readQuantity } from "@/lib/units/read-quantity";

/** What was typed, read: an amount in SI (null when nothing was typed), or what is wrong with it. */
export type Read = { amount: number | null } | { problem: string };

/** Reads a quantity of a kind, with its unit or, as the field's label says, in its SI unit without; `null` is a pure number. */
export function typedQuantity(typed: string | number | null | undefined, kind: Kind | null): Read {
  if (typed === null || typed === undefined) return { amount: null };
  if (typeof typed === "number")
    return Number.isFinite(typed) ? { amount: typed } : { problem: "This is not a number." };
  const text = typed.trim();
  if (text === "") return { amount: null };
  if (kind === null) return pureNumber(text);
  const read = readQuantity(text, kind, SI_UNIT[kind]);
  return "problem" in read ? read : { amount: read.amount };
}

function pureNumber(text: string): Read {
  if (/^[+-]?\d{1,12}(\.\d{1,12})?$/.test(text)) return { amount: Number(text) };
  if (/^[+-]?\d+,\d+$/.test(text))
    return { problem: `Write the decimal with a point: ${text.replace(",", ".")}.` };
  return { problem: "Give a number without a unit, as 3 or 2.5." };
}
