import { type SQL, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { ProjectId } from "@/lib/contracts/ids";
import { verifyProject } from "./audit-chain";
import { alteredRevisions } from "./signed-content";

/** What must hold in every project at every moment. A query answers with one row for each thing that breaks it. */
export type Invariant = { id: string; sentence: string; broken: (project: ProjectId) => SQL };

/** Tables whose rows are numbered 1, 2, 3 … within what they belong to. */
const NUMBERED = [
  ["bearing_value_revision", "value_id"],
  ["document_revision", "document_id"],
  ["hole_revision", "hole_id"],
  ["zone_revision", "zone_id"],
  ["footing_revision", "footing_id"],
  ["load_set", "footing_id"],
  ["footing_link", "footing_id"],
  ["stage_event", "footing_id"],
  ["disposition", "consequence_id"],
  ["criteria", "project_id"],
] as const;

/** The latest checks that something newer stands against, worked out join by join and apart from the view's own way. */
const affectedByHand = (project: ProjectId): SQL => sql`
  with latest as (
    select distinct on (footing_id) * from footing_check where project_id = ${project} order by footing_id, seq desc
  )
  select c.id from latest c join footing f on f.project_id = c.project_id and f.id = c.footing_id
    where f.value_id is null or f.value_id <> c.value_id
      or f.current_load_set_id is null or f.current_load_set_id <> c.load_set_id
      or f.current_revision_id is null or f.current_revision_id <> c.footing_revision_id
  union
  select c.id from latest c where c.value_revision_id not in (
    select current_revision_id from bearing_value where project_id = ${project} and current_revision_id is not null)
  union
  select c.id from latest c where c.zone_revision_id not in (
    select z.current_revision_id from zone z join bearing_value v on v.project_id = z.project_id and v.zone_id = z.id
    where z.project_id = ${project} and v.id = c.value_id and z.current_revision_id is not null)
  union
  select c.id from latest c where c.criteria_number not in (select current_criteria from project where id = ${project})
  union
  select c.id from latest c join hole_revision r on r.project_id = c.project_id and r.id = any(c.hole_revision_ids)
    where r.id not in (
      select current_revision_id from hole where project_id = ${project} and current_revision_id is not null)
  union
  select c.id from latest c join inspection i on i.project_id = c.project_id and i.footing_id = c.footing_id
    where not i.as_expected and i.recorded_at > c.run_at
  union
  select c.id from latest c
    join value_source s on s.project_id = c.project_id and s.value_revision_id = c.value_revision_id
    join document_revision dr on dr.project_id = s.project_id and dr.id = s.document_revision_id
    join document d on d.project_id = dr.project_id and d.id = dr.document_id
    where d.current_revision_id <> s.document_revision_id and d.current_revision_id not in (
      select k.document_revision_id from source_confirmation k
      where k.project_id = s.project_id and k.value_revision_id = s.value_revision_id)`;

const audited = (table: string, columns: string, verb: string, event: string): Invariant => ({
  id: "I6",
  sentence: `every row of ${table} was written down once, as ${verb}`,
  broken: (project) => sql`
    select ${sql.raw(columns)} as what from ${sql.raw(table)} r where r.project_id = ${project} and (
      select count(*) from audit_event e where e.project_id = r.project_id and e.verb = ${verb} and ${sql.raw(event)}) <> 1`,
});

export const invariants: Invariant[] = [
  ...NUMBERED.map(([table, owner]) => ({
    id: "I1",
    sentence: `numbers of ${table} run 1, 2, 3 … without a gap`,
    broken: (project: ProjectId) => sql`
      select ${sql.raw(owner)}::text as what from ${sql.raw(table)} where project_id = ${project}
      group by ${sql.raw(owner)} having min(number) <> 1 or max(number) <> count(*)`,
  })),
  {
    id: "I2",
    sentence: "a checked revision still carries the content hash that was written down when it was checked",
    broken: (project) => sql`
      select r.id::text as what from bearing_value_revision r where r.project_id = ${project} and not exists (
        select from audit_event e where e.project_id = r.project_id and e.verb = 'revision:check'
          and e.detail::jsonb ->> 'id' = r.id::text and e.detail::jsonb ->> 'contentHash' = r.content_hash)`,
  },
  {
    id: "I2",
    sentence: "a revision in force was issued, was not withdrawn, and bears three different names",
    broken: (project) => sql`
      select v.id::text as what from bearing_value v
      left join revision_issue i on i.project_id = v.project_id and i.value_revision_id = v.current_revision_id
      left join revision_withdrawal w on w.project_id = v.project_id and w.value_revision_id = v.current_revision_id
      where v.project_id = ${project} and v.current_revision_id is not null
        and (i.value_id is distinct from v.id or w.value_revision_id is not null
          or i.prepared_by = i.checked_by or i.issued_by in (i.prepared_by, i.checked_by))`,
  },
  {
    id: "I3",
    sentence:
      "every check names the footing revision, loads, value revision and engine that it used, and their pressure",
    broken: (project) => sql`
      select c.id::text as what from footing_check c
      left join footing_revision fr on fr.project_id = c.project_id and fr.id = c.footing_revision_id
      left join load_set l on l.project_id = c.project_id and l.id = c.load_set_id
      left join bearing_value_revision r on r.project_id = c.project_id and r.id = c.value_revision_id
      where c.project_id = ${project}
        and (c.engine_version = '' or fr.footing_id is distinct from c.footing_id or l.footing_id is distinct from c.footing_id
          or r.value_id is distinct from c.value_id or r.net_allowable_kpa is distinct from c.net_allowable_kpa)`,
  },
  {
    id: "I4",
    sentence: "a current check is its footing's newest, against the value's newest issued revision",
    broken: (project) => sql`
      select s.check_id::text as what from check_standing s
      join footing_check c on c.project_id = s.project_id and c.id = s.check_id
      join footing f on f.project_id = c.project_id and f.id = c.footing_id
      left join bearing_value v on v.project_id = f.project_id and v.id = f.value_id
      where s.project_id = ${project} and s.standing = 'current'
        and (v.current_revision_id is distinct from c.value_revision_id
          or c.seq <> (select max(seq) from footing_check n where n.project_id = c.project_id and n.footing_id = c.footing_id))`,
  },
  {
    id: "I5",
    sentence: "the checks shown as affected are those that something newer stands against, and no others",
    broken: (project) => sql`
      with by_hand as (${affectedByHand(project)}), by_view as (
        select check_id as id from check_standing
        where project_id = ${project} and standing = 'affected' and reason_codes <> array['method'])
      (select 'shown only: ' || id::text as what from (select id from by_view except select id from by_hand) a)
      union all
      (select 'not shown: ' || id::text from (select id from by_hand except select id from by_view) b)`,
  },
  audited(
    "revision_issue",
    "r.value_revision_id::text",
    "revision:issue",
    "e.detail::jsonb ->> 'revisionId' = r.value_revision_id::text",
  ),
  audited(
    "revision_withdrawal",
    "r.value_revision_id::text",
    "revision:withdraw",
    "e.detail::jsonb ->> 'revisionId' = r.value_revision_id::text",
  ),
  audited("change_closure", "r.change_id::text", "change:close", "e.subject = 'change/' || r.change_id"),
  {
    id: "I6",
    sentence: "every set of criteria after the first was written down once",
    broken: (project) => sql`
      select 'criteria ' || c.number as what from criteria c where c.project_id = ${project} and c.number > 1 and (
        select count(*) from audit_event e where e.project_id = c.project_id and e.verb = 'criteria:change'
          and e.subject = 'criteria/' || c.number) <> 1`,
  },
  {
    id: "I7",
    sentence: "every letter about a change tells of one that was committed",
    broken: (project) => sql`
      select o.message_key as what from outbox o where o.project_id = ${project} and o.message_key like 'change/%'
        and not exists (select from change c where c.project_id = o.project_id
          and c.id::text = split_part(o.message_key, '/', 2))`,
  },
  {
    id: "I7",
    sentence: "every change that touched somebody's footings has its letters",
    broken: (project) => sql`
      select c.id::text as what from change c where c.project_id = ${project}
        and exists (select from membership m join person p on p.id = m.person_id
          where m.project_id = c.project_id and m.role = 'lead' and m.granted_at < c.made_at and p.disabled_at is null)
        and not exists (select from outbox o where o.project_id = c.project_id
          and o.message_key like 'change/' || c.id || '/%')`,
  },
  {
    id: "I8",
    sentence: "every document revision names an object by its key, size and SHA-256",
    broken: (project) => sql`
      select id::text as what from document_revision
      where project_id = ${project} and (object_key = '' or size_bytes <= 0 or sha256 !~ '^[0-9a-f]{64}$')`,
  },
];

export type Finding = { id: string; sentence: string; what: string[] };

/** Those asked in SQL, and two that hashes are made again for: what was signed, and the audit chain. */
export const INVARIANT_COUNT = invariants.length + 2;

/** Asks every invariant of one project, the hashes among them; answers with those that are broken. */
export async function brokenIn(tx: Transaction, project: ProjectId): Promise<Finding[]> {
  // Letters are seen through the relay's door only.
  await tx.execute(sql`select set_config('app.door', 'relay', true)`);
  const findings: Finding[] = [];
  for (const { id, sentence, broken } of invariants) {
    const { rows } = await tx.execute<{ what: string }>(broken(project));
    if (rows.length > 0) findings.push({ id, sentence, what: rows.map(({ what }) => what) });
  }
  const altered = await alteredRevisions(tx, project);
  if (altered.length > 0)
    findings.push({ id: "I2", sentence: "a checked revision holds what two people signed", what: altered });
  const chain = await verifyProject(tx, project);
  if (chain.broken)
    findings.push({ id: "I6", sentence: "the audit chain is unbroken", what: [chain.broken.what] });
  return findings;
}
