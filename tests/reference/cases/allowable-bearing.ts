import { casesOf, type ReferenceCase } from "../reference-case";
import { PSF_kPa } from "../source-units";

export const allowableBearingCases: ReferenceCase[] = casesOf(
  {
    method: "allowable-bearing",
    citation:
      "The conventions of FHWA-SA-02-054 (Kimmerling 2002), sections 4.2 and 5.2, on 900 kPa, 36 kPa, factor 3; numbers ours",
    status: "computed independently",
    tolerance: { abs: 1e-9 },
  },
  [
    {
      id: "allowable-net",
      why: "allows 288 kPa net, 324 kPa gross, with the factor on the net ultimate",
      inputs: {
        grossUltimate_kPa: 900,
        overburden_kPa: 36,
        factorOfSafety: 3,
        convention: "net-over-factor",
      },
      expected: { netAllowable_kPa: 288, grossAllowable_kPa: 324 },
    },
    {
      id: "allowable-gross",
      why: "allows 264 kPa net, 300 kPa gross, with the factor on the gross ultimate",
      inputs: {
        grossUltimate_kPa: 900,
        overburden_kPa: 36,
        factorOfSafety: 3,
        convention: "gross-over-factor",
      },
      expected: { netAllowable_kPa: 264, grossAllowable_kPa: 300 },
    },
    {
      id: "allowable-surface",
      why: "comes to the same on both conventions without overburden",
      inputs: {
        grossUltimate_kPa: 900,
        overburden_kPa: 0,
        factorOfSafety: 3,
        convention: "gross-over-factor",
      },
      expected: { netAllowable_kPa: 300, grossAllowable_kPa: 300 },
    },
  ],
).concat(
  casesOf(
    {
      method: "allowable-bearing",
      citation:
        "B. M. Das, Principles of Foundation Engineering, Terzaghi's square base, factor 4 on gross (edition not stated in the copy read)",
      status: "read in a secondary copy",
      tolerance: { rel: 1e-4 },
    },
    [
      {
        id: "allowable-das",
        why: "allows 2,690.76 psf gross of 10,763 psf",
        inputs: {
          grossUltimate_kPa: 10763.04 * PSF_kPa,
          overburden_kPa: 345 * PSF_kPa,
          factorOfSafety: 4,
          convention: "gross-over-factor",
        },
        expected: { grossAllowable_kPa: 2690.76 * PSF_kPa, netAllowable_kPa: (2690.76 - 345) * PSF_kPa },
      },
    ],
  ),
);
