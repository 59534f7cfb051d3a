import type { Theory } from "../bearing-factors/index";

const degree = Math.PI / 180;

export type Situation = {
  theory: Theory;
  undrained: boolean;
  breadth_m: number;
  length_m: number;
  depth_m: number;
  cohesion_kPa: number;
  frictionAngle_deg: number;
  vertical_kN: number;
  horizontal_kN: number;
  /** Angle of the horizontal load from the length axis. */
  horizontalFromLength_deg: number;
  nc: number;
  nq: number;
};
export type Triple = { c: number; q: number; gamma: number };
const none: Triple = { c: 1, q: 1, gamma: 1 };

/** Shape factors of one author, on the effective sides. */
export function shapeFactors(s: Situation): Triple {
  const ratio = s.breadth_m / s.length_m;
  const phi = s.frictionAngle_deg * degree;
  const kp = Math.tan(Math.PI / 4 + phi / 2) ** 2;
  switch (s.theory) {
    case "terzaghi":
      // Printed for the strip and the square; between them by the ratio of the sides, as is common practice.
      return { c: 1 + 0.3 * ratio, q: 1, gamma: 1 - 0.2 * ratio };
    case "meyerhof": {
      // With an inclined load the author's shape factors are left at one.
      if (s.horizontal_kN > 0) return none;
      const other = s.frictionAngle_deg > 10 ? 1 + 0.1 * kp * ratio : 1;
      return { c: 1 + 0.2 * kp * ratio, q: other, gamma: other };
    }
    case "hansen":
      return {
        c: s.undrained ? 1 + 0.2 * ratio : 1 + ratio * (s.nq / s.nc),
        q: 1 + ratio * Math.sin(phi),
        gamma: Math.max(0.6, 1 - 0.4 * ratio),
      };
    case "vesic":
      return {
        c: s.undrained ? 1 + 0.2 * ratio : 1 + ratio * (s.nq / s.nc),
        q: 1 + ratio * Math.tan(phi),
        gamma: Math.max(0.6, 1 - 0.4 * ratio),
      };
    case "en1997": {
      if (s.undrained) return { c: 1 + 0.2 * ratio, q: 1, gamma: 1 };
      const q = 1 + ratio * Math.sin(phi);
      return { c: s.nq > 1 ? (q * s.nq - 1) / (s.nq - 1) : 1 + 0.2 * ratio, q, gamma: 1 - 0.3 * ratio };
    }
  }
}

/** Depth factors of one author; one where the author has none. */
export function depthFactors(s: Situation): Triple {
  const phi = s.frictionAngle_deg * degree;
  const relative = s.depth_m / s.breadth_m;
  if (s.theory === "meyerhof") {
    const root = Math.tan(Math.PI / 4 + phi / 2);
    const other = s.frictionAngle_deg > 10 ? 1 + 0.1 * root * relative : 1;
    return { c: 1 + 0.2 * root * relative, q: other, gamma: other };
  }
  if (s.theory === "hansen" || s.theory === "vesic") {
    const k = relative <= 1 ? relative : Math.atan(relative);
    if (s.undrained) return { c: 1 + 0.4 * k, q: 1, gamma: 1 };
    const q = 1 + 2 * Math.tan(phi) * (1 - Math.sin(phi)) ** 2 * k;
    return { c: s.nc > 0 && phi > 1e-7 ? q - (1 - q) / (s.nc * Math.tan(phi)) : 1 + 0.4 * k, q, gamma: 1 };
  }
  return none;
}

/** Inclination factors of one author. Zero or less means that the base slides before it bears. */
export function inclinationFactors(s: Situation): Triple {
  const H = s.horizontal_kN;
  if (H === 0 || s.theory === "terzaghi") return none;
  const V = s.vertical_kN;
  const area_m2 = s.breadth_m * s.length_m;
  const phi = s.frictionAngle_deg * degree;
  const angle = (s.horizontalFromLength_deg * degree) as number;
  const mB = (2 + s.breadth_m / s.length_m) / (1 + s.breadth_m / s.length_m);
  const mL = (2 + s.length_m / s.breadth_m) / (1 + s.length_m / s.breadth_m);
  const m = mL * Math.cos(angle) ** 2 + mB * Math.sin(angle) ** 2;
  if (s.theory === "meyerhof") {
    const tilt_deg = Math.atan2(H, V) / degree;
    const q = Math.max(0, 1 - tilt_deg / 90) ** 2;
    const gamma = s.frictionAngle_deg > 0 ? Math.max(0, 1 - tilt_deg / s.frictionAngle_deg) ** 2 : 0;
    return { c: q, q, gamma };
  }
  if (s.undrained) {
    const share = H / (area_m2 * s.cohesion_kPa);
    if (!(share <= 1)) return { c: 0, q: 1, gamma: 1 };
    if (s.theory === "vesic") return { c: Math.max(0, 1 - (m * share) / (Math.PI + 2)), q: 1, gamma: 1 };
    return { c: 0.5 * (1 + Math.sqrt(1 - share)), q: 1, gamma: 1 };
  }
  const holding_kN = V + (phi > 1e-7 ? (area_m2 * s.cohesion_kPa) / Math.tan(phi) : Number.POSITIVE_INFINITY);
  const share = H / holding_kN;
  const fall = (base: number, power: number) => Math.max(0, base) ** power;
  const q = s.theory === "hansen" ? fall(1 - 0.5 * share, 5) : fall(1 - share, m);
  const gamma = s.theory === "hansen" ? fall(1 - 0.7 * share, 5) : fall(1 - share, m + 1);
  const c =
    s.theory === "hansen"
      ? Math.max(0, q - (1 - q) / Math.max(1e-12, s.nq - 1))
      : Math.max(0, q - (1 - q) / (s.nc * Math.tan(phi)));
  return { c, q, gamma };
}
