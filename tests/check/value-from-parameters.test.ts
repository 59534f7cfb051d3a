import { describe, expect, it } from "vitest";
import { checkFooting } from "@/lib/check/check-footing";
import { explainCheck } from "@/lib/check/explain-check";
import { bearingResistanceOf } from "@/lib/methods/bearing-resistance/index";
import { pad } from "./check-arbitraries";

const clay = {
  theory: "en1997",
  drainage: "undrained",
  cohesion_kPa: 50,
  frictionAngle_deg: 0,
  unitWeightBelow_kNm3: 18,
  factorOfSafety: 3,
  convention: "net-over-factor",
  settlementCap_kPa: null,
};

describe("a value computed from soil parameters", () => {
  const value = { kind: "parameters", parameters: clay };

  it("is less for a load that is inclined, and less still along the side that it acts on", () => {
    const net = (load: object) =>
      checkFooting(pad({ footing: { length_m: 4 }, loads: [load], value })).combinations[0]
        ?.netAllowable_kPa as number;
    expect(net({ horizontalB_kN: 60 })).toBeLessThan(net({}));
  });

  it("fails where the horizontal load is more than the clay holds", () => {
    const result = checkFooting(pad({ loads: [{ horizontalB_kN: 250 }], value }));
    expect(result.verdict).toBe("fails");
    expect(result.findings.map(({ message }) => message)).toContain(
      "Bearing: the ground has no resistance left under this load.",
    );
  });

  it("does not apply to a horizontal load where its theory knows none", () => {
    const old = { ...value, parameters: { ...clay, theory: "terzaghi" } };
    expect(checkFooting(pad({ value: old })).verdict).toBe("passes");
    const result = checkFooting(pad({ loads: [{ horizontalL_kN: 5 }], value: old }));
    expect(result.verdict).toBe("outside conditions");
    expect(result.findings[0]).toMatchObject({ code: "no-inclination", severity: "outside" });
  });

  it("keeps the direction of the horizontal load when the effective sides change places", () => {
    const sand = { ...clay, drainage: "drained", frictionAngle_deg: 30, cohesion_kPa: 0 };
    const one = checkFooting(
      pad({
        footing: { breadth_m: 2, length_m: 3 },
        loads: [{ horizontalB_kN: 50 }],
        value: { ...value, parameters: sand },
      }),
    );
    const turned = checkFooting(
      pad({
        footing: { breadth_m: 3, length_m: 2 },
        loads: [{ horizontalL_kN: 50 }],
        value: { ...value, parameters: sand },
      }),
    );
    const other = checkFooting(
      pad({
        footing: { breadth_m: 2, length_m: 3 },
        loads: [{ horizontalL_kN: 50 }],
        value: { ...value, parameters: sand },
      }),
    );
    const ultimate = (result: typeof one) => result.combinations[0]?.ultimate_kPa as number;
    expect(ultimate(turned)).toBeCloseTo(ultimate(one), 9);
    expect(Math.abs(ultimate(other) / ultimate(one) - 1)).toBeGreaterThan(0.01);
  });

  it("is what the method bearing-resistance gives: effective sides, effective overburden, submerged weight", () => {
    const sand = {
      ...clay,
      drainage: "drained",
      frictionAngle_deg: 32,
      cohesion_kPa: 2,
      unitWeightBelow_kNm3: 20,
    };
    const input = pad({
      footing: { breadth_m: 2, length_m: 3 },
      loads: [{ vertical_kN: 600, momentB_kNm: 40, horizontalB_kN: 50, horizontalL_kN: 20 }],
      value: { ...value, parameters: sand, groundwaterLevel_m: 10.4 },
    });
    const [c] = checkFooting(input).combinations;
    if (!c) throw new Error("No combination.");
    expect([c.effectiveBreadth_m, c.effectiveLength_m].every((side) => side > 0)).toBe(true);
    const { ultimate_kPa } = bearingResistanceOf({
      theory: "en1997",
      drainage: "drained",
      effectiveBreadth_m: c.effectiveBreadth_m,
      effectiveLength_m: c.effectiveLength_m,
      depth_m: 1,
      cohesion_kPa: 2,
      frictionAngle_deg: 32,
      surcharge_kPa: 18 - 9.81 * 0.4,
      unitWeightBelow_kNm3: 20,
      vertical_kN: c.baseVertical_kN,
      horizontal_kN: Math.hypot(50, 20),
      horizontalAlong: (Math.atan2(50, 20) * 180) / Math.PI,
      baseTilt_deg: 0,
      waterDepth_m: -0.4,
    });
    expect(c.ultimate_kPa).toBeCloseTo(ultimate_kPa, 9);
    expect(c.netAllowable_kPa).toBeCloseTo((ultimate_kPa - (18 - 9.81 * 0.4)) / 3, 9);
  });

  it("takes the total overburden off an undrained gross value", () => {
    const gross = {
      ...value,
      parameters: { ...clay, convention: "gross-over-factor" },
      groundwaterLevel_m: 11,
    };
    const [c] = checkFooting(pad({ value: gross })).combinations;
    expect(c?.netAllowable_kPa).toBeCloseTo(((Math.PI + 2) * 60 + 18) / 3 - 18, 9);
  });

  it("comes to the same undrained net pressure whether water stands at the surface or nowhere", () => {
    const net = (groundwaterLevel_m: number | null) =>
      checkFooting(pad({ value: { ...value, groundwaterLevel_m } })).utilisationBearing as number;
    expect(net(11)).toBeCloseTo(net(null), 12);
  });

  it("is not raised beyond what settlement allows, not even for a short load", () => {
    const capped = {
      ...value,
      parameters: { ...clay, settlementCap_kPa: 80 },
      durationFactors: { transient: 2, accidental: 2 },
    };
    const [c] = checkFooting(pad({ loads: [{ duration: "transient" }], value: capped })).combinations;
    expect(c).toMatchObject({ capacityNet_kPa: 80, demandNet_kPa: 103 });
    expect(c?.utilisationBearing).toBe(103 / 80);
  });

  it("shows how it was computed", () => {
    const input = pad({ value });
    const { combinations } = explainCheck(input, checkFooting(input));
    const symbols = combinations[0]?.lines.map(({ symbol }) => symbol) ?? [];
    expect(symbols).toEqual(expect.arrayContaining(["q_c", "q_q", "q_γ", "q_ult", "q_net,a"]));
  });
});
