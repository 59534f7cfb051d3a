import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { delaunay } from "@/lib/geometry/delaunay";
import { circleSideOf, sideOf } from "@/lib/geometry/exact-side";
import type { GridPoint } from "@/lib/geometry/point";
import { signedArea_m2 } from "@/lib/geometry/polygon";
import { surfaceThrough } from "@/lib/geometry/surface";

/** Area of the convex hull, by Andrew's chain: another way to the same outline. */
function hullArea_m2(points: readonly GridPoint[]): number {
  const sorted = [...points].sort((a, b) => a[0] - b[0] || a[1] - b[1]);
  const half = (from: GridPoint[]): GridPoint[] => {
    const chain: GridPoint[] = [];
    for (const p of from) {
      for (;;) {
        const b = chain.at(-1);
        const a = chain.at(-2);
        if (!a || !b || (b[0] - a[0]) * (p[1] - a[1]) - (b[1] - a[1]) * (p[0] - a[0]) > 0) break;
        chain.pop();
      }
      chain.push(p);
    }
    return chain.slice(0, -1);
  };
  return Math.abs(signedArea_m2([...half(sorted), ...half(sorted.reverse())]));
}

function expectDelaunay(points: readonly GridPoint[]): void {
  const { triangles } = delaunay(points);
  let area = 0;
  for (const corners of triangles) {
    const ring = corners.map((index) => points[index] as GridPoint);
    expect(signedArea_m2(ring)).toBeGreaterThan(0);
    area += signedArea_m2(ring);
    const [a, b, c] = ring.map(([x, y]) => [Math.round(x * 1e4), Math.round(y * 1e4)] as const);
    for (const [x, y] of points)
      if (a && b && c)
        expect(circleSideOf(a, b, c, [Math.round(x * 1e4), Math.round(y * 1e4)])).toBeLessThanOrEqual(0);
  }
  expect(area).toBeCloseTo(hullArea_m2(points), 6);
}

// Whole steps of 0.1 m: many points on one line and on one circle, as footings are.
const lattice = fc.array(
  fc
    .tuple(fc.integer({ min: 0, max: 12 }), fc.integer({ min: 0, max: 12 }))
    .map(([x, y]): GridPoint => [x / 10, y / 10]),
  { minLength: 3, maxLength: 60 },
);
const scattered = fc.array(
  fc
    .tuple(fc.integer({ min: 0, max: 1e6 }), fc.integer({ min: 0, max: 1e6 }))
    .map(([x, y]): GridPoint => [x / 1e4, y / 1e4]),
  { minLength: 3, maxLength: 80 },
);

describe("joining points to triangles", () => {
  it("joins a square and its middle to four triangles, all neighbours of the middle", () => {
    const { triangles, neighbours } = delaunay([
      [0, 0],
      [6, 0],
      [6, 6],
      [0, 6],
      [3, 3],
    ]);
    expect(triangles).toHaveLength(4);
    expect(neighbours).toEqual([
      [0, 1],
      [0, 3],
      [0, 4],
      [1, 2],
      [1, 4],
      [2, 3],
      [2, 4],
      [3, 4],
    ]);
  });

  it("prefers the short diagonal of a rhomb", () => {
    const { neighbours } = delaunay([
      [0, 0],
      [5, 2],
      [10, 0],
      [5, -2],
    ]);
    expect(neighbours).toContainEqual([1, 3]);
    expect(neighbours).not.toContainEqual([0, 2]);
  });

  it("holds no point within any circle and fills the whole outline, in rows and grids of footings", () => {
    fc.assert(
      fc.property(lattice, (points) => {
        expectDelaunay(points);
      }),
      { numRuns: 150 },
    );
  });

  it("holds no point within any circle and fills the whole outline, for scattered points", () => {
    fc.assert(
      fc.property(scattered, (points) => {
        expectDelaunay(points);
      }),
      { numRuns: 100 },
    );
  });

  it("gives the same on a national grid", () => {
    fc.assert(
      fc.property(scattered, (points) => {
        const far = points.map(([x, y]): GridPoint => [x + 523_145, y + 178_456]);
        expect(delaunay(far).neighbours.length).toBe(delaunay(points).neighbours.length);
      }),
      { numRuns: 40 },
    );
  });

  it("makes each a neighbour of the next where all lie on one line", () => {
    const row: GridPoint[] = [
      [12, 6],
      [0, 0],
      [6, 3],
      [18, 9],
    ];
    expect(delaunay(row)).toMatchObject({
      triangles: [],
      neighbours: [
        [0, 2],
        [0, 3],
        [1, 2],
      ],
    });
  });

  it("counts two points at one place as one, and says which", () => {
    const { triangles, sameAs } = delaunay([
      [0, 0],
      [6, 0],
      [0, 6],
      [6, 0],
    ]);
    expect(triangles).toEqual([[0, 1, 2]]);
    expect([...sameAs]).toEqual([[3, 1]]);
  });

  it.each([0, 1, 2])("has no triangle for %i points", (count) => {
    const points: GridPoint[] = [
      [0, 0],
      [6, 0],
    ];
    expect(delaunay(points.slice(0, count))).toMatchObject({
      triangles: [],
      neighbours: count === 2 ? [[0, 1]] : [],
    });
  });

  it("joins ten thousand footings on a regular grid", () => {
    const points = Array.from(
      { length: 10_000 },
      (_, index): GridPoint => [(index % 100) * 7.5, Math.floor(index / 100) * 6],
    );
    // A grid of 99 × 99 bays has two triangles in each.
    expect(delaunay(points).triangles).toHaveLength(99 * 99 * 2);
  });

  it("refuses a point without coordinates", () => {
    expect(() =>
      delaunay([
        [0, 0],
        [Number.NaN, 1],
        [2, 2],
      ]),
    ).toThrow(/lacks an easting/);
  });
});

describe("signs without rounding", () => {
  it("sees one tenth of a millimetre beside a line of 100 km", () => {
    const a = [0, 0] as const;
    const b = [1_000_000_000, 999_999_999] as const;
    const c = [500_000_001, 500_000_000] as const;
    // (10⁹ · 5·10⁸) − (10⁹ − 1)(5·10⁸ + 1) = −10⁹ + 5·10⁸ + 1 < 0.
    expect(sideOf(a, b, c)).toBe(-1);
    expect(sideOf(b, a, c)).toBe(1);
    expect(sideOf(a, [3, 3], [700_000_000, 700_000_000])).toBe(0);
  });

  it("knows a point on a circle from its neighbours on either side", () => {
    const [a, b, c] = [
      [5_000_000, 0],
      [3_000_000, 4_000_000],
      [-5_000_000, 0],
    ] as const;
    expect(circleSideOf(a, b, c, [-4_000_000, -3_000_000])).toBe(0);
    expect(circleSideOf(a, b, c, [-4_000_000, -2_999_999])).toBe(1);
    expect(circleSideOf(a, b, c, [-4_000_000, -3_000_001])).toBe(-1);
  });
});

describe("a surface through levels", () => {
  const slope = (easting_m: number, northing_m: number) => ({
    easting_m,
    northing_m,
    level_m: 20 + 0.1 * easting_m - 0.05 * northing_m,
  });

  it("reads a plane slope exactly between its points, and nothing beyond them", () => {
    const surface = surfaceThrough([slope(0, 0), slope(40, 0), slope(40, 30), slope(0, 30), slope(13, 11)]);
    expect(surface.at([20, 20])?.level_m).toBeCloseTo(21, 9);
    expect(surface.at([40, 30])?.level_m).toBeCloseTo(22.5, 9);
    expect(surface.at([41, 15])).toBeNull();
  });

  it("reads each point's own level, and between the lowest and the highest elsewhere", () => {
    fc.assert(
      fc.property(
        scattered,
        fc.array(fc.integer({ min: 0, max: 200 }), { minLength: 80, maxLength: 80 }),
        fc.double({ min: 0, max: 100, noNaN: true }),
        fc.double({ min: 0, max: 100, noNaN: true }),
        (places, levels, easting, northing) => {
          const seen = new Map(
            places.map(([e, n], i) => [
              `${e} ${n}`,
              { easting_m: e, northing_m: n, level_m: (levels[i] ?? 0) / 10 },
            ]),
          );
          const points = [...seen.values()];
          const surface = surfaceThrough(points);
          const reading = surface.at([easting, northing]);
          const all = points.map(({ level_m }) => level_m);
          if (reading) {
            expect(reading.level_m).toBeGreaterThanOrEqual(Math.min(...all) - 1e-6);
            expect(reading.level_m).toBeLessThanOrEqual(Math.max(...all) + 1e-6);
            expect(reading.from.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 9);
          }
        },
      ),
      { numRuns: 100 },
    );
  });
});
