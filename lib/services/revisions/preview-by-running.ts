import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { Outcome } from "@/db/schema";
import type { RevisionPreview } from "@/lib/contracts/changes";
import type { FootingId, ValueId } from "@/lib/contracts/ids";
import { gatherLinked, type LinkedBatch } from "../changes/gather-linked";
import { type JudgedTerms, judge } from "../changes/judge";
import { needsAction, noCounts, outcomeOf } from "../changes/outcome";
import type { Context } from "../context";

export type PreviewAt = {
  tx: Transaction;
  context: Context;
  valueId: ValueId;
  currentNet_kPa: number | null;
};

/** How many points the curve has at most, and how many footings are named. */
export const CURVE_POINTS = 200;
export const NAMED = 50;

export type Seen = {
  footingId: FootingId;
  mark: string;
  stage: string;
  outcome: Outcome;
  requiredNet_kPa: number | null;
};

/** The preview by running every linked check with the draft's terms. Reads in batches, writes nothing. */
export async function previewByRunning(at: PreviewAt, trial: JudgedTerms): Promise<RevisionPreview> {
  const { tx, context, valueId, currentNet_kPa } = at;
  const seen = await runTrial(gatherLinked(tx, context, sql`f.value_id = ${valueId}`), trial);
  seen.required.sort((a, b) => b.requiredNet_kPa - a.requiredNet_kPa || (a.mark < b.mark ? -1 : 1));
  const { rows } = await tx.execute<{ all: number }>(sql`
    select count(*)::int as all from footing where project_id = ${context.projectId} and value_id = ${valueId}`);
  const all = rows[0]?.all ?? seen.run;
  const limit_kPa = currentNet_kPa ?? Number.POSITIVE_INFINITY;
  return {
    netAllowable_kPa: trial.netAllowable_kPa,
    currentNet_kPa,
    how: "checks run again",
    linked: all,
    unchecked: all - seen.run,
    counts: seen.counts,
    excavatedAffected: seen.excavated,
    pouredAffected: seen.poured,
    firstToFail:
      seen.required.find(({ requiredNet_kPa }) => requiredNet_kPa > 0 && requiredNet_kPa <= limit_kPa) ??
      null,
    curve: curveOf(seen.required.map(({ requiredNet_kPa }) => requiredNet_kPa)),
    worst: worstFirst(seen.troubled, trial.netAllowable_kPa),
  };
}

/** Runs gathered footings and counts what the terms did to each. */
export async function runTrial(batches: AsyncIterable<LinkedBatch>, trial: JudgedTerms) {
  const counts = noCounts();
  const required: { footingId: FootingId; mark: string; requiredNet_kPa: number }[] = [];
  const troubled: Seen[] = [];
  let run = 0;
  for await (const { footings, criteria } of batches) {
    for (const footing of footings) {
      const { id, mark, stage } = footing;
      const { verdict, requiredNet_kPa } = judge(footing, trial, criteria);
      const outcome = outcomeOf(footing.verdict, verdict);
      run += 1;
      counts[outcome] += 1;
      if (requiredNet_kPa !== null) required.push({ footingId: id, mark, requiredNet_kPa });
      if (needsAction(outcome)) troubled.push({ footingId: id, mark, stage, outcome, requiredNet_kPa });
    }
  }
  const excavated = troubled.filter(
    ({ stage }) => stage === "excavated" || stage === "formation-accepted",
  ).length;
  const poured = troubled.filter(({ stage }) => stage === "poured").length;
  return { counts, required, troubled, run, excavated, poured };
}

/** At each required value, how many footings require more than it: at most so many points, both ends kept. */
function curveOf(descending_kPa: number[]): RevisionPreview["curve"] {
  const step = Math.max(1, Math.ceil(descending_kPa.length / CURVE_POINTS));
  let failing = 0;
  return descending_kPa
    .map((netAllowable_kPa, index) => {
      if (netAllowable_kPa !== descending_kPa[index - 1]) failing = index;
      return { netAllowable_kPa, failing };
    })
    .filter((_, index) => index % step === 0 || index === descending_kPa.length - 1);
}

/** Those that need somebody, the largest shortfall first. */
export function worstFirst(troubled: Seen[], netAllowable_kPa: number | null): RevisionPreview["worst"] {
  return troubled
    .map((seen) => ({
      ...seen,
      shortfall_kPa:
        seen.requiredNet_kPa === null || netAllowable_kPa === null
          ? null
          : seen.requiredNet_kPa - netAllowable_kPa,
    }))
    .sort((a, b) => (b.shortfall_kPa ?? -1e9) - (a.shortfall_kPa ?? -1e9) || (a.mark < b.mark ? -1 : 1))
    .slice(0, NAMED);
}
