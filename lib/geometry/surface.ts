import { delaunay } from "./delaunay";
import type { GridPoint } from "./point";

/** A level found at a place on plan. */
export type LevelPoint = { easting_m: number; northing_m: number; level_m: number };

/** A level read from a surface, and the points that it was read from with their share; null outside the points. */
export type SurfaceReading = { level_m: number; from: { point: number; share: number }[] } | null;

/** A surface through levels at points (of ground, or of the top of a ground unit): plane over each triangle. */
export type Surface = { at: (place: GridPoint) => SurfaceReading };

/**
 * Builds the surface through levels at points. It speaks only between them: outside their triangles there is no
 * reading, and never one that is prolonged. Of points at one place the first counts.
 */
export function surfaceThrough(points: readonly LevelPoint[]): Surface {
  const { triangles } = delaunay(points.map(({ easting_m, northing_m }) => [easting_m, northing_m]));
  return {
    at([easting_m, northing_m]) {
      for (const corners of triangles) {
        const [a, b, c] = corners.map((index) => points[index]) as [LevelPoint, LevelPoint, LevelPoint];
        const whole = twiceArea(a, b, c);
        const here = { easting_m, northing_m };
        const shares = [
          twiceArea(here, b, c) / whole,
          twiceArea(a, here, c) / whole,
          twiceArea(a, b, here) / whole,
        ];
        // A hair's breadth outside still counts, so that a hole reads its own level.
        if (shares.some((share) => !(share >= -1e-9))) continue;
        const [u = 0, v = 0, w = 0] = shares;
        return {
          level_m: u * a.level_m + v * b.level_m + w * c.level_m,
          from: corners.map((point, index) => ({ point, share: shares[index] ?? 0 })),
        };
      }
      return null;
    },
  };
}

type Place = { easting_m: number; northing_m: number };

const twiceArea = (a: Place, b: Place, c: Place): number =>
  (b.easting_m - a.easting_m) * (c.northing_m - a.northing_m) -
  (b.northing_m - a.northing_m) * (c.easting_m - a.easting_m);
