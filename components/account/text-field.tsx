import type { InputHTMLAttributes } from "react";

type Props = InputHTMLAttributes<HTMLInputElement> & {
  name: string;
  label: string;
  hint?: string;
  problem?: string;
};

/** A line of a form with its label above, its hint below, and what is wrong with it in its place. */
export function TextField({ name, label, hint, problem, ...input }: Props) {
  const note = `${name}-note`;
  return (
    <div className="mt-4">
      <label className="block text-sm" htmlFor={name}>
        {label}
      </label>
      <input
        {...input}
        id={name}
        name={name}
        aria-invalid={problem ? true : undefined}
        aria-describedby={problem || hint ? note : undefined}
        className="mt-1 block w-full border border-field bg-sheet px-2 py-1.5 text-ink aria-invalid:border-fails"
      />
      {problem ? (
        <p id={note} className="mt-1 text-sm text-fails-text">
          {problem}
        </p>
      ) : hint ? (
        <p id={note} className="mt-1 text-sm text-ink-2">
          {hint}
        </p>
      ) : null}
    </div>
  );
}
