import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { readNumber, typedForm } from "@/components/ui/read-number";

const value = (typed: string) => {
  const read = readNumber(typed);
  return "value" in read ? read.value : read.problem;
};

describe("a number as it is typed", () => {
  it.each([
    ["150", 150],
    [" 150.40 ", 150.4],
    ["-2.4", -2.4],
    ["−2.4", -2.4],
    ["+3", 3],
    [".5", 0.5],
    ["5.", 5],
    ["1 250.5", 1250.5],
    ["1\u202f250", 1250],
    ["2e-4", 0.0002],
  ])("reads %s", (typed, number) => expect(value(typed)).toBe(number));

  it("reads nothing from an empty field, which is not zero", () => expect(value("  ")).toBeNull());

  it.each([
    "1,250",
    "1,5",
    "12 5",
    "1 2500",
    "abc",
    "150 kPa",
    "--2",
    "1e",
    "0x10",
    "Infinity",
    "NaN",
    "1e999",
  ])("refuses %s with a sentence", (typed) => expect(value(typed)).toMatch(/^[A-Z].+\.$/));

  it("reads back what it writes, every figure of it", () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (number) => {
        expect(value(typedForm(number))).toBe(number === 0 ? 0 : number);
      }),
    );
  });
});
