import { z } from "zod";
import { defineMethod, output, quantity } from "../define-method";

export type ValueTable = { breadths_m: number[]; depths_m: number[]; netAllowable_kPa: number[][] };
export type TableReading =
  | { outside: false; netAllowable_kPa: number }
  | { outside: true; limit: string; netAllowable_kPa: null };

/** Bilinear between the printed points; beyond them there is no value, and the limit that was passed is named. */
export function readTable(table: ValueTable, at: { breadth_m: number; depth_m: number }): TableReading {
  const column = bracket(table.breadths_m, at.breadth_m);
  const row = bracket(table.depths_m, at.depth_m);
  if (typeof column === "string") return outside("breadth", column, table.breadths_m, at.breadth_m);
  if (typeof row === "string") return outside("depth", row, table.depths_m, at.depth_m);
  const [x0, x1, u] = column;
  const [y0, y1, v] = row;
  const q = (y: number, x: number) => table.netAllowable_kPa[y]?.[x] ?? Number.NaN;
  const upper = mixed(q(y0, x0), q(y0, x1), u);
  const lower = mixed(q(y1, x0), q(y1, x1), u);
  return { outside: false, netAllowable_kPa: mixed(upper, lower, v) };
}

/** Exactly an end's value at that end, and between two equal values exactly that value. */
const mixed = (from: number, to: number, share: number): number =>
  share === 0 || from === to ? from : share === 1 ? to : from + share * (to - from);

function bracket(points: number[], at: number): [number, number, number] | "below" | "above" {
  const last = points.length - 1;
  const first = points[0] as number;
  if (at < first) return "below";
  if (at > (points[last] as number)) return "above";
  for (let upper = 1; upper <= last; upper += 1) {
    const to = points[upper] as number;
    const from = points[upper - 1] as number;
    if (at <= to) return [upper - 1, upper, (at - from) / (to - from)];
  }
  return [0, 0, 0];
}

function outside(
  what: "breadth" | "depth",
  side: "below" | "above",
  points: number[],
  at: number,
): TableReading {
  const limit = side === "below" ? points[0] : points.at(-1);
  return {
    outside: true,
    limit: `The ${what} ${at} m lies ${side} the table's ${side === "below" ? "smallest" : "largest"} ${what}, ${limit} m.`,
    netAllowable_kPa: null,
  };
}

const rising = (label: string) =>
  z
    .array(quantity({ label, unit: "m", min: 0 }))
    .min(1, `${label} needs at least one entry.`)
    .max(50, `${label} takes at most 50 entries.`)
    .refine((points) => points.every((at, index) => index === 0 || at > (points[index - 1] as number)), {
      message: `${label} must rise from entry to entry.`,
    })
    .meta({ label, unit: "m" });

/** A table whose rows and columns fit together; every entry a positive pressure. */
export const tableShape = {
  breadths_m: rising("Breadths"),
  depths_m: rising("Founding depths"),
  netAllowable_kPa: z
    .array(z.array(quantity({ label: "Net allowable bearing pressure", unit: "kPa", above: 0 })))
    .meta({ label: "Net allowable bearing pressure, a row for each depth", unit: "kPa" }),
};

/** True when there is one row for each depth and one entry for each breadth. */
export const tableFits = (table: ValueTable): boolean =>
  table.netAllowable_kPa.length === table.depths_m.length &&
  table.netAllowable_kPa.every((row) => row.length === table.breadths_m.length);

export const tableMisfit = {
  message: "The table needs one row for each depth and one entry for each breadth.",
  path: ["netAllowable_kPa"],
};

export const valueTable = defineMethod({
  id: "value-table",
  version: "1",
  title: "Bearing value from a table by breadth and founding depth",
  source: ["practice"],
  limits: ["Bilinear between the given points; never extrapolated: outside them there is no value."],
  inputs: z
    .strictObject({
      ...tableShape,
      breadth_m: quantity({ label: "Breadth", unit: "m", above: 0 }),
      depth_m: quantity({ label: "Founding depth", unit: "m", min: 0 }),
    })
    .refine(tableFits, tableMisfit),
  outputs: z.object({
    outside: z.boolean().meta({ label: "Outside the table", unit: "" }),
    limit: z.string().nullable().meta({ label: "Limit passed", unit: "" }),
    netAllowable_kPa: output("Net allowable bearing pressure", "kPa").nullable(),
  }),
  compute: (q) => {
    const reading = readTable(q, q);
    return {
      outside: reading.outside,
      limit: reading.outside ? reading.limit : null,
      netAllowable_kPa: reading.netAllowable_kPa,
    };
  },
});
