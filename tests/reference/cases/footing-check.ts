import { casesOf, type ReferenceCase } from "../reference-case";

/**
 * A pad of 2 m by 2 m by 0.5 m, founded 1 m deep: 48 kN of pad, 36 kN of backfill, 18 kPa of overburden. A central load
 * N presses N/4 + 21 kPa, that is N/4 + 3 kPa net.
 */
const footing = { breadth_m: 2, length_m: 2, thickness_m: 0.5, groundLevel_m: 11, foundingLevel_m: 10 };
const value = { kind: "single", netAllowable_kPa: 150, soilUnitWeight_kNm3: 18 };
const criteria = { interfaceAngle_deg: 30 };
const load = (vertical_kN: number, more: Record<string, unknown> = {}) => ({
  name: "C1",
  duration: "permanent",
  vertical_kN,
  ...more,
});

export const footingCheckCases: ReferenceCase[] = casesOf(
  {
    method: "footing-check",
    citation: "Worked by hand from the definitions: 24 and 18 kN/m³, water 9.81 kN/m³",
    status: "computed independently",
    tolerance: { rel: 1e-12 },
  },
  [
    {
      id: "check-central",
      why: "presses 171 kPa, 153 kPa net, under 600 kN and fails 150 kPa",
      inputs: { footing, loads: [load(600)], value, criteria },
      expected: {
        verdict: "fails",
        maxPressure_kPa: 171,
        requiredNet_kPa: 153,
        utilisationBearing: 1.02,
        utilisation: 1.02,
        governingCombination: "C1",
        governedBy: "bearing",
        factorSliding: null,
        factorOverturning: null,
        factorUplift: null,
        minContactRatio: 1,
      },
    },
    {
      id: "check-at-limit",
      why: "passes at a utilisation of exactly one",
      inputs: { footing, loads: [load(588)], value, criteria },
      expected: { verdict: "passes", requiredNet_kPa: 150, utilisation: 1 },
    },
    {
      id: "check-just-over",
      why: "fails with 150.4 kPa against 150 kPa, which rounds to the same",
      inputs: { footing, loads: [load(589.6)], value, criteria },
      expected: { verdict: "fails", requiredNet_kPa: 150.4 },
    },
    {
      id: "check-water",
      why: "asks for the same net pressure with water above the base, and lifts 19.62 kN",
      inputs: { footing, loads: [load(600)], value: { ...value, groundwaterLevel_m: 10.5 }, criteria },
      expected: {
        requiredNet_kPa: 153,
        maxPressure_kPa: 171 - 4.905,
        buoyancy_kN: 19.62,
        overburden_kPa: 13.095,
        factorUplift: 684 / 19.62,
      },
    },
    {
      id: "check-moment-from-height",
      why: "adds a horizontal load times its height to the moment, here at the top of the pad",
      inputs: { footing, loads: [load(516, { horizontalB_kN: 40, momentB_kNm: 40 })], value, criteria },
      expected: {
        "combinations.0.momentB_kNm": 60,
        "combinations.0.eccentricityB_m": 0.1,
        maxPressure_kPa: 195,
        requiredNet_kPa: 177,
        factorOverturning: 10,
        factorSliding: (600 * Math.tan(Math.PI / 6)) / 40,
      },
    },
    {
      id: "check-partial-contact",
      why: "fails a permanent load outside the middle third, however low the pressure",
      inputs: {
        footing,
        loads: [load(516, { momentB_kNm: 300 })],
        value: { ...value, netAllowable_kPa: 1000 },
        criteria,
      },
      expected: {
        verdict: "fails",
        "combinations.0.contactRatio": 0.75,
        maxPressure_kPa: 400,
        "combinations.0.utilisationContact": 1.5,
        governedBy: "middle third",
      },
    },
    {
      id: "check-transient-contact",
      why: "lets the same load pass as a transient one, three quarters of the base being in contact",
      inputs: {
        footing,
        loads: [load(516, { momentB_kNm: 300, duration: "transient" })],
        value: { ...value, netAllowable_kPa: 1000 },
        criteria,
      },
      expected: { verdict: "passes", minContactRatio: 0.75, factorOverturning: 2 },
    },
    {
      id: "check-duration-factor",
      why: "lets a transient load ask for less by the factor that the value grants",
      inputs: {
        footing,
        loads: [load(600), load(738, { name: "W", duration: "transient" })],
        value: { ...value, netAllowable_kPa: 153, durationFactors: { transient: 1.25 } },
        criteria,
      },
      expected: {
        verdict: "passes",
        "combinations.1.demandNet_kPa": 187.5,
        "combinations.1.requiredNet_kPa": 150,
        requiredNet_kPa: 153,
        governingCombination: "C1",
      },
    },
    {
      id: "check-effective-area",
      why: "compares the uniform pressure on the effective area where the value is stated for that",
      inputs: {
        footing,
        loads: [load(516, { momentB_kNm: 60 })],
        value: { ...value, comparedWith: "effective-area" },
        criteria,
      },
      expected: { requiredNet_kPa: 600 / (1.8 * 2) - 18, maxPressure_kPa: 195 },
    },
    {
      id: "check-no-equilibrium",
      why: "fails without a figure where the resultant leaves the base",
      inputs: { footing, loads: [load(0, { momentL_kNm: 100, duration: "accidental" })], value, criteria },
      expected: {
        verdict: "fails",
        utilisation: null,
        requiredNet_kPa: null,
        maxPressure_kPa: null,
        minContactRatio: 0,
        governedBy: "equilibrium",
      },
    },
    {
      id: "check-pull",
      why: "holds a pull of 70 kN with 84 kN of weight 1.2 times over",
      inputs: { footing, loads: [load(-70)], value, criteria },
      expected: {
        factorUplift: 1.2,
        "combinations.0.baseVertical_kN": 14,
        requiredNet_kPa: 3.5 - 18,
        utilisationBearing: 0,
        verdict: "passes",
      },
    },
    {
      id: "check-outside",
      why: "puts a pad broader than the value holds for outside its conditions, though the figures would pass",
      inputs: { footing, loads: [load(100)], value: { ...value, maxBreadth_m: 1.9 }, criteria },
      expected: { verdict: "outside conditions", requiredNet_kPa: 28, "findings.0.code": "breadth" },
    },
    {
      id: "check-cover",
      why: "takes 10 − 8.8 for the 1.2 m of cover that is asked for, where binary digits say a little less",
      inputs: {
        footing: { ...footing, groundLevel_m: 10, foundingLevel_m: 8.8 },
        loads: [load(100)],
        value: { ...value, minFoundingDepth_m: 1.2 },
        criteria,
      },
      expected: { verdict: "passes", depth_m: 1.2 },
    },
    {
      id: "check-table",
      why: "reads a table at the smaller side and the founding depth",
      inputs: {
        footing: { ...footing, breadth_m: 3 },
        loads: [load(600)],
        value: {
          kind: "table",
          table: {
            breadths_m: [1, 3],
            depths_m: [1, 2],
            netAllowable_kPa: [
              [100, 200],
              [150, 250],
            ],
          },
          soilUnitWeight_kNm3: 18,
        },
        criteria,
      },
      expected: { "combinations.0.netAllowable_kPa": 150, requiredNet_kPa: 103 },
    },
    {
      id: "check-parameters",
      why: "computes (π + 2) · 50 · 1.2 / 3 = 102.8 kPa net for a square on clay of 50 kPa",
      inputs: {
        footing,
        loads: [load(300)],
        value: {
          kind: "parameters",
          parameters: {
            theory: "en1997",
            drainage: "undrained",
            cohesion_kPa: 50,
            frictionAngle_deg: 0,
            unitWeightBelow_kNm3: 18,
            factorOfSafety: 3,
            convention: "net-over-factor",
          },
          soilUnitWeight_kNm3: 18,
        },
        criteria,
      },
      expected: {
        "combinations.0.ultimate_kPa": (Math.PI + 2) * 60 + 18,
        "combinations.0.netAllowable_kPa": (Math.PI + 2) * 20,
        requiredNet_kPa: 78,
        utilisationBearing: 78 / ((Math.PI + 2) * 20),
      },
    },
  ],
);
