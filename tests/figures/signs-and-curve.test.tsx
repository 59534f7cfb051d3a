import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, it } from "vitest";
import { type CurvePoint, failingAt, NumberFailingCurve } from "@/components/figures/number-failing-curve";
import { Sign, SignMark, type SignName } from "@/components/figures/sign";
import { SOILS, SoilLegend, SoilSwatch, soilKind, soilWord } from "@/components/figures/soil-hatch";
import { collisionsIn, letteringOf } from "./lettering";

const names: SignName[] = ["passes", "fails", "affected", "outside conditions", "no check yet", "withdrawn"];

/** Luminance and contrast of two colours, as WCAG 2.2 defines them. */
function contrast(one: string, other: string): number {
  const luminance = (colour: string): number => {
    const [r = 0, g = 0, b = 0] = [1, 3, 5]
      .map((at) => Number.parseInt(colour.slice(at, at + 2), 16) / 255)
      .map((c) => (c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4));
    return 0.2126 * r + 0.7152 * g + 0.0722 * b;
  };
  const [light = 0, dark = 0] = [luminance(one), luminance(other)].sort((a, b) => b - a);
  return (light + 0.05) / (dark + 0.05);
}

describe("a sign", () => {
  it("is told by its word, and by a shape that no other sign has", () => {
    for (const name of names) expect(renderToStaticMarkup(<Sign name={name} />)).toContain(`>${name}</`);
    const shapes = names.map((name) =>
      renderToStaticMarkup(<SignMark name={name} />).replace(/(fill|stroke)="[^"]*"/g, ""),
    );
    expect(new Set(shapes).size).toBe(names.length);
  });

  it("is read aloud once: by its word where that is seen, else by the name of its picture", () => {
    expect(renderToStaticMarkup(<Sign name="fails" />)).toContain('aria-hidden="true"');
    const hidden = renderToStaticMarkup(<Sign name="fails" hideWord />);
    expect(hidden).toContain('role="img" aria-label="fails"');
    expect(hidden).not.toContain(">fails<");
  });

  it("carries the revision's number in the triangle and in words", () => {
    const sign = renderToStaticMarkup(<Sign name="affected" revision={3} />);
    expect(letteringOf(sign).map(({ text }) => text)).toEqual(["3"]);
    expect(sign).toContain("affected by revision 3");
  });

  it("strikes out what is withdrawn", () => {
    expect(renderToStaticMarkup(<Sign name="withdrawn" word="P02" />)).toMatch(/<s [^>]*>P02<\/s>/);
  });

  it("stands out by 3:1 at least, on the light and on the dark sheet, by its ink outline or its own colour", () => {
    // Outlines in ink or second ink; the number in dark ink on orange.
    expect(contrast("#1B2326", "#FFFEFB")).toBeGreaterThan(3);
    expect(contrast("#E8E6DF", "#1B2123")).toBeGreaterThan(3);
    expect(contrast("#56615F", "#FFFEFB")).toBeGreaterThan(3);
    expect(contrast("#1B2326", "#E69F00")).toBeGreaterThan(4.5);
    for (const name of names)
      expect(renderToStaticMarkup(<SignMark name={name} />)).toMatch(/stroke="var\(--ink(-2)?, /);
  });
});

describe("hatches of ground", () => {
  it("differ from each other for every soil", () => {
    const drawn = Object.keys(SOILS).map(
      (soil) => /<pattern[^>]*>(.*)<\/pattern>/s.exec(renderToStaticMarkup(<SoilSwatch soil={soil} />))?.[1],
    );
    expect(new Set(drawn).size).toBe(Object.keys(SOILS).length);
  });

  it("draw an unheard-of word as not known, even one that every object has", () => {
    expect(soilKind("clay")).toBe("clay");
    expect(soilKind("gumbo")).toBe("unknown");
    expect(soilKind("constructor")).toBe("unknown");
    expect(soilWord("")).toBe("not known");
  });

  it("are explained by a legend in words", () => {
    const legend = renderToStaticMarkup(
      <SoilLegend entries={[{ soil: "clay", word: "Unit 2, stiff CLAY" }, { soil: "sand" }]} />,
    );
    expect(letteringOf(legend).map(({ text }) => text)).toEqual(["Unit 2, stiff CLAY", "sand"]);
    expect(legend).toContain("Legend of ground: Unit 2, stiff CLAY, sand");
    const all = renderToStaticMarkup(
      <SoilLegend entries={Object.keys(SOILS).map((soil) => ({ soil }))} width_px={300} />,
    );
    expect(collisionsIn(all)).toEqual([]);
  });

  it("give each figure names of its own, so that two on a page do not mix", () => {
    const two = renderToStaticMarkup(
      <>
        <SoilSwatch soil="clay" />
        <SoilSwatch soil="clay" />
      </>,
    );
    const ids = [...two.matchAll(/ id="([^"]+)"/g)].map(([, id]) => id);
    expect(new Set(ids).size).toBe(2);
    for (const id of ids) expect(two).toContain(`url(#${id})`);
  });
});

describe("the curve of number failing against value", () => {
  // Four footings requiring 240, 200, 200 and 150 kPa.
  const points: CurvePoint[] = [
    { netAllowable_kPa: 240, failing: 0 },
    { netAllowable_kPa: 200, failing: 1 },
    { netAllowable_kPa: 200, failing: 1 },
    { netAllowable_kPa: 150, failing: 3 },
  ];
  const words = (current: number | null, draft: number | null): string[] =>
    letteringOf(
      renderToStaticMarkup(
        <NumberFailingCurve points={points} currentNet_kPa={current} draftNet_kPa={draft} checked={4} />,
      ),
    ).map(({ text }) => text);

  it.each([
    [300, 0],
    [240, 0],
    [239.9, 1],
    [200, 1],
    [199.9, 3],
    [150, 3],
    [149, 4],
  ])("counts at %d kPa the footings that require more: %i", (value, failing) => {
    expect(failingAt(points, value, 4)).toBe(failing);
  });

  it("does not guess below its lowest point when it does not know how many were checked", () => {
    expect(failingAt(points, 149)).toBeNull();
  });

  it("marks today's value and the draft's with what fails at each", () => {
    expect(words(250, 180)).toEqual(
      expect.arrayContaining(["today 250 kPa: 0 fail", "draft 180 kPa: 3 fail"]),
    );
    expect(words(210, null)).toContain("today 210 kPa: 1 fails");
    expect(words(210, null).some((text) => text.startsWith("draft"))).toBe(false);
  });

  it("keeps the two marks apart when the values are almost the same or at the ends", () => {
    for (const [current, draft] of [
      [200, 200],
      [200, 200.4],
      [10, 11],
      [900, 899],
    ] as const) {
      const markup = renderToStaticMarkup(
        <NumberFailingCurve points={points} currentNet_kPa={current} draftNet_kPa={draft} checked={4} />,
      );
      expect(collisionsIn(markup)).toEqual([]);
    }
  });

  it("falls never as the value falls, drawn as steps of level and upright lines", () => {
    const markup = renderToStaticMarkup(
      <NumberFailingCurve points={points} currentNet_kPa={null} draftNet_kPa={null} checked={4} />,
    );
    const path = /stroke="var\(--fails[^"]*"[^>]*>/.exec(markup)?.index ?? 0;
    const d =
      /d="([^"]+)"[^>]*stroke="var\(--fails/.exec(markup.slice(markup.lastIndexOf("<path", path)))?.[1] ?? "";
    const at = [...d.matchAll(/[ML](\S+?) ([\d.]+)/g)].map(([, x, y]) => [Number(x), Number(y)] as const);
    expect(at.length).toBeGreaterThan(6);
    at.slice(1).forEach(([x, y], index) => {
      const [beforeX, beforeY] = at[index] ?? [0, 0];
      expect(x <= beforeX && y <= beforeY && (x === beforeX || y === beforeY)).toBe(true);
    });
  });

  it("says so when there is nothing to draw", () => {
    expect(
      renderToStaticMarkup(<NumberFailingCurve points={[]} currentNet_kPa={200} draftNet_kPa={null} />),
    ).toContain("No linked footing has a check yet");
  });
});
