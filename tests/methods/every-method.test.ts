import { describe, expect, it } from "vitest";
import { z } from "zod";
import { allMethods, runMethod } from "@/lib/check/all-methods";
import { references } from "@/lib/methods/references";
import { referenceCases } from "../reference/cases";

type Schema = {
  type?: string;
  label?: unknown;
  unit?: unknown;
  properties?: Record<string, Schema>;
  items?: Schema;
  anyOf?: Schema[];
  oneOf?: Schema[];
};

/** Figures inside the inputs of a case, as paths. */
function figuresIn(value: unknown, at: (string | number)[] = []): (string | number)[][] {
  if (typeof value === "number") return [at];
  if (typeof value !== "object" || value === null) return [];
  return Object.entries(value).flatMap(([name, part]) =>
    figuresIn(part, [...at, Array.isArray(value) ? Number(name) : name]),
  );
}

function withFigure(inputs: unknown, path: (string | number)[], figure: unknown): Record<string, unknown> {
  const copy = structuredClone(inputs) as Record<string, unknown>;
  let at: Record<string | number, unknown> = copy;
  for (const name of path.slice(0, -1)) at = at[name] as Record<string | number, unknown>;
  at[path.at(-1) as string | number] = figure;
  return copy;
}

/** Fields of a schema that lack a label or a unit. */
function unlabelled(schema: Schema, at = ""): string[] {
  const inner = schema.anyOf ?? schema.oneOf;
  if (inner && schema.label === undefined)
    return inner.flatMap((part) => (part.type === "null" ? [] : unlabelled(part, at)));
  if (schema.items) return unlabelled(schema.items, `${at}[]`);
  if (!schema.properties) return [];
  return Object.entries(schema.properties).flatMap(([name, field]) => {
    const path = at === "" ? name : `${at}.${name}`;
    const facts = [field, ...(field.anyOf ?? [])].find(({ label }) => label !== undefined);
    const nested = field.properties || field.items || field.oneOf ? unlabelled(field, path) : [];
    const grouped =
      field.properties !== undefined || field.oneOf !== undefined || field.items?.properties !== undefined;
    const own =
      grouped || (typeof facts?.label === "string" && typeof facts.unit === "string") || "const" in field;
    return own ? nested : [path, ...nested];
  });
}

describe.each(allMethods.map((method) => [method.id, method] as const))("%s", (id, method) => {
  const given = referenceCases.find((one) => one.method === id)?.inputs ?? {};

  it("takes the inputs of its first case", () => {
    expect(method.answer(given)).toHaveProperty("outputs");
  });

  it.each([
    ["NaN", Number.NaN],
    ["infinity", Number.POSITIVE_INFINITY],
    ["minus infinity", Number.NEGATIVE_INFINITY],
    ["digits in a text", "12"],
    ["yes", true],
  ])("refuses %s in place of any of its figures, and names that field", (_, figure) => {
    for (const path of figuresIn(given)) {
      const answer = method.answer(withFigure(given, path, figure));
      if (!("error" in answer)) throw new Error(`${path.join(".")} took ${String(figure)}.`);
      expect(answer.error.code).toBe("invalid");
      expect(Object.keys(answer.error.fields).some((name) => path.join(".").startsWith(name))).toBe(true);
      for (const sentence of Object.values(answer.error.fields)) expect(sentence).toMatch(/^[A-Z].*\.$/);
    }
  });

  it("refuses a field that it does not know, by its name", () => {
    const answer = method.answer({ ...given, colour: 3 });
    expect(answer).toMatchObject({ error: { fields: { colour: "There is no such field." } } });
  });

  it("refuses nothing at all, a text, a list and none, and does not fall over", () => {
    for (const inputs of [undefined, null, "x", [], 3, {}])
      expect(method.answer(inputs)).toMatchObject({ error: { code: "invalid" } });
  });

  it("gives a label and a unit to every field that goes in or comes out", () => {
    for (const io of ["input", "output"] as const) {
      const schema = z.toJSONSchema(io === "input" ? method.inputs : method.outputs, {
        io,
        unrepresentable: "any",
      }) as Schema;
      expect(unlabelled(schema)).toEqual([]);
    }
  });

  it("gives what its outputs promise, from inputs that it leaves alone, twice the same", () => {
    for (const { inputs } of referenceCases.filter((one) => one.method === id)) {
      const before = JSON.stringify(inputs);
      const answer = method.answer(inputs);
      if ("error" in answer) throw new Error(answer.error.message);
      expect(method.outputs.safeParse(answer.outputs).error?.issues ?? []).toEqual([]);
      expect(JSON.stringify(inputs)).toBe(before);
      expect(JSON.stringify(method.answer(inputs))).toBe(JSON.stringify(answer));
    }
  });

  it("prints steps whose numbers are all put in and whose results are figures", () => {
    for (const { inputs } of referenceCases.filter((one) => one.method === id)) {
      const answer = method.answer(inputs);
      if ("error" in answer) throw new Error(answer.error.message);
      for (const { numbers, value, ref, shown } of answer.lines) {
        expect(Number.isFinite(value), shown).toBe(true);
        expect(numbers).not.toMatch(/NaN|undefined|—/);
        expect(Object.keys(references)).toContain(ref);
      }
    }
  });

  it("says what it stands on and where it ends", () => {
    expect(method.source.length).toBeGreaterThan(0);
    expect(method.limits.length).toBeGreaterThan(0);
    for (const limit of method.limits) expect(limit).toMatch(/\.$/);
    expect(method.version).toMatch(/^\d+$/);
  });
});

describe("the list of methods", () => {
  it("names each method once, in the form of an address", () => {
    const ids = allMethods.map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
    for (const id of ids) expect(id).toMatch(/^[a-z]+(-[a-z]+)*$/);
  });

  it("gives out no figure beyond what numbers can hold", () => {
    const given = { soil: "clay", plateBreadth_m: 1e-200, plateSettlement_mm: 5, footingBreadth_m: 1e200 };
    expect(runMethod("plate-load", given)).toMatchObject({
      error: { message: expect.stringContaining("footingSettlement_mm has no finite value") },
    });
  });

  it("answers an unknown id with the ids that there are", () => {
    expect(runMethod("base-presure", {})).toMatchObject({ error: { code: "unknown-method" } });
    expect(runMethod("toString", {})).toMatchObject({ error: { code: "unknown-method" } });
  });
});
