/** What is in a net and in a gross pressure, drawn: gross holds the soil that was there before, net begins above it. */
export function NetGrossFigure({ basis }: { basis: "net" | "gross" | null }) {
  const words =
    basis === "net"
      ? "Net pressure: what the base adds to the weight of soil that was at founding level before."
      : basis === "gross"
        ? "Gross pressure: all that stands on the ground at founding level, the former weight of soil included."
        : "Net pressure leaves out the former weight of soil at founding level; gross pressure holds it.";
  return (
    <figure className="mt-3">
      <svg
        viewBox="0 0 320 120"
        width="320"
        height="120"
        role="img"
        aria-label={words}
        className="max-w-full"
      >
        <path d="M10 30H310" stroke="currentColor" />
        <path d="M120 30V70H200V30" fill="none" stroke="currentColor" strokeDasharray="3 2" />
        <rect x="120" y="58" width="80" height="12" fill="none" stroke="currentColor" strokeWidth="1.5" />
        <rect x="152" y="14" width="16" height="44" fill="none" stroke="currentColor" strokeWidth="1.5" />
        <path d="M100 30V70M96 30H104M96 70H104" stroke="currentColor" />
        <text x="92" y="54" textAnchor="end" fontSize="11" fill="currentColor">
          σ0 = γ D
        </text>
        <g className={basis === "gross" ? "text-ink-2" : ""}>
          <path d="M130 76V92M146 76V92M162 76V92M178 76V92M194 76V92" stroke="currentColor" />
          <text x="206" y="88" fontSize="11" fill="currentColor" fontWeight={basis === "net" ? 600 : 400}>
            net
          </text>
        </g>
        <g className={basis === "net" ? "text-ink-2" : ""}>
          <path
            d="M122 76V112M138 76V112M154 76V112M170 76V112M186 76V112"
            stroke="currentColor"
            strokeWidth="0.75"
          />
          <text x="206" y="108" fontSize="11" fill="currentColor" fontWeight={basis === "gross" ? 600 : 400}>
            gross = net + σ0
          </text>
        </g>
      </svg>
      <figcaption className="text-sm text-ink-2">{words}</figcaption>
    </figure>
  );
}
