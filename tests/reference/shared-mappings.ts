import { type SharedCase, si, siList } from "./shared-cases";

/** A shared case in our own fields: what to run, and which output stands for which expected name. */
export type Mapped = {
  method: string;
  inputs: Record<string, unknown>;
  /** Expected name → output path, or that figure brought into the source's own measure (SI). */
  outputs: Record<string, string | Reading>;
  /** Where the source rounds its factors first, how far that may carry (relative). */
  rounding?: number;
};
/** An output times a factor, plus an addend. */
export type Reading = { of: string; times: number; plus?: number };
const times = (of: string, factor: number): Reading => ({ of, times: factor });

type Mapping = (one: SharedCase) => Mapped | null;

/** States one mapping; each stands for itself, whatever the others beside it have. */
const into = (one: Mapped): Mapped => one;

const maybe = (one: SharedCase, name: string): number | null =>
  name in one.inputs ? si(one.inputs[name]) : null;

/** Pressure on a base of 2 m by 3 m under 600 kN, where a case gives shares only. */
const onBase = (one: SharedCase): Mapped => {
  const alongB = maybe(one, "ex_over_B") ?? maybe(one, "e_over_B") ?? 0;
  const alongL = maybe(one, "ey_over_L") ?? 0;
  const [breadth_m, length_m] = [maybe(one, "B") ?? 2, maybe(one, "L") ?? 3];
  const vertical_kN = maybe(one, "N") ?? 600;
  const given = "My_=N*ex" in one.inputs;
  const area = breadth_m * length_m;
  return into({
    method: "base-pressure",
    inputs: {
      breadth_m,
      length_m,
      vertical_kN,
      momentB_kNm: given ? si(one.inputs["My_=N*ex"]) : vertical_kN * alongB * breadth_m,
      momentL_kNm: given ? si(one.inputs["Mx_=N*ey"]) : vertical_kN * alongL * length_m,
    },
    outputs: {
      qmax_A_over_N: times("maxPressure_kPa", area / vertical_kN),
      contact_ratio: "contactRatio",
      contact_area: times("contactRatio", area),
      q_max: "maxPressure_kPa",
      q_pp: "cornerPressures_kPa.0",
      q_mp: "cornerPressures_kPa.1",
      q_mm: "cornerPressures_kPa.2",
      q_pm: "cornerPressures_kPa.3",
    },
  });
};

const alongLength: Mapping = (one) =>
  into({
    method: "base-pressure",
    inputs: {
      breadth_m: si(one.inputs.B),
      length_m: si(one.inputs.L),
      vertical_kN: si(one.inputs.Q),
      momentL_kNm: si(one.inputs.Q) * si(one.inputs.e_L),
    },
    outputs: {
      q_max: "maxPressure_kPa",
      q_min: "minPressure_kPa",
      L1: times("contactRatio", si(one.inputs.L)),
    },
  });

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

/** One mapping a topic. Null: the case is of something that no method of ours computes. */
export const mappings: Record<string, Mapping> = {
  "base-pressure-biaxial-partial": onBase,
  "base-pressure-full": (one) => ("ex_over_B" in one.inputs ? onBase(one) : null),
  "base-pressure-uniaxial-partial": (one) => ("e_L" in one.inputs ? alongLength(one) : onBase(one)),
  "base-pressure-degenerate": (one) =>
    "ex_over_B" in one.inputs && !("N" in one.inputs) ? onBase(one) : null,
  "kern-limits": (one) => ("ex_over_B" in one.inputs ? onBase(one) : null),
  "effective-area": (one) =>
    "eB" in one.inputs
      ? into({
          method: "effective-area",
          inputs: {
            breadth_m: si(one.inputs.B),
            length_m: si(one.inputs.L),
            eccentricityB_m: si(one.inputs.eB),
            eccentricityL_m: si(one.inputs.eL),
          },
          outputs: {
            // Swapped after the reduction, as the case asks.
            B_eff: "effectiveLength_m",
            L_eff: "effectiveBreadth_m",
          },
        })
      : "Meyerhof_A_eff_over_A" in one.expected
        ? into({
            method: "effective-area",
            inputs: {
              breadth_m: 1,
              length_m: 1,
              eccentricityB_m: si(one.inputs.eB_over_B),
              eccentricityL_m: si(one.inputs.eL_over_L),
            },
            outputs: { Meyerhof_A_eff_over_A: "effectiveArea_m2" },
          })
        : null,
  sliding: (one) => {
    const i = one.inputs;
    if ("tan_delta" in i)
      return into({
        method: "sliding",
        inputs: {
          vertical_kN: si(i.W) + si(i.Pv),
          horizontalB_kN: si(i.H),
          horizontalL_kN: 0,
          interfaceAngle_deg: (Math.atan(si(i.tan_delta)) * 180) / Math.PI,
        },
        outputs: { FS: "factorOfSafety", F_R: "resistance_kN" },
      });
    if ("c_a" in i)
      return into({
        method: "sliding",
        inputs: {
          vertical_kN: 0,
          horizontalB_kN: si(i.H),
          horizontalL_kN: 0,
          adhesion_kPa: si(i.c_a),
          contactArea_m2: si(i.B_f),
        },
        outputs: { FS: "factorOfSafety", F_R: "resistance_kN" },
      });
    if ("Ph" in i)
      return into({
        method: "sliding",
        // Loads per metre of wall.
        inputs: {
          vertical_kN: si(i.V),
          horizontalB_kN: si(i.Ph),
          horizontalL_kN: 0,
          interfaceAngle_deg: (2 / 3) * si(i.phi2),
          adhesion_kPa: (2 / 3) * si(i.c2),
          contactArea_m2: si(i.B),
        },
        outputs: { FS: "factorOfSafety" },
      });
    if ("Vd" in i) {
      const design =
        (Math.atan(Math.tan((si(i.phi_cv_k) * Math.PI) / 180) / si(i.gamma_phi)) * 180) / Math.PI;
      return into({
        method: "sliding",
        inputs: {
          vertical_kN: si(i.Vd),
          horizontalB_kN: 0,
          horizontalL_kN: 0,
          interfaceAngle_deg: /2\/3/.test(one.method) ? (2 / 3) * design : design,
        },
        outputs: { Rd: "resistance_kN" },
      });
    }
    return null;
  },
  overturning: (one) =>
    "M_resisting" in one.inputs
      ? into({
          method: "overturning",
          inputs: {
            breadth_m: 2,
            length_m: 1,
            vertical_kN: si(one.inputs.M_resisting),
            momentB_kNm: si(one.inputs.M_overturning),
            momentL_kNm: 0,
          },
          outputs: { FS: "factorOfSafety" },
        })
      : "e" in one.inputs
        ? into({
            method: "overturning",
            inputs: {
              breadth_m: si(one.inputs.B),
              length_m: 1,
              vertical_kN: 100,
              momentB_kNm: 100 * si(one.inputs.e),
              momentL_kNm: 0,
            },
            outputs: { FS: "factorOfSafety" },
          })
        : null,
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
