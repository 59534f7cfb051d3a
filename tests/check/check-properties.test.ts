import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { UnusableInput } from "@/lib/check/assert-usable";
import { checkFooting } from "@/lib/check/check-footing";
import { explainCheck } from "@/lib/check/explain-check";
import { type FootingCheckInput, footingCheckInput } from "@/lib/check/input";
import { checks } from "./check-arbitraries";

/** The next number below, the smallest step that a comparison can be wrong by. */
function justBelow(figure: number): number {
  const bits = new DataView(new ArrayBuffer(8));
  bits.setFloat64(0, figure);
  bits.setBigInt64(0, bits.getBigInt64(0) - 1n);
  return bits.getFloat64(0);
}

const withNet = (input: FootingCheckInput, netAllowable_kPa: number): FootingCheckInput => ({
  ...input,
  value: { ...input.value, kind: "single", netAllowable_kPa } as FootingCheckInput["value"],
});

function frozen<Whole>(whole: Whole): Whole {
  if (typeof whole === "object" && whole !== null) {
    for (const part of Object.values(whole)) frozen(part);
    Object.freeze(whole);
  }
  return whole;
}

function figuresIn(value: unknown, at: (string | number)[] = []): (string | number)[][] {
  if (typeof value === "number") return [at];
  if (typeof value !== "object" || value === null) return [];
  return Object.entries(value).flatMap(([name, part]) => figuresIn(part, [...at, name]));
}

describe("a check, whatever the footing", () => {
  it("comes to the same digits each time, from an input that it leaves alone", () => {
    fc.assert(
      fc.property(checks, (input) => {
        const first = JSON.stringify(checkFooting(frozen(input)));
        expect(JSON.stringify(checkFooting(structuredClone(input)))).toBe(first);
      }),
    );
  });

  it("passes bearing with exactly the required value and fails with the number just below it", () => {
    fc.assert(
      fc.property(checks, (input) => {
        const { requiredNet_kPa } = checkFooting(input);
        fc.pre(requiredNet_kPa !== null && requiredNet_kPa > 1);
        const required = requiredNet_kPa as number;
        expect(checkFooting(withNet(input, required)).utilisationBearing).toBe(1);
        expect(checkFooting(withNet(input, justBelow(required))).utilisationBearing).toBeGreaterThan(1);
        expect(checkFooting(withNet(input, justBelow(required))).verdict).toBe("fails");
      }),
    );
  });

  it("asks for the same value whatever it is checked against", () => {
    fc.assert(
      fc.property(checks, (input) => {
        expect(checkFooting(withNet(input, 77)).requiredNet_kPa).toBe(checkFooting(input).requiredNet_kPa);
      }),
    );
  });

  it("never passes with less what it failed with more", () => {
    fc.assert(
      fc.property(checks, fc.double({ min: 0.3, max: 1, noNaN: true }), (input, share) => {
        fc.pre(input.value.kind === "single");
        const net_kPa = input.value.kind === "single" ? input.value.netAllowable_kPa : 1;
        const before = checkFooting(input);
        const after = checkFooting(withNet(input, net_kPa * share));
        if (before.verdict === "fails") expect(after.verdict).toBe("fails");
        if (before.utilisation !== null)
          expect(after.utilisation as number).toBeGreaterThanOrEqual(before.utilisation);
      }),
    );
  });

  it("passes only where every requirement of every combination is met, and says which is not", () => {
    fc.assert(
      fc.property(checks, (input) => {
        const result = checkFooting(input);
        const met = result.combinations.every((c) =>
          [
            c.utilisationBearing,
            c.utilisationContact,
            c.utilisationSliding,
            c.utilisationOverturning,
            c.utilisationUplift,
          ].every((share) => share !== null && share <= 1),
        );
        expect(result.verdict === "passes").toBe(met);
        expect(result.findings.some(({ severity }) => severity === "fails")).toBe(!met);
      }),
      { numRuns: 500 },
    );
  });

  it("gives out no figure that is NaN or infinite", () => {
    fc.assert(
      fc.property(checks, (input) => {
        const result = checkFooting(input);
        for (const path of figuresIn(result)) {
          const figure = path.reduce<unknown>((at, name) => (at as Record<string, unknown>)[name], result);
          expect(Number.isFinite(figure), path.join(".")).toBe(true);
        }
      }),
    );
  });

  it("is the same with the axes exchanged", () => {
    fc.assert(
      fc.property(checks, (input) => {
        const { footing, loads } = input;
        const here = checkFooting(input);
        const turned = checkFooting({
          ...input,
          footing: { ...footing, breadth_m: footing.length_m, length_m: footing.breadth_m },
          loads: loads.map((load) => ({
            ...load,
            momentB_kNm: load.momentL_kNm,
            momentL_kNm: load.momentB_kNm,
            horizontalB_kN: load.horizontalL_kN,
            horizontalL_kN: load.horizontalB_kN,
          })),
        });
        expect(turned.verdict).toBe(here.verdict);
        if (here.requiredNet_kPa === null) expect(turned.requiredNet_kPa).toBe(null);
        else expect(turned.requiredNet_kPa as number).toBeCloseTo(here.requiredNet_kPa, 6);
      }),
    );
  });

  it("is never made lower by turning all moments and horizontal loads round", () => {
    fc.assert(
      fc.property(checks, (input) => {
        const here = checkFooting(input);
        const round = checkFooting({
          ...input,
          loads: input.loads.map((load) => ({
            ...load,
            momentB_kNm: -load.momentB_kNm,
            momentL_kNm: -load.momentL_kNm,
            horizontalB_kN: -load.horizontalB_kN,
            horizontalL_kN: -load.horizontalL_kN,
          })),
        });
        expect(round.utilisation).toBe(here.utilisation);
        expect(round.maxPressure_kPa).toBe(here.maxPressure_kPa);
      }),
    );
  });

  it("takes its worst from some combination, and a combination more never makes it better", () => {
    fc.assert(
      fc.property(checks, (input) => {
        const whole = checkFooting(input);
        const alone = input.loads.map((load) => checkFooting({ ...input, loads: [load] }));
        const worst = Math.max(...alone.map(({ utilisation }) => utilisation ?? Number.POSITIVE_INFINITY));
        expect(whole.utilisation ?? Number.POSITIVE_INFINITY).toBe(worst);
        const governs = input.loads.findIndex(({ name }) => name === whole.governingCombination);
        expect(governs).toBeGreaterThanOrEqual(0);
      }),
    );
  });

  it("prints the figures that it computed: every step of the sheet is a figure of the result", () => {
    fc.assert(
      fc.property(checks, (input) => {
        const result = checkFooting(input);
        const { common, combinations } = explainCheck(input, result);
        const said = Object.fromEntries(common.map(({ symbol, value }) => [symbol, value]));
        expect(said).toEqual({
          D: result.depth_m,
          W_pad: result.padWeight_kN,
          W_fill: result.backfillWeight_kN,
          U: result.buoyancy_kN,
          "σ′": result.overburden_kPa,
        });
        combinations.forEach(({ lines }, at) => {
          const figures = result.combinations[at];
          if (!figures) throw new Error("A combination is missing.");
          const step = (symbol: string) => lines.find((line) => line.symbol === symbol)?.value;
          expect(step("V′")).toBe(figures.baseVertical_kN);
          expect(step("M_B")).toBe(figures.momentB_kNm);
          expect(step("M_L")).toBe(figures.momentL_kNm);
          if (figures.equilibrium) {
            expect(step("q_net")).toBe(figures.demandNet_kPa);
            expect(step("q_req")).toBe(figures.requiredNet_kPa);
            expect(step("u_bearing")).toBe(figures.utilisationBearing);
            expect(
              Math.abs((step("q_max") as number) / (figures.maxPressure_kPa as number) - 1),
            ).toBeLessThan(1e-12);
          }
          if (figures.slidingApplied_kN > 0) {
            expect(step("R")).toBe(figures.slidingResistance_kN);
            expect(step("F") ?? figures.factorSliding).toBe(figures.factorSliding);
          }
        });
      }),
      { numRuns: 200 },
    );
  });

  it("is refused, never passed, with NaN, infinity, a text or nothing in place of any figure", () => {
    fc.assert(
      fc.property(
        checks,
        fc.constantFrom<unknown>(
          Number.NaN,
          Number.POSITIVE_INFINITY,
          Number.NEGATIVE_INFINITY,
          "12",
          undefined,
        ),
        (input, figure) => {
          for (const path of figuresIn(input)) {
            // What is not stated is no condition; what is stated as something else than a number is refused.
            if (path.at(-1) === "groundwaterLevel_m" && figure === undefined) continue;
            const copy = structuredClone(input);
            const at = path
              .slice(0, -1)
              .reduce<unknown>((found, name) => (found as Record<string, unknown>)[name], copy);
            (at as Record<string | number, unknown>)[path.at(-1) as string] = figure;
            expect(() => checkFooting(copy), path.join(".")).toThrow(UnusableInput);
          }
        },
      ),
      { numRuns: 40 },
    );
  });

  it("takes what the schema lets through", () => {
    fc.assert(
      fc.property(checks, (input) => {
        expect(footingCheckInput.parse(structuredClone(input))).toEqual(input);
      }),
    );
  });
});
