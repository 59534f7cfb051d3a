type Props = {
  /** How many lines of what size will come: body lines of 20 px, or dense rows of 32 px. */
  lines?: number;
  as?: "lines" | "rows";
  /** What is being read, read aloud. */
  label?: string;
  className?: string;
};

const spans = ["w-11/12", "w-4/5", "w-full", "w-3/5", "w-10/12"];

/** Keeps the place of what is being read, in its size, so that nothing jumps when it comes. */
export function Skeleton({ lines = 3, as = "lines", label = "Reading", className = "" }: Props) {
  return (
    <div role="status" className={className}>
      <span className="sr-only">{label} …</span>
      {Array.from({ length: lines }, (_, line) => spans[line % spans.length]).map((span, line) => (
        <div
          // biome-ignore lint/suspicious/noArrayIndexKey: the lines are all alike and never change their order
          key={line}
          aria-hidden="true"
          className={`flex items-center ${as === "rows" ? "h-8 border-b border-rule" : "h-5"}`}
        >
          <span className={`breathes block h-2.5 bg-rule ${span}`} />
        </div>
      ))}
    </div>
  );
}
