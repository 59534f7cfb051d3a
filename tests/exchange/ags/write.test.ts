import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { groundFromAgs } from "@/lib/exchange/ags/ground";
import { plainText } from "@/lib/exchange/ags/plain-text";
import { readAgs } from "@/lib/exchange/ags/read";
import { writeAgs } from "@/lib/exchange/ags/write";
import type { AgsExport } from "@/lib/exchange/ags/write-model";

const base: AgsExport = {
  project: { projectId: "P-17", name: "Mill Lane depot", client: 'A "small" client' },
  transmittal: {
    issueNumber: "3",
    date: "2024-03-05",
    producer: "Register",
    status: "Final",
    recipient: "Office",
  },
};
const full: AgsExport = {
  ...base,
  holes: [
    {
      name: "BH1",
      kind: "CP+RC",
      status: "FINAL",
      easting_m: 1000.125,
      northing_m: 2000.5,
      nationalGrid: "LOCAL",
      groundLevel_m: 16.2,
      finalDepth_m: 6,
      startDate: "2024-02-01",
      verticalDatum: "Site datum",
    },
    { name: "BH2", groundLevel_m: null },
  ],
  strata: [
    {
      hole: "BH1",
      top_m: 0,
      base_m: 1.2,
      description: 'MADE GROUND: "ash", brick | slag + clinker',
      legendCode: "102",
    },
    { hole: "BH1", top_m: 1.2, base_m: 6, description: "Firm CLAY, 5° dip", legendCode: "202" },
  ],
  spts: [
    {
      hole: "BH1",
      depth_m: 2,
      kind: "S",
      blowCount: 20,
      mainBlows: 20,
      mainPenetration_mm: 300,
      seatingBlows: 3,
      seatingPenetration_mm: 150,
      waterText: "Dry",
      energyRatio_percent: 62,
    },
    { hole: "BH1", depth_m: 4, blowCount: null, refusal: true, mainBlows: 50, mainPenetration_mm: 85 },
  ],
  strikes: [{ hole: "BH1", depth_m: 2.9, at: "2024-02-01", rises: [{ minutes: 20, depth_m: 2.405 }] }],
  samples: [{ hole: "BH1", top_m: 1.5, reference: "1", kind: "U", sampleId: "S1", base_m: 1.95 }],
  installations: [{ hole: "BH1", name: "SP1", depth_m: 5.5, kind: "SP" }],
  readings: [
    {
      hole: "BH1",
      installation: "SP1",
      depth_m: 5.5,
      at: "2024-02-20T10:30:00",
      kind: "WDEP",
      reference: "1",
      value: "Dry",
      unit: "m",
    },
  ],
  files: [{ set: "FS1", name: "report.pdf", kind: "REP" }],
};

describe("writing an AGS 4 file", () => {
  it("gives CR LF, doubled quotes and ASCII, and reads back without an error", () => {
    const { text, bytes, report, findings } = writeAgs(full);
    expect(report.findings).toEqual([]);
    expect(findings).toEqual([]);
    expect(text.split("\r\n").length).toBe(text.split("\n").length);
    expect(bytes.every((byte) => byte < 128)).toBe(true);
    expect(text).toContain('"MADE GROUND: ""ash"", brick | slag + clinker"');
    expect(text).toContain("5deg dip");
  });

  it("says the same again when it is read as ground data", () => {
    const ground = groundFromAgs(readAgs(writeAgs(full).bytes));
    expect(ground.findings.map(({ message }) => message)).toEqual([
      "1 of 2 holes have an empty ground level.",
    ]);
    expect(ground.holes[0]).toMatchObject({
      kindCodes: ["CP", "RC"],
      national: { easting_m: 1000.125, northing_m: 2000.5 },
      verticalDatum: "Site datum",
    });
    expect(ground.spts).toMatchObject([
      {
        blowCount: 20,
        refusal: false,
        mainPenetration_mm: 300,
        energyRatio_percent: 62,
        water: { text: "Dry", number: null },
      },
      { blowCount: null, refusal: true, mainBlows: 50, mainPenetration_mm: 85, reportText: "50 for 85mm" },
    ]);
    expect(ground.strikes).toMatchObject([
      { depth_m: 2.9, at: "2024-02-01", rises: [{ minutes: 20, depth: { number: 2.405 } }] },
    ]);
    expect(ground.otherGroups.map(({ name }) => name)).toEqual(["FILE", "SAMP", "MONG", "MOND"]);
  });

  it("writes the least file that keeps every rule", () => {
    expect(writeAgs(base).report.findings).toEqual([]);
  });

  it("declares the user's own groups", () => {
    const { text, report } = writeAgs({
      ...full,
      userGroups: [
        {
          name: "BRGV",
          description: "Bearing values",
          parent: "PROJ",
          headings: [
            { name: "BRGV_ID", type: "ID", unit: "", description: "Value", key: true },
            { name: "BRGV_VAL", type: "0DP", unit: "kPa", description: "Net allowable" },
          ],
          rows: [
            ["V1", 150],
            ["V2", 162.5],
          ],
        },
      ],
    });
    expect(report.findings).toEqual([]);
    expect(text).toContain('"DATA","V2","162.5"');
    expect(text).toContain('"DATA","GROUP","BRGV","","","","Bearing values","","PROJ"');
  });

  it("hands out its own report when a key stands twice, a parent is missing or a required item is empty", () => {
    const rulesOf = (given: AgsExport) => Object.keys(writeAgs(given).report.countsByRule).sort();
    expect(rulesOf({ ...full, holes: [...(full.holes ?? []), { name: "BH1" }] })).toEqual(["10a", "8"]);
    expect(rulesOf({ ...full, strata: [{ hole: "BH9", top_m: 0, base_m: 1, description: "" }] })).toEqual([
      "10c",
    ]);
    expect(rulesOf({ ...base, transmittal: { ...base.transmittal, producer: "" } })).toEqual(["10b"]);
  });

  it("says what it could not carry: characters, dates, digits", () => {
    const { findings, report, text } = writeAgs({
      ...base,
      holes: [
        { name: "BH1", remarks: "粘土", startDate: "Spring 2019", groundLevel_m: 1 / 3 },
        { name: "BH2", startDate: "2024-02-30", groundLevel_m: Number.NaN },
      ],
    });
    expect(report.counts.error).toBe(0);
    expect(findings.map(({ heading }) => heading).sort()).toEqual([
      "LOCA_GL",
      "LOCA_GL",
      "LOCA_REM",
      "LOCA_STAR",
      "LOCA_STAR",
    ]);
    expect(text).toContain('"0.333333"');
  });

  it("never makes up a time of day: a column with days and moments is written in days", () => {
    const { text, findings, report } = writeAgs({
      ...full,
      strikes: [
        { hole: "BH1", depth_m: 2.9, at: "2024-02-01" },
        { hole: "BH1", depth_m: 3.9, at: "2024-02-01T11:30" },
      ],
    });
    expect(report.findings).toEqual([]);
    expect(text).not.toContain("T00:00");
    expect(findings).toMatchObject([{ heading: "WSTG_DTIM", severity: "warning" }]);
  });

  const cellText = fc.string({
    unit: fc.constantFrom(..."abAB09 \"',|+;:-()/\\%°é–粘\n\r\t=@"),
    maxLength: 24,
  });
  const depth = fc.integer({ min: 0, max: 100_000 }).map((value) => value / 1000);

  it("keeps every text and number, whatever stands in them", () => {
    const holeNames = fc.uniqueArray(
      fc.string({ unit: fc.constantFrom(...'AB12-+|" ,'), minLength: 1, maxLength: 6 }),
      {
        minLength: 1,
        maxLength: 5,
        selector: (name) => name.trim(),
      },
    );
    const site = holeNames
      .map((names) => names.map((name) => name.trim()).filter((name) => name !== ""))
      .filter((names) => names.length > 0)
      .chain((names) =>
        fc.record({
          names: fc.constant(names),
          level: fc.option(fc.integer({ min: 1, max: 5_000_000 }).map((value) => value / 10_000)),
          texts: fc.array(cellText, { minLength: names.length, maxLength: names.length }),
          kinds: fc.array(cellText, { minLength: names.length, maxLength: names.length }),
          tops: fc.uniqueArray(depth, { minLength: 1, maxLength: 6 }),
          note: cellText,
        }),
      );
    fc.assert(
      fc.property(site, ({ names, level, texts, kinds, tops, note }) => {
        const holes = names.map((name, at) => ({
          name,
          groundLevel_m: level,
          kind: kinds[at] ?? "",
          remarks: texts[at] ?? "",
        }));
        const strata = names.flatMap((hole) =>
          tops.map((top_m) => ({
            hole,
            top_m,
            base_m: top_m + 1,
            description: note,
            geologyCode: kinds[0] ?? "",
          })),
        );
        const strikes = names.map((hole) => ({
          hole,
          depth_m: tops[0] ?? 1,
          remarks: note,
          rises: [{ minutes: 5, depth_m: tops.at(-1) ?? 0 }],
        }));
        const written = writeAgs({
          ...base,
          project: { ...base.project, memo: note },
          holes,
          strata,
          strikes,
        });
        expect(written.report.findings).toEqual([]);
        const ground = groundFromAgs(readAgs(written.bytes));
        expect(ground.holes.map(({ name }) => name)).toEqual(names);
        expect(ground.holes.map(({ groundLevel_m }) => groundLevel_m)).toEqual(names.map(() => level));
        expect(ground.holes.map(({ remarks }) => remarks)).toEqual(texts.map((text) => plainText(text).text));
        expect(ground.strata.map(({ hole, top_m }) => [hole, top_m])).toEqual(
          strata.map(({ hole, top_m }) => [hole, top_m]),
        );
        expect(ground.strata.every(({ description }) => description === plainText(note).text)).toBe(true);
        expect(ground.strikes.every(({ rises }) => rises.length === 1)).toBe(true);
      }),
      { numRuns: 200 },
    );
  });
});

describe("plain text", () => {
  it.each([
    ["10°", "10deg"],
    ["kN/m³", "kN/m3"],
    ["φ′ – “stiff”…", `phi' - "stiff"...`],
    ["Müller, façade", "Muller, facade"],
    ["two\r\nlines\tand tab", "two lines and tab"],
    ["nul\u0000bell\u0007", "nulbell"],
  ])("writes %j as %j", (text, plain) => {
    expect(plainText(text).text).toBe(plain);
  });

  it("keeps Latin-1 letters where they are asked for", () => {
    expect(plainText("Müller 5° – 粘", "latin-1")).toEqual({ text: "Müller 5° - ?", lost: 1 });
  });
});
