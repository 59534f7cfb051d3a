import { checkFooting } from "@/lib/check/check-footing";
import type { Finding, FootingCheckInput, FootingCheckResult } from "@/lib/check/input";
import type { CheckSnapshot, RegisterConditions } from "@/lib/contracts/checks";
import { loadBasisTitles } from "@/lib/contracts/footing-words";
import type { GatheredCriteria, ValueTerms } from "./gather";
import { type CheckedSize, toCheckInput } from "./to-input";

/** Brings a stored footing, a value revision and the criteria into what a check is given. */
export function snapshotOf(
  footing: CheckedSize & { combinations: string | FootingCheckInput["loads"]; loadBasis: string },
  terms: Omit<ValueTerms, "valueId" | "valueRevisionId" | "zoneId">,
  criteria: Omit<GatheredCriteria, "number">,
  holesNear: string[] | null,
): CheckSnapshot {
  return {
    input: toCheckInput(footing, terms, criteria),
    register: {
      reference: terms.reference,
      code: terms.code,
      loadBasis: footing.loadBasis,
      valueLoadBasis: terms.loadBasis,
      highestFoundingLevel_m: terms.highestFoundingLevel_m,
      lowestFoundingLevel_m: terms.lowestFoundingLevel_m,
      basis: terms.basis,
      purpose: terms.purpose,
      confirmBy: terms.confirmBy,
      confirmWho: terms.confirmWho,
      holesNear,
      nearestHoleLimit_m: criteria.nearestHoleLimit_m,
    },
  };
}

/**
 * One footing against one value revision: the figures, and the conditions that only the register knows. Loads on
 * another basis than the value's, or a founding level outside its range, put the footing outside its conditions
 * whatever the figures say. Pure: the same snapshot gives the same result.
 */
export function runCheck(snapshot: CheckSnapshot): FootingCheckResult {
  const result = checkFooting(snapshot.input);
  const outside = outsideConditions(snapshot);
  const doubts = doubtsAbout(snapshot.register);
  if (outside.length === 0 && doubts.length === 0) return result;
  return {
    ...result,
    verdict: outside.length > 0 ? "outside conditions" : result.verdict,
    findings: [...outside, ...result.findings, ...doubts],
  };
}

const finding = (code: string, severity: Finding["severity"], message: string): Finding => ({
  code,
  severity,
  message,
  combination: null,
});

function outsideConditions({ input, register }: CheckSnapshot): Finding[] {
  const found: Finding[] = [];
  const { loadBasis, valueLoadBasis, highestFoundingLevel_m, lowestFoundingLevel_m } = register;
  const level_m = input.footing.foundingLevel_m;
  if (loadBasis !== valueLoadBasis)
    found.push(
      finding(
        "load-basis",
        "outside",
        `The loads are ${basisInWords(loadBasis)}, the value is for loads that are ${basisInWords(valueLoadBasis)}. The two are never mixed.`,
      ),
    );
  if (highestFoundingLevel_m !== null && level_m > highestFoundingLevel_m)
    found.push(
      finding(
        "founding-level",
        "outside",
        `The founding level ${level_m} m lies above the highest level the value holds for, ${highestFoundingLevel_m} m.`,
      ),
    );
  if (lowestFoundingLevel_m !== null && level_m < lowestFoundingLevel_m)
    found.push(
      finding(
        "founding-level",
        "outside",
        `The founding level ${level_m} m lies below the lowest level the value holds for, ${lowestFoundingLevel_m} m.`,
      ),
    );
  return found;
}

function doubtsAbout(register: RegisterConditions): Finding[] {
  const { reference, code, basis, purpose, confirmWho, confirmBy, holesNear, nearestHoleLimit_m } = register;
  const found: Finding[] = [];
  if (basis !== "recommended") {
    const by = [confirmWho && ` by ${confirmWho}`, confirmBy && ` until ${confirmBy}`]
      .filter(Boolean)
      .join("");
    found.push(
      finding(
        "unconfirmed-value",
        "warning",
        `${reference} ${code} is ${basis === "assumed" ? "assumed" : "presumed from a code's table"}, not confirmed by investigation. To be confirmed${by}; not for construction before that.`,
      ),
    );
  }
  if (purpose === "preliminary")
    found.push(
      finding(
        "preliminary-value",
        "warning",
        `${reference} ${code} is preliminary: not for final design or construction.`,
      ),
    );
  if (holesNear?.length === 0)
    found.push(
      finding(
        "no-hole-near",
        "note",
        `No exploratory hole lies within ${nearestHoleLimit_m} m of the footing. Inspect the formation with that in mind.`,
      ),
    );
  return found;
}

const basisInWords = (basis: string): string =>
  loadBasisTitles[basis as keyof typeof loadBasisTitles] ?? basis;
