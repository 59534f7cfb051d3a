import { describe, expect, it } from "vitest";
import { UnusableInput } from "@/lib/check/assert-usable";
import { checkFooting } from "@/lib/check/check-footing";
import { footingCheckInput } from "@/lib/check/input";
import { footingCheck } from "@/lib/check/method";
import { pad } from "./check-arbitraries";

const codes = (input: Parameters<typeof checkFooting>[0]) =>
  checkFooting(input).findings.map(({ code, severity }) => `${severity}: ${code}`);

describe("the verdict", () => {
  it("does not call −800 kPa a pass when the resultant leaves the base", () => {
    const result = checkFooting(
      pad({ loads: [{ vertical_kN: 100, momentB_kNm: 300, duration: "accidental" }] }),
    );
    expect(result).toMatchObject({ verdict: "fails", utilisation: null, maxPressure_kPa: null });
    expect(result.findings[0]).toMatchObject({
      code: "no-equilibrium",
      severity: "fails",
      combination: "C1",
    });
  });

  it("does not let a negative moment give a lower peak", () => {
    const there = checkFooting(pad({ loads: [{ momentB_kNm: 80 }] }));
    expect(checkFooting(pad({ loads: [{ momentB_kNm: -80 }] })).maxPressure_kPa).toBe(there.maxPressure_kPa);
  });

  it("never says 150 against 150: it prints as many figures as it takes to tell two numbers apart", () => {
    const said = (net_kPa: number) =>
      checkFooting(pad({ loads: [{ vertical_kN: (net_kPa - 3) * 4 }] })).findings[0]?.message;
    expect(said(150.4)).toBe("Bearing: 150.4 kPa net against 150.0 kPa allowed.");
    expect(said(150.0004)).toBe("Bearing: 150.0004 kPa net against 150.0000 kPa allowed.");
  });

  it("gives another answer when breadth and length are exchanged and the moment is not", () => {
    const oblong = (breadth_m: number, length_m: number) =>
      checkFooting(pad({ footing: { breadth_m, length_m }, loads: [{ momentB_kNm: 60 }] })).maxPressure_kPa;
    expect(oblong(2, 3)).not.toBe(oblong(3, 2));
  });

  it("refuses a footing without loads, a size of nothing, a base above the ground and a value of nothing", () => {
    for (const wrong of [
      pad({ loads: [] }),
      pad({ footing: { breadth_m: 0 } }),
      pad({ footing: { length_m: -2 } }),
      pad({ footing: { foundingLevel_m: 11.5 } }),
      pad({ value: { netAllowable_kPa: 0 } }),
      pad({ value: { minBreadth_m: Number.NaN } }),
    ])
      expect(() => checkFooting(wrong)).toThrow(UnusableInput);
  });

  it("fails a duration that it does not know", () => {
    expect(() => checkFooting(pad({ loads: [{ duration: "short" as "transient" }] }))).not.toThrow();
    expect(checkFooting(pad({ loads: [{ duration: "short" as "transient" }] })).verdict).toBe("fails");
  });
});

describe("a value outside its conditions", () => {
  it.each([
    ["a pad narrower than it holds for", { minBreadth_m: 2.1 }, "breadth"],
    ["a pad broader than it holds for", { maxBreadth_m: 1.9 }, "breadth"],
    ["too little cover", { minFoundingDepth_m: 1.01 }, "cover"],
  ])("does not apply to %s, and says which condition", (_, value, code) => {
    const result = checkFooting(pad({ value }));
    expect(result.verdict).toBe("outside conditions");
    expect(result.findings[0]).toMatchObject({ code, severity: "outside" });
    expect(result.findings[0]?.message).toMatch(/2 m|1 m/);
  });

  it("still applies exactly at its limits", () => {
    const value = { minBreadth_m: 2, maxBreadth_m: 2, minFoundingDepth_m: 1 };
    expect(checkFooting(pad({ value })).verdict).toBe("passes");
  });

  it("goes by the smaller side, whichever that is", () => {
    for (const footing of [
      { breadth_m: 2, length_m: 4 },
      { breadth_m: 4, length_m: 2 },
    ])
      expect(checkFooting(pad({ footing, value: { maxBreadth_m: 3 } })).verdict).toBe("passes");
  });

  it("is never extrapolated from a table: the figures are there, the verdict is not a pass", () => {
    const table = {
      breadths_m: [1, 1.5],
      depths_m: [0.5, 2],
      netAllowable_kPa: [
        [900, 900],
        [900, 900],
      ],
    };
    const result = checkFooting(pad({ value: { kind: "table", table } }));
    expect(result).toMatchObject({ verdict: "outside conditions", utilisation: null, requiredNet_kPa: 103 });
    expect(result.findings[0]?.message).toContain("largest breadth, 1.5 m");
  });

  it("says outside conditions rather than fails, and tells what fails besides", () => {
    expect(codes(pad({ value: { maxBreadth_m: 1 }, loads: [{ vertical_kN: 4000 }] }))).toEqual([
      "outside: breadth",
      "fails: bearing",
    ]);
  });
});

describe("load durations", () => {
  const wind = { vertical_kN: 738, duration: "transient" } as const;

  it("raise nothing unless the value grants it", () => {
    expect(checkFooting(pad({ loads: [wind] })).verdict).toBe("fails");
    const granted = { durationFactors: { transient: 1.25, accidental: 1 } };
    expect(checkFooting(pad({ loads: [wind], value: granted })).verdict).toBe("passes");
    expect(checkFooting(pad({ loads: [{ ...wind, duration: "permanent" }], value: granted })).verdict).toBe(
      "fails",
    );
  });

  it("hold a permanent load to the middle third, a transient one to half the base", () => {
    const lifted = { momentB_kNm: 200, vertical_kN: 400 };
    const value = { netAllowable_kPa: 1000 };
    expect(codes(pad({ loads: [lifted], value }))).toEqual(["fails: middle-third", "note: partial-contact"]);
    expect(codes(pad({ loads: [{ ...lifted, duration: "transient" }], value }))).toEqual([
      "note: partial-contact",
    ]);
    const far = { momentB_kNm: 350, vertical_kN: 400, duration: "transient" } as const;
    expect(codes(pad({ loads: [far], value }))).toContain("fails: contact");
    expect(
      codes(
        pad({
          loads: [{ ...far, duration: "accidental" }],
          value,
          criteria: { accidentalMinContactRatio: 0.2 },
        }),
      ),
    ).not.toContain("fails: contact");
  });

  it("ask nothing of a permanent eccentricity where the criteria do not", () => {
    const value = { netAllowable_kPa: 1000 };
    const criteria = { permanentWithinMiddleThird: false };
    expect(checkFooting(pad({ loads: [{ momentB_kNm: 200 }], value, criteria })).verdict).toBe("passes");
  });
});

describe("stability", () => {
  it("is judged on the combination with the least weight, bearing on that with the most", () => {
    const result = checkFooting(
      pad({
        loads: [
          { name: "most", vertical_kN: 500, horizontalB_kN: 60 },
          { name: "least", vertical_kN: 50, horizontalB_kN: 60, duration: "transient" },
        ],
      }),
    );
    expect(result.factorSliding).toBe(result.combinations[1]?.factorSliding);
    expect(result.maxPressure_kPa).toBe(result.combinations[0]?.maxPressure_kPa);
    expect(result).toMatchObject({ governingCombination: "least", governedBy: "sliding", verdict: "fails" });
  });

  it("is governed by the first of combinations that are alike", () => {
    const result = checkFooting(pad({ loads: [{ name: "one" }, { name: "same" }, { name: "again" }] }));
    expect(result.governingCombination).toBe("one");
  });

  it("holds overturning to the factor that the project asks for", () => {
    const loads = [{ vertical_kN: 516, momentB_kNm: 300, duration: "transient" as const }];
    const value = { netAllowable_kPa: 1000 };
    expect(codes(pad({ loads, value, criteria: { overturningFactor: 2 } }))).not.toContain(
      "fails: overturning",
    );
    const asked = checkFooting(pad({ loads, value, criteria: { overturningFactor: 2.5 } }));
    expect(asked).toMatchObject({ verdict: "fails", governedBy: "overturning", utilisation: 1.25 });
    expect(asked.findings[0]?.message).toBe("Overturning: factor 2.00 where 2.50 is asked.");
  });

  it("has no backfill on a pad that is thicker than it is deep, and none taken off", () => {
    const result = checkFooting(pad({ footing: { thickness_m: 1.5 } }));
    expect(result).toMatchObject({ padWeight_kN: 144, backfillWeight_kN: 0, depth_m: 1 });
  });

  it("slides on the effective load: water takes its share", () => {
    const loads = [{ horizontalB_kN: 100 }];
    const dry = checkFooting(pad({ loads })).factorSliding as number;
    const wet = checkFooting(pad({ loads, value: { groundwaterLevel_m: 11 } })).factorSliding as number;
    expect(wet / dry).toBeCloseTo((484 - 39.24) / 484, 12);
  });

  it("counts adhesion on the area in contact only", () => {
    const criteria = { interfaceAngle_deg: 0, adhesion_kPa: 50, permanentWithinMiddleThird: false };
    const [c] = checkFooting(
      pad({
        loads: [{ vertical_kN: 516, momentB_kNm: 299.5, horizontalB_kN: 1 }],
        criteria,
        value: { netAllowable_kPa: 900 },
      }),
    ).combinations;
    expect(c?.contactRatio).toBeCloseTo(0.75, 12);
    expect(c?.slidingResistance_kN).toBeCloseTo(50 * 3, 9);
  });

  it("holds a pull down with weight alone, not with the pull", () => {
    const result = checkFooting(pad({ loads: [{ vertical_kN: -80 }] }));
    expect(result.factorUplift).toBe(84 / 80);
    expect(result.verdict).toBe("fails");
    expect(result.findings[0]).toMatchObject({ code: "uplift" });
    expect(result.findings[0]?.message).toBe("Uplift: factor 1.05 where 1.10 is asked.");
  });

  it("finds no equilibrium where more pulls than holds", () => {
    expect(codes(pad({ loads: [{ vertical_kN: -100 }] }))).toEqual([
      "fails: no-equilibrium",
      "fails: uplift",
    ]);
  });

  it("fails a horizontal load that nothing resists", () => {
    const criteria = { interfaceAngle_deg: 0, adhesion_kPa: 0 };
    expect(codes(pad({ loads: [{ horizontalL_kN: 1 }], criteria }))).toEqual(["fails: sliding"]);
  });
});

describe("notes", () => {
  it("say that the pad stands out of the ground, and that water stands above it", () => {
    expect(codes(pad({ footing: { thickness_m: 1.2 } }))).toEqual(["note: pad-above-ground"]);
    expect(codes(pad({ value: { groundwaterLevel_m: 11.5 } }))).toContain("warning: water-above-ground");
  });

  it("warn of an eccentricity beyond a third of the side", () => {
    const loads = [{ vertical_kN: 500, momentB_kNm: 400, duration: "accidental" as const }];
    const criteria = { accidentalMinContactRatio: 0.2, overturningFactor: 1.1 };
    expect(codes(pad({ loads, criteria, value: { netAllowable_kPa: 2000 } }))).toContain(
      "warning: large-eccentricity",
    );
  });
});

describe("as a method", () => {
  const asked = {
    footing: { breadth_m: 2, length_m: 2, thickness_m: 0.5, groundLevel_m: 11, foundingLevel_m: 10 },
    loads: [{ name: "G", duration: "permanent", vertical_kN: 400 }],
    value: { kind: "single", netAllowable_kPa: 150, soilUnitWeight_kNm3: 18 },
    criteria: { interfaceAngle_deg: 30 },
  };

  it("fills in what is left out as the definitions say", () => {
    expect(footingCheckInput.parse(asked)).toEqual(pad({ loads: [{ name: "G" }] }));
  });

  it.each([
    ["a value typed beside the kind that it is not", { value: { ...asked.value, table: {} } }, "value.table"],
    ["a kind that there is not", { value: { ...asked.value, kind: "guess" } }, "value.kind"],
    [
      "a base above the ground",
      { footing: { ...asked.footing, foundingLevel_m: 12 } },
      "footing.foundingLevel_m",
    ],
    ["no loads", { loads: [] }, "loads"],
    [
      "a duration factor of nothing",
      { value: { ...asked.value, durationFactors: { transient: 0 } } },
      "value.durationFactors.transient",
    ],
    [
      "a pressure among the criteria",
      { criteria: { ...asked.criteria, netAllowable_kPa: 400 } },
      "criteria.netAllowable_kPa",
    ],
  ])("refuses %s, by field", (_, part, field) => {
    expect(footingCheck.answer({ ...asked, ...part })).toMatchObject({
      error: { code: "invalid", fields: { [field]: expect.any(String) } },
    });
  });
});
