import { type ValueFieldName, valueFields, valueWords } from "@/lib/contracts/value-words";
import type { StatedFields } from "@/lib/contracts/values";

/** All that a revision states, to be read through: what is not stated says so. */
export function ConditionsList({ fields }: { fields: StatedFields }) {
  return (
    <dl className="mt-3 grid max-w-4xl grid-cols-1 gap-x-6 gap-y-1 text-sm sm:grid-cols-[auto_1fr]">
      {valueFields.map(({ name, label, unit }) => (
        <div key={name} className="contents">
          <dt className="text-ink-2">{label}</dt>
          <dd className={`whitespace-pre-wrap ${typeof fields[name] === "number" ? "tabular-nums" : ""}`}>
            {shown(name, fields[name], unit)}
          </dd>
        </div>
      ))}
    </dl>
  );
}

function shown(name: ValueFieldName, value: string | number | null, unit: string): string {
  if (value === null || value === "") return "not stated";
  if (typeof value === "number") {
    const figure = String(Number(value.toPrecision(6))).replace("-", "−");
    return unit === "" ? figure : `${figure} ${unit}`;
  }
  return (valueWords as Record<string, Record<string, string>>)[name]?.[value] ?? value;
}
