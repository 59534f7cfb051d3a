import { casesOf, type ReferenceCase } from "../reference-case";
import { TSF_kPa } from "../source-units";

const DAS_PFE = "B. M. Das, Principles of Foundation Engineering (edition not stated in the copy read)";

const DAS_PGE = "B. M. Das, Principles of Geotechnical Engineering, 7th ed.";

export const sptCorrectionCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "spt-correction",
      citation: `${DAS_PGE}, σ′ = 0.275 tsf with one atmosphere as 1 tsf`,
      status: "read in a secondary copy",
      tolerance: { abs: 0.05 },
    },
    [
      {
        id: "spt-liao-whitman",
        why: "raises 8 blows at 0.275 tsf to 15.3",
        inputs: {
          blowCount: 8,
          effectiveStress_kPa: 0.275 * TSF_kPa,
          overburdenRule: "liao-whitman",
          referencePressure_kPa: TSF_kPa,
        },
        expected: { cn: 1.907, n60: 8, n160: 15.3 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "spt-correction",
      citation: "A. W. Skempton, Géotechnique 36(3) 1986, factors for rods of 5 m and a borehole of 150 mm",
      status: "from memory",
      tolerance: { abs: 0.01 },
    },
    [
      {
        id: "spt-energy",
        why: "corrects 14 blows at 72 % energy to 14.99",
        inputs: {
          blowCount: 14,
          energyRatio: 0.72,
          boreholeFactor: 1.05,
          rodFactor: 0.85,
          effectiveStress_kPa: 100,
          overburdenRule: "none",
        },
        expected: { n60: 14.99, cn: 1, n160: 14.99 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "spt-correction",
      citation: "R. B. Peck, W. E. Hanson and T. H. Thornburn, Foundation Engineering, 2nd ed. 1974",
      status: "from memory",
      tolerance: { abs: 0.002 },
    },
    [
      {
        id: "spt-peck",
        why: "corrects by 1.219 at 50 kPa",
        inputs: { blowCount: 10, effectiveStress_kPa: 50, overburdenRule: "peck" },
        expected: { cn: 1.219 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "spt-correction",
      citation: "A cap of 1.7 on the overburden correction (Youd and others 2001)",
      status: "common practice",
      tolerance: { abs: 0.001 },
    },
    [
      {
        id: "spt-no-cap",
        why: "triples the count at 10 kPa unless a cap is given",
        inputs: { blowCount: 10, effectiveStress_kPa: 10, overburdenRule: "liao-whitman" },
        expected: { cn: 3.162 },
      },
      {
        id: "spt-cap",
        why: "keeps to a cap of 1.7 that is given",
        inputs: { blowCount: 10, effectiveStress_kPa: 10, overburdenRule: "liao-whitman", cap: 1.7 },
        expected: { cn: 1.7, n160: 17 },
      },
    ],
  ),
];

export const sptAllowableCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "spt-allowable",
      citation: `${DAS_PFE}, Bowles's form`,
      status: "read in a secondary copy",
      tolerance: { rel: 1e-3 },
    },
    (
      [
        [2.25, 1.22, 195.88],
        [2.3, 1.215, 194.08],
        [2, 1.248, 206.31],
      ] as const
    ).map(([breadth_m, factor, netAllowable_kPa]) => ({
      id: `spt-bowles-${breadth_m}`,
      why: `allows ${netAllowable_kPa} kPa on N60 = 10 for a pad of ${breadth_m} m`,
      inputs: { rule: "bowles", n60: 10, breadth_m, depth_m: ((factor - 1) / 0.33) * breadth_m },
      expected: { netAllowable_kPa, embedmentFactor: factor },
    })),
  ),
  ...casesOf(
    {
      method: "spt-allowable",
      citation: `${DAS_PFE}, Ex. 6.2 p. 280, a mat (whose (B + 0.3)/B the book drops)`,
      status: "read in a secondary copy",
      tolerance: { rel: 0.07 },
    },
    [
      {
        id: "spt-bowles-mat",
        why: "allows about 133 kPa under a mat of 10 m, the breadth term within 6 % of one",
        inputs: { rule: "bowles", n60: 10, breadth_m: 10, depth_m: 2 },
        expected: { netAllowable_kPa: 133.25 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "spt-allowable",
      citation: "G. G. Meyerhof, Journal of the SMFD 82(SM1) 1956",
      status: "from memory",
      tolerance: { rel: 2e-3 },
    },
    [
      {
        id: "spt-meyerhof-narrow",
        why: "allows 12 N on a narrow base",
        inputs: { rule: "meyerhof", n60: 20, breadth_m: 1, depth_m: 0 },
        expected: { netAllowable_kPa: 240 },
      },
      {
        id: "spt-meyerhof-wide",
        why: "allows 201.4 kPa on 2.5 m",
        inputs: { rule: "meyerhof", n60: 20, breadth_m: 2.5, depth_m: 0 },
        expected: { netAllowable_kPa: 201.4 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "spt-allowable",
      citation: "J. E. Bowles, Foundation Analysis and Design, 1977",
      status: "from memory",
      tolerance: { rel: 2e-3 },
    },
    [
      {
        id: "spt-bowles-20mm",
        why: "allows 250.9 kPa on 2.5 m for 20 mm, in proportion to the settlement",
        inputs: { rule: "bowles", n60: 20, breadth_m: 2.5, depth_m: 0, settlement_mm: 20 },
        expected: { netAllowable_kPa: 250.9 },
      },
    ],
  ),
];
