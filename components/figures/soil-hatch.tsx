import { type ReactNode, useId } from "react";
import { Label, round } from "./drawing-marks";
import { INK, SMALL_PX } from "./ink";
import { textWidth } from "./text-width";

/** Principal soils and rocks that have a hatch of their own; anything else is drawn as not known. */
export type SoilKind = keyof typeof SOILS;

type Soil = {
  word: string;
  tint: string;
  opacity: number;
  tile: [width: number, height: number];
  marks: ReactNode;
};

const line = (d: string): ReactNode => <path d={d} fill="none" />;
const dots = (...at: [number, number, number?][]): ReactNode =>
  at.map(([x, y, r = 0.95]) => <circle key={`${x} ${y}`} cx={x} cy={y} r={r} fill={INK} stroke="none" />);
const circles = (...at: [number, number, number][]): ReactNode =>
  at.map(([x, y, r]) => <circle key={`${x} ${y}`} cx={x} cy={y} r={r} fill="none" />);

/**
 * Word, earth tint and hatch of each. The hatches follow what legends of ground have in common (dots for sand, open
 * circles for gravel, dashes for clay, bricks for limestone; FGDC-STD-013-2006 lets any be used that is explained), the
 * drawing of them is our own. Tints are thin washes, so that they lie quietly on a light and on a dark sheet.
 */
export const SOILS = {
  "made-ground": {
    word: "made ground",
    tint: "#8C8577",
    opacity: 0.2,
    tile: [12, 12],
    marks: line("M0 0L12 12M12 0L0 12"),
  },
  topsoil: {
    word: "topsoil",
    tint: "#5E4B36",
    opacity: 0.3,
    tile: [16, 20],
    marks: line("M1.5 8V4M4.5 8V1.5M7.5 8V4M9 18V14M12 18V11.5M15 18V14"),
  },
  clay: {
    word: "clay",
    tint: "#A2703F",
    opacity: 0.26,
    tile: [18, 10],
    marks: line("M1.5 2.5H8.5M10.5 7.5H17.5"),
  },
  silt: {
    word: "silt",
    tint: "#9A8B5A",
    opacity: 0.24,
    tile: [10, 14],
    marks: line("M2.5 1.5V6M7.5 8.5V13"),
  },
  sand: {
    word: "sand",
    tint: "#D3A94A",
    opacity: 0.28,
    tile: [11, 11],
    marks: dots([2.5, 2.5], [8, 5], [4.5, 8.8]),
  },
  gravel: {
    word: "gravel",
    tint: "#B98D5C",
    opacity: 0.22,
    tile: [20, 20],
    marks: circles([5, 5, 3], [14.5, 7, 2.2], [8.5, 14.5, 2.4], [16.5, 16, 3]),
  },
  cobbles: {
    word: "cobbles",
    tint: "#8F8069",
    opacity: 0.24,
    tile: [34, 32],
    marks: circles([9, 9, 6.5], [26, 10, 5], [17, 24, 6], [31, 26, 2.2], [3.5, 24, 3]),
  },
  peat: {
    word: "peat",
    tint: "#3F3226",
    opacity: 0.42,
    tile: [20, 16],
    marks: line("M5 7V2M5 7L2 3M5 7L8 3M15 15V10M15 15L12 11M15 15L18 11"),
  },
  mudstone: {
    word: "mudstone",
    tint: "#77746E",
    opacity: 0.26,
    tile: [20, 12],
    marks: line("M0 0.5H20M2 4.5H8M12 4.5H18M7 8.5H13"),
  },
  siltstone: {
    word: "siltstone",
    tint: "#8A8466",
    opacity: 0.26,
    tile: [14, 12],
    marks: line("M0 0.5H14M3.5 3.5V8M10.5 5.5V10"),
  },
  sandstone: {
    word: "sandstone",
    tint: "#C08A45",
    opacity: 0.28,
    tile: [16, 12],
    marks: [
      <path key="bed" d="M0 0.5H16" />,
      <g key="grain">{dots([3, 4.5], [8, 8], [12.5, 4.5], [14.5, 9], [2.5, 9.2])}</g>,
    ],
  },
  limestone: {
    word: "limestone",
    tint: "#7E93A0",
    opacity: 0.22,
    tile: [22, 16],
    marks: line("M0 0.5H22M0 8.5H22M5.5 0.5V8.5M16.5 8.5V16.5"),
  },
  chalk: {
    word: "chalk",
    tint: "#A9B8B4",
    opacity: 0.18,
    tile: [22, 16],
    marks: line("M0 0.5H22M0 8.5H22M3.5 0.5V8.5M14.5 8.5V16.5M11 3V6.2M15 3V6.2M2.5 11V14.2M6.5 11V14.2"),
  },
  coal: {
    word: "coal",
    tint: "#1B1B1B",
    opacity: 0.62,
    tile: [12, 5],
    marks: line("M0 2.5H12"),
  },
  breccia: {
    word: "breccia",
    tint: "#94806A",
    opacity: 0.24,
    tile: [22, 20],
    marks: line("M3 8L6 2L9 8ZM13 17L17 10L20 17ZM14 6L18 5L16.5 2ZM4 17L8 16L5.5 12.5Z"),
  },
  conglomerate: {
    word: "conglomerate",
    tint: "#94806A",
    opacity: 0.24,
    tile: [24, 18],
    marks: [
      <path key="bed" d="M0 0.5H24" />,
      <g key="stones">{circles([6, 7, 3.2], [17.5, 6, 2.3], [12, 13.5, 2.6], [21, 13.5, 1.8])}</g>,
    ],
  },
  igneous: {
    word: "igneous rock",
    tint: "#A86A5B",
    opacity: 0.24,
    tile: [18, 18],
    marks: line("M2 5H8M5 2V8M11 14H17M14 11V17"),
  },
  metamorphic: {
    word: "metamorphic rock",
    tint: "#7C7F8E",
    opacity: 0.26,
    tile: [20, 9],
    marks: line("M0 4.5C3.3 0 6.7 0 10 4.5S16.7 9 20 4.5"),
  },
  rock: {
    word: "rock",
    tint: "#83807A",
    opacity: 0.24,
    tile: [20, 20],
    marks: line("M3 8L8 3M12 6L17 11M4 17L10 12M14 18L18 15"),
  },
  concrete: {
    word: "concrete",
    tint: "#8D9494",
    opacity: 0.2,
    tile: [24, 24],
    marks: [
      <path key="stones" d="M4 9L7 4L10 9ZM15 20L19 18L16.5 14.5Z" fill="none" />,
      <g key="grains">{dots([15, 5], [20, 9], [3, 15], [9, 18], [12, 12], [21, 22], [5, 22])}</g>,
    ],
  },
  void: {
    word: "void",
    tint: "#FFFFFF",
    opacity: 0,
    tile: [26, 26],
    marks: line("M0 26L26 0"),
  },
  unknown: {
    word: "not known",
    tint: "#9A9A94",
    opacity: 0.12,
    tile: [24, 24],
    marks: line("M4 12H8M6 10V14M16 22H20M18 20V24"),
  },
} as const satisfies Record<string, Soil>;

/** The hatch that a word of the register calls for; `unknown` for a word that has none. */
export const soilKind = (word: string): SoilKind =>
  Object.hasOwn(SOILS, word) ? (word as SoilKind) : "unknown";

/** How a soil is called in a legend. */
export const soilWord = (word: string): string => SOILS[soilKind(word)].word;

/** A prefix for the names inside one figure, the same on the server and in the browser. */
export const useFigureId = (): string => `fig${useId().replace(/[^A-Za-z0-9]/g, "")}`;

/** The patterns of the soils that a figure draws; each figure carries its own, under its own prefix. */
export function SoilPatterns({ prefix, soils }: { prefix: string; soils: readonly string[] }) {
  const kinds = [...new Set(soils.map(soilKind))];
  return (
    <defs>
      {kinds.map((kind) => {
        const { tile, marks } = SOILS[kind];
        return (
          <pattern
            key={kind}
            id={`${prefix}-${kind}`}
            width={tile[0]}
            height={tile[1]}
            patternUnits="userSpaceOnUse"
          >
            <g stroke={INK} strokeWidth={0.85} strokeLinecap="round" fill="none">
              {marks}
            </g>
          </pattern>
        );
      })}
    </defs>
  );
}

/** An area of ground: its wash and over it its hatch. `d` is an SVG path; the patterns come from `SoilPatterns`. */
export function SoilArea({ prefix, soil, d }: { prefix: string; soil: string; d: string }) {
  const kind = soilKind(soil);
  const { tint, opacity } = SOILS[kind];
  return (
    <g data-soil={kind}>
      <path d={d} fill={tint} fillOpacity={opacity} />
      <path d={d} fill={`url(#${prefix}-${kind})`} />
    </g>
  );
}

/** A rectangle as the path that `SoilArea` takes. */
export const boxPath = (x: number, y: number, width: number, height: number): string =>
  `M${round(x)} ${round(y)}h${round(width)}v${round(height)}h${round(-width)}Z`;

const SWATCH: [width: number, height: number] = [36, 22];

/** One soil's hatch by itself, for tables and forms; its word stands beside it, so it is hidden from readers aloud. */
export function SoilSwatch({
  soil,
  width_px = SWATCH[0],
  height_px = SWATCH[1],
}: {
  soil: string;
  width_px?: number;
  height_px?: number;
}) {
  const prefix = useFigureId();
  return (
    <svg width={width_px} height={height_px} viewBox={`0 0 ${width_px} ${height_px}`} aria-hidden="true">
      <SoilPatterns prefix={prefix} soils={[soil]} />
      <SoilArea prefix={prefix} soil={soil} d={boxPath(0.5, 0.5, width_px - 1, height_px - 1)} />
      <path d={boxPath(0.5, 0.5, width_px - 1, height_px - 1)} fill="none" stroke={INK} strokeWidth={0.9} />
    </svg>
  );
}

/** The legend of the soils in a figure, in the order given, with a word of the caller's own where there is one. */
export function SoilLegend({
  entries,
  width_px = 640,
}: {
  entries: readonly { soil: string; word?: string }[];
  width_px?: number;
}) {
  const prefix = useFigureId();
  const [swatchWidth, swatchHeight] = SWATCH;
  const words = entries.map(({ soil, word }) => word ?? soilWord(soil));
  const widest = Math.max(0, ...words.map((word) => textWidth(word, SMALL_PX)));
  const column = swatchWidth + 8 + widest + 18;
  const columns = Math.max(1, Math.floor((width_px + 18) / column));
  const height = Math.ceil(entries.length / columns) * (swatchHeight + 8);
  return (
    <svg
      className="h-auto max-w-full"
      width={width_px}
      height={height}
      viewBox={`0 0 ${width_px} ${height}`}
      role="img"
      aria-label={`Legend of ground: ${words.join(", ")}`}
    >
      <SoilPatterns prefix={prefix} soils={entries.map(({ soil }) => soil)} />
      {entries.map(({ soil }, index) => {
        const x = (index % columns) * column;
        const y = Math.floor(index / columns) * (swatchHeight + 8) + 1;
        const box = boxPath(x + 0.5, y, swatchWidth, swatchHeight);
        return (
          <g key={`${soil} ${words[index]}`}>
            <SoilArea prefix={prefix} soil={soil} d={box} />
            <path d={box} fill="none" stroke={INK} strokeWidth={0.9} />
            <Label x={x + swatchWidth + 8} y={y + swatchHeight / 2 + 4} size_px={SMALL_PX}>
              {words[index]}
            </Label>
          </g>
        );
      })}
    </svg>
  );
}
