import { randomUUID } from "node:crypto";
import { type SQL, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { ChangeKind, Outcome } from "@/db/schema";
import * as t from "@/db/schema";
import type { OutcomeCounts } from "@/lib/contracts/changes";
import type { ChangeId, FootingId, PersonId } from "@/lib/contracts/ids";
import type { Context } from "../context";
import { faultPoint } from "../faults";
import { announceChange, type TallyByOwner, tally, total } from "./announce";
import { recordConsequences } from "./record-consequences";

/** A change upstream of checks, other than of a bearing value. */
export type UpstreamChange = {
  kind: Exclude<ChangeKind, "value-issued" | "value-withdrawn">;
  /** The document, hole, zone, ground unit or project that changed; for footings the first of them. */
  subjectId: string;
  /** One sentence, shown everywhere: "Report GIR-01 superseded: P01 → P02". */
  title: string;
  reason: string;
  fromRevisionId?: string | null;
  toRevisionId?: string | null;
  /** Which footings it touches. Needed for loads, footing and inspection; elsewhere found from the subject. */
  footingIds?: readonly FootingId[];
};

/** Changes after which a check gives other figures, so that it has to be run again to say what they did. */
const alters: Partial<Record<ChangeKind, true>> = {
  "criteria-changed": true,
  "loads-changed": true,
  "footing-changed": true,
};

/**
 * Records a change and its consequence for every checked footing that it touches, and queues the letters. Call it in
 * the transaction that makes the change, after the pointer has moved and before `audit`. Writes nothing and answers
 * null when no check rests on the subject. Five statements, or a few more where checks are run again.
 */
export async function recordChange(
  tx: Transaction,
  context: Context,
  given: UpstreamChange,
): Promise<{ changeId: ChangeId; counts: OutcomeCounts } | null> {
  const changeId = randomUUID() as ChangeId;
  const touched = touchedBy(context, given);
  const byOwner = alters[given.kind]
    ? await recordConsequences(tx, context, { changeId, checked: touched })
    : await keepVerdicts(tx, context, changeId, touched);
  const counts = total(byOwner);
  if (Object.values(counts).every((count) => count === 0)) return null;
  await faultPoint("change:consequences");
  await insertChange(tx, context, { ...given, id: changeId, counts });
  await announceChange(tx, context, { id: changeId, title: given.title, reason: given.reason, byOwner });
  return { changeId, counts };
}

/** The row that says what changed. Written after its consequences, because it carries their counts and never changes. */
export async function insertChange(
  tx: Transaction,
  context: Context,
  row: Omit<typeof t.change.$inferInsert, "projectId" | "madeBy" | "seq"> & {
    id: ChangeId;
    counts: OutcomeCounts;
  },
): Promise<void> {
  const { id, kind, subjectId, title, reason, valueId, fromRevisionId, toRevisionId, counts } = row;
  await tx.insert(t.change).values({
    id,
    kind,
    subjectId,
    title,
    reason,
    valueId: valueId ?? null,
    fromRevisionId: fromRevisionId ?? null,
    toRevisionId: toRevisionId ?? null,
    counts,
    projectId: context.projectId,
    madeBy: context.person.id,
  });
}

/** The condition on `footing f` (with its last check `k`) that holds for the footings a change touches. */
function touchedBy(context: Context, given: UpstreamChange): SQL {
  if (given.footingIds) return sql`f.id = any(${sql.param([...given.footingIds])}::uuid[])`;
  const project = context.projectId;
  switch (given.kind) {
    case "document-superseded":
      return sql`k.value_revision_id in (
        select s.value_revision_id from value_source s
        join document_revision d on d.project_id = s.project_id and d.id = s.document_revision_id
        where s.project_id = ${project} and d.document_id = ${given.subjectId})`;
    case "hole-revised":
      return sql`k.hole_revision_ids && array(
        select r.id from hole_revision r where r.project_id = ${project} and r.hole_id = ${given.subjectId})`;
    case "zone-redrawn":
      return sql`f.value_id in (
        select v.id from bearing_value v where v.project_id = ${project} and v.zone_id = ${given.subjectId})`;
    case "unit-reassigned":
      return sql`f.value_id in (
        select v.id from bearing_value v where v.project_id = ${project} and v.ground_unit_id = ${given.subjectId})`;
    case "criteria-changed":
      return sql`true`;
    default:
      return sql`f.id = ${given.subjectId}`;
  }
}

/** Consequences of a change that leaves every figure as it is: the standing falls, the verdict of the last check stays. */
async function keepVerdicts(
  tx: Transaction,
  context: Context,
  changeId: ChangeId,
  touched: SQL,
): Promise<TallyByOwner> {
  const rows = await tx.execute<{ owner: PersonId | null; outcome: Outcome; count: number }>(sql`
    with written as (
      insert into consequence (project_id, change_id, footing_id, check_id, outcome, verdict_before, verdict_after,
        utilisation_before, utilisation_after, required_net_kpa, stage)
      select f.project_id, ${changeId}, f.id, k.id,
        case k.verdict when 'passes' then 'holds' when 'fails' then 'still fails' else 'outside conditions' end,
        k.verdict, k.verdict, k.utilisation, k.utilisation, k.required_net_kpa, f.stage
      from footing f
      join footing_check k on k.project_id = f.project_id and k.id = f.latest_check_id
      where f.project_id = ${context.projectId} and ${touched}
      returning footing_id, outcome)
    select f.owner_id as owner, w.outcome, count(*)::int as count
    from written w join footing f on f.project_id = ${context.projectId} and f.id = w.footing_id
    group by 1, 2`);
  const byOwner: TallyByOwner = new Map();
  for (const row of rows.rows) tally(byOwner, row.owner, row.outcome, row.count);
  return byOwner;
}
