"use client";

import { type ComponentProps, useState } from "react";
import { controlLook, Field, type FieldProps } from "./field";
import { readNumber, typedForm } from "./read-number";

type Props = FieldProps & {
  value: number | null;
  /**
   * Hears each key: the number, or null while the field is empty or cannot be read. `typed` is not empty in the second
   * case; the field then says by itself what is wrong.
   */
  onChange: (value: number | null, typed: string) => void;
} & Omit<
    ComponentProps<"input">,
    keyof FieldProps | "children" | "value" | "onChange" | "type" | "defaultValue"
  >;

/** A number with its unit beside the label. Keeps what was typed, also while it is no number yet. */
export function NumberInput({
  label,
  unit,
  hint,
  error,
  optional,
  hideLabel,
  className,
  id,
  value,
  onChange,
  onBlur,
  ...input
}: Props) {
  const [typed, setTyped] = useState(() => typedForm(value));
  const [known, setKnown] = useState(value);
  const [left, setLeft] = useState(true);
  // A number that came from elsewhere (another person, a sum, a reset) takes the place of what was typed.
  if (value !== known) {
    setKnown(value);
    const read = readNumber(typed);
    if (!("value" in read) || read.value !== value) setTyped(typedForm(value));
  }
  const read = readNumber(typed);
  const own = left && "problem" in read ? read.problem : undefined;

  return (
    <Field {...{ label, unit, hint, optional, hideLabel, className, id }} error={own ?? error}>
      {(control) => (
        <input
          autoComplete="off"
          spellCheck={false}
          {...input}
          {...control}
          type="text"
          inputMode="decimal"
          value={typed}
          onChange={(event) => {
            const text = event.target.value;
            const now = readNumber(text);
            const number = "value" in now ? now.value : null;
            setTyped(text);
            setLeft(false);
            setKnown(number);
            onChange(number, text);
          }}
          onBlur={(event) => {
            setLeft(true);
            onBlur?.(event);
          }}
          className={`${controlLook} text-right`}
        />
      )}
    </Field>
  );
}
