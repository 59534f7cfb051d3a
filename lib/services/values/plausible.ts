import type { DraftFinding } from "@/lib/contracts/values";

/** A net pressure outside the band of its principal soil is asked about; the band never forbids. */
type Band = { words: string; low_kPa: number; high_kPa: number; source: string };

const gravels = "BS 8004:1986 table 1, presumed values of loose to dense gravel (secondary copy)";
const sands = "BS 8004:1986 table 1, presumed values of loose to compact sand (secondary copy)";
const clays = "BS 8004:1986 table 1, presumed values of soft to hard clay (secondary copy)";
const poor = "common practice: such ground carries a footing only after its own investigation";
const rocks =
  "IBC table 1806.2 (192 kPa) to BS 8004:1986 table 1, sound strong rock (10,000 kPa, from memory)";

// Where the table leaves a band open at one end, half the lowest or twice the highest figure printed is taken.
const bands: Record<string, Band> = {
  clay: { words: "clay", low_kPa: 37.5, high_kPa: 600, source: clays },
  silt: { words: "silt", low_kPa: 37.5, high_kPa: 300, source: clays },
  sand: { words: "sand", low_kPa: 50, high_kPa: 600, source: sands },
  gravel: { words: "gravel", low_kPa: 100, high_kPa: 1200, source: gravels },
  cobbles: { words: "cobbles", low_kPa: 100, high_kPa: 1200, source: gravels },
  peat: {
    words: "peat",
    low_kPa: Number.POSITIVE_INFINITY,
    high_kPa: Number.POSITIVE_INFINITY,
    source: poor,
  },
  topsoil: {
    words: "topsoil",
    low_kPa: Number.POSITIVE_INFINITY,
    high_kPa: Number.POSITIVE_INFINITY,
    source: poor,
  },
  "made-ground": {
    words: "made ground",
    low_kPa: Number.POSITIVE_INFINITY,
    high_kPa: Number.POSITIVE_INFINITY,
    source: poor,
  },
};
const rock: Band = { words: "rock", low_kPa: 192, high_kPa: 10_000, source: rocks };

/** Asks "sure?" of a net pressure that the ground unit's principal soil seldom has; null where nothing is odd. */
export function askIfPlausible(soil: string, netAllowable_kPa: number): DraftFinding | null {
  const band = bands[soil] ?? rock;
  if (netAllowable_kPa >= band.low_kPa && netAllowable_kPa <= band.high_kPa) return null;
  const pressure = Number(netAllowable_kPa.toPrecision(3));
  const sentence =
    band.low_kPa === Number.POSITIVE_INFINITY
      ? `${pressure} kPa net on ${band.words}: is that so? No usual range is published for it.`
      : `${pressure} kPa net is ${netAllowable_kPa < band.low_kPa ? "less" : "more"} than ${band.words} usually has ` +
        `(${Number(band.low_kPa.toPrecision(3))} to ${band.high_kPa} kPa). Is the unit right?`;
  return { code: "unusual-pressure", field: "given", sentence, source: band.source };
}
