import { casesOf, type ReferenceCase } from "../reference-case";
import { FOOT_m, PSF_kPa } from "../source-units";

const DAS_PFE = "B. M. Das, Principles of Foundation Engineering (edition not stated in the copy read)";

export const layeredCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "layered-bearing",
      citation:
        "FHWA-SA-02-054, Geotechnical Engineering Circular No. 6 (Kimmerling 2002), Eq. 5-17, Appendix B",
      status: "read in a secondary copy",
      tolerance: { abs: 0.006 },
    },
    [
      {
        id: "layered-gec6",
        why: "brings 131.69 kPa on a layer 1.05 m below a base of 3 m under 240 kPa",
        inputs: {
          breadth_m: 3,
          length_m: 3,
          pressure_kPa: 240,
          thickness_m: 1.05,
          lowerNetAllowable_kPa: 263.38,
        },
        expected: { pressureOnLower_kPa: 131.69, utilisation: 0.5 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "layered-bearing",
      citation: "USACE EM 1110-1-1905 (2025), Appendix B, Ex. B-3, Eq. 5-17",
      status: "read in a secondary copy",
      tolerance: { abs: 0.005 },
    },
    [
      {
        id: "layered-usace",
        why: "spreads over 3.45 times the area 6 ft below a base of 7 ft",
        inputs: {
          breadth_m: 7 * FOOT_m,
          length_m: 7 * FOOT_m,
          pressure_kPa: 3.45,
          thickness_m: 6 * FOOT_m,
          lowerNetAllowable_kPa: 1,
        },
        expected: { pressureOnLower_kPa: 1 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "layered-bearing",
      citation: `${DAS_PFE}, a base of 5 ft by 10 ft at 12.5 ft, beside elastic theory`,
      status: "read in a secondary copy",
      tolerance: { rel: 3e-3 },
    },
    [
      {
        id: "layered-das",
        why: "brings 253.97 psf of 2,000 psf at 2.5 breadths",
        inputs: {
          breadth_m: 5 * FOOT_m,
          length_m: 10 * FOOT_m,
          pressure_kPa: 2000 * PSF_kPa,
          thickness_m: 12.5 * FOOT_m,
          lowerNetAllowable_kPa: 100,
        },
        expected: { pressureOnLower_kPa: 253.97 * PSF_kPa },
      },
    ],
  ),
];

export const plateCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "plate-load",
      citation: "K. Terzaghi and R. B. Peck, Soil Mechanics in Engineering Practice, 1948; numbers ours",
      status: "from memory",
      tolerance: { rel: 1e-9 },
    },
    [
      {
        id: "plate-sand-equal",
        why: "leaves the settlement of a footing as broad as the plate alone",
        inputs: { soil: "sand", plateBreadth_m: 0.3, plateSettlement_mm: 5, footingBreadth_m: 0.3 },
        expected: { footingSettlement_mm: 5 },
      },
      {
        id: "plate-sand-limit",
        why: "never comes to more than four times the plate's settlement on sand",
        inputs: { soil: "sand", plateBreadth_m: 0.3, plateSettlement_mm: 5, footingBreadth_m: 3e6 },
        expected: { footingSettlement_mm: 20 },
        tolerance: { rel: 1e-6 },
      },
      {
        id: "plate-sand-foot",
        why: "settles a footing of 3 ft 2.25 times as much as a plate of one foot on sand",
        inputs: {
          soil: "sand",
          plateBreadth_m: FOOT_m,
          plateSettlement_mm: 10,
          footingBreadth_m: 3 * FOOT_m,
        },
        expected: { footingSettlement_mm: 22.5 },
      },
      {
        id: "plate-clay",
        why: "settles in proportion to the breadth on clay",
        inputs: { soil: "clay", plateBreadth_m: 0.3, plateSettlement_mm: 5, footingBreadth_m: 1.5 },
        expected: { footingSettlement_mm: 25 },
      },
    ],
  ),
];
