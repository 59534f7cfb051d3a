/** Which column orders the rows, and which way. */
export type Sort = { column: string; descending: boolean };

/** What a row is ordered by: figures by size, words as people count (F2 before F10), nothing last in both directions. */
export type SortValue = number | string | boolean | null | undefined;

const collator = new Intl.Collator("en-GB", { numeric: true, sensitivity: "base" });

/** The rows in order of what `by` says of each; rows that say the same stay as they were. */
export function sortRows<Row>(rows: readonly Row[], by: (row: Row) => SortValue, descending: boolean): Row[] {
  const way = descending ? -1 : 1;
  return rows
    .map((row) => ({ row, value: by(row) }))
    .sort((one, other) => {
      const oneMissing = isMissing(one.value);
      const otherMissing = isMissing(other.value);
      if (oneMissing || otherMissing) return Number(oneMissing) - Number(otherMissing);
      return way * compared(one.value, other.value);
    })
    .map(({ row }) => row);
}

const isMissing = (value: SortValue): boolean =>
  value === null || value === undefined || value === "" || Number.isNaN(value);

function compared(one: SortValue, other: SortValue): number {
  if (typeof one === "string" || typeof other === "string")
    return collator.compare(String(one), String(other));
  return Number(one) - Number(other);
}
