import { z } from "zod";
import { defineMethod, output, quantity } from "../define-method";

export const theories = ["terzaghi", "meyerhof", "hansen", "vesic", "en1997"] as const;
export type Theory = (typeof theories)[number];

const degree = Math.PI / 180;

/** Nγ for Terzaghi's mechanism by whole degrees from 0 to 50 (Kumbhojkar 1993; it has no closed form; from memory). */
const terzaghiNGamma = [
  0, 0.01, 0.04, 0.06, 0.1, 0.14, 0.2, 0.27, 0.35, 0.44, 0.56, 0.69, 0.85, 1.04, 1.26, 1.52, 1.82, 2.18, 2.59,
  3.07, 3.64, 4.31, 5.09, 6.0, 7.08, 8.34, 9.84, 11.6, 13.7, 16.18, 19.13, 22.65, 26.87, 31.94, 38.04, 45.41,
  54.36, 65.27, 78.61, 95.03, 115.31, 140.51, 171.99, 211.56, 261.6, 325.34, 407.11, 512.84, 650.67, 831.99,
  1072.8,
];

/** Bearing capacity factors of one author; never mixed with another's shape, depth or inclination. */
export function bearingFactorsOf(
  theory: Theory,
  frictionAngle_deg: number,
): { nc: number; nq: number; nGamma: number } {
  const phi = frictionAngle_deg * degree;
  const tangent = Math.tan(phi);
  if (theory === "terzaghi") {
    const nq =
      Math.exp(2 * (0.75 * Math.PI - phi / 2) * tangent) / (2 * Math.cos(Math.PI / 4 + phi / 2) ** 2);
    // Terzaghi's printed 5.7 is 3π/2 + 1, the limit of (Nq − 1) cot φ.
    return { nc: cohesionFactor(nq, phi, 1.5 * Math.PI + 1), nq, nGamma: terzaghiGamma(frictionAngle_deg) };
  }
  const nq = Math.exp(Math.PI * tangent) * Math.tan(Math.PI / 4 + phi / 2) ** 2;
  const nc = cohesionFactor(nq, phi, Math.PI + 2);
  const nGamma = {
    meyerhof: (nq - 1) * Math.tan(1.4 * phi),
    hansen: 1.5 * (nq - 1) * tangent,
    vesic: 2 * (nq + 1) * tangent,
    en1997: 2 * (nq - 1) * tangent,
  }[theory];
  return { nc, nq, nGamma };
}

/** (Nq − 1) cot φ; near φ = 0 both go to zero together, so its limit is used where the difference has no digits left. */
function cohesionFactor(nq: number, phi: number, limit: number): number {
  if (phi < 1e-7) return limit;
  return (nq - 1) / Math.tan(phi);
}

function terzaghiGamma(angle_deg: number): number {
  const below = Math.min(49, Math.floor(angle_deg));
  const from = terzaghiNGamma[below] as number;
  const to = terzaghiNGamma[below + 1] as number;
  const share = angle_deg - below;
  // The factor grows nearly exponentially: between whole degrees it is read on a logarithmic scale.
  return from === 0 ? to * share : from * (to / from) ** share;
}

export const bearingFactors = defineMethod({
  id: "bearing-factors",
  version: "1",
  title: "Bearing capacity factors",
  source: ["terzaghi1943", "kumbhojkar1993", "meyerhof1963", "hansen1970", "vesic1973", "en1997"],
  limits: [
    "General shear. One author's factors go with that author's shape, depth and inclination factors only.",
    "Terzaghi's Nγ is read from Kumbhojkar's table by whole degrees, logarithmically between them.",
  ],
  inputs: z.strictObject({
    theory: z
      .enum(theories, { error: `Theory must be one of ${theories.join(", ")}.` })
      .meta({ label: "Theory", unit: "" }),
    frictionAngle_deg: quantity({ label: "Angle of friction φ", unit: "°", min: 0, max: 50 }),
  }),
  outputs: z.object({ nc: output("Nc"), nq: output("Nq"), nGamma: output("Nγ") }),
  compute: (q) => bearingFactorsOf(q.theory, q.frictionAngle_deg),
});
