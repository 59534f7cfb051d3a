import { z } from "zod";
import { delaunay } from "@/lib/geometry/delaunay";
import { defineMethod, type MethodFinding, output, quantity } from "@/lib/methods/define-method";
import { formula, line } from "@/lib/methods/formula";

/** Difference of settlement over distance, between two neighbours. */
export const distortion = formula({
  symbol: "β",
  unit: "",
  ref: "en1997H",
  shown: "Δs / (1000 d)",
  symbols: { Δs: "differential_mm", d: "distance_m" },
  of: (q: { differential_mm: number; distance_m: number }) => q.differential_mm / (1000 * q.distance_m),
});

type Point = { id: string; x_m: number; y_m: number; settlement_mm: number };
type Pair = { from: string; to: string; distance_m: number; differential_mm: number; ratio: number };

/** Every pair of neighbours (sides of the Delaunay triangles) with its distortion, and the worst; in order of the points. */
export function distortionsOf(points: readonly Point[]): { pairs: Pair[]; worst: Pair | null } {
  const { neighbours } = delaunay(points.map(({ x_m, y_m }) => [x_m, y_m] as const));
  const pairs = neighbours.map(([one, other]): Pair => {
    const a = points[one] as Point;
    const b = points[other] as Point;
    const distance_m = Math.hypot(a.x_m - b.x_m, a.y_m - b.y_m);
    const differential_mm = Math.abs(a.settlement_mm - b.settlement_mm);
    return {
      from: a.id,
      to: b.id,
      distance_m,
      differential_mm,
      ratio: distortion.of({ differential_mm, distance_m }),
    };
  });
  const worst = pairs.reduce<Pair | null>(
    (most, pair) => (most === null || pair.ratio > most.ratio ? pair : most),
    null,
  );
  return { pairs, worst };
}

/** The usual limits that a distortion is held against: EN 1997-1 Annex H, read in a secondary copy. */
const limits = [
  {
    from: 1 / 150,
    code: "ultimate",
    message: "More than 1/150: an ultimate limit state is likely in ordinary frames.",
  },
  {
    from: 1 / 300,
    code: "above-range",
    message: "More than 1/300: beyond the range that ordinary structures bear in use.",
  },
  {
    from: 1 / 500,
    code: "above-usual",
    message: "More than 1/500, which is acceptable for many structures.",
  },
] as const;

const pair = z.object({
  from: z.string().meta({ label: "From", unit: "" }),
  to: z.string().meta({ label: "To", unit: "" }),
  distance_m: output("Distance", "m"),
  differential_mm: output("Differential settlement", "mm"),
  ratio: output("Angular distortion"),
});

export const angularDistortion = defineMethod({
  id: "angular-distortion",
  version: "1",
  title: "Angular distortion between neighbouring footings",
  source: ["en1997H"],
  limits: [
    "A tilt of the whole structure is part of these figures: take it out before comparing with limits of relative rotation.",
    "Neighbours are the sides of the Delaunay triangles; of footings on one place only the first counts.",
  ],
  inputs: z.strictObject({
    points: z
      .array(
        z.strictObject({
          id: z
            .string({ error: "A point has an id in words." })
            .min(1, "A point has an id.")
            .meta({ label: "Mark", unit: "" }),
          x_m: quantity({ label: "Easting", unit: "m", min: -1e8, max: 1e8 }),
          y_m: quantity({ label: "Northing", unit: "m", min: -1e8, max: 1e8 }),
          settlement_mm: quantity({ label: "Settlement", unit: "mm" }),
        }),
        { error: "Points is a list." },
      )
      .min(2, "At least two points are needed.")
      .max(20_000, "At most 20,000 points.")
      .refine(
        (points) => new Set(points.map(({ id }) => id)).size === points.length,
        "Each point has an id of its own.",
      )
      .meta({ label: "Footings", unit: "" }),
  }),
  outputs: z.object({
    pairs: z.array(pair).meta({ label: "Neighbours", unit: "" }),
    worst: pair.nullable().meta({ label: "Worst pair", unit: "" }),
  }),
  compute: ({ points }) => distortionsOf(points),
  lines: (_, { worst }) => (worst === null ? [] : [line(distortion, worst)]),
  findings: ({ points }, { worst }) => {
    const found: MethodFinding[] = [];
    const limit = limits.find(({ from }) => worst !== null && worst.ratio > from);
    if (limit) found.push({ code: limit.code, severity: "warning", message: limit.message });
    const { sameAs } = delaunay(points.map(({ x_m, y_m }) => [x_m, y_m] as const));
    if (sameAs.size > 0)
      found.push({
        code: "one-place",
        severity: "note",
        message: `${sameAs.size} of the points lie on another one and were left out.`,
      });
    return found;
  },
});
