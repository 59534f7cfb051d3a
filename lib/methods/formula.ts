import type { ReferenceKey } from "./references";

export type Formula<Quantities extends Record<string, number>> = {
  /** The symbol on the left, as engineers write it. */
  readonly symbol: string;
  readonly unit: string;
  readonly ref: ReferenceKey;
  /** Clause or equation in the source, where there is one. */
  readonly where?: string;
  /** The right-hand side, in symbols. */
  readonly shown: string;
  /** Which name in `of` each symbol of `shown` stands for: what the numbers put in are taken from. */
  readonly symbols: Readonly<Record<string, keyof Quantities & string>>;
  readonly of: (quantities: Quantities) => number;
};

/** A formula as one literal: what is printed is what is computed. An unknown source does not compile. */
export const formula = <Quantities extends Record<string, number>>(
  literal: Formula<Quantities>,
): Formula<Quantities> => literal;

/** A printed step: the formula, the same with its numbers put in, and the result (SI, unrounded). */
export type Line = {
  symbol: string;
  shown: string;
  numbers: string;
  value: number;
  unit: string;
  ref: ReferenceKey;
  where?: string;
};

/** Works a formula out and keeps how. Numbers are put in rounded to five figures; the value is not rounded. */
export function line<Quantities extends Record<string, number>>(
  formula: Formula<Quantities>,
  quantities: Quantities,
): Line {
  const names = Object.keys(formula.symbols).sort((one, other) => other.length - one.length);
  const any = names.map((name) => name.replace(/[.*+?^${}()|[\]\\]/g, "\\$&")).join("|");
  // A symbol stands alone: the a of an adhesion is not the a of tan.
  const pattern = new RegExp(`(?<![\\p{L}\\d_′])(?:${any})(?![\\p{L}\\d_′])`, "gu");
  const numbers =
    names.length === 0
      ? formula.shown
      : formula.shown.replace(pattern, (symbol) => {
          const name = formula.symbols[symbol];
          return name === undefined ? symbol : figure(quantities[name] ?? Number.NaN);
        });
  return {
    symbol: formula.symbol,
    shown: formula.shown,
    numbers,
    value: formula.of(quantities),
    unit: formula.unit,
    ref: formula.ref,
    ...(formula.where === undefined ? {} : { where: formula.where }),
  };
}

/** Five significant figures without an exponent where engineers would write none; a negative number in brackets. */
export function figure(value: number): string {
  if (!Number.isFinite(value)) return "—";
  const size = Math.abs(value);
  const text =
    size !== 0 && (size < 1e-4 || size >= 1e7)
      ? value.toExponential(4)
      : String(Number(value.toPrecision(5)));
  return value < 0 ? `(${text.replace("-", "−")})` : text;
}
