import type { DraftContent, DraftFinding, StatedFields } from "@/lib/contracts/values";
import { type Kind, SI_UNIT } from "@/lib/units/factors";
import { askIfPlausible } from "./plausible";
import { type Read, typedQuantity } from "./typed-quantity";

export type DraftReading = {
  /** Complete and within bounds, or null while there are problems. */
  fields: StatedFields | null;
  reasonCode: string;
  reason: string;
  problems: Record<string, string>;
  findings: DraftFinding[];
  /** The net pressure as far as it can be read, whatever else is missing. */
  netAllowable_kPa: number | null;
  /** What a check would read of it, each as far as nothing is wrong with it. */
  terms: Partial<DraftTerms>;
};

export type DraftTerms = Pick<StatedFields, (typeof termNames)[number]>;

const ranges = [
  "groundwaterLevel_m",
  "minBreadth_m",
  "maxBreadth_m",
  "minFoundingDepth_m",
  "highestFoundingLevel_m",
  "lowestFoundingLevel_m",
] as const;
const termNames = [
  "comparedWith",
  "loadBasis",
  "soilUnitWeight_kNm3",
  "transientFactor",
  "accidentalFactor",
  ...ranges,
] as const;

type Bounds = { least: number; most: number; open?: boolean; kind: Kind | null };
type Problems = Record<string, string>;

/**
 * Reads a draft as an engineer would before signing: what is missing or cannot be (by field), what is odd, and the
 * fields in SI when nothing is in the way. A gross figure is brought to net by taking off the overburden that goes
 * with it; both stay. `today` is an ISO date.
 */
export function readDraft(draft: DraftContent, ground: { soil: string; today: string }): DraftReading {
  const problems: Problems = {};
  const findings: DraftFinding[] = [];
  const choose = <Word>(
    name: keyof DraftContent,
    chosen: Word | null | undefined,
    sentence: string,
  ): Word | null => {
    if (chosen === null || chosen === undefined) problems[name] = sentence;
    return chosen ?? null;
  };
  const amount = (name: keyof DraftContent & `${string}`, bounds: Bounds, missing?: string): number | null =>
    take(
      problems,
      name,
      typedQuantity(draft[name] as string | number | null | undefined, bounds.kind),
      bounds,
      missing,
    );

  const pressure = readPressure(draft, problems);
  const choices = readChoices(choose, draft);
  const factors = readTransient(draft, problems, amount);
  const ranges = readRanges(problems, amount);
  const factorOfSafety = amount(
    "factorOfSafety",
    { least: 1, most: 10, kind: null },
    draft.factorConvention && draft.factorConvention !== "not-stated"
      ? "State the factor that this convention was used with."
      : undefined,
  );
  const settlementLimit_mm = amount(
    "settlementLimit_mm",
    { least: 0, most: 500, open: true, kind: "settlement" },
    draft.governedBy === "settlement"
      ? "A value governed by settlement states the settlement it allows."
      : undefined,
  );
  const settlementPredicted_mm = amount("settlementPredicted_mm", {
    least: 0,
    most: 500,
    kind: "settlement",
  });
  const confirmation = readBasis(draft, problems);
  const texts = readTexts(draft, problems);
  askAround(draft, ground, pressure.net_kPa, confirmation.confirmBy, findings);

  const complete = Object.keys(problems).length === 0;
  const fields = {
    netAllowable_kPa: pressure.net_kPa,
    given: pressure.given,
    given_kPa: pressure.given_kPa,
    givenOverburden_kPa: pressure.overburden_kPa,
    factorOfSafety,
    settlementLimit_mm,
    settlementPredicted_mm,
    ...choices,
    ...factors,
    ...ranges,
    ...confirmation,
    groundwaterBasis: texts.groundwaterBasis,
    neighbours: texts.neighbours,
    conditions: texts.conditions,
  };
  return {
    // Without problems every field has been read; that is what a problem means.
    fields: complete ? (fields as StatedFields) : null,
    reasonCode: draft.reasonCode ?? "",
    reason: texts.reason,
    problems,
    findings,
    netAllowable_kPa: pressure.net_kPa,
    terms: readable(fields, problems),
  };
}

/** Fields that can be used as they stand; an empty range is a term too, an empty choice is not. */
function readable(fields: Record<string, unknown>, problems: Problems): Partial<DraftTerms> {
  const empty: readonly string[] = ranges;
  return Object.fromEntries(
    termNames
      .filter((name) => !(name in problems) && (fields[name] !== null || empty.includes(name)))
      .map((name) => [name, fields[name]]),
  );
}

function take(problems: Problems, name: string, read: Read, bounds: Bounds, missing?: string): number | null {
  if ("problem" in read) {
    problems[name] = read.problem;
    return null;
  }
  if (read.amount === null) {
    if (missing) problems[name] = missing;
    return null;
  }
  const { least, most, open, kind } = bounds;
  const unit = kind === null ? "" : SI_UNIT[kind];
  if (read.amount < least || read.amount > most || (open && read.amount === least)) {
    const from = open ? `above ${least}` : `from ${least}`;
    problems[name] = `${from} to ${most}${unit && ` ${unit}`} is possible here.`.replace(/^./, (c) =>
      c.toUpperCase(),
    );
    return null;
  }
  return read.amount;
}

function readPressure(draft: DraftContent, problems: Problems) {
  const bounds: Bounds = { least: 0, most: 100_000, open: true, kind: "pressure" };
  const given_kPa = take(
    problems,
    "given",
    typedQuantity(draft.given, "pressure"),
    bounds,
    "Give the pressure as the report has it.",
  );
  const given = typeof draft.given === "number" ? `${draft.given} kPa` : (draft.given ?? "").trim();
  if (!draft.givenBasis)
    problems.givenBasis =
      "Net or gross: state which weights are included. If the report does not say, ask its author.";
  if (draft.givenBasis !== "gross") {
    return { given, given_kPa, overburden_kPa: null, net_kPa: draft.givenBasis === "net" ? given_kPa : null };
  }
  const overburden_kPa = take(
    problems,
    "givenOverburden_kPa",
    typedQuantity(draft.givenOverburden_kPa, "pressure"),
    { least: 0, most: 5000, kind: "pressure" },
    "A gross figure needs the overburden at founding level that it includes.",
  );
  if (given_kPa === null || overburden_kPa === null)
    return { given, given_kPa, overburden_kPa, net_kPa: null };
  // Under either factor convention the allowable gross exceeds the allowable net by the overburden (allowable-bearing).
  const net_kPa = given_kPa - overburden_kPa;
  if (net_kPa <= 0) {
    problems.givenOverburden_kPa = "Nothing is left of the gross figure once this overburden is taken off.";
    return { given, given_kPa, overburden_kPa, net_kPa: null };
  }
  return { given, given_kPa, overburden_kPa, net_kPa };
}

function readChoices(
  choose: <Word>(name: keyof DraftContent, chosen: Word | null | undefined, sentence: string) => Word | null,
  draft: DraftContent,
) {
  return {
    givenBasis: draft.givenBasis ?? null,
    factorConvention: choose(
      "factorConvention",
      draft.factorConvention,
      "Say whether the factor was put on the net or the gross ultimate, or that the report does not say.",
    ),
    comparedWith: choose(
      "comparedWith",
      draft.comparedWith,
      "Say which pressure of the footing it is compared with.",
    ),
    loadBasis: choose(
      "loadBasis",
      draft.loadBasis,
      "Say which loads it goes with: working or factored. They never mix.",
    ),
    governedBy: choose(
      "governedBy",
      draft.governedBy,
      "Say whether strength or settlement governs, or that it is not stated.",
    ),
    drainage: choose("drainage", draft.drainage, "Say whether the value is for drained or undrained ground."),
    basis: choose("basis", draft.basis, "Say where the value comes from."),
    purpose: choose("purpose", draft.purpose, "Say whether it is preliminary or good for design."),
    reasonCode: choose("reasonCode", draft.reasonCode, "Choose what led to this revision."),
  };
}

function readTransient(
  draft: DraftContent,
  problems: Problems,
  amount: (name: "transientFactor" | "accidentalFactor", bounds: Bounds, missing?: string) => number | null,
) {
  if (!draft.transientIncrease) {
    problems.transientIncrease = "Yes or no: does the report grant an increase for short-term loads?";
    return { transientIncrease: null, transientFactor: null, accidentalFactor: null };
  }
  if (draft.transientIncrease === "none")
    return { transientIncrease: "none", transientFactor: 1, accidentalFactor: 1 };
  if (draft.loadBasis === "characteristic-reduced")
    problems.transientIncrease = "Loads that are already reduced cannot have the increase as well.";
  const bounds: Bounds = { least: 1, most: 2, kind: null };
  const missing = "State the factor that the report grants; 1 where it grants none.";
  const transientFactor = amount("transientFactor", bounds, missing);
  const accidentalFactor = amount("accidentalFactor", bounds, missing);
  if (transientFactor === 1 && accidentalFactor === 1)
    problems.transientFactor = "Both factors are 1: then no increase is granted. Choose no instead.";
  return { transientIncrease: "granted", transientFactor, accidentalFactor };
}

function readRanges(
  problems: Problems,
  amount: (
    name:
      | "minBreadth_m"
      | "maxBreadth_m"
      | "minFoundingDepth_m"
      | "highestFoundingLevel_m"
      | "lowestFoundingLevel_m"
      | "groundwaterLevel_m"
      | "soilUnitWeight_kNm3",
    bounds: Bounds,
    missing?: string,
  ) => number | null,
) {
  const breadth: Bounds = { least: 0, most: 100, open: true, kind: "length" };
  const level: Bounds = { least: -500, most: 9000, kind: "length" };
  const minBreadth_m = amount("minBreadth_m", breadth);
  const maxBreadth_m = amount("maxBreadth_m", breadth);
  if (minBreadth_m !== null && maxBreadth_m !== null && maxBreadth_m < minBreadth_m)
    problems.maxBreadth_m = "The greatest breadth is less than the least.";
  const highestFoundingLevel_m = amount("highestFoundingLevel_m", level);
  const lowestFoundingLevel_m = amount("lowestFoundingLevel_m", level);
  if (
    highestFoundingLevel_m !== null &&
    lowestFoundingLevel_m !== null &&
    highestFoundingLevel_m < lowestFoundingLevel_m
  )
    problems.highestFoundingLevel_m = "The highest founding level is below the lowest.";
  return {
    minBreadth_m,
    maxBreadth_m,
    minFoundingDepth_m: amount("minFoundingDepth_m", { least: 0, most: 100, kind: "length" }),
    highestFoundingLevel_m,
    lowestFoundingLevel_m,
    groundwaterLevel_m: amount("groundwaterLevel_m", level),
    soilUnitWeight_kNm3: amount(
      "soilUnitWeight_kNm3",
      { least: 8, most: 28, kind: "unitWeight" },
      "State the unit weight of the soil above founding level.",
    ),
  };
}

function readBasis(draft: DraftContent, problems: Problems) {
  if (draft.basis === "recommended" && (draft.sources ?? []).length === 0)
    problems.sources = "A recommended value rests on at least one page of a report.";
  if (draft.basis !== "assumed" && draft.basis !== "presumptive")
    return { confirmBy: null, confirmWho: null };
  const confirmBy = (draft.confirmBy ?? "").trim();
  const confirmWho = (draft.confirmWho ?? "").trim();
  if (!isDate(confirmBy)) problems.confirmBy = "Give the day by which it is to be confirmed, as 2026-03-31.";
  if (confirmWho === "") problems.confirmWho = "Name who is to confirm it.";
  if (draft.purpose === "for-design")
    problems.purpose = "A value that no investigation has confirmed is preliminary.";
  return { confirmBy, confirmWho };
}

function isDate(text: string): boolean {
  if (!/^\d{4}-\d{2}-\d{2}$/.test(text)) return false;
  const [year = 0, month = 0, day = 0] = text.split("-").map(Number);
  const days = [
    31,
    (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0 ? 29 : 28,
    31,
    30,
    31,
    30,
    31,
    31,
    30,
    31,
    30,
    31,
  ];
  return year >= 1900 && month >= 1 && day >= 1 && day <= (days[month - 1] ?? 0);
}

function readTexts(draft: DraftContent, problems: Problems) {
  const groundwaterBasis = (draft.groundwaterBasis ?? "").trim();
  if (groundwaterBasis === "")
    problems.groundwaterBasis =
      "Say what the groundwater level rests on, or that none was met and down to what depth.";
  const reason = (draft.reason ?? "").trim();
  if (reason.length < 10) problems.reason = "Say in a sentence why this revision is made.";
  return {
    groundwaterBasis,
    reason,
    neighbours: (draft.neighbours ?? "").trim(),
    conditions: (draft.conditions ?? "").trim(),
  };
}

function askAround(
  draft: DraftContent,
  ground: { soil: string; today: string },
  net_kPa: number | null,
  confirmBy: string | null,
  findings: DraftFinding[],
): void {
  const odd = net_kPa === null ? null : askIfPlausible(ground.soil, net_kPa);
  if (odd) findings.push(odd);
  if (draft.loadBasis === "design-factored")
    findings.push({
      code: "allowable-with-factored-loads",
      field: "loadBasis",
      sentence:
        "An allowable pressure goes with working loads, a design resistance with factored ones. Is this one a resistance?",
      source: "common practice; EN 1997-1 2.4.7 keeps the two apart",
    });
  if (draft.transientIncrease === "granted" && draft.governedBy === "settlement")
    findings.push({
      code: "increase-on-settlement",
      field: "transientIncrease",
      sentence:
        "A value limited by settlement is seldom raised for short-term loads. Does the report say so?",
      source: "common practice",
    });
  if (confirmBy && isDate(confirmBy) && confirmBy < ground.today)
    findings.push({
      code: "confirmation-date-passed",
      field: "confirmBy",
      sentence: "The day by which this value was to be confirmed has passed.",
      source: "the draft itself",
    });
}
