import { ArrowHead, Label, round } from "./drawing-marks";
import { INK, INK_2, RULE, SHEET, SMALL_PX } from "./ink";
import { spread } from "./spread";
import { COLUMNS, HEAD_PX, type StripLayout, type StripSpt } from "./strip-layout";

/** Room for the figures beside the plot. */
const FIGURES_PX = 84;

/** What a test says: N, or the blows and the penetration that they made, or that the log gives neither. */
export function sptText({ blowCount, refusal, mainBlows, mainPenetration_mm }: StripSpt): string {
  if (!refusal) return blowCount === null ? "no N given" : `${blowCount}`;
  if (mainBlows === null) return "refusal";
  return mainPenetration_mm === null
    ? `${mainBlows}, refusal`
    : `${mainBlows} for ${Math.round(mainPenetration_mm)} mm`;
}

/** Blow counts against depth. Refusal is an arrow out of the plot, never a number that was not measured. */
export function StripSpts({ spts, layout }: { spts: readonly StripSpt[]; layout: StripLayout }) {
  const left = COLUMNS.spt + 10;
  const right = COLUMNS.water - FIGURES_PX - 6;
  const most = Math.max(50, ...spts.map(({ blowCount }) => blowCount ?? 0));
  const end = Math.ceil(most / 50) * 50;
  const x = (blows: number): number => left + (blows / end) * (right - left);
  const inOrder = [...spts].sort((a, b) => a.depth_m - b.depth_m);
  const places = spread(
    inOrder.map(({ depth_m }) => ({ wanted: layout.y(depth_m) - 6, size: 12 })),
    HEAD_PX,
    layout.height,
    1,
  );
  return (
    <g>
      {[0, end / 2, end].map((blows) => (
        <g key={blows}>
          <path
            d={`M${round(x(blows))} ${HEAD_PX}V${round(layout.bottom)}`}
            stroke={RULE}
            strokeWidth={0.8}
          />
          <Label x={x(blows)} y={HEAD_PX - 7} anchor="middle" size_px={SMALL_PX}>
            {blows}
          </Label>
        </g>
      ))}
      {spts.length === 0 ? (
        <Label x={right + 12} y={HEAD_PX + 17} size_px={SMALL_PX} colour={INK_2}>
          none recorded
        </Label>
      ) : null}
      {inOrder.map((spt, index) => {
        const y = layout.y(spt.depth_m);
        const textY = (places[index] ?? 0) + 6;
        const from = spt.refusal ? right + 3 : x(spt.blowCount ?? 0) + 6;
        return (
          <g key={textY}>
            {spt.refusal ? (
              <>
                <path d={`M${round(x(0))} ${round(y)}H${round(right - 4)}`} stroke={INK} strokeWidth={1.3} />
                <ArrowHead x={right} y={y} towards="right" />
              </>
            ) : spt.blowCount === null ? (
              <path d={`M${round(x(0))} ${round(y)}h6`} stroke={INK_2} strokeWidth={1.3} />
            ) : (
              <circle
                cx={round(x(spt.blowCount))}
                cy={round(y)}
                r={3.2}
                fill={SHEET}
                stroke={INK}
                strokeWidth={1.5}
              />
            )}
            <path
              d={`M${round(from)} ${round(y)}H${round(Math.max(from, right + 3))}L${round(right + 9)} ${round(textY)}`}
              stroke={INK_2}
              strokeWidth={0.5}
              strokeDasharray="1.5 2.5"
              fill="none"
            />
            <Label x={right + 12} y={textY + 4} size_px={SMALL_PX}>
              {sptText(spt)}
            </Label>
          </g>
        );
      })}
    </g>
  );
}
