import { describe, expect, it } from "vitest";
import { judgeFor, withFigures } from "@/lib/exchange/ags/data-types";
import { dictionaryOf, editionFor, standardDictionary } from "@/lib/exchange/ags/dictionary";
import { readAgs } from "@/lib/exchange/ags/read";
import { validateAgs } from "@/lib/exchange/ags/validate";
import { exampleBytes, exampleLines, lineOf } from "./example-file";

const check = (changes: Readonly<Record<string, string | null>> = {}) =>
  validateAgs(readAgs(exampleBytes(changes)));
const fits = (type: string, unit: string, text: string): boolean => {
  const judge = judgeFor(type, unit);
  if (judge === null) return true;
  if (typeof judge !== "function") throw new Error(judge.fault);
  return judge(text) === null;
};

const bh2 = '"DATA","BH2","CP","FINAL","1010.00","2000.50","16.40","5.00","2024-02-02"';
const clay2 = '"DATA","BH2","0.00","5.00","Firm brown CLAY.","202"';
const proj = '"DATA","P-17","Mill Lane depot"';
const tran = '"DATA","2","2024-03-05","Boring Works","Final","4.1.1","Design office","|","+"';
const geolHeading = '"HEADING","LOCA_ID","GEOL_TOP","GEOL_BASE","GEOL_DESC","GEOL_LEG"';

const asText = { '"TYPE","ID","2DP","2DP","X","PA"': '"TYPE","ID","2DP","2DP","X","X"' };

describe("a file that keeps the rules", () => {
  it("has no finding at all", () => {
    expect(check()).toMatchObject({ findings: [], counts: { error: 0, warning: 0, note: 0 }, stopped: null });
  });
});

describe("each rule finds its own breach, on its line, and no other", () => {
  const own: readonly [string, string, Record<string, string | null>, number | null][] = [
    [
      "2",
      "a group without data",
      { '"DATA","BH1","2.90","10","2.60"': null, '"DATA","BH1","2.90","20","2.40"': null },
      lineOf('"GROUP","WSTD"'),
    ],
    [
      "7",
      "headings out of order",
      { [geolHeading]: '"HEADING","LOCA_ID","GEOL_BASE","GEOL_TOP","GEOL_DESC","GEOL_LEG"' },
      lineOf(geolHeading),
    ],
    ["8", "a level with one decimal", { [bh2]: bh2.replace("16.40", "16.4") }, lineOf(bh2)],
    ["8", "a word for a level", { [bh2]: bh2.replace("16.40", "Null") }, lineOf(bh2)],
    ["8", "a day that does not exist", { [bh2]: bh2.replace("2024-02-02", "2023-02-29") }, lineOf(bh2)],
    ["10a", "a stratum given twice", { [clay2]: `${clay2}\r\n${clay2}` }, lineOf(clay2)],
    ["10b", "an empty producer", { [tran]: tran.replace("Boring Works", "") }, lineOf(tran)],
    ["10c", "a stratum of a hole that is not there", { [clay2]: clay2.replace("BH2", "BH9") }, lineOf(clay2)],
    [
      "11b",
      "no mark to join codes",
      {
        [tran]: tran.replace('"+"', '""'),
        [exampleLines[48] ?? ""]: (exampleLines[48] ?? "").replace("CP+RC", "CP"),
      },
      lineOf(tran),
    ],
    ["13", "two projects", { [proj]: `${proj}\r\n"DATA","P-18","Other"` }, lineOf(proj) + 1],
    ["14", "two transmittals", { [tran]: `${tran}\r\n${tran.replace('"2"', '"3"')}` }, lineOf(tran) + 1],
    [
      "15",
      "a unit that is not listed",
      { '"DATA","mm","millimetre"': null },
      lineOf('"UNIT","","m","","","mm","","","m",""') - 1,
    ],
    [
      "16",
      "a code that is not listed",
      { '"DATA","LOCA_TYPE","RC","Rotary core"': null },
      lineOf('"DATA","BH1","CP+RC","FINAL","1000.00","2000.50","16.20","6.00","2024-02-01"') - 1,
    ],
    [
      "17",
      "a type that is not listed",
      { '"DATA","XN","Text or number"': null },
      lineOf('"TYPE","ID","2DP","0DP","0DP","0DP","0DP","X","XN","PA"') - 1,
    ],
  ];
  it.each(own)("rule %s: %s", (rule, _, changes, line) => {
    const report = check(changes);
    expect([...new Set(report.findings.map((finding) => finding.rule))]).toEqual([rule]);
    expect(report.findings[0]).toMatchObject({ rule, line });
    expect(report.findings[0]?.message).toMatch(/^\S.{10,}[.]$/);
  });

  it("rule 9 and 7: a heading that nobody declares", () => {
    const report = check({ [geolHeading]: geolHeading.replace("GEOL_LEG", "GEOL_XYZ"), ...asText });
    expect(report.findings.map(({ rule, severity }) => [rule, severity])).toEqual([
      ["9", "error"],
      ["7", "warning"],
    ]);
  });

  it("rule 9 is kept by a heading that DICT declares", () => {
    const declared = [
      '"GROUP","DICT"',
      '"HEADING","DICT_TYPE","DICT_GRP","DICT_HDNG","DICT_STAT","DICT_DTYP","DICT_DESC","DICT_UNIT","DICT_PGRP"',
      '"UNIT","","","","","","","",""',
      '"TYPE","X","X","X","X","X","X","X","X"',
      '"DATA","HEADING","GEOL","GEOL_XYZ","OTHER","X","Own remark","",""',
      "",
      '"GROUP","LOCA"',
    ].join("\r\n");
    const changes = {
      [geolHeading]: geolHeading.replace("GEOL_LEG", "GEOL_XYZ"),
      '"GROUP","LOCA"': declared,
      ...asText,
    };
    expect(check(changes).findings).toEqual([]);
  });

  it("rule 19: names of groups and headings", () => {
    const report = check({ '"GROUP","WSTD"': '"GROUP","Wstd"' });
    expect(report.findings.filter(({ rule }) => rule === "19")).toMatchObject([
      { line: lineOf('"GROUP","WSTD"') },
    ]);
    const long = check({ [geolHeading]: geolHeading.replace("GEOL_LEG", "GEOL_LEGEND") });
    expect(long.countsByRule).toMatchObject({ "19a": 1, "19b": 1 });
  });

  it("rule 20: files are judged only when it is known which came along", () => {
    const files = [
      '"GROUP","FILE"',
      '"HEADING","FILE_FSET","FILE_NAME"',
      '"UNIT","",""',
      '"TYPE","X","X"',
      '"DATA","FS1","report.pdf"',
      "",
      '"GROUP","LOCA"',
    ].join("\r\n");
    const file = readAgs(exampleBytes({ '"GROUP","LOCA"': files }));
    expect(validateAgs(file).findings).toMatchObject([{ rule: "20", severity: "note" }]);
    expect(validateAgs(file, { attached: new Set(["FS1/report.pdf"]) }).findings).toEqual([]);
    expect(validateAgs(file, { attached: new Set() }).findings).toMatchObject([
      { rule: "20", severity: "error" },
    ]);
  });

  it("rule 11: a link is compared as text and must point at one row", () => {
    const sample = (link: string) =>
      [
        '"GROUP","SAMP"',
        '"HEADING","LOCA_ID","SAMP_TOP","SAMP_REF","SAMP_TYPE","SAMP_ID","SAMP_LINK"',
        '"UNIT","","m","","","",""',
        '"TYPE","ID","2DP","X","X","ID","RL"',
        `"DATA","BH1","2.00","1","D","S1","${link}"`,
        "",
        '"GROUP","ISPT"',
      ].join("\r\n");
    const faults = (link: string) =>
      check({
        '"GROUP","ISPT"': sample(link),
        '"DATA","ID","Identifier"': '"DATA","ID","Identifier"\r\n"DATA","RL","Link"',
      }).findings.map(({ rule, message }) => `${rule} ${message}`);
    expect(faults("ISPT|BH1|2.00")).toEqual([]);
    expect(faults("ISPT|BH1|2.00+WSTG|BH1|2.90")).toEqual([]);
    expect(faults("ISPT|BH1|2")).toEqual([expect.stringContaining("11c")]);
    expect(faults("ISPT|BH1")).toEqual([expect.stringContaining("fits 2 rows")]);
    expect(faults("NONE|BH1")).toEqual([expect.stringContaining("does not have")]);
    expect(faults("ISPT")).toEqual([expect.stringContaining("gives no key")]);
    expect(faults("ISPT|BH1|2.00|9")).toEqual([expect.stringContaining("more than ISPT has keys")]);
  });

  it("lets a sample stand on its own id, without a hole", () => {
    const alone = [
      '"GROUP","SAMP"',
      '"HEADING","LOCA_ID","SAMP_TOP","SAMP_REF","SAMP_TYPE","SAMP_ID"',
      '"UNIT","","m","","",""',
      '"TYPE","ID","2DP","X","X","ID"',
      '"DATA","","","","","S1"',
      '"DATA","","","","","S2"',
      "",
      '"GROUP","ISPT"',
    ].join("\r\n");
    expect(check({ '"GROUP","ISPT"': alone }).findings).toEqual([]);
  });
});

describe("data types (rule 8)", () => {
  it.each([
    ["0DP", "", ["0", "12", "-3"], ["1.0", "+1", "1e2", "", " 1", "１"]],
    ["2DP", "", ["0.00", "-1.50", "123.45"], ["1.5", "1", "1.555", ".50", "1,50"]],
    // Two significant figures, as the test data of the trade body has them: 45 yes, 45.0 no; 100 for 101; 0.20 for 0.2.
    ["2SF", "", ["45", "0.20", "100", "0", "4.5", "-45", "0.045"], ["45.0", "101", "0.2", "5", "x"]],
    ["3SF", "", ["1.00", "12.3", "12300"], ["1", "12.34", "12345"]],
    ["2SCI", "", ["1.50e1", "1.50E-1", "0.00e0"], ["3.4e1", "30.45e1", "2.455e1", "1.50"]],
    ["U", "", ["1", "-1.5", "1e-9"], ["Belfast", ""]],
    ["YN", "", ["Y", "N", "y", "n"], ["yes", "1", "No"]],
    ["DMS", "", ["51:28:52.498", "-0:00:01.9"], ["51:60:00", "51:28", "51:28:52,4", "190:00:00"]],
    ["DT", "yyyy-mm-dd", ["2024-02-29"], ["2023-02-29", "2024-2-9", "01-12-2020", "2024-02-29T10:00"]],
    ["DT", "yyyy-mm", ["2023-11"], ["2023-13", "2023"]],
    ["DT", "yyyy-mm-ddThh:mm", ["2023-09-21T10:01"], ["2023-09-21", "2023-11-17T9:00", "2023-09-21T24:00"]],
    ["DT", "yyyy-mm-ddThh:mm:ss.sss", ["2023-09-21T10:01:00.250"], ["2023-09-21T10:01:00"]],
    [
      "DT",
      "yyyy-mm-ddThh:mmZ(+hh:mm)",
      ["2023-11-16T11:34Z(-03:00)"],
      ["2023-11-16T11:34", "2023-11-16T11:34Z(+25:00)"],
    ],
    ["DT", "hh:mm", ["11:34"], ["25:00", "11:60"]],
    ["T", "hh:mm", ["00:45", "123:45"], ["1:00", "01:00:00", "23:77"]],
    ["T", "hh:mm:ss", ["23:34:56"], ["23:34", "23:34:77"]],
  ])("%s in %s takes %j and refuses %j", (type, unit, good, bad) => {
    for (const text of good) expect(fits(type, unit, text), text).toBe(true);
    for (const text of bad) expect(fits(type, unit, text), text).toBe(false);
  });

  it("names a type or a unit of a date that it does not know, once for the column", () => {
    const pattern = '"TYPE","ID","PA","PA","2DP","2DP","2DP","2DP","DT"';
    expect(check({ [pattern]: pattern.replace('"DT"', '"S"') }).findings).toMatchObject([
      { rule: "8", line: lineOf(pattern) },
      { rule: "17" },
    ]);
    const unit = '"UNIT","","","","m","m","m","m","yyyy-mm-dd"';
    expect(check({ [unit]: unit.replace("yyyy-mm-dd", "dd/mm/yyyy") }).findings[0]?.message).toContain(
      "dd/mm/yyyy",
    );
  });

  it("rounds to significant figures in plain digits", () => {
    expect([
      withFigures(101, 2),
      withFigures(0.2, 2),
      withFigures(99.6, 2),
      withFigures(-0.00456, 1),
    ]).toEqual(["100", "0.20", "100", "-0.005"]);
  });
});

describe("the dictionary of an edition", () => {
  it("is chosen from what the file states", () => {
    expect(
      ["4", "4.0", "4.0.3", "4.1", "4.1.1", "4.2", "x.x", null].map((said) => editionFor(said).edition),
    ).toEqual(["4.0.4", "4.0.4", "4.0.4", "4.1.1", "4.1.1", "4.2", "4.1.1", "4.1.1"]);
    expect(editionFor("x.x").known).toBe(false);
  });

  // Counts and changes: the published dictionary files of the editions (groups 4.1.1: 148).
  it("holds the groups and headings of that edition", () => {
    const [older, middle, newer] = (["4.0.4", "4.1.1", "4.2"] as const).map(standardDictionary);
    expect(middle?.size).toBe(148);
    const has = (dictionary: typeof older, group: string, heading: string) =>
      dictionary?.get(group)?.headings.some(({ name }) => name === heading) ?? false;
    expect([older, middle, newer].map((each) => has(each, "ISPT", "ISPT_N60"))).toEqual([false, true, true]);
    expect([older, middle, newer].map((each) => has(each, "LOCA", "LOCA_NATD"))).toEqual([true, true, true]);
    expect([older, middle, newer].map((each) => has(each, "LOCA", "LOCA_GLDT"))).toEqual([
      false,
      false,
      true,
    ]);
    expect([older, middle, newer].map((each) => each?.has("ERES"))).toEqual([true, true, false]);
    expect([older, middle, newer].map((each) => each?.has("CPTG"))).toEqual([false, false, true]);
    expect(middle?.get("WSTD")?.parent).toBe("WSTG");
    expect(
      middle
        ?.get("GEOL")
        ?.headings.filter(({ key }) => key)
        .map(({ name }) => name),
    ).toEqual(["LOCA_ID", "GEOL_TOP", "GEOL_BASE"]);
  });

  it("is not changed by a file that declares groups with the names of object parts", () => {
    const rows = ["__proto__", "constructor"].map((name) => `"DATA","GROUP","${name}","","","","x","","-"`);
    const text = [
      '"GROUP","DICT"',
      '"HEADING","DICT_TYPE","DICT_GRP","DICT_HDNG","DICT_STAT","DICT_DTYP","DICT_DESC","DICT_UNIT","DICT_PGRP"',
      ...rows,
    ].join("\r\n");
    const dictionary = dictionaryOf(readAgs(new TextEncoder().encode(text)));
    expect(dictionary.get("__proto__")).toMatchObject({ user: true, headings: [] });
    expect(standardDictionary("4.1.1").has("__proto__")).toBe(false);
  });
});
