import type { Verdict } from "@/db/schema";
import { checkFooting } from "@/lib/check/check-footing";
import type { GatheredCriteria, GatheredFooting, ValueTerms } from "../checks/gather";
import { type CheckedTerms, toCheckInput } from "../checks/to-input";

export type Judged = { verdict: Verdict; utilisation: number | null; requiredNet_kPa: number | null };

/** A footing whose value has no revision in force is inside nobody's conditions. */
export const WITHOUT_VALUE: Judged = {
  verdict: "outside conditions",
  utilisation: null,
  requiredNet_kPa: null,
};

/** The verdict of a footing's check against these terms, as a stored check of it would have it. */
export function judge(
  footing: GatheredFooting,
  terms: CheckedTerms & Pick<ValueTerms, "loadBasis" | "highestFoundingLevel_m" | "lowestFoundingLevel_m">,
  criteria: GatheredCriteria,
): Judged {
  const input = toCheckInput({ ...footing, combinations: footing.combinations ?? "[]" }, terms, criteria);
  return checkFooting(input);
}
