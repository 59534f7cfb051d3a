import { type ValueFieldName, valueFields, valueWords } from "@/lib/contracts/value-words";
import type { CitedSource, FieldDifference, StatedFields } from "@/lib/contracts/values";

type Stated = { fields: StatedFields; sources: CitedSource[] };

/** Field by field, what a revision says otherwise than the one before it; with the change in percent between numbers. */
export function differences(before: Stated, after: Stated): FieldDifference[] {
  const found: FieldDifference[] = [];
  for (const { name, label, unit } of valueFields) {
    const was = before.fields[name];
    const is = after.fields[name];
    if (was === is) continue;
    const numbers = typeof was === "number" && typeof is === "number" && was !== 0;
    found.push({
      name,
      label,
      unit,
      before: shown(name, was),
      after: shown(name, is),
      change_percent: numbers ? ((is - was) / Math.abs(was)) * 100 : null,
    });
  }
  const [was, is] = [cited(before.sources), cited(after.sources)];
  if (was !== is)
    found.push({ name: "sources", label: "Sources", unit: "", before: was, after: is, change_percent: null });
  return found;
}

/** A stated field in the words of the register; an empty one says so. */
export function shown(name: ValueFieldName, value: string | number | null): string {
  if (value === null || value === "") return "not stated";
  if (typeof value === "number") return String(Number(value.toPrecision(6)));
  const words: Record<string, string> | undefined = (valueWords as Record<string, Record<string, string>>)[
    name
  ];
  return words?.[value] ?? value;
}

const cited = (sources: CitedSource[]): string =>
  sources.length === 0
    ? "not stated"
    : sources
        .map(({ reference, code, page, clause, holes }) =>
          [`${reference} ${code}`, page && `p. ${page}`, clause, holes.join(", ")].filter(Boolean).join(", "),
        )
        .join("; ");
