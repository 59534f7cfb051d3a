"use client";

import { type ReactNode, useId } from "react";

/** What a control needs so that its label, hint and refusal are read with it. */
export type ControlProps = {
  id: string;
  "aria-describedby": string | undefined;
  "aria-invalid": true | undefined;
  "aria-required": true | undefined;
};

export type FieldProps = {
  label: ReactNode;
  /** Stands beside the label, once: `kPa`, `m OD`. */
  unit?: string;
  hint?: ReactNode;
  /** What is wrong in a sentence, and what would be right. */
  error?: string;
  /** Says "optional" beside the label; without it the field is required. */
  optional?: boolean;
  /** The label is read aloud and not shown: for a control in a table, whose column says it. */
  hideLabel?: boolean;
  className?: string;
};

type Props = FieldProps & {
  /** The control's own id where the page needs to know it. */
  id?: string;
  children: (control: ControlProps) => ReactNode;
};

/** Edge and ground of everything that is typed into. */
export const controlLook =
  "block min-h-8 w-full min-w-0 border border-field bg-sheet px-2 py-1 text-ink hover:border-ink aria-invalid:border-2 aria-invalid:border-fails [&[readonly]]:bg-paper disabled:bg-paper disabled:text-ink-2";

/** A line of a form: label with unit above, the control, then what is wrong with it or else its hint. */
export function Field({
  label,
  unit,
  hint,
  error,
  optional = false,
  hideLabel = false,
  className,
  id,
  children,
}: Props) {
  const own = useId();
  const control = id ?? own;
  const hintId = `${control}-hint`;
  const errorId = `${control}-error`;
  const described = [error ? errorId : "", hint ? hintId : ""].filter(Boolean).join(" ");
  return (
    <div className={className}>
      <label htmlFor={control} className={hideLabel ? "sr-only" : "mb-1 block"}>
        {label}
        {unit && (
          <>
            {" "}
            <span className="text-ink-2">({unit})</span>
          </>
        )}
        {optional && <span className="text-ink-2"> · optional</span>}
      </label>
      {children({
        id: control,
        "aria-describedby": described || undefined,
        "aria-invalid": error ? true : undefined,
        "aria-required": optional ? undefined : true,
      })}
      <FieldNotes hint={hint} error={error} hintId={hintId} errorId={errorId} />
    </div>
  );
}

/** What is wrong, then the hint, under a control or a group of them. */
export function FieldNotes({
  hint,
  error,
  hintId,
  errorId,
}: Pick<FieldProps, "hint" | "error"> & { hintId: string; errorId: string }) {
  return (
    <>
      {error && (
        <p id={errorId} className="mt-1 border-l-4 border-fails pl-2 text-fails-text">
          {error}
        </p>
      )}
      {hint && (
        <p id={hintId} className="mt-1 text-sm text-ink-2">
          {hint}
        </p>
      )}
    </>
  );
}
