import { spawnSync } from "node:child_process";
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join, resolve } from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { exampleBytes } from "./example-file";

const root = resolve(import.meta.dirname, "../../..");
let folder = "";

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), "ags check "));
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const run = (...args: string[]) => {
  const { status, stdout, stderr } = spawnSync(
    process.execPath,
    [join(root, "node_modules/tsx/dist/cli.mjs"), join(root, "scripts/ags-check.ts"), ...args],
    { encoding: "utf8", cwd: folder },
  );
  const lines = stdout.split("\n").filter((line) => line !== "");
  return { status, stderr, findings: lines.map((line) => JSON.parse(line) as Record<string, unknown>) };
};
const file = (name: string, bytes: Uint8Array) => {
  const path = join(folder, name);
  writeFileSync(path, bytes);
  return path;
};

describe("npm run ags:check", () => {
  it("prints nothing and ends with 0 for a file that keeps the rules", () => {
    expect(run(file("sound.ags", exampleBytes()))).toEqual({ status: 0, stderr: "", findings: [] });
  });

  it("prints one JSON object a finding and ends with 1 where there is an error", () => {
    const clay = '"DATA","BH2","0.00","5.00","Firm brown CLAY.","202"';
    const { status, findings } = run(
      file("orphan.ags", exampleBytes({ [clay]: clay.replace("BH2", "BH9") })),
    );
    expect(status).toBe(1);
    expect(findings).toHaveLength(1);
    expect(Object.keys(findings[0] ?? {}).sort()).toEqual([
      "group",
      "heading",
      "line",
      "message",
      "rule",
      "severity",
    ]);
    expect(findings[0]).toMatchObject({ rule: "10c", group: "GEOL", severity: "error" });
  });

  it("ends with 0 where there are notes only", () => {
    const { status, findings } = run(file("lf.ags", exampleBytes({}, "\n")));
    expect([status, findings.map(({ rule }) => rule)]).toEqual([0, ["2a"]]);
  });

  it("looks for declared files in the folder FILE beside the data", () => {
    const declared =
      '"GROUP","FILE"\r\n"HEADING","FILE_FSET","FILE_NAME"\r\n"UNIT","",""\r\n"TYPE","X","X"\r\n"DATA","FS1","a.pdf"\r\n\r\n"GROUP","LOCA"';
    const path = file("files.ags", exampleBytes({ '"GROUP","LOCA"': declared }));
    expect(run(path)).toMatchObject({ status: 0, findings: [{ rule: "20", severity: "note" }] });
    mkdirSync(join(folder, "FILE", "FS1"), { recursive: true });
    expect(run(path)).toMatchObject({ status: 1, findings: [{ rule: "20", severity: "error" }] });
    writeFileSync(join(folder, "FILE", "FS1", "a.pdf"), "x");
    expect(run(path)).toMatchObject({ status: 0, findings: [] });
  });

  it("ends with 2 and a sentence where there is no file to read", () => {
    expect(run()).toMatchObject({ status: 2, stderr: expect.stringContaining("Usage") });
    expect(run(join(folder, "none.ags"))).toMatchObject({
      status: 2,
      stderr: expect.stringContaining("cannot be opened"),
    });
  });
});
