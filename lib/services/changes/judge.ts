import type { Verdict } from "@/db/schema";
import type { GatheredCriteria, GatheredFooting, ValueTerms } from "../checks/gather";
import { runCheck, snapshotOf } from "../checks/run-check";

export type Judged = { verdict: Verdict; utilisation: number | null; requiredNet_kPa: number | null };

/** What a check reads of a value revision, or of a draft that would be one. */
export type JudgedTerms = Omit<ValueTerms, "valueId" | "valueRevisionId" | "zoneId">;

/** A footing whose value has no revision in force is inside nobody's conditions. */
export const WITHOUT_VALUE: Judged = {
  verdict: "outside conditions",
  utilisation: null,
  requiredNet_kPa: null,
};

/** The verdict of a footing's check against these terms, as a stored check of it would have it. */
export function judge(footing: GatheredFooting, terms: JudgedTerms, criteria: GatheredCriteria): Judged {
  if (!hasLoads(footing)) throw new Error(`${footing.mark} has no loads to judge.`);
  // Holes near a footing are a remark of the check, never its verdict: they are not looked for here.
  return runCheck(snapshotOf(footing, terms, criteria, null));
}

type Loaded = GatheredFooting & { combinations: string; loadBasis: string };

const hasLoads = (footing: GatheredFooting): footing is Loaded =>
  footing.combinations !== null && footing.loadBasis !== null;
