import type { ComponentProps } from "react";
import { controlLook, Field, type FieldProps } from "./field";

type Props = FieldProps & Omit<ComponentProps<"textarea">, keyof FieldProps | "children">;

/** Several lines of text with their label; grows with what is typed where the browser can. */
export function Textarea({
  label,
  unit,
  hint,
  error,
  optional,
  hideLabel,
  className,
  id,
  rows = 3,
  ...textarea
}: Props) {
  return (
    <Field {...{ label, unit, hint, error, optional, hideLabel, className, id }}>
      {(control) => (
        <textarea
          {...textarea}
          {...control}
          rows={rows}
          className={`${controlLook} field-sizing-content min-h-16`}
        />
      )}
    </Field>
  );
}
