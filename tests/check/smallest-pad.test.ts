import { describe, expect, it } from "vitest";
import { checkFooting } from "@/lib/check/check-footing";
import { type Resize, smallestPad } from "@/lib/check/smallest-pad";
import { pad } from "./check-arbitraries";

describe("the smallest pad that passes", () => {
  // A square of side a under N asks for N/a² + 3 kPa net, so 150 kPa holds from a = √(N/147) on.
  it.each([
    [400, Math.sqrt(400 / 147)],
    [1000, Math.sqrt(1000 / 147)],
    [2500, Math.sqrt(2500 / 147)],
  ])(
    "under a central load of %i kN is the next step of 5 cm above the side found by hand",
    (vertical_kN, side_m) => {
      const offer = smallestPad(pad({ loads: [{ vertical_kN }] }), "square");
      expect(offer?.breadth_m).toBe(Math.ceil(side_m * 20) / 20);
      expect(offer?.length_m).toBe(offer?.breadth_m);
      expect(offer?.result.verdict).toBe("passes");
    },
  );

  it.each<Resize>(["proportion", "breadth", "length", "square"])(
    "passes, and 5 cm less does not (%s)",
    (resize) => {
      const input = pad({
        footing: { breadth_m: 2, length_m: 3 },
        loads: [{ vertical_kN: 1500, momentB_kNm: 120 }],
      });
      const offer = smallestPad(input, resize);
      if (!offer) throw new Error("Nothing was offered.");
      if (resize === "breadth") expect(offer.breadth_m).toBe(2);
      if (resize === "length") expect(offer.length_m).toBe(3);
      const less = {
        breadth_m: resize === "breadth" ? 2 : offer.breadth_m - 0.05,
        length_m:
          resize === "length"
            ? 3
            : offer.length_m - (resize === "breadth" || resize === "square" ? 0.05 : 0.1),
      };
      expect(checkFooting({ ...input, footing: { ...input.footing, ...less } }).verdict).toBe("fails");
    },
  );

  it("is not offered where the value does not hold for a pad so broad, nor where no size helps", () => {
    expect(smallestPad(pad({ loads: [{ vertical_kN: 1500 }], value: { maxBreadth_m: 2.5 } }))).toBe(null);
    expect(smallestPad(pad({ value: { netAllowable_kPa: 1 } }))).toBe(null);
  });

  it("holds a pull by its own weight", () => {
    const offer = smallestPad(pad({ loads: [{ vertical_kN: -300 }] }), "square");
    // 21 kPa of pad and backfill against 1.1 times 300 kN: a² = 15.71.
    expect(offer?.breadth_m).toBe(4);
  });
});
