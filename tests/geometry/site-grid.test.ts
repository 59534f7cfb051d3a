import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { gridOfPixel, imageCorners, pixelOfGrid, placeImage } from "@/lib/geometry/image-placement";
import type { GridPoint } from "@/lib/geometry/point";
import {
  fitSiteGrid,
  levelOnDatum_m,
  levelOnOther_m,
  type SiteGrid,
  siteGridFromAngle,
  toNational,
  toSite,
} from "@/lib/geometry/site-grid";

const grid = fc.record({
  originEasting_m: fc.double({ min: 1e5, max: 7e5, noNaN: true }),
  originNorthing_m: fc.double({ min: 1e5, max: 9e6, noNaN: true }),
  rotation_deg: fc.double({ min: -179, max: 179, noNaN: true }),
  scale: fc.double({ min: 0.9995, max: 1.0005, noNaN: true }),
});
const place = fc.tuple(
  fc.double({ min: -2000, max: 2000, noNaN: true }),
  fc.double({ min: -2000, max: 2000, noNaN: true }),
) as fc.Arbitrary<GridPoint>;
const fitted = (points: Parameters<typeof fitSiteGrid>[0]) => {
  const fit = fitSiteGrid(points);
  if ("problem" in fit) throw new Error(fit.problem);
  return fit;
};
const control = (grid: SiteGrid, sites: GridPoint[]) =>
  sites.map((site, index) => ({ name: `C${index + 1}`, site, national: toNational(grid, site) }));

describe("the site grid on the national grid", () => {
  it("is a quarter turn worked by hand: site east is national north", () => {
    const quarter = { originEasting_m: 1000, originNorthing_m: 2000, rotation_deg: 90, scale: 1 };
    const [easting, northing] = toNational(quarter, [10, 3]);
    expect(easting).toBeCloseTo(997, 9);
    expect(northing).toBeCloseTo(2010, 9);
  });

  it("comes back from there to the nearest micrometre", () => {
    fc.assert(
      fc.property(grid, place, (given, site) => {
        const [easting, northing] = toSite(given, toNational(given, site));
        expect(easting).toBeCloseTo(site[0], 6);
        expect(northing).toBeCloseTo(site[1], 6);
      }),
    );
  });

  it("is found again from the points that it was used for", () => {
    fc.assert(
      fc.property(grid, (given) => {
        const {
          grid: found,
          residuals,
          checked,
        } = fitted(
          control(given, [
            [0, 0],
            [200, 0],
            [180, 150],
          ]),
        );
        expect(checked).toBe(true);
        for (const { distance_m } of residuals) expect(distance_m).toBeLessThan(1e-6);
        const [easting, northing] = toNational(found, [500, 500]);
        const [expectedEasting, expectedNorthing] = toNational(given, [500, 500]);
        expect(easting).toBeCloseTo(expectedEasting, 5);
        expect(northing).toBeCloseTo(expectedNorthing, 5);
      }),
    );
  });

  it("leaves nothing over at two points, and says that this proves nothing", () => {
    const fit = fitted([
      { name: "A", site: [0, 0], national: [500, 500] },
      { name: "B", site: [100, 0], national: [500, 600.5] },
    ]);
    expect(fit.checked).toBe(false);
    expect(fit.rootMeanSquare_m).toBeCloseTo(0, 9);
    expect(fit.grid.rotation_deg).toBeCloseTo(90, 9);
    expect(fit.grid.scale).toBeCloseTo(1.005, 9);
  });

  it("shows a mistyped control point by what is left over, greatest there", () => {
    const true_ = { originEasting_m: 523_000, originNorthing_m: 178_000, rotation_deg: 12, scale: 1 };
    const points = control(true_, [
      [0, 0],
      [200, 0],
      [200, 150],
      [0, 150],
      [100, 75],
    ]);
    const [, , wrong] = points;
    if (wrong) wrong.national = [wrong.national[0] + 1, wrong.national[1]];
    const fit = fitted(points);
    const worst = [...fit.residuals].sort((a, b) => b.distance_m - a.distance_m)[0];
    expect(worst?.name).toBe("C3");
    expect(worst?.distance_m).toBeGreaterThan(0.4);
    // Least squares leave no shift over: the residuals add up to nothing.
    expect(fit.residuals.reduce((sum, { easting_m }) => sum + easting_m, 0)).toBeCloseTo(0, 6);
  });

  it.each([
    [[{ name: "A", site: [0, 0], national: [5, 5] }], "at least two control points"],
    [
      [
        { name: "A", site: [0, 0], national: [5, 5] },
        { name: "B", site: [0, 0], national: [9, 5] },
      ],
      "same point of the site grid",
    ],
    [
      [
        { name: "A", site: [0, 0], national: [5, 5] },
        { name: "B", site: [9, 0], national: [5, 5] },
      ],
      "same point of the national grid",
    ],
    [
      [
        { name: "A", site: [0, 0], national: [5, 5] },
        { name: "B", site: [9, 0], national: [Number.NaN, 5] },
      ],
      "lacks an easting",
    ],
  ] as [Parameters<typeof fitSiteGrid>[0], string][])("is refused in a sentence: %#", (points, part) => {
    expect(fitSiteGrid(points)).toMatchObject({ problem: expect.stringContaining(part) });
  });

  it("can be had from one point and an angle, true at that point", () => {
    fc.assert(
      fc.property(grid, place, place, ({ rotation_deg }, site, national) => {
        const found = siteGridFromAngle({ point: { site, national }, rotation_deg });
        const [easting, northing] = toNational(found, site);
        expect(easting).toBeCloseTo(national[0], 6);
        expect(northing).toBeCloseTo(national[1], 6);
      }),
    );
  });

  it("carries levels between the site datum and the ordnance datum: +0.00 = 21.350", () => {
    expect(levelOnOther_m({ zero_m: 21.35 }, -1.2)).toBeCloseTo(20.15, 12);
    expect(levelOnDatum_m({ zero_m: 21.35 }, 20.15)).toBeCloseTo(-1.2, 12);
  });
});

describe("placing an image by points", () => {
  const upright = [
    { x_px: 100, y_px: 900, easting_m: 10, northing_m: 10 },
    { x_px: 1100, y_px: 400, easting_m: 210, northing_m: 110 },
  ];

  it("lays an upright plan at 0.2 m a pixel with its top to the north", () => {
    const placed = placeImage(upright);
    if ("problem" in placed) throw new Error(placed.problem);
    expect(placed.metresPerPixel).toBeCloseTo(0.2, 12);
    expect(placed.rotation_deg).toBeCloseTo(0, 9);
    const [upperLeft, , lowerRight] = imageCorners(placed, { width_px: 1200, height_px: 1000 });
    expect(upperLeft[0]).toBeCloseTo(-10, 9);
    expect(upperLeft[1]).toBeCloseTo(190, 9);
    expect(lowerRight[0]).toBeCloseTo(230, 9);
    expect(lowerRight[1]).toBeCloseTo(-10, 9);
  });

  it("puts the known points where they are known, and pixels come back from the grid", () => {
    fc.assert(
      fc.property(place, place, (a, b) => {
        fc.pre(Math.hypot(a[0] - b[0], a[1] - b[1]) > 1);
        const placed = placeImage([
          { x_px: 20, y_px: 30, easting_m: a[0], northing_m: a[1] },
          { x_px: 800, y_px: 600, easting_m: b[0], northing_m: b[1] },
        ]);
        if ("problem" in placed) throw new Error(placed.problem);
        const [easting, northing] = gridOfPixel(placed, 800, 600);
        expect(easting).toBeCloseTo(b[0], 6);
        expect(northing).toBeCloseTo(b[1], 6);
        const pixel = pixelOfGrid(placed, a);
        expect(pixel.x_px).toBeCloseTo(20, 4);
        expect(pixel.y_px).toBeCloseTo(30, 4);
      }),
    );
  });

  it("is refused with one point, or with two that are the same", () => {
    const [first] = upright;
    if (!first) throw new Error("No point.");
    expect(placeImage([first])).toMatchObject({ problem: expect.stringContaining("two points") });
    expect(placeImage([first, { ...first, x_px: 500 }])).toMatchObject({
      problem: expect.stringContaining("apart"),
    });
  });
});
