import type { FootingCheckInput } from "./input";

/** A figure reached the check that is no finite number, or a size that is none: a fault before the check, not in it. */
export class UnusableInput extends Error {
  constructor(readonly fields: readonly string[]) {
    super(`The check cannot use: ${fields.join(", ")}.`);
    this.name = "UnusableInput";
  }
}

/**
 * Refuses an input in which any figure is missing, NaN, infinite or no number, or which has no loads. One sum decides for
 * the good case, since whatever is no finite number makes it none; only then are names looked for.
 */
export function assertUsable({ footing: f, loads, value: v, criteria: c }: FootingCheckInput): void {
  let sum: unknown =
    f.breadth_m +
    f.length_m +
    f.thickness_m +
    f.groundLevel_m +
    f.foundingLevel_m +
    f.loadHeight_m +
    f.concreteUnitWeight_kNm3 +
    f.backfillUnitWeight_kNm3 +
    v.soilUnitWeight_kNm3 +
    (v.groundwaterLevel_m ?? 0) +
    (v.minFoundingDepth_m ?? 0) +
    (v.minBreadth_m ?? 0) +
    (v.maxBreadth_m ?? 0) +
    v.durationFactors.transient +
    v.durationFactors.accidental +
    c.slidingFactor +
    c.overturningFactor +
    c.upliftFactor +
    c.interfaceAngle_deg +
    c.adhesion_kPa +
    c.transientMinContactRatio +
    c.accidentalMinContactRatio;
  if (v.kind === "single") sum = (sum as number) + v.netAllowable_kPa;
  for (const load of loads)
    sum =
      (sum as number) +
      load.vertical_kN +
      load.momentB_kNm +
      load.momentL_kNm +
      load.horizontalB_kN +
      load.horizontalL_kN;
  const sized =
    f.breadth_m > 0 && f.length_m > 0 && f.thickness_m > 0 && f.groundLevel_m >= f.foundingLevel_m;
  const kinded = v.kind === "single" ? v.netAllowable_kPa > 0 : noneIn(v, "value").length === 0;
  if (Number.isFinite(sum) && sized && kinded && loads.length > 0) return;
  const named = [
    ...noneIn(f, "footing"),
    ...loads.flatMap((load) => noneIn(load, `loads ${load.name}`)),
    ...noneIn(v, "value"),
    ...noneIn(c, "criteria"),
  ];
  if (named.length === 0 && !sized) named.push("the size of the footing");
  if (named.length === 0 && loads.length === 0) named.push("loads");
  throw new UnusableInput(named.length > 0 ? named : ["a figure that is too large or of the wrong sign"]);
}

/** Names of the figures in a record that are no finite numbers. Words, choices and what is stated as none are left. */
function noneIn(record: object, at: string): string[] {
  return Object.entries(record).flatMap(([name, figure]) => {
    if (figure === null || typeof figure === "boolean") return [];
    if (typeof figure === "object") return noneIn(figure, `${at}.${name}`);
    if (typeof figure === "string") return words.has(name) ? [] : [`${at}.${name}`];
    return Number.isFinite(figure) ? [] : [`${at}.${name}`];
  });
}

const words = new Set(["name", "duration", "kind", "comparedWith", "theory", "drainage", "convention"]);
