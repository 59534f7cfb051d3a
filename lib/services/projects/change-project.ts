import { eq, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import * as t from "@/db/schema";
import { changeProjectInput, type ProjectFacts } from "@/lib/contracts/projects";
import { audit } from "../audit";
import { assertMay, type Context, databaseCode, inProject } from "../context";
import { Invalid } from "../errors";
import { assertSeen, parse } from "../parse";
import { readFacts } from "./project-facts";

/** Settings that every coordinate and level of the project is read by. */
const FRAME = [
  "gridName",
  "epsgCode",
  "gridOriginEasting_m",
  "gridOriginNorthing_m",
  "gridRotation_deg",
  "gridScale",
  "datumName",
] as const;

/** Changes settings of the project. Once there are holes or footings, another grid or datum needs a reason. */
export async function changeProject(context: Context, given: unknown): Promise<ProjectFacts> {
  assertMay(context, "project:change");
  const { revision, reason, ...wanted } = parse(changeProjectInput, given);

  try {
    return await inProject(context, async (tx) => {
      await tx.execute(sql`select 1 from project where id = ${context.projectId} for update`);
      const before = await readFacts(tx, context);
      assertSeen(revision, before.revision, "The project", before);
      const changed = Object.fromEntries(
        Object.entries(wanted).filter(
          ([name, value]) => value !== undefined && value !== before[name as keyof typeof before],
        ),
      );
      if (Object.keys(changed).length === 0) return before;
      const frame = FRAME.filter((name) => name in changed);
      if (frame.length > 0 && !reason?.trim() && (await hasGround(tx, context)))
        throw new Invalid("Holes or footings are recorded on this grid and datum.", {
          reason:
            "Say why grid or datum changes, and see to it that recorded coordinates and levels still hold.",
        });
      await tx
        .update(t.project)
        .set({ ...changed, revision: sql`revision + 1` })
        .where(eq(t.project.id, context.projectId));
      const after = await readFacts(tx, context);
      await audit(tx, context, {
        verb: "project:change",
        subject: `project/${context.projectId}`,
        detail: {
          before: Object.fromEntries(
            Object.keys(changed).map((name) => [name, before[name as keyof typeof before]]),
          ),
          after: changed,
          reason: reason ?? "",
        },
      });
      return after;
    });
  } catch (error) {
    if (databaseCode(error) === "23505" || (error as { extra?: { constraint?: string } }).extra?.constraint)
      throw new Invalid(
        "One field needs another look.",
        { number: "There is a project with this number already." },
        409,
      );
    throw error;
  }
}

async function hasGround(tx: Transaction, context: Context): Promise<boolean> {
  const { rows } = await tx.execute<{ any: boolean }>(sql`
    select exists (select from hole where project_id = ${context.projectId})
      or exists (select from footing where project_id = ${context.projectId})
      or exists (select from zone where project_id = ${context.projectId}) as any`);
  return rows[0]?.any ?? false;
}
