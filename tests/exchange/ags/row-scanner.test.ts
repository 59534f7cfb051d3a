import { parse } from "csv-parse/sync";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { scanRow } from "@/lib/exchange/ags/row-scanner";

describe("the row scanner", () => {
  it("finds the same items as an independent CSV reader in every properly quoted row", () => {
    const item = fc.string({ unit: fc.constantFrom(..."ab ,\"'|+;\t°粘"), maxLength: 10 });
    fc.assert(
      fc.property(
        fc.array(item, { minLength: 1, maxLength: 8 }),
        fc.constantFrom("\n", "\r\n", ""),
        (items, end) => {
          const row = ["DATA", ...items].map((text) => `"${text.replaceAll('"', '""')}"`).join(",") + end;
          const scanned = scanRow(row, 0);
          expect([scanned.items]).toEqual(parse(row));
          expect(scanned).toMatchObject({ next: row.length, continued: 0, open: false });
          expect(scanned.faults.size).toBe(0);
        },
      ),
      { numRuns: 3000 },
    );
  });

  it("begins where it is told and stops at the end of its line", () => {
    const text = '"GROUP","A"\n"DATA","b",\n"DATA"';
    expect(scanRow(text, 12)).toMatchObject({ items: ["DATA", "b", ""], next: 24 });
    expect(scanRow(text, 24).items).toEqual(["DATA"]);
  });

  it("joins at most two hundred lines", () => {
    const scanned = scanRow(`"DATA","x${"\ny".repeat(1000)}`, 0);
    expect(scanned).toMatchObject({ continued: 200, open: true });
  });
});
