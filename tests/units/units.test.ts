import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { type Kind, SI_UNIT, UNITS } from "@/lib/units/factors";
import { comparedFigures, figure, quantity, unitOf, utilisation } from "@/lib/units/format-quantity";
import { amountIn, readPressure, readQuantity } from "@/lib/units/read-quantity";

const kPaOf = (typed: string): number => {
  const read = readPressure(typed);
  if ("problem" in read) throw new Error(read.problem);
  return read.kPa;
};
const problemOf = (typed: string, kind: Kind = "pressure", bare: string | null = null): string => {
  const read = readQuantity(typed, kind, bare);
  return "problem" in read ? read.problem : `read as ${read.amount}`;
};

describe("factors of units", () => {
  // NIST Special Publication 811 (2008), appendix B.8, in the digits that it prints (from memory).
  it.each([
    ["1 psf", 4.788026e-2, 8],
    ["1 ksf", 4.788026e1, 5],
    ["1 psi", 6.894757, 6],
    ["1 kgf/cm2", 98.0665, 9],
    ["1 bar", 100, 9],
    ["1 t/m2", 9.80665, 9],
    ["1 MPa", 1000, 9],
    ["150 kN/m2", 150, 9],
  ])("reads %s as %d kPa", (typed, kPa, digits) => {
    expect(kPaOf(typed)).toBeCloseTo(kPa, digits - 1);
  });

  it("reads one kip as 4.448 222 kN, one pound a cubic foot as 0.157 087 5 kN/m³ (NIST SP 811, from memory)", () => {
    const [kip] = UNITS.force.filter(({ symbol }) => symbol === "kip");
    const [pcf] = UNITS.unitWeight.filter(({ symbol }) => symbol === "pcf");
    expect(kip?.factor).toBeCloseTo(4.448222, 6);
    expect(pcf?.factor).toBeCloseTo(0.1570875, 7);
  });

  it("keeps the three tons apart: short 2000 lb, metric 1000 kg, long 2240 lb", () => {
    const tons = ["short ton", "t", "long ton"].map(
      (symbol) => UNITS.force.find((unit) => unit.symbol === symbol)?.factor ?? 0,
    );
    expect(tons[0]).toBeCloseTo(8.896443, 6);
    expect(tons[1]).toBe(9.80665);
    expect(tons[2]).toBeCloseTo(9.964016, 6);
    expect(kPaOf("1 short ton/ft2")).toBeCloseTo(95.7605, 4);
    expect(kPaOf("1 tsf")).toBe(kPaOf("1 short ton/ft2"));
    expect(kPaOf("1 long ton/ft2")).toBeCloseTo(107.2518, 4);
    expect(kPaOf("1 metric ton/m2")).toBe(9.80665);
  });

  it("counts one of the SI unit of each kind as one", () => {
    for (const kind of Object.keys(UNITS) as Kind[])
      expect(readQuantity(`1 ${SI_UNIT[kind]}`, kind)).toMatchObject({ amount: 1, factor: 1 });
  });

  it("gives no two units of one kind the same spelling", () => {
    for (const kind of Object.keys(UNITS) as Kind[]) {
      const spellings = UNITS[kind].flatMap((unit) => unit.spellings);
      expect(new Set(spellings).size).toBe(spellings.length);
    }
  });
});

describe("reading a quantity as typed", () => {
  it("keeps what was typed and the factor beside the kPa", () => {
    expect(readPressure(" 3 ksf ")).toEqual({
      kPa: 3 * kPaOf("1 ksf"),
      typed: "3 ksf",
      unit: "ksf",
      factor: kPaOf("1 ksf"),
    });
  });

  it.each([
    ["3ksf", 143.64078],
    ["3 KSF", 143.64078],
    ["3 kips/ft²", 143.64078],
    ["15 t/m²", 147.09975],
    ["15 tonnes / m^2", 147.09975],
    ["1 500 kPa", 1500],
    ["1\u202f500.5 kPa", 1500.5],
    ["200 kpa", 200],
    [".5 MN/m2", 500],
    ["+150 kN/sqm", 150],
  ])("reads %s", (typed, kPa) => {
    expect(kPaOf(typed)).toBeCloseTo(kPa, 4);
  });

  it.each(["15 ton/m2", "15 tons/m2", "2 ton/ft2", "2 Tons / sq ft", "2 tonf/ft2"])(
    "refuses %s: a bare ton can be three things",
    (typed) => {
      expect(problemOf(typed)).toMatch(/metric ton \(t\), short ton or long ton/);
    },
  );
  it("refuses a bare ton of force as well", () => {
    expect(problemOf("40 ton", "force")).toMatch(/short ton or long ton/);
    expect(problemOf("40 tons", "force")).toMatch(/short ton or long ton/);
  });

  it.each([
    ["", "Give a number with its unit"],
    ["kPa", "Begin with a number"],
    ["150", "Give the unit with the number, as 150 kPa"],
    ["1,5 kPa", "1.5"],
    ["1,500 kPa", "1500 or 1.500"],
    ["1.2.3 kPa", "plain digits"],
    ["1e3 kPa", "plain digits"],
    ["150 mPa", "MPa, with its capitals"],
    ["150 kN", "is a unit of force; here is asked for pressure"],
    ["150 furlong", "not a unit that is known here"],
    ["Infinity kPa", "Begin with a number"],
    ["NaN", "Begin with a number"],
    ["150 kPa or so", "not a unit"],
  ])('refuses "%s" with a sentence', (typed, part) => {
    expect(problemOf(typed)).toContain(part);
  });

  it("reads a number alone only in the unit that the field names", () => {
    expect(readQuantity("150", "pressure", "kPa")).toMatchObject({ amount: 150, unit: "kPa", typed: "150" });
    expect(readQuantity("3", "pressure", "ksf")).toMatchObject({ unit: "ksf", number: 3 });
  });

  it("reads levels below the datum, with either minus sign", () => {
    expect(readQuantity("-1.250 m", "length")).toMatchObject({ amount: -1.25 });
    expect(readQuantity("−1.250 m", "length")).toMatchObject({ amount: -1.25, typed: "−1.250 m" });
  });

  it("gives back exactly the number that was typed, in every unit of every kind", () => {
    const kinds = Object.keys(UNITS) as Kind[];
    const units = kinds.flatMap((kind) => UNITS[kind].map(({ symbol }) => ({ kind, symbol })));
    fc.assert(
      fc.property(
        fc.constantFrom(...units),
        fc.integer({ min: -99_999_999, max: 99_999_999 }),
        fc.integer({ min: 0, max: 4 }),
        ({ kind, symbol }, digits, decimals) => {
          const text = (digits / 10 ** decimals).toFixed(decimals);
          const read = readQuantity(`${text} ${symbol}`, kind);
          if ("problem" in read) throw new Error(read.problem);
          expect(read.typed).toBe(`${text} ${symbol}`);
          expect(read.number).toBe(Number(text));
          expect(amountIn(read.amount, kind, symbol)).toBe(Number(text));
        },
      ),
    );
  });
});

describe("showing a quantity", () => {
  it("rounds once, by the rule of the thing shown", () => {
    expect(quantity(150.4, "pressure")).toBe("150 kPa");
    expect(quantity(12.3456, "level")).toBe("12.346 m");
    expect(quantity(-0.0004, "level")).toBe("0.000 m");
    expect(quantity(-1.25, "level")).toBe("−1.250 m");
    expect(quantity(24.6, "settlement")).toBe("25 mm");
    expect(figure(null, "pressure")).toBe("—");
    expect(figure(Number.NaN, "pressure")).toBe("—");
  });

  it("shows 143.64 kPa as 3.00 ksf and 147.1 kPa as 15.0 t/m²", () => {
    expect(quantity(kPaOf("3 ksf"), "pressure", "kip-ft")).toBe("3.00 ksf");
    expect(quantity(kPaOf("15 t/m2"), "pressure", "tonne-metre")).toBe("15.0 t/m²");
    expect(unitOf("unitWeight", "kip-ft")).toBe("pcf");
  });

  it.each([
    [0.824, "0.82"],
    [0.999, "1.00"],
    [1, "1.00"],
    [1.002, "1.002"],
    [1.0004, "1.0004"],
    [1.00001, ">1.00"],
    [1.006, "1.01"],
    [2.5, "2.50"],
    [Number.POSITIVE_INFINITY, "∞"],
    [Number.NaN, "—"],
    [null, "—"],
  ])("shows a utilisation of %s as %s", (value, text) => {
    expect(utilisation(value)).toBe(text);
  });

  it("never shows a utilisation above the limit as 1.00", () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 1.02, minExcluded: true, noNaN: true }), (value) => {
        expect(utilisation(value)).not.toBe("1.00");
        expect(utilisation(value)).toMatch(/^(>1\.00|1\.0\d+)$/);
      }),
    );
  });

  it("shows two compared pressures so that the greater is seen to be greater", () => {
    expect(comparedFigures(150.4, 150, "pressure")).toEqual(["150.4", "150.0"]);
    expect(comparedFigures(150, 150, "pressure")).toEqual(["150", "150"]);
    expect(comparedFigures(180, 150, "pressure")).toEqual(["180", "150"]);
    expect(comparedFigures(150.02, 150, "pressure")).toEqual(["150.02", "150.00"]);
  });
});
