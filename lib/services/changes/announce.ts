import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { OutcomeCounts } from "@/lib/contracts/changes";
import { countsInWords } from "@/lib/contracts/counts-in-words";
import type { ChangeId, PersonId } from "@/lib/contracts/ids";
import { env } from "@/lib/env";
import type { Context } from "../context";
import { queueMail } from "../outbox";
import { noCounts } from "./outcome";

/** What one owner's footings came to; "" stands for footings that nobody owns. */
export type TallyByOwner = Map<PersonId | "", OutcomeCounts>;

/** Adds one footing to its owner's tally. */
export function tally(
  byOwner: TallyByOwner,
  ownerId: PersonId | null,
  outcome: keyof OutcomeCounts,
  count = 1,
): void {
  const key = ownerId ?? "";
  const counts = byOwner.get(key) ?? noCounts();
  counts[outcome] += count;
  byOwner.set(key, counts);
}

/** The sum over all owners. */
export function total(byOwner: TallyByOwner): OutcomeCounts {
  const sum = noCounts();
  for (const counts of byOwner.values())
    for (const outcome of Object.keys(sum) as (keyof OutcomeCounts)[]) sum[outcome] += counts[outcome];
  return sum;
}

/** Queues one letter to each owner of a touched footing and to each project lead: one a person a change, two statements. */
export async function announceChange(
  tx: Transaction,
  context: Context,
  change: { id: ChangeId; title: string; reason: string; byOwner: TallyByOwner },
): Promise<number> {
  const owners = [...change.byOwner.keys()].filter((key): key is PersonId => key !== "");
  const people = await tx.execute<{
    id: PersonId;
    email: string;
    name: string;
    leads: boolean;
    project: string;
  }>(sql`
    select p.id, p.email, p.name, bool_or(m.role = 'lead') as leads, j.number || ' ' || j.title as project
    from person p
    join membership m on m.person_id = p.id and m.project_id = ${context.projectId}
    join project j on j.id = m.project_id
    where p.disabled_at is null
      and (m.role = 'lead' or p.id = any(${sql.param(owners)}::uuid[]))
    group by p.id, j.number, j.title order by p.id`);
  const all = total(change.byOwner);
  const address = `${env().APP_ORIGIN}/projects/${context.projectId}/revisions/${change.id}`;
  const letters = people.rows.map((person) => {
    const own = change.byOwner.get(person.id);
    const lines = [
      `${person.name},`,
      "",
      change.title,
      `Reason: ${change.reason}`,
      `Recorded by ${context.person.name}.`,
      "",
      ...(own ? [`Your footings: ${countsInWords(own)}.`] : []),
      ...(person.leads ? [`All footings of the project: ${countsInWords(all)}.`] : []),
      "",
      "A footing that rested on what has changed is not approved until an engineer has looked at it again.",
      `What it did to each footing: ${address}`,
    ];
    return {
      key: `change/${change.id}/${person.id}`,
      recipientId: person.id,
      recipient: person.email,
      subject: oneLine(`${person.project}: ${change.title}`),
      body: lines.join("\n"),
    };
  });
  await queueMail(tx, context, letters);
  return letters.length;
}

/** A subject is one line: a line break in a title would begin another header. */
const oneLine = (text: string): string => text.replace(/\s+/g, " ").trim().slice(0, 250);
