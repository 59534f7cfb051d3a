import { describe, expect, it } from "vitest";
import { normalEmail } from "@/lib/contracts/email-address";

describe("an e-mail address", () => {
  it("is kept in lower case and in one Unicode form", () => {
    expect(normalEmail("  Mira.Holt@Office.Example ")).toBe("mira.holt@office.example");
    expect(normalEmail("ｍｉｒａ@office.example")).toBe("mira@office.example");
    expect(normalEmail("o'neil+site@sub.office.example")).toBe("o'neil+site@sub.office.example");
    expect(normalEmail("a@xn--bcher-kva.example")).toBe("a@xn--bcher-kva.example");
  });

  for (const [what, typed] of [
    ["a quoted part with another address in it", '"a@evil.example"@good.example'],
    ["two addresses with a comma", "a@evil.example,b@good.example"],
    ["two addresses with a semicolon", "a@evil.example;b@good.example"],
    ["a full-width at sign", "a＠good.example"],
    ["a full-width at sign beside a plain one", "a@evil.example＠good.example"],
    ["a small at sign", "a﹫good.example"],
    ["a trailing dot", "a@good.example."],
    ["two dots", "a..b@good.example"],
    ["a line break and another header", "a@good.example\r\nBcc: b@evil.example"],
    ["a line feed alone at its end", "a@good.example\n"],
    ["a zero byte", "a\0@good.example"],
    ["a comment", "a(b)@good.example"],
    ["angle brackets", "<a@good.example>"],
    ["a space inside", "a b@good.example"],
    ["an invisible joiner", "a\u200d@good.example"],
    ["a right-to-left mark", "a\u202e@good.example"],
    ["a Cyrillic letter that looks Latin", "аdmin@good.example"],
    ["a sign that turns into a slash", "℀@good.example"],
    ["a Turkish capital I with dot", "İ@good.example"],
    ["a per cent sign that some servers route by", "a%evil.example@good.example"],
    ["an address literal", "a@[127.0.0.1]"],
    ["no top-level name", "a@localhost"],
    ["digits as top-level name", "a@10.0.0.1"],
    ["a label that begins with a hyphen", "a@-good.example"],
    ["a local part of 65 characters", `${"a".repeat(65)}@good.example`],
    ["255 characters", `a@${"b.".repeat(123)}example`],
    ["nothing", ""],
    ["no at sign", "good.example"],
  ] as const)
    it(`is refused with ${what}`, () => {
      expect(normalEmail(typed)).toBeNull();
    });
});
