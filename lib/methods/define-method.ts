import { z } from "zod";
import type { Line } from "./formula";
import type { ReferenceKey } from "./references";

/** What a field shows beside its name in a worksheet, an API page or a sheet. */
export type FieldFacts = { label: string; unit: string };

/** A condition of a method that the inputs do not meet: said, not hidden, and no error. */
export type MethodFinding = { code: string; severity: "outside" | "warning" | "note"; message: string };

/** What can be said of a method and asked of it without knowing its fields. */
export type RegisteredMethod = {
  readonly id: string;
  readonly version: string;
  readonly title: string;
  readonly source: readonly ReferenceKey[];
  /** When it holds and what it leaves out, one sentence each. */
  readonly limits: readonly string[];
  readonly inputs: z.ZodType;
  readonly outputs: z.ZodType;
  /** Runs on untrusted inputs. What cannot be read is an error by field; the physically impossible is a result. */
  readonly answer: (inputs: unknown) => MethodAnswer;
};

export type Method<Inputs, Outputs> = RegisteredMethod & {
  readonly compute: (inputs: Inputs) => Outputs;
};

export type InputError = { code: "invalid"; message: string; fields: Record<string, string> };
export type MethodAnswer =
  | { outputs: Record<string, unknown>; findings: MethodFinding[]; lines: Line[] }
  | { error: InputError };

/** Declares a method once; the worksheet, the address, the command and the sheet are all made from this. */
export function defineMethod<
  Inputs extends z.ZodType,
  Outputs extends z.ZodType<Record<string, unknown>>,
>(method: {
  id: string;
  version: string;
  title: string;
  source: readonly ReferenceKey[];
  limits: readonly string[];
  inputs: Inputs;
  outputs: Outputs;
  compute: (inputs: z.output<Inputs>) => z.input<Outputs>;
  /** The steps with the numbers put in. */
  lines?: (inputs: z.output<Inputs>, outputs: z.input<Outputs>) => Line[];
  /** Which limits these inputs or this outcome do not keep. */
  findings?: (inputs: z.output<Inputs>, outputs: z.input<Outputs>) => MethodFinding[];
}): Method<z.output<Inputs>, z.input<Outputs>> {
  const { lines, findings, ...declared } = method;
  return {
    ...declared,
    answer: (given) => {
      const read = method.inputs.safeParse(given);
      if (!read.success) return { error: inputError(read.error) };
      const outputs = method.compute(read.data) as z.input<Outputs> & Record<string, unknown>;
      const beyond = notFinite(outputs, "");
      if (beyond !== null)
        return {
          error: {
            code: "invalid",
            message: `These inputs lead beyond what numbers can hold: ${beyond} has no finite value.`,
            fields: {},
          },
        };
      return {
        outputs,
        findings: findings?.(read.data, outputs) ?? [],
        lines: lines?.(read.data, outputs) ?? [],
      };
    },
  };
}

/** Where in an answer a number is NaN or infinite; null when there is none. Such an answer is never given out. */
function notFinite(value: unknown, at: string): string | null {
  if (typeof value === "number") return Number.isFinite(value) ? null : at;
  if (typeof value !== "object" || value === null) return null;
  for (const [name, part] of Object.entries(value)) {
    const found = notFinite(part, at === "" ? name : `${at}.${name}`);
    if (found !== null) return found;
  }
  return null;
}

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
  const sized = unit === "" ? "" : ` ${unit}`;
  if (above !== undefined) schema = schema.gt(above, `${label} must be more than ${above}${sized}.`);
  if (min !== undefined) schema = schema.gte(min, `${label} must be ${min}${sized} or more.`);
  if (below !== undefined) schema = schema.lt(below, `${label} must be less than ${below}${sized}.`);
  if (max !== undefined) schema = schema.lte(max, `${label} must be ${max}${sized} or less.`);
  return schema.meta({ label, unit });
}

/** One of a few words; anything else is refused with the words that are known. */
export const choice = <const Words extends readonly [string, ...string[]]>(label: string, words: Words) =>
  z
    .enum(words, {
      error: (issue) =>
        issue.input === undefined ? `${label} is missing.` : `${label} must be one of: ${words.join(", ")}.`,
    })
    .meta({ label, unit: "" });

/** A yes or no. */
export const yesNo = (label: string) =>
  z
    .boolean({
      error: (issue) =>
        issue.input === undefined ? `${label} is missing.` : `${label} must be true or false.`,
    })
    .meta({ label, unit: "" });

/** An output figure. */
export const output = (label: string, unit = "") => z.number().meta({ label, unit });

/** The sentences of a failed reading, by field; an unknown field is named. */
export function inputError(error: z.ZodError): InputError {
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
