import type { z } from "zod";
import { Invalid, RevisionMissing, Superseded } from "./errors";

/** Parses what a verb was given; a mismatch is refused field by field, in sentences. */
export function parse<Schema extends z.ZodType>(schema: Schema, given: unknown): z.output<Schema> {
  const read = schema.safeParse(given);
  if (read.success) return read.data;
  const fields: Record<string, string> = {};
  for (const issue of read.error.issues) {
    if (issue.code === "unrecognized_keys") {
      for (const key of issue.keys)
        fields[[...issue.path, key].join(".")] ??= "This field is not known here.";
    } else fields[issue.path.join(".") || "body"] ??= issue.message;
  }
  const count = Object.keys(fields).length;
  throw new Invalid(
    count === 1 ? "One field needs another look." : `${count} fields need another look.`,
    fields,
  );
}

/** Refuses a write that saw another revision than the current one; answers with both. */
export function assertSeen(seen: number | undefined, current: number, what: string, row: unknown): void {
  if (seen === undefined)
    throw new RevisionMissing("Say which revision you saw (If-Match), so that nobody's work is lost.");
  if (seen !== current)
    throw new Superseded(
      `${what} was changed meanwhile: you saw revision ${seen}, it is now at ${current}.`,
      {
        seen,
        current: row,
        currentRevision: current,
      },
    );
}
