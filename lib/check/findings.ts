import type { CombinationResult, Finding, FootingCheckInput } from "./input";

const rounded = (value: number, digits = 3): number => Number(value.toFixed(digits));

/** Two figures with as many decimals as it takes to tell them apart: never "150 against 150". */
function apart(one: number, other: number, digits: number): [string, string] {
  for (let more = digits; more < 15; more += 1) {
    const [left, right] = [one.toFixed(more), other.toFixed(more)];
    if (left !== right || one === other) return [left, right];
  }
  return [String(one), String(other)];
}

/** Says which of the value's stated conditions the footing is outside of. */
export function collectOutside(
  { footing, loads, value }: FootingCheckInput,
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
  if (value.minFoundingDepth_m !== null && depth_m < value.minFoundingDepth_m)
    add(
      "cover",
      `The founding depth ${rounded(depth_m)} m is less than the smallest cover the value asks for, ${value.minFoundingDepth_m} m.`,
    );
  if (tableLimit !== null) add("table", tableLimit);
  if (
    value.kind === "parameters" &&
    value.parameters.theory === "terzaghi" &&
    loads.some((load) => load.horizontalB_kN !== 0 || load.horizontalL_kN !== 0)
  )
    add(
      "no-inclination",
      "The value is computed by Terzaghi's theory, which knows no inclined load, and horizontal loads act.",
    );
}

/** Says which requirements one combination does not meet, each with the figures that decide. */
export function collectFailures(
  r: CombinationResult,
  { criteria }: FootingCheckInput,
  findings: Finding[],
): void {
  if (r.utilisation !== null && r.utilisation <= 1) return;
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
  if (r.utilisationBearing !== null && !(r.utilisationBearing <= 1)) {
    const [demand, capacity] = apart(r.demandNet_kPa ?? 0, r.capacityNet_kPa ?? 0, 1);
    add("bearing", "fails", `Bearing: ${demand} kPa net against ${capacity} kPa allowed.`);
  } else if (r.utilisationBearing === null && r.equilibrium && r.netAllowable_kPa !== null)
    add("bearing", "fails", "Bearing: the ground has no resistance left under this load.");
  const withinContact = r.utilisationContact !== null && r.utilisationContact <= 1;
  if (r.equilibrium && !withinContact) {
    if (r.duration === "permanent")
      add(
        "middle-third",
        "fails",
        `The permanent resultant leaves the middle third: 6|eB|/B + 6|eL|/L is ${apart(r.kernSum ?? 0, 1, 3)[0]}, more than 1.`,
      );
    else {
      const least =
        r.duration === "transient" ? criteria.transientMinContactRatio : criteria.accidentalMinContactRatio;
      const [contact, asked] = apart(r.contactRatio * 100, least * 100, 1);
      add("contact", "fails", `Only ${contact} % of the base is in contact where ${asked} % is asked.`);
    }
  }
  if (!(r.utilisationSliding !== null && r.utilisationSliding <= 1)) {
    const [factor, asked] = apart(r.factorSliding ?? 0, criteria.slidingFactor, 2);
    add("sliding", "fails", `Sliding: factor ${factor} where ${asked} is asked.`);
  }
  if (!(r.utilisationOverturning !== null && r.utilisationOverturning <= 1)) {
    const [factor, asked] = apart(r.factorOverturning ?? 0, criteria.overturningFactor, 2);
    add("overturning", "fails", `Overturning: factor ${factor} where ${asked} is asked.`);
  }
  if (!(r.utilisationUplift !== null && r.utilisationUplift <= 1)) {
    const [factor, asked] = apart(r.factorUplift ?? 0, criteria.upliftFactor, 2);
    add("uplift", "fails", `Uplift: factor ${factor} where ${asked} is asked.`);
  }
}

/** Says, once for the pad, that part of its base lifts although no requirement is broken by that. */
export function notePartialContact(
  { footing }: FootingCheckInput,
  combinations: readonly CombinationResult[],
  findings: Finding[],
): void {
  let least: CombinationResult | null = null;
  let most: CombinationResult | null = null;
  let number = 0;
  let share = 1 / 3;
  for (const result of combinations) {
    if (!result.equilibrium || result.withinMiddleThird) continue;
    number += 1;
    if (least === null || result.contactRatio < least.contactRatio) least = result;
    const alongB = Math.abs(result.eccentricityB_m ?? 0) / footing.breadth_m;
    const alongL = Math.abs(result.eccentricityL_m ?? 0) / footing.length_m;
    if (Math.max(alongB, alongL) > share) {
      share = Math.max(alongB, alongL);
      most = result;
    }
  }
  if (least !== null)
    findings.push({
      code: "partial-contact",
      severity: "note",
      message: `Part of the base lifts in ${number} of ${combinations.length} combinations; ${rounded(least.contactRatio * 100, 1)} % stays in contact at the least.`,
      combination: least.name,
    });
  if (most !== null)
    findings.push({
      code: "large-eccentricity",
      severity: "warning",
      message:
        "The eccentricity is more than a third of the side: review the actions and allow for a tolerance of up to 0.10 m in the position of the edge (EN 1997-1:2004, 6.5.4).",
      combination: most.name,
    });
}

/** Says what a reader should know of the pad as a whole, whatever the loads. */
export function collectNotes(
  { footing, value }: FootingCheckInput,
  { depth_m, overburden_kPa }: { depth_m: number; overburden_kPa: number },
  findings: Finding[],
): void {
  const add = (code: string, severity: Finding["severity"], message: string) =>
    findings.push({ code, severity, message, combination: null });
  if (footing.thickness_m > depth_m)
    add(
      "pad-above-ground",
      "note",
      `The pad is ${rounded(footing.thickness_m)} m thick and founded ${rounded(depth_m)} m deep: its top stands above the ground.`,
    );
  if (value.groundwaterLevel_m !== null && value.groundwaterLevel_m > footing.groundLevel_m)
    add(
      "water-above-ground",
      "warning",
      `The value's groundwater level ${value.groundwaterLevel_m} m lies above the ground at the footing, ${footing.groundLevel_m} m.`,
    );
  if (overburden_kPa < 0)
    add(
      "no-overburden",
      "warning",
      `Water takes away all effective overburden at founding level: ${rounded(overburden_kPa, 1)} kPa.`,
    );
}
