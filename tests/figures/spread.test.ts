import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { decimalsOf, niceStep, stepsBetween } from "@/components/figures/nice-steps";
import { spread } from "@/components/figures/spread";
import { textWidth, wrapText } from "@/components/figures/text-width";

const things = fc
  .array(
    fc.record({
      wanted: fc.double({ min: 0, max: 300, noNaN: true }),
      size: fc.double({ min: 1, max: 40, noNaN: true }),
    }),
    { minLength: 1, maxLength: 15 },
  )
  .map((list) => list.sort((a, b) => a.wanted - b.wanted));

describe("spreading labels along a line", () => {
  it("leaves each where it wants to be when there is room", () => {
    expect(
      spread(
        [
          { wanted: 10, size: 10 },
          { wanted: 40, size: 10 },
        ],
        0,
        100,
      ),
    ).toEqual([10, 40]);
  });

  it("moves two that want one place aside by equal shares", () => {
    expect(
      spread(
        [
          { wanted: 50, size: 10 },
          { wanted: 50, size: 10 },
        ],
        0,
        100,
      ),
    ).toEqual([45, 55]);
  });

  it("keeps inside both ends", () => {
    expect(
      spread(
        [
          { wanted: -5, size: 10 },
          { wanted: 98, size: 10 },
        ],
        0,
        100,
      ),
    ).toEqual([0, 90]);
  });

  it("runs on past the far end when all together do not fit, from the near end on", () => {
    expect(
      spread(
        [
          { wanted: 0, size: 60 },
          { wanted: 5, size: 60 },
        ],
        0,
        100,
      ),
    ).toEqual([0, 60]);
  });

  it("never puts one over another nor before the near end, and stays within when all fit", () => {
    fc.assert(
      fc.property(things, fc.double({ min: 0, max: 6, noNaN: true }), (list, gap) => {
        const places = spread(list, 10, 400, gap);
        const total = list.reduce((sum, { size }) => sum + size + gap, -gap);
        places.forEach((place, index) => {
          expect(place).toBeGreaterThanOrEqual(10 - 1e-9);
          const next = places[index + 1];
          if (next !== undefined)
            expect(next - place).toBeGreaterThanOrEqual((list[index]?.size ?? 0) + gap - 1e-9);
        });
        const end = (places.at(-1) ?? 0) + (list.at(-1)?.size ?? 0);
        if (total <= 390) expect(end).toBeLessThanOrEqual(400 + 1e-9);
      }),
    );
  });
});

describe("lettering", () => {
  it("takes the widths of Roboto: ten figures of 562 thousandths, with 4 % to spare", () => {
    expect(textWidth("0123456789", 10)).toBeCloseTo(56.2 * 1.04, 6);
  });

  it("breaks a description into lines that fit, and leaves no word out", () => {
    fc.assert(
      fc.property(
        fc.array(fc.string({ unit: "grapheme-ascii", minLength: 1, maxLength: 30 }), { maxLength: 20 }),
        fc.integer({ min: 60, max: 300 }),
        (words, width) => {
          const lines = wrapText(words.join(" "), width, 11);
          for (const line of lines) expect(textWidth(line, 11)).toBeLessThanOrEqual(width);
          expect(lines.join("").replace(/\s/g, "")).toBe(words.join("").replace(/\s/g, ""));
        },
      ),
    );
  });
});

describe("steps of a scale", () => {
  it.each([
    [15, 20, 1],
    [15, 10, 2],
    [2.1, 7, 0.5],
    [340, 8, 50],
    [0.03, 5, 0.01],
  ])("divides %d into at most %d steps of %d", (span, most, step) => {
    expect(niceStep(span, most)).toBeCloseTo(step, 12);
  });

  it("lists the multiples in a span and the decimals that they need", () => {
    expect(stepsBetween(-2.65, 1, 1)).toEqual([-2, -1, 0, 1]);
    expect(decimalsOf(0.5)).toBe(1);
    expect(decimalsOf(20)).toBe(0);
    expect(decimalsOf(0.01)).toBe(2);
  });
});
