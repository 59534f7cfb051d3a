import fc from "fast-check";
import type { GridPoint } from "@/lib/geometry/point";

/** Corners of a boundary that does not cross itself: seen from a middle, in order of direction, at any distance. */
export const starRing = fc
  .record({
    easting: fc.integer({ min: -50, max: 50 }),
    northing: fc.integer({ min: -50, max: 50 }),
    radii: fc.array(fc.integer({ min: 5, max: 60 }), { minLength: 5, maxLength: 12 }),
  })
  .map(({ easting, northing, radii }): GridPoint[] =>
    radii.map((radius, index) => {
      const angle = (2 * Math.PI * index) / radii.length;
      return [easting + radius * Math.cos(angle), northing + radius * Math.sin(angle)];
    }),
  );

export const rectangle = fc.record({
  easting_m: fc.double({ min: -40, max: 40, noNaN: true }),
  northing_m: fc.double({ min: -40, max: 40, noNaN: true }),
  breadth_m: fc.double({ min: 0.5, max: 12, noNaN: true }),
  length_m: fc.double({ min: 0.5, max: 12, noNaN: true }),
  orientation_deg: fc.double({ min: -360, max: 360, noNaN: true }),
});

export const shifted = (ring: readonly GridPoint[], easting_m: number, northing_m: number): GridPoint[] =>
  ring.map((point) => [point[0] + easting_m, point[1] + northing_m]);
