import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { boundingBox, type GridPoint } from "@/lib/geometry/point";
import { pointInRing } from "@/lib/geometry/point-in-ring";
import {
  anticlockwise,
  area_m2,
  centroidOf,
  containsPoint,
  orientationOf,
  perimeter_m,
  placeOf,
  signedArea_m2,
} from "@/lib/geometry/polygon";
import { cleanRing, readRing, selfCrossing } from "@/lib/geometry/ring-check";
import { shifted, starRing } from "./arbitraries";

// An L of 10 × 10 m with a corner of 6 × 6 m cut out: 64 m².
const lShape: GridPoint[] = [
  [0, 0],
  [10, 0],
  [10, 4],
  [4, 4],
  [4, 10],
  [0, 10],
];
const bowTie: GridPoint[] = [
  [0, 0],
  [10, 10],
  [10, 0],
  [0, 10],
];

describe("a boundary on plan", () => {
  it("measures an L by hand: 64 m², 40 m round, centre at 3.875 m", () => {
    expect(signedArea_m2(lShape)).toBe(64);
    expect(perimeter_m(lShape)).toBe(40);
    // (100·5 − 36·7) / 64 = 3.875.
    expect(centroidOf(lShape)).toEqual([3.875, 3.875]);
    expect(boundingBox(lShape)).toEqual({
      minEasting_m: 0,
      minNorthing_m: 0,
      maxEasting_m: 10,
      maxNorthing_m: 10,
    });
  });

  it("knows which way its corners run and turns them anticlockwise", () => {
    const clockwise = [...lShape].reverse();
    expect(orientationOf(lShape)).toBe("anticlockwise");
    expect(orientationOf(clockwise)).toBe("clockwise");
    expect(orientationOf(lShape.slice(0, 2))).toBe("none");
    expect(anticlockwise(clockwise)).toEqual(lShape);
    expect(area_m2(clockwise)).toBe(64);
  });

  it("contains a point on its side and at its corner, and none in the notch", () => {
    expect(placeOf([2, 8], lShape)).toBe("inside");
    expect(placeOf([4, 7], lShape)).toBe("on the boundary");
    expect(placeOf([10, 4], lShape)).toBe("on the boundary");
    expect(placeOf([7, 7], lShape)).toBe("outside");
    expect(containsPoint(lShape, [4, 7])).toBe(true);
    expect(pointInRing([7, 7], lShape)).toBe(false);
  });

  it("is not misled by a corner at the very height of the point", () => {
    const diamond: GridPoint[] = [
      [0, -5],
      [5, 0],
      [0, 5],
      [-5, 0],
    ];
    expect(placeOf([0, 0], diamond)).toBe("inside");
    expect(placeOf([-6, 0], diamond)).toBe("outside");
    expect(placeOf([6, 0], diamond)).toBe("outside");
    expect(placeOf([-6, 5], diamond)).toBe("outside");
  });

  it("keeps its area, and its centre moves with it, on a national grid", () => {
    fc.assert(
      fc.property(starRing, (ring) => {
        const far = shifted(ring, 523_145, 178_456);
        expect(area_m2(far)).toBeCloseTo(area_m2(ring), 6);
        const near = centroidOf(ring) as GridPoint;
        const there = centroidOf(far) as GridPoint;
        expect(there[0] - 523_145).toBeCloseTo(near[0], 6);
        expect(there[1] - 178_456).toBeCloseTo(near[1], 6);
      }),
    );
  });
});

describe("cleaning a boundary", () => {
  it("drops the first corner repeated at the end and corners repeated at once", () => {
    const drawn: GridPoint[] = [
      [0, 0],
      [0, 0],
      [10, 0],
      [10, 4],
      [10, 4.0005],
      [4, 4],
      [4, 10],
      [0, 10],
      [0, 0],
    ];
    expect(cleanRing(drawn)).toEqual(lShape);
  });

  it("drops a spike that runs out and straight back", () => {
    const drawn: GridPoint[] = [
      [0, 0],
      [10, 0],
      [10, 4],
      [25, 4],
      [10, 4],
      [4, 4],
      [4, 10],
      [0, 10],
    ];
    expect(cleanRing(drawn)).toEqual(lShape);
  });

  it("leaves nothing of a line drawn there and back, and says so", () => {
    expect(
      cleanRing([
        [0, 0],
        [5, 0],
        [0, 0],
      ]).length,
    ).toBeLessThan(3);
    expect(
      readRing([
        [0, 0],
        [5, 0],
        [0, 0],
      ]),
    ).toMatchObject({ problem: expect.stringContaining("three") });
  });

  it("does not change what is clean", () => {
    fc.assert(
      fc.property(starRing, (ring) => {
        expect(cleanRing(ring)).toEqual(ring);
      }),
    );
  });
});

describe("a boundary that meets itself", () => {
  it("names the point of the crossing and the two sides", () => {
    expect(selfCrossing(bowTie)).toEqual({ at: [5, 5], sides: [1, 3] });
    expect(readRing(bowTie)).toEqual({
      problem: "The boundary meets itself at 5.00 E, 5.00 N (sides 1 and 3).",
      at: [5, 5],
    });
  });

  it("is found where a corner touches another side", () => {
    const touching: GridPoint[] = [
      [0, 0],
      [10, 0],
      [10, 10],
      [5, 0],
      [0, 10],
    ];
    expect(selfCrossing(touching)?.at).toEqual([5, 0]);
  });

  it("is found where one side runs back over the last", () => {
    const back: GridPoint[] = [
      [0, 0],
      [10, 0],
      [4, 0],
      [4, 8],
    ];
    expect(selfCrossing(back)?.at).toEqual([4, 0]);
  });

  it("is not seen in a simple boundary, whatever its shape", () => {
    fc.assert(
      fc.property(starRing, (ring) => {
        expect(selfCrossing(ring)).toBeNull();
      }),
    );
  });

  it("is seen whenever two far corners of a convex boundary change places", () => {
    fc.assert(
      fc.property(fc.integer({ min: 6, max: 14 }), fc.integer({ min: 2, max: 3 }), (count, apart) => {
        const ring = Array.from({ length: count }, (_, index): GridPoint => {
          const angle = (2 * Math.PI * index) / count;
          return [30 * Math.cos(angle), 20 * Math.sin(angle)];
        });
        const swapped = [...ring];
        swapped[0] = ring[apart] as GridPoint;
        swapped[apart] = ring[0] as GridPoint;
        expect(selfCrossing(swapped)).not.toBeNull();
      }),
    );
  });
});

describe("reading a drawn boundary", () => {
  it("gives it back clean and anticlockwise", () => {
    const first = lShape[0] as GridPoint;
    const read = readRing([...[...lShape].reverse(), lShape.at(-1) as GridPoint]);
    expect("ring" in read && orientationOf(read.ring)).toBe("anticlockwise");
    expect("ring" in read && area_m2(read.ring)).toBe(64);
    expect("ring" in read && read.ring).toContainEqual(first);
  });

  it.each([
    [[], "at least three"],
    [
      [
        [0, 0],
        [5, 5],
      ],
      "at least three",
    ],
    [
      [
        [0, 0],
        [5, 5],
        [9, 9],
      ],
      "encloses nothing",
    ],
    [
      [
        [0, 0],
        [5, Number.NaN],
        [9, 0],
      ],
      "Corner 2 has no easting",
    ],
  ] as [GridPoint[], string][])("refuses %j", (points, part) => {
    expect(readRing(points)).toMatchObject({ problem: expect.stringContaining(part) });
  });
});
