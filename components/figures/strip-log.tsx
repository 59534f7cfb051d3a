import { Label, Lines, round } from "./drawing-marks";
import { INK, INK_2, RULE, SMALL_PX } from "./ink";
import { boxPath, SoilArea, SoilPatterns, soilWord, useFigureId } from "./soil-hatch";
import {
  COLUMNS,
  HEAD_PX,
  LINE_PX,
  layStrip,
  type StripHole,
  type StripLayout,
  signed,
} from "./strip-layout";
import { StripSpts } from "./strip-spt";
import { StripWater } from "./strip-water";

/**
 * The strip log of one hole: depth and level, hatched strata with their words beside them, ground unit, blow counts,
 * water. The words are those of the log, all of them; where they need more room than their stratum, a line leads there.
 */
export function StripLog({ hole }: { hole: StripHole }) {
  const prefix = useFigureId();
  const layout = layStrip(hole);
  const height = Math.ceil(layout.height);
  return (
    <svg
      className="h-auto max-w-full tabular-nums"
      width={COLUMNS.end}
      height={height}
      viewBox={`0 0 ${COLUMNS.end} ${height}`}
      role="img"
      aria-label={sentenceOf(hole)}
    >
      <SoilPatterns prefix={prefix} soils={hole.strata.map(({ soil }) => soil)} />
      <Head levels={hole.groundLevel_m !== null} />
      <Scales layout={layout} />
      {layout.blocks.map(({ stratum, top, base, wordsTop }) => (
        <SoilArea
          key={wordsTop}
          prefix={prefix}
          soil={stratum.soil}
          d={boxPath(COLUMNS.hatch, top, COLUMNS.lead - COLUMNS.hatch, Math.max(0, base - top))}
        />
      ))}
      <Words layout={layout} />
      <path
        d={`M${COLUMNS.hatch} ${HEAD_PX}V${round(layout.bottom)}M${COLUMNS.lead} ${HEAD_PX}V${round(layout.bottom)}`}
        stroke={INK}
        strokeWidth={1.2}
        fill="none"
      />
      <StripSpts spts={hole.spts} layout={layout} />
      <StripWater strikes={hole.strikes} layout={layout} />
      <Foot hole={hole} layout={layout} />
    </svg>
  );
}

function Head({ levels }: { levels: boolean }) {
  const titles = [
    { x: COLUMNS.depth, lines: ["depth", "m"] },
    { x: COLUMNS.level, lines: levels ? ["level", "m"] : ["level", "not known"] },
    { x: COLUMNS.hatch, lines: ["legend"] },
    { x: COLUMNS.words, lines: ["description"] },
    { x: COLUMNS.unit, lines: ["ground unit"] },
    { x: COLUMNS.spt + 10, lines: ["SPT blows for 300 mm"] },
    { x: COLUMNS.water + 6, lines: ["water", "depth in m"] },
  ];
  return (
    <g>
      {titles.map(({ x, lines }) => (
        <Lines key={x} x={x} y={18} line_px={14} lines={lines} size_px={SMALL_PX} colour={INK_2} />
      ))}
      <path d={`M4 ${HEAD_PX}H${COLUMNS.end - 4}`} stroke={INK} strokeWidth={1.2} />
    </g>
  );
}

function Scales({ layout }: { layout: StripLayout }) {
  return (
    <g>
      <path
        d={`M${COLUMNS.level - 8} ${HEAD_PX}V${round(layout.bottom)}`}
        stroke={INK}
        strokeWidth={0.9}
        fill="none"
      />
      {layout.depthTicks.map(({ y, text }) => (
        <g key={text}>
          <path d={`M${COLUMNS.level - 13} ${round(y)}h5`} stroke={INK} strokeWidth={0.9} />
          <Label x={COLUMNS.level - 16} y={Math.max(y + 4, HEAD_PX + 10)} anchor="end" size_px={SMALL_PX}>
            {text}
          </Label>
        </g>
      ))}
      {layout.levelTicks.map(({ y, text }) => (
        <g key={text}>
          <path d={`M${COLUMNS.hatch - 5} ${round(y)}h5`} stroke={INK} strokeWidth={0.9} />
          <Label x={COLUMNS.hatch - 8} y={Math.max(y + 4, HEAD_PX + 10)} anchor="end" size_px={SMALL_PX}>
            {text}
          </Label>
        </g>
      ))}
    </g>
  );
}

function Words({ layout }: { layout: StripLayout }) {
  return (
    <g>
      {layout.blocks.map(({ stratum, top, wordsTop, heading, lines, unitLines }) => {
        const lineY = wordsTop - 3;
        return (
          <g key={wordsTop}>
            <path d={`M${COLUMNS.hatch} ${round(top)}H${COLUMNS.lead}`} stroke={INK} strokeWidth={0.9} />
            <path
              d={`M${COLUMNS.lead} ${round(top)}L${COLUMNS.words - 8} ${round(lineY)}H${COLUMNS.spt - 4}`}
              stroke={stratum.top_m === 0 ? "none" : INK_2}
              strokeWidth={0.6}
              fill="none"
            />
            <Label x={COLUMNS.words} y={wordsTop + 10} size_px={SMALL_PX} weight="medium">
              {heading}
            </Label>
            <Lines
              x={COLUMNS.words}
              y={wordsTop + 10 + LINE_PX}
              line_px={LINE_PX}
              lines={lines}
              size_px={SMALL_PX}
            />
            <Lines
              x={COLUMNS.unit}
              y={wordsTop + 10}
              line_px={LINE_PX}
              lines={unitLines}
              size_px={SMALL_PX}
            />
          </g>
        );
      })}
      <path
        d={`M${COLUMNS.spt} ${HEAD_PX}V${round(layout.bottom)}M${COLUMNS.water} ${HEAD_PX}V${round(layout.bottom)}`}
        stroke={RULE}
        strokeWidth={0.8}
      />
    </g>
  );
}

function Foot({ hole, layout }: { hole: StripHole; layout: StripLayout }) {
  const { finalDepth_m, groundLevel_m } = hole;
  const bottom = round(layout.bottom);
  return (
    <g>
      <path d={`M${COLUMNS.hatch - 5} ${bottom}H${COLUMNS.lead}`} stroke={INK} strokeWidth={2} />
      {finalDepth_m === null ? (
        <Label x={COLUMNS.depth} y={layout.bottom + 19} size_px={SMALL_PX}>
          final depth not given
        </Label>
      ) : (
        <>
          <Label x={COLUMNS.depth} y={layout.bottom + 19} size_px={SMALL_PX} weight="medium">
            {`final depth ${finalDepth_m.toFixed(2)} m`}
          </Label>
          {groundLevel_m === null ? null : (
            <Label x={COLUMNS.depth} y={layout.bottom + 33} size_px={SMALL_PX}>
              {`level ${signed(groundLevel_m - finalDepth_m, 2)} m`}
            </Label>
          )}
        </>
      )}
    </g>
  );
}

/** The log in a sentence for those who do not see it; the words in full stand in the page's table. */
function sentenceOf({ name, groundLevel_m, finalDepth_m, strata, spts, strikes }: StripHole): string {
  const level =
    groundLevel_m === null ? "ground level not known" : `ground level ${signed(groundLevel_m, 2)} m`;
  const depth = finalDepth_m === null ? "final depth not given" : `final depth ${finalDepth_m.toFixed(2)} m`;
  const ground = strata
    .map(
      ({ top_m, soil, unit }) =>
        `from ${top_m.toFixed(2)} m ${soilWord(soil)}${unit ? ` (${unit.code})` : ""}`,
    )
    .join(", ");
  return `Strip log of ${name}: ${level}, ${depth}; ${ground || "no strata"}; ${spts.length} penetration tests, ${strikes.length} water strikes.`;
}
