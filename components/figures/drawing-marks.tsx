import type { ReactNode } from "react";
import { FACE, INK, INK_2, SHEET, TEXT_PX } from "./ink";

type LabelProps = {
  x: number;
  y: number;
  children: ReactNode;
  anchor?: "start" | "middle" | "end";
  size_px?: number;
  weight?: "regular" | "medium";
  colour?: string;
};

/** One line of lettering, its baseline at `y`. */
export function Label({
  x,
  y,
  children,
  anchor = "start",
  size_px = TEXT_PX,
  weight = "regular",
  colour = INK,
}: LabelProps) {
  return (
    <text
      x={round(x)}
      y={round(y)}
      textAnchor={anchor}
      fontSize={size_px}
      fontWeight={weight === "medium" ? 500 : 400}
      fontFamily={FACE}
      fill={colour}
    >
      {children}
    </text>
  );
}

/** Lines of lettering under one another, the first with its baseline at `y`. */
export function Lines({
  lines,
  y,
  line_px,
  ...label
}: Omit<LabelProps, "children"> & { lines: readonly string[]; line_px: number }) {
  return lines.map((line, row) => {
    const lineY = y + row * line_px;
    return (
      <Label key={lineY} y={lineY} {...label}>
        {line}
      </Label>
    );
  });
}

/** A coordinate to a hundredth of a pixel: enough for any printer, and the same on server and in browser. */
export const round = (value: number): number => Math.round(value * 100) / 100;

/** Points as an SVG path, closed unless told otherwise. */
export const pathOf = (points: readonly (readonly [number, number])[], closed = true): string =>
  points.map(([x, y], index) => `${index === 0 ? "M" : "L"}${round(x)} ${round(y)}`).join("") +
  (closed && points.length > 0 ? "Z" : "");

/** The oblique stroke that ends a dimension line. */
const tick = (x: number, y: number): string =>
  `M${round(x - 4)} ${round(y + 4)}L${round(x + 4)} ${round(y - 4)}`;

/** A dimension line from `x1` to `x2` at height `y`, with extension lines from `from`; its figure stands as told. */
export function HorizontalDimension(props: {
  x1: number;
  x2: number;
  y: number;
  from?: number;
  text: ReactNode;
  textAt?: { x: number; anchor: "start" | "middle" | "end" };
}) {
  const { x1, x2, y, from, text, textAt } = props;
  const over = from === undefined ? 0 : Math.sign(y - from);
  const left = Math.min(x1, x2);
  const right = Math.max(x1, x2);
  const overhang = right - left < 12 ? 10 : 0;
  return (
    <g>
      {from === undefined ? null : (
        <path
          d={`M${round(x1)} ${round(from)}V${round(y + 4 * over)}M${round(x2)} ${round(from)}V${round(y + 4 * over)}`}
          stroke={INK_2}
          strokeWidth={0.6}
          fill="none"
        />
      )}
      <path
        d={`M${round(left - overhang)} ${round(y)}H${round(right + overhang)}${tick(x1, y)}${tick(x2, y)}`}
        stroke={INK}
        strokeWidth={0.9}
        fill="none"
      />
      {textAt ? (
        <Label x={textAt.x} y={y + 4} anchor={textAt.anchor}>
          {text}
        </Label>
      ) : (
        <Label x={(x1 + x2) / 2} y={y - 5} anchor="middle">
          {text}
        </Label>
      )}
    </g>
  );
}

/** A dimension line from `y1` to `y2` at `x`, with extension lines from `from`; its figure stands level beside it. */
export function VerticalDimension(props: {
  y1: number;
  y2: number;
  x: number;
  from?: number;
  text: ReactNode;
  side: "left" | "right";
}) {
  const { y1, y2, x, from, text, side } = props;
  const over = from === undefined ? 0 : Math.sign(x - from);
  const top = Math.min(y1, y2);
  const bottom = Math.max(y1, y2);
  const overhang = bottom - top < 12 ? 10 : 0;
  return (
    <g>
      {from === undefined ? null : (
        <path
          d={`M${round(from)} ${round(y1)}H${round(x + 4 * over)}M${round(from)} ${round(y2)}H${round(x + 4 * over)}`}
          stroke={INK_2}
          strokeWidth={0.6}
          fill="none"
        />
      )}
      <path
        d={`M${round(x)} ${round(top - overhang)}V${round(bottom + overhang)}${tick(x, y1)}${tick(x, y2)}`}
        stroke={INK}
        strokeWidth={0.9}
        fill="none"
      />
      <Label
        x={side === "left" ? x - 8 : x + 8}
        y={(y1 + y2) / 2 + 4}
        anchor={side === "left" ? "end" : "start"}
      >
        {text}
      </Label>
    </g>
  );
}

/** A symbol with an index below it, as q with "max". */
export function Indexed({ symbol, index }: { symbol: string; index: string }) {
  return (
    <>
      <tspan fontStyle="italic">{symbol}</tspan>
      <tspan dy={3} fontSize={9}>
        {index}
      </tspan>
      <tspan dy={-3}> </tspan>
    </>
  );
}

/** The head of an arrow whose tip is at a point, turned clockwise by quarter turns from pointing right. */
export function ArrowHead({
  x,
  y,
  towards,
  colour = INK,
}: {
  x: number;
  y: number;
  towards: "right" | "down" | "left" | "up";
  colour?: string;
}) {
  const tips: Record<typeof towards, [number, number][]> = {
    right: [
      [0, 0],
      [-9, -3.5],
      [-9, 3.5],
    ],
    left: [
      [0, 0],
      [9, -3.5],
      [9, 3.5],
    ],
    down: [
      [0, 0],
      [-3.5, -9],
      [3.5, -9],
    ],
    up: [
      [0, 0],
      [-3.5, 9],
      [3.5, 9],
    ],
  };
  return (
    <path d={pathOf(tips[towards].map(([dx, dy]): [number, number] => [x + dx, y + dy]))} fill={colour} />
  );
}

/** The triangle that stands on a level: open for a level, filled for water at rest. Its tip is at the point. */
export function LevelTriangle({ x, y, filled = false }: { x: number; y: number; filled?: boolean }) {
  return (
    <path
      d={pathOf([
        [x, y],
        [x - 5, y - 8.5],
        [x + 5, y - 8.5],
      ])}
      fill={filled ? INK : SHEET}
      stroke={INK}
      strokeWidth={0.9}
    />
  );
}
