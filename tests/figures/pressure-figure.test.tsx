import fc from "fast-check";
import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, it } from "vitest";
import { PressureFigure } from "@/components/figures/pressure-figure";
import {
  type BasePoint,
  contactLimit,
  edgeProfile,
  type PressureGiven,
  scaleOf,
} from "@/components/figures/pressure-layout";
import { beyondSheet, collisionsIn, letteringOf } from "./lettering";

const whole = (breadth_m: number, length_m: number): BasePoint[] => [
  [breadth_m / 2, length_m / 2],
  [-breadth_m / 2, length_m / 2],
  [-breadth_m / 2, -length_m / 2],
  [breadth_m / 2, -length_m / 2],
];
// Worked by hand: N = 600 kN on 2 × 3 m is 100 kPa; e = 0.1 m along B adds and takes 6·0.1/2 of it.
const trapezoidal: PressureGiven = {
  breadth_m: 2,
  length_m: 3,
  thickness_m: 0.5,
  groundLevel_m: 12.35,
  foundingLevel_m: 11.1,
  groundwaterLevel_m: 11.4,
  vertical_kN: 600,
  eccentricityB_m: 0.1,
  eccentricityL_m: 0,
  distribution: "trapezoidal",
  cornerPressures_kPa: [130, 70, 70, 130],
  maxPressure_kPa: 130,
  minPressure_kPa: 70,
  contactRatio: 1,
  contactPolygon_m: whole(2, 3),
};
// e = 0.5 m > B/6: contact 3 (1 − 0.5) = 1.5 m from the −B edge, q = 2·600/(3·1.5) = 266.7 kPa.
const triangular: PressureGiven = {
  ...trapezoidal,
  eccentricityB_m: -0.5,
  distribution: "triangular",
  cornerPressures_kPa: [0, 266.67, 266.67, 0],
  maxPressure_kPa: 266.67,
  minPressure_kPa: 0,
  contactRatio: 0.75,
  contactPolygon_m: [
    [0.5, 1.5],
    [-1, 1.5],
    [-1, -1.5],
    [0.5, -1.5],
  ],
};
// One corner in contact: ex/B = ey/L = 0.3 leave legs of 4·0.2 of the sides (statics of the tetrahedron).
const corner: PressureGiven = {
  ...trapezoidal,
  eccentricityB_m: 0.6,
  eccentricityL_m: -0.9,
  distribution: "partial",
  cornerPressures_kPa: [0, 0, 0, 937.5],
  maxPressure_kPa: 937.5,
  minPressure_kPa: 0,
  contactRatio: 0.32,
  contactPolygon_m: [
    [1, -1.5],
    [1, 0.9],
    [-0.6, -1.5],
  ],
};
const none: PressureGiven = {
  ...trapezoidal,
  eccentricityB_m: 1.2,
  distribution: "none",
  cornerPressures_kPa: [0, 0, 0, 0],
  maxPressure_kPa: 0,
  minPressure_kPa: 0,
  contactRatio: 0,
  contactPolygon_m: [],
};
const draw = (given: PressureGiven): string =>
  renderToStaticMarkup(<PressureFigure given={given} soil="clay" />);
const words = (given: PressureGiven): string[] => letteringOf(draw(given)).map(({ text }) => text);

describe("the pressure figure", () => {
  it("letters the sizes, the eccentricity, the levels and the pressure at every corner", () => {
    expect(words(trapezoidal)).toEqual(
      expect.arrayContaining([
        "B = 2.000 m",
        "L = 3.000 m",
        "eB = 0.100 m",
        "600 kN",
        "ground 12.350",
        "water 11.400",
        "founding 11.100",
      ]),
    );
    // Four corners and the two ends of the block.
    expect(words(trapezoidal).filter((text) => text === "130 kPa")).toHaveLength(3);
    expect(words(trapezoidal).filter((text) => text === "70 kPa")).toHaveLength(3);
    expect(words(trapezoidal)).toContain("in contact, the whole base");
  });

  it("draws one metre alike along B and along L, in plan and elevation", () => {
    const { pxPerM } = scaleOf(trapezoidal);
    const rectangles = [...draw(trapezoidal).matchAll(/d="M(\S+) (\S+)L(\S+) \2L\3 (\S+)L\1 \4Z"/g)];
    const pad = rectangles.find(
      ([, left, , right]) => Math.abs(Number(right) - Number(left) - 2 * pxPerM) < 0.02,
    );
    expect(pad).toBeDefined();
    expect(Math.abs(Number(pad?.[4]) - Number(pad?.[2]))).toBeCloseTo(3 * pxPerM, 1);
  });

  it("shows no neutral axis in full contact, and one at 0.50 m from the middle when 1.50 m remain in contact", () => {
    expect(contactLimit(trapezoidal)).toBeNull();
    expect(words(trapezoidal)).not.toContain("neutral axis");
    const limit = contactLimit(triangular);
    expect(limit?.map(([alongB]) => alongB)).toEqual([0.5, 0.5]);
    expect(words(triangular)).toEqual(
      expect.arrayContaining(["neutral axis", "in contact, 75 % of the base", "in contact over 1.50 m"]),
    );
  });

  it("takes the block along the side with the highest pressure and says which side that is", () => {
    expect(edgeProfile(corner)).toEqual({
      side: "−L",
      from_m: -0.6,
      to_m: 1,
      fromPressure_kPa: 0,
      toPressure_kPa: 937.5,
    });
    expect(words(corner)).toContain("pressure along the −L side");
    expect(words(trapezoidal).some((text) => text.startsWith("pressure along"))).toBe(false);
  });

  it("says that there is no equilibrium, and shows no pressure at all", () => {
    expect(words(none)).toContain("No equilibrium: the resultant falls on or outside the edge of the base.");
    expect(words(none).some((text) => text.endsWith("kPa"))).toBe(false);
    const lifted = words({
      ...none,
      vertical_kN: -40,
      eccentricityB_m: Number.NaN,
      eccentricityL_m: Number.NaN,
    });
    expect(lifted).toContain("No equilibrium: no load presses the base on to the ground.");
    expect(lifted.some((text) => text.startsWith("40 kN upwards"))).toBe(true);
  });

  it("is described in a sentence with every corner", () => {
    expect(draw(triangular)).toContain(
      "Pad of 2.00 by 3.00 m, triangular base pressure, contact over 75 % of the base; at the corners, in kPa: +B+L 0, −B+L 267, −B−L 267, +B−L 0.",
    );
    expect(draw(none)).toMatch(/aria-label="Pad of 2\.00 by 3\.00 m\. No equilibrium/);
  });

  it("holds no style attribute, which the content security policy forbids, and no NaN", () => {
    for (const given of [
      trapezoidal,
      triangular,
      corner,
      none,
      { ...none, eccentricityB_m: Number.POSITIVE_INFINITY },
    ]) {
      expect(draw(given)).not.toContain(" style=");
      expect(draw(given)).not.toMatch(/NaN|Infinity|undefined/);
    }
  });

  it("never letters over lettering nor beyond its sheet, whatever the pad, the load and the levels", () => {
    const pressure = fc.integer({ min: 0, max: 9999 });
    fc.assert(
      fc.property(
        fc.record({
          breadth_m: fc.double({ min: 0.4, max: 9, noNaN: true }),
          length_m: fc.double({ min: 0.4, max: 9, noNaN: true }),
          thickness_m: fc.double({ min: 0.2, max: 1.5, noNaN: true }),
          depth_m: fc.double({ min: 0.1, max: 6, noNaN: true }),
          water_m: fc.double({ min: -1, max: 7, noNaN: true }),
          shareB: fc.double({ min: -0.49, max: 0.49, noNaN: true }),
          shareL: fc.double({ min: -0.49, max: 0.49, noNaN: true }),
          corners: fc.tuple(pressure, pressure, pressure, pressure),
          vertical_kN: fc.integer({ min: 1, max: 99_999 }),
          part: fc.double({ min: 0.05, max: 1, noNaN: true }),
        }),
        ({
          breadth_m,
          length_m,
          thickness_m,
          depth_m,
          water_m,
          shareB,
          shareL,
          corners,
          vertical_kN,
          part,
        }) => {
          const right_m = breadth_m / 2;
          const left_m = right_m - part * breadth_m;
          const lifted = part < 1;
          const markup = draw({
            ...trapezoidal,
            breadth_m,
            length_m,
            thickness_m,
            groundLevel_m: 100,
            foundingLevel_m: 100 - depth_m,
            groundwaterLevel_m: 100 - water_m,
            vertical_kN,
            eccentricityB_m: shareB * breadth_m,
            eccentricityL_m: shareL * length_m,
            distribution: lifted ? "partial" : "trapezoidal",
            cornerPressures_kPa: lifted
              ? [corners[0] + 1, 0, 0, corners[3] + 1]
              : corners.map((kPa) => kPa + 1),
            maxPressure_kPa: Math.max(...corners) + 1,
            minPressure_kPa: 0,
            contactRatio: part,
            contactPolygon_m: [
              [right_m, length_m / 2],
              [left_m, length_m / 2],
              [left_m, -length_m / 2],
              [right_m, -length_m / 2],
            ],
          });
          expect(collisionsIn(markup)).toEqual([]);
          expect(beyondSheet(markup)).toEqual([]);
        },
      ),
      { numRuns: 300 },
    );
  });
});
