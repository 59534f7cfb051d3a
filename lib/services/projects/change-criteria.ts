import { sql } from "drizzle-orm";
import * as t from "@/db/schema";
import { changeCriteriaInput, type ProjectFacts } from "@/lib/contracts/projects";
import { audit } from "../audit";
import { recordChange } from "../changes/record-change";
import { assertMay, type Context, inProject } from "../context";
import { Invalid } from "../errors";
import { assertSeen, parse } from "../parse";
import { readFacts } from "./project-facts";

/** Puts new criteria in force under the next number; every check made under the old ones is affected from now on. */
export async function changeCriteria(context: Context, given: unknown): Promise<ProjectFacts> {
  assertMay(context, "criteria:change");
  const { revision, reason, ...fields } = parse(changeCriteriaInput, given);

  return inProject(context, async (tx) => {
    await tx.execute(sql`select 1 from project where id = ${context.projectId} for update`);
    const before = await readFacts(tx, context);
    assertSeen(revision, before.revision, "The project", before);
    const changed = (Object.keys(fields) as (keyof typeof fields)[]).filter(
      (name) => fields[name] !== before.criteria[name],
    );
    if (changed.length === 0) throw new Invalid("Nothing is different from the criteria in force.");
    const number = before.currentCriteria + 1;
    await tx
      .insert(t.criteria)
      .values({ projectId: context.projectId, number, ...fields, reason, setBy: context.person.id });
    await tx.execute(sql`
      update project set current_criteria = ${number}, revision = revision + 1 where id = ${context.projectId}`);
    await recordChange(tx, context, {
      kind: "criteria-changed",
      subjectId: context.projectId,
      title: `Criteria changed: ${before.currentCriteria} → ${number}`,
      reason,
    });
    await audit(tx, context, {
      verb: "criteria:change",
      subject: `criteria/${number}`,
      detail: {
        before: Object.fromEntries(changed.map((name) => [name, before.criteria[name]])),
        after: Object.fromEntries(changed.map((name) => [name, fields[name]])),
        reason,
      },
    });
    return readFacts(tx, context);
  });
}
