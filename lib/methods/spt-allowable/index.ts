import { z } from "zod";
import { choice, defineMethod, output, quantity } from "../define-method";
import { formula, line } from "../formula";

/** Both rules raise the value with embedment, to a third more at most. */
export const embedmentFactor = formula({
  symbol: "F_d",
  unit: "",
  ref: "bowles1977",
  shown: "min(1.33, 1 + 0.33 D / B)",
  symbols: { D: "depth_m", B: "breadth_m" },
  of: (q: { depth_m: number; breadth_m: number }) => Math.min(1.33, 1 + (0.33 * q.depth_m) / q.breadth_m),
});

type Terms = { n60: number; breadth_m: number; factor: number; settlement_mm: number };
const symbols = { N: "n60", B: "breadth_m", F_d: "factor", s: "settlement_mm" } as const;

/** To B = 1.22 m; for 25 mm, in proportion for other settlements. */
export const meyerhofNarrow = formula({
  symbol: "q_net,a",
  unit: "kPa",
  ref: "meyerhof1956",
  shown: "12 N F_d (s / 25)",
  symbols: { N: "n60", F_d: "factor", s: "settlement_mm" },
  of: (q: Terms) => 12 * q.n60 * q.factor * (q.settlement_mm / 25),
});

/** Beyond B = 1.22 m. */
export const meyerhofWide = formula({
  symbol: "q_net,a",
  unit: "kPa",
  ref: "meyerhof1956",
  shown: "8 N ((B + 0.305) / B)² F_d (s / 25)",
  symbols,
  of: (q: Terms) =>
    8 * q.n60 * ((q.breadth_m + 0.305) / q.breadth_m) ** 2 * q.factor * (q.settlement_mm / 25),
});

/** To B = 1.2 m. */
export const bowlesNarrow = formula({
  symbol: "q_net,a",
  unit: "kPa",
  ref: "bowles1977",
  shown: "N / 0.05 F_d (s / 25)",
  symbols: { N: "n60", F_d: "factor", s: "settlement_mm" },
  of: (q: Terms) => (q.n60 / 0.05) * q.factor * (q.settlement_mm / 25),
});

/** Beyond B = 1.2 m. */
export const bowlesWide = formula({
  symbol: "q_net,a",
  unit: "kPa",
  ref: "bowles1977",
  shown: "N / 0.08 ((B + 0.3) / B)² F_d (s / 25)",
  symbols,
  of: (q: Terms) =>
    (q.n60 / 0.08) * ((q.breadth_m + 0.3) / q.breadth_m) ** 2 * q.factor * (q.settlement_mm / 25),
});

const ruleFor = (q: { rule: "meyerhof" | "bowles"; breadth_m: number }) =>
  q.rule === "meyerhof"
    ? q.breadth_m <= 1.22
      ? meyerhofNarrow
      : meyerhofWide
    : q.breadth_m <= 1.2
      ? bowlesNarrow
      : bowlesWide;

export const sptAllowable = defineMethod({
  id: "spt-allowable",
  version: "1",
  title: "Net allowable pressure from SPT for a settlement",
  source: ["meyerhof1956", "bowles1977"],
  limits: [
    "Sand; the count averaged from the base to about one breadth below. Settlement governs: strength is checked apart.",
    "Ground water is already in the count: it is not allowed for twice.",
    "The two formulas of a rule do not meet exactly where they change over; the value drops a little there.",
  ],
  inputs: z.strictObject({
    rule: choice("Rule", ["meyerhof", "bowles"]),
    n60: quantity({ label: "Average N60", min: 0, max: 200 }),
    breadth_m: quantity({ label: "Breadth (smaller side)", unit: "m", above: 0 }),
    depth_m: quantity({ label: "Founding depth", unit: "m", min: 0 }),
    settlement_mm: quantity({ label: "Settlement allowed", unit: "mm", above: 0, max: 100 }).default(25),
  }),
  outputs: z.object({
    embedmentFactor: output("Embedment factor"),
    netAllowable_kPa: output("Net allowable bearing pressure", "kPa"),
  }),
  compute: (q) => {
    const factor = embedmentFactor.of(q);
    return { embedmentFactor: factor, netAllowable_kPa: ruleFor(q).of({ ...q, factor }) };
  },
  lines: (q, { embedmentFactor: factor }) => [line(embedmentFactor, q), line(ruleFor(q), { ...q, factor })],
  findings: (q) => [
    ...(q.n60 > 50
      ? [
          {
            code: "refusal",
            severity: "warning" as const,
            message: "An average above 50 stands on refusals: the rule was not made from such counts.",
          },
        ]
      : []),
    ...(q.settlement_mm > 25
      ? [
          {
            code: "more-settlement",
            severity: "warning" as const,
            message:
              "The rule was made for 25 mm; more settlement is in proportion only roughly, and strength may govern.",
          },
        ]
      : []),
  ],
});
