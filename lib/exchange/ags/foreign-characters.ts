import type { AgsEncoding } from "./file-model";
import type { FindingList } from "./finding-list";

const beyondAscii = /\P{ASCII}+/gu;

/**
 * Rule 1: reports each line with characters outside ASCII. Characters 160 to 255 are a warning, because what they
 * mean depends on the encoding; all others, and text that was damaged before, are errors.
 */
export function reportForeignCharacters(text: string, encoding: AgsEncoding, findings: FindingList): void {
  if (encoding === "ascii") return;
  let line = 1;
  let feed = text.indexOf("\n");
  let reported = 0;
  beyondAscii.lastIndex = 0;
  for (let match = beyondAscii.exec(text); match; match = beyondAscii.exec(text)) {
    while (feed !== -1 && feed < match.index) {
      line += 1;
      feed = text.indexOf("\n", feed + 1);
    }
    if (reported === line) continue;
    reported = line;
    const whole = text.slice(match.index, feed === -1 ? undefined : feed);
    const { severity, message } = describe(whole);
    findings.add("1", severity, { line }, message);
  }
  beyondAscii.lastIndex = 0;
}

function describe(restOfLine: string): { severity: "error" | "warning"; message: string } {
  let worst = "";
  for (const character of restOfLine.slice(0, 4000)) {
    const code = character.codePointAt(0) ?? 0;
    if (code < 128) continue;
    if (code === 0xfffd) {
      return {
        severity: "error",
        message: "A character here was already lost before the file was written (U+FFFD).",
      };
    }
    if (worst === "" || (isLatin(worst) && !isLatin(character))) worst = character;
  }
  const code = (worst.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, "0");
  if (isLatin(worst)) {
    return {
      severity: "warning",
      message: `The character "${worst}" (U+${code}) is not ASCII; another reader may show something else here.`,
    };
  }
  const shown = /\p{C}/u.test(worst) ? "" : ` "${worst}"`;
  return {
    severity: "error",
    message: `The character${shown} (U+${code}) is outside what the format allows.`,
  };
}

function isLatin(character: string): boolean {
  const code = character.codePointAt(0) ?? 0;
  return code >= 160 && code <= 255;
}
