import { circleSideOf, sideOf, type Whole } from "./exact-side";
import { boundingBox, type GridPoint } from "./point";

/** Points that lie nearer than this to each other count as one, in metres. */
const RESOLUTION_M = 1e-4;

/** A Delaunay triangulation; numbers are places in the given list of points. */
export type Triangulation = {
  /** Corners of each triangle, anticlockwise. */
  triangles: [number, number, number][];
  /** Pairs of neighbours, the lower number first, in order. Along the line where all points lie on one. */
  neighbours: [number, number][];
  /** Points left out because they lie on an earlier one: the number of that one. */
  sameAs: Map<number, number>;
};

/**
 * Joins points to triangles whose circles hold no other point (Delaunay), by inserting one after another and joining
 * anew the hole that each makes (Bowyer 1981, Watson 1981), with a point at infinity beyond the outer edges. Signs are
 * exact, so rows and grids of footings need no luck. Of four points on one circle either diagonal may be drawn.
 */
export function delaunay(points: readonly GridPoint[]): Triangulation {
  const { places, distinct, sameAs } = prepare(points);
  const start = firstTriangle(places, distinct);
  if (!start) return { triangles: [], neighbours: alongLine(places, distinct), sameAs };
  const mesh = new Mesh(places, start);
  for (const point of distinct) if (!start.includes(point)) mesh.insert(point);
  const triangles = mesh.triangles();
  const pairs = new Map<number, [number, number]>();
  for (const [a, b, c] of triangles)
    for (const [from, to] of [
      [a, b],
      [b, c],
      [c, a],
    ] as const) {
      const pair: [number, number] = from < to ? [from, to] : [to, from];
      pairs.set(pair[0] * points.length + pair[1], pair);
    }
  const neighbours = [...pairs.values()].sort((p, q) => p[0] - q[0] || p[1] - q[1]);
  return { triangles, neighbours, sameAs };
}

/** Whole coordinates, each distinct place once, in an order that keeps the way from one to the next short. */
function prepare(points: readonly GridPoint[]): {
  places: Whole[];
  distinct: number[];
  sameAs: Map<number, number>;
} {
  const box = boundingBox(points) ?? { minEasting_m: 0, minNorthing_m: 0, maxEasting_m: 0, maxNorthing_m: 0 };
  const places = points.map(([easting_m, northing_m]): Whole => {
    if (!Number.isFinite(easting_m) || !Number.isFinite(northing_m))
      throw new RangeError("A point to be triangulated lacks an easting or a northing.");
    return [
      Math.round((easting_m - box.minEasting_m) / RESOLUTION_M),
      Math.round((northing_m - box.minNorthing_m) / RESOLUTION_M),
    ];
  });
  const first = new Map<string, number>();
  const sameAs = new Map<number, number>();
  places.forEach((place, index) => {
    const key = place.join();
    const earlier = first.get(key);
    if (earlier === undefined) first.set(key, index);
    else sameAs.set(index, earlier);
  });
  // Strips of the plan, walked to and fro.
  const strips = Math.max(1, Math.round(Math.sqrt(first.size / 2)));
  const height = (box.maxNorthing_m - box.minNorthing_m) / RESOLUTION_M / strips || 1;
  const stripOf = (index: number): number => Math.floor((places[index] as Whole)[1] / height);
  const distinct = [...first.values()].sort((p, q) => {
    const strip = stripOf(p);
    const other = stripOf(q);
    if (strip !== other) return strip - other;
    const along =
      (places[p] as Whole)[0] - (places[q] as Whole)[0] || (places[p] as Whole)[1] - (places[q] as Whole)[1];
    return strip % 2 === 0 ? along : -along;
  });
  return { places, distinct, sameAs };
}

/** Three points that do not lie on one line, anticlockwise; null when all do. */
function firstTriangle(
  places: readonly Whole[],
  distinct: readonly number[],
): [number, number, number] | null {
  const [a, b] = distinct;
  if (a === undefined || b === undefined) return null;
  for (const c of distinct) {
    const side = sideOf(places[a] as Whole, places[b] as Whole, places[c] as Whole);
    if (side !== 0) return side > 0 ? [a, b, c] : [b, a, c];
  }
  return null;
}

function alongLine(places: readonly Whole[], distinct: readonly number[]): [number, number][] {
  const inOrder = [...distinct].sort((p, q) => {
    const [a, b] = [places[p] as Whole, places[q] as Whole];
    return a[0] - b[0] || a[1] - b[1];
  });
  return inOrder
    .slice(1)
    .map((to, index): [number, number] => {
      const from = inOrder[index] as number;
      return from < to ? [from, to] : [to, from];
    })
    .sort((p, q) => p[0] - q[0] || p[1] - q[1]);
}

/** Triangles by their directed edges: to each edge the corner on its left. The corner at infinity closes the outside. */
class Mesh {
  readonly #apex = new Map<number, number>();
  readonly #places: readonly Whole[];
  readonly #infinity: number;
  #latest: [number, number];

  constructor(places: readonly Whole[], [a, b, c]: [number, number, number]) {
    this.#places = places;
    this.#infinity = places.length;
    this.#latest = [a, b];
    this.#add(a, b, c);
    this.#add(b, a, this.#infinity);
    this.#add(c, b, this.#infinity);
    this.#add(a, c, this.#infinity);
  }

  insert(point: number): void {
    const [a, b] = this.#find(point);
    const c = this.#left(a, b);
    this.#remove(a, b, c);
    const edges: [number, number][] = [
      [a, b],
      [b, c],
      [c, a],
    ];
    const rim: [number, number][] = [];
    for (let edge = edges.pop(); edge; edge = edges.pop()) {
      const [from, to] = edge;
      const beyond = this.#apex.get(this.#key(to, from));
      if (beyond !== undefined && this.#holds(to, from, beyond, point)) {
        this.#remove(to, from, beyond);
        edges.push([from, beyond], [beyond, to]);
      } else rim.push(edge);
    }
    for (const [from, to] of rim) {
      this.#add(from, to, point);
      if (from !== this.#infinity && to !== this.#infinity) this.#latest = [from, to];
    }
  }

  triangles(): [number, number, number][] {
    const found: [number, number, number][] = [];
    for (const [key, c] of this.#apex) {
      const a = Math.floor(key / (this.#infinity + 1));
      const b = key % (this.#infinity + 1);
      // Each triangle stands under three edges: told at the one that begins with its lowest number.
      if (a < b && a < c && b !== this.#infinity && c !== this.#infinity) found.push([a, b, c]);
    }
    return found.sort((p, q) => p[0] - q[0] || p[1] - q[1] || p[2] - q[2]);
  }

  /** An edge of a triangle whose circle holds the point, found by walking towards it from the triangle made last. */
  #find(point: number): [number, number] {
    let edge = this.#latest;
    for (;;) {
      const [a, b] = edge;
      const c = this.#left(a, b);
      if (c === this.#infinity) return edge;
      if (this.#side(b, c, point) < 0) edge = [c, b];
      else if (this.#side(c, a, point) < 0) edge = [a, c];
      else if (this.#side(a, b, point) < 0) edge = [b, a];
      else return edge;
    }
  }

  /** Whether a point lies inside a triangle's circle; for one with the corner at infinity, beyond its outer edge or on it. */
  #holds(a: number, b: number, c: number, point: number): boolean {
    if (a === this.#infinity || b === this.#infinity || c === this.#infinity) {
      const [from, to] = a === this.#infinity ? [b, c] : b === this.#infinity ? [c, a] : [a, b];
      const side = this.#side(from, to, point);
      return side > 0 || (side === 0 && this.#between(from, to, point));
    }
    const [pa, pb, pc, p] = [a, b, c, point].map((index) => this.#places[index]) as [
      Whole,
      Whole,
      Whole,
      Whole,
    ];
    return circleSideOf(pa, pb, pc, p) > 0;
  }

  #between(a: number, b: number, point: number): boolean {
    const [pa, pb, p] = [a, b, point].map((index) => this.#places[index]) as [Whole, Whole, Whole];
    return (p[0] - pa[0]) * (p[0] - pb[0]) + (p[1] - pa[1]) * (p[1] - pb[1]) < 0;
  }

  #side(a: number, b: number, c: number): -1 | 0 | 1 {
    const [pa, pb, pc] = [a, b, c].map((index) => this.#places[index]) as [Whole, Whole, Whole];
    return sideOf(pa, pb, pc);
  }

  #key(from: number, to: number): number {
    return from * (this.#infinity + 1) + to;
  }

  #left(from: number, to: number): number {
    const apex = this.#apex.get(this.#key(from, to));
    if (apex === undefined) throw new Error("The triangulation lost an edge.");
    return apex;
  }

  #add(a: number, b: number, c: number): void {
    this.#apex.set(this.#key(a, b), c);
    this.#apex.set(this.#key(b, c), a);
    this.#apex.set(this.#key(c, a), b);
  }

  #remove(a: number, b: number, c: number): void {
    this.#apex.delete(this.#key(a, b));
    this.#apex.delete(this.#key(b, c));
    this.#apex.delete(this.#key(c, a));
  }
}
