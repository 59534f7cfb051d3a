import { spawnSync } from "node:child_process";
import { join } from "node:path";
import { describe, expect, it } from "vitest";
import { allMethods } from "@/lib/check/all-methods";

const root = join(import.meta.dirname, "../..");

function calc(lines: string[], ...options: string[]): Record<string, never>[] {
  const run = spawnSync(process.execPath, ["--import", "tsx", "scripts/calc.ts", ...options], {
    cwd: root,
    input: lines.join("\n"),
    encoding: "utf8",
  });
  if (run.status !== 0) throw new Error(run.stderr);
  return run.stdout.split("\n").flatMap((line) => (line === "" ? [] : [JSON.parse(line)]));
}

describe("npm run calc", () => {
  it("answers each line with one line, in order, and outlives those that it cannot use", {
    timeout: 60_000,
  }, () => {
    const answers = calc([
      '{"method":"uplift","inputs":{"stabilising_kN":110,"uplift_kN":100}}',
      "nonsense",
      "[1,2]",
      '{"inputs":{}}',
      '{"method":"no-such-method","inputs":{}}',
      '{"method":"uplift","inputs":{"stabilising_kN":-1,"uplift_kN":1e999,"colour":1}}',
      '{"method":"uplift"}',
      "",
      '{"method":"base-pressure","inputs":{"breadth_m":2,"length_m":3,"vertical_kN":600,"momentB_kNm":900}}',
      '{"method":"uplift","inputs":{"stabilising_kN":84,"uplift_kN":70}}',
    ]);
    expect(answers).toMatchObject([
      { outputs: { factorOfSafety: 1.1 } },
      { error: { code: "invalid" } },
      { error: { code: "invalid" } },
      { error: { code: "invalid" } },
      { error: { code: "unknown-method" } },
      {
        error: {
          code: "invalid",
          fields: {
            stabilising_kN: expect.any(String),
            uplift_kN: expect.any(String),
            colour: expect.any(String),
          },
        },
      },
      { error: { code: "invalid", fields: { stabilising_kN: expect.any(String) } } },
      { outputs: { equilibrium: false, distribution: "none" } },
      { outputs: { factorOfSafety: 1.2 } },
    ]);
    expect(Object.keys(answers[0] ?? {})).toEqual(["outputs"]);
  });

  it("lists every method with its fields, and adds the steps when asked", { timeout: 60_000 }, () => {
    const listed = calc([], "--list") as unknown as { id: string; inputs: unknown; outputs: unknown }[];
    expect(listed.map(({ id }) => id)).toEqual(allMethods.map(({ id }) => id));
    expect(listed[0]).toMatchObject({
      inputs: { breadth_m: { label: "Breadth B", unit: "m" }, momentB_kNm: { default: 0 } },
      outputs: { maxPressure_kPa: { unit: "kPa" } },
    });
    const [answer] = calc(['{"method":"uplift","inputs":{"stabilising_kN":84,"uplift_kN":70}}'], "--lines");
    expect(answer).toMatchObject({ lines: [{ shown: "G / U", numbers: "84 / 70", value: 1.2 }] });
  });
});
