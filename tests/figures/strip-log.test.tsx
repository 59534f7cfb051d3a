import fc from "fast-check";
import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, it } from "vitest";
import { layStrip, type StripHole } from "@/components/figures/strip-layout";
import { StripLog } from "@/components/figures/strip-log";
import { sptText } from "@/components/figures/strip-spt";
import { beyondSheet, collisionsIn, letteringOf } from "./lettering";

const hole: StripHole = {
  name: "BH03",
  groundLevel_m: 12.35,
  finalDepth_m: 8,
  strata: [
    { top_m: 0, base_m: 0.3, description: "Soft dark brown organic CLAY with rootlets.", soil: "topsoil" },
    {
      top_m: 0.3,
      base_m: 4.1,
      description: "Stiff brown slightly sandy CLAY.",
      soil: "clay",
      unit: { code: "2", name: "Stiff CLAY" },
    },
    { top_m: 4.1, base_m: null, description: "Dense GRAVEL of flint.", soil: "gravel" },
  ],
  spts: [
    { depth_m: 2, blowCount: 14, refusal: false, mainBlows: null, mainPenetration_mm: null },
    { depth_m: 6, blowCount: null, refusal: true, mainBlows: 50, mainPenetration_mm: 215 },
  ],
  strikes: [
    {
      depth_m: 4.6,
      rises: [
        { minutes: 5, depth_m: 4.4, text: "" },
        { minutes: 20, depth_m: 3.6, text: "" },
      ],
    },
  ],
};
const draw = (given: StripHole): string => renderToStaticMarkup(<StripLog hole={given} />);
const words = (given: StripHole): string[] => letteringOf(draw(given)).map(({ text }) => text);

describe("the strip log", () => {
  it("letters each stratum with its depths and levels, its words and its ground unit", () => {
    expect(words(hole)).toEqual(
      expect.arrayContaining([
        "0.30 to 4.10 m  (level 12.05 to 8.25)",
        "Stiff brown slightly sandy CLAY.",
        "Stiff CLAY",
        "4.10 to final depth  (level 8.25)",
        "final depth 8.00 m",
        "level 4.35 m",
      ]),
    );
  });

  it("draws depths to scale", () => {
    const { y, pxPerM } = layStrip(hole);
    expect(y(4.1) - y(0.3)).toBeCloseTo(3.8 * pxPerM, 9);
    expect(layStrip(hole).blocks.map(({ base, top }) => base - top)[2]).toBeCloseTo(3.9 * pxPerM, 9);
  });

  it("puts round levels at their depths: 10.0 m lies 2.35 m below a ground level of 12.35 m", () => {
    const layout = layStrip(hole);
    expect(layout.levelTicks.find(({ text }) => text === "10.0")?.y).toBeCloseTo(layout.y(2.35), 9);
  });

  it("hatches each stratum by its principal soil", () => {
    expect([...draw(hole).matchAll(/data-soil="([^"]+)"/g)].map(([, soil]) => soil)).toEqual([
      "topsoil",
      "clay",
      "gravel",
    ]);
  });

  it("shows refusal as blows and penetration, never as a number of blows that was not measured", () => {
    expect(words(hole)).toContain("50 for 215 mm");
    expect(words(hole)).not.toContain("50 ");
    const test = { depth_m: 1, blowCount: null, refusal: true, mainBlows: null, mainPenetration_mm: null };
    expect(sptText(test)).toBe("refusal");
    expect(sptText({ ...test, mainBlows: 50 })).toBe("50, refusal");
    expect(sptText({ ...test, refusal: false })).toBe("no N given");
    expect(sptText({ ...test, refusal: false, blowCount: 0 })).toBe("0");
  });

  it("shows the strike and the last rise of the water", () => {
    const text = words(hole).join(" ");
    expect(text).toContain("struck at 4.60");
    expect(text).toContain("3.60 after 20 min");
    expect(text).not.toContain("4.40");
  });

  it("says where nothing is known instead of drawing a zero", () => {
    const bare: StripHole = {
      name: "TP1",
      groundLevel_m: null,
      finalDepth_m: null,
      strata: [],
      spts: [],
      strikes: [],
    };
    expect(words(bare)).toEqual(expect.arrayContaining(["not known", "final depth not given"]));
    expect(words(bare).filter((text) => text === "none recorded")).toHaveLength(2);
    expect(layStrip(bare).levelTicks).toEqual([]);
    expect(draw(bare)).not.toMatch(/NaN|Infinity|undefined/);
  });

  it("never letters over lettering, leaves no word out and stays on its sheet, however many thin strata there are", () => {
    const description = fc.array(
      fc.constantFrom(
        "stiff",
        "fissured",
        "CLAY",
        "with",
        "occasional",
        "subangular",
        "(TOPSOIL)",
        "gravel-sized",
      ),
      { minLength: 1, maxLength: 40 },
    );
    fc.assert(
      fc.property(
        fc.array(fc.record({ thick_m: fc.double({ min: 0.05, max: 5, noNaN: true }), description }), {
          minLength: 1,
          maxLength: 12,
        }),
        fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { maxLength: 12 }),
        fc.option(fc.double({ min: -20, max: 400, noNaN: true })),
        (layers, places, groundLevel_m) => {
          let top_m = 0;
          const strata = layers.map(({ thick_m, description: parts }) => {
            const from_m = top_m;
            top_m += thick_m;
            return {
              top_m: from_m,
              base_m: top_m,
              description: parts.join(" "),
              soil: "clay",
              unit: { code: "2a", name: "Stiff to very stiff CLAY" },
            };
          });
          const given: StripHole = {
            name: "BH",
            groundLevel_m,
            finalDepth_m: top_m,
            strata,
            spts: places.map((share, index) => ({
              depth_m: share * top_m,
              blowCount: index * 9,
              refusal: index % 4 === 3,
              mainBlows: 50,
              mainPenetration_mm: 215,
            })),
            strikes: places.slice(0, 3).map((share) => ({
              depth_m: share * top_m,
              rises: [{ minutes: 20, depth_m: (share * top_m) / 2, text: "" }],
            })),
          };
          const markup = draw(given);
          expect(collisionsIn(markup)).toEqual([]);
          expect(beyondSheet(markup)).toEqual([]);
          const lettered = letteringOf(markup)
            .map(({ text }) => text)
            .join(" ");
          for (const { description: text } of strata)
            for (const word of text.split(" ")) expect(lettered).toContain(word);
        },
      ),
      { numRuns: 150 },
    );
  });
});
