import { describe, expect, it } from "vitest";
import { governs } from "@/components/footings/combinations-table";
import { textOfFile } from "@/components/footings/file-text";
import { fixed, numberTyped, utilisationShown, whole } from "@/components/footings/shown";
import type { CombinationResult } from "@/lib/check/input";

describe("a utilisation as it is shown", () => {
  it("has two decimals, at the limit too", () => {
    expect([0.854, 0.995, 1, 1.25].map(utilisationShown)).toEqual(["0.85", "0.99", "1.00", "1.25"]);
  });

  it("never rounds a failure to 1.00: 150.4 against 150 keeps the digits that show it", () => {
    expect(utilisationShown(150.4 / 150)).toBe("1.003");
    expect(utilisationShown(1.00001)).toBe("1.00001");
  });

  it("is a dash where there is none, never NaN", () => {
    expect([null, undefined, Number.NaN, Number.POSITIVE_INFINITY].map(utilisationShown)).toEqual([
      "–",
      "–",
      "–",
      "–",
    ]);
    expect([fixed(null, 2), whole(Number.NaN)]).toEqual(["–", "–"]);
  });
});

describe("what is typed into a field of numbers", () => {
  it("is a number where it is one, with a minus sign of either kind", () => {
    expect([" 1.5 ", "-3", "−3", ".5", "1e3"].map(numberTyped)).toEqual([1.5, -3, -3, 0.5, 1000]);
  });

  it("is sent as typed where it is none, so that the server says what is wrong; and not at all where it is empty", () => {
    expect(["1,5", "1.5 m", "NaN", "Infinity", "0x10"].map(numberTyped)).toEqual([
      "1,5",
      "1.5 m",
      "NaN",
      "Infinity",
      "0x10",
    ]);
    expect(numberTyped("  ")).toBeUndefined();
  });
});

describe("the combination that governs a requirement", () => {
  const of = (...shares: (number | null)[]) =>
    governs(
      shares.map((utilisation) => ({ utilisation }) as CombinationResult),
      (c) => c.utilisation,
    );
  it("is the one with the largest share, and the first of equals", () => {
    expect([of(0.2, 0.9, 0.4), of(0.5, 0.5)]).toEqual([1, 0]);
  });
  it("is the one without a bound before any number", () => {
    expect(of(5, null, 9)).toBe(1);
  });
  it("is none where nothing is asked of it", () => {
    expect([of(0, 0), of()]).toEqual([null, null]);
  });
});

describe("a file that is chosen", () => {
  const read = (bytes: Uint8Array | string) => textOfFile(new File([bytes as BlobPart], "pads.csv"));
  it("is read as UTF-8, and as the older encoding where it is not that", async () => {
    expect(await read("mark,γ\nF1,18")).toEqual({ text: "mark,γ\nF1,18" });
    expect(await read(Uint8Array.from([0x46, 0xe9]))).toEqual({ text: "Fé" });
  });
  it("is refused empty or above 8 MB, with its name", async () => {
    expect(await read("")).toEqual({ problem: "pads.csv is empty." });
    expect(await read(new Uint8Array(8_000_001))).toMatchObject({
      problem: expect.stringContaining("larger than 8 MB"),
    });
  });
});
