import { describe, expect, it } from "vitest";
import type { DocumentRevisionId } from "@/lib/contracts/ids";
import type { DraftContent } from "@/lib/contracts/values";
import { readDraft } from "@/lib/services/values/read-draft";

const gravel = { soil: "gravel", today: "2026-03-01" };

const complete: DraftContent = {
  given: "250 kPa",
  givenBasis: "net",
  factorConvention: "net-over-factor",
  factorOfSafety: "3",
  comparedWith: "maximum",
  loadBasis: "characteristic-full",
  governedBy: "settlement",
  settlementLimit_mm: "25",
  groundwaterBasis: "Not met to 12 m",
  soilUnitWeight_kNm3: "18",
  drainage: "drained",
  transientIncrease: "none",
  basis: "recommended",
  purpose: "for-design",
  reasonCode: "first",
  reason: "From the investigation report",
  sources: [{ documentRevisionId: "r" as DocumentRevisionId, page: 3, clause: "", note: "", holes: [] }],
};
const problemsOf = (over: DraftContent) => readDraft({ ...complete, ...over }, gravel).problems;
const codesOf = (over: DraftContent, soil = "gravel") =>
  readDraft({ ...complete, ...over }, { ...gravel, soil }).findings.map(({ code }) => code);

describe("a draft read before it is signed", () => {
  it("lacks nothing when every choice is made and every figure given", () => {
    const read = readDraft(complete, gravel);
    expect(read.problems).toEqual({});
    expect(read.fields).toMatchObject({
      netAllowable_kPa: 250,
      given: "250 kPa",
      givenOverburden_kPa: null,
      transientFactor: 1,
    });
  });

  it.each(["givenBasis", "loadBasis", "transientIncrease"] as const)(
    "has no default for %s: absent, it stands in the way",
    (name) => {
      const { [name]: _, ...without } = complete;
      const read = readDraft(without, gravel);
      expect(read.fields).toBeNull();
      expect(Object.keys(read.problems)).toEqual([name]);
    },
  );

  it("names every missing field of an empty draft and reads no pressure from it", () => {
    const read = readDraft({}, gravel);
    expect(read.netAllowable_kPa).toBeNull();
    expect(Object.keys(read.problems).sort()).toEqual(
      [
        "basis",
        "comparedWith",
        "drainage",
        "factorConvention",
        "given",
        "givenBasis",
        "governedBy",
        "groundwaterBasis",
        "loadBasis",
        "purpose",
        "reason",
        "reasonCode",
        "soilUnitWeight_kNm3",
        "transientIncrease",
      ].sort(),
    );
  });
});

describe("net and gross", () => {
  it("brings a gross 286 kPa over 36 kPa of overburden to 250 kPa net and keeps both", () => {
    const { fields } = readDraft(
      { ...complete, given: "286 kPa", givenBasis: "gross", givenOverburden_kPa: "36" },
      gravel,
    );
    expect(fields).toMatchObject({
      netAllowable_kPa: 250,
      given_kPa: 286,
      givenOverburden_kPa: 36,
      givenBasis: "gross",
    });
    expect(fields?.factorConvention).toBe("net-over-factor");
  });

  it("refuses a gross figure without its overburden", () => {
    expect(problemsOf({ givenBasis: "gross" })).toHaveProperty("givenOverburden_kPa");
  });

  it("refuses a gross figure that the overburden uses up", () => {
    expect(problemsOf({ givenBasis: "gross", given: 36, givenOverburden_kPa: 36 })).toHaveProperty(
      "givenOverburden_kPa",
    );
  });

  it("leaves a net figure as it is, whatever overburden was typed beside it", () => {
    expect(readDraft({ ...complete, givenOverburden_kPa: 36 }, gravel).fields).toMatchObject({
      netAllowable_kPa: 250,
      givenOverburden_kPa: null,
    });
  });
});

describe("units as typed", () => {
  // Factors of conversion: kip/ft² and tonne-force/m² after the tables of any engineering handbook (exact definitions).
  it.each([
    ["3 ksf", 143.6],
    ["150 kN/m2", 150],
    ["15 t/m2", 147.1],
    ["0.25 MPa", 250],
  ])("reads %s as %d kPa", (typed, kPa) => {
    expect(readDraft({ ...complete, given: typed }, gravel).netAllowable_kPa).toBeCloseTo(kPa, 1);
  });

  it.each(["15 ton/m2", "2 ton", "abc", "1,5 kPa", "-200 kPa", "0", "1e400", "250 kN"])(
    "refuses %s beside the field",
    (typed) => {
      const read = readDraft({ ...complete, given: typed }, gravel);
      expect(read.fields).toBeNull();
      expect(Object.keys(read.problems)).toEqual(["given"]);
    },
  );

  it("asks for a point where a decimal comma was typed", () => {
    expect(problemsOf({ minBreadth_m: "1,5" }).minBreadth_m).toContain("1.5");
  });

  it("takes a breadth in metres or feet and refuses one in kPa", () => {
    expect(readDraft({ ...complete, minBreadth_m: "1.5 m" }, gravel).fields?.minBreadth_m).toBe(1.5);
    expect(readDraft({ ...complete, minBreadth_m: "5 ft" }, gravel).fields?.minBreadth_m).toBeCloseTo(
      1.524,
      9,
    );
    expect(problemsOf({ minBreadth_m: "5 kPa" })).toHaveProperty("minBreadth_m");
  });
});

describe("what cannot be", () => {
  it.each([
    ["a greatest breadth under the least", { minBreadth_m: 2, maxBreadth_m: 1 }, "maxBreadth_m"],
    [
      "a highest founding level under the lowest",
      { lowestFoundingLevel_m: 10, highestFoundingLevel_m: 9 },
      "highestFoundingLevel_m",
    ],
    ["a unit weight of water", { soilUnitWeight_kNm3: 1.8 }, "soilUnitWeight_kNm3"],
    ["a settlement that governs and is not stated", { settlementLimit_mm: null }, "settlementLimit_mm"],
    ["a recommendation without a page", { sources: [] }, "sources"],
    [
      "an increase on loads already reduced",
      {
        transientIncrease: "granted",
        transientFactor: 1.25,
        accidentalFactor: 1,
        loadBasis: "characteristic-reduced",
      },
      "transientIncrease",
    ],
    [
      "an increase without its factor",
      { transientIncrease: "granted", accidentalFactor: 1 },
      "transientFactor",
    ],
    [
      "an increase of nothing",
      { transientIncrease: "granted", transientFactor: 1, accidentalFactor: 1 },
      "transientFactor",
    ],
    ["a factor of safety below one", { factorOfSafety: 0.9 }, "factorOfSafety"],
    ["a reason of one word", { reason: "water" }, "reason"],
  ] as [string, DraftContent, string][])("refuses %s", (_, over, field) => {
    expect(Object.keys(problemsOf(over))).toEqual([field]);
  });

  it("keeps an assumed value preliminary, with a day and a person to confirm it", () => {
    const assumed: DraftContent = { basis: "assumed", sources: [] };
    expect(Object.keys(problemsOf(assumed)).sort()).toEqual(["confirmBy", "confirmWho", "purpose"]);
    expect(
      problemsOf({ ...assumed, purpose: "preliminary", confirmWho: "I. Halloran", confirmBy: "2026-02-30" }),
    ).toHaveProperty("confirmBy");
    expect(
      problemsOf({ ...assumed, purpose: "preliminary", confirmWho: "I. Halloran", confirmBy: "2026-04-30" }),
    ).toEqual({});
  });
});

describe("what is odd is asked, not refused", () => {
  // Bands from BS 8004:1986 table 1 (secondary copy); job table row 7 names clay over 600 kPa and sand under 20 kPa.
  it("asks about clay over 600 kPa and sand under 20 kPa, and not about either at 150 kPa", () => {
    expect(codesOf({ given: 650 }, "clay")).toEqual(["unusual-pressure"]);
    expect(codesOf({ given: 600 }, "clay")).toEqual([]);
    expect(codesOf({ given: 19 }, "sand")).toEqual(["unusual-pressure"]);
    expect(codesOf({ given: 150 }, "sand")).toEqual([]);
    expect(codesOf({ given: 150 }, "clay")).toEqual([]);
  });

  it("asks about psf typed as kPa: 3000 on gravel", () => {
    const { findings, problems } = readDraft({ ...complete, given: 3000 }, gravel);
    expect(problems).toEqual({});
    expect(findings[0]?.source).toContain("BS 8004");
  });

  it("asks about any pressure on peat and made ground", () => {
    expect(codesOf({ given: 20 }, "peat")).toEqual(["unusual-pressure"]);
    expect(codesOf({ given: 100 }, "made-ground")).toEqual(["unusual-pressure"]);
  });

  it("asks about an increase on a value that settlement limits, and about allowables beside factored loads", () => {
    expect(codesOf({ transientIncrease: "granted", transientFactor: 1.25, accidentalFactor: 1 })).toEqual([
      "increase-on-settlement",
    ]);
    expect(codesOf({ loadBasis: "design-factored" })).toEqual(["allowable-with-factored-loads"]);
  });
});
