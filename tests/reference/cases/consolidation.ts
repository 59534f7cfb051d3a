import { casesOf, type ReferenceCase } from "../reference-case";
import { FOOT_m, INCH_m, PSF_kPa } from "../source-units";

const DAS_PFE = "B. M. Das, Principles of Foundation Engineering";

const clay = (given: Record<string, number>) => ({ layers: [{ cr: 0.05, ...given }] });

export const consolidationCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "settlement-consolidation",
      citation:
        "B. M. Das, Principles of Geotechnical Engineering, 7th ed. 2013, overconsolidated clay of 4 m",
      status: "read in a secondary copy",
      tolerance: { abs: 0.6 },
    },
    [
      {
        id: "consolidation-overconsolidated",
        why: "settles 35 mm along the recompression index while the final stress stays below 190 kPa",
        inputs: clay({
          thickness_m: 4,
          effectiveStress_kPa: 79.14,
          preconsolidation_kPa: 190,
          increase_kPa: 100,
          cc: 0.27,
          cr: 0.045,
          e0: 0.8,
        }),
        expected: { settlement_mm: 35 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "settlement-consolidation",
      citation:
        "B. M. Das, Principles of Geotechnical Engineering, 7th ed. 2013, footing on clay with Simpson's mean stress",
      status: "read in a secondary copy",
      tolerance: { abs: 0.0007 * 25.4 },
    },
    [
      {
        id: "consolidation-das-footing",
        why: "settles 0.826 in under the mean of 408, 232 and 19 psf",
        inputs: clay({
          thickness_m: 120 * INCH_m,
          effectiveStress_kPa: 1814 * PSF_kPa,
          preconsolidation_kPa: 1814 * PSF_kPa,
          increase_kPa: ((408 + 4 * 232 + 19) / 6) * PSF_kPa,
          cc: 0.27,
          e0: 1,
        }),
        expected: { settlement_mm: 0.826 * 25.4 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "settlement-consolidation",
      citation: `${DAS_PFE}, Ex. 5.10 p. 256 and Ex. 6.4 p. 284 (edition not stated in the copy read)`,
      status: "read in a secondary copy",
      tolerance: { abs: 0.15 },
    },
    [
      {
        id: "consolidation-das-5-10",
        why: "settles 46.45 mm below a footing of 1 m by 2 m",
        inputs: clay({
          thickness_m: 2.5,
          effectiveStress_kPa: 52.83,
          preconsolidation_kPa: 52.83,
          increase_kPa: 14.375,
          cc: 0.32,
          e0: 0.8,
        }),
        expected: { settlement_mm: 46.45 },
        tolerance: { abs: 0.01 },
      },
      {
        id: "consolidation-das-6-4",
        why: "settles 6.76 in below a mat with the stress that is printed",
        inputs: clay({
          thickness_m: 18 * FOOT_m,
          effectiveStress_kPa: 3900.4 * PSF_kPa,
          preconsolidation_kPa: 3900.4 * PSF_kPa,
          increase_kPa: 2461.23 * PSF_kPa,
          cc: 0.28,
          e0: 0.9,
        }),
        expected: { settlement_mm: 6.76 * 25.4 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "settlement-consolidation",
      citation: "UFC 3-220-10 (2022), Eq. 5-14, by hand",
      status: "computed independently",
      tolerance: { rel: 1e-9 },
    },
    [
      {
        id: "consolidation-across",
        why: "goes along Cr to the preconsolidation stress and along Cc beyond it",
        inputs: clay({
          thickness_m: 2,
          effectiveStress_kPa: 50,
          preconsolidation_kPa: 100,
          increase_kPa: 150,
          cc: 0.3,
          e0: 1,
        }),
        expected: { settlement_mm: 1000 * (0.05 + 0.3) * Math.log10(2) },
      },
      {
        id: "consolidation-none",
        why: "settles nothing without an increase",
        inputs: clay({
          thickness_m: 2,
          effectiveStress_kPa: 50,
          preconsolidation_kPa: 50,
          increase_kPa: 0,
          cc: 0.3,
          e0: 1,
        }),
        expected: { settlement_mm: 0 },
      },
      {
        id: "consolidation-heave",
        why: "heaves along the recompression index under a net unloading",
        inputs: clay({
          thickness_m: 2,
          effectiveStress_kPa: 100,
          preconsolidation_kPa: 100,
          increase_kPa: -50,
          cc: 0.3,
          e0: 1,
        }),
        expected: { settlement_mm: -50 * Math.log10(2) },
      },
      {
        id: "consolidation-all-gone",
        why: "tells no settlement where all effective stress is taken away, and takes no logarithm of it",
        inputs: clay({
          thickness_m: 2,
          effectiveStress_kPa: 50,
          preconsolidation_kPa: 50,
          increase_kPa: -50,
          cc: 0.3,
          e0: 1,
        }),
        expected: { settlement_mm: null },
      },
    ],
  ),
];
