/** How far the characters of a written file may go: 7-bit ASCII, or Latin-1 letters too, written as UTF-8. */
export type WrittenCharacters = "ascii" | "latin-1";

/** Characters that site data often carry, in ASCII letters that an engineer reads the same way. */
const replacements: ReadonlyMap<string, string> = new Map([
  ["°", "deg"],
  ["º", "deg"],
  ["µ", "u"],
  ["μ", "u"],
  ["²", "2"],
  ["³", "3"],
  ["¹", "1"],
  ["½", "1/2"],
  ["¼", "1/4"],
  ["¾", "3/4"],
  ["×", "x"],
  ["·", "."],
  ["±", "+/-"],
  ["–", "-"],
  ["—", "-"],
  ["−", "-"],
  ["‐", "-"],
  ["‑", "-"],
  ["‘", "'"],
  ["’", "'"],
  ["“", '"'],
  ["”", '"'],
  ["′", "'"],
  ["″", '"'],
  ["«", '"'],
  ["»", '"'],
  ["…", "..."],
  ["≤", "<="],
  ["≥", ">="],
  ["≈", "~"],
  ["φ", "phi"],
  ["Φ", "Phi"],
  ["γ", "gamma"],
  ["σ", "sigma"],
  ["δ", "delta"],
  ["Δ", "Delta"],
  ["ø", "o"],
  ["Ø", "O"],
  ["ß", "ss"],
  ["æ", "ae"],
  ["Æ", "AE"],
  ["œ", "oe"],
  ["ł", "l"],
  ["Ł", "L"],
  ["£", "GBP"],
  ["€", "EUR"],
]);

const foreign = /\P{ASCII}/u;
const lineBreaks = /[\r\n\u0085\u2028\u2029]+/gu;
const controls = /[\p{Cc}\p{Cs}\p{Co}\p{Cn}\u200b-\u200f\ufeff]/gu;

/**
 * A text as it may stand in an AGS item: line breaks become blanks, control characters go, and characters the format
 * does not allow are written in ASCII. `lost` counts those that have no like and became "?".
 */
export function plainText(
  text: string,
  characters: WrittenCharacters = "ascii",
): { text: string; lost: number } {
  const oneLine = text.replace(lineBreaks, " ").replace(/\t/g, " ").replace(controls, "");
  if (!foreign.test(oneLine)) return { text: oneLine, lost: 0 };
  let lost = 0;
  let plain = "";
  for (const character of oneLine) {
    const code = character.codePointAt(0) ?? 0;
    if (code < 128 || (characters === "latin-1" && code >= 160 && code <= 255)) {
      plain += character;
      continue;
    }
    const bare = replacements.get(character) ?? character.normalize("NFKD").replace(/\p{M}/gu, "");
    if (foreign.test(bare)) {
      lost += 1;
      plain += "?";
    } else plain += bare;
  }
  return { text: plain, lost };
}
