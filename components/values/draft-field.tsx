import { TextField } from "@/components/account/text-field";
import type { DraftFinding } from "@/lib/contracts/values";
import type { DraftField as Field } from "./draft-fields";

type Props = {
  field: Field;
  value: string;
  problem?: string;
  findings: DraftFinding[];
  onChange: (value: string | null) => void;
};

/** One field of a draft with what is wrong or odd about it beside it. Choices show all their answers and none chosen. */
export function DraftFieldInput({ field, value, problem, findings, onChange }: Props) {
  const label = field.unit ? `${field.label} (${field.unit})` : field.label;
  return (
    <div>
      {field.kind === "choice" ? (
        <Choice field={field} label={label} value={value} problem={problem} onChange={onChange} />
      ) : field.kind === "long" ? (
        <Long field={field} label={label} value={value} problem={problem} onChange={onChange} />
      ) : (
        <TextField
          name={field.name}
          label={label}
          hint={field.hint}
          problem={problem}
          type={field.kind === "date" ? "date" : "text"}
          value={value}
          maxLength={field.kind === "date" ? undefined : 60}
          autoComplete="off"
          onChange={(event) => onChange(event.target.value === "" ? null : event.target.value)}
        />
      )}
      {findings.map((finding) => (
        <p key={finding.code} className="mt-1 border-l-4 border-affected pl-2 text-sm">
          {finding.sentence} <span className="text-ink-2">Source: {finding.source}.</span>
        </p>
      ))}
    </div>
  );
}

type Part = { field: Field; label: string; value: string; problem?: string; onChange: Props["onChange"] };

function Choice({ field, label, value, problem, onChange }: Part) {
  const note = `${field.name}-note`;
  const said = problem || field.hint;
  return (
    <fieldset className="mt-4" aria-describedby={said ? note : undefined}>
      <legend className="text-sm">{label}</legend>
      {(field.options ?? []).map(([option, title]) => (
        <label key={option} className="mt-1 flex items-baseline gap-2">
          <input
            type="radio"
            name={field.name}
            value={option}
            checked={value === option}
            onChange={() => onChange(option)}
          />
          {title}
        </label>
      ))}
      {said && (
        <p id={note} className={`mt-1 text-sm ${problem ? "text-fails-text" : "text-ink-2"}`}>
          {said}
        </p>
      )}
    </fieldset>
  );
}

function Long({ field, label, value, problem, onChange }: Part) {
  const note = `${field.name}-note`;
  const said = problem || field.hint;
  return (
    <div className="mt-4">
      <label className="block text-sm" htmlFor={field.name}>
        {label}
      </label>
      <textarea
        id={field.name}
        name={field.name}
        rows={3}
        value={value}
        aria-invalid={problem ? true : undefined}
        aria-describedby={said ? note : undefined}
        onChange={(event) => onChange(event.target.value)}
        className="mt-1 block w-full border border-rule bg-sheet px-2 py-1.5 aria-invalid:border-fails"
      />
      {said && (
        <p id={note} className={`mt-1 text-sm ${problem ? "text-fails-text" : "text-ink-2"}`}>
          {said}
        </p>
      )}
    </div>
  );
}
