import { spawnSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, it } from "vitest";

const root = join(import.meta.dirname, "..", "..");

/** Runs vitest over these files with our reporter; answers with the last line of its output and its exit code. */
function countsOf(files: Record<string, string>): { last: string; code: number | null } {
  // Below node_modules, so that the files find vitest and no other run finds them.
  const folder = mkdtempSync(join(root, "node_modules", ".counts-"));
  try {
    for (const [name, source] of Object.entries(files)) writeFileSync(join(folder, name), source);
    writeFileSync(
      join(folder, "vitest.config.mjs"),
      'export default { test: { include: ["*.test.ts"] } };\n',
    );
    const vitest = join(root, "node_modules", "vitest", "vitest.mjs");
    const args = [
      vitest,
      "run",
      "--root",
      folder,
      "--reporter",
      join(root, "tests/support/count-reporter.ts"),
    ];
    const env = { ...process.env };
    for (const name of ["HOLDGROUND_COUNTS", "VITEST", "VITEST_POOL_ID", "VITEST_WORKER_ID"])
      delete env[name];
    const run = spawnSync(process.execPath, args, { encoding: "utf8", env });
    return { last: run.stdout.trimEnd().split("\n").at(-1) ?? "", code: run.status };
  } finally {
    rmSync(folder, { recursive: true });
  }
}

const using = 'import { beforeAll, describe, expect, it } from "vitest";\n';
const passing = `${using}it("holds", () => expect(1).toBe(1));`;

describe("the line of counts", () => {
  it("tells passed, failed and skipped tests", () => {
    const counted = countsOf({
      "a.test.ts": `${passing}\nit("does not", () => expect(1).toBe(2));`,
      "b.test.ts": `${using}describe.runIf(false)("elsewhere", () => { it("is not run", () => {}); });`,
    });
    expect(counted).toEqual({ last: "1 passed, 1 failed, 1 skipped", code: 1 });
  });

  it("counts a file that cannot be loaded, and a group whose preparation fails, as failed", () => {
    const counted = countsOf({
      "a.test.ts": passing,
      "b.test.ts": 'import "./not-there";',
      "c.test.ts": `${using}describe("group", () => { beforeAll(() => { throw new Error("no"); }); it("waits", () => {}); });`,
    });
    expect(counted.code).toBe(1);
    expect(counted.last).toMatch(/^1 passed, 2 failed/);
  });

  it("counts an error that nobody awaited as failed", () => {
    const counted = countsOf({
      "a.test.ts": `${passing}\nit("leaves one", () => { Promise.reject(new Error("late")); });`,
    });
    expect(counted.code).toBe(1);
    expect(counted.last).toMatch(/^2 passed, 1 failed/);
  });
});
