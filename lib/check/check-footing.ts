import { solveBase } from "@/lib/methods/base-pressure/index";
import { KERN_TOLERANCE } from "@/lib/methods/base-pressure/solve";
import { overturningFactors } from "@/lib/methods/overturning/index";
import { factorOver, slidingApplied, slidingResistance } from "@/lib/methods/sliding/index";
import { computedAllowable, statedAllowable, waterHead } from "./allowable";
import {
  backfillWeight,
  baseMoment,
  baseVertical,
  bearingDemand,
  buoyancy,
  effectiveOverburden,
  foundingDepth,
  padWeight,
} from "./formulas";
import type {
  CheckedLoad,
  CheckVerdict,
  CombinationResult,
  Finding,
  FootingCheckInput,
  FootingCheckResult,
} from "./input";

/** The same for every combination of one footing: weights, water, overburden. */
type Fixed = {
  depth_m: number;
  padWeight_kN: number;
  backfillWeight_kN: number;
  waterHead_m: number;
  buoyancy_kN: number;
  overburden_kPa: number;
  stated_kPa: number | null;
};

/**
 * One footing, its combinations, one value, the criteria (definitions: DEVELOPERS.md, "The check"). Pure and
 * deterministic. Comparisons are made on unrounded figures; a figure that has no bound is null and never passes.
 * The input must have come through `footingCheckInput` or the register, whose columns hold the same limits.
 */
export function checkFooting(input: FootingCheckInput): FootingCheckResult {
  const { footing, loads, value, criteria } = input;
  const findings: Finding[] = [];
  const { breadth_m, length_m } = footing;
  const depth_m = foundingDepth.of(footing);
  const waterHead_m = waterHead(value.groundwaterLevel_m, footing.foundingLevel_m);
  const stated = statedAllowable(value, Math.min(breadth_m, length_m), depth_m);
  const fixed: Fixed = {
    depth_m,
    padWeight_kN: padWeight.of(footing),
    backfillWeight_kN: backfillWeight.of({ ...footing, depth_m }),
    waterHead_m,
    buoyancy_kN: buoyancy.of({ waterHead_m, breadth_m, length_m }),
    overburden_kPa: effectiveOverburden.of({
      soilUnitWeight_kNm3: value.soilUnitWeight_kNm3,
      depth_m,
      waterHead_m,
    }),
    stated_kPa: stated.netAllowable_kPa,
  };
  collectOutside(input, depth_m, stated.outside, findings);
  const outside = findings.length > 0;

  const combinations: CombinationResult[] = new Array(loads.length);
  let governing = 0;
  let worst = -1;
  let bearing: number | null = 0;
  let required: number | null = 0;
  let maxPressure_kPa: number | null = 0;
  let minContactRatio = 1;
  let factorSliding: number | null = null;
  let factorOverturning: number | null = null;
  let factorUplift: number | null = null;
  for (let at = 0; at < loads.length; at += 1) {
    const result = combine(loads[at] as CheckedLoad, input, fixed);
    combinations[at] = result;
    // Without a bound is worse than any number; of equals the first governs.
    const rank = result.utilisation ?? Number.POSITIVE_INFINITY;
    if (rank > worst) {
      worst = rank;
      governing = at;
    }
    bearing = larger(bearing, result.utilisationBearing);
    required = larger(required, result.requiredNet_kPa);
    maxPressure_kPa = larger(maxPressure_kPa, result.maxPressure_kPa);
    if (result.contactRatio < minContactRatio) minContactRatio = result.contactRatio;
    factorSliding = smaller(factorSliding, result.factorSliding);
    factorOverturning = smaller(factorOverturning, result.factorOverturning);
    factorUplift = smaller(factorUplift, result.factorUplift);
    collectFailures(result, criteria, findings);
  }
  const utilisation = Number.isFinite(worst) ? worst : null;
  return {
    verdict: verdictOf(outside, utilisation),
    governingCombination: loads[governing]?.name ?? "",
    utilisation,
    utilisationBearing: bearing,
    requiredNet_kPa: required,
    maxPressure_kPa,
    minContactRatio,
    factorSliding,
    factorOverturning,
    factorUplift,
    depth_m,
    padWeight_kN: fixed.padWeight_kN,
    backfillWeight_kN: fixed.backfillWeight_kN,
    waterHead_m,
    buoyancy_kN: fixed.buoyancy_kN,
    overburden_kPa: fixed.overburden_kPa,
    findings,
    combinations,
  };
}

/** Written so that NaN fails: only a number that is at most one passes. */
const verdictOf = (outside: boolean, utilisation: number | null): CheckVerdict =>
  outside ? "outside conditions" : utilisation !== null && utilisation <= 1 ? "passes" : "fails";

const larger = (one: number | null, other: number | null): number | null =>
  one === null || other === null ? null : other > one || Number.isNaN(other) ? other : one;
const smaller = (one: number | null, other: number | null): number | null =>
  one === null ? other : other === null ? one : Math.min(one, other);

/** Demand over capacity, never below zero; null where a demand stands on no capacity. */
function share(demand: number, capacity: number): number | null {
  if (!(demand > 0)) return Number.isNaN(demand) ? null : 0;
  return capacity > 0 ? demand / capacity : null;
}

function combine(load: CheckedLoad, input: FootingCheckInput, fixed: Fixed): CombinationResult {
  const { footing, value, criteria } = input;
  const { breadth_m, length_m, loadHeight_m } = footing;
  const { overburden_kPa, padWeight_kN, backfillWeight_kN, buoyancy_kN } = fixed;
  const baseVertical_kN = baseVertical.of({
    vertical_kN: load.vertical_kN,
    padWeight_kN,
    backfillWeight_kN,
    buoyancy_kN,
  });
  const momentB_kNm = baseMoment.of({
    moment_kNm: load.momentB_kNm,
    horizontal_kN: load.horizontalB_kN,
    loadHeight_m,
  });
  const momentL_kNm = baseMoment.of({
    moment_kNm: load.momentL_kNm,
    horizontal_kN: load.horizontalL_kN,
    loadHeight_m,
  });
  const base = solveBase({ breadth_m, length_m, vertical_kN: baseVertical_kN, momentB_kNm, momentL_kNm });
  const effectiveBreadth_m = base.equilibrium ? breadth_m - 2 * Math.abs(base.eccentricityB_m as number) : 0;
  const effectiveLength_m = base.equilibrium ? length_m - 2 * Math.abs(base.eccentricityL_m as number) : 0;
  const effectivePressure_kPa = base.equilibrium
    ? baseVertical_kN / (effectiveBreadth_m * effectiveLength_m)
    : null;

  const pressure_kPa = value.comparedWith === "maximum" ? base.maxPressure_kPa : effectivePressure_kPa;
  const demandNet_kPa = pressure_kPa === null ? null : bearingDemand.of({ pressure_kPa, overburden_kPa });
  const durationFactor = load.duration === "permanent" ? 1 : value.durationFactors[load.duration];
  const netAllowable_kPa =
    value.kind === "parameters"
      ? computedAllowable(value.parameters, footing, value, {
          effectiveBreadth_m,
          effectiveLength_m,
          vertical_kN: baseVertical_kN,
          horizontalB_kN: load.horizontalB_kN,
          horizontalL_kN: load.horizontalL_kN,
          depth_m: fixed.depth_m,
          overburden_kPa,
        })
      : fixed.stated_kPa;
  const capacityNet_kPa = netAllowable_kPa === null ? null : netAllowable_kPa * durationFactor;
  const utilisationBearing =
    demandNet_kPa === null || capacityNet_kPa === null ? null : share(demandNet_kPa, capacityNet_kPa);

  const contactArea_m2 = base.contactRatio * breadth_m * length_m;
  const slidingResistance_kN = slidingResistance.of({
    vertical_kN: Math.max(0, baseVertical_kN),
    interfaceAngle_deg: criteria.interfaceAngle_deg,
    adhesion_kPa: criteria.adhesion_kPa,
    contactArea_m2,
    passive_kN: 0,
  });
  const slidingApplied_kN = slidingApplied.of(load);
  const { factorOfSafety: factorOverturning } = overturningFactors({
    breadth_m,
    length_m,
    vertical_kN: Math.max(0, baseVertical_kN),
    momentB_kNm,
    momentL_kNm,
  });
  const stabilising_kN = Math.max(0, load.vertical_kN) + padWeight_kN + backfillWeight_kN;
  const uplift_kN = buoyancy_kN + Math.max(0, -load.vertical_kN);
  const utilisationContact = contactUtilisation(
    load,
    base.kernSum,
    base.contactRatio,
    base.equilibrium,
    criteria,
  );
  const utilisationSliding = share(slidingApplied_kN * criteria.slidingFactor, slidingResistance_kN);
  const utilisationOverturning =
    factorOverturning === null ? 0 : share(criteria.overturningFactor, factorOverturning);
  const utilisationUplift = share(uplift_kN * criteria.upliftFactor, stabilising_kN);
  return {
    name: load.name,
    duration: load.duration,
    baseVertical_kN,
    momentB_kNm,
    momentL_kNm,
    eccentricityB_m: base.eccentricityB_m,
    eccentricityL_m: base.eccentricityL_m,
    kernSum: base.kernSum,
    withinMiddleThird: base.withinMiddleThird,
    distribution: base.distribution,
    equilibrium: base.equilibrium,
    maxPressure_kPa: base.maxPressure_kPa,
    minPressure_kPa: base.minPressure_kPa,
    cornerPressures_kPa: base.cornerPressures_kPa,
    contactRatio: base.contactRatio,
    effectiveBreadth_m,
    effectiveLength_m,
    effectivePressure_kPa,
    demandNet_kPa,
    durationFactor,
    netAllowable_kPa,
    capacityNet_kPa,
    requiredNet_kPa: demandNet_kPa === null ? null : Math.max(0, demandNet_kPa / durationFactor),
    utilisationBearing,
    utilisationContact,
    slidingResistance_kN,
    slidingApplied_kN,
    factorSliding: factorOver(slidingResistance_kN, slidingApplied_kN),
    utilisationSliding,
    factorOverturning,
    utilisationOverturning,
    factorUplift: factorOver(stabilising_kN, uplift_kN),
    utilisationUplift,
    utilisation: larger(
      larger(
        larger(utilisationBearing, utilisationContact),
        larger(utilisationSliding, utilisationOverturning),
      ),
      utilisationUplift,
    ),
  };
}

/** Eccentricity against the limit for the combination's duration: middle third for permanent, contact for the rest. */
function contactUtilisation(
  load: CheckedLoad,
  kernSum: number | null,
  contactRatio: number,
  equilibrium: boolean,
  criteria: FootingCheckInput["criteria"],
): number | null {
  if (!equilibrium || kernSum === null) return null;
  if (load.duration === "permanent") {
    if (!criteria.permanentWithinMiddleThird) return 0;
    // On the edge of the middle third to the last digit is inside it.
    return Math.abs(kernSum - 1) <= KERN_TOLERANCE ? 1 : kernSum;
  }
  const least =
    load.duration === "transient" ? criteria.transientMinContactRatio : criteria.accidentalMinContactRatio;
  return share(least, contactRatio);
}

function collectOutside(
  { footing, value }: FootingCheckInput,
  depth_m: number,
  tableLimit: string | null,
  findings: Finding[],
): void {
  const add = (code: string, message: string) =>
    findings.push({ code, severity: "outside", message, combination: null });
  const smaller_m = Math.min(footing.breadth_m, footing.length_m);
  if (value.minBreadth_m !== null && smaller_m < value.minBreadth_m)
    add(
      "breadth",
      `The smaller side ${smaller_m} m is less than the smallest breadth the value holds for, ${value.minBreadth_m} m.`,
    );
  if (value.maxBreadth_m !== null && smaller_m > value.maxBreadth_m)
    add(
      "breadth",
      `The smaller side ${smaller_m} m is more than the largest breadth the value holds for, ${value.maxBreadth_m} m.`,
    );
  if (
    value.minFoundingDepth_m !== null &&
    depth_m < value.minFoundingDepth_m &&
    !close(depth_m, value.minFoundingDepth_m)
  )
    add(
      "cover",
      `The founding depth ${rounded(depth_m)} m is less than the smallest cover the value asks for, ${value.minFoundingDepth_m} m.`,
    );
  if (tableLimit !== null) add("table", tableLimit);
}

/** A depth is a difference of levels: 102.40 − 101.20 is 1.2 m, whatever the last binary digit says. */
const close = (one: number, other: number): boolean => Math.abs(one - other) <= 1e-9;
const rounded = (value: number, digits = 3): number => Number(value.toFixed(digits));

function collectFailures(
  r: CombinationResult,
  criteria: FootingCheckInput["criteria"],
  findings: Finding[],
): void {
  const add = (code: string, severity: Finding["severity"], message: string) =>
    findings.push({ code, severity, message, combination: r.name });
  if (!r.equilibrium)
    add(
      "no-equilibrium",
      "fails",
      r.baseVertical_kN > 0
        ? "No equilibrium: the resultant falls on or outside the edge of the base."
        : "No equilibrium: nothing presses the base down.",
    );
  if (r.utilisationBearing !== null && !(r.utilisationBearing <= 1))
    add(
      "bearing",
      "fails",
      `Bearing: ${rounded(r.demandNet_kPa as number, 1)} kPa net against ${rounded(r.capacityNet_kPa as number, 1)} kPa allowed.`,
    );
  else if (r.utilisationBearing === null && r.equilibrium && r.netAllowable_kPa !== null)
    add("bearing", "fails", "Bearing: the ground has no resistance left under this inclination of the load.");
  if (r.utilisationContact !== null && !(r.utilisationContact <= 1))
    add(
      r.duration === "permanent" ? "middle-third" : "contact",
      "fails",
      r.duration === "permanent"
        ? `The permanent resultant leaves the middle third: 6|eB|/B + 6|eL|/L is ${rounded(r.kernSum as number)}.`
        : `Only ${rounded(r.contactRatio * 100, 1)} % of the base is in contact.`,
    );
  if (!(r.utilisationSliding !== null && r.utilisationSliding <= 1))
    add(
      "sliding",
      "fails",
      `Sliding: factor ${rounded(r.factorSliding ?? 0, 2)} where ${criteria.slidingFactor} is asked.`,
    );
  if (!(r.utilisationOverturning !== null && r.utilisationOverturning <= 1))
    add(
      "overturning",
      "fails",
      `Overturning: factor ${rounded(r.factorOverturning ?? 0, 2)} where ${criteria.overturningFactor} is asked.`,
    );
  if (!(r.utilisationUplift !== null && r.utilisationUplift <= 1))
    add(
      "uplift",
      "fails",
      `Uplift: factor ${rounded(r.factorUplift ?? 0, 2)} where ${criteria.upliftFactor} is asked.`,
    );
  if (r.equilibrium && !r.withinMiddleThird && r.utilisationContact !== null && r.utilisationContact <= 1)
    add("partial-contact", "note", `${rounded(r.contactRatio * 100, 1)} % of the base is in contact.`);
}
