import { describe, expect, it } from "vitest";
import type { AgsFinding } from "@/lib/exchange/ags/file-model";
import { groundFromAgs } from "@/lib/exchange/ags/ground";
import { readAgs } from "@/lib/exchange/ags/read";
import { validateAgs } from "@/lib/exchange/ags/validate";
import { sharedFile, sharedFilesPresent } from "../shared-files";

type Expected = Record<string, Record<string, { line: number | "-"; group: string }[]>>;
/** What an independent checker found in the outside rule suite. */
const expected: Expected = sharedFilesPresent
  ? (JSON.parse(new TextDecoder().decode(sharedFile("findings.json"))) as Expected)
  : {};

/**
 * Where we differ from the independent checker and stand by it.
 * Rule 8 on dates: it reports every date that is filled, also 2021-01-24 under yyyy-mm-dd. A date that follows its UNIT
 * and exists is no breach; its reports on numbers, elapsed times and identifiers in the same files are ours too.
 * Rule 20: whether a declared file was delivered can be told only where the delivery is at hand; the suite's own FILE
 * folder is not, so we note that it was not checked.
 * A group that stands twice (2c), and a file that stops after its first group: the checker goes no further and finds
 * nothing else. We go on, and ABBR, TRAN, UNIT and TYPE are in fact missing there.
 */
const differences: Record<string, { line?: Record<string, number>; missing?: string[]; added?: string[] }> = {
  "4.1-rule8-2.ags": { line: { "8": 82 } },
  "4.1-rule8-4.ags": { line: { "8": 18 } },
  "4.1-rule8-6.ags": { line: { "8": 83 } },
  "4.1-rule20-2.ags": { missing: ["20"] },
  "DuplicateGroups.ags": { added: ["16", "2c"] },
  "Row_with_missing_field.ags": { added: ["14", "15", "17"] },
};

const broken = (findings: readonly AgsFinding[]) =>
  findings.filter(({ rule, severity }) => rule !== "file" && severity !== "note");
const firstLine = (lines: readonly (number | "-" | null)[]): number | null => {
  const numbered = lines.filter((line): line is number => typeof line === "number");
  return numbered.length === 0 ? null : Math.min(...numbered);
};

describe.runIf(sharedFilesPresent)("the outside rule suite", () => {
  it.each(Object.keys(expected))(
    "breaks the rules that an independent checker found, from the same line: %s",
    (name) => {
      const findings = broken(validateAgs(readAgs(sharedFile("rule-files", name))).findings);
      const stand = differences[name] ?? {};
      const theirs = Object.keys(expected[name] ?? {}).map((rule) => rule.replace("Rule ", ""));
      const wanted = [
        ...theirs.filter((rule) => !stand.missing?.includes(rule)),
        ...(stand.added ?? []),
      ].sort();
      expect([...new Set(findings.map(({ rule }) => rule))].sort()).toEqual(wanted);
      for (const rule of theirs) {
        const line =
          stand.line?.[rule] ?? firstLine((expected[name]?.[`Rule ${rule}`] ?? []).map((each) => each.line));
        if (line === null || stand.missing?.includes(rule)) continue;
        const ours = firstLine(
          findings.filter((finding) => finding.rule === rule).map((finding) => finding.line),
        );
        expect(ours, `rule ${rule}`).toBe(line);
      }
    },
  );

  it("names the group that the checker names, wherever it gives one", () => {
    for (const [name, rules] of Object.entries(expected)) {
      const findings = broken(validateAgs(readAgs(sharedFile("rule-files", name))).findings);
      for (const [rule, places] of Object.entries(rules)) {
        if (differences[name]?.missing) continue;
        const own = new Set(
          findings.filter((each) => `Rule ${each.rule}` === rule).map(({ group }) => group ?? ""),
        );
        const named = places.map(({ group }) => group).filter((group) => group !== "");
        // Under rule 8 the checker also counts dates that follow their unit (see above).
        if (rule !== "Rule 8") for (const group of named) expect(own, `${name} ${rule}`).toContain(group);
      }
    }
  });
});

describe.runIf(sharedFilesPresent)("real site investigation files", () => {
  const read = (name: string) => {
    const file = readAgs(sharedFile("real", name));
    return { file, report: validateAgs(file), ground: groundFromAgs(file) };
  };

  it.each([
    ["1788-holes-no-levels.ags", 1788, 5728, 0, 0, 0],
    ["31-holes-spt-water.ags", 31, 196, 121, 15, 41],
    ["34-holes-rock-monitoring-bom.ags", 34, 118, 89, 18, 60],
    ["eleven-holes.ags", 11, 34, 0, 0, 0],
    ["final-1.ags", 11, 23, 5, 5, 5],
    ["final-2-is-another-project.ags", 2, 17, 13, 2, 0],
    ["two-holes-lab.ags", 2, 8, 12, 2, 2],
  ])(
    "are read whole: %s has %i holes, %i strata, %i tests, %i strikes and %i rises",
    (name, holes, strata, spts, strikes, rises) => {
      const start = performance.now();
      const { file, ground } = read(name);
      expect(performance.now() - start).toBeLessThan(5000);
      expect(file.stopped).toBeNull();
      expect(file.edition).toBe("4.0.4");
      expect(ground.holes).toHaveLength(holes);
      expect(ground.strata).toHaveLength(strata);
      expect(ground.spts).toHaveLength(spts);
      expect(ground.strikes).toHaveLength(strikes);
      expect(ground.strikes.flatMap((strike) => strike.rises)).toHaveLength(rises);
      expect(ground.findings.filter(({ severity }) => severity === "error")).toEqual([]);
    },
  );

  it("leave the ground level open where the file has none, or writes Null, and say so once", () => {
    for (const [name, words] of [
      ["1788-holes-no-levels.ags", "1788 of 1788"],
      ["eleven-holes.ags", "11 of 11"],
    ] as const) {
      const { ground } = read(name);
      expect(ground.holes.every(({ groundLevel_m }) => groundLevel_m === null)).toBe(true);
      const said = ground.findings.filter(({ heading }) => heading === "LOCA_GL");
      expect(said).toHaveLength(1);
      expect(said[0]?.message).toContain(words);
    }
  });

  it("keep a refusal apart from N where the file writes 50 in the column of N", () => {
    const { spts } = read("31-holes-spt-water.ags").ground;
    const short = spts.find(({ line }) => line === 365);
    expect(short).toMatchObject({ blowCount: null, refusal: true, mainBlows: 50, mainPenetration_mm: 85 });
    expect(spts.filter(({ refusal }) => refusal)).toHaveLength(35);
  });

  it("keep a water strike without a depth as one, with its words", () => {
    const { strikes } = read("31-holes-spt-water.ags").ground;
    expect(strikes[0]).toMatchObject({ depth_m: null, depthText: "" });
    expect(strikes[0]?.remarks.length).toBeGreaterThan(100);
  });

  it("show by their identity that the second of two issues is of another project", () => {
    const [first, second] = ["final-1.ags", "final-2-is-another-project.ags"].map(
      (name) => read(name).ground.identity,
    );
    expect(first?.projectId).not.toBe(second?.projectId);
    expect(first?.holeNames.filter((name) => second?.holeNames.includes(name))).toEqual([]);
    expect(first?.nationalBox?.minEasting_m).toBeGreaterThan(
      (second?.nationalBox?.maxEasting_m ?? 0) + 80_000,
    );
    expect([first?.dataStatus, second?.dataStatus]).toEqual(["Final", "Preliminary"]);
  });

  it("name the older edition in one sentence", () => {
    const { report } = read("older-edition-3.ags");
    expect(report.findings).toHaveLength(1);
    expect(report.stopped).toContain("AGS 3");
  });

  it("join the descriptions that one file breaks over lines", () => {
    const { file, ground } = read("eleven-holes.ags");
    expect(file.countsByRule["6"]).toBe(10);
    expect(ground.strata.every(({ top_m, base_m }) => top_m !== null && base_m !== null)).toBe(true);
  });

  it("can be cut anywhere without harm", () => {
    const bytes = sharedFile("real", "31-holes-spt-water.ags");
    for (let part = 1; part < 60; part += 1) {
      const file = readAgs(bytes.subarray(0, Math.floor((bytes.length * part) / 60)));
      expect(groundFromAgs(file).holes.length).toBeLessThanOrEqual(31);
      expect(validateAgs(file).counts.error).toBeGreaterThan(0);
    }
  });
});
