import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { HoleId, HoleRevisionId } from "@/lib/contracts/ids";
import type { Context } from "../context";

export type PlacedHole = {
  id: HoleId;
  revisionId: HoleRevisionId;
  name: string;
  easting_m: number;
  northing_m: number;
};

/** Holes by squares of the size of the limit, so that a search looks at nine squares and not at every hole. */
export type HoleGrid = { limit_m: number; squares: Map<string, PlacedHole[]> };

/** One statement: the current log of every hole that has a place on the site grid. */
export async function gatherHoles(tx: Transaction, context: Context): Promise<PlacedHole[]> {
  const { rows } = await tx.execute<PlacedHole>(sql`
    select h.id, r.id as "revisionId", h.name, r.easting_m, r.northing_m
    from hole h join hole_revision r on r.project_id = h.project_id and r.id = h.current_revision_id
    where h.project_id = ${context.projectId} and r.easting_m is not null and r.northing_m is not null
    order by h.name`);
  return rows;
}

/** Sorts holes into squares of the project's limit. */
export function holeGrid(holes: readonly PlacedHole[], limit_m: number): HoleGrid {
  const squares = new Map<string, PlacedHole[]>();
  for (const hole of holes) {
    const key = squareOf(hole.easting_m, hole.northing_m, limit_m);
    const square = squares.get(key);
    if (square) square.push(hole);
    else squares.set(key, [hole]);
  }
  return { limit_m, squares };
}

/** Holes within the limit of a point on plan, the nearest first. */
export function holesNear(
  grid: HoleGrid,
  at: { easting_m: number; northing_m: number },
): { hole: PlacedHole; distance_m: number }[] {
  const found: { hole: PlacedHole; distance_m: number }[] = [];
  for (const east of [-1, 0, 1])
    for (const north of [-1, 0, 1]) {
      const key = squareOf(
        at.easting_m + east * grid.limit_m,
        at.northing_m + north * grid.limit_m,
        grid.limit_m,
      );
      for (const hole of grid.squares.get(key) ?? []) {
        const distance_m = Math.hypot(hole.easting_m - at.easting_m, hole.northing_m - at.northing_m);
        if (distance_m <= grid.limit_m) found.push({ hole, distance_m });
      }
    }
  return found.sort((a, b) => a.distance_m - b.distance_m || (a.hole.name < b.hole.name ? -1 : 1));
}

const squareOf = (easting_m: number, northing_m: number, side_m: number): string =>
  `${Math.floor(easting_m / side_m)} ${Math.floor(northing_m / side_m)}`;
