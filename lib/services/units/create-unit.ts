import { randomUUID } from "node:crypto";
import { and, eq } from "drizzle-orm";
import * as t from "@/db/schema";
import { createUnitInput } from "@/lib/contracts/ground";
import type { GroundUnitId } from "@/lib/contracts/ids";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { Invalid } from "../errors";
import { parse } from "../parse";

/** Adds a ground unit: a layer of the whole project that strata can be assigned to. */
export async function createUnit(context: Context, given: unknown) {
  assertMay(context, "unit:write");
  const fields = parse(createUnitInput, given);
  const { projectId } = context;
  return inProject(context, async (tx) => {
    const [taken] = await tx
      .select({ id: t.groundUnit.id })
      .from(t.groundUnit)
      .where(and(eq(t.groundUnit.projectId, projectId), eq(t.groundUnit.code, fields.code)));
    if (taken)
      throw new Invalid(`There is a unit ${fields.code} already.`, { code: "Give the unit another code." });
    const id = randomUUID() as GroundUnitId;
    await tx.insert(t.groundUnit).values({ projectId, id, ...fields });
    await audit(tx, context, { verb: "unit:create", subject: `unit/${id}`, detail: fields });
    return { id, ...fields, revision: 1 };
  });
}
