import { type Kind, SI_UNIT, UNITS, type Unit } from "./factors";

/** A quantity as typed, kept with what it came to: `amount` = `number` × `factor`, in the kind's SI unit. */
export type TypedQuantity = {
  amount: number;
  number: number;
  /** Symbol of the unit that was read. */
  unit: string;
  factor: number;
  /** Word for word as typed, but for blanks around it. */
  typed: string;
};

/** A quantity that was read, or a sentence that says what is wrong with what was typed. */
export type ReadQuantity = TypedQuantity | { problem: string };

const NUMBER = /^([+-]?\d{1,3}(?:[ \u00a0\u202f]\d{3})+|[+-]?\d+)?(\.\d+)?/;

/**
 * Reads a number with its unit ("3 ksf", "150 kN/m2", "15 t/m2"). Nothing is guessed: a bare ton, a comma that could
 * be a decimal or a thousand, a unit of another kind are refused with a sentence. A number alone is read in
 * `bareUnit`, and refused when that is null.
 */
export function readQuantity(typed: string, kind: Kind, bareUnit: string | null = null): ReadQuantity {
  const text = typed.trim();
  if (text === "") return { problem: `Give a number with its unit, as 12 ${SI_UNIT[kind]}.` };
  const plain = text.replace(/[−–]/g, "-");
  const found = NUMBER.exec(plain)?.[0] ?? "";
  const rest = plain.slice(found.length).trim();
  if (!/\d/.test(found)) return { problem: `Begin with a number, as 12 ${SI_UNIT[kind]}.` };
  if (/^,\d/.test(rest)) return { problem: commaProblem(plain) };
  if (/^[\d.eE]/.test(rest) && !/^[eE](?!\d|[+-])/.test(rest))
    return { problem: `Write the number in plain digits, as 1500 or 1500.5.` };
  const number = Number(found.replace(/[ \u00a0\u202f]/g, ""));
  if (rest === "" && bareUnit === null)
    return { problem: `Give the unit with the number, as ${found} ${SI_UNIT[kind]}.` };
  const unit = findUnit(rest === "" ? (bareUnit ?? "") : rest, kind);
  if ("problem" in unit) return unit;
  const amount = number * unit.factor;
  if (!Number.isFinite(amount)) return { problem: "This number is larger than any quantity." };
  return { amount, number, unit: unit.symbol, factor: unit.factor, typed: text };
}

/** A pressure as typed with what it came to in kPa. */
export type TypedPressure = { kPa: number; typed: string; unit: string; factor: number };

/** Reads a pressure with its unit into kPa, keeping what was typed and the factor used. */
export function readPressure(
  typed: string,
  bareUnit: string | null = null,
): TypedPressure | { problem: string } {
  const read = readQuantity(typed, "pressure", bareUnit);
  return "problem" in read
    ? read
    : { kPa: read.amount, typed: read.typed, unit: read.unit, factor: read.factor };
}

/** An SI amount in another unit, to 14 significant digits: gives back exactly the number that was typed in it. */
export function amountIn(amount: number, kind: Kind, unit: string): number {
  const found = findUnit(unit, kind);
  if ("problem" in found) throw new RangeError(found.problem);
  return Number((amount / found.factor).toPrecision(14));
}

const plainUnit = (text: string): string =>
  text
    .replace(/\s+|\^/g, "")
    .replace(/²/g, "2")
    .replace(/³/g, "3")
    .replace(/\bsq\.?ft\b/i, "ft2");

function findUnit(text: string, kind: Kind): Unit | { problem: string } {
  const wanted = plainUnit(text);
  const units = UNITS[kind];
  const exact = units.find(({ spellings }) => spellings.some((spelling) => plainUnit(spelling) === wanted));
  if (exact) return exact;
  const lower = wanted.toLowerCase();
  const alike = units.filter(({ spellings }) =>
    spellings.some((spelling) => plainUnit(spelling).toLowerCase() === lower),
  );
  const [only] = alike;
  // A capital M is a million and a small m a thousandth: these two are never taken for each other.
  if (only && alike.length === 1 && !/^m(pa|n)/i.test(wanted)) return only;
  if (only)
    return {
      problem: `Write the unit as ${alike.map(({ symbol }) => symbol).join(" or ")}, with its capitals.`,
    };
  if (/(^|[^a-z])tons?f?($|[^a-z])/i.test(wanted))
    return { problem: `"${text}" can be three things: say metric ton (t), short ton or long ton.` };
  const other = (Object.keys(UNITS) as Kind[]).find((name) =>
    UNITS[name].some(({ spellings }) =>
      spellings.some((spelling) => plainUnit(spelling).toLowerCase() === lower),
    ),
  );
  const known = units.map(({ symbol }) => symbol).join(", ");
  return {
    problem: other
      ? `"${text}" is a unit of ${KIND_WORDS[other]}; here is asked for ${KIND_WORDS[kind]}: ${known}.`
      : `"${text}" is not a unit that is known here. Known: ${known}.`,
  };
}

const KIND_WORDS: Record<Kind, string> = {
  pressure: "pressure",
  force: "force",
  moment: "moment",
  length: "length",
  settlement: "settlement",
  unitWeight: "unit weight",
};

function commaProblem(text: string): string {
  const [whole = "", after = ""] = text.split(",", 2);
  const digits = /^\d+/.exec(after)?.[0] ?? "";
  return digits.length === 3
    ? `The comma in ${whole},${digits} can be a decimal or a thousand: write ${whole}${digits} or ${whole}.${digits}.`
    : `Write the decimal with a point: ${whole}.${digits}.`;
}
