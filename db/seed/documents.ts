import type { DocumentKind } from "@/lib/contracts/document-words";
import type { Page } from "./pdf";

export type SeedDocument = {
  reference: string;
  title: string;
  kind: DocumentKind;
  author: string;
  code: string;
  status: string;
  receivedOn: string;
  limitations?: string;
  pages: Page[];
};

const firm = "Quill & Aske Ground Engineering";

/** Eight documents of the invented investigation, and the second revision of one of them. */
export const documents: SeedDocument[] = [
  {
    reference: "DS-01",
    title: "Desk study",
    kind: "desk study",
    author: firm,
    code: "P01",
    status: "S2",
    receivedOn: "2024-11-18",
    pages: [
      {
        heading: "Site history",
        lines: [
          "A mill race crossed the west of the site until about 1910 and was filled with brick and ash.",
          "A print works with shallow strip footings stood on the eastern half; its slab was broken out in 2023.",
        ],
      },
      {
        heading: "Expected ground",
        lines: [
          "Made ground over terrace gravel, thinning out southwards, over stiff clay. Soft alluvium is expected along the filled mill race.",
          "Water is expected in the gravel, in step with the river.",
        ],
      },
    ],
  },
  {
    reference: "FR-01",
    title: "Factual report on the ground investigation",
    kind: "factual report",
    author: firm,
    code: "P01",
    status: "S4",
    receivedOn: "2025-03-24",
    pages: [
      {
        heading: "Fieldwork",
        lines: [
          "Twelve boreholes by cable percussion, four of them followed by rotary coring, and four trial pits, 6 to 27 February 2025.",
          "Standard penetration tests at 1.0 m centres to 6 m and at 1.5 m below; hammer energy ratio 64 %.",
        ],
      },
      {
        heading: "Groundwater",
        lines: [
          "Water entered fast in the gravel at 8.4 to 8.8 m on the site datum and slowly in the clay.",
          "The boreholes were open for a day at most: these are not settled levels.",
        ],
      },
      {
        heading: "Laboratory tests",
        lines: [
          "Clay: liquid limit 54 to 68 %, plasticity index 31 to 42 %, undrained strength 74 to 142 kPa, rising with depth.",
          "Gravel: 58 to 71 % gravel, 24 to 36 % sand, fines below 6 %.",
        ],
      },
    ],
  },
  {
    reference: "FR-02",
    title: "Supplementary boreholes in the south-east",
    kind: "addendum",
    author: firm,
    code: "P01",
    status: "S4",
    receivedOn: "2025-10-06",
    pages: [
      {
        heading: "Scope",
        lines: [
          "BH13, BH14, WS01 and WS02, 15 to 17 September 2025, after the store was moved south by 22 m.",
        ],
      },
      {
        heading: "Findings",
        lines: [
          "In BH13 the top metre of the clay is firm only, N = 12 and 14.",
          "In the north-east the gravel is looser around BH09 than the first tests showed; water stood 0.4 m higher than in February.",
        ],
      },
    ],
  },
  {
    reference: "GIR-01",
    title: "Ground investigation report",
    kind: "ground investigation report",
    author: firm,
    code: "P01",
    status: "S4",
    receivedOn: "2025-04-14",
    limitations:
      "For the scheme of April 2025 with columns up to 900 kN and no basement. The ground between holes is interpreted.",
    pages: [
      {
        heading: "Ground model",
        lines: [
          "Units 1 to 5: made ground, alluvium, terrace gravel, stiff clay, weathered mudstone.",
          "The gravel dies out southwards between northing 50 and 64.",
        ],
      },
      {
        heading: "Strength",
        lines: [
          "Gravel: N 22 to 41, cautious estimate 26.",
          "Clay: undrained strength, cautious estimate 65 + 6 z kPa with z in metres below its top.",
        ],
      },
      {
        heading: "Groundwater for design",
        lines: ["9.0 m on the site datum in the gravel; to be confirmed by a winter of readings."],
      },
      {
        heading: "Founding in the gravel",
        lines: [
          "8.3.1 West: 210 kPa net. 8.3.2 Centre: 260 kPa net. 8.3.3 East: 300 kPa net.",
          "Each for pads 1.0 to 3.5 m wide (3.0 m in the east) at least 1.0 m deep, settlement below 25 mm, no increase for wind.",
        ],
      },
      {
        heading: "Founding in the clay",
        lines: [
          "8.4.1 West: 100 kPa net, preliminary. 8.4.2 Centre: 150 kPa net. 8.4.3 East: 165 kPa net.",
          "Each for pads 1.0 to 4.0 m wide at least 1.2 m deep; blind within four hours of opening; factor 3 on the net ultimate pressure.",
        ],
      },
    ],
  },
  {
    reference: "GDR-01",
    title: "Geotechnical design report",
    kind: "geotechnical design report",
    author: firm,
    code: "P01",
    status: "S4",
    receivedOn: "2025-05-19",
    pages: [
      {
        heading: "Shallow foundations",
        lines: [
          "Pads on gravel and on stiff clay are suitable. No pad may rest on made ground or alluvium.",
          "The formation is to be inspected and recorded before concrete.",
        ],
      },
      {
        heading: "Plan of supervision",
        lines: [
          "Gravel: visual check and dynamic probe, at least 8 blows for 100 mm. Clay: hand vane, mean of three at least 75 kPa.",
        ],
      },
    ],
  },
  {
    reference: "LT-01",
    title: "Letter on winter groundwater readings",
    kind: "letter",
    author: firm,
    code: "P01",
    status: "S2",
    receivedOn: "2025-11-24",
    pages: [
      {
        heading: "Readings October to November 2025",
        lines: [
          "Highest level in the standpipe of BH05: 9.3 m; of BH09: 9.4 m on the site datum.",
          "The design level in the east is raised to 9.4 m.",
        ],
      },
    ],
  },
  {
    reference: "LD-01",
    title: "Column loads at base, service level",
    kind: "loads",
    author: "Holm Brandt Structures",
    code: "P02",
    status: "S4",
    receivedOn: "2025-06-30",
    pages: [
      {
        heading: "Conventions",
        lines: [
          "Characteristic loads at the top of the pads. Down is positive. Moments are given by the direction they tip towards.",
          "B is along the letters of the column grid, L along its numbers.",
        ],
      },
    ],
  },
  {
    reference: "TC-01",
    title: "Plate tests on gravel formation",
    kind: "test certificate",
    author: "Northbank Testing",
    code: "P01",
    status: "S2",
    receivedOn: "2025-09-29",
    pages: [
      {
        heading: "Results",
        lines: [
          "450 mm plate at F79: 4.1 mm at 400 kPa. At F81: 5.6 mm at 400 kPa.",
          "The plate stresses the ground to about 0.8 m only.",
        ],
      },
    ],
  },
];

export const secondRevision: SeedDocument = {
  ...(documents[5] as SeedDocument),
  code: "P02",
  receivedOn: "2026-01-19",
  pages: [
    {
      heading: "Readings October 2025 to January 2026",
      lines: [
        "Highest level in the standpipe of BH10: 9.2 m on the site datum; of BH05: 9.4 m.",
        "The readings go on until April 2026.",
      ],
    },
  ],
};
