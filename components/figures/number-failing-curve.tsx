import { Label, pathOf, round } from "./drawing-marks";
import { ACTION, FAILS, INK, INK_2, RULE, SHEET, SMALL_PX } from "./ink";
import { decimalsOf, niceStep, stepsBetween } from "./nice-steps";
import { spread } from "./spread";
import { textWidth } from "./text-width";

/** At this value so many footings fail: those that require more. Holds up to the next higher value of the curve. */
export type CurvePoint = { netAllowable_kPa: number; failing: number };

type Props = {
  /** From the highest value down, as a preview gives them. */
  points: readonly CurvePoint[];
  /** The value in force and the draft's; null where there is none. */
  currentNet_kPa: number | null;
  draftNet_kPa: number | null;
  /** Linked footings that have a check: all of them fail below the lowest point. */
  checked?: number;
};

const WIDTH_PX = 640;
const HEIGHT_PX = 290;
const LEFT = 60;
const RIGHT = WIDTH_PX - 22;
const TOP = 66;
const BOTTOM = HEIGHT_PX - 46;

/** How many footings fail at a value; null below a curve whose whole number is not known. */
export function failingAt(points: readonly CurvePoint[], value_kPa: number, checked?: number): number | null {
  const reached = points.find(({ netAllowable_kPa }) => netAllowable_kPa <= value_kPa);
  return reached?.failing ?? checked ?? null;
}

/** Number of footings that fail in bearing against the net allowable pressure, with the value in force and the draft's. */
export function NumberFailingCurve({ points, currentNet_kPa, draftNet_kPa, checked }: Props) {
  const marked = [currentNet_kPa, draftNet_kPa].filter((value) => value !== null);
  const values = [...points.map(({ netAllowable_kPa }) => netAllowable_kPa), ...marked];
  if (points.length === 0 || values.length === 0)
    return (
      <p className="text-sm text-ink-2">No linked footing has a check yet: there is no curve to draw.</p>
    );
  const lowest = Math.min(...values);
  const highest = Math.max(...values);
  const margin = Math.max((highest - lowest) * 0.06, highest * 0.02, 1);
  const stepX = niceStep(highest - lowest + 2 * margin, 8);
  const fromX = Math.max(0, Math.floor((lowest - margin) / stepX) * stepX);
  const toX = Math.ceil((highest + margin) / stepX) * stepX;
  const most = Math.max(1, checked ?? 0, ...points.map(({ failing }) => failing));
  const stepY = Math.max(1, niceStep(most, 5));
  const toY = Math.ceil(most / stepY) * stepY;
  const x = (value: number): number => LEFT + ((value - fromX) / (toX - fromX)) * (RIGHT - LEFT);
  const y = (failing: number): number => BOTTOM - (failing / toY) * (BOTTOM - TOP);
  const steps = stepPath(points, checked, x, y, fromX, toX);
  const marks = [
    { name: "today", value: currentNet_kPa, colour: INK, dash: undefined },
    { name: "draft", value: draftNet_kPa, colour: ACTION, dash: "7 4" },
  ].flatMap(({ value, ...mark }) => {
    if (value === null) return [];
    const failing = failingAt(points, value, checked);
    const says = failing === null ? "" : `: ${failing} ${failing === 1 ? "fails" : "fail"}`;
    return [{ ...mark, value, failing, text: `${mark.name} ${figureOf(value)} kPa${says}` }];
  });
  const sentence = `Number of footings failing against net allowable pressure. ${marks.map(({ text }) => text).join("; ")}.`;
  return (
    <svg
      className="h-auto max-w-full tabular-nums"
      width={WIDTH_PX}
      height={HEIGHT_PX}
      viewBox={`0 0 ${WIDTH_PX} ${HEIGHT_PX}`}
      role="img"
      aria-label={sentence}
    >
      {stepsBetween(0, toY, stepY).map((failing) => (
        <g key={failing}>
          <path
            d={`M${LEFT} ${round(y(failing))}H${RIGHT}`}
            stroke={failing === 0 ? INK : RULE}
            strokeWidth={failing === 0 ? 1.2 : 0.8}
          />
          <Label x={LEFT - 8} y={y(failing) + 4} anchor="end" size_px={SMALL_PX}>
            {failing}
          </Label>
        </g>
      ))}
      {stepsBetween(fromX, toX, stepX).map((value) => (
        <g key={value}>
          <path d={`M${round(x(value))} ${BOTTOM}v5`} stroke={INK} strokeWidth={1} />
          <Label x={x(value)} y={BOTTOM + 18} anchor="middle" size_px={SMALL_PX}>
            {value.toFixed(decimalsOf(stepX))}
          </Label>
        </g>
      ))}
      <path d={`M${LEFT} ${TOP}V${BOTTOM}`} stroke={INK} strokeWidth={1.2} />
      <Label x={RIGHT} y={BOTTOM + 37} anchor="end" size_px={SMALL_PX} colour={INK_2}>
        net allowable bearing pressure, kPa
      </Label>
      <Label x={12} y={16} size_px={SMALL_PX} colour={INK_2}>
        footings failing in bearing
      </Label>
      <path d={pathOf(steps, false)} fill="none" stroke={FAILS} strokeWidth={2} strokeLinejoin="miter" />
      <Marks marks={marks} x={x} y={y} />
    </svg>
  );
}

type Mark = {
  name: string;
  value: number;
  failing: number | null;
  colour: string;
  dash: string | undefined;
  text: string;
};

/** The marked values as upright lines, each lettered in the band above the curve, none over another. */
function Marks({
  marks,
  x,
  y,
}: {
  marks: Mark[];
  x: (value: number) => number;
  y: (failing: number) => number;
}) {
  const inOrder = [...marks].sort((a, b) => a.value - b.value);
  const sizes = inOrder.map(({ text }) => textWidth(text, SMALL_PX, "medium"));
  const places = spread(
    inOrder.map(({ value }, index) => ({
      wanted: x(value) - (sizes[index] ?? 0) / 2,
      size: sizes[index] ?? 0,
    })),
    LEFT,
    RIGHT,
    14,
  );
  return (
    <g>
      {inOrder.map(({ name, value, failing, colour, dash, text }, index) => {
        const middle = (places[index] ?? 0) + (sizes[index] ?? 0) / 2;
        return (
          <g key={name}>
            <path
              d={`M${round(middle)} 42L${round(x(value))} ${TOP - 8}V${BOTTOM}`}
              fill="none"
              stroke={colour}
              strokeWidth={1.4}
              strokeDasharray={dash}
            />
            {failing === null ? null : (
              <circle
                cx={round(x(value))}
                cy={round(y(failing))}
                r={4}
                fill={SHEET}
                stroke={colour}
                strokeWidth={1.8}
              />
            )}
            <Label x={middle} y={37} anchor="middle" size_px={SMALL_PX} weight="medium">
              {text}
            </Label>
          </g>
        );
      })}
    </g>
  );
}

/** The curve as steps: each number holds from its own value up to the next higher one. */
function stepPath(
  points: readonly CurvePoint[],
  checked: number | undefined,
  x: (value: number) => number,
  y: (failing: number) => number,
  fromX: number,
  toX: number,
): [number, number][] {
  const path: [number, number][] = [];
  let right = toX;
  for (const { netAllowable_kPa, failing } of points) {
    path.push([x(right), y(failing)], [x(netAllowable_kPa), y(failing)]);
    right = netAllowable_kPa;
  }
  if (checked !== undefined) path.push([x(right), y(checked)], [x(fromX), y(checked)]);
  return path;
}

const figureOf = (value: number): string =>
  Math.abs(value - Math.round(value)) < 0.05 ? String(Math.round(value)) : value.toFixed(1);
