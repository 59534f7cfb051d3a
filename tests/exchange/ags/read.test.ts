import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { groundFromAgs } from "@/lib/exchange/ags/ground";
import { readAgs } from "@/lib/exchange/ags/read";
import { validateAgs } from "@/lib/exchange/ags/validate";
import { exampleBytes, exampleLines, lineOf } from "./example-file";

const bytesOf = (text: string) => new TextEncoder().encode(text);
const rulesOf = (bytes: Uint8Array) => [...new Set(readAgs(bytes).findings.map(({ rule }) => rule))].sort();
const clay = '"DATA","BH1","1.20","6.00","Firm brown CLAY.","202"';
const group = (file: ReturnType<typeof readAgs>, name: string) =>
  file.groups.find((each) => each.name === name);

describe("reading an AGS 4 file", () => {
  it("takes groups, headings with unit and type, and rows with their line", () => {
    const file = readAgs(exampleBytes());
    expect(file).toMatchObject({
      kind: "ags4",
      edition: "4.1.1",
      encoding: "ascii",
      lineEnds: "crlf",
      stopped: null,
    });
    expect(file.findings).toEqual([]);
    const geol = group(file, "GEOL");
    expect(geol?.headings[1]).toEqual({ name: "GEOL_TOP", unit: "m", type: "2DP" });
    expect(geol?.rows[1]).toEqual({
      line: lineOf(clay),
      cells: ["BH1", "1.20", "6.00", "Firm brown CLAY.", "202"],
    });
    expect(geol?.rows[0]?.cells[3]).toBe('MADE GROUND: brick and "ash", loose.');
  });

  it("reads LF files alike, with one note under rule 2a", () => {
    const file = readAgs(exampleBytes({}, "\n"));
    expect(file.groups).toEqual(readAgs(exampleBytes()).groups);
    expect(file.findings).toMatchObject([{ rule: "2a", severity: "note", line: 1 }]);
  });

  it("reads CR files alike", () => {
    expect(readAgs(exampleBytes({}, "\r")).groups).toEqual(readAgs(exampleBytes()).groups);
  });

  it("says where line ends begin to differ", () => {
    const mixed = bytesOf(exampleLines.map((line, at) => line + (at === 4 ? "\n" : "\r\n")).join(""));
    expect(readAgs(mixed)).toMatchObject({ lineEnds: "mixed", findings: [{ rule: "2a", line: 5 }] });
  });

  it("passes over a byte order mark", () => {
    const file = readAgs(Uint8Array.of(0xef, 0xbb, 0xbf, ...exampleBytes()));
    expect(file).toMatchObject({ encoding: "utf-8-bom", findings: [{ rule: "1", severity: "note" }] });
    expect(file.groups).toEqual(readAgs(exampleBytes()).groups);
  });

  it("reads bytes that are not UTF-8 as windows-1252, and reports both kinds of characters", () => {
    const [before = "", after = ""] = new TextDecoder().decode(exampleBytes()).split("Slow inflow");
    const file = readAgs(Uint8Array.of(...bytesOf(before), 0xb0, 0x96, ...bytesOf(after)));
    expect(file.encoding).toBe("windows-1252");
    expect(group(file, "WSTG")?.rows[0]?.cells[2]).toBe("°–");
    expect(file.findings).toMatchObject([
      { rule: "1", severity: "error", line: lineOf('"DATA","BH1","2.90","Slow inflow"') },
    ]);
    expect(file.findings[0]?.message).toContain("U+2013");
  });

  it("warns of a Latin-1 character in UTF-8 and names it", () => {
    const file = readAgs(exampleBytes({ [clay]: clay.replace("Firm", "Firm 5° dip") }));
    expect(file.encoding).toBe("utf-8");
    expect(file.findings).toMatchObject([{ rule: "1", severity: "warning", line: lineOf(clay) }]);
  });

  it("mends a quote that is not doubled and keeps the description", () => {
    const file = readAgs(exampleBytes({ [clay]: '"DATA","BH1","1.20","6.00","Firm "brown" CLAY.","202"' }));
    expect(group(file, "GEOL")?.rows[1]?.cells[3]).toBe('Firm "brown" CLAY.');
    expect(file.findings).toMatchObject([{ rule: "5", line: lineOf(clay), group: "GEOL" }]);
  });

  it("mends an inch mark at the end of an item", () => {
    const file = readAgs(exampleBytes({ [clay]: '"DATA","BH1","1.20","6.00","pipe 5"","202"' }));
    expect(group(file, "GEOL")?.rows[1]?.cells).toEqual(["BH1", "1.20", "6.00", 'pipe 5"', "202"]);
  });

  it("joins a description broken over lines and reports it, and counts lines on", () => {
    const broken = '"DATA","BH1","1.20","6.00","Firm\r\nbrown\r\nCLAY.","202"';
    const file = readAgs(exampleBytes({ [clay]: broken }));
    expect(group(file, "GEOL")?.rows[1]?.cells[3]).toBe("Firm\r\nbrown\r\nCLAY.");
    expect(group(file, "GEOL")?.rows[2]?.line).toBe(lineOf(clay) + 3);
    expect(file.countsByRule).toEqual({ "3": 1, "5": 1, "6": 1 });
  });

  it("does not let an open quote swallow the rows below it", () => {
    const file = readAgs(exampleBytes({ [clay]: '"DATA","BH1","1.20","6.00","Firm brown CLAY' }));
    expect(group(file, "GEOL")?.rows).toHaveLength(3);
    expect(group(file, "GEOL")?.rows[1]).toMatchObject({ found: 4, line: lineOf(clay) });
    expect(rulesOf(exampleBytes({ [clay]: '"DATA","BH1","1.20","6.00","Firm' }))).toEqual(["4", "5"]);
  });

  it("reads a file that lost its quotes in a spreadsheet and was filled up with commas", () => {
    const text = exampleLines.map(
      (line) => `${line.replaceAll('"', "").replaceAll("ash, loose", "ash loose")},,,`,
    );
    const file = readAgs(bytesOf(text.join("\r\n")));
    expect(group(file, "LOCA")?.rows.map(({ cells }) => cells[0])).toEqual(["BH1", "BH2"]);
    expect(group(file, "LOCA")?.rows.every(({ found }) => found === undefined)).toBe(true);
    expect(file.counts.error).toBeGreaterThan(50);
  });

  it("marks a row with an item too few, because its columns have moved", () => {
    const file = readAgs(exampleBytes({ [clay]: '"DATA","BH1","6.00","Firm brown CLAY.","202"' }));
    expect(group(file, "GEOL")?.rows[1]).toMatchObject({ found: 4 });
    expect(file.findings).toMatchObject([{ rule: "4", line: lineOf(clay) }]);
    const ground = groundFromAgs(file);
    expect(ground.strata).toHaveLength(2);
    expect(ground.findings.filter(({ severity }) => severity === "error")).toMatchObject([
      { line: lineOf(clay) },
    ]);
  });

  it.each([
    ["no group", "", "2"],
    ["an unknown descriptor", '"ROW","BH1"', "3"],
    ["a comment", "// loose note", "3"],
  ])("reports a line with %s", (_, line, rule) => {
    const stray = line === "" ? '"DATA","x"' : line;
    const file = readAgs(bytesOf(`${stray}\r\n${new TextDecoder().decode(exampleBytes())}`));
    expect(file.findings[0]).toMatchObject({ rule, line: 1 });
  });

  it("keeps both groups when a group stands twice, and validation says so", () => {
    const twice = `${new TextDecoder().decode(exampleBytes())}"GROUP","WSTG"\r\n"HEADING","LOCA_ID","WSTG_DPTH"\r\n"UNIT","","m"\r\n"TYPE","ID","2DP"\r\n"DATA","BH2","3.00"\r\n`;
    const file = readAgs(bytesOf(twice));
    expect(file.groups.filter(({ name }) => name === "WSTG")).toHaveLength(2);
    expect(validateAgs(file).countsByRule).toEqual({ "2c": 1 });
    expect(groundFromAgs(file).strikes.map(({ hole }) => hole)).toEqual(["BH1", "BH2"]);
  });
});

describe("what is no AGS 4 file", () => {
  it.each([
    ["an AGS 3 file", bytesOf('"**PROJ"\r\n"*PROJ_ID"\r\n"P1"\r\n'), "ags3", "AGS 3"],
    ["an empty file", new Uint8Array(0), "empty", "empty"],
    ["a ZIP archive", Uint8Array.of(0x50, 0x4b, 3, 4, 20, 0, 0, 0), "zip", "ZIP"],
    [
      "a picture",
      Uint8Array.of(0x89, 0x50, 0x4e, 0x47, 13, 10, 26, 10, 0, 0, 0, 13, 1, 2, 3),
      "binary",
      "not a text",
    ],
    ["a PDF", bytesOf("%PDF-1.7\n1 0 obj"), "binary", "not a text"],
    ["UTF-16 text", Uint8Array.of(0xff, 0xfe, 0x22, 0, 0x47, 0), "utf-16", "UTF-16"],
    [
      "UTF-16 text without a mark",
      Uint8Array.from([...'"GROUP","PROJ"'].flatMap((c) => [c.charCodeAt(0), 0])),
      "utf-16",
      "UTF-16",
    ],
    ["prose", bytesOf("Dear all,\nplease find attached the logs.\n"), "no-groups", "does not look like"],
  ])("is refused with its reason: %s", (_, bytes, kind, words) => {
    const file = readAgs(bytes);
    expect(file).toMatchObject({ kind, groups: [] });
    expect(file.stopped).toContain(words);
    expect(file.findings.filter(({ rule }) => rule === "file")).toHaveLength(1);
  });

  it("has its refusal alone in the report of an AGS 3 file", () => {
    const report = validateAgs(readAgs(bytesOf('"**PROJ"\r\n"*PROJ_ID"\r\n"P1"\r\n')));
    expect(report.findings).toHaveLength(1);
    expect(report.counts).toEqual({ error: 1, warning: 0, note: 0 });
  });

  it("is refused when it is larger than the limit", () => {
    expect(readAgs(exampleBytes(), { largest_bytes: 100 }).kind).toBe("too-large");
  });
});

describe("a damaged file", () => {
  const whole = exampleBytes();

  it("never throws wherever it is cut, and says that it may have been cut", () => {
    // Before the last unit is listed the lists are not complete; later a cut between two groups leaves a sound file.
    const listed = new TextDecoder().decode(whole).indexOf('"DATA","yyyy-mm-dd"');
    let said = 0;
    for (let length = 0; length <= whole.length; length += 1) {
      const file = readAgs(whole.subarray(0, length));
      groundFromAgs(file);
      const report = validateAgs(file);
      if (length < listed) expect(report.counts.error).toBeGreaterThan(0);
      if (file.findings.some(({ message }) => message.includes("cut off"))) said += 1;
    }
    expect(said).toBeGreaterThan(whole.length / 2);
  });

  it("never throws on bytes at random, nor on a good file with bytes changed", () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 400 }), (bytes) => {
        const file = readAgs(bytes);
        groundFromAgs(file);
        expect(validateAgs(file).findings.length + file.groups.length).toBeGreaterThan(0);
      }),
      { numRuns: 300 },
    );
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.nat(whole.length - 1), fc.nat(255)), { maxLength: 8 }), (changes) => {
        const bytes = whole.slice();
        for (const [at, byte] of changes) bytes[at] = byte;
        const file = readAgs(bytes);
        groundFromAgs(file);
        expect(validateAgs(file).findings).toBeInstanceOf(Array);
      }),
      { numRuns: 300 },
    );
  });

  it("never throws on lines of the format's own pieces in any order", () => {
    const piece = fc.constantFrom(
      ...'GROUP HEADING UNIT TYPE DATA LOCA LOCA_ID GEOL GEOL_TOP ID 2DP SF m BH1 1.00 __proto__ constructor " , | +'.split(
        " ",
      ),
      '"',
      '""',
      '","',
      "\n",
      "\r\n",
      " ",
    );
    fc.assert(
      fc.property(fc.array(piece, { maxLength: 120 }), (pieces) => {
        const file = readAgs(bytesOf(pieces.join("")));
        groundFromAgs(file);
        expect(validateAgs(file).findings).toBeInstanceOf(Array);
      }),
      { numRuns: 500 },
    );
    expect(({} as Record<string, unknown>).found).toBeUndefined();
  });

  it("takes time in proportion to the file, whatever is wrong with it", () => {
    const shapes = ['"DATA","x', '"DATA",5', "DATA", '"', '"a"b"c', `"DATA","${'""'.repeat(20)}`];
    const time = (text: string) => {
      const bytes = bytesOf(text);
      const start = performance.now();
      readAgs(bytes);
      return performance.now() - start;
    };
    for (const shape of shapes) {
      const line = `${shape}\n`;
      const head = '"GROUP","LOCA"\n"HEADING","LOCA_ID"\n';
      const small = Math.min(...[0, 1, 2].map(() => time(head + line.repeat(10_000))));
      const large = Math.min(...[0, 1].map(() => time(head + line.repeat(80_000))));
      // Eight times the lines: a quadratic reader would take sixty-four times as long.
      expect(large, shape).toBeLessThan(Math.max(small, 5) * 30);
    }
  });

  it("lists a bounded number of findings and counts all of them", () => {
    const file = readAgs(bytesOf(`"GROUP","LOCA"\n"HEADING","LOCA_ID"\n${"loose\n".repeat(5000)}`));
    expect(file.countsByRule["3"]).toBe(5000);
    expect(file.findings.filter(({ rule }) => rule === "3")).toHaveLength(1001);
    expect(file.findings.at(-1)?.message).toMatch(/^4000 more findings/);
  });
});
