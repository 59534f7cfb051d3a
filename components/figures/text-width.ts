/** Advance widths of Roboto Regular in thousandths of the letter height, for the signs 32 to 126 (read from the font). */
const ASCII = [
  248, 258, 320, 616, 562, 732, 622, 175, 342, 348, 431, 567, 197, 276, 264, 413, 562, 562, 562, 562, 562,
  562, 562, 562, 562, 562, 242, 211, 508, 549, 523, 473, 898, 652, 623, 651, 656, 568, 553, 681, 713, 272,
  552, 627, 539, 873, 713, 688, 631, 688, 616, 594, 597, 648, 637, 887, 627, 601, 599, 265, 411, 265, 418,
  451, 309, 544, 562, 523, 564, 530, 348, 562, 551, 243, 239, 507, 243, 877, 552, 570, 562, 568, 339, 516,
  327, 551, 484, 751, 496, 473, 496, 338, 244, 338, 680,
];

const OTHERS: Record<string, number> = {
  "′": 175,
  "″": 320,
  "·": 261,
  "•": 337,
  "−": 572,
  "–": 656,
  "—": 781,
  "²": 367,
  "³": 367,
  "°": 374,
  "…": 669,
  "∞": 1028,
};

/** A letter outside the table is taken as wide as a broad one. */
const UNKNOWN = 720;

/** Room for a fallback face or a heavier weight, which are a little wider. */
const MARGIN = 1.04;

/** Width that a line of lettering takes at a height, in the same pixels; on the safe side. */
export function textWidth(text: string, height_px: number, weight: "regular" | "medium" = "regular"): number {
  let thousandths = 0;
  for (const sign of text) thousandths += ASCII[(sign.codePointAt(0) ?? 0) - 32] ?? OTHERS[sign] ?? UNKNOWN;
  return (thousandths / 1000) * height_px * MARGIN * (weight === "medium" ? 1.03 : 1);
}

/** Breaks a text into lines no wider than `width_px`; a word that is wider by itself is broken too, and nothing is left out. */
export function wrapText(text: string, width_px: number, height_px: number): string[] {
  const lines: string[] = [];
  for (const paragraph of text.split(/\r?\n/)) {
    let line = "";
    for (const word of paragraph.split(/\s+/).filter((part) => part !== "")) {
      const longer = line === "" ? word : `${line} ${word}`;
      if (textWidth(longer, height_px) <= width_px) {
        line = longer;
        continue;
      }
      if (line !== "") lines.push(line);
      line = "";
      for (const sign of word) {
        if (line !== "" && textWidth(line + sign, height_px) > width_px) {
          lines.push(line);
          line = "";
        }
        line += sign;
      }
    }
    if (line !== "") lines.push(line);
  }
  return lines;
}
