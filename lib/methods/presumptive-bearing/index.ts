import { z } from "zod";
import { choice, defineMethod, output } from "../define-method";
import { bs8004, ibc, type Presumed } from "./tables";

const standards = {
  "ibc-1806.2": {
    rows: ibc,
    note: "International Building Code 2012, Table 1806.2; not checked against the printed page. Not for mud, organic silt or clay, peat or unprepared fill.",
  },
  "bs8004-1986": {
    rows: bs8004,
    note: "BS 8004:1986, Table 1 (withdrawn 2015); not checked against the printed page. Granular values assume a breadth of 1 m or more and water at least one breadth below the base; clay values are prone to long-term settlement.",
  },
} as const;

const known = (standard: keyof typeof standards): readonly Presumed[] => standards[standard].rows;

export const presumptiveBearing = defineMethod({
  id: "presumptive-bearing",
  version: "1",
  title: "Presumed bearing value from a code's table",
  source: ["ibc1806", "bs8004"],
  limits: [
    "Preliminary design and light structures only; a presumed value is confirmed by investigation before construction.",
    "Vertical load, no weaker layer below, neighbours that do not overlap; not on normally consolidated or organic ground.",
    "Tables of different countries are not interchangeable.",
  ],
  inputs: z
    .strictObject({
      standard: choice("Standard", ["ibc-1806.2", "bs8004-1986"]),
      soilClass: z
        .string({
          error: (issue) =>
            issue.input === undefined ? "Class of ground is missing." : "Class of ground is a word.",
        })
        .meta({
          label: "Class of ground",
          unit: "",
          description: `IBC: ${ibc.map((row) => `${row.soilClass} ${row.label}`).join("; ")}. BS 8004: ${bs8004.map((row) => row.soilClass).join(", ")}.`,
        }),
    })
    .superRefine((given, refinement) => {
      const rows = known(given.standard);
      if (!rows.some(({ soilClass }) => soilClass === given.soilClass))
        refinement.addIssue({
          code: "custom",
          path: ["soilClass"],
          message: `Class of ground must be one of: ${rows.map(({ soilClass }) => soilClass).join(", ")}.`,
        });
    }),
  outputs: z.object({
    ground: z.string().meta({ label: "Ground", unit: "" }),
    min_kPa: output("Lower end of the range", "kPa").nullable(),
    max_kPa: output("Upper end of the range", "kPa").nullable(),
    note: z.string().meta({ label: "Note", unit: "" }),
  }),
  compute: ({ standard, soilClass }) => {
    const row = known(standard).find((one) => one.soilClass === soilClass);
    return {
      ground: row?.label ?? "",
      min_kPa: row?.min_kPa ?? null,
      max_kPa: row?.max_kPa ?? null,
      note: standards[standard].note,
    };
  },
  findings: (_, { min_kPa, max_kPa }) => [
    {
      code: "presumed",
      severity: "warning",
      message:
        "A presumed value, for preliminary design: to be confirmed by investigation before construction.",
    },
    ...(min_kPa === null || max_kPa === null
      ? [
          {
            code: "open-range",
            severity: "note" as const,
            message: `The table gives only ${min_kPa === null ? "an upper" : "a lower"} end: nothing is interpolated.`,
          },
        ]
      : []),
  ],
});
