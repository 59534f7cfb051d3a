import { solveBase } from "@/lib/methods/base-pressure/index";
import { KERN_TOLERANCE } from "@/lib/methods/base-pressure/solve";
import { effectiveAreaOf } from "@/lib/methods/effective-area/index";
import { overturningFactors } from "@/lib/methods/overturning/index";
import { factorOver, slidingApplied, slidingResistance } from "@/lib/methods/sliding/index";
import { computedAllowable, statedAllowable } from "./allowable";
import { assertUsable } from "./assert-usable";
import { collectFailures, collectNotes, collectOutside, notePartialContact } from "./findings";
import {
  backfillWeight,
  baseMoment,
  baseVertical,
  bearingDemand,
  buoyancy,
  contactArea,
  effectiveOverburden,
  effectivePressure,
  foundingDepth,
  padWeight,
  requiredNet,
  stabilisingLoad,
  upliftLoad,
  waterHead,
} from "./formulas";
import type {
  CheckedLoad,
  CheckVerdict,
  CombinationResult,
  Finding,
  FootingCheckInput,
  FootingCheckResult,
  Requirement,
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
 * One footing, its combinations, one value, the criteria (definitions: the formulas beside this file). Pure and
 * deterministic. Comparisons are made on unrounded figures; a figure that has no bound is null and never passes. The
 * input has come through `footingCheckInput` or the register, whose columns hold the same limits; a figure that is none
 * all the same is refused by an `UnusableInput`, never checked.
 */
export function checkFooting(input: FootingCheckInput): FootingCheckResult {
  assertUsable(input);
  const { footing, loads, value } = input;
  const { breadth_m, length_m } = footing;
  const depth_m = foundingDepth.of(footing);
  const waterHead_m = waterHead(value.groundwaterLevel_m, footing.foundingLevel_m);
  const stated = statedAllowable(value, Math.min(breadth_m, length_m), depth_m);
  const fixed: Fixed = {
    depth_m,
    padWeight_kN: padWeight.of(footing),
    backfillWeight_kN: backfillWeight.of({
      breadth_m,
      length_m,
      depth_m,
      thickness_m: footing.thickness_m,
      backfillUnitWeight_kNm3: footing.backfillUnitWeight_kNm3,
    }),
    waterHead_m,
    buoyancy_kN: buoyancy.of({ waterHead_m, breadth_m, length_m }),
    overburden_kPa: effectiveOverburden.of({
      soilUnitWeight_kNm3: value.soilUnitWeight_kNm3,
      depth_m,
      waterHead_m,
    }),
    stated_kPa: stated.netAllowable_kPa,
  };
  const findings: Finding[] = [];
  collectOutside(input, depth_m, stated.outside, findings);
  const outside = findings.length > 0;

  const combinations: CombinationResult[] = new Array(loads.length);
  let governing = 0;
  let worst = -1;
  let bearing: number | null = 0;
  let required: number | null = Number.NEGATIVE_INFINITY;
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
    collectFailures(result, input, findings);
  }
  if (minContactRatio < 1) notePartialContact(input, combinations, findings);
  collectNotes(input, fixed, findings);
  const utilisation = Number.isFinite(worst) ? worst : null;
  return {
    verdict: verdictOf(outside, utilisation),
    governingCombination: loads[governing]?.name ?? "",
    governedBy: combinations[governing]?.governedBy ?? "bearing",
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
  const { effectiveBreadth_m, effectiveLength_m, effectiveArea_m2 } = base.equilibrium
    ? effectiveAreaOf({
        breadth_m,
        length_m,
        eccentricityB_m: base.eccentricityB_m ?? 0,
        eccentricityL_m: base.eccentricityL_m ?? 0,
      })
    : { effectiveBreadth_m: 0, effectiveLength_m: 0, effectiveArea_m2: 0 };
  const effectivePressure_kPa =
    effectiveArea_m2 > 0
      ? effectivePressure.of({ vertical_kN: baseVertical_kN, effectiveBreadth_m, effectiveLength_m })
      : null;

  const pressure_kPa = value.comparedWith === "maximum" ? base.maxPressure_kPa : effectivePressure_kPa;
  const demandNet_kPa = pressure_kPa === null ? null : bearingDemand.of({ pressure_kPa, overburden_kPa });
  const durationFactor = load.duration === "permanent" ? 1 : value.durationFactors[load.duration];
  const requiredNet_kPa = demandNet_kPa === null ? null : requiredNet.of({ demandNet_kPa, durationFactor });
  let netAllowable_kPa = fixed.stated_kPa;
  let ultimate_kPa: number | null = null;
  let settlementCap_kPa: number | null = null;
  if (value.kind === "parameters") {
    settlementCap_kPa = value.parameters.settlementCap_kPa;
    const computed = computedAllowable(value, footing, {
      effectiveBreadth_m,
      effectiveLength_m,
      vertical_kN: baseVertical_kN,
      horizontalB_kN: load.horizontalB_kN,
      horizontalL_kN: load.horizontalL_kN,
      depth_m: fixed.depth_m,
      overburden_kPa,
    });
    netAllowable_kPa = computed?.netAllowable_kPa ?? null;
    ultimate_kPa = computed?.ultimate_kPa ?? null;
  }
  // What settlement allows is not raised for a short load.
  const strength_kPa = netAllowable_kPa === null ? null : netAllowable_kPa * durationFactor;
  const capacityNet_kPa =
    strength_kPa === null || settlementCap_kPa === null
      ? strength_kPa
      : Math.min(strength_kPa, settlementCap_kPa);
  // The required value over the stated one, so that a stored required value and a check never disagree by rounding.
  const utilisationBearing =
    demandNet_kPa === null || requiredNet_kPa === null || netAllowable_kPa === null
      ? null
      : settlementCap_kPa === null
        ? share(requiredNet_kPa, netAllowable_kPa)
        : larger(share(requiredNet_kPa, netAllowable_kPa), share(demandNet_kPa, settlementCap_kPa));

  const contactArea_m2 = contactArea.of({ contactRatio: base.contactRatio, breadth_m, length_m });
  const slidingResistance_kN = slidingResistance.of({
    vertical_kN: Math.max(0, baseVertical_kN),
    interfaceAngle_deg: criteria.interfaceAngle_deg,
    adhesion_kPa: criteria.adhesion_kPa,
    contactArea_m2,
    passive_kN: 0,
  });
  const slidingApplied_kN = slidingApplied.of(load);
  const { factorOfSafetyB, factorOfSafetyL, factorOfSafety } = overturningFactors({
    breadth_m,
    length_m,
    vertical_kN: Math.max(0, baseVertical_kN),
    momentB_kNm,
    momentL_kNm,
  });
  const { vertical_kN } = load;
  const stabilising_kN = stabilisingLoad.of({ vertical_kN, padWeight_kN, backfillWeight_kN });
  const uplift_kN = upliftLoad.of({ buoyancy_kN, vertical_kN });
  const utilisationContact = base.equilibrium
    ? contactUtilisation(load, base.kernSum ?? Number.NaN, base.contactRatio, criteria)
    : null;
  const utilisationSliding = share(slidingApplied_kN * criteria.slidingFactor, slidingResistance_kN);
  const utilisationOverturning =
    factorOfSafety === null ? 0 : share(criteria.overturningFactor, factorOfSafety);
  const utilisationUplift = share(uplift_kN * criteria.upliftFactor, stabilising_kN);

  let utilisation = utilisationBearing;
  let governedBy: Requirement = base.equilibrium ? "bearing" : "equilibrium";
  if (exceeds(utilisationContact, utilisation)) {
    utilisation = utilisationContact;
    governedBy = load.duration === "permanent" ? "middle third" : "contact";
  }
  if (exceeds(utilisationSliding, utilisation)) {
    utilisation = utilisationSliding;
    governedBy = "sliding";
  }
  if (exceeds(utilisationOverturning, utilisation)) {
    utilisation = utilisationOverturning;
    governedBy = "overturning";
  }
  if (exceeds(utilisationUplift, utilisation)) {
    utilisation = utilisationUplift;
    governedBy = "uplift";
  }
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
    contactArea_m2,
    effectiveBreadth_m,
    effectiveLength_m,
    effectivePressure_kPa,
    demandNet_kPa,
    durationFactor,
    ultimate_kPa,
    netAllowable_kPa,
    capacityNet_kPa,
    requiredNet_kPa,
    utilisationBearing,
    utilisationContact,
    slidingResistance_kN,
    slidingApplied_kN,
    factorSliding: factorOver(slidingResistance_kN, slidingApplied_kN),
    utilisationSliding,
    factorOverturningB: factorOfSafetyB,
    factorOverturningL: factorOfSafetyL,
    factorOverturning: factorOfSafety,
    utilisationOverturning,
    stabilising_kN,
    uplift_kN,
    factorUplift: factorOver(stabilising_kN, uplift_kN),
    utilisationUplift,
    utilisation,
    governedBy,
  };
}

/** Whether one utilisation governs over another: none at all is worse than any number. */
const exceeds = (one: number | null, other: number | null): boolean =>
  other !== null && (one === null || !(one <= other));

/** Eccentricity against the limit for the combination's duration: middle third for permanent, contact for the rest. */
function contactUtilisation(
  load: CheckedLoad,
  kernSum: number,
  contactRatio: number,
  criteria: FootingCheckInput["criteria"],
): number | null {
  if (load.duration === "permanent") {
    if (!criteria.permanentWithinMiddleThird) return 0;
    // On the edge of the middle third to the last digit is inside it.
    return Math.abs(kernSum - 1) <= KERN_TOLERANCE ? 1 : kernSum;
  }
  const least =
    load.duration === "transient" ? criteria.transientMinContactRatio : criteria.accidentalMinContactRatio;
  return share(least, contactRatio);
}
