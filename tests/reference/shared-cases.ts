import { existsSync, readFileSync } from "node:fs";
import { join } from "node:path";
import type { Tolerance } from "./reference-case";

type Measured = { value: unknown; unit: string };
export type SharedCase = {
  id: string;
  topic: string;
  method: string;
  inputs: Record<string, Measured | string>;
  expected: Record<string, Measured>;
  tolerance: Tolerance | { exact: true } | Record<string, Tolerance>;
  citation: string;
  source_status: string;
};

const folder = join(
  process.env.HOLDGROUND_SHARED ?? join(import.meta.dirname, "../../../shared"),
  "reference",
);

/** The cases that lie beside a checkout; none where that folder is absent. */
export function sharedCases(file: "base.json" | "bearing.json"): SharedCase[] {
  const path = join(folder, file);
  if (!existsSync(path)) return [];
  return Object.values(JSON.parse(readFileSync(path, "utf8")) as Record<string, SharedCase>);
}

/** A figure in SI. The sources' own units; a unit that is not known here is a fault of this table, not a pass. */
export function si(measured: Measured | string | undefined): number {
  if (typeof measured !== "object") throw new Error(`No figure: ${JSON.stringify(measured)}.`);
  const factor = factors[measured.unit];
  const value = Number(String(measured.value).split(" ")[0]);
  if (factor === undefined || !Number.isFinite(value))
    throw new Error(`Cannot read ${JSON.stringify(measured)}.`);
  return value * factor;
}

const factors: Record<string, number> = {
  "-": 1,
  "%": 0.01,
  deg: 1,
  yr: 1,
  m: 1,
  cm: 0.01,
  mm: 1,
  in: 0.0254,
  ft: 0.3048,
  m2: 1,
  kN: 1,
  "kN/m": 1,
  "kN.m": 1,
  kPa: 1,
  psf: 0.04788025898,
  ksf: 47.88025898,
  psi: 6.894757293,
  tsf: 95.76051796,
  "tsf (pa~1 tsf)": 95.76051796,
  lbf: 0.0044482216152605,
  kip: 4.4482216152605,
  "kip/ft": 4.4482216152605 / 0.3048,
  "kip/ft2": 47.88025898,
  "kip.ft/ft": 4.4482216152605,
  "kN/m3": 1,
  pcf: 0.15708746385,
  kcf: 157.08746385,
  consistent: 1,
  "blows/0.3 m": 1,
  "kPa/blow": 1,
};

/** A list of figures in SI, as the sources give lists: comma separated or as an array. */
export function siList(measured: Measured | string | undefined): number[] {
  if (typeof measured !== "object") throw new Error(`No list: ${JSON.stringify(measured)}.`);
  const parts = Array.isArray(measured.value) ? measured.value : String(measured.value).split(",");
  return parts.map((value) => si({ value: String(value).trim(), unit: measured.unit }));
}
