import { createInterface } from "node:readline";
import { z } from "zod";
import { allMethods, runMethod } from "@/lib/check/all-methods";

/**
 * `npm run -s calc`: one JSON object a line on standard input, `{"method": "<id>", "inputs": {…}}`, one line each on
 * standard output, `{"outputs": {…}}` or `{"error": {…}}`, with `findings` beside the outputs where a limit of the
 * method is not kept. A bad line is answered, never fatal. `--list` prints the ids and fields; `--lines` adds the steps
 * with their numbers.
 */
function answer(text: string): unknown {
  let asked: unknown;
  try {
    asked = JSON.parse(text);
  } catch {
    return { error: { code: "invalid", message: "This line is not well-formed JSON.", fields: {} } };
  }
  if (
    asked === null ||
    typeof asked !== "object" ||
    typeof (asked as { method?: unknown }).method !== "string"
  )
    return {
      error: {
        code: "invalid",
        message: 'A line is {"method": "<id>", "inputs": {…}}.',
        fields: { method: "Missing." },
      },
    };
  const { method, inputs } = asked as { method: string; inputs?: unknown };
  try {
    const given = runMethod(method, inputs ?? {});
    if ("error" in given) return given;
    const { outputs, findings, lines } = given;
    return {
      outputs,
      ...(findings.length > 0 ? { findings } : {}),
      ...(process.argv.includes("--lines") ? { lines } : {}),
    };
  } catch (error) {
    return { error: { code: "failed", message: String((error as Error).message), fields: {} } };
  }
}

type Field = { label?: string; unit?: string; default?: unknown; anyOf?: Field[] };

/** Each field with label, unit and, for what may be left out, its default. */
function fieldsOf(schema: z.ZodType, io: "input" | "output"): Record<string, object> {
  const { properties = {} } = z.toJSONSchema(schema, { io, unrepresentable: "any" }) as {
    properties?: Record<string, Field>;
  };
  return Object.fromEntries(
    Object.entries(properties).map(([name, field]) => {
      const { label, unit } = [field, ...(field.anyOf ?? [])].find((one) => one.label !== undefined) ?? {};
      return [name, { label, unit, ...("default" in field ? { default: field.default } : {}) }];
    }),
  );
}

if (process.argv.includes("--list")) {
  for (const { id, version, title, inputs, outputs } of allMethods)
    process.stdout.write(
      `${JSON.stringify({ id, version, title, inputs: fieldsOf(inputs, "input"), outputs: fieldsOf(outputs, "output") })}\n`,
    );
} else {
  for await (const text of createInterface({ input: process.stdin, crlfDelay: Number.POSITIVE_INFINITY }))
    if (text.trim() !== "") process.stdout.write(`${JSON.stringify(answer(text))}\n`);
}
