import { ArrowHead, HorizontalDimension, Label, LevelTriangle, pathOf, round } from "./drawing-marks";
import { ACTION, INK, INK_2, SMALL_PX } from "./ink";
import { DEPTH_PX, edgeProfile, type PressureGiven } from "./pressure-layout";
import { boxPath, SoilArea } from "./soil-hatch";
import { spread } from "./spread";

/** Height of the highest pressure in the drawing. */
const BLOCK_PX = 84;

type ElevationProps = {
  given: PressureGiven;
  centreX: number;
  /** Height of the ground line in the drawing. */
  groundY: number;
  pxPerM: number;
  broken: boolean;
  prefix: string;
  soil: string;
  width_px: number;
};

/** Depth in pixels that the pad is drawn below ground. */
export const drawnDepth_px = (given: PressureGiven, pxPerM: number): number =>
  Math.min(Math.max(0, given.groundLevel_m - given.foundingLevel_m) * pxPerM, DEPTH_PX);

/** Height in pixels below the founding level that the pressure block and its figures take. */
export const BLOCK_ROOM_PX = BLOCK_PX + 48;

/** The pad seen along L: ground, pad and column, the load at its eccentricity, levels, and the pressure block under it. */
export function PressureElevation({
  given,
  centreX,
  groundY,
  pxPerM,
  broken,
  prefix,
  soil,
  width_px,
}: ElevationProps) {
  const halfB = (given.breadth_m / 2) * pxPerM;
  const baseY = groundY + drawnDepth_px(given, pxPerM);
  const thickness = given.thickness_m * pxPerM;
  const padTop = baseY - thickness;
  const column = given.column ?? { breadth_m: given.breadth_m / 4 };
  const halfColumn = Math.min(halfB, (column.breadth_m / 2) * pxPerM);
  const columnTop = Math.min(groundY, padTop) - 22;
  const groundLeft = 24;
  const groundRight = width_px - 150;
  const profile = edgeProfile(given);
  return (
    <g>
      <SoilArea
        prefix={prefix}
        soil={soil}
        d={
          boxPath(groundLeft, baseY, centreX - halfB - groundLeft, 14) +
          boxPath(centreX + halfB, baseY, groundRight - centreX - halfB, 14)
        }
      />
      <path
        d={`M${groundLeft} ${round(baseY)}H${groundRight}`}
        stroke={INK_2}
        strokeWidth={0.7}
        fill="none"
      />
      {groundY < baseY - 1 ? (
        <path
          d={`M${groundLeft} ${round(groundY)}H${groundRight}`}
          stroke={INK}
          strokeWidth={1.4}
          fill="none"
        />
      ) : null}
      {broken ? <BreakLine x1={groundLeft} x2={groundRight} y={(groundY + padTop) / 2} /> : null}
      <path
        d={pathOf([
          [centreX - halfB, padTop],
          [centreX - halfColumn, padTop],
          [centreX - halfColumn, columnTop],
          [centreX + halfColumn, columnTop],
          [centreX + halfColumn, padTop],
          [centreX + halfB, padTop],
          [centreX + halfB, baseY],
          [centreX - halfB, baseY],
        ])}
        fill="var(--sheet, #FFFEFB)"
        stroke={INK}
        strokeWidth={1.8}
      />
      <SoilArea prefix={prefix} soil="concrete" d={boxPath(centreX - halfB, padTop, 2 * halfB, thickness)} />
      <Load
        given={given}
        centreX={centreX}
        halfB={halfB}
        pxPerM={pxPerM}
        top={columnTop - 14}
        baseY={baseY}
      />
      {profile ? (
        <Block given={given} profile={profile} centreX={centreX} baseY={baseY} pxPerM={pxPerM} />
      ) : null}
      <Levels given={given} x={groundRight} groundY={groundY} baseY={baseY} broken={broken} pxPerM={pxPerM} />
    </g>
  );
}

function BreakLine({ x1, x2, y }: { x1: number; x2: number; y: number }) {
  const middle = (x1 + x2) / 2;
  const zig = (x: number): string =>
    `H${round(x - 8)}L${round(x - 3)} ${round(y - 6)}L${round(x + 3)} ${round(y + 6)}L${round(x + 8)} ${round(y)}`;
  return (
    <path
      d={`M${round(x1)} ${round(y)}${zig(x1 + (middle - x1) / 4)}${zig(x2 - (middle - x1) / 4)}H${round(x2)}`}
      stroke={INK_2}
      strokeWidth={0.8}
      fill="none"
    />
  );
}

function Load(props: {
  given: PressureGiven;
  centreX: number;
  halfB: number;
  pxPerM: number;
  top: number;
  baseY: number;
}) {
  const { given, centreX, halfB, pxPerM, top, baseY } = props;
  const shift = given.eccentricityB_m * pxPerM;
  const beyond = !Number.isFinite(shift) || Math.abs(shift) > halfB + 26;
  const x = centreX + (beyond ? Math.sign(shift || 1) * (halfB + 26) : shift);
  const upwards = given.vertical_kN < 0;
  const text = `${Math.round(Math.abs(given.vertical_kN))} kN${upwards ? " upwards" : ""}${beyond ? ", beyond the pad" : ""}`;
  return (
    <g>
      <path
        d={`M${round(x)} ${round(top)}V${round(baseY - (upwards ? 0 : 6))}`}
        stroke={ACTION}
        strokeWidth={1.8}
        fill="none"
      />
      {upwards ? (
        <ArrowHead x={x} y={top} towards="up" colour={ACTION} />
      ) : (
        <ArrowHead x={x} y={baseY} towards="down" colour={ACTION} />
      )}
      <Label x={x} y={top - 6} anchor="middle">
        {text}
      </Label>
    </g>
  );
}

function Block(props: {
  given: PressureGiven;
  profile: NonNullable<ReturnType<typeof edgeProfile>>;
  centreX: number;
  baseY: number;
  pxPerM: number;
}) {
  const { given, profile, centreX, baseY, pxPerM } = props;
  const left = centreX + profile.from_m * pxPerM;
  const right = centreX + profile.to_m * pxPerM;
  const depth = (pressure_kPa: number): number => (pressure_kPa / given.maxPressure_kPa) * BLOCK_PX;
  const start = baseY + 2;
  const leftDepth = depth(profile.fromPressure_kPa);
  const rightDepth = depth(profile.toPressure_kPa);
  const count = Math.max(2, Math.round((right - left) / 22));
  const arrows = Array.from({ length: count + 1 }, (_, index) => {
    const share = index / count;
    return { x: left + share * (right - left), deep: leftDepth + share * (rightDepth - leftDepth) };
  }).filter(({ deep }) => deep > 12);
  const partial = profile.to_m - profile.from_m < given.breadth_m * (1 - 1e-6);
  const figures = [
    { pressure_kPa: profile.fromPressure_kPa, x: left - 6, deep: leftDepth, anchor: "end" as const },
    { pressure_kPa: profile.toPressure_kPa, x: right + 6, deep: rightDepth, anchor: "start" as const },
  ];
  return (
    <g>
      <path
        d={pathOf([
          [left, start],
          [right, start],
          [right, start + rightDepth],
          [left, start + leftDepth],
        ])}
        fill={ACTION}
        fillOpacity={0.14}
        stroke={ACTION}
        strokeWidth={1.4}
        strokeLinejoin="round"
      />
      {arrows.map(({ x, deep }) => (
        <g key={round(x)}>
          <path
            d={`M${round(x)} ${round(start + deep)}V${round(start + 8)}`}
            stroke={ACTION}
            strokeWidth={0.9}
          />
          <ArrowHead x={x} y={start + 1} towards="up" colour={ACTION} />
        </g>
      ))}
      {figures.map(({ pressure_kPa, x, deep, anchor }) => (
        <Label
          key={anchor}
          x={x}
          y={start + Math.max(26, deep)}
          anchor={anchor}
          weight={pressure_kPa === given.maxPressure_kPa ? "medium" : "regular"}
        >
          {`${Math.round(pressure_kPa)} kPa`}
        </Label>
      ))}
      {partial ? (
        <HorizontalDimension
          x1={left}
          x2={right}
          y={start + BLOCK_PX + 32}
          text={`in contact over ${(profile.to_m - profile.from_m).toFixed(2)} m`}
        />
      ) : null}
    </g>
  );
}

function Levels(props: {
  given: PressureGiven;
  x: number;
  groundY: number;
  baseY: number;
  broken: boolean;
  pxPerM: number;
}) {
  const { given, x, groundY, baseY, broken, pxPerM } = props;
  const { groundwaterLevel_m: water } = given;
  const marks = [{ name: "ground", level_m: given.groundLevel_m, y: groundY, filled: false }];
  if (water !== null && water !== undefined) {
    const true_ = groundY + (given.groundLevel_m - water) * pxPerM;
    const within = broken
      ? groundY +
        ((given.groundLevel_m - water) / (given.groundLevel_m - given.foundingLevel_m)) * (baseY - groundY)
      : true_;
    if (within <= baseY + BLOCK_PX) marks.push({ name: "water", level_m: water, y: within, filled: true });
  }
  marks.push({ name: "founding", level_m: given.foundingLevel_m, y: baseY, filled: false });
  marks.sort((a, b) => a.y - b.y);
  const places = spread(
    marks.map(({ y }) => ({ wanted: y - 8, size: 15 })),
    0,
    Number.POSITIVE_INFINITY,
    2,
  );
  return (
    <g>
      {marks.map(({ name, level_m, y, filled }, index) => {
        const textY = (places[index] ?? 0) + 12;
        const text = `${name} ${level_m.toFixed(3).replace("-", "−")}`;
        return (
          <g key={name}>
            {name === "water" ? (
              <path
                d={`M24 ${round(y)}H${round(x)}`}
                stroke={ACTION}
                strokeWidth={0.8}
                strokeDasharray="7 4"
                fill="none"
              />
            ) : null}
            <LevelTriangle x={filled ? x - 26 : x - 8} y={y} filled={filled} />
            <path
              d={`M${round(x)} ${round(y)}h6L${round(x + 16)} ${round(textY - 4)}h4`}
              stroke={INK_2}
              strokeWidth={0.7}
              fill="none"
            />
            <Label x={x + 24} y={textY} size_px={SMALL_PX}>
              {text}
            </Label>
          </g>
        );
      })}
    </g>
  );
}
