/** The mark between units and tenths. */
export type DecimalMark = "." | ",";

/** A cell read as a number: a value, nothing, or a sentence saying why not. Never a silent zero. */
export type NumberReading =
  | { readonly kind: "number"; readonly value: number }
  | { readonly kind: "empty" }
  | { readonly kind: "problem"; readonly message: string };

const plain = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;

/** The decimal mark that a cell shows, or null where it is no plain decimal number. */
export function decimalMarkIn(cell: string): DecimalMark | null {
  if (/^[+-]?\d*\.\d+$/.test(cell)) return ".";
  if (/^[+-]?\d*,\d+$/.test(cell)) return ",";
  return null;
}

/**
 * Reads a number strictly: plain digits, one decimal mark, an exponent if need be. Words, units, thousands marks,
 * digits of other scripts, formulas and numbers too large or too small to keep are problems with a sentence each.
 */
export function readNumber(cell: string, decimalMark: DecimalMark = "."): NumberReading {
  const text = cell.trim();
  if (text === "") return { kind: "empty" };
  const point = decimalMark === "," ? text.replace(",", ".") : text;
  const foreignMark = decimalMark === "," && text.includes(".");
  if (!foreignMark && plain.test(point)) return kept(text, Number(point));
  return { kind: "problem", message: `${shown(text)} ${reason(text, decimalMark)}` };
}

function kept(text: string, value: number): NumberReading {
  if (!Number.isFinite(value)) return { kind: "problem", message: `${shown(text)} is too large a number.` };
  if (value === 0 && /[1-9]/.test(text.replace(/[eE].*$/, ""))) {
    return { kind: "problem", message: `${shown(text)} is too small a number to keep.` };
  }
  return { kind: "number", value: value === 0 ? 0 : value };
}

function reason(text: string, decimalMark: DecimalMark): string {
  if (/^[=@]/.test(text) || /^[+-][A-Za-z(]/.test(text))
    return "is a formula, not a number; save the values.";
  if (/\p{Nd}/u.test(text.replace(/[0-9]/g, "")))
    return "is written in digits of another script; use 0 to 9.";
  if (/^[\u2212\u2010-\u2015\uff0d\ufe63]\s*[\d.,]/.test(text))
    return "has a dash for a minus sign; write -.";
  if (/^[+-]?\d{1,3}(['\u2019\s]\d{3})+([.,]\d+)?$/u.test(text))
    return "has thousands marks; write the digits alone.";
  if (/^[+-]?\d{1,3}(,\d{3})+\.\d+$/.test(text) || /^[+-]?\d{1,3}(\.\d{3})+,\d+$/.test(text)) {
    return "has thousands marks; write the digits and one decimal mark.";
  }
  if (/^[+-]?\d{1,3}([.,]\d{3}){2,}$/.test(text)) return "has thousands marks; write the digits alone.";
  if (/^[+-]?\d*,\d+$/.test(text)) {
    return decimalMark === "."
      ? "has a comma: write a decimal point, and no thousands marks."
      : "is not a number.";
  }
  if (decimalMark === "," && /^[+-]?\d*\.\d+$/.test(text)) {
    return "has a decimal point where the file writes decimal commas.";
  }
  if (/^[<>≤≥~≈]/.test(text)) return "is a limit or an estimate, not a number.";
  if (/^[+-]?[\d.,]+\s*[\p{L}°%'"²³/·*^]+[\p{L}\d°%²³/·*^ ]*$/u.test(text) && !/^[+-]?0x/i.test(text)) {
    return "has a unit in the cell; put the unit in the heading and the number alone here.";
  }
  return "is not a number.";
}

function shown(text: string): string {
  const short = text.length > 40 ? `${text.slice(0, 40)}…` : text;
  return `"${short.replace(/\s+/g, " ")}"`;
}
