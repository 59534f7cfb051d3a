import type { ComponentProps } from "react";
import { controlLook, Field, type FieldProps } from "./field";

type Props = FieldProps & Omit<ComponentProps<"input">, keyof FieldProps | "children">;

/** One line of text with its label. Everything of an `<input>` may be given, also a `ref`. */
export function TextInput({
  label,
  unit,
  hint,
  error,
  optional,
  hideLabel,
  className,
  id,
  type = "text",
  ...input
}: Props) {
  return (
    <Field {...{ label, unit, hint, error, optional, hideLabel, className, id }}>
      {(control) => <input autoComplete="off" {...input} {...control} type={type} className={controlLook} />}
    </Field>
  );
}
