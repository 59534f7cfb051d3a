import { describe, expect, it } from "vitest";
import { allMethods, runMethod } from "@/lib/check/all-methods";
import { referenceCases } from "./cases";
import { atPath, type ReferenceCase, toleranceOf } from "./reference-case";

function outputsOf({ method, inputs }: ReferenceCase): unknown {
  const answer = runMethod(method, inputs);
  if ("error" in answer) throw new Error(`${answer.error.message} ${JSON.stringify(answer.error.fields)}`);
  return answer.outputs;
}

describe.each(allMethods.map(({ id }) => id))("%s", (id) => {
  const own = referenceCases.filter(({ method }) => method === id);

  it("has at least three cases, of which one stands on a source outside this code", () => {
    expect(own.length).toBeGreaterThanOrEqual(3);
    for (const { citation } of own) expect(citation.length).toBeGreaterThan(5);
  });

  it.each(own.map((one) => [one.why, one] as const))("%s", (_, one) => {
    const outputs = outputsOf(one);
    for (const [field, wanted] of Object.entries(one.expected)) {
      const given = atPath(outputs, field);
      if (typeof wanted !== "number") {
        expect(given, field).toBe(wanted);
        continue;
      }
      const tolerance = toleranceOf(one, field);
      const allowed = "abs" in tolerance ? tolerance.abs : tolerance.rel * Math.abs(wanted);
      expect(given, field).toBeTypeOf("number");
      const missed = Math.abs((given as number) - wanted);
      expect(missed, `${field}: ${given} where ${wanted} ± ${allowed} is published`).toBeLessThanOrEqual(
        allowed,
      );
    }
  });
});

describe("the reference cases", () => {
  it("are each named once, and each of a method that there is", () => {
    expect(new Set(referenceCases.map(({ id }) => id)).size).toBe(referenceCases.length);
    const known = new Set(allMethods.map(({ id }) => id));
    expect(referenceCases.filter(({ method }) => !known.has(method))).toEqual([]);
  });
});
