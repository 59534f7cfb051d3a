import { casesOf, type ReferenceCase } from "../reference-case";

export const distortionCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "angular-distortion",
      citation: "EN 1997-1:2004, Annex H, definition; numbers ours",
      status: "computed independently",
      tolerance: { abs: 1e-8 },
    },
    [
      {
        id: "distortion-two",
        why: "turns 14 mm over 6 m into 1/429",
        inputs: {
          points: [
            { id: "F1", x_m: 0, y_m: 0, settlement_mm: 32 },
            { id: "F2", x_m: 6, y_m: 0, settlement_mm: 18 },
          ],
        },
        expected: { "worst.ratio": 0.002333333333, "pairs.0.distance_m": 6, "pairs.0.differential_mm": 14 },
      },
      {
        id: "distortion-row",
        why: "joins the footings of one row each to the next only",
        inputs: {
          points: [0, 5, 10, 15].map((x_m, at) => ({
            id: `F${at}`,
            x_m,
            y_m: 2,
            settlement_mm: [10, 12, 30, 31][at],
          })),
        },
        expected: { "worst.from": "F1", "worst.to": "F2", "worst.ratio": 0.0036 },
      },
    ],
  ),
  ...casesOf(
    {
      method: "angular-distortion",
      citation:
        "L. Bjerrum, European Conference on Soil Mechanics, Wiesbaden 1963: first cracking of panel walls at 1/300",
      status: "from memory",
      tolerance: { abs: 1e-8 },
    },
    [
      {
        id: "distortion-bjerrum",
        why: "reaches 1/300 at 20 mm between footings 6 m apart, and says where in a triangle",
        inputs: {
          points: [
            { id: "A", x_m: 0, y_m: 0, settlement_mm: 25 },
            { id: "B", x_m: 6, y_m: 0, settlement_mm: 5 },
            { id: "C", x_m: 0, y_m: 8, settlement_mm: 20 },
          ],
        },
        expected: { "worst.ratio": 1 / 300, "worst.from": "A", "worst.to": "B" },
      },
    ],
  ),
];
