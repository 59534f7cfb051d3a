import { Label, pathOf, round } from "./drawing-marks";
import { ACTION, INK, INK_2, SMALL_PX } from "./ink";
import { BLOCK_ROOM_PX, drawnDepth_px, PressureElevation } from "./pressure-elevation";
import { edgeProfile, type PressureGiven, scaleOf } from "./pressure-layout";
import { PressurePlan, ResultantMark } from "./pressure-plan";
import { SoilPatterns, useFigureId } from "./soil-hatch";
import { textWidth } from "./text-width";

const WIDTH_PX = 620;

/** Middle of the pad: left of the middle of the sheet, because levels stand on the right. */
const CENTRE_X = 290;

/**
 * A pad and the pressure under it, drawn to one true scale: above the elevation along B with the pressure block, below
 * it the plan with contact area, middle third, resultant and the pressures at the corners. `soil` hatches the ground
 * that the pad stands on.
 */
export function PressureFigure({ given, soil = "unknown" }: { given: PressureGiven; soil?: string }) {
  const prefix = useFigureId();
  const { pxPerM, broken } = scaleOf(given);
  const none = given.distribution === "none";
  const groundY = 76 + Math.max(0, given.thickness_m * pxPerM - drawnDepth_px(given, pxPerM));
  const baseY = groundY + drawnDepth_px(given, pxPerM);
  const halfL = (given.length_m / 2) * pxPerM;
  const planTop = baseY + (none ? 96 : BLOCK_ROOM_PX + 50);
  const centreY = planTop + halfL;
  const keyY = centreY + halfL + 78;
  const profile = edgeProfile(given);
  const entries = keyEntries(given, prefix);
  const rows = keyRows(entries.map(({ word }) => word));
  const height = keyY + rows.count * 22 + 18;
  return (
    <svg
      className="h-auto max-w-full tabular-nums"
      width={WIDTH_PX}
      height={Math.ceil(height)}
      viewBox={`0 0 ${WIDTH_PX} ${Math.ceil(height)}`}
      role="img"
      aria-label={sentenceOf(given)}
    >
      <SoilPatterns prefix={prefix} soils={[soil, "concrete"]} />
      <defs>
        <pattern
          id={`${prefix}-contact`}
          width={6}
          height={6}
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(45)"
        >
          <path d="M0 0V6" stroke={ACTION} strokeWidth={1.1} strokeOpacity={0.75} />
        </pattern>
      </defs>
      <Label x={24} y={18} weight="medium">
        Elevation along B
      </Label>
      {profile && differsAlongL(given) ? (
        <Label
          x={24 + textWidth("Elevation along B", 12, "medium") + 8}
          y={18}
          size_px={SMALL_PX}
          colour={INK_2}
        >
          {`pressure along the ${profile.side} side`}
        </Label>
      ) : null}
      <PressureElevation
        given={given}
        centreX={CENTRE_X}
        groundY={groundY}
        pxPerM={pxPerM}
        broken={broken}
        prefix={prefix}
        soil={soil}
        width_px={WIDTH_PX}
      />
      <Label x={24} y={planTop - 42} weight="medium">
        Plan
      </Label>
      {none ? (
        <Label x={24 + textWidth("Plan", 12, "medium") + 12} y={planTop - 42} colour={INK}>
          {reasonOf(given)}
        </Label>
      ) : null}
      <PressurePlan
        given={given}
        centreX={CENTRE_X}
        centreY={centreY}
        pxPerM={pxPerM}
        contactFill={`url(#${prefix}-contact)`}
      />
      <Axes x={40} y={centreY + halfL + 46} />
      <ScaleBar x={WIDTH_PX - 150} y={centreY + halfL + 44} pxPerM={pxPerM} />
      {entries.map(({ word, mark }, index) => {
        const place = rows.places[index] ?? { x: 0, row: 0 };
        return (
          <g key={word} transform={`translate(${round(24 + place.x)} ${round(keyY + place.row * 22)})`}>
            {mark}
          </g>
        );
      })}
      {entries.map(({ word }, index) => {
        const place = rows.places[index] ?? { x: 0, row: 0 };
        return (
          <Label key={word} x={24 + place.x + 30} y={keyY + place.row * 22 + 4} size_px={SMALL_PX}>
            {word}
          </Label>
        );
      })}
    </svg>
  );
}

/** Whether the two sides along B carry other pressures, so that it has to be said which one is drawn. */
function differsAlongL({
  cornerPressures_kPa: [a = 0, b = 0, c = 0, d = 0],
  maxPressure_kPa,
}: PressureGiven): boolean {
  return Math.max(Math.abs(a - d), Math.abs(b - c)) > 1e-6 * maxPressure_kPa;
}

/** What the figure shows, in a sentence for those who do not see it. */
function sentenceOf(given: PressureGiven): string {
  const size = `Pad of ${given.breadth_m.toFixed(2)} by ${given.length_m.toFixed(2)} m`;
  if (given.distribution === "none") return `${size}. ${reasonOf(given)}`;
  const contact =
    given.contactRatio < 1 - 1e-9
      ? `contact over ${Math.round(given.contactRatio * 100)} % of the base`
      : "full contact";
  const corners = ["+B+L", "−B+L", "−B−L", "+B−L"]
    .map((name, index) => `${name} ${Math.round(given.cornerPressures_kPa[index] ?? 0)}`)
    .join(", ");
  return `${size}, ${given.distribution} base pressure, ${contact}; at the corners, in kPa: ${corners}.`;
}

const reasonOf = ({ vertical_kN }: PressureGiven): string =>
  vertical_kN > 0
    ? "No equilibrium: the resultant falls on or outside the edge of the base."
    : "No equilibrium: no load presses the base on to the ground.";

function keyEntries(given: PressureGiven, prefix: string) {
  const limit = given.contactRatio < 1 - 1e-9 && given.distribution !== "none";
  const percent = Math.round(given.contactRatio * 100);
  return [
    { word: "resultant", mark: <ResultantMark x={11} y={0} /> },
    {
      word: "middle third",
      mark: (
        <path
          d={pathOf([
            [11, -8],
            [22, 0],
            [11, 8],
            [0, 0],
          ])}
          fill="none"
          stroke={INK}
          strokeWidth={0.9}
          strokeDasharray="4 3"
        />
      ),
    },
    ...(given.distribution === "none"
      ? []
      : [
          {
            word: limit ? `in contact, ${percent} % of the base` : "in contact, the whole base",
            mark: (
              <path d="M0 -7H22V7H0Z" fill={`url(#${prefix}-contact)`} stroke={INK_2} strokeWidth={0.7} />
            ),
          },
        ]),
    ...(limit
      ? [
          {
            word: "neutral axis",
            mark: <path d="M0 0H22" stroke={INK} strokeWidth={1.6} strokeDasharray="10 3 2 3" />,
          },
        ]
      : []),
  ];
}

function keyRows(words: readonly string[]): { places: { x: number; row: number }[]; count: number } {
  const places: { x: number; row: number }[] = [];
  let x = 0;
  let row = 0;
  for (const word of words) {
    const width = 30 + textWidth(word, SMALL_PX) + 20;
    if (x > 0 && x + width > WIDTH_PX - 48) {
      x = 0;
      row += 1;
    }
    places.push({ x, row });
    x += width;
  }
  return { places, count: row + 1 };
}

function Axes({ x, y }: { x: number; y: number }) {
  return (
    <g>
      <path
        d={`M${round(x)} ${round(y)}h22m-5 -3l5 3l-5 3M${round(x)} ${round(y)}v-22m-3 5l3 -5l3 5`}
        fill="none"
        stroke={INK}
        strokeWidth={1}
      />
      <Label x={x + 27} y={y + 4} size_px={SMALL_PX}>
        +B
      </Label>
      <Label x={x} y={y - 27} size_px={SMALL_PX} anchor="middle">
        +L
      </Label>
    </g>
  );
}

function ScaleBar({ x, y, pxPerM }: { x: number; y: number; pxPerM: number }) {
  const length_m = [5, 2, 1, 0.5, 0.2, 0.1].find((metres) => metres * pxPerM <= 100) ?? 0.1;
  const half = (length_m * pxPerM) / 2;
  return (
    <g>
      <path d={`M${round(x)} ${round(y)}h${round(half)}v5h${round(-half)}Z`} fill={INK} />
      <path
        d={`M${round(x)} ${round(y)}h${round(2 * half)}v5h${round(-2 * half)}Z`}
        fill="none"
        stroke={INK}
        strokeWidth={0.9}
      />
      <Label x={x} y={y - 5} size_px={SMALL_PX} anchor="middle">
        0
      </Label>
      <Label x={x + 2 * half} y={y - 5} size_px={SMALL_PX} anchor="middle">
        {`${length_m} m`}
      </Label>
    </g>
  );
}
