import { describe, expect, it } from "vitest";
import { runMethod } from "@/lib/check/all-methods";
import { theories } from "@/lib/methods/bearing-factors/index";
import { student95 } from "@/lib/methods/characteristic-value/student";
import {
  foxDepthFactor,
  halfSpaceCorner,
  halfSpaceMean,
  layerCorner,
} from "@/lib/methods/settlement-elastic/formulas";
import { boussinesqCorner } from "@/lib/methods/stress-increase/formulas";

function outputsOf(method: string, inputs: Record<string, unknown>): Record<string, number> {
  const answer = runMethod(method, inputs);
  if ("error" in answer) throw new Error(JSON.stringify(answer.error));
  return answer.outputs as Record<string, number>;
}
const findingsOf = (method: string, inputs: Record<string, unknown>): string[] => {
  const answer = runMethod(method, inputs);
  if ("error" in answer) throw new Error(JSON.stringify(answer.error));
  return answer.findings.map(({ code }) => code);
};

describe("bearing resistance", () => {
  const base = {
    drainage: "drained",
    effectiveBreadth_m: 2,
    effectiveLength_m: 3,
    depth_m: 1,
    cohesion_kPa: 5,
    frictionAngle_deg: 30,
    surcharge_kPa: 18,
    unitWeightBelow_kNm3: 18,
    vertical_kN: 900,
  };

  it.each(theories)("grows with friction, cohesion and overburden (%s)", (theory) => {
    const of = (more: object) =>
      outputsOf("bearing-resistance", { theory, ...base, ...more }).ultimate_kPa as number;
    expect(of({ frictionAngle_deg: 31 })).toBeGreaterThan(of({}));
    expect(of({ cohesion_kPa: 6 })).toBeGreaterThan(of({}));
    expect(of({ surcharge_kPa: 19 })).toBeGreaterThan(of({}));
  });

  it.each(["meyerhof", "hansen", "vesic", "en1997"])(
    "falls with a horizontal load without a step (%s)",
    (theory) => {
      const of = (horizontal_kN: number) =>
        outputsOf("bearing-resistance", {
          theory,
          ...base,
          horizontal_kN,
          // Meyerhof leaves shape at one as soon as the load inclines: a square-free strip shows no step.
          effectiveLength_m: theory === "meyerhof" ? 1e9 : 3,
        }).ultimate_kPa as number;
      expect(of(1e-6)).toBeCloseTo(of(0), 2);
      expect(of(100)).toBeLessThan(of(50));
      expect(of(50)).toBeLessThan(of(0));
    },
  );

  it.each(theories)("goes over into the undrained form as friction goes to nothing (%s)", (theory) => {
    const of = (frictionAngle_deg: number) =>
      outputsOf("bearing-factors", { theory, frictionAngle_deg }) as {
        nc: number;
        nq: number;
        nGamma: number;
      };
    const [none, almost] = [of(0), of(1e-6)];
    expect(almost.nc).toBeCloseTo(none.nc, 5);
    expect(almost.nq).toBeCloseTo(1, 5);
    expect(almost.nGamma).toBeCloseTo(0, 5);
    expect(none.nc).toBeCloseTo(theory === "terzaghi" ? 1.5 * Math.PI + 1 : Math.PI + 2, 12);
  });

  it("falls as water rises to the base, and no further below it than one breadth", () => {
    const of = (waterDepth_m: number | null) =>
      outputsOf("bearing-resistance", { theory: "en1997", ...base, waterDepth_m }).ultimate_kPa as number;
    expect(of(2)).toBe(of(null));
    expect(of(1)).toBeLessThan(of(2));
    expect(of(0)).toBeLessThan(of(1));
    expect(of(-1)).toBe(of(0));
  });

  it("refuses sides in the wrong order and an inclined load without a vertical one", () => {
    const wrong = (more: object) => runMethod("bearing-resistance", { theory: "en1997", ...base, ...more });
    expect(wrong({ effectiveBreadth_m: 4 })).toMatchObject({
      error: { fields: { effectiveBreadth_m: expect.any(String) } },
    });
    expect(wrong({ vertical_kN: null, horizontal_kN: 5 })).toMatchObject({
      error: { fields: { vertical_kN: expect.any(String) } },
    });
    expect(wrong({ frictionAngle_deg: 51 })).toMatchObject({
      error: { fields: { frictionAngle_deg: expect.any(String) } },
    });
  });

  it("says what a theory leaves out rather than leaving it out in silence", () => {
    expect(findingsOf("bearing-resistance", { theory: "terzaghi", ...base, horizontal_kN: 50 })).toEqual([
      "no-inclination",
    ]);
    expect(findingsOf("bearing-resistance", { theory: "meyerhof", ...base, baseTilt_deg: 3 })).toEqual([
      "no-tilt",
    ]);
    expect(findingsOf("bearing-resistance", { theory: "vesic", ...base, frictionAngle_deg: 46 })).toEqual([
      "high-friction",
    ]);
    expect(findingsOf("bearing-resistance", { theory: "vesic", ...base, depth_m: 5.1 })).toEqual(["deep"]);
    expect(findingsOf("bearing-resistance", { theory: "en1997", ...base, horizontal_kN: 2000 })).toEqual([
      "sliding-governs",
    ]);
  });
});

describe("Terzaghi's table of Nγ", () => {
  const gamma = (frictionAngle_deg: number) =>
    outputsOf("bearing-factors", { theory: "terzaghi", frictionAngle_deg }).nGamma as number;
  const degrees = Array.from({ length: 49 }, (_, at) => at + 1);

  it("runs smoothly: no entry stands out from its neighbours by more than its rounding", () => {
    for (const angle of degrees) {
      const [below, here, above] = [gamma(angle - 1), gamma(angle), gamma(angle + 1)];
      // Rounded to a hundredth; the slope itself changes by less than half a per cent from degree to degree.
      const rounding = angle < 15 ? 0.011 : 0.005;
      const middle = below > 0 ? Math.sqrt(below * above) : above / 4;
      expect(Math.abs(here - middle), `${angle}°`).toBeLessThan(2 * rounding + 0.005 * here);
    }
  });

  it("keeps within 12 % of a closed form fitted to it from 25° on, 2 (Nq + 1) tan φ / (1 + 0.4 sin 4φ), from memory of Coduto", () => {
    for (const angle of degrees.filter((one) => one >= 25 && one <= 48)) {
      const { nq = 0 } = outputsOf("bearing-factors", { theory: "terzaghi", frictionAngle_deg: angle });
      const phi = (angle * Math.PI) / 180;
      const fitted = (2 * (nq + 1) * Math.tan(phi)) / (1 + 0.4 * Math.sin(4 * phi));
      expect(Math.abs(gamma(angle) / fitted - 1), `${angle}°`).toBeLessThan(0.12);
    }
  });

  it("rises between whole degrees without a step", () => {
    for (let tenth = 0; tenth < 500; tenth += 1)
      expect(gamma((tenth + 1) / 10)).toBeGreaterThan(gamma(tenth / 10));
    expect(gamma(30 - 1e-9)).toBeCloseTo(gamma(30 + 1e-9), 6);
  });
});

describe("stress increase", () => {
  it("is the pressure itself under the loaded area, half on its side, a quarter on its corner, nothing beside it", () => {
    const at = (x_m: number, y_m: number) =>
      outputsOf("stress-increase", {
        rule: "boussinesq",
        breadth_m: 2,
        length_m: 3,
        pressure_kPa: 100,
        depth_m: 0,
        x_m,
        y_m,
      }).influence as number;
    expect(at(0, 0)).toBeCloseTo(1, 12);
    expect(at(1, 0)).toBeCloseTo(0.5, 12);
    expect(at(1, 1.5)).toBeCloseTo(0.25, 12);
    expect(at(1.5, 0)).toBeCloseTo(0, 12);
  });

  it("adds up over the plane to the whole load, at any depth", () => {
    const [depth_m, step_m, reach_m] = [1.5, 0.25, 120];
    let sum = 0;
    for (let x = step_m / 2; x < reach_m; x += step_m * (x < 10 ? 1 : 8))
      for (let y = step_m / 2; y < reach_m; y += step_m * (y < 10 ? 1 : 8)) {
        const area = step_m ** 2 * (x < 10 ? 1 : 8) * (y < 10 ? 1 : 8);
        const corner = (a: number, b: number) => boussinesqCorner(a, b, depth_m);
        sum +=
          4 *
          area *
          (corner(1 - x, 1 - y) + corner(1 + x, 1 - y) + corner(1 - x, 1 + y) + corner(1 + x, 1 + y));
      }
    expect(sum / 4).toBeGreaterThan(0.97);
    expect(sum / 4).toBeLessThan(1.03);
  });
});

describe("elastic settlement", () => {
  it("of a layer goes over into that of the half-space as it thickens, and to nothing as it thins", () => {
    for (const m of [1, 2, 5]) {
      expect(Math.abs(layerCorner(m, 1e6, 0.3) / halfSpaceCorner(m) - 1)).toBeLessThan(1e-5);
      expect(layerCorner(m, 1e-6, 0.3)).toBeLessThan(1e-5);
    }
  });

  it("does not depend on which side is called the breadth", () => {
    const of = (breadth_m: number, length_m: number) =>
      outputsOf("settlement-elastic", {
        breadth_m,
        length_m,
        pressure_kPa: 100,
        modulus_kPa: 1e4,
        layerThickness_m: 4,
        rigidity: "flexible-centre",
      }).settlement_mm as number;
    expect(of(2, 5)).toBeCloseTo(of(5, 2), 12);
  });

  it("has a rigid base settle less than the flexible mean, and the mean less than the centre", () => {
    for (const m of [1, 1.5, 2, 4, 10]) {
      const rigid = outputsOf("settlement-elastic", {
        breadth_m: 1,
        length_m: m,
        pressure_kPa: 1,
        modulus_kPa: 1,
        rigidity: "rigid",
      }).influence as number;
      expect(rigid).toBeLessThan(halfSpaceMean(m));
      expect(halfSpaceMean(m)).toBeLessThan(2 * halfSpaceCorner(m));
    }
  });

  it("at depth goes from one at the surface to that of the full space, (3 − 4ν) / 8(1 − ν)²", () => {
    for (const poisson of [0, 0.3, 0.5]) {
      expect(foxDepthFactor(1, 2, 1e-6, poisson)).toBeCloseTo(1, 4);
      expect(foxDepthFactor(1, 2, 500, poisson)).toBeCloseTo((3 - 4 * poisson) / (8 * (1 - poisson) ** 2), 2);
    }
  });
});

describe("consolidation", () => {
  it("has no step where the final stress passes the preconsolidation stress", () => {
    const of = (increase_kPa: number) =>
      outputsOf("settlement-consolidation", {
        layers: [
          {
            thickness_m: 3,
            effectiveStress_kPa: 60,
            preconsolidation_kPa: 100,
            increase_kPa,
            cc: 0.3,
            cr: 0.04,
            e0: 0.9,
          },
        ],
      }).settlement_mm as number;
    expect(of(40 + 1e-9)).toBeCloseTo(of(40 - 1e-9), 6);
    expect(of(60)).toBeGreaterThan(of(40));
  });

  it("warns of ground that still settles under its own weight", () => {
    const layer = {
      thickness_m: 3,
      effectiveStress_kPa: 60,
      preconsolidation_kPa: 50,
      increase_kPa: 10,
      cc: 0.3,
      cr: 0.04,
      e0: 0.9,
    };
    expect(findingsOf("settlement-consolidation", { layers: [layer] })).toEqual(["underconsolidated"]);
  });
});

describe("settlement on sand", () => {
  it("has no step where the pressure passes what the ground has borne before (Burland and Burbidge)", () => {
    const of = (pressure_kPa: number) =>
      outputsOf("settlement-burland-burbidge", {
        breadth_m: 2,
        length_m: 3,
        pressure_kPa,
        previousPressure_kPa: 100,
        averageN60: 20,
        loading: "static",
      }).settlement_mm as number;
    expect(of(100 + 1e-9)).toBeCloseTo(of(100 - 1e-9), 6);
  });

  it("counts a layer thicker than the influence in full (Burland and Burbidge)", () => {
    const of = (layerThickness_m: number | null) =>
      outputsOf("settlement-burland-burbidge", {
        breadth_m: 2,
        length_m: 2,
        pressure_kPa: 100,
        averageN60: 20,
        layerThickness_m,
        loading: "static",
      }).thicknessFactor as number;
    expect(of(null)).toBe(1);
    expect(of(50)).toBe(1);
    expect(of(0.5 * 2 ** 0.75)).toBeCloseTo(0.75, 12);
  });

  it("says when the layers end above the depth of influence (Schmertmann)", () => {
    const given = {
      breadth_m: 2,
      length_m: 2,
      netPressure_kPa: 100,
      overburden_kPa: 18,
      overburdenAtPeak_kPa: 36,
      years: 1,
    };
    const layer = (thickness_m: number) => [{ thickness_m, modulus_kPa: 10000 }];
    expect(findingsOf("settlement-schmertmann", { ...given, layers: layer(3.9) })).toEqual([
      "layers-too-short",
    ]);
    expect(findingsOf("settlement-schmertmann", { ...given, layers: layer(4) })).toEqual([]);
  });
});

describe("Student's t at 95 %", () => {
  it.each([
    [1, 6.314],
    [2, 2.92],
    [4, 2.132],
    [9, 1.833],
    [29, 1.699],
    [120, 1.658],
  ])("with %i degrees of freedom is %f, as tables print it", (degrees, t) => {
    expect(student95(degrees)).toBeCloseTo(t, 3);
  });

  it("comes to the normal distribution with many", () => {
    expect(student95(1e7)).toBeCloseTo(1.6448536, 5);
  });
});

describe("characteristic values", () => {
  it("need at least two values for a scatter, and a coefficient where that is known", () => {
    expect(runMethod("characteristic-value", { values: [5], rule: "schneider" })).toMatchObject({
      error: { fields: { values: expect.any(String) } },
    });
    expect(runMethod("characteristic-value", { values: [5, 6], rule: "known-cov" })).toMatchObject({
      error: { fields: { cov: expect.any(String) } },
    });
    expect(outputsOf("characteristic-value", { values: [5], rule: "known-cov", cov: 0.1 }).k).toBeCloseTo(
      1.645,
      3,
    );
  });

  it("are lower for a local value than for a mean, and say when they are not positive", () => {
    const of = (rule: string) =>
      outputsOf("characteristic-value", { values: [40, 50, 60, 55, 45], rule }).characteristic;
    expect(of("student-5-fractile")).toBeLessThan(of("student-95-mean") as number);
    expect(findingsOf("characteristic-value", { values: [1, 99], rule: "student-5-fractile" })).toContain(
      "not-positive",
    );
  });
});

describe("a table of values", () => {
  const table = {
    breadths_m: [1, 2],
    depths_m: [1, 2],
    netAllowable_kPa: [
      [100, 200],
      [150, 250],
    ],
  };

  it.each([
    ["breadths that do not rise", { breadths_m: [2, 1] }, "breadths_m"],
    ["a row too few", { netAllowable_kPa: [[100, 200]] }, "netAllowable_kPa"],
    ["an entry too few", { netAllowable_kPa: [[100], [150]] }, "netAllowable_kPa"],
    [
      "an entry that is no pressure",
      {
        netAllowable_kPa: [
          [100, 0],
          [150, 250],
        ],
      },
      "netAllowable_kPa.0.1",
    ],
    ["no entries", { breadths_m: [], netAllowable_kPa: [[], []] }, "breadths_m"],
  ])("is refused with %s", (_, part, field) => {
    expect(runMethod("value-table", { ...table, ...part, breadth_m: 1, depth_m: 1 })).toMatchObject({
      error: { fields: { [field]: expect.any(String) } },
    });
  });

  it("of one breadth holds for that breadth and no other", () => {
    const one = { breadths_m: [2], depths_m: [1, 2], netAllowable_kPa: [[100], [150]] };
    expect(outputsOf("value-table", { ...one, breadth_m: 2, depth_m: 1.5 }).netAllowable_kPa).toBe(125);
    expect(outputsOf("value-table", { ...one, breadth_m: 2.01, depth_m: 1.5 })).toMatchObject({
      outside: true,
    });
  });

  it("names the limit that was passed", () => {
    const said = outputsOf("value-table", { ...table, breadth_m: 2.5, depth_m: 1 }).limit;
    expect(said).toBe("The breadth 2.5 m lies above the table's largest breadth, 2 m.");
  });
});
