import type { FootingCheckResult } from "@/lib/check/input";
import type { CheckSnapshot } from "@/lib/contracts/checks";
import { runCheck } from "./run-check";

/** Where a stored result differs from the one computed now; empty when every digit is the same. */
export function replayCheck(stored: { snapshot: CheckSnapshot; result: FootingCheckResult }): Difference[] {
  // What is stored has been through JSON, so what is computed goes through it too.
  const now: unknown = JSON.parse(JSON.stringify(runCheck(stored.snapshot)));
  const differences: Difference[] = [];
  compare(stored.result, now, "", differences);
  return differences;
}

export type Difference = { at: string; stored: unknown; now: unknown };

/** Walks both together. Keys may come in another order (the database sorts them); numbers must be the same double. */
function compare(stored: unknown, now: unknown, at: string, found: Difference[]): void {
  if (stored === now) return;
  if (isRecord(stored) && isRecord(now) && Array.isArray(stored) === Array.isArray(now)) {
    for (const key of new Set([...Object.keys(stored), ...Object.keys(now)]))
      compare(stored[key], now[key], at === "" ? key : `${at}.${key}`, found);
    return;
  }
  found.push({ at, stored, now });
}

const isRecord = (value: unknown): value is Record<string, unknown> =>
  typeof value === "object" && value !== null;
