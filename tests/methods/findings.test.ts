import { describe, expect, it } from "vitest";
import { runMethod } from "@/lib/check/all-methods";

function codesOf(method: string, inputs: Record<string, unknown>): string[] {
  const answer = runMethod(method, inputs);
  if ("error" in answer) throw new Error(JSON.stringify(answer.error));
  for (const { message } of answer.findings) expect(message).toMatch(/^[A-Z0-9].*\.$/);
  return answer.findings.map(({ code, severity }) => `${severity}: ${code}`);
}

const spt = { blowCount: 50, effectiveStress_kPa: 100, overburdenRule: "none" };
const allowed = { rule: "bowles", n60: 50, breadth_m: 2, depth_m: 1, settlement_mm: 25 };
const burland = { breadth_m: 2, length_m: 2, pressure_kPa: 100, averageN60: 60, loading: "static" };
const plate = { soil: "sand", plateBreadth_m: 0.3, plateSettlement_mm: 5, footingBreadth_m: 3 };
const layered = { breadth_m: 2, length_m: 3, pressure_kPa: 100, thickness_m: 1, lowerNetAllowable_kPa: 80 };
const elastic = { breadth_m: 1, length_m: 10, pressure_kPa: 100, modulus_kPa: 1e4, rigidity: "rigid" };
const spread = { rule: "two-to-one", breadth_m: 2, length_m: 2, pressure_kPa: 100, depth_m: 1 };
const schmertmann = {
  breadth_m: 2,
  length_m: 2,
  netPressure_kPa: 100,
  overburden_kPa: 18,
  overburdenAtPeak_kPa: 36,
  layers: [{ thickness_m: 4, modulus_kPa: 1e4 }],
};
const points = (settlement_mm: number) => ({
  points: [
    { id: "A", x_m: 0, y_m: 0, settlement_mm: 0 },
    { id: "B", x_m: 6, y_m: 0, settlement_mm },
  ],
});

describe("a limit that is not kept is said, and one that just is, is not", () => {
  it.each<[string, string, Record<string, unknown>, string[]]>([
    ["a count of 50", "spt-correction", spt, []],
    ["a count above 50", "spt-correction", { ...spt, blowCount: 51 }, ["note: refusal"]],
    [
      "a correction above 1.7",
      "spt-correction",
      { ...spt, effectiveStress_kPa: 34, overburdenRule: "liao-whitman" },
      ["warning: large-correction"],
    ],
    [
      "Peck's rule above 24 kPa",
      "spt-correction",
      { ...spt, effectiveStress_kPa: 24, overburdenRule: "peck" },
      [],
    ],
    [
      "Peck's rule below 24 kPa",
      "spt-correction",
      { ...spt, effectiveStress_kPa: 23.9, overburdenRule: "peck" },
      ["outside: shallow"],
    ],
    ["an average of 50 and 25 mm", "spt-allowable", allowed, []],
    ["an average above 50", "spt-allowable", { ...allowed, n60: 50.5 }, ["warning: refusal"]],
    ["more than 25 mm", "spt-allowable", { ...allowed, settlement_mm: 25.1 }, ["warning: more-settlement"]],
    ["an average of 60", "settlement-burland-burbidge", burland, []],
    [
      "an average above 60",
      "settlement-burland-burbidge",
      { ...burland, averageN60: 61 },
      ["warning: refusal"],
    ],
    ["two years", "settlement-burland-burbidge", { ...burland, years: 2.9 }, ["note: before-three-years"]],
    ["three years", "settlement-burland-burbidge", { ...burland, years: 3 }, []],
    ["a footing ten plates broad", "plate-load", plate, []],
    [
      "a footing broader than ten plates",
      "plate-load",
      { ...plate, footingBreadth_m: 3.1 },
      ["warning: small-plate"],
    ],
    [
      "a footing narrower than the plate",
      "plate-load",
      { ...plate, footingBreadth_m: 0.2 },
      ["outside: large-plate"],
    ],
    ["a crust of half the breadth", "layered-bearing", layered, []],
    ["a thinner crust", "layered-bearing", { ...layered, thickness_m: 0.99 }, ["warning: thin-crust"]],
    ["a rigid base of L/B = 10", "settlement-elastic", elastic, []],
    ["a longer rigid base", "settlement-elastic", { ...elastic, length_m: 10.1 }, ["outside: long-rigid"]],
    [
      "a rigid base on a layer",
      "settlement-elastic",
      { ...elastic, layerThickness_m: 5 },
      ["note: rigid-by-practice"],
    ],
    ["a depth that is not used", "settlement-elastic", { ...elastic, depth_m: 1 }, ["note: depth-not-used"]],
    ["a depth that is used", "settlement-elastic", { ...elastic, depth_m: 1, foxDepth: true }, []],
    ["2:1 for the whole area", "stress-increase", spread, []],
    ["2:1 at a point", "stress-increase", { ...spread, x_m: 0.5 }, ["outside: mean-only"]],
    ["a tenth of a year", "settlement-schmertmann", { ...schmertmann, years: 0.1 }, []],
    ["a shorter time", "settlement-schmertmann", { ...schmertmann, years: 0.05 }, ["note: no-creep"]],
    [
      "a range with two ends",
      "presumptive-bearing",
      { standard: "bs8004-1986", soilClass: "firm-clay" },
      ["warning: presumed"],
    ],
    [
      "a range with one end",
      "presumptive-bearing",
      { standard: "bs8004-1986", soilClass: "soft-clay" },
      ["warning: presumed", "note: open-range"],
    ],
    ["1/500 between two footings", "angular-distortion", points(12), []],
    ["more than 1/500", "angular-distortion", points(12.1), ["warning: above-usual"]],
    ["more than 1/300", "angular-distortion", points(20.1), ["warning: above-range"]],
    ["more than 1/150", "angular-distortion", points(40.1), ["warning: ultimate"]],
    [
      "two footings on one place",
      "angular-distortion",
      { points: [...points(0).points, { id: "C", x_m: 6, y_m: 0, settlement_mm: 90 }] },
      ["note: one-place"],
    ],
    [
      "a friction that undrained ground has not",
      "bearing-resistance",
      {
        theory: "en1997",
        drainage: "undrained",
        effectiveBreadth_m: 2,
        effectiveLength_m: 2,
        depth_m: 1,
        cohesion_kPa: 50,
        frictionAngle_deg: 20,
        surcharge_kPa: 18,
        unitWeightBelow_kNm3: 18,
      },
      ["note: friction-not-used"],
    ],
    [
      "four values",
      "characteristic-value",
      { values: [9, 10, 11, 12], rule: "student-95-mean" },
      ["warning: few-values"],
    ],
    ["five values", "characteristic-value", { values: [9, 10, 11, 12, 13], rule: "student-95-mean" }, []],
    [
      "a wide scatter",
      "characteristic-value",
      { values: [1, 2, 9, 10, 14], rule: "schneider" },
      ["warning: wide-scatter"],
    ],
  ])("%s (%s)", (_, method, inputs, codes) => {
    expect(codesOf(method, inputs)).toEqual(codes);
  });
});

describe("ranges of the inputs", () => {
  it.each([
    ["sliding", "interfaceAngle_deg", 90],
    ["sliding", "vertical_kN", -1],
    ["bearing-factors", "frictionAngle_deg", 50.1],
    ["allowable-bearing", "factorOfSafety", 0.9],
    ["settlement-elastic", "poisson", 0.51],
    ["characteristic-value", "cov", 1.1],
    ["spt-correction", "energyRatio", 1.1],
    ["uplift", "uplift_kN", -1],
  ])("of %s refuse %s = %f", (method, field, figure) => {
    expect(runMethod(method, { [field]: figure })).toMatchObject({
      error: { fields: { [field]: expect.stringMatching(/must be/) } },
    });
  });
});
