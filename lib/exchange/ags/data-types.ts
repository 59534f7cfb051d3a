/** Judges one filled cell of a column: null when it fits, else a phrase that completes "<value> …". */
export type CellJudge = (text: string) => string | null;

const decimal = /^-?\d+(\.\d+)?$/;
const anyNumber = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;
const free = new Set(["X", "XN", "ID", "PA", "PT", "PU", "RL"]);

/**
 * The judge for a column's TYPE and UNIT (rule 8): null where any text fits, a phrase where the type itself or its
 * unit cannot be used, so that it is reported once and not for every row.
 */
export function judgeFor(type: string, unit: string): CellJudge | { fault: string } | null {
  if (free.has(type)) return null;
  const numbered = /^(\d+)(DP|SF|SCI)$/.exec(type);
  const digits = Number(numbered?.[1]);
  if (digits <= 15 && numbered?.[2] === "DP") return decimalPlaces(digits);
  if (digits <= 15 && digits > 0 && numbered?.[2] === "SF") return significantFigures(digits);
  if (digits <= 15 && numbered?.[2] === "SCI") return scientific(digits);
  if (type === "U" || type === "MC") return (text) => (anyNumber.test(text) ? null : "is not a number");
  if (type === "YN") return (text) => (/^[YNyn]$/.test(text) ? null : "is neither Y nor N");
  if (type === "DMS") return degrees;
  if (type === "DT") return dateTime(unit);
  if (type === "T") return elapsedTime(unit);
  return { fault: type === "" ? "has no data type" : `has the data type ${type}, which is not known` };
}

function decimalPlaces(places: number): CellJudge {
  const shape = places === 0 ? /^-?\d+$/ : new RegExp(`^-?\\d+\\.\\d{${places}}$`);
  return (text) => {
    if (shape.test(text)) return null;
    return anyNumber.test(text) ? `does not have ${counted(places, "decimal place")}` : "is not a number";
  };
}

function significantFigures(figures: number): CellJudge {
  return (text) => {
    if (!decimal.test(text))
      return anyNumber.test(text) ? "is not written as a plain number" : "is not a number";
    const value = Number(text);
    if (value === 0) return null;
    return text === withFigures(value, figures)
      ? null
      : `does not have ${counted(figures, "significant figure")}`;
  };
}

/** A number with so many significant figures, in plain digits: 101 to two is 100, 0.2 is 0.20. */
export function withFigures(value: number, figures: number): string {
  const [mantissa = "", exponentText = "0"] = value.toExponential(figures - 1).split("e");
  const exponent = Number(exponentText);
  const sign = mantissa.startsWith("-") ? "-" : "";
  const digits = mantissa.replace(/[-.]/g, "");
  if (exponent < 0) return `${sign}0.${"0".repeat(-exponent - 1)}${digits}`;
  if (exponent + 1 >= digits.length) return `${sign}${digits}${"0".repeat(exponent + 1 - digits.length)}`;
  return `${sign}${digits.slice(0, exponent + 1)}.${digits.slice(exponent + 1)}`;
}

function scientific(places: number): CellJudge {
  const fraction = places === 0 ? "" : `\\.\\d{${places}}`;
  const shape = new RegExp(`^-?(?:[1-9]${fraction}|0${fraction})[eE][+-]?\\d+$`);
  return (text) => {
    if (shape.test(text)) return null;
    if (!anyNumber.test(text)) return "is not a number";
    return `is not in scientific form with ${counted(places, "decimal place")}`;
  };
}

function degrees(text: string): string | null {
  const parts = /^[+-]?(\d{1,3}):(\d{1,2}):(\d{1,2})(\.\d+)?$/.exec(text);
  if (!parts) return "is not degrees:minutes:seconds";
  const seconds = Number(`${parts[3]}${parts[4] ?? ""}`);
  const inRange = Number(parts[1]) <= 180 && Number(parts[2]) < 60 && seconds < 60;
  return inRange ? null : "is not a possible angle";
}

const dateParts: Readonly<Record<string, string>> = {
  yyyy: "(?<year>\\d{4})",
  sss: "\\d{3}",
  dd: "(?<day>\\d{2})",
  hh: "(?<hour>\\d{2})",
  ss: "(?<second>\\d{2})",
};

function dateTime(unit: string): CellJudge | { fault: string } {
  if (!/^(yyyy(-mm(-dd)?)?)?(T?hh:mm(:ss(\.s{1,3})?)?)?(Z\(\+hh:mm\))?$/.test(unit) || unit === "") {
    return {
      fault: `is a date whose UNIT "${unit}" is not a pattern of year, month, day, hour, minute and second`,
    };
  }
  const [moment = "", zone] = unit.split("Z(");
  const shape = new RegExp(
    `^${patternOf(moment)}${zone ? "Z\\([+-](?<zoneHour>\\d{2}):(?<zoneMinute>\\d{2})\\)" : ""}$`,
  );
  return (text) => {
    const parts = shape.exec(text)?.groups;
    if (!parts) return `does not follow the pattern ${unit}`;
    return isRealMoment(parts) ? null : "is not a date or time that exists";
  };
}

function patternOf(moment: string): string {
  let minutes = !moment.includes("yyyy");
  return moment.replace(/yyyy|s{3}|ss|s|dd|hh|mm|[-:.]/g, (part) => {
    if (part === "hh") minutes = true;
    if (part === "mm") return minutes ? "(?<minute>\\d{2})" : "(?<month>\\d{2})";
    if (part === "s") return "\\d";
    return dateParts[part] ?? (part === "." ? "\\." : part);
  });
}

function isRealMoment(parts: Record<string, string | undefined>): boolean {
  const number = (name: string, otherwise: number) =>
    parts[name] === undefined ? otherwise : Number(parts[name]);
  const month = number("month", 1);
  const day = number("day", 1);
  if (month < 1 || month > 12 || day < 1 || day > daysIn(number("year", 2000), month)) return false;
  if (number("zoneHour", 0) > 14 || number("zoneMinute", 0) > 59) return false;
  return number("hour", 0) < 24 && number("minute", 0) < 60 && number("second", 0) < 60;
}

/** Days of a month, leap years as the Gregorian calendar has them. */
export function daysIn(year: number, month: number): number {
  if (month === 2) return (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0 ? 29 : 28;
  return [4, 6, 9, 11].includes(month) ? 30 : 31;
}

function elapsedTime(unit: string): CellJudge | { fault: string } {
  const shapes: Readonly<Record<string, RegExp>> = {
    "hh:mm": /^\d{2,}:[0-5]\d$/,
    "hh:mm:ss": /^\d{2,}:[0-5]\d:[0-5]\d$/,
    "mm:ss": /^\d{2,}:[0-5]\d$/,
  };
  const shape = Object.hasOwn(shapes, unit) ? shapes[unit] : undefined;
  if (!shape) return { fault: `is an elapsed time whose UNIT "${unit}" is not hh:mm, hh:mm:ss or mm:ss` };
  return (text) => (shape.test(text) ? null : `is not an elapsed time in ${unit}`);
}

function counted(count: number, word: string): string {
  return `${count} ${word}${count === 1 ? "" : "s"}`;
}
