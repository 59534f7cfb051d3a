import { into, type Mapped, type Mapping, maybe, times } from "./mapping";
import { type SharedCase, si, siList } from "./shared-cases";

/** A layer in the sources' names, normally consolidated unless a preconsolidation stress is given. */
const clayLayer = (one: SharedCase, increase_kPa: number) => {
  const i = one.inputs;
  return {
    thickness_m: si(i.H),
    effectiveStress_kPa: si(i.sigma0),
    preconsolidation_kPa: maybe(one, "sigma_p") ?? si(i.sigma0),
    increase_kPa,
    cc: si(i.Cc),
    cr: maybe(one, "Cs") ?? 0,
    e0: si(i.e0),
  };
};

const consolidation = (one: SharedCase, increase_kPa: number): Mapped =>
  into({
    method: "settlement-consolidation",
    inputs: { layers: [clayLayer(one, increase_kPa)] },
    outputs: { s: one.expected.s?.unit === "mm" ? "settlement_mm" : metres, s_primary: metres },
  });

const metres = times("settlement_mm", 0.001);

/** Stress, settlement and distortion. */
export const settlementMappings: Record<string, Mapping> = {
  "stress-2to1": (one) =>
    "q" in one.inputs
      ? into({
          method: "stress-increase",
          inputs: {
            rule: "two-to-one",
            breadth_m: si(one.inputs.B),
            length_m: si(one.inputs.L),
            pressure_kPa: si(one.inputs.q),
            depth_m: si(one.inputs.z),
          },
          outputs: { dsigma: "increase_kPa" },
        })
      : into({
          method: "stress-increase",
          inputs: {
            rule: "boussinesq",
            breadth_m: 1,
            length_m: 1,
            pressure_kPa: 1,
            depth_m: si(one.inputs.z_over_B),
          },
          outputs: { centre: "influence" },
        }),
  "stress-rect": (one) => {
    const i = one.inputs;
    if ("m" in i && "n" in i)
      return into({
        method: "stress-increase",
        inputs: {
          rule: "boussinesq",
          breadth_m: si(i.m),
          length_m: si(i.n),
          pressure_kPa: 1,
          depth_m: 1,
          x_m: si(i.m) / 2,
          y_m: si(i.n) / 2,
        },
        outputs: { I: "influence" },
      });
    if ("m1" in i)
      return into({
        method: "stress-increase",
        inputs: {
          rule: "boussinesq",
          breadth_m: 2,
          length_m: 2 * si(i.m1),
          pressure_kPa: maybe(one, "q") ?? 1,
          depth_m: si(i.n1),
        },
        outputs: { Ic: "influence", dsigma: "increase_kPa" },
      });
    if ("distance_from_centre_on_axis" in i)
      return into({
        method: "stress-increase",
        inputs: {
          rule: "boussinesq",
          breadth_m: si(i.B),
          length_m: si(i.L),
          pressure_kPa: si(i.q),
          depth_m: si(i.z),
          x_m: si(i.distance_from_centre_on_axis),
        },
        outputs: { dsigma: "increase_kPa" },
      });
    if ("z_over_B" in i)
      return into({
        method: "stress-increase",
        inputs: {
          rule: "boussinesq",
          breadth_m: 1,
          length_m: 1000,
          pressure_kPa: 1,
          depth_m: si(i.z_over_B),
        },
        outputs: { factor: "influence" },
      });
    return null;
  },
  "stress-westergaard": (one) =>
    into({
      method: "stress-increase",
      inputs: {
        rule: "westergaard",
        breadth_m: si(one.inputs.m),
        length_m: si(one.inputs.n),
        pressure_kPa: 1,
        depth_m: 1,
        x_m: si(one.inputs.m) / 2,
        y_m: si(one.inputs.n) / 2,
      },
      outputs: { I: "influence" },
    }),
  "immediate-elastic": (one) => {
    if (!("L_over_B" in one.inputs)) return null;
    const rigidity = "rigid" in one.expected ? "rigid" : "flexible-centre";
    return into({
      method: "settlement-elastic",
      inputs: {
        breadth_m: 1,
        length_m: si(one.inputs.L_over_B),
        pressure_kPa: 1,
        modulus_kPa: 1,
        poisson: 0,
        rigidity,
      },
      // Half the centre is the corner, by superposition.
      outputs: { rigid: "influence", center: "influence", corner: times("influence", 0.5) },
    });
  },
  "immediate-schmertmann": (one) =>
    one.id === "BAS-230"
      ? into({
          method: "settlement-schmertmann",
          inputs: {
            breadth_m: 2,
            length_m: 2,
            netPressure_kPa: si(one.inputs.dp),
            overburden_kPa: si(one.inputs.sigma0),
            // The stress at the peak that gives the peak which the case states.
            overburdenAtPeak_kPa: si(one.inputs.dp) / ((si(one.inputs.Izp) - 0.5) / 0.1) ** 2,
            layers: [{ thickness_m: 4, modulus_kPa: si(one.inputs.Es) }],
            years: si(one.inputs.t),
          },
          outputs: { area_Iz: "layers.0.area_m", C1: "c1", s: "settlement_mm" },
        })
      : one.id === "BAS-228"
        ? into({
            method: "settlement-schmertmann",
            inputs: {
              breadth_m: 2,
              length_m: 2,
              netPressure_kPa: si(one.inputs.q) - si(one.inputs.sigma0),
              overburden_kPa: si(one.inputs.sigma0),
              overburdenAtPeak_kPa: 80,
              layers: [{ thickness_m: 4, modulus_kPa: 10000 }],
              years: 0.1,
            },
            outputs: { C1: "c1" },
          })
        : null,
  "immediate-spt": (one) => {
    const i = one.inputs;
    if ("R3" in i)
      return into({
        method: "settlement-burland-burbidge",
        inputs: {
          breadth_m: 1,
          length_m: si(i.L_over_B),
          pressure_kPa: 100,
          averageN60: 10,
          years: si(i.t),
          loading: "static",
        },
        outputs: { fs: "shapeFactor", ft: "timeFactor" },
      });
    if (one.id === "BAS-240")
      return into({
        method: "spt-allowable",
        inputs: {
          rule: "bowles",
          n60: si(i.N60),
          breadth_m: si(i.B),
          depth_m: ((si(i.Fd) - 1) / 0.33) * si(i.B),
          settlement_mm: si(i.s),
        },
        outputs: { q_net: "netAllowable_kPa", Q: times("netAllowable_kPa", si(i.B) ** 2) },
      });
    return null;
  },
  consolidation: (one) => {
    const i = one.inputs;
    if ("dsigma_top_mid_bottom" in i) {
      const [top = 0, mid = 0, bottom = 0] = siList(i.dsigma_top_mid_bottom);
      return consolidation(one, (top + 4 * mid + bottom) / 6);
    }
    if ("dsigma_mean" in i) return consolidation(one, si(i.dsigma_mean));
    return "sigma0" in i ? consolidation(one, si(i.dsigma)) : null;
  },
  "movement-limits": (one) =>
    "span" in one.inputs
      ? into({
          method: "angular-distortion",
          inputs: {
            points: [
              { id: "one", x_m: 0, y_m: 0, settlement_mm: si(one.inputs.s1) },
              { id: "other", x_m: si(one.inputs.span), y_m: 0, settlement_mm: si(one.inputs.s2) },
            ],
          },
          outputs: { beta: "worst.ratio" },
        })
      : null,
};
