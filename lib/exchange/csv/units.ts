/** What kind of quantity a column holds; each is kept in one SI unit. */
export type Quantity = "length" | "force" | "moment" | "unit weight" | "angle";

/** The unit that each quantity is kept in. */
export const keptUnit: Readonly<Record<Quantity, string>> = {
  length: "m",
  force: "kN",
  moment: "kNm",
  "unit weight": "kN/m3",
  angle: "deg",
};

// Exact by definition: 1 ft = 0.3048 m, 1 lbf = 4.4482216152605 N (international yard and pound, 1959; standard gravity).
const pound_kN = 0.0044482216152605;
const factors: Readonly<Record<Quantity, Readonly<Record<string, number>>>> = {
  length: { m: 1, mm: 0.001, cm: 0.01, ft: 0.3048, in: 0.0254 },
  force: { kN: 1, N: 0.001, MN: 1000, kip: 1000 * pound_kN, kips: 1000 * pound_kN, lbf: pound_kN },
  moment: {
    kNm: 1,
    Nm: 0.001,
    MNm: 1000,
    "kip-ft": 1000 * pound_kN * 0.3048,
    "kips-ft": 1000 * pound_kN * 0.3048,
    kipft: 1000 * pound_kN * 0.3048,
  },
  "unit weight": { "kN/m3": 1, kNm3: 1, "N/m3": 0.001, pcf: pound_kN / 0.3048 ** 3 },
  angle: { deg: 1, degrees: 1, "°": 1, rad: 180 / Math.PI },
};

/** Factor to the unit kept, or null where the unit is not one of the quantity. Case counts only for MN and mN. */
export function unitFactor(unit: string, quantity: Quantity): number | null {
  const written = tidyUnit(unit);
  const known = Object.entries(factors[quantity]);
  const exact = known.find(([name]) => name === written);
  if (exact) return exact[1];
  if (/^mn/i.test(written)) return null;
  return known.find(([name]) => name.toLowerCase() === written.toLowerCase())?.[1] ?? null;
}

/** Value in the kept unit; divides for whole reciprocals so that 1500 mm is 1.5 m and nothing beside it. */
export function toKeptUnit(value: number, factor: number): number {
  const inverse = 1 / factor;
  const whole = Math.round(inverse);
  return factor < 1 && Math.abs(inverse - whole) < 1e-9 ? value / whole : value * factor;
}

/** True when the cells are a row of units: at least one known unit, and nothing but units, dashes and blanks. */
export function isUnitRow(cells: readonly string[]): boolean {
  let units = 0;
  for (const cell of cells) {
    const inner = cell.replace(/^[[(]\s*|\s*[\])]$/g, "");
    if (isUnit(inner)) units += 1;
    else if (!/^([-–—]|units?|text)?$/i.test(inner)) return false;
  }
  return units > 0;
}

/** True when the text is a unit of any quantity that is known here. */
export function isUnit(text: string): boolean {
  return (Object.keys(factors) as Quantity[]).some((quantity) => unitFactor(text, quantity) !== null);
}

function tidyUnit(unit: string): string {
  return unit
    .trim()
    .replace(/³/g, "3")
    .replace(/\s*[·.*]\s*/g, "")
    .replace(/\^/g, "")
    .replace(/^(kN|N|MN|kn)[\s-]m$/, "$1m")
    .replace(/\s+/g, "");
}
