import { into, type Mapped, type Mapping, maybe, times } from "./mapping";
import { type SharedCase, si } from "./shared-cases";

const sandOrClay = (given: Record<string, unknown>) => ({
  depth_m: 0,
  cohesion_kPa: 0,
  frictionAngle_deg: 0,
  surcharge_kPa: 0,
  unitWeightBelow_kNm3: 18,
  ...given,
});

/** Annex D in the sources' names; sides in any order, the smaller first. */
const annexD = (one: SharedCase, drainage: "drained" | "undrained"): Mapped => {
  const i = one.inputs;
  const b = si(i.B_eff ?? i.B);
  const l = si(i.L_eff ?? i.L);
  return into({
    method: "bearing-resistance",
    inputs: sandOrClay({
      theory: "en1997",
      drainage,
      effectiveBreadth_m: Math.min(b, l),
      effectiveLength_m: Math.max(b, l),
      cohesion_kPa: maybe(one, "cu_d") ?? maybe(one, "cu") ?? maybe(one, "c_d") ?? 0,
      frictionAngle_deg: maybe(one, "phi_d") ?? 0,
      surcharge_kPa: maybe(one, "q") ?? maybe(one, "q_eff") ?? 0,
      unitWeightBelow_kNm3: maybe(one, "gamma_eff") ?? 18,
      vertical_kN: maybe(one, "V") ?? (i.H ? 1000 : null),
      horizontal_kN: maybe(one, "H") ?? 0,
      horizontalAlong: /along L/.test(one.method) ? "length" : "breadth",
      baseTilt_deg: maybe(one, "alpha") ?? 0,
    }),
    outputs: {
      R_over_A: "ultimate_kPa",
      q_Rd: "ultimate_kPa",
      sc: "sc",
      sq: "sq",
      sg: "sGamma",
      ic: "ic",
      iq: "iq",
      ig: "iGamma",
      bc: "bc",
      bq: "bq",
    },
  });
};

const bearingResistance: Record<string, Mapping> = {
  "BRG-038": (one) =>
    into({
      method: "bearing-resistance",
      inputs: sandOrClay({
        theory: "terzaghi",
        drainage: "drained",
        effectiveBreadth_m: si(one.inputs.B),
        effectiveLength_m: 1e6,
        cohesion_kPa: si(one.inputs.c),
        frictionAngle_deg: si(one.inputs.phi),
        surcharge_kPa: si(one.inputs.gamma) * si(one.inputs.D),
        unitWeightBelow_kNm3: si(one.inputs.gamma),
      }),
      outputs: { q_all_gross: times("ultimate_kPa", 1 / si(one.inputs.FS)) },
      rounding: 1e-4,
    }),
  "BRG-040": (one) => {
    const i = one.inputs;
    const submerged = si(i.gamma_sat) - si(i.gamma_w);
    return into({
      method: "bearing-resistance",
      inputs: sandOrClay({
        theory: "meyerhof",
        drainage: "drained",
        effectiveBreadth_m: si(i.B),
        effectiveLength_m: si(i.L),
        depth_m: si(i.D),
        frictionAngle_deg: si(i.phi),
        surcharge_kPa: si(i.gamma_above) * si(i.Dw) + submerged * (si(i.D) - si(i.Dw)),
        unitWeightBelow_kNm3: si(i.gamma_sat),
        waterDepth_m: si(i.Dw) - si(i.D),
      }),
      outputs: { Q_all_gross: times("ultimate_kPa", (si(i.B) * si(i.L)) / si(i.FS)) },
    });
  },
  "BRG-041": (one) => {
    const i = one.inputs;
    const effective = si(i.B) - 2 * si(i.e_B);
    return into({
      method: "bearing-resistance",
      inputs: sandOrClay({
        theory: "meyerhof",
        drainage: "drained",
        effectiveBreadth_m: effective,
        effectiveLength_m: si(i.L),
        depth_m: si(i.D),
        frictionAngle_deg: si(i.phi),
        surcharge_kPa: si(i.gamma) * si(i.D),
        unitWeightBelow_kNm3: si(i.gamma),
      }),
      outputs: { Q_ult: times("ultimate_kPa", effective * si(i.L)) },
    });
  },
  "BRG-060": (one) => annexD(one, "undrained"),
  "BRG-061": (one) => annexD(one, "undrained"),
  "BRG-064": (one) => annexD(one, "drained"),
  "BRG-065": (one) => annexD(one, "drained"),
  "BRG-066": (one) => annexD(one, "drained"),
  "BRG-068": (one) => {
    const i = one.inputs;
    return into({
      method: "bearing-resistance",
      inputs: sandOrClay({
        theory: "meyerhof",
        drainage: "drained",
        effectiveBreadth_m: si(i.B),
        effectiveLength_m: si(i.L),
        depth_m: si(i.D),
        frictionAngle_deg: si(i.phi),
        surcharge_kPa: si(i.q),
        unitWeightBelow_kNm3: si(i.gamma),
        vertical_kN: 1000,
        horizontal_kN: 1000 * Math.tan((si(i.load_inclination) * Math.PI) / 180),
      }),
      outputs: { i_q: "iq", i_g: "iGamma", q_ult: "ultimate_kPa" },
    });
  },
  "BRG-069": (one) =>
    into({
      method: "bearing-resistance",
      inputs: sandOrClay({
        theory: "hansen",
        drainage: "drained",
        effectiveBreadth_m: 1,
        effectiveLength_m: 1,
        frictionAngle_deg: si(one.inputs.phi),
        vertical_kN: si(one.inputs.V),
        horizontal_kN: si(one.inputs.H),
      }),
      outputs: { i_q: "iq", i_g: "iGamma", i_c: "ic" },
    }),
  "BRG-070": (one) =>
    into({
      method: "bearing-resistance",
      inputs: sandOrClay({
        theory: "hansen",
        drainage: "undrained",
        effectiveBreadth_m: si(one.inputs.B),
        effectiveLength_m: si(one.inputs.L),
        depth_m: si(one.inputs.D),
        cohesion_kPa: si(one.inputs.su),
        surcharge_kPa: si(one.inputs.q),
        vertical_kN: 1000,
        horizontal_kN: si(one.inputs.H),
      }),
      outputs: {
        sc: { of: "sc", times: 1, plus: -1 },
        dc: { of: "dc", times: 1, plus: -1 },
        ic: { of: "ic", times: -1, plus: 1 },
        q_ult: "ultimate_kPa",
      },
    }),
};

/** n values with mean 100 and standard deviation 10 exactly. */
function scattered(n: number): number[] {
  const even = Array.from({ length: n }, (_, at): number =>
    n % 2 === 1 && at === n - 1 ? 0 : at % 2 === 0 ? 1 : -1,
  );
  const scale = 10 * Math.sqrt((n - 1) / even.reduce((sum, x) => sum + x * x, 0));
  return even.map((x) => 100 + scale * x);
}

const theoryOf = (method: string): string | null =>
  /Terzaghi/.test(method)
    ? "terzaghi"
    : /Vesic/.test(method)
      ? "vesic"
      : /EN 1997/.test(method)
        ? "en1997"
        : /^Meyerhof/.test(method)
          ? "meyerhof"
          : null;

const presumedClasses: Record<string, string> = {
  "dense gravel or dense sand and gravel": "dense-gravel",
  "medium dense gravel / sand and gravel": "medium-dense-gravel",
  "loose gravel / loose sand and gravel": "loose-gravel",
  "compact sand": "compact-sand",
  "medium dense sand": "medium-dense-sand",
  "loose sand": "loose-sand",
  "very stiff boulder clay, hard clay": "hard-clay",
  "stiff clay": "stiff-clay",
  "firm clay": "firm-clay",
  "soft clay and silt": "soft-clay",
  "strong igneous and gneissic rock, sound": "igneous-rock",
  "strong limestone or strong sandstone": "limestone",
  "schist and slate": "schist",
  "strong shale, mudstone, siltstone": "mudstone",
};

const text = (one: SharedCase, name: string): string => {
  const given = one.inputs[name];
  return String(typeof given === "object" ? given.value : given);
};

/** Bearing values and what they are derived from. */
export const bearingMappings: Record<string, Mapping> = {
  "bearing-factors": (one) => {
    const theory = theoryOf(one.method);
    return theory === null || !("phi" in one.inputs) || "reduction" in one.inputs
      ? null
      : into({
          method: "bearing-factors",
          inputs: { theory, frictionAngle_deg: si(one.inputs.phi) },
          outputs: { Nc: "nc", Nq: "nq", Ngamma: "nGamma" },
        });
  },
  "bearing-resistance": (one) => bearingResistance[one.id]?.(one) ?? null,
  presumptive: (one) => {
    if ("class" in one.inputs)
      return into({
        method: "presumptive-bearing",
        inputs: { standard: "ibc-1806.2", soilClass: text(one, "class").slice(0, 1) },
        outputs: { q_presumptive: "max_kPa", q_presumptive_SI: "min_kPa" },
      });
    const soilClass = /^BS 8004/.test(one.method) ? presumedClasses[text(one, "ground")] : undefined;
    return soilClass === undefined
      ? null
      : into({
          method: "presumptive-bearing",
          inputs: { standard: "bs8004-1986", soilClass },
          outputs: { min: "min_kPa", max: "max_kPa", q_presumed: "min_kPa" },
        });
  },
  "spt-corrections": (one) => {
    const i = one.inputs;
    if ("rod_length" in i)
      return into({
        method: "spt-correction",
        inputs: {
          blowCount: si(i.N),
          energyRatio: si(i.ER),
          boreholeFactor: si(one.expected.CB),
          rodFactor: si(one.expected.CR),
          effectiveStress_kPa: 100,
          overburdenRule: "none",
        },
        outputs: { N60: "n60" },
      });
    if (/^Skempton/.test(one.method)) return null;
    const peck = /^Peck/.test(one.method);
    return into({
      method: "spt-correction",
      inputs: {
        blowCount: maybe(one, "N60") ?? 10,
        effectiveStress_kPa: si(i.sigma_v_eff),
        overburdenRule: peck ? "peck" : "liao-whitman",
        referencePressure_kPa: "N60" in i ? 95.76051796 : 100,
      },
      outputs: { CN: "cn", N1_60: "n160", CN_uncapped: "cn" },
    });
  },
  "spt-allowable": (one) => {
    const i = one.inputs;
    if ("Fd" in i)
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
    if ("B_large" in i)
      return into({
        method: "spt-allowable",
        inputs: {
          rule: /^Meyerhof/.test(one.method) ? "meyerhof" : "bowles",
          n60: si(i.N),
          breadth_m: si(i.B_large),
          depth_m: 0,
          settlement_mm: si(i.s),
        },
        outputs: { q_large: "netAllowable_kPa" },
      });
    return null;
  },
  layered: (one) =>
    "z" in one.inputs
      ? into({
          method: "layered-bearing",
          inputs: {
            breadth_m: si(one.inputs.B),
            length_m: si(one.inputs.L),
            pressure_kPa: si(one.inputs.q),
            thickness_m: si(one.inputs.z),
            lowerNetAllowable_kPa: 100,
          },
          outputs: { two_to_one: "pressureOnLower_kPa" },
        })
      : null,
  "characteristic-values": (one) => {
    if (!("n" in one.inputs)) return null;
    const values = scattered(si(one.inputs.n));
    return into({
      method: "characteristic-value",
      inputs: { values, rule: "k_mean" in one.expected ? "student-95-mean" : "student-5-fractile" },
      outputs: { k_mean: "k", k_unknown: "k" },
    });
  },
};
