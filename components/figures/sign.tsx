import { AFFECTED, FACE, FAILS, INK, INK_2, INK_ON_COLOUR, OUTSIDE, PASSES } from "./ink";

/** Everything that a sign can say of a footing, a check or a value. */
export type SignName = "passes" | "fails" | "affected" | "outside conditions" | "no check yet" | "withdrawn";

type Size = "small" | "normal" | "large";
const SIZES: Record<Size, { sign_px: number; words: string }> = {
  small: { sign_px: 12, words: "text-xs" },
  normal: { sign_px: 16, words: "text-sm" },
  large: { sign_px: 24, words: "text-base" },
};

type MarkProps = {
  name: SignName;
  /** Number of the revision that touched it, shown in the triangle. */
  revision?: number;
};

/**
 * The shape of a sign in a field of 20 by 20, for use inside another drawing: filled circle, square crossed once,
 * triangle with number, hollow diamond, hollow circle. Ink around the colour keeps it plain in black and white.
 */
export function SignMark({ name, revision }: MarkProps) {
  const ink = { stroke: INK, strokeWidth: 1.2, strokeLinejoin: "round" as const };
  switch (name) {
    case "passes":
      return <circle cx={10} cy={10} r={6.6} fill={PASSES} {...ink} />;
    case "fails":
      return (
        <>
          <rect x={3} y={3} width={14} height={14} fill={FAILS} {...ink} />
          <path d="M3 17L17 3" fill="none" stroke={INK_ON_COLOUR} strokeWidth={2} />
        </>
      );
    case "affected":
      return (
        <>
          <path d="M10 0.8L19.4 18.4H0.6Z" fill={AFFECTED} {...ink} />
          {revision === undefined ? null : (
            <text
              x={10}
              y={16.6}
              textAnchor="middle"
              fontSize={revision > 9 ? 8 : 10}
              fontWeight={700}
              fontFamily={FACE}
              fill={INK_ON_COLOUR}
            >
              {revision}
            </text>
          )}
        </>
      );
    case "outside conditions":
      return (
        <>
          <path d="M10 1.6L18.4 10L10 18.4L1.6 10Z" fill="none" {...ink} />
          <path d="M10 4.2L15.8 10L10 15.8L4.2 10Z" fill="none" stroke={OUTSIDE} strokeWidth={2.6} />
        </>
      );
    case "no check yet":
      return <circle cx={10} cy={10} r={6.4} fill="none" stroke={INK_2} strokeWidth={1.6} />;
    case "withdrawn":
      return <path d="M3 10H17" fill="none" stroke={INK_2} strokeWidth={2} />;
  }
}

/** A sign by shape, word and colour. With `hideWord` the word is still read aloud. */
export function Sign({
  name,
  revision,
  word = wordOf(name, revision),
  hideWord = false,
  size = "normal",
}: MarkProps & { word?: string; hideWord?: boolean; size?: Size }) {
  const { sign_px, words } = SIZES[size];
  // The triangle is drawn larger: a number has to be read in it.
  const drawn_px = name === "affected" ? Math.round(sign_px * 1.25) : sign_px;
  return (
    <span data-sign={name} className="inline-flex items-center gap-1.5 align-middle whitespace-nowrap">
      {name === "withdrawn" && !hideWord ? null : (
        <svg
          width={drawn_px}
          height={drawn_px}
          viewBox="0 0 20 20"
          className="shrink-0"
          role={hideWord ? "img" : undefined}
          aria-label={hideWord ? word : undefined}
          aria-hidden={hideWord ? undefined : true}
        >
          <SignMark name={name} revision={revision} />
        </svg>
      )}
      {hideWord ? null : name === "withdrawn" ? (
        <s className={words}>{word}</s>
      ) : (
        <span className={words}>{word}</span>
      )}
    </span>
  );
}

/** What a sign says in words; the revision's number belongs to "affected". */
export const wordOf = (name: SignName, revision?: number): string =>
  name === "affected" && revision !== undefined ? `affected by revision ${revision}` : name;
