import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  containsRing,
  overlapArea_m2,
  overlapPieces,
  ringsOverlap,
  shareInside,
} from "@/lib/geometry/overlap";
import type { GridPoint } from "@/lib/geometry/point";
import { area_m2 } from "@/lib/geometry/polygon";
import { clearGap_m, containsRectangle, cornersOf, padAxesOf, pointOnPad } from "@/lib/geometry/rectangle";
import { rectangle, shifted, starRing } from "./arbitraries";

const box = (easting: number, northing: number, width: number, height: number): GridPoint[] => [
  [easting, northing],
  [easting + width, northing],
  [easting + width, northing + height],
  [easting, northing + height],
];
const pad = (
  easting_m: number,
  northing_m: number,
  breadth_m: number,
  length_m: number,
  orientation_deg = 0,
) => ({
  easting_m,
  northing_m,
  breadth_m,
  length_m,
  orientation_deg,
});

describe("the area that two boundaries have in common", () => {
  it("is measured by hand", () => {
    expect(overlapArea_m2(box(0, 0, 10, 10), box(6, 7, 10, 10))).toBeCloseTo(12, 9);
    expect(overlapArea_m2(box(0, 0, 10, 10), box(2, 3, 4, 5))).toBeCloseTo(20, 9);
    expect(overlapArea_m2(box(0, 0, 10, 10), box(20, 0, 5, 5))).toBe(0);
    const diamond: GridPoint[] = [
      [5, 0],
      [10, 5],
      [5, 10],
      [0, 5],
    ];
    expect(overlapArea_m2(box(0, 0, 10, 10), diamond)).toBeCloseTo(50, 9);
    expect(overlapArea_m2([...box(0, 0, 10, 10)].reverse(), diamond)).toBeCloseTo(50, 9);
  });

  it("agrees with the pieces that the clipping library draws", () => {
    fc.assert(
      fc.property(starRing, starRing, (first, second) => {
        const pieces = overlapPieces(first, second);
        if (pieces === null) return;
        const drawn = pieces.reduce(
          (sum, { ring, holes }) => sum + area_m2(ring) - holes.reduce((s, hole) => s + area_m2(hole), 0),
          0,
        );
        // Corners were brought to 0.1 mm: along some 500 m of boundary that is 0.05 m² at most.
        expect(Math.abs(overlapArea_m2(first, second) - drawn)).toBeLessThan(0.05);
      }),
      { numRuns: 200 },
    );
  });

  it("is the same from either side, never more than either, and the whole of a ring with itself", () => {
    fc.assert(
      fc.property(starRing, starRing, (first, second) => {
        const common = overlapArea_m2(first, second);
        expect(common).toBeCloseTo(overlapArea_m2(second, first), 6);
        expect(common).toBeLessThanOrEqual(Math.min(area_m2(first), area_m2(second)));
        expect(overlapArea_m2(first, first)).toBeCloseTo(area_m2(first), 6);
      }),
    );
  });

  it("does not depend on where the site lies on the national grid", () => {
    fc.assert(
      fc.property(starRing, starRing, (first, second) => {
        const far = overlapArea_m2(shifted(first, 523_145, 178_456), shifted(second, 523_145, 178_456));
        expect(far).toBeCloseTo(overlapArea_m2(first, second), 5);
      }),
    );
  });
});

describe("zones as neighbours", () => {
  it("do not overlap along a shared side, drawn exactly or a few millimetres over each other", () => {
    expect(ringsOverlap(box(0, 0, 10, 10), box(10, 0, 10, 10))).toBe(false);
    expect(ringsOverlap(box(0, 0, 10, 10), box(9.996, 0, 10, 10))).toBe(false);
    expect(ringsOverlap(box(0, 0, 10, 10), box(10, 10, 10, 10))).toBe(false);
    expect(ringsOverlap(box(0, 0, 10, 10), box(10.004, 0, 10, 10))).toBe(false);
  });

  it("overlap by a small corner in earnest, though it is less ground than a hair along a whole side", () => {
    expect(ringsOverlap(box(0, 0, 200, 200), box(199.9, 199.9, 50, 50))).toBe(true);
    expect(ringsOverlap(box(0, 0, 200, 200), box(199.995, 0, 50, 200))).toBe(false);
  });

  it("overlap where one lies inside the other or both are the same", () => {
    expect(ringsOverlap(box(0, 0, 10, 10), box(2, 2, 3, 3))).toBe(true);
    expect(ringsOverlap(box(0, 0, 10, 10), box(0, 0, 10, 10))).toBe(true);
  });

  it("share one side cut at other corners without overlapping", () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: 1, max: 99, noNaN: true }), { maxLength: 6 }),
        fc.array(fc.double({ min: 1, max: 99, noNaN: true }), { maxLength: 6 }),
        fc.double({ min: -Math.PI, max: Math.PI, noNaN: true }),
        (cutsLeft, cutsRight, angle) => {
          const turned = ([x, y]: GridPoint): GridPoint => [
            523_000 + x * Math.cos(angle) - y * Math.sin(angle),
            178_000 + x * Math.sin(angle) + y * Math.cos(angle),
          ];
          const up = (cuts: number[]): GridPoint[] => [...cuts].sort((a, b) => a - b).map((y) => [0, y]);
          const left: GridPoint[] = [[0, 0], ...up(cutsLeft), [0, 100], [-50, 100], [-50, 0]];
          const right: GridPoint[] = [[0, 0], ...up(cutsRight), [0, 100], [50, 100], [50, 0]];
          expect(ringsOverlap(left.map(turned), right.map(turned))).toBe(false);
        },
      ),
    );
  });
});

describe("a pad on plan", () => {
  it("has its breadth axis at the stated bearing, anticlockwise from grid east", () => {
    expect(cornersOf(pad(100, 50, 2, 4))).toEqual([
      [101, 52],
      [99, 52],
      [99, 48],
      [101, 48],
    ]);
    // Turned by 90° the breadth lies north, the length west.
    expect(cornersOf(pad(100, 50, 2, 4, 90))).toEqual([
      [98, 51],
      [98, 49],
      [102, 49],
      [102, 51],
    ]);
    const turned = pointOnPad(pad(0, 0, 2, 4, 30), 1, 0);
    expect(turned[0]).toBeCloseTo(Math.sqrt(3) / 2, 12);
    expect(turned[1]).toBeCloseTo(0.5, 12);
  });

  it("keeps its area at every bearing, runs anticlockwise, and gives back its own axes", () => {
    fc.assert(
      fc.property(rectangle, fc.double({ min: -5, max: 5, noNaN: true }), (given, along) => {
        expect(area_m2(cornersOf(given))).toBeCloseTo(given.breadth_m * given.length_m, 6);
        const axes = padAxesOf(given, pointOnPad(given, along, -2 * along));
        expect(axes.alongB_m).toBeCloseTo(along, 9);
        expect(axes.alongL_m).toBeCloseTo(-2 * along, 9);
      }),
    );
  });

  it("is contained up to the very boundary, and not beyond it", () => {
    const zone = box(0, 0, 10, 10);
    expect(containsRectangle(zone, pad(9, 5, 2, 2))).toBe(true);
    expect(containsRectangle(zone, pad(9.1, 5, 2, 2))).toBe(false);
    expect(shareInside(cornersOf(pad(10, 5, 2, 2)), zone)).toBeCloseTo(0.5, 9);
  });

  it("is not contained where a notch of the zone reaches in between its corners", () => {
    const notched: GridPoint[] = [
      [0, 0],
      [4.8, 0],
      [5, 6],
      [5.2, 0],
      [10, 0],
      [10, 10],
      [0, 10],
    ];
    const over = pad(5, 4, 6, 4);
    for (const corner of cornersOf(over)) expect(corner[1]).toBeGreaterThan(0);
    expect(containsRectangle(notched, over)).toBe(false);
    expect(containsRing(notched, box(1, 7, 8, 2))).toBe(true);
  });

  it("leaves a clear gap to its neighbour; none when they touch, cross or one holds the other", () => {
    expect(clearGap_m(pad(0, 0, 2, 2), pad(5, 0, 2, 2))).toBeCloseTo(3, 12);
    expect(clearGap_m(pad(0, 0, 2, 2), pad(5, 6, 2, 2))).toBeCloseTo(5, 12);
    // A diamond's corner, √2 m from its centre, points at the side.
    expect(clearGap_m(pad(0, 0, 2, 2), pad(5, 0, 2, 2, 45))).toBeCloseTo(4 - Math.SQRT2, 9);
    expect(clearGap_m(pad(0, 0, 2, 2), pad(2, 0, 2, 2))).toBe(0);
    expect(clearGap_m(pad(0, 0, 6, 1), pad(0, 0, 1, 6))).toBe(0);
    expect(clearGap_m(pad(0, 0, 6, 6), pad(0, 0, 1, 1))).toBe(0);
  });

  it("has no gap exactly where it overlaps its neighbour on plan", () => {
    fc.assert(
      fc.property(rectangle, rectangle, (a, b) => {
        const gap = clearGap_m(a, b);
        const common = overlapArea_m2(cornersOf(a), cornersOf(b));
        if (common > 1e-6) expect(gap).toBe(0);
        if (gap > 1e-6) expect(common).toBeLessThan(1e-6);
        expect(gap).toBeCloseTo(clearGap_m(b, a), 9);
      }),
    );
  });
});
