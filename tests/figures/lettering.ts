import { textWidth } from "@/components/figures/text-width";

export type Lettered = { text: string; left: number; right: number; top: number; bottom: number };

const decoded = (text: string): string =>
  text
    .replace(/&lt;/g, "<")
    .replace(/&gt;/g, ">")
    .replace(/&quot;/g, '"')
    .replace(/&#x27;/g, "'")
    .replace(/&amp;/g, "&");

const attribute = (tag: string, name: string): string =>
  new RegExp(` ${name}="([^"]*)"`).exec(tag)?.[1] ?? "";

/** Every line of lettering in a figure, with the box that it takes. No figure turns or shifts its lettering. */
export function letteringOf(markup: string): Lettered[] {
  return [...markup.matchAll(/(<text[^>]*>)(.*?)<\/text>/gs)].map(([, tag = "", inside = ""]) => {
    const text = decoded(inside.replace(/<[^>]*>/g, ""));
    const size = Number(attribute(tag, "font-size"));
    const width = textWidth(text, size, attribute(tag, "font-weight") === "500" ? "medium" : "regular");
    const x = Number(attribute(tag, "x"));
    const y = Number(attribute(tag, "y"));
    const anchor = attribute(tag, "text-anchor");
    const left = anchor === "middle" ? x - width / 2 : anchor === "end" ? x - width : x;
    // Above the baseline a capital takes 0.71 of the height, below it a descender 0.21.
    return { text, left, right: left + width, top: y - 0.71 * size, bottom: y + 0.21 * size };
  });
}

/** Pairs of lettering that stand over each other. */
export function collisionsIn(markup: string): string[] {
  const all = letteringOf(markup);
  return all.flatMap((a, index) =>
    all
      .slice(index + 1)
      .filter((b) => a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom)
      .map((b) => `"${a.text}" over "${b.text}"`),
  );
}

/** Lettering that leaves the sheet of its figure. */
export function beyondSheet(markup: string): string[] {
  const [, width = "0", height = "0"] = /viewBox="0 0 (\S+) (\S+)"/.exec(markup) ?? [];
  return letteringOf(markup)
    .filter(
      ({ left, right, top, bottom }) =>
        left < 0 || top < 0 || right > Number(width) || bottom > Number(height),
    )
    .map(({ text }) => text);
}
