import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { readHeading } from "@/lib/exchange/csv/columns";
import { readFootingsCsv } from "@/lib/exchange/csv/footings";
import { readLoadsCsv } from "@/lib/exchange/csv/loads";
import type { CsvFinding } from "@/lib/exchange/csv/model";
import { readNumber } from "@/lib/exchange/csv/number";
import { readCsvTable } from "@/lib/exchange/csv/read";
import { neutralised, writeCsv } from "@/lib/exchange/csv/write";

const bytesOf = (text: string) => new TextEncoder().encode(text);
const errors = (findings: readonly CsvFinding[]) =>
  findings
    .filter(({ severity }) => severity === "error")
    .map(({ row, column, message }) => [row, column, message]);

describe("a number in a cell", () => {
  it.each([
    ["0", 0],
    ["-0", 0],
    ["1.5", 1.5],
    [" 12 ", 12],
    ["+3.25", 3.25],
    [".5", 0.5],
    ["5.", 5],
    ["1e3", 1000],
    ["-2.5E-3", -0.0025],
  ])("%j is %d", (cell, value) => {
    expect(readNumber(cell)).toEqual({ kind: "number", value });
  });

  it.each([
    ["NaN", "not a number"],
    ["Infinity", "not a number"],
    ["-inf", "not a number"],
    ["1e999", "too large"],
    ["1e-999", "too small"],
    ["1,5", "comma"],
    ["1,234", "comma"],
    ["1,234.5", "thousands marks"],
    ["1.234,5", "thousands marks"],
    ["1,234,567", "thousands marks"],
    ["1 234", "thousands marks"],
    ["1\u00a0234.5", "thousands marks"],
    ["1'234", "thousands marks"],
    ["２.５", "another script"],
    ["٣", "another script"],
    ["−1.5", "minus sign"],
    ["–2", "minus sign"],
    ["1.5 m", "unit in the cell"],
    ["1500mm", "unit in the cell"],
    ["45°", "unit in the cell"],
    ["=A1*2", "formula"],
    ["+SUM(A1)", "formula"],
    ["@x", "formula"],
    ["<5", "limit"],
    ["~2", "limit"],
    ["0x10", "not a number"],
    ["1_000", "not a number"],
    ["1.2.3", "not a number"],
    ["--1", "not a number"],
    ["n/a", "not a number"],
    ["-", "not a number"],
    ["'5", "not a number"],
    ["1e", "unit in the cell"],
    ["true", "not a number"],
  ])("%j is refused: %s", (cell, words) => {
    const reading = readNumber(cell);
    expect(reading.kind).toBe("problem");
    expect(reading.kind === "problem" && reading.message).toContain(words);
  });

  it("is nothing, not zero, where the cell is empty", () => {
    expect([readNumber(""), readNumber("  ")]).toEqual([{ kind: "empty" }, { kind: "empty" }]);
  });

  it("takes a decimal comma only where the file writes them", () => {
    expect(readNumber("1,5", ",")).toEqual({ kind: "number", value: 1.5 });
    expect(readNumber("1.5", ",")).toMatchObject({ kind: "problem" });
    expect(readNumber("1.234,5", ",")).toMatchObject({ kind: "problem" });
  });

  it("is read back as it was written, for every finite number", () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        expect(readNumber(String(value))).toEqual({ kind: "number", value: value === 0 ? 0 : value });
      }),
    );
  });

  it("is never made out of a text that is not one", () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 12 }), (text) => {
        const reading = readNumber(text);
        if (reading.kind !== "number") return;
        expect(text.trim()).toMatch(/^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/);
        expect(Number.isFinite(reading.value)).toBe(true);
      }),
      { numRuns: 2000 },
    );
  });
});

describe("a table", () => {
  const cells = (text: string) => readCsvTable(text).rows.map((row) => row.cells);

  it.each([
    [",", "a,b\n1,2\n"],
    [";", "a;b\n1;2\n"],
    ["\t", "a\tb\n1\t2\n"],
    [";", "sep=;\na;b\n1;2\n"],
    [",", "a,b\r\n\r\n1,2\r\n,,\r\n"],
    [",", "\ufeffa,b\r1,2\r"],
  ])("with delimiter %j is read: %j", (delimiter, text) => {
    expect(readCsvTable(text)).toMatchObject({ delimiter, headings: ["a", "b"], refused: null });
    expect(cells(text)).toEqual([["1", "2"]]);
  });

  it("keeps the line of each row over breaks inside cells and empty lines", () => {
    const table = readCsvTable('a,b\n"x\ny",1\n\nz,2\n');
    expect(table.rows.map(({ row }) => row)).toEqual([2, 5]);
  });

  it("is the same from bytes and from text, with a byte order mark or in windows-1252", () => {
    expect(readCsvTable(bytesOf("\ufeffa,b\n1,é\n"))).toMatchObject({
      encoding: "utf-8-bom",
      rows: [{ cells: ["1", "é"] }],
    });
    expect(readCsvTable(Uint8Array.of(...bytesOf("a,b\n1,"), 0xe9))).toMatchObject({
      encoding: "windows-1252",
      rows: [{ cells: ["1", "é"] }],
    });
  });

  it("takes a row of units for what it is", () => {
    expect(readCsvTable("mark,breadth\n-,mm\nF1,1500\n")).toMatchObject({ units: ["-", "mm"], rowCount: 1 });
    expect(readCsvTable("mark,breadth\nF1,1500\n").units).toBeNull();
  });

  it("leaves out a row of another length and says so", () => {
    const table = readCsvTable("a,b,c\n1,2\n1,2,3,4\n1,2,3,\n1,2,3\n");
    expect(table.rows.map(({ row }) => row)).toEqual([4, 5]);
    expect(table.rowCount).toBe(4);
    expect(errors(table.findings).map(([row]) => row)).toEqual([2, 3]);
  });

  it("finds decimal commas, and a mixture of both marks", () => {
    expect(readCsvTable("a;b\n1,5;2,25\n")).toMatchObject({
      decimalMark: ",",
      findings: [{ severity: "note" }],
    });
    const mixed = readCsvTable("a;b\n1,5;2,25\n1.5;2\n");
    expect(mixed.findings).toMatchObject([
      { severity: "warning", row: 2, message: expect.stringContaining("mixes") },
    ]);
  });

  it.each([
    ["an empty file", new Uint8Array(0)],
    ["blank lines", bytesOf("\n\n  \n")],
    ["a workbook", Uint8Array.of(0x50, 0x4b, 3, 4, 0, 0, 0, 0)],
    ["UTF-16", Uint8Array.of(0xff, 0xfe, 97, 0, 44, 0)],
    ["a picture", Uint8Array.of(0x89, 0x50, 0x4e, 0x47, 0, 0, 0, 13, 0, 1, 2, 3)],
    ["a quote never closed", bytesOf('a,b\n"1,2\n3,4\n')],
    ["zero characters", bytesOf(`a,b\n1,\u0000${"x".repeat(70_000)}\n`)],
  ])("is refused in one sentence: %s", (_, bytes) => {
    const table = readCsvTable(bytes);
    expect(table.refused).toMatch(/^\S.*\.$/);
    expect(table).toMatchObject({ rows: [], findings: [{ severity: "error" }] });
  });

  it("never throws, whatever the bytes are", () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 300 }), (bytes) => {
        expect(readFootingsCsv(bytes).rows.length + readLoadsCsv(bytes).rows.length).toBeGreaterThanOrEqual(
          0,
        );
      }),
      { numRuns: 400 },
    );
    const piece = fc.constantFrom(
      '"',
      '""',
      ",",
      ";",
      "\t",
      "\n",
      "\r\n",
      "mark",
      "length",
      "F1",
      "1.5",
      "1,5",
      "__proto__",
      "m",
      " ",
    );
    fc.assert(
      fc.property(fc.array(piece, { maxLength: 60 }), (pieces) => {
        const { rows, rowCount } = readFootingsCsv(pieces.join(""));
        expect(rows.length).toBeLessThanOrEqual(rowCount);
      }),
      { numRuns: 1000 },
    );
  });
});

describe("a heading", () => {
  it.each([
    ["breadth_m", "breadth", "m"],
    ["Breadth (m)", "breadth", "m"],
    ["Breadth [mm]", "breadth", "mm"],
    ["Breadth, m", "breadth", "m"],
    ["Breadth / m", "breadth", "m"],
    ["Breadth in mm", "breadth", "mm"],
    ["groundLevel_m", "ground level", "m"],
    ["FOUNDING LEVEL", "founding level", ""],
    ["momentB_kNm", "moment b", "kNm"],
    ["Moment B (kN·m)", "moment b", "kN·m"],
    ["concreteUnitWeight_kNm3", "concrete unit weight", "kNm3"],
    ["Axial N", "axial n", ""],
    ["vertical_N", "vertical", "N"],
    ["Mark (as drawn)", "mark as drawn", ""],
  ])("%j reads as %j in %j", (heading, words, unit) => {
    expect(readHeading(heading)).toEqual({ words, unit });
  });
});

describe("a schedule of footings", () => {
  const heading =
    "mark,easting_m,northing_m,breadth_m,length_m,thickness_m,groundLevel_m,foundingLevel_m,orientation_deg,zone";

  it("is read row by row, with nothing where a cell is empty", () => {
    const reading = readFootingsCsv(`${heading}\nF1,100.5,200,1.5,2,0.5,16.2,15,30,North\nF2,,,1.2,,,,,,\n`);
    expect(reading).toMatchObject({ refused: null, rowCount: 2, findings: [] });
    expect(reading.rows[0]).toMatchObject({
      row: 2,
      mark: "F1",
      easting_m: 100.5,
      breadth_m: 1.5,
      foundingLevel_m: 15,
      orientation_deg: 30,
      zone: "North",
    });
    expect(reading.rows[1]).toMatchObject({
      row: 3,
      mark: "F2",
      easting_m: null,
      breadth_m: 1.2,
      length_m: null,
      zone: "",
    });
  });

  it("understands friendly headings and brings units to metres and degrees", () => {
    const { rows, findings } = readFootingsCsv(
      "Footing;Width (mm);L (cm);Underside level [ft];Rotation (rad)\nF1;1500;225;10;1\n",
    );
    expect(rows[0]).toMatchObject({ mark: "F1", breadth_m: 1.5, length_m: 2.25, foundingLevel_m: 3.048 });
    expect(rows[0]?.orientation_deg).toBeCloseTo(57.29578, 5);
    expect(findings.every(({ severity }) => severity === "note")).toBe(true);
  });

  it("takes the units from a row below the headings", () => {
    expect(readFootingsCsv("mark,breadth,length\n,mm,m\nF1,1500,2\n").rows).toMatchObject([
      { row: 3, breadth_m: 1.5, length_m: 2 },
    ]);
  });

  it.each([
    ["breadth", "F1,1,2,0,2,0.5,16,15,0,", "breadth_m", "above 0"],
    ["length", "F1,1,2,1,-2,0.5,16,15,0,", "length_m", "above 0"],
    ["easting", "F1,1e999,2,1,2,0.5,16,15,0,", "easting_m", "too large"],
    ["level", "F1,1,2,1,2,0.5,16 m,15,0,", "groundLevel_m", "unit in the cell"],
    ["mark", ",1,2,1,2,0.5,16,15,0,", "mark", "no mark"],
  ])("reports the cell of a bad %s and leaves the row out", (_, row, column, words) => {
    const reading = readFootingsCsv(`${heading}\n${row}\nF9,1,2,1,2,0.5,16,15,0,\n`);
    expect(errors(reading.findings)).toEqual([[2, column, expect.stringContaining(words)]]);
    expect(reading.rows.map(({ mark }) => mark)).toEqual(["F9"]);
    expect(reading.rowCount).toBe(2);
  });

  it("takes a mark once, in capitals or not", () => {
    const { rows, findings } = readFootingsCsv("mark,length\nF1,1\nf1,2\n");
    expect(rows).toHaveLength(1);
    expect(errors(findings)).toEqual([[3, "mark", "f1 stands in row 2 already."]]);
  });

  it("refuses a depth that does not agree with the two levels", () => {
    const text = (depth: number) => `mark,ground level,founding level,founding depth\nF1,16.2,15,${depth}\n`;
    expect(readFootingsCsv(text(1.2)).rows).toHaveLength(1);
    expect(errors(readFootingsCsv(text(1.5)).findings)).toEqual([
      [2, "founding level", expect.stringContaining("14.70 m, not 15 m")],
    ]);
  });

  it.each([
    ["no marks", "breadth,length\n1,2\n", "mark"],
    ["nothing but marks", "mark,colour\nF1,red\n", "nothing to read"],
    ["two columns for one field", "mark,breadth_m,Width\nF1,1,2\n", "keep one"],
    ["a unit that is not known", "mark,breadth (kN)\nF1,1\n", "not known"],
  ])("is refused whole with %s", (_, text, words) => {
    const reading = readFootingsCsv(text);
    expect(reading.refused).toContain(words);
    expect(reading.rows).toEqual([]);
  });

  it("says which columns it does not use", () => {
    expect(readFootingsCsv("mark,length,Colour\nF1,1,red\n").findings).toMatchObject([
      { severity: "note", column: "Colour" },
    ]);
  });
});

describe("a table of loads", () => {
  const heading =
    "mark,combination,duration,vertical_kN,momentB_kNm,momentL_kNm,horizontalB_kN,horizontalL_kN,loadBasis";

  it("is read one combination a row", () => {
    const { rows, findings } = readLoadsCsv(
      `${heading}\nF1,G,permanent,400,10,0,-5,0,\nF1,G+W,Short-term,380,60,0,20,0,service\n`,
    );
    expect(findings).toEqual([]);
    expect(rows).toEqual([
      {
        row: 2,
        mark: "F1",
        combination: "G",
        duration: "permanent",
        loadBasis: "",
        vertical_kN: 400,
        momentB_kNm: 10,
        momentL_kNm: 0,
        horizontalB_kN: -5,
        horizontalL_kN: 0,
      },
      {
        row: 3,
        mark: "F1",
        combination: "G+W",
        duration: "transient",
        loadBasis: "service",
        vertical_kN: 380,
        momentB_kNm: 60,
        momentL_kNm: 0,
        horizontalB_kN: 20,
        horizontalL_kN: 0,
      },
    ]);
  });

  it("brings newtons and kips to kilonewtons", () => {
    const { rows } = readLoadsCsv(
      "mark,combination,duration,vertical (kip),Moment B (kip-ft)\nF1,G,permanent,100,100\n",
    );
    expect(rows[0]?.vertical_kN).toBeCloseTo(444.822, 3);
    expect(rows[0]?.momentB_kNm).toBeCloseTo(135.582, 3);
    expect(
      readLoadsCsv("mark,combination,duration,vertical_N\nF1,G,permanent,1500\n").rows[0]?.vertical_kN,
    ).toBe(1.5);
  });

  it.each([
    ["an unknown duration", "F1,G,for ever,400,0,0,0,0,", "duration", "no duration"],
    ["no duration", "F1,G,,400,0,0,0,0,", "duration", "missing"],
    ["no vertical load", "F1,G,permanent,,0,0,0,0,", "vertical_kN", "missing"],
    ["a bad moment", "F1,G,permanent,400,x,0,0,0,", "momentB_kNm", "not a number"],
    ["no combination", "F1,,permanent,400,0,0,0,0,", "combination", "no name"],
    ["no mark", ",G,permanent,400,0,0,0,0,", "mark", "names no footing"],
  ])("leaves out a row with %s", (_, row, column, words) => {
    const { rows, findings } = readLoadsCsv(`${heading}\n${row}\n`);
    expect(rows).toEqual([]);
    expect(errors(findings)).toEqual([[2, column, expect.stringContaining(words)]]);
  });

  it("takes a combination of one footing once", () => {
    const row = (mark: string, name: string) => `${mark},${name},permanent,400,0,0,0,0,\n`;
    const { rows, findings } = readLoadsCsv(
      `${heading}\n${row("F1", "G")}${row("F2", "G")}${row("f1", "g")}`,
    );
    expect(rows).toHaveLength(2);
    expect(errors(findings)).toEqual([[4, "combination", "g on f1 stands in row 2 already."]]);
  });

  it("warns where an empty moment is read as 0, and where a column is missing", () => {
    const empty = readLoadsCsv(`${heading}\nF1,G,permanent,400,,0,0,0,\n`);
    expect(empty.rows[0]?.momentB_kNm).toBe(0);
    expect(empty.findings).toMatchObject([{ severity: "warning", row: 2, column: "momentB_kNm" }]);
    const absent = readLoadsCsv("mark,combination,duration,vertical_kN\nF1,G,permanent,400\n");
    expect(absent.findings.map(({ severity, row }) => [severity, row])).toEqual(
      Array(4).fill(["warning", null]),
    );
  });

  it.each([
    "combination,duration,vertical",
    "mark,duration,vertical",
    "mark,combination,vertical",
    "mark,combination,duration",
  ])("is refused with the headings %s alone", (headings) => {
    expect(readLoadsCsv(`${headings}\na,b,c\n`).refused).toContain("Head it");
  });
});

describe("writing CSV", () => {
  it.each([
    ["=1+1", "'=1+1"],
    ["+A1", "'+A1"],
    ["-cmd", "'-cmd"],
    ["@x", "'@x"],
    ["\t=1", "'\t=1"],
    ["\r=1", "'\r=1"],
    ["＝1", "'＝1"],
    ["-5.2", "-5.2"],
    ["+3", "+3"],
    ["1e5", "1e5"],
    ["Firm CLAY", "Firm CLAY"],
    ["", ""],
  ])("neutralises %j as %j", (text, written) => {
    expect(neutralised(text)).toBe(written);
  });

  it("quotes what needs it, ends lines in CR LF and writes nothing for null", () => {
    expect(
      writeCsv([
        ["a", 1.5, null, true],
        ['say "x", y', "=1;2", " b ", -0.5],
      ]),
    ).toBe('a,1.5,,yes\r\n"say ""x"", y","\'=1;2"," b ",-0.5\r\n');
    expect(writeCsv([["é"]], { byteOrderMark: true })).toBe("\ufeffé\r\n");
    expect(() => writeCsv([[Number.NaN]])).toThrow("not finite");
  });

  it("is read back as the same cells, and no cell begins as a formula", () => {
    const cell = fc.string({ unit: fc.constantFrom(..."ab1 ,;\"'=+-@\n."), maxLength: 8 });
    fc.assert(
      fc.property(fc.array(fc.tuple(cell, cell), { minLength: 1, maxLength: 8 }), (rows) => {
        const text = writeCsv([["first", "second"], ...rows.map(([a, b], at) => [`r${at}${a}`, b])]);
        const table = readCsvTable(text);
        const read = table.rows.map((row) => row.cells);
        expect(read).toEqual(rows.map(([a, b], at) => [`r${at}${a}`.trim(), neutralised(b).trim()]));
        for (const found of read.flat()) expect(found).not.toMatch(/^[=@]|^[+-](?![\d.])/);
      }),
      { numRuns: 500 },
    );
  });
});
