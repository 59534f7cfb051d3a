import type { ComponentProps } from "react";
import { controlLook, Field, type FieldProps } from "./field";

/** What can be chosen: the value that is kept and the words that are shown. */
export type Option = { value: string; label: string; unavailable?: boolean };

type Props = FieldProps & {
  options: readonly Option[];
  /** What the empty first line says, such as "Choose a zone"; without it there is no empty line. */
  placeholder?: string;
} & Omit<ComponentProps<"select">, keyof FieldProps | "children">;

/** A list to choose one from, the browser's own, so that keyboard and phone know it. */
export function Select({
  label,
  unit,
  hint,
  error,
  optional,
  hideLabel,
  className,
  id,
  options,
  placeholder,
  ...select
}: Props) {
  return (
    <Field {...{ label, unit, hint, error, optional, hideLabel, className, id }}>
      {(control) => (
        <select {...select} {...control} className={`${controlLook} pr-1`}>
          {placeholder !== undefined && <option value="">{placeholder}</option>}
          {options.map((option) => (
            <option key={option.value} value={option.value} disabled={option.unavailable}>
              {option.label}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}
