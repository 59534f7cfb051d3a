import { z } from "zod";
import { defineMethod, type MethodFinding, output, quantity } from "../define-method";
import { formula, type Line, line } from "../formula";

/** One straight branch of the compression curve, over the stresses from one to another. */
export const branch = formula({
  symbol: "Δs",
  unit: "mm",
  ref: "terzaghi1925",
  shown: "1000 H C / (1 + e0) log10(σ2′ / σ1′)",
  symbols: { H: "thickness_m", C: "index", e0: "e0", "σ2′": "to_kPa", "σ1′": "from_kPa" },
  of: (q: { thickness_m: number; index: number; e0: number; to_kPa: number; from_kPa: number }) =>
    ((1000 * q.thickness_m * q.index) / (1 + q.e0)) * Math.log10(q.to_kPa / q.from_kPa),
});

type Layer = {
  thickness_m: number;
  effectiveStress_kPa: number;
  preconsolidation_kPa: number;
  increase_kPa: number;
  cc: number;
  cr: number;
  e0: number;
};

/** The branches that a layer goes through: along Cr up to the preconsolidation stress, along Cc beyond it. */
function branches(
  layer: Layer,
): { thickness_m: number; index: number; e0: number; to_kPa: number; from_kPa: number }[] {
  const { thickness_m, e0, cc, cr, effectiveStress_kPa: from_kPa } = layer;
  const to_kPa = from_kPa + layer.increase_kPa;
  // Ground that bears more than it ever did before is on the virgin branch already.
  const past_kPa = Math.max(layer.preconsolidation_kPa, from_kPa);
  if (to_kPa <= past_kPa)
    return to_kPa === from_kPa ? [] : [{ thickness_m, index: cr, e0, to_kPa, from_kPa }];
  const virgin = { thickness_m, index: cc, e0, to_kPa, from_kPa: past_kPa };
  return past_kPa === from_kPa
    ? [virgin]
    : [{ thickness_m, index: cr, e0, to_kPa: past_kPa, from_kPa }, virgin];
}

const ofLayer = (layer: Layer): number | null =>
  layer.effectiveStress_kPa + layer.increase_kPa > 0
    ? branches(layer).reduce((sum, part) => sum + branch.of(part), 0)
    : null;

const layerInput = z.strictObject({
  thickness_m: quantity({ label: "Thickness", unit: "m", above: 0 }),
  effectiveStress_kPa: quantity({ label: "Effective stress at mid-layer", unit: "kPa", above: 0 }),
  preconsolidation_kPa: quantity({ label: "Preconsolidation stress", unit: "kPa", above: 0 }),
  increase_kPa: quantity({ label: "Increase of stress at mid-layer", unit: "kPa" }),
  cc: quantity({ label: "Compression index Cc", min: 0, max: 20 }),
  cr: quantity({ label: "Recompression index Cr", min: 0, max: 20 }),
  e0: quantity({ label: "Void ratio e0", above: 0, max: 50 }),
});

export const settlementConsolidation = defineMethod({
  id: "settlement-consolidation",
  version: "1",
  title: "Primary consolidation settlement",
  source: ["terzaghi1925"],
  limits: [
    "One-dimensional, at the end of primary consolidation; stresses at mid-layer, so layers are kept thin.",
    "A net unloading heaves along the recompression index; creep and time are apart.",
  ],
  inputs: z.strictObject({
    layers: z
      .array(layerInput, { error: "Layers is a list." })
      .min(1, "At least one layer is needed.")
      .max(500, "At most 500 layers.")
      .meta({ label: "Layers", unit: "" }),
  }),
  outputs: z.object({
    settlement_mm: output("Settlement", "mm").nullable(),
    layers: z
      .array(
        z.object({
          finalStress_kPa: output("Effective stress at the end", "kPa"),
          settlement_mm: output("Settlement", "mm").nullable(),
        }),
      )
      .meta({ label: "By layer", unit: "" }),
  }),
  compute: (q) => {
    const layers = q.layers.map((layer) => ({
      finalStress_kPa: layer.effectiveStress_kPa + layer.increase_kPa,
      settlement_mm: ofLayer(layer),
    }));
    const settlement_mm = layers.reduce<number | null>(
      (sum, { settlement_mm: part }) => (sum === null || part === null ? null : sum + part),
      0,
    );
    return { settlement_mm, layers };
  },
  lines: (q): Line[] =>
    q.layers.flatMap((layer) =>
      ofLayer(layer) === null ? [] : branches(layer).map((part) => line(branch, part)),
    ),
  findings: (q) =>
    q.layers.flatMap((layer, at): MethodFinding[] => {
      if (layer.effectiveStress_kPa + layer.increase_kPa <= 0)
        return [
          {
            code: "no-effective-stress",
            severity: "outside",
            message: `Layer ${at + 1}: the unloading takes away all effective stress; no settlement can be told.`,
          },
        ];
      if (layer.preconsolidation_kPa < layer.effectiveStress_kPa)
        return [
          {
            code: "underconsolidated",
            severity: "warning",
            message: `Layer ${at + 1}: the preconsolidation stress is less than the effective stress; it is still settling under its own weight.`,
          },
        ];
      return [];
    }),
});
