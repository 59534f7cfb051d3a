import { describe, expect, it } from "vitest";
import type { AgsFinding } from "@/lib/exchange/ags/file-model";
import { groundFromAgs } from "@/lib/exchange/ags/ground";
import { readPrincipalSoil } from "@/lib/exchange/ags/principal-soil";
import { readAgs } from "@/lib/exchange/ags/read";
import { readSptReport } from "@/lib/exchange/ags/spt-report";
import { exampleBytes, lineOf } from "./example-file";

const ground = (changes: Readonly<Record<string, string | null>> = {}) =>
  groundFromAgs(readAgs(exampleBytes(changes)));
const said = (findings: readonly AgsFinding[]) =>
  findings.map(({ severity, message }) => `${severity}: ${message}`);

const bh1 = '"DATA","BH1","CP+RC","FINAL","1000.00","2000.50","16.20","6.00","2024-02-01"';
const bh2 = '"DATA","BH2","CP","FINAL","1010.00","2000.50","16.40","5.00","2024-02-02"';
const holeUnits = '"UNIT","","","","m","m","m","m","yyyy-mm-dd"';
const made = '"DATA","BH1","0.00","1.20","MADE GROUND: brick and ""ash"", loose.","102"';
const clay1 = '"DATA","BH1","1.20","6.00","Firm brown CLAY.","202"';
const clay2 = '"DATA","BH2","0.00","5.00","Firm brown CLAY.","202"';
const spt1 = '"DATA","BH1","2.00","3","20","450","20","N=20 (1,2/4,5,5,6)","Dry","S"';
const spt2 = '"DATA","BH1","4.00","21","50","365","","N=50 (7,14/50 for 215mm)","1.80","S"';
const strike = '"DATA","BH1","2.90","Slow inflow"';

describe("rows of the register from an AGS file", () => {
  it("are taken without a doubt from a sound file", () => {
    const all = ground();
    expect(all.findings).toEqual([]);
    expect(all.project).toMatchObject({ projectId: "P-17", name: "Mill Lane depot", group: "PROJ", line: 5 });
    expect(all.transmittal).toMatchObject({
      issueNumber: "2",
      isoDate: "2024-03-05",
      status: "Final",
      producer: "Boring Works",
    });
    expect(all.holes[0]).toMatchObject({
      name: "BH1",
      kindCodes: ["CP", "RC"],
      status: "FINAL",
      national: { easting_m: 1000, northing_m: 2000.5 },
      local: null,
      groundLevel_m: 16.2,
      finalDepth_m: 6,
      startDate: "2024-02-01",
      line: lineOf(bh1),
    });
    expect(all.strata.map(({ hole, top_m, base_m, line }) => [hole, top_m, base_m, line])).toEqual([
      ["BH1", 0, 1.2, lineOf(made)],
      ["BH1", 1.2, 6, lineOf(clay1)],
      ["BH2", 0, 5, lineOf(clay2)],
    ]);
    expect(all.strikes).toMatchObject([
      {
        hole: "BH1",
        depth_m: 2.9,
        remarks: "Slow inflow",
        rises: [{ minutes: 10, depth: { number: 2.6 } }, { minutes: 20 }],
      },
    ]);
    expect(all.abbreviations).toHaveLength(6);
    expect(all.otherGroups).toEqual([]);
  });

  it("say for the import guard whose data this is and where it lies", () => {
    expect(ground().identity).toEqual({
      projectId: "P-17",
      projectName: "Mill Lane depot",
      issueNumber: "2",
      issueDate: "2024-03-05",
      dataStatus: "Final",
      producer: "Boring Works",
      holeCount: 2,
      holeNames: ["BH1", "BH2"],
      nationalBox: { minEasting_m: 1000, minNorthing_m: 2000.5, maxEasting_m: 1010, maxNorthing_m: 2000.5 },
      localBox: null,
      holeStatuses: { FINAL: 2 },
      nationalGrids: [],
      verticalDatums: [],
    });
  });

  it.each([
    ["", "have an empty ground level"],
    ["Null", '"Null", which is no number'],
    ["0.00", '"0.00", which is taken as not stated'],
  ])("leave the ground level open where the file says %j", (level, words) => {
    const { holes, findings } = ground({ [bh2]: bh2.replace("16.40", level) });
    expect(holes[1]).toMatchObject({ groundLevel_m: null, groundLevelText: level });
    expect(said(findings)).toEqual([expect.stringContaining(`1 of 2 holes`)]);
    expect(findings[0]?.message).toContain(words);
  });

  it.each([
    ["ft", "16.40", 16.4 * 0.3048],
    ["mm", "16400", 16.4],
    ["cm", "1640", 16.4],
  ])("bring a level in %s to metres and note it", (unit, text, level_m) => {
    const units = holeUnits.replace('"m","m","m","m"', `"m","m","${unit}","m"`);
    const { holes, findings } = ground({ [holeUnits]: units, [bh2]: bh2.replace("16.40", text) });
    expect(holes[1]?.groundLevel_m).toBeCloseTo(level_m, 12);
    expect(said(findings)).toEqual([`note: LOCA_GL is in ${unit} and was brought to m.`]);
  });

  it("take no level at all from a unit that is not known, rather than a wrong one", () => {
    const { holes, findings } = ground({
      [holeUnits]: holeUnits.replace('"m","m","m","m"', '"m","m","fathom","m"'),
    });
    expect(holes.map(({ groundLevel_m }) => groundLevel_m)).toEqual([null, null]);
    expect(said(findings)).toEqual([expect.stringContaining('error: LOCA_GL is in "fathom"')]);
  });

  it("do not take a hole at 0, 0 nor one with half a position for a place", () => {
    expect(
      ground({ [bh2]: bh2.replace("1010.00", "0.00").replace("2000.50", "0.00") }).holes[1]?.national,
    ).toBeNull();
    const half = ground({ [bh2]: bh2.replace("1010.00", "") });
    expect(half.holes[1]?.national).toBeNull();
    expect(said(half.findings)).toEqual(["warning: BH2 has one coordinate of two."]);
  });

  it("use the latest of several transmittals", () => {
    const tran = '"DATA","2","2024-03-05","Boring Works","Final","4.1.1","Design office","|","+"';
    const older = tran.replace('"2","2024-03-05"', '"1","2024-01-05"').replace("Final", "Preliminary");
    const { transmittal, findings } = ground({ [tran]: `${tran}\r\n${older}` });
    expect(transmittal).toMatchObject({ issueNumber: "2", status: "Final" });
    expect(said(findings)).toEqual([expect.stringContaining("2 transmittal rows")]);
  });

  it("leave out rows of a hole that the file does not have, and a hole given twice", () => {
    const orphan = ground({ [clay2]: clay2.replace("BH2", "BH9") });
    expect(orphan.strata).toHaveLength(2);
    expect(said(orphan.findings)).toEqual(["error: The hole BH9 is not in LOCA; the row was left out."]);
    const twice = ground({ [bh2]: bh2.replace("BH2", "BH1") });
    expect(twice.holes).toHaveLength(1);
    expect(said(twice.findings)[0]).toContain("error: The hole BH1 stands in line");
  });

  it("trim names, so that padding ties nothing loose", () => {
    expect(ground({ [bh2]: bh2.replace("BH2", " BH2 ") }).strata).toHaveLength(3);
  });
});

describe("the intervals of a log", () => {
  it.each([
    [
      "a gap",
      { [clay1]: clay1.replace("1.20", "1.50") },
      "warning: Between 1.20 m and 1.50 m the log of BH1 has a gap.",
    ],
    [
      "an overlap",
      { [clay1]: clay1.replace("1.20", "1.00") },
      "warning: The strata of BH1 overlap: 1.00 m lies above 1.20 m.",
    ],
    [
      "upside down",
      { [clay2]: clay2.replace('"0.00","5.00"', '"5.00","0.00"') },
      "error: A stratum of BH2 is upside down: top 5.00 m, base 0.00 m.",
    ],
    [
      "too deep",
      { [clay2]: clay2.replace('"5.00"', '"5.50"') },
      "warning: A stratum of BH2 ends at 5.50 m, below the final depth 5.00 m.",
    ],
    [
      "no base",
      { [clay2]: clay2.replace('"5.00"', '""') },
      "warning: The stratum of BH2 from 0.00 m has no base.",
    ],
    [
      "no thickness",
      { [clay2]: `${clay2}\r\n${clay2.replace('"0.00"', '"5.00"')}` },
      "warning: A stratum of BH2 at 5.00 m has no thickness.",
    ],
    [
      "no top",
      { [clay2]: clay2.replace('"0.00"', '""') },
      "error: A stratum of BH2 has no depth of its top.",
    ],
  ])("with %s are reported, and nothing else is", (_, changes, message) => {
    expect(said(ground(changes).findings)).toEqual([message]);
  });

  it("agree to half a centimetre without a word", () => {
    expect(ground({ [clay1]: clay1.replace("1.20", "1.204") }).findings).toEqual([]);
  });
});

describe("standard penetration tests", () => {
  it("keep N, refusal and the words apart", () => {
    const { spts } = ground();
    expect(spts[0]).toMatchObject({
      blowCount: 20,
      refusal: false,
      mainBlows: 20,
      mainPenetration_mm: 300,
      seatingBlows: 3,
      reportText: "N=20 (1,2/4,5,5,6)",
      water: { text: "Dry", number: null },
    });
    expect(spts[0]?.increments.map(({ blows }) => blows)).toEqual([1, 2, 4, 5, 5, 6]);
    expect(spts[1]).toMatchObject({
      blowCount: null,
      refusal: true,
      mainBlows: 50,
      mainPenetration_mm: 215,
      seatingBlows: 21,
      water: { text: "1.80", number: 1.8 },
    });
  });

  it("take the refusal from the words although the file puts 50 under N", () => {
    const { spts } = ground({ [spt2]: spt2.replace('"365",""', '"365","50"') });
    expect(spts[1]).toMatchObject({ blowCount: null, refusal: true, mainPenetration_mm: 215 });
  });

  it("take the penetration less the seating drive where the words are missing, as the other tests show", () => {
    const { spts } = ground({ [spt2]: spt2.replace("N=50 (7,14/50 for 215mm)", "") });
    expect(spts[1]).toMatchObject({ refusal: true, mainPenetration_mm: 215, mainBlows: 50 });
  });

  it("do not guess how far a test went where the file shows neither meaning", () => {
    const { spts, findings } = ground({
      [spt1]: spt1.replace('"450"', '""'),
      [spt2]: spt2.replace("N=50 (7,14/50 for 215mm)", "").replace("365", "250"),
    });
    expect(spts[1]).toMatchObject({ blowCount: null, refusal: true, mainPenetration_mm: null });
    expect(said(findings)).toEqual([expect.stringContaining("not clear")]);
  });

  it("say where the figures and the words differ", () => {
    const { findings } = ground({ [spt1]: spt1.replace('"20","450","20"', '"18","450","18"') });
    expect(said(findings)).toEqual([
      expect.stringContaining("give 20 blows of the main drive, the figures 18"),
    ]);
  });

  it.each([
    [
      "N=20 (1,2/4,5,5,6)",
      {
        blowCount: 20,
        refusal: false,
        mainBlows: 20,
        mainPenetration_mm: 300,
        seatingBlows: 3,
        seatingPenetration_mm: 150,
      },
    ],
    [
      "N=50 (7,14/50 for 215mm)",
      {
        blowCount: null,
        refusal: true,
        mainBlows: 50,
        mainPenetration_mm: 215,
        seatingBlows: 21,
        seatingPenetration_mm: 150,
      },
    ],
    [
      "50 (25 for 41mm/50 for 45mm)",
      {
        blowCount: null,
        refusal: true,
        mainBlows: 50,
        mainPenetration_mm: 45,
        seatingBlows: 25,
        seatingPenetration_mm: 41,
      },
    ],
    ["N=41 (7,11/41 for 150mm)", { blowCount: null, refusal: true, mainBlows: 41, mainPenetration_mm: 150 }],
    ["N = 62 (8, 10/10, 12, 18, 22)", { blowCount: 62, refusal: false, mainBlows: 62 }],
    ["N=1 (0,0/0,1,0,0)", { blowCount: 1, refusal: false, mainBlows: 1, seatingBlows: 0 }],
    ["50 for 75mm", { blowCount: null, refusal: true, mainBlows: 50, mainPenetration_mm: 75 }],
    ["50/75mm", { blowCount: null, refusal: true, mainBlows: 50, mainPenetration_mm: 75 }],
    ["N=17", { blowCount: 17, refusal: false, mainBlows: 17 }],
  ])("read the words %s", (text, reading) => {
    expect(readSptReport(text)).toMatchObject(reading);
  });

  it.each(["", "see log", "50/", "N=", "(1,2/3", "N=20 (1,2/4,5,x,6)", "N=20 (1,2,3/4,5,5,6)"])(
    "leave words of no known form alone: %j",
    (text) => {
      expect(readSptReport(text)).toBeNull();
    },
  );
});

describe("water", () => {
  it("keeps a strike that has no depth, with its remark", () => {
    const { strikes, findings } = ground({
      [strike]: strike.replace("2.90", ""),
      '"DATA","BH1","2.90","10","2.60"': null,
      '"DATA","BH1","2.90","20","2.40"': null,
    });
    expect(strikes).toMatchObject([{ depth_m: null, remarks: "Slow inflow", rises: [] }]);
    expect(said(findings)).toEqual(["warning: A water strike in BH1 has no depth; its remark is kept."]);
  });

  it("ties a rise to its strike by the number of the depth, and reports one without a strike", () => {
    expect(
      ground({ '"DATA","BH1","2.90","10","2.60"': '"DATA","BH1","2.9","10","2.60"' }).strikes[0]?.rises,
    ).toHaveLength(2);
    const loose = ground({ '"DATA","BH1","2.90","10","2.60"': '"DATA","BH1","3.10","10","2.60"' });
    expect(loose.strikes[0]?.rises).toHaveLength(1);
    expect(said(loose.findings)).toEqual([expect.stringContaining("belongs to no water strike")]);
  });

  it("never turns a word into a number", () => {
    const { strikes } = ground({ '"DATA","BH1","2.90","10","2.60"': '"DATA","BH1","2.90","10","Dry"' });
    expect(strikes[0]?.rises[0]?.depth).toEqual({ text: "Dry", number: null });
  });
});

describe("the principal soil", () => {
  it.each([
    ["202", "Firm CLAY", "clay", false, "legend code"],
    ["310", "", "silt", false, "legend code"],
    ["430", "SAND and GRAVEL", "sand", false, "legend code"],
    ["528", "", "gravel", false, "legend code"],
    ["601", "", "peat", false, "legend code"],
    ["730", "", "cobbles", false, "legend code"],
    ["801", "", "mudstone", false, "legend code"],
    ["805", "", "chalk", false, "legend code"],
    ["899", "", "rock", false, "legend code"],
    ["101", "TOPSOIL", "topsoil", false, "legend code"],
    ["102", "Brick rubble", "made-ground", true, "legend code"],
    ["202", "MADE GROUND: clay with brick", "clay", true, "legend code"],
    ["NR04", "Dense brown slightly clayey SAND with bands of CLAY", "sand", false, "description"],
    ["", "Firm to stiff brown slightly sandy gravelly CLAY", "clay", false, "description"],
    ["", "firm brown sandy gravelly clay with gravel of limestone", "clay", false, "description"],
    ["", "SOFT BROWN SANDY CLAY", "clay", false, "description"],
    ["", "MADE GROUND: dark SAND and brick", "made-ground", true, "description"],
    ["", "Possible made ground: gravel", "made-ground", true, "description"],
    ["", "Weak grey MUDSTONE", "mudstone", false, "description"],
    ["999", "Driller's note", "unknown", false, "nothing"],
  ])("of code %j and words %j is %s", (code, words, soil, madeGround, readFrom) => {
    expect(readPrincipalSoil(code, words)).toMatchObject({ soil, madeGround, readFrom, machineRead: true });
  });

  it("marks peat and peaty soil as organic", () => {
    expect([
      readPrincipalSoil("", "Soft peaty CLAY").organic,
      readPrincipalSoil("", "Firm CLAY").organic,
    ]).toEqual([true, false]);
  });
});
