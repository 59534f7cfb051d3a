import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import {
  type AnswerConsequencesInput,
  acceptConsequencesInput,
  referConsequencesInput,
} from "@/lib/contracts/changes";
import type { ChangeId, ConsequenceId, PersonId } from "@/lib/contracts/ids";
import { env } from "@/lib/env";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { Conflict, NotFound } from "../errors";
import { queueMail } from "../outbox";
import { parse } from "../parse";
import { isAnswered, lastAnswer } from "./answered";

/** The project lead accepts footings as built: each with the written reason, for ever. */
export async function acceptConsequences(context: Context, given: AnswerConsequencesInput) {
  assertMay(context, "consequence:accept");
  const { changeId, consequenceIds, reason } = parse(acceptConsequencesInput, given);
  return inProject(context, async (tx) => {
    const marks = await answer(tx, context, { changeId, consequenceIds, reason, kind: "accepted-as-built" });
    await audit(tx, context, {
      verb: "consequence:accept",
      subject: `change/${changeId}`,
      detail: { marks, consequenceIds, reason },
    });
    return { changeId, answered: marks.length };
  });
}

/** The structural engineer refers footings back: the geotechnical engineers get the question by mail. */
export async function referConsequences(context: Context, given: AnswerConsequencesInput) {
  assertMay(context, "consequence:answer");
  const { changeId, consequenceIds, reason } = parse(referConsequencesInput, given);
  return inProject(context, async (tx) => {
    const marks = await answer(tx, context, { changeId, consequenceIds, reason, kind: "referred-back" });
    await askGeotechnical(tx, context, changeId, marks, reason);
    await audit(tx, context, {
      verb: "consequence:answer",
      subject: `change/${changeId}`,
      detail: { kind: "referred-back", marks, consequenceIds, reason },
    });
    return { changeId, answered: marks.length };
  });
}

type Answer = {
  changeId: ChangeId;
  consequenceIds: ConsequenceId[];
  reason: string;
  kind: "accepted-as-built" | "referred-back";
};

/** Locks the change against a second hand, refuses what is closed or answered, and records one answer a footing. */
async function answer(tx: Transaction, context: Context, given: Answer): Promise<string[]> {
  const { changeId, reason, kind } = given;
  const ids = [...new Set(given.consequenceIds)];
  await lockChange(tx, context, changeId);
  const rows = await tx.execute<{ id: ConsequenceId; mark: string; answered: boolean; number: number }>(sql`
    select q.id, f.mark, ${isAnswered} as answered,
      (select coalesce(max(d.number), 0) + 1 from disposition d
        where d.project_id = q.project_id and d.consequence_id = q.id)::int as number
    from consequence q
    join footing f on f.project_id = q.project_id and f.id = q.footing_id
    ${lastAnswer}
    where q.project_id = ${context.projectId} and q.change_id = ${changeId} and q.id = any(${sql.param(ids)}::uuid[])
    order by f.mark`);
  if (rows.rows.length < ids.length)
    throw new NotFound("One of these footings is not among those of this change.");
  const answered = rows.rows.filter((row) => row.answered).map(({ mark }) => mark);
  if (answered.length > 0)
    throw new Conflict(`Answered already: ${answered.slice(0, 20).join(", ")}.`, { marks: answered });
  await tx.execute(sql`
    insert into disposition (project_id, consequence_id, number, kind, reason, answered_by)
    select ${context.projectId}, q.id, q.number, ${kind}, ${reason}, ${context.person.id}
    from unnest(${sql.param(rows.rows.map(({ id }) => id))}::uuid[],
      ${sql.param(rows.rows.map(({ number }) => number))}::int[]) as q(id, number)`);
  return rows.rows.map(({ mark }) => mark);
}

/** One hand at a time answers or closes a change; a closed one takes no more answers. */
export async function lockChange(
  tx: Transaction,
  context: Context,
  changeId: ChangeId,
): Promise<{ title: string }> {
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${`change ${changeId}`}, 0))`);
  const rows = await tx.execute<{ title: string; closer: string | null }>(sql`
    select h.title, p.name as closer from change h
    left join change_closure c on c.project_id = h.project_id and c.change_id = h.id
    left join person p on p.id = c.closed_by
    where h.project_id = ${context.projectId} and h.id = ${changeId}`);
  const change = rows.rows[0];
  if (!change) throw new NotFound("There is no such change in this project.");
  if (change.closer) throw new Conflict(`${change.closer} has closed this change.`);
  return change;
}

async function askGeotechnical(
  tx: Transaction,
  context: Context,
  changeId: ChangeId,
  marks: string[],
  question: string,
) {
  const people = await tx.execute<{ id: PersonId; email: string; name: string }>(sql`
    select p.id, p.email, p.name from person p join membership m on m.person_id = p.id
    where m.project_id = ${context.projectId} and m.role = 'geotechnical' and p.disabled_at is null order by p.id`);
  const address = `${env().APP_ORIGIN}/projects/${context.projectId}/revisions/${changeId}`;
  await queueMail(
    tx,
    context,
    people.rows.map((person) => ({
      key: `referred/${changeId}/${context.requestId}/${person.id}`,
      recipientId: person.id,
      recipient: person.email,
      subject:
        `${marks.length === 1 ? `Footing ${marks[0]} is` : `${marks.length} footings are`} referred back`.slice(
          0,
          250,
        ),
      body: [
        `${person.name},`,
        "",
        `${context.person.name} asks: ${question}`,
        `Footings: ${marks.slice(0, 50).join(", ")}${marks.length > 50 ? ` and ${marks.length - 50} more` : ""}.`,
        "",
        address,
      ].join("\n"),
    })),
  );
}
