import { z } from "zod";
import { defineMethod, type MethodFinding, output, quantity } from "../define-method";
import { formula, line } from "../formula";

/** Relief by embedment, never less than a half. */
export const embedmentFactor = formula({
  symbol: "C1",
  unit: "",
  ref: "schmertmann1978",
  shown: "max(0.5, 1 − 0.5 σ0′ / Δp)",
  symbols: { "σ0′": "overburden_kPa", Δp: "netPressure_kPa" },
  of: (q: { overburden_kPa: number; netPressure_kPa: number }) =>
    Math.max(0.5, 1 - (0.5 * q.overburden_kPa) / q.netPressure_kPa),
});

/** Creep from a tenth of a year on. */
export const creepFactor = formula({
  symbol: "C2",
  unit: "",
  ref: "schmertmann1978",
  shown: "1 + 0.2 log10(max(t, 0.1) / 0.1)",
  symbols: { t: "years" },
  of: (q: { years: number }) => 1 + 0.2 * Math.log10(Math.max(q.years, 0.1) / 0.1),
});

/** Largest strain influence; the stress is that at the depth of the peak, not at the base. */
export const peakInfluence = formula({
  symbol: "I_zp",
  unit: "",
  ref: "schmertmann1978",
  shown: "0.5 + 0.1 √(Δp / σ_vp′)",
  symbols: { Δp: "netPressure_kPa", "σ_vp′": "overburdenAtPeak_kPa" },
  of: (q: { netPressure_kPa: number; overburdenAtPeak_kPa: number }) =>
    0.5 + 0.1 * Math.sqrt(q.netPressure_kPa / q.overburdenAtPeak_kPa),
});

export const schmertmannSettlement = formula({
  symbol: "s",
  unit: "mm",
  ref: "schmertmann1978",
  shown: "1000 C1 C2 Δp Σ(I_z Δz / E)",
  symbols: { C1: "c1", C2: "c2", Δp: "netPressure_kPa", "Σ(I_z Δz / E)": "sum_mPerkPa" },
  of: (q: { c1: number; c2: number; netPressure_kPa: number; sum_mPerkPa: number }) =>
    1000 * q.c1 * q.c2 * q.netPressure_kPa * q.sum_mPerkPa,
});

/** The strain diagram of a base: square and strip as printed, linear in L/B between 1 and 10. */
export function strainDiagram(q: { breadth_m: number; length_m: number; peak: number }) {
  const side_m = Math.min(q.breadth_m, q.length_m);
  const ratio = Math.max(q.breadth_m, q.length_m) / side_m;
  const towardsStrip = Math.min(1, (ratio - 1) / 9);
  return {
    atBase: 0.1 + 0.1 * towardsStrip,
    peakDepth_m: side_m * (0.5 + 0.5 * towardsStrip),
    endDepth_m: side_m * (2 + 2 * towardsStrip),
    peak: q.peak,
  };
}

type Diagram = ReturnType<typeof strainDiagram>;

/** Area of the diagram from the base to a depth (m). */
function areaTo(depth_m: number, { atBase, peakDepth_m, endDepth_m, peak }: Diagram): number {
  const rising_m = Math.min(depth_m, peakDepth_m);
  const atRising = atBase + ((peak - atBase) * rising_m) / peakDepth_m;
  const first = ((atBase + atRising) / 2) * rising_m;
  if (depth_m <= peakDepth_m) return first;
  const falling_m = Math.min(depth_m, endDepth_m) - peakDepth_m;
  const length_m = endDepth_m - peakDepth_m;
  return first + peak * falling_m * (1 - falling_m / (2 * length_m));
}

const layer = z.strictObject({
  thickness_m: quantity({ label: "Thickness", unit: "m", above: 0 }),
  modulus_kPa: quantity({ label: "Modulus E", unit: "kPa", above: 0 }),
});

export const settlementSchmertmann = defineMethod({
  id: "settlement-schmertmann",
  version: "1",
  title: "Settlement on sand by strain influence (1978)",
  source: ["schmertmann1978"],
  limits: [
    "The modulus goes with the diagram: of the 1978 pair 2.5 qc for a square base, 3.5 qc for a strip.",
    "Each layer takes the exact area of the diagram over its thickness; ground below the given layers counts as rigid.",
  ],
  inputs: z.strictObject({
    breadth_m: quantity({ label: "Breadth B", unit: "m", above: 0 }),
    length_m: quantity({ label: "Length L", unit: "m", above: 0 }),
    netPressure_kPa: quantity({ label: "Net pressure at the base", unit: "kPa", above: 0 }),
    overburden_kPa: quantity({ label: "Effective overburden at founding level", unit: "kPa", min: 0 }),
    overburdenAtPeak_kPa: quantity({
      label: "Effective overburden at the depth of the peak",
      unit: "kPa",
      above: 0,
    }),
    layers: z
      .array(layer, { error: "Layers is a list of thickness and modulus." })
      .min(1, "At least one layer is needed.")
      .max(200, "At most 200 layers.")
      .meta({ label: "Layers below the base, from the top", unit: "" }),
    years: quantity({ label: "Time", unit: "years", min: 0, max: 1000 }),
  }),
  outputs: z.object({
    settlement_mm: output("Settlement", "mm"),
    c1: output("Embedment factor C1"),
    c2: output("Creep factor C2"),
    peakInfluence: output("Peak strain influence"),
    peakDepth_m: output("Depth of the peak below the base", "m"),
    influenceDepth_m: output("Depth of influence below the base", "m"),
    layers: z
      .array(
        z.object({ area_m: output("Area of the diagram", "m"), settlement_mm: output("Settlement", "mm") }),
      )
      .meta({ label: "By layer", unit: "" }),
  }),
  compute: (q) => {
    const c1 = embedmentFactor.of(q);
    const c2 = creepFactor.of(q);
    const peak = peakInfluence.of(q);
    const diagram = strainDiagram({ ...q, peak });
    let top_m = 0;
    let sum_mPerkPa = 0;
    const layers = q.layers.map(({ thickness_m, modulus_kPa }) => {
      const area_m = areaTo(top_m + thickness_m, diagram) - areaTo(top_m, diagram);
      top_m += thickness_m;
      sum_mPerkPa += area_m / modulus_kPa;
      return {
        area_m,
        settlement_mm: schmertmannSettlement.of({
          c1,
          c2,
          netPressure_kPa: q.netPressure_kPa,
          sum_mPerkPa: area_m / modulus_kPa,
        }),
      };
    });
    return {
      settlement_mm: schmertmannSettlement.of({ c1, c2, netPressure_kPa: q.netPressure_kPa, sum_mPerkPa }),
      c1,
      c2,
      peakInfluence: peak,
      peakDepth_m: diagram.peakDepth_m,
      influenceDepth_m: diagram.endDepth_m,
      layers,
    };
  },
  lines: (q, r) => [
    line(embedmentFactor, q),
    line(creepFactor, q),
    line(peakInfluence, q),
    line(schmertmannSettlement, {
      c1: r.c1,
      c2: r.c2,
      netPressure_kPa: q.netPressure_kPa,
      sum_mPerkPa: r.settlement_mm / (1000 * r.c1 * r.c2 * q.netPressure_kPa),
    }),
  ],
  findings: (q, { influenceDepth_m }) => {
    const found: MethodFinding[] = [];
    const given_m = q.layers.reduce((sum, { thickness_m }) => sum + thickness_m, 0);
    if (given_m < influenceDepth_m - 1e-9)
      found.push({
        code: "layers-too-short",
        severity: "warning",
        message: `The layers end ${given_m} m below the base, the influence at ${influenceDepth_m.toFixed(2)} m: what is missing counts as rigid.`,
      });
    if (q.years < 0.1)
      found.push({
        code: "no-creep",
        severity: "note",
        message: "Before a tenth of a year no creep is counted.",
      });
    return found;
  },
});
