import { readFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, it } from "vitest";

const css = readFileSync(join(process.cwd(), "app/globals.css"), "utf8");

/** The colours given between two places of the style sheet, by name. */
const coloursIn = (from: string, to: string): Record<string, string> => {
  const start = css.indexOf(from);
  const end = css.indexOf(to, start);
  if (start < 0 || end < 0) throw new Error(`The style sheet has no part from “${from}” to “${to}”.`);
  const found = css.slice(start, end).matchAll(/--([\w-]+): (#[0-9a-f]{6});/g);
  return Object.fromEntries([...found].map(([, name, colour]) => [name, colour]));
};
const day = coloursIn(":root {", "@custom-variant night");
const night = { ...day, ...coloursIn("@variant night {", "@layer base") };

// Relative luminance and contrast ratio: WCAG 2.2, definitions, w3.org/TR/WCAG22.
const luminance = (colour: string): number => {
  const [red = 0, green = 0, blue = 0] = [1, 3, 5].map((at) => {
    const part = Number.parseInt(colour.slice(at, at + 2), 16) / 255;
    return part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
};
const contrast = (one: string, other: string): number => {
  const [dark = 0, light = 0] = [luminance(one), luminance(other)].sort((a, b) => a - b);
  return (light + 0.05) / (dark + 0.05);
};

describe.each([
  ["day", day],
  ["night", night],
])("the paper by %s", (_, colours) => {
  const between = (one: string, other: string): number => {
    const [first, second] = [colours[one], colours[other]];
    if (!first || !second) throw new Error(`There is no colour ${first ? other : one}.`);
    return contrast(first, second);
  };

  it.each(["ink", "ink-2", "fails-text"])(
    "lets %s be read on paper, sheet and chosen rows at 4.5 to 1",
    (text) => {
      for (const ground of ["paper", "sheet", "chosen"])
        expect(between(text, ground)).toBeGreaterThanOrEqual(4.5);
    },
  );

  it("lets the words on a main button be read at 4.5 to 1", () => {
    expect(between("on-action", "action")).toBeGreaterThanOrEqual(4.5);
  });

  it.each(["field", "frame", "action", "passes", "fails"])(
    "shows %s beside paper and sheet at 3 to 1",
    (mark) => {
      for (const ground of ["paper", "sheet"]) expect(between(mark, ground)).toBeGreaterThanOrEqual(3);
    },
  );
});

it("measures black on white as 21 to 1, and #777777 on white just under 4.5, as the definition does", () => {
  expect(contrast("#000000", "#ffffff")).toBeCloseTo(21, 6);
  expect(contrast("#777777", "#ffffff")).toBeCloseTo(4.48, 2);
});
