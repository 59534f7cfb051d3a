/**
 * The pressure plane under a rigid base that carries no tension, exactly: closed forms where one side or one corner is
 * in contact, Newton's method on the clipped block where only the far corner lifts. Everything happens in the unit
 * square, for a resultant in its positive quadrant, so the result cannot depend on the order of edges or on scale.
 */

/** Rounding in e/B and N that must not turn "on the edge of the middle third" into "outside". */
export const KERN_TOLERANCE = 1e-12;

/** Pressure over the mean pressure: `s(u, v) = a + b u + c v` on [−½, ½]², clipped at zero. */
export type PressurePlane = {
  a: number;
  b: number;
  c: number;
  peak: number;
  /** Smallest corner value, zero where contact is partial. */
  least: number;
  contactRatio: number;
  zone: "full" | "one side" | "one corner" | "far corner lifts";
  /** Largest relative error in the load and the two moments, by integrating the block again. */
  residual: number;
};

/** Solves for relative eccentricities ξ = |eB|/B and η = |eL|/L, each in [0, ½). */
export function pressurePlane(xi: number, eta: number): PressurePlane {
  const kern = 6 * xi + 6 * eta;
  if (kern <= 1 + KERN_TOLERANCE)
    return {
      a: 1,
      b: 12 * xi,
      c: 12 * eta,
      peak: 1 + kern,
      least: Math.max(0, 1 - kern),
      contactRatio: 1,
      zone: "full",
      residual: 0,
    };
  if (xi >= 0.25 && eta >= 0.25) return cornerContact(xi, eta);
  if (eta <= 0.25) {
    const along = sideContact(xi, eta);
    if (along) return along;
  }
  if (xi <= 0.25) {
    const along = sideContact(eta, xi);
    if (along) return { ...along, b: along.c, c: along.b };
  }
  return farCornerLifts(xi, eta);
}

/** One corner in contact: a triangle with legs 4(½ − ξ) and 4(½ − η). */
function cornerContact(xi: number, eta: number): PressurePlane {
  const p = 4 * (0.5 - xi);
  const q = 4 * (0.5 - eta);
  const peak = 6 / (p * q);
  const b = peak / p;
  const c = peak / q;
  return {
    a: peak - b / 2 - c / 2,
    b,
    c,
    peak,
    least: 0,
    contactRatio: (p * q) / 2,
    zone: "one corner",
    residual: 0,
  };
}

/** One whole side in contact: a trapezoid of mean depth l0 whose depth grows along the side by the slope t. */
function sideContact(xi: number, eta: number): PressurePlane | null {
  const t = (12 * eta) / (1 + Math.sqrt(Math.max(0, 1 - 12 * eta * eta)));
  const depth = (3 * (0.5 - xi) * (1 + (t * t) / 12)) / (1 + (t * t) / 4);
  if (depth * (1 + t / 2) > 1) return null;
  const b = 2 / (depth * depth * (1 + (t * t) / 12));
  const peak = b * depth * (1 + t / 2);
  return {
    a: b * (depth - 0.5),
    b,
    c: b * depth * t,
    peak,
    least: 0,
    contactRatio: depth,
    zone: "one side",
    residual: 0,
  };
}

/** All but the far corner in contact: a pentagon. Three equilibrium equations, convex, so Newton finds the one root. */
function farCornerLifts(xi: number, eta: number): PressurePlane {
  let a = 1;
  let b = 12 * xi;
  let c = 12 * eta;
  let size = Number.POSITIVE_INFINITY;
  for (let step = 0; step < 40; step += 1) {
    const w = b / 2 + c / 2 - a;
    const m = w / b;
    const n = w / c;
    const lifted = (w * m * n) / 6;
    const r0 = a + lifted - 1;
    const r1 = b / 12 - lifted / 2 + (w * m * m * n) / 24 - xi;
    const r2 = c / 12 - lifted / 2 + (w * m * n * n) / 24 - eta;
    size = Math.max(Math.abs(r0), Math.abs(r1) / xi, Math.abs(r2) / eta);
    if (size <= 4e-16) break;
    // Second moments of the contact area: the unit square less the lifted triangle.
    const area = (m * n) / 2;
    const mu = (m * m * n) / 6;
    const nu = (m * n * n) / 6;
    const h00 = 1 - area;
    const h01 = area / 2 - mu;
    const h02 = area / 2 - nu;
    const h11 = 1 / 12 - (area / 4 - mu + (m * m * m * n) / 12);
    const h22 = 1 / 12 - (area / 4 - nu + (m * n * n * n) / 12);
    const h12 = -(area / 4 - mu / 2 - nu / 2 + (m * m * n * n) / 24);
    const c00 = h11 * h22 - h12 * h12;
    const c01 = h02 * h12 - h01 * h22;
    const c02 = h01 * h12 - h02 * h11;
    const c11 = h00 * h22 - h02 * h02;
    const c12 = h01 * h02 - h00 * h12;
    const c22 = h00 * h11 - h01 * h01;
    const determinant = h00 * c00 + h01 * c01 + h02 * c02;
    const da = (c00 * r0 + c01 * r1 + c02 * r2) / determinant;
    const db = (c01 * r0 + c11 * r1 + c12 * r2) / determinant;
    const dc = (c02 * r0 + c12 * r1 + c22 * r2) / determinant;
    // A full step may leave the region of this shape; half steps come back into it.
    let scale = 1;
    while (
      scale > 1e-6 &&
      !(
        b - scale * db > 0 &&
        c - scale * dc > 0 &&
        (b - scale * db) / 2 + (c - scale * dc) / 2 - (a - scale * da) > 0
      )
    )
      scale /= 2;
    const moved = Math.abs(scale * da) / Math.abs(a) + Math.abs(scale * db) / b + Math.abs(scale * dc) / c;
    a -= scale * da;
    b -= scale * db;
    c -= scale * dc;
    if (moved < 1e-15) break;
  }
  const w = b / 2 + c / 2 - a;
  const m = w / b;
  const n = w / c;
  const lifted = (w * m * n) / 6;
  const residual = Math.max(
    Math.abs(a + lifted - 1),
    Math.abs(b / 12 - lifted / 2 + (w * m * m * n) / 24 - xi) / xi,
    Math.abs(c / 12 - lifted / 2 + (w * m * n * n) / 24 - eta) / eta,
  );
  return {
    a,
    b,
    c,
    peak: a + b / 2 + c / 2,
    least: 0,
    contactRatio: 1 - (m * n) / 2,
    zone: "far corner lifts",
    residual,
  };
}
