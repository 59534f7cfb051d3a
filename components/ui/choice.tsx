"use client";

import { type ReactNode, useId } from "react";
import { FieldNotes, type FieldProps } from "./field";

/** One answer of a question, with what it means where that is not plain. */
export type Answer<Value extends string> = { value: Value; label: string; hint?: ReactNode };

type Props<Value extends string> = Omit<FieldProps, "hideLabel"> & {
  /** The name under which a plain form sends the answer. */
  name?: string;
  answers: readonly Answer<Value>[];
  /** Null while nobody has answered: the register never answers for the engineer. */
  value: Value | null;
  onChange: (value: Value) => void;
  disabled?: boolean;
  /** Answers side by side instead of one below the other. */
  inline?: boolean;
};

/** A question with all its answers shown and none chosen beforehand. Arrow keys move between the answers. */
export function Choice<Value extends string>({
  label,
  unit,
  hint,
  error,
  optional = false,
  className,
  name,
  answers,
  value,
  onChange,
  disabled,
  inline = false,
}: Props<Value>) {
  const id = useId();
  const labelId = `${id}-label`;
  const hintId = `${id}-hint`;
  const errorId = `${id}-error`;
  const described = [error ? errorId : "", hint ? hintId : ""].filter(Boolean).join(" ");
  return (
    <div
      role="radiogroup"
      aria-labelledby={labelId}
      aria-describedby={described || undefined}
      aria-invalid={error ? true : undefined}
      aria-required={optional ? undefined : true}
      className={className}
    >
      <div id={labelId} className="mb-1">
        {label}
        {unit && <span className="text-ink-2"> ({unit})</span>}
        {optional && <span className="text-ink-2"> · optional</span>}
      </div>
      <div className={inline ? "flex flex-wrap gap-x-5" : ""}>
        {answers.map((answer) => {
          const noteId = `${id}-${answer.value}-note`;
          return (
            <div key={answer.value} className="py-1">
              <label className="flex min-h-6 items-start gap-2">
                <input
                  type="radio"
                  name={name ?? id}
                  value={answer.value}
                  checked={value === answer.value}
                  disabled={disabled}
                  onChange={() => onChange(answer.value)}
                  aria-describedby={answer.hint ? noteId : undefined}
                  className="mt-0.5 size-4 shrink-0"
                />
                {answer.label}
              </label>
              {answer.hint && (
                <p id={noteId} className="ml-6 text-sm text-ink-2">
                  {answer.hint}
                </p>
              )}
            </div>
          );
        })}
      </div>
      <FieldNotes hint={hint} error={error} hintId={hintId} errorId={errorId} />
    </div>
  );
}
