"use client";

import { type ReactNode, useRef, useState } from "react";
import { Button } from "./button";
import { savedSvg } from "./saved-svg";

type Props = {
  /** What the figure shows, with its number where there is one. */
  caption: ReactNode;
  /** Name of the saved file, without its ending: `F12-base-pressure`. */
  fileName: string;
  /** The drawing: one `<svg>` and whatever stands beside it. */
  children: ReactNode;
  className?: string;
};

/** A drawing with its caption, which can be copied and saved as a file of its own. */
export function FigureFrame({ caption, fileName, children, className = "" }: Props) {
  const place = useRef<HTMLDivElement>(null);
  const [said, setSaid] = useState("");

  const drawn = (): string | null => {
    const drawing = place.current?.querySelector("svg");
    return drawing ? savedSvg(drawing) : null;
  };
  const copy = async () => {
    const text = drawn();
    if (text === null) return setSaid("There is no drawing to copy yet.");
    try {
      await navigator.clipboard.writeText(text);
      setSaid("Copied as SVG.");
    } catch {
      setSaid("The browser did not let it be copied. Save it instead.");
    }
  };
  const save = () => {
    const text = drawn();
    if (text === null) return setSaid("There is no drawing to save yet.");
    const address = URL.createObjectURL(new Blob([text], { type: "image/svg+xml" }));
    const link = document.createElement("a");
    link.href = address;
    link.download = `${fileName}.svg`;
    link.click();
    // The browser reads the address after this turn.
    setTimeout(() => URL.revokeObjectURL(address), 10_000);
    setSaid("Saved as SVG.");
  };

  return (
    <figure className={className}>
      <div ref={place} className="max-w-full overflow-x-auto">
        {children}
      </div>
      <figcaption className="mt-1 flex flex-wrap items-baseline gap-x-4">
        <span className="text-ink-2">{caption}</span>
        <span className="flex items-baseline gap-x-4" data-screen-only>
          <Button kind="text" onClick={copy}>
            Copy
          </Button>
          <Button kind="text" onClick={save}>
            Save
          </Button>
          <span role="status" className="text-ink-2">
            {said}
          </span>
        </span>
      </figcaption>
    </figure>
  );
}
