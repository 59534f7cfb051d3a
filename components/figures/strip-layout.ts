import { decimalsOf, niceStep, stepsBetween } from "./nice-steps";
import { spread } from "./spread";
import { wrapText } from "./text-width";

/** One described interval as the log draws it; without a base it runs to the final depth. */
export type StripStratum = {
  top_m: number;
  base_m: number | null;
  description: string;
  /** Principal soil, which chooses the hatch. */
  soil: string;
  unit?: { code: string; name: string } | null;
};

/** One standard penetration test: N over 300 mm, or on refusal the blows and how far they drove. */
export type StripSpt = {
  depth_m: number;
  blowCount: number | null;
  refusal: boolean;
  mainBlows: number | null;
  mainPenetration_mm: number | null;
};

/** One water strike with what the water did after it. A reading in words has no depth. */
export type StripStrike = {
  depth_m: number | null;
  rises: readonly { minutes: number; depth_m: number | null; text: string }[];
};

export type StripHole = {
  name: string;
  groundLevel_m: number | null;
  finalDepth_m: number | null;
  strata: readonly StripStratum[];
  spts: readonly StripSpt[];
  strikes: readonly StripStrike[];
};

/** Where the columns of a strip log begin, left to right; the last is its width. */
export const COLUMNS = {
  depth: 8,
  level: 52,
  hatch: 112,
  lead: 164,
  words: 192,
  unit: 506,
  spt: 604,
  water: 810,
  end: 932,
};
export const HEAD_PX = 66;
export const LINE_PX = 14;

export type StratumBlock = {
  stratum: StripStratum;
  top: number;
  base: number;
  wordsTop: number;
  heading: string;
  lines: string[];
  unitLines: string[];
};

export type StripLayout = {
  depth_m: number;
  pxPerM: number;
  /** Height in the drawing of a depth. */
  y: (depth_m: number) => number;
  bottom: number;
  height: number;
  blocks: StratumBlock[];
  depthTicks: { y: number; text: string }[];
  levelTicks: { y: number; text: string }[];
};

const LEAST_PX_PER_M = 24;
const MOST_PX_PER_M = 110;
const AIMED_HEIGHT_PX = 700;
/** The scale is stretched up to so many times to make room for words before they run on below the hole. */
const STRETCH = 1.8;

/** Depth that a log is drawn to: its final depth, or the deepest thing known of it. */
export function drawnDepth_m(hole: StripHole): number {
  const known = [
    hole.finalDepth_m ?? 0,
    ...hole.strata.map(({ top_m, base_m }) => base_m ?? top_m + 0.5),
    ...hole.spts.map(({ depth_m }) => depth_m),
    ...hole.strikes.map(({ depth_m }) => depth_m ?? 0),
  ];
  return Math.max(1, ...known);
}

/** A hole's strata, words and scales as places in the drawing; words never stand over one another and none is left out. */
export function layStrip(hole: StripHole): StripLayout {
  const depth_m = drawnDepth_m(hole);
  const strata = [...hole.strata].sort((a, b) => a.top_m - b.top_m);
  const texts = strata.map((stratum) => {
    const lines = wrapText(stratum.description, COLUMNS.unit - COLUMNS.words - 12, 11);
    const unit = stratum.unit ? [stratum.unit.code, stratum.unit.name] : [];
    const unitLines = unit.flatMap((part) => wrapText(part, COLUMNS.spt - COLUMNS.unit - 10, 11));
    return { lines, unitLines, size: Math.max(lines.length + 1, unitLines.length) * LINE_PX };
  });
  const needed = texts.reduce((sum, { size }) => sum + size + WORDS_GAP, 0);
  const natural = Math.min(MOST_PX_PER_M, Math.max(LEAST_PX_PER_M, AIMED_HEIGHT_PX / depth_m));
  const pxPerM = Math.min(natural * STRETCH, Math.max(natural, needed / depth_m));
  const y = (depth: number): number => HEAD_PX + depth * pxPerM;
  const bottom = y(depth_m);
  const places = spread(
    texts.map(({ size }, index) => ({ wanted: y(strata[index]?.top_m ?? 0) + 2, size })),
    HEAD_PX + 2,
    bottom,
    WORDS_GAP,
  );
  const blocks = strata.map((stratum, index): StratumBlock => {
    const text = texts[index] ?? { lines: [], unitLines: [], size: 0 };
    const base_m = stratum.base_m ?? depth_m;
    return {
      stratum,
      top: y(stratum.top_m),
      base: y(base_m),
      wordsTop: places[index] ?? 0,
      heading: headingOf(stratum, hole.groundLevel_m),
      lines: text.lines,
      unitLines: text.unitLines,
    };
  });
  const wordsBottom = Math.max(
    bottom,
    ...blocks.map(({ wordsTop }, index) => wordsTop + (texts[index]?.size ?? 0)),
  );
  const step = niceStep(depth_m, Math.max(2, (depth_m * pxPerM) / 32));
  const ticks = stepsBetween(0, depth_m, step);
  const level = hole.groundLevel_m;
  return {
    depth_m,
    pxPerM,
    y,
    bottom,
    height: Math.max(wordsBottom + 10, bottom + 44),
    blocks,
    depthTicks: ticks.map((depth) => ({ y: y(depth), text: depth.toFixed(Math.max(1, decimalsOf(step))) })),
    levelTicks:
      level === null
        ? []
        : stepsBetween(level - depth_m, level, step)
            .reverse()
            .map((tick) => ({ y: y(level - tick), text: signed(tick, Math.max(1, decimalsOf(step))) })),
  };
}

const WORDS_GAP = 8;

/** A number with a true minus sign; never −0. */
export const signed = (value: number, decimals: number): string => {
  const text = Math.abs(value).toFixed(decimals);
  return value < 0 && Number(text) !== 0 ? `−${text}` : text;
};

function headingOf({ top_m, base_m }: StripStratum, groundLevel_m: number | null): string {
  const depths = `${top_m.toFixed(2)} to ${base_m === null ? "final depth" : `${base_m.toFixed(2)} m`}`;
  if (groundLevel_m === null) return depths;
  const levels = [top_m, base_m]
    .filter((depth) => depth !== null)
    .map((depth) => signed(groundLevel_m - depth, 2));
  return `${depths}  (level ${levels.join(" to ")})`;
}
