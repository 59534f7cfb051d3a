import { describe, expect, it } from "vitest";
import { figure, formula, line } from "@/lib/methods/formula";

const resistance = formula({
  symbol: "R",
  unit: "kN",
  ref: "gec6",
  where: "Eq. 5-38",
  shown: "V tan δ + a A′ + a² B′ / A",
  symbols: {
    V: "vertical_kN",
    δ: "angle_deg",
    a: "adhesion_kPa",
    A: "area_m2",
    "A′": "effective_m2",
    "B′": "side_m",
  },
  of: (q: {
    vertical_kN: number;
    angle_deg: number;
    adhesion_kPa: number;
    area_m2: number;
    effective_m2: number;
    side_m: number;
  }) => q.vertical_kN + q.adhesion_kPa * q.effective_m2,
});
const given = { vertical_kN: -600, angle_deg: 30, adhesion_kPa: 5, area_m2: 6, effective_m2: 4, side_m: 1.8 };

describe("a printed step", () => {
  it("puts numbers in for symbols that stand alone, the longer first, and leaves words alone", () => {
    expect(line(resistance, given).numbers).toBe("(−600) tan 30 + 5 4 + 5² 1.8 / 6");
  });

  it("carries the result unrounded, with its unit and where it comes from", () => {
    expect(line(resistance, { ...given, effective_m2: 1 / 3 })).toMatchObject({
      symbol: "R",
      unit: "kN",
      ref: "gec6",
      where: "Eq. 5-38",
      value: -600 + 5 / 3,
    });
  });

  it("does not compile with a source that is not in the list", () => {
    const rest = { symbol: "x", unit: "", shown: "1", symbols: {}, of: () => 1 };
    // @ts-expect-error "hearsay" is no key of the references.
    const unfounded = formula({ ...rest, ref: "hearsay" });
    expect(line(unfounded, {}).value).toBe(1);
  });
});

describe("a figure in a step", () => {
  it.each([
    [0, "0"],
    [1 / 3, "0.33333"],
    [123456.789, "123460"],
    [-2.5, "(−2.5)"],
    [0.00012345678, "0.00012346"],
    [3e-7, "3.0000e-7"],
    [1.23456789e9, "1.2346e+9"],
    [Number.NaN, "—"],
  ])("%f is written %s", (value, written) => {
    expect(figure(value)).toBe(written);
  });
});
