/**
 * The pressure plane under a rigid base that carries no tension, exactly: closed forms where one corner or one side is
 * in contact, Newton's method where only the far corner lifts. Everything happens in the unit square, measured from the
 * corner that is pressed most, so that an answer depends neither on scale nor on the order of edges, and figures stay
 * accurate while the contact shrinks towards that corner.
 */

/** Rounding in e/B that must not turn "on the edge of the middle third" into "outside". */
export const KERN_TOLERANCE = 1e-12;

/** Newton's answer is taken when the block integrated again gives load and moments back this well. */
const NEWTON_RESIDUAL = 1e-12;

export type ContactZone = "full" | "one side" | "one corner" | "far corner lifts";

/** Pressure over the mean pressure, `peak − slopeB x − slopeL y` and never below zero; x, y in [0, 1] from the corner. */
export type PressurePlane = {
  peak: number;
  slopeB: number;
  slopeL: number;
  contactRatio: number;
  zone: ContactZone;
  /** Largest relative error in the load and its two lever arms, by integrating the block again. */
  residual: number;
};

/** Solves for relative eccentricities ξ = |eB|/B and η = |eL|/L, each in [0, ½). */
export function pressurePlane(xi: number, eta: number): PressurePlane {
  const kern = 6 * xi + 6 * eta;
  if (kern <= 1 + KERN_TOLERANCE)
    return { peak: 1 + kern, slopeB: 12 * xi, slopeL: 12 * eta, contactRatio: 1, zone: "full", residual: 0 };
  const plane = partialPlane(xi, eta);
  plane.residual = residualOf(plane, xi, eta);
  if (plane.zone !== "far corner lifts" || plane.residual <= NEWTON_RESIDUAL) return plane;
  return planeByBisection(xi, eta);
}

function partialPlane(xi: number, eta: number): PressurePlane {
  if (xi >= 0.25 && eta >= 0.25) return cornerContact(xi, eta);
  if (eta <= 0.25) {
    const along = sideContact(xi, eta);
    if (along !== null) return along;
  }
  if (xi <= 0.25) {
    const along = sideContact(eta, xi);
    if (along !== null) {
      const { slopeB, slopeL } = along;
      along.slopeB = slopeL;
      along.slopeL = slopeB;
      return along;
    }
  }
  return farCornerLifts(xi, eta);
}

/** One corner in contact: a triangle with legs 4(½ − ξ) and 4(½ − η). */
function cornerContact(xi: number, eta: number): PressurePlane {
  const legB = 4 * (0.5 - xi);
  const legL = 4 * (0.5 - eta);
  const peak = 6 / (legB * legL);
  return {
    peak,
    slopeB: peak / legB,
    slopeL: peak / legL,
    contactRatio: (legB * legL) / 2,
    zone: "one corner",
    residual: 0,
  };
}

/** One whole side in contact: a trapezoid of mean depth l0 that grows along the side by t l0; null where it is none. */
function sideContact(xi: number, eta: number): PressurePlane | null {
  const t = (12 * eta) / (1 + Math.sqrt(Math.max(0, 1 - 12 * eta * eta)));
  const depth = (3 * (0.5 - xi) * (1 + (t * t) / 12)) / (1 + (t * t) / 4);
  const deepest = depth * (1 + t / 2);
  if (deepest > 1) return null;
  const peak = (2 * (1 + t / 2)) / (depth * (1 + (t * t) / 12));
  return {
    peak,
    slopeB: peak / deepest,
    slopeL: (peak * t) / (1 + t / 2),
    contactRatio: depth,
    zone: "one side",
    residual: 0,
  };
}

/** All but the far corner in contact. The three equilibrium equations are the gradient of a convex function. */
function farCornerLifts(xi: number, eta: number): PressurePlane {
  const armB = 0.5 - xi;
  const armL = 0.5 - eta;
  let p = 1 + 6 * xi + 6 * eta;
  let b = 12 * xi;
  let c = 12 * eta;
  for (let step = 0; step < 40; step += 1) {
    const w = b + c - p;
    const m = w / b;
    const n = w / c;
    const lifted = (w * m * n) / 6;
    const r0 = p - b / 2 - c / 2 + lifted - 1;
    const r1 = p / 2 - b / 3 - c / 4 + lifted * (1 - m / 4) - armB;
    const r2 = p / 2 - b / 4 - c / 3 + lifted * (1 - n / 4) - armL;
    // Area moments of the contact, from the loaded corner: the square less the lifted triangle.
    const t = (m * n) / 2;
    const h00 = 1 - t;
    const h01 = 0.5 - t * (1 - m / 3);
    const h02 = 0.5 - t * (1 - n / 3);
    const h11 = 1 / 3 - t * (1 - (2 * m) / 3 + (m * m) / 6);
    const h22 = 1 / 3 - t * (1 - (2 * n) / 3 + (n * n) / 6);
    const h12 = 0.25 - t * (1 - (m + n) / 3 + (m * n) / 12);
    const c00 = h11 * h22 - h12 * h12;
    const c01 = h02 * h12 - h01 * h22;
    const c02 = h01 * h12 - h02 * h11;
    const c11 = h00 * h22 - h02 * h02;
    const c12 = h01 * h02 - h00 * h12;
    const c22 = h00 * h11 - h01 * h01;
    const determinant = h00 * c00 + h01 * c01 + h02 * c02;
    const dp = (c00 * r0 + c01 * r1 + c02 * r2) / determinant;
    const db = -(c01 * r0 + c11 * r1 + c12 * r2) / determinant;
    const dc = -(c02 * r0 + c12 * r1 + c22 * r2) / determinant;
    // A full step may leave the region of this shape; half steps come back into it.
    let share = 1;
    while (share > 1e-6 && !(b - share * db > 0 && c - share * dc > 0 && w - share * (db + dc - dp) > 0))
      share /= 2;
    p -= share * dp;
    b -= share * db;
    c -= share * dc;
    if (Math.abs(dp) + Math.abs(db) + Math.abs(dc) <= 4e-15 * p) break;
  }
  const w = b + c - p;
  return {
    peak: p,
    slopeB: b,
    slopeL: c,
    contactRatio: 1 - (w * w) / (2 * b * c),
    zone: "far corner lifts",
    residual: 0,
  };
}

/** Volume and first moments of the block about the loaded corner; filled by `integrate`, read at once. */
const sums = new Float64Array(3);

/**
 * Integrates the clipped block as a fan of triangles from the loaded corner. Every term is positive, so nothing cancels,
 * and it knows nothing of how the plane was found. Returns the contact area.
 */
function integrate(p: number, b: number, c: number): number {
  sums.fill(0);
  let area = 0;
  let x = p > b ? 1 : p / b;
  let y = 0;
  let s = p > b ? p - b : 0;
  if (p > b) {
    const full = p - b > c;
    const nextY = full ? 1 : (p - b) / c;
    const next = full ? p - b - c : 0;
    area += addTriangle(p, x, y, s, 1, nextY, next);
    y = nextY;
    s = next;
  }
  if (p > c) {
    const nextX = Math.min(1, (p - c) / b);
    const next = nextX === 1 ? Math.max(0, p - b - c) : 0;
    area += addTriangle(p, x, y, s, nextX, 1, next);
    area += addTriangle(p, nextX, 1, next, 0, 1, p - c);
    return area;
  }
  x = p > b ? 1 : x;
  area += addTriangle(p, x, y, s, 0, p / c, 0);
  return area;
}

function addTriangle(
  p: number,
  x1: number,
  y1: number,
  s1: number,
  x2: number,
  y2: number,
  s2: number,
): number {
  const area = (x1 * y2 - x2 * y1) / 2;
  const total = p + s1 + s2;
  sums[0] = (sums[0] as number) + (area * total) / 3;
  sums[1] = (sums[1] as number) + (area * ((x1 + x2) * total + x1 * s1 + x2 * s2)) / 12;
  sums[2] = (sums[2] as number) + (area * ((y1 + y2) * total + y1 * s1 + y2 * s2)) / 12;
  return area;
}

/** Largest relative error in the load, and in its lever arms from the two edges that are pressed most. */
export function residualOf(plane: PressurePlane, xi: number, eta: number): number {
  integrate(plane.peak, plane.slopeB, plane.slopeL);
  const volume = Math.abs((sums[0] as number) - 1);
  const alongB = Math.abs((sums[1] as number) / (0.5 - xi) - 1);
  const alongL = Math.abs((sums[2] as number) / (0.5 - eta) - 1);
  return Math.max(volume, alongB, alongL);
}

/**
 * The same plane by bisection on the direction of the neutral axis and, for each, on its distance: slow and certain, for
 * any resultant outside the middle third. Stands behind Newton's method and beside the closed forms in tests.
 */
export function planeByBisection(xi: number, eta: number): PressurePlane {
  const armB = 0.5 - xi;
  const armL = 0.5 - eta;
  let low = 0;
  let high = Math.PI / 2;
  for (let step = 0; step < 200 && high - low > 1e-16; step += 1) {
    const angle = (low + high) / 2;
    if (angle === low || angle === high) break;
    const across = Math.cos(angle);
    const along = Math.sin(angle);
    offsetFor(across, along, armB, armL);
    const volume = sums[0] as number;
    const turn =
      ((sums[1] as number) / volume - armB) * along - ((sums[2] as number) / volume - armL) * across;
    if (turn < 0) low = angle;
    else high = angle;
  }
  const across = Math.cos((low + high) / 2);
  const along = Math.sin((low + high) / 2);
  const offset = offsetFor(across, along, armB, armL);
  const contactRatio = integrate(offset, across, along);
  const volume = sums[0] as number;
  const plane: PressurePlane = {
    peak: offset / volume,
    slopeB: across / volume,
    slopeL: along / volume,
    contactRatio,
    zone: zoneOf(offset, across, along),
    residual: 0,
  };
  plane.residual = residualOf(plane, xi, eta);
  return plane;
}

/** The offset at which the block's centroid lies as far along the normal as the resultant does; leaves the sums filled. */
function offsetFor(across: number, along: number, armB: number, armL: number): number {
  const target = armB * across + armL * along;
  let low = 0;
  let high = 1;
  while (centroidAlong(high, across, along) < target && high < 1e12) high *= 2;
  for (let step = 0; step < 200; step += 1) {
    const middle = (low + high) / 2;
    if (middle === low || middle === high) break;
    if (centroidAlong(middle, across, along) < target) low = middle;
    else high = middle;
  }
  centroidAlong(high, across, along);
  return high;
}

function centroidAlong(offset: number, across: number, along: number): number {
  integrate(offset, across, along);
  return ((sums[1] as number) * across + (sums[2] as number) * along) / (sums[0] as number);
}

function zoneOf(p: number, b: number, c: number): ContactZone {
  if (p >= b + c) return "full";
  if (p >= b && p >= c) return "far corner lifts";
  return p >= b || p >= c ? "one side" : "one corner";
}

export type ContactCorner = readonly [x: number, y: number];

/**
 * Corners of the contact area from the loaded corner, going first along B, and the ends of the line where the pressure
 * ends (null in full contact). A corner of the base that the line passes through is named once, whatever the last digits
 * of the slopes say.
 */
export function contactCorners({ peak: p, slopeB: b, slopeL: c, zone }: PressurePlane): {
  corners: ContactCorner[];
  ends: readonly [ContactCorner, ContactCorner] | null;
} {
  const loaded: ContactCorner = [0, 0];
  if (zone === "full") return { corners: [loaded, [1, 0], [1, 1], [0, 1]], ends: null };
  const rounding = 1e-12 * p;
  const pastB = p - b > rounding;
  const pastL = p - c > rounding;
  const from: ContactCorner = pastB ? [1, Math.min(1, (p - b) / c)] : [Math.min(1, p / b), 0];
  const to: ContactCorner = pastL ? [Math.min(1, (p - c) / b), 1] : [0, Math.min(1, p / c)];
  const corners: ContactCorner[] = [loaded];
  if (pastB) corners.push([1, 0]);
  corners.push(from, to);
  if (pastL) corners.push([0, 1]);
  return { corners, ends: [from, to] };
}
