import { type Kind, UNITS } from "./factors";

/** The systems of units that a project is shown in; what is kept and computed is SI always. */
export type UnitSystem = "si" | "kip-ft" | "tonne-metre";

/** What can be shown: the kinds, and a level, which is a length with more decimals. */
export type Shown = Kind | "level";

type Rule = { unit: string; decimals: number };

/** Unit and decimals of each thing shown. Common practice: kPa whole, levels to the millimetre, settlement whole mm. */
const RULES: Record<UnitSystem, Record<Shown, Rule>> = {
  si: {
    pressure: { unit: "kPa", decimals: 0 },
    force: { unit: "kN", decimals: 0 },
    moment: { unit: "kNm", decimals: 0 },
    length: { unit: "m", decimals: 2 },
    level: { unit: "m", decimals: 3 },
    settlement: { unit: "mm", decimals: 0 },
    unitWeight: { unit: "kN/m³", decimals: 1 },
  },
  "kip-ft": {
    pressure: { unit: "ksf", decimals: 2 },
    force: { unit: "kip", decimals: 1 },
    moment: { unit: "kip·ft", decimals: 1 },
    length: { unit: "ft", decimals: 2 },
    level: { unit: "ft", decimals: 2 },
    settlement: { unit: "in", decimals: 2 },
    unitWeight: { unit: "pcf", decimals: 0 },
  },
  "tonne-metre": {
    pressure: { unit: "t/m²", decimals: 1 },
    force: { unit: "t", decimals: 1 },
    moment: { unit: "t·m", decimals: 1 },
    length: { unit: "m", decimals: 2 },
    level: { unit: "m", decimals: 3 },
    settlement: { unit: "mm", decimals: 0 },
    unitWeight: { unit: "t/m³", decimals: 2 },
  },
};

/** What stands where there is no number. */
export const NO_NUMBER = "—";

/** The unit in which a system shows something, for the head of a column. */
export const unitOf = (shown: Shown, system: UnitSystem = "si"): string => RULES[system][shown].unit;

/** A number with so many decimals and a true minus sign; never −0. */
export function fixed(value: number, decimals: number): string {
  const text = Math.abs(value).toFixed(decimals);
  return value < 0 && Number(text) !== 0 ? `−${text}` : text;
}

/** An SI amount as a figure of a system, without its unit: for columns. `decimals` overrides the rule. */
export function figure(
  amount: number | null | undefined,
  shown: Shown,
  system: UnitSystem = "si",
  decimals?: number,
): string {
  if (amount === null || amount === undefined || !Number.isFinite(amount)) return NO_NUMBER;
  return fixed(amount / factorOf(shown, system), decimals ?? RULES[system][shown].decimals);
}

/** An SI amount as a figure with its unit. */
export function quantity(
  amount: number | null | undefined,
  shown: Shown,
  system: UnitSystem = "si",
  decimals?: number,
): string {
  const text = figure(amount, shown, system, decimals);
  return text === NO_NUMBER ? text : `${text} ${unitOf(shown, system)}`;
}

/**
 * A utilisation to two decimals. Above 1 it never reads 1.00: it takes a third and fourth decimal, and ">1.00" where
 * even they do not tell.
 */
export function utilisation(value: number | null | undefined): string {
  if (value === null || value === undefined || Number.isNaN(value)) return NO_NUMBER;
  if (value === Number.POSITIVE_INFINITY) return "∞";
  for (const decimals of [2, 3, 4]) {
    const text = fixed(value, decimals);
    if (value <= 1 || Number(text) > 1) return text;
  }
  return ">1.00";
}

/** Most decimals that a comparison takes to show which of two amounts is the greater. */
const MOST_DECIMALS = 6;

/**
 * Two amounts that are compared, with decimals enough that the figures show which is the greater: 150.4 against 150
 * reads "150.4" and "150.0", not 150 and 150.
 */
export function comparedFigures(
  first: number,
  second: number,
  shown: Shown,
  system: UnitSystem = "si",
): [string, string] {
  const least = RULES[system][shown].decimals;
  for (let decimals = least; decimals <= MOST_DECIMALS; decimals += 1) {
    const pair: [string, string] = [
      figure(first, shown, system, decimals),
      figure(second, shown, system, decimals),
    ];
    if (first === second || pair[0] !== pair[1]) return pair;
  }
  return [figure(first, shown, system, least), figure(second, shown, system, least)];
}

function factorOf(shown: Shown, system: UnitSystem): number {
  const { unit } = RULES[system][shown];
  const kind: Kind = shown === "level" ? "length" : shown;
  const found = UNITS[kind].find(({ symbol }) => symbol === unit);
  if (!found) throw new Error(`No factor for ${unit}.`);
  return found.factor;
}
