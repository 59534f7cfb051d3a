import { type SharedCase, si } from "./shared-cases";

/** A shared case in our own fields: what to run, and which output stands for which expected name. */
export type Mapped = {
  method: string;
  inputs: Record<string, unknown>;
  /** Expected name → output path, or that figure brought into the source's own measure (SI). */
  outputs: Record<string, string | Reading>;
  /** Where the source rounds its factors first, how far that may carry (relative). */
  rounding?: number;
};

/** An output times a factor, plus an addend. */
export type Reading = { of: string; times: number; plus?: number };

export const times = (of: string, factor: number): Reading => ({ of, times: factor });

export type Mapping = (one: SharedCase) => Mapped | null;

/** States one mapping; each stands for itself, whatever the others beside it have. */
export const into = (one: Mapped): Mapped => one;

export const maybe = (one: SharedCase, name: string): number | null =>
  name in one.inputs ? si(one.inputs[name]) : null;
