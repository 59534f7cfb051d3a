import { HorizontalDimension, Label, pathOf, round, VerticalDimension } from "./drawing-marks";
import { ACTION, INK, INK_2, SHEET, SMALL_PX, TEXT_PX } from "./ink";
import { type BasePoint, contactLimit, type PressureGiven } from "./pressure-layout";
import { textWidth } from "./text-width";

type PlanProps = {
  given: PressureGiven;
  /** Centre of the pad in the drawing. */
  centreX: number;
  centreY: number;
  pxPerM: number;
  contactFill: string;
};

const metres = (value: number): string => `${value.toFixed(value < 10 ? 3 : 2).replace("-", "−")} m`;

/** The pad from above: contact, its limit, middle third, column, resultant, pressures at the corners, sizes. */
export function PressurePlan({ given, centreX, centreY, pxPerM, contactFill }: PlanProps) {
  const { breadth_m, length_m, cornerPressures_kPa, eccentricityB_m, eccentricityL_m } = given;
  const halfB = (breadth_m / 2) * pxPerM;
  const halfL = (length_m / 2) * pxPerM;
  const at = ([alongB, alongL]: BasePoint): [number, number] => [
    centreX + alongB * pxPerM,
    centreY - alongL * pxPerM,
  ];
  const left = centreX - halfB;
  const right = centreX + halfB;
  const top = centreY - halfL;
  const bottom = centreY + halfL;
  const none = given.distribution === "none";
  const limit = none ? null : contactLimit(given);
  const corners: { x: number; y: number; anchor: "start" | "end" }[] = [
    { x: right + 7, y: top - 5, anchor: "start" },
    { x: left - 7, y: top - 5, anchor: "end" },
    { x: left - 7, y: bottom + 13, anchor: "end" },
    { x: right + 7, y: bottom + 13, anchor: "start" },
  ];
  const pressures = corners.map((_, index) => `${Math.round(cornerPressures_kPa[index] ?? 0)} kPa`);
  const widest = Math.max(...pressures.map((text) => textWidth(text, SMALL_PX)));
  const breadthText = `B = ${metres(breadth_m)}`;
  const resultant = resultantPlace(given, halfB, halfL, pxPerM);
  const [rx, ry] = [centreX + resultant.x, centreY + resultant.y];
  const column = given.column ?? { breadth_m: breadth_m / 4, length_m: length_m / 4 };
  return (
    <g>
      <path
        d={pathOf([
          [left, top],
          [right, top],
          [right, bottom],
          [left, bottom],
        ])}
        fill={SHEET}
        stroke="none"
      />
      {none ? null : <path d={pathOf(given.contactPolygon_m.map(at))} fill={contactFill} stroke="none" />}
      {given.column === null ? null : (
        <path
          d={pathOf([
            at([-column.breadth_m / 2, -column.length_m / 2]),
            at([column.breadth_m / 2, -column.length_m / 2]),
            at([column.breadth_m / 2, column.length_m / 2]),
            at([-column.breadth_m / 2, column.length_m / 2]),
          ])}
          fill="none"
          stroke={INK_2}
          strokeWidth={0.9}
        />
      )}
      <path
        d={`M${round(left - 10)} ${round(centreY)}H${round(right + 10)}M${round(centreX)} ${round(top - 10)}V${round(bottom + 10)}`}
        stroke={INK_2}
        strokeWidth={0.6}
        strokeDasharray="12 3 2 3"
        fill="none"
      />
      <path
        d={pathOf([
          at([breadth_m / 6, 0]),
          at([0, length_m / 6]),
          at([-breadth_m / 6, 0]),
          at([0, -length_m / 6]),
        ])}
        stroke={INK}
        strokeWidth={0.9}
        strokeDasharray="4 3"
        fill="none"
      />
      {limit ? (
        <path
          d={pathOf(limit.map(at), false)}
          stroke={INK}
          strokeWidth={1.6}
          strokeDasharray="10 3 2 3"
          fill="none"
        />
      ) : null}
      <path
        d={pathOf([
          [left, top],
          [right, top],
          [right, bottom],
          [left, bottom],
        ])}
        fill="none"
        stroke={INK}
        strokeWidth={1.8}
      />
      <ResultantMark x={rx} y={ry} />
      {resultant.away ? (
        <Label x={rx} y={ry - 12} anchor="middle" size_px={SMALL_PX}>
          beyond
        </Label>
      ) : null}
      {none
        ? null
        : corners.map(({ x, y, anchor }, index) => (
            <Label
              key={`${x} ${y}`}
              x={x}
              y={y}
              anchor={anchor}
              size_px={SMALL_PX}
              weight={isHighest(given, index) ? "medium" : "regular"}
            >
              {pressures[index]}
            </Label>
          ))}
      <HorizontalDimension
        x1={left}
        x2={right}
        y={bottom + 40}
        from={bottom + 20}
        text={breadthText}
        textAt={
          textWidth(breadthText, TEXT_PX) + 8 > 2 * halfB ? { x: right + 18, anchor: "start" } : undefined
        }
      />
      <VerticalDimension
        y1={top}
        y2={bottom}
        x={left - widest - 20}
        from={left - 8}
        text={`L = ${metres(length_m)}`}
        side="left"
      />
      {none || Math.abs(eccentricityB_m) < 5e-4 ? null : (
        <HorizontalDimension
          x1={centreX}
          x2={rx}
          y={top - 30}
          from={top - 12}
          text={<EccentricityText axis="B" value_m={eccentricityB_m} />}
          textAt={{ x: Math.max(centreX, rx) + 20, anchor: "start" }}
        />
      )}
      {none || Math.abs(eccentricityL_m) < 5e-4 ? null : (
        <VerticalDimension
          y1={centreY}
          y2={ry}
          x={right + widest + 22}
          from={right + 12}
          text={<EccentricityText axis="L" value_m={eccentricityL_m} />}
          side="right"
        />
      )}
    </g>
  );
}

function EccentricityText({ axis, value_m }: { axis: "B" | "L"; value_m: number }) {
  return (
    <>
      <tspan fontStyle="italic">e</tspan>
      <tspan dy={3} fontSize={9}>
        {axis}
      </tspan>
      <tspan dy={-3}>{` = ${metres(value_m)}`}</tspan>
    </>
  );
}

/** Where the resultant is drawn from the centre; one far off the base is drawn just beside it and said to be beyond. */
function resultantPlace(
  given: PressureGiven,
  halfB: number,
  halfL: number,
  pxPerM: number,
): { x: number; y: number; away: boolean } {
  const x = Number.isFinite(given.eccentricityB_m) ? given.eccentricityB_m * pxPerM : halfB * 2;
  const y = Number.isFinite(given.eccentricityL_m) ? -given.eccentricityL_m * pxPerM : 0;
  const heldX = Math.max(-halfB - 26, Math.min(halfB + 26, x));
  const heldY = Math.max(-halfL - 26, Math.min(halfL + 16, y));
  return { x: heldX, y: heldY, away: Math.abs(heldX - x) > 1 || Math.abs(heldY - y) > 1 };
}

const isHighest = ({ cornerPressures_kPa, maxPressure_kPa }: PressureGiven, index: number): boolean =>
  maxPressure_kPa > 0 && (cornerPressures_kPa[index] ?? 0) >= maxPressure_kPa * (1 - 1e-9);

/** The resultant on plan: a ring with a cross, filled behind so that lines under it do not confuse. */
export function ResultantMark({ x, y }: { x: number; y: number }) {
  return (
    <g>
      <circle cx={round(x)} cy={round(y)} r={5} fill={SHEET} stroke={ACTION} strokeWidth={1.8} />
      <path
        d={`M${round(x - 8)} ${round(y)}H${round(x + 8)}M${round(x)} ${round(y - 8)}V${round(y + 8)}`}
        stroke={ACTION}
        strokeWidth={1.2}
        fill="none"
      />
    </g>
  );
}
