import { casesOf, type ReferenceCase } from "../reference-case";
import { FOOT_m, PSF_kPa, TSF_kPa } from "../source-units";

const IBC =
  "International Building Code 2012, Table 1806.2, as reprinted in R. W. Day, Geotechnical Earthquake Engineering Handbook, Table 14.6";
const BS = "BS 8004:1986, Table 1 (withdrawn 2015), in a secondary copy";
const DAS_PFE = "B. M. Das, Principles of Foundation Engineering (edition not stated in the copy read)";
const DAS_PGE = "B. M. Das, Principles of Geotechnical Engineering, 7th ed.";

export const presumptiveCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "presumptive-bearing",
      citation: IBC,
      status: "read in transcription",
      tolerance: { rel: 1e-3 },
    },
    (
      [
        ["1", 12000],
        ["2", 4000],
        ["3", 3000],
        ["4", 2000],
        ["5", 1500],
      ] as const
    ).map(([soilClass, psf]) => ({
      id: `presumed-ibc-${soilClass}`,
      why: `presumes ${psf} psf for class ${soilClass}`,
      inputs: { standard: "ibc-1806.2", soilClass },
      expected: { min_kPa: psf * PSF_kPa, max_kPa: psf * PSF_kPa },
    })),
  ),
  ...casesOf(
    { method: "presumptive-bearing", citation: BS, status: "read in transcription", tolerance: { abs: 0 } },
    (
      [
        ["dense-gravel", 600, null],
        ["medium-dense-gravel", 200, 600],
        ["loose-gravel", null, 200],
        ["compact-sand", 300, null],
        ["medium-dense-sand", 100, 300],
        ["loose-sand", null, 100],
        ["hard-clay", 300, 600],
        ["stiff-clay", 150, 300],
        ["firm-clay", 75, 150],
        ["soft-clay", null, 75],
      ] as const
    ).map(([soilClass, min_kPa, max_kPa]) => ({
      id: `presumed-bs8004-${soilClass}`,
      why: `presumes ${min_kPa ?? "less than"} ${min_kPa === null ? "" : max_kPa === null ? "or more" : "to"} ${max_kPa ?? ""} kPa for ${soilClass.replaceAll("-", " ")}`,
      inputs: { standard: "bs8004-1986", soilClass },
      expected: { min_kPa, max_kPa },
    })),
  ),
];

export const sptCorrectionCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "spt-correction",
      citation: `${DAS_PGE}, σ′ = 0.275 tsf with one atmosphere as 1 tsf`,
      status: "read in transcription",
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
      status: "read in transcription",
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
      status: "read in transcription",
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

export const layeredCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "layered-bearing",
      citation:
        "FHWA-SA-02-054, Geotechnical Engineering Circular No. 6 (Kimmerling 2002), Eq. 5-17, Appendix B",
      status: "read in transcription",
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
      status: "read in transcription",
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
      status: "read in transcription",
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

/** n values of mean zero about 100, with a standard deviation of 10: half of them up, half of them down. */
function scattered(n: number): number[] {
  const deviation = 10 * Math.sqrt((n - 1) / (n - (n % 2)));
  return Array.from({ length: n }, (_, at) =>
    n % 2 === 1 && at === n - 1 ? 100 : 100 + (at % 2 === 0 ? deviation : -deviation),
  );
}

export const characteristicCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "characteristic-value",
      citation: "EN 1990:2002, Annex D, Table D.1, coefficient of variation unknown",
      status: "from memory",
      tolerance: { abs: 0.012 },
    },
    (
      [
        [3, 3.37],
        [4, 2.63],
        [5, 2.33],
        [6, 2.18],
        [8, 2.0],
        [10, 1.92],
        [30, 1.73],
      ] as const
    ).map(([n, k]) => ({
      id: `fractile-${n}`,
      why: `takes ${k} standard deviations off for the 5 % fractile of ${n} values`,
      inputs: { values: scattered(n), rule: "student-5-fractile" },
      expected: { k, mean: 100, standardDeviation: 10, characteristic: 100 - 10 * k },
      tolerance: {
        k: { abs: 0.012 },
        mean: { abs: 1e-9 },
        standardDeviation: { abs: 1e-9 },
        characteristic: { abs: 0.12 },
      },
    })),
  ),
  ...casesOf(
    {
      method: "characteristic-value",
      citation: "EN 1990:2002, Annex D, Table D.1, coefficient of variation known",
      status: "from memory",
      tolerance: { abs: 0.012 },
    },
    (
      [
        [3, 1.89],
        [5, 1.8],
        [10, 1.72],
      ] as const
    ).map(([n, k]) => ({
      id: `fractile-known-${n}`,
      why: `takes ${k} known deviations off for the 5 % fractile of ${n} values`,
      inputs: { values: scattered(n), rule: "known-cov", cov: 0.1, estimate: "fractile" },
      expected: { k, cov: 0.1 },
    })),
  ),
  ...casesOf(
    {
      method: "characteristic-value",
      citation: "Student's t at 95 % over √n; 1.645 over √n with a known coefficient of variation",
      status: "computed independently",
      tolerance: { abs: 0.001 },
    },
    (
      [
        [3, 1.686, 0.95],
        [4, 1.177, 0.822],
        [5, 0.953, 0.736],
        [6, 0.823, 0.672],
        [10, 0.58, 0.52],
        [20, 0.387, 0.368],
        [30, 0.31, 0.3],
      ] as const
    ).flatMap(([n, unknown, known]) => [
      {
        id: `mean-${n}`,
        why: `takes ${unknown} standard deviations off for a 95 % cautious mean of ${n} values`,
        inputs: { values: scattered(n), rule: "student-95-mean" },
        expected: { k: unknown },
      },
      {
        id: `mean-known-${n}`,
        why: `takes ${known} known deviations off for the same`,
        inputs: { values: scattered(n), rule: "known-cov", cov: 0.15 },
        expected: { k: known },
      },
    ]),
  ),
  ...casesOf(
    {
      method: "characteristic-value",
      citation: "H. R. Schneider, Proc. 14th ICSMFE 1997; coefficient of variation 0.1 for φ",
      status: "from memory",
      tolerance: { abs: 1e-9 },
    },
    [
      {
        id: "schneider-phi",
        why: "takes half a standard deviation off 34°",
        inputs: { values: [33, 34, 35], rule: "schneider", cov: 0.1 },
        expected: { characteristic: 32.3 },
      },
      {
        id: "schneider-cohesion",
        why: "takes a fifth off a cohesion that varies by 0.4",
        inputs: { values: [8, 10, 12], rule: "schneider", cov: 0.4 },
        expected: { characteristic: 8 },
      },
    ],
  ),
];

const table = {
  breadths_m: [1, 2, 3],
  depths_m: [1, 2],
  netAllowable_kPa: [
    [200, 250, 280],
    [260, 320, 360],
  ],
};

export const valueTableCases: ReferenceCase[] = casesOf(
  {
    method: "value-table",
    citation: "Bilinear interpolation by hand",
    status: "computed independently",
    tolerance: { abs: 1e-9 },
  },
  [
    {
      id: "table-point",
      why: "gives a printed point itself",
      inputs: { ...table, breadth_m: 2, depth_m: 1 },
      expected: { netAllowable_kPa: 250, outside: false },
    },
    {
      id: "table-between",
      why: "lies in the middle of four points at 257.5 kPa",
      inputs: { ...table, breadth_m: 1.5, depth_m: 1.5 },
      expected: { netAllowable_kPa: (200 + 250 + 260 + 320) / 4, outside: false },
    },
    {
      id: "table-last-point",
      why: "still holds at its last breadth and depth",
      inputs: { ...table, breadth_m: 3, depth_m: 2 },
      expected: { netAllowable_kPa: 360, outside: false },
    },
    {
      id: "table-outside-breadth",
      why: "gives nothing beyond its last breadth",
      inputs: { ...table, breadth_m: 3.0001, depth_m: 1.5 },
      expected: { netAllowable_kPa: null, outside: true },
    },
    {
      id: "table-outside-depth",
      why: "gives nothing above its first depth",
      inputs: { ...table, breadth_m: 2, depth_m: 0.9 },
      expected: { netAllowable_kPa: null, outside: true },
    },
  ],
);
