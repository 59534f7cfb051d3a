import { z } from "zod";
import type { Line } from "./formula";
import type { ReferenceKey } from "./references";

/** What a field shows beside its name in a worksheet, an API page or a sheet. */
export type FieldFacts = { label: string; unit: string };

/** A condition of a method that the inputs do not meet: said, not hidden, and no error. */
export type MethodFinding = {
  code: string;
  severity: "fails" | "outside" | "warning" | "note";
  message: string;
};

export type Method<Inputs = unknown, Outputs = unknown> = {
  readonly id: string;
  readonly version: string;
  readonly title: string;
  readonly source: readonly ReferenceKey[];
  /** When it holds and what it leaves out, one sentence each. */
  readonly limits: readonly string[];
  readonly inputs: z.ZodType<Inputs>;
  readonly outputs: z.ZodType<Outputs>;
  readonly compute: (inputs: Inputs) => Outputs;
  /** The steps with the numbers put in. */
  readonly lines?: (inputs: Inputs) => Line[];
};

/** Declares a method once; the worksheet, the address, the command and the sheet are all made from this. */
export const defineMethod = <Inputs, Outputs>(method: {
  id: string;
  version: string;
  title: string;
  source: readonly ReferenceKey[];
  limits: readonly string[];
  inputs: z.ZodType<Inputs>;
  outputs: z.ZodType<Outputs>;
  compute: (inputs: Inputs) => Outputs;
  lines?: (inputs: Inputs) => Line[];
}): Method<Inputs, Outputs> => method;

type NumberRange = {
  label: string;
  unit?: string;
  above?: number;
  min?: number;
  below?: number;
  max?: number;
};

/** A number with its label, unit and range; what is refused is refused in a sentence. */
export function quantity({ label, unit = "", above, min, below, max }: NumberRange) {
  let schema = z.number({
    error: (issue) =>
      issue.input === undefined ? `${label} is missing.` : `${label} must be a finite number, in digits.`,
  });
  if (above !== undefined) schema = schema.gt(above, `${label} must be more than ${above}.`);
  if (min !== undefined) schema = schema.gte(min, `${label} must be ${min} or more.`);
  if (below !== undefined) schema = schema.lt(below, `${label} must be less than ${below}.`);
  if (max !== undefined) schema = schema.lte(max, `${label} must be ${max} or less.`);
  return schema.meta({ label, unit });
}

/** An output figure; null where it has no value (nothing applied, no equilibrium). */
export const output = (label: string, unit = "") => z.number().meta({ label, unit });

export type MethodAnswer =
  | { outputs: unknown; lines?: Line[] }
  | { error: { code: "invalid" | "unknown-method"; message: string; fields: Record<string, string> } };

/** Runs a method on untrusted inputs. What cannot be read is an error by field; the impossible is a result. */
export function answerOf(method: Method<never, unknown>, inputs: unknown): MethodAnswer {
  const read = (method.inputs as z.ZodType).safeParse(inputs);
  if (!read.success) return { error: inputError(read.error) };
  return { outputs: method.compute(read.data as never) };
}

/** The sentences of a failed reading, by field; an unknown field is named. */
export function inputError(error: z.ZodError): {
  code: "invalid";
  message: string;
  fields: Record<string, string>;
} {
  const fields: Record<string, string> = {};
  for (const issue of error.issues) {
    if (issue.code === "unrecognized_keys")
      for (const key of issue.keys) fields[[...issue.path, key].join(".")] ??= "There is no such field.";
    else fields[issue.path.join(".") || "inputs"] ??= issue.message;
  }
  const names = Object.keys(fields);
  const message =
    names.length === 1 ? `One input cannot be used: ${names[0]}.` : `${names.length} inputs cannot be used.`;
  return { code: "invalid", message, fields };
}
