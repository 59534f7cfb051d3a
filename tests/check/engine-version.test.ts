import { describe, expect, it } from "vitest";
import { allMethods } from "@/lib/check/all-methods";
import { COMPOSED_METHODS, ENGINE_VERSION } from "@/lib/check/version";

describe("the engine's version", () => {
  it("is raised with any method that the check composes: the record names each at its present version", () => {
    const present = Object.fromEntries(
      allMethods.filter(({ id }) => id in COMPOSED_METHODS).map(({ id, version }) => [id, version]),
    );
    expect(present).toEqual(COMPOSED_METHODS);
  });

  it("is the version of the method footing-check", () => {
    expect(allMethods.find(({ id }) => id === "footing-check")?.version).toBe(ENGINE_VERSION);
  });
});
