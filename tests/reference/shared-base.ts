import { into, type Mapped, type Mapping, maybe, times } from "./mapping";
import { type SharedCase, si } from "./shared-cases";

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

/** Base pressure and stability. */
export const baseMappings: Record<string, Mapping> = {
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
};
