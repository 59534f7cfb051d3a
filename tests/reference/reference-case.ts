/** How far a value was checked against its source. */
export type Status =
  | "read in a secondary copy"
  | "from memory"
  | "computed independently"
  | "common practice";

/** How near an answer must come: the rounding that the source prints, for one figure or for all. */
export type Tolerance = { abs: number } | { rel: number };

/** A published or independently computed value that a method has to give. Data only: no test runner, no Node. */
export type ReferenceCase = {
  id: string;
  method: string;
  /** What is claimed, in a sentence that an engineer could dispute. */
  why: string;
  inputs: Record<string, unknown>;
  /** By output field; a path such as `cornerPressures_kPa.2` reaches inside. Words, yes or no, and none are compared as they are. */
  expected: Record<string, number | string | boolean | null>;
  tolerance: Tolerance | Record<string, Tolerance>;
  citation: string;
  status: Status;
};

/** The tolerance of one expected figure of a case. */
export function toleranceOf({ tolerance }: ReferenceCase, field: string): Tolerance {
  if ("abs" in tolerance || "rel" in tolerance) return tolerance as Tolerance;
  const own = tolerance[field];
  if (own === undefined) throw new Error(`The case states no tolerance for ${field}.`);
  return own;
}

/** Fills the same facts of a source into several cases of one method. */
export const casesOf = (
  facts: Pick<ReferenceCase, "method" | "citation" | "status"> & Partial<ReferenceCase>,
  cases: (Pick<ReferenceCase, "id" | "why" | "inputs" | "expected"> & Partial<ReferenceCase>)[],
): ReferenceCase[] => cases.map((one) => ({ tolerance: { rel: 1e-6 }, ...facts, ...one }));

/** What lies at a path such as `combinations.0.momentB_kNm` of an answer. */
export const atPath = (answer: unknown, path: string): unknown =>
  path
    .split(".")
    .reduce<unknown>((found, key) => (found as Record<string, unknown> | null | undefined)?.[key], answer);
