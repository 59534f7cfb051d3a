import { daysIn } from "./data-types";

/** The day that a text starts with, as yyyy-mm-dd, where it is a day that exists; else null. */
export function isoDay(text: string): string | null {
  const parts = /^(\d{4})-(\d{2})-(\d{2})(?:$|[T ])/.exec(text);
  if (!parts) return null;
  const [, year = "", month = "", day = ""] = parts;
  const exists = Number(month) >= 1 && Number(month) <= 12 && Number(day) >= 1;
  if (!exists || Number(day) > daysIn(Number(year), Number(month))) return null;
  return `${year}-${month}-${day}`;
}

/** Degrees from degrees:minutes:seconds or plain degrees; null where the text is neither or out of range. */
export function degreesOf(text: string, largest_deg: number): number | null {
  const parts = /^([+-]?)(\d{1,3})(?::(\d{1,2}):(\d{1,2}(?:\.\d+)?)|(\.\d+)?)$/.exec(text.trim());
  if (!parts) return null;
  const [, sign, whole = "", minutes = "0", seconds = "0", fraction = "0"] = parts;
  if (Number(minutes) >= 60 || Number(seconds) >= 60) return null;
  const value = Number(whole) + Number(fraction) + Number(minutes) / 60 + Number(seconds) / 3600;
  if (value > largest_deg) return null;
  return sign === "-" ? -value : value;
}
