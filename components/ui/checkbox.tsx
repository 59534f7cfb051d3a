"use client";

import { type ComponentProps, useId } from "react";
import { FieldNotes, type FieldProps } from "./field";

type Props = Pick<FieldProps, "label" | "hint" | "error" | "className" | "hideLabel"> & {
  /** Some of what it stands for is chosen, not all. */
  partly?: boolean;
} & Omit<ComponentProps<"input">, keyof FieldProps | "type" | "children">;

/** A box to tick with its words behind it. */
export function Checkbox({
  label,
  hint,
  error,
  className,
  hideLabel,
  partly = false,
  id,
  ref,
  ...input
}: Props) {
  const own = useId();
  const control = id ?? own;
  const hintId = `${control}-hint`;
  const errorId = `${control}-error`;
  const described = [error ? errorId : "", hint ? hintId : ""].filter(Boolean).join(" ");
  return (
    <div className={className}>
      <label htmlFor={control} className="inline-flex min-h-6 items-start gap-2">
        <input
          {...input}
          id={control}
          type="checkbox"
          aria-describedby={described || undefined}
          aria-invalid={error ? true : undefined}
          ref={(box) => {
            if (box) box.indeterminate = partly;
            if (typeof ref === "function") return ref(box);
            if (ref) ref.current = box;
          }}
          className="mt-0.5 size-4 shrink-0"
        />
        <span className={hideLabel ? "sr-only" : undefined}>{label}</span>
      </label>
      <FieldNotes hint={hint} error={error} hintId={hintId} errorId={errorId} />
    </div>
  );
}
