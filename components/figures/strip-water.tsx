import { ArrowHead, Label, LevelTriangle, Lines, round } from "./drawing-marks";
import { ACTION, INK_2, SMALL_PX } from "./ink";
import { spread } from "./spread";
import { COLUMNS, HEAD_PX, type StripLayout, type StripStrike } from "./strip-layout";
import { wrapText } from "./text-width";

const LINE = 12;
const ROW_PX = 17;

/** Water strikes (open triangle) and what the water rose to (filled triangle), with depths and minutes in words. */
export function StripWater({ strikes, layout }: { strikes: readonly StripStrike[]; layout: StripLayout }) {
  const textX = COLUMNS.water + 46;
  const width = COLUMNS.end - textX - 2;
  const drawn = strikes.map((strike, index) => {
    const x = COLUMNS.water + 14 + (index % 2) * ROW_PX;
    const risen = [...strike.rises]
      .filter(({ depth_m }) => depth_m !== null)
      .sort((a, b) => b.minutes - a.minutes)[0];
    return { strike, x, risen };
  });
  const notes = drawn
    .flatMap(({ strike, risen, x }) => {
      const words = strike.rises
        .filter(({ depth_m, text }) => depth_m === null && text !== "")
        .map(({ text }) => text);
      const struck =
        strike.depth_m === null
          ? []
          : [
              {
                depth_m: strike.depth_m,
                x,
                text: [`struck at ${strike.depth_m.toFixed(2)}`, ...words].join(", "),
              },
            ];
      const rose =
        risen && risen.depth_m !== null
          ? [{ depth_m: risen.depth_m, x, text: `${risen.depth_m.toFixed(2)} after ${risen.minutes} min` }]
          : [];
      return [...struck, ...rose];
    })
    .map((note) => ({ ...note, lines: wrapText(note.text, width, SMALL_PX) }))
    .sort((a, b) => a.depth_m - b.depth_m);
  const places = spread(
    notes.map(({ depth_m, lines }) => ({ wanted: layout.y(depth_m) - 9, size: lines.length * LINE })),
    HEAD_PX,
    layout.height,
    4,
  );
  return (
    <g>
      {strikes.length === 0 ? (
        <Label x={COLUMNS.water + 6} y={HEAD_PX + 17} size_px={SMALL_PX} colour={INK_2}>
          none recorded
        </Label>
      ) : null}
      {drawn.map(({ strike, x, risen }) => {
        const struckY = strike.depth_m === null ? null : layout.y(strike.depth_m);
        const risenY = risen && risen.depth_m !== null ? layout.y(risen.depth_m) : null;
        const rises = struckY !== null && risenY !== null && struckY - risenY > 14;
        return (
          <g key={`${strike.depth_m} ${x}`}>
            {rises ? (
              <>
                <path
                  d={`M${round(x)} ${round(struckY - 9)}V${round(risenY + 3)}`}
                  stroke={ACTION}
                  strokeWidth={1.2}
                />
                <ArrowHead x={x} y={risenY + 2} towards="up" colour={ACTION} />
              </>
            ) : null}
            {struckY === null ? null : <LevelTriangle x={x} y={struckY} />}
            {risenY === null ? null : <LevelTriangle x={x} y={risenY} filled />}
          </g>
        );
      })}
      {notes.map(({ depth_m, x, lines }, index) => {
        const top = places[index] ?? 0;
        return (
          <g key={top}>
            <path
              d={`M${round(x + 6)} ${round(layout.y(depth_m))}H${round(COLUMNS.water + 38)}L${textX - 3} ${round(top + 6)}`}
              stroke={INK_2}
              strokeWidth={0.5}
              fill="none"
            />
            <Lines x={textX} y={top + 10} line_px={LINE} lines={lines} size_px={SMALL_PX} />
          </g>
        );
      })}
    </g>
  );
}
