import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type {
  DocumentRevisionId,
  GroundUnitId,
  PersonId,
  ValueId,
  ValueRevisionId,
  ZoneId,
} from "@/lib/contracts/ids";
import {
  type CitedSource,
  type RevisionState,
  readValueInput,
  type Signature,
  type StatedFields,
  type ValueDetail,
  type ValueDraft,
  type ValueRevision,
} from "@/lib/contracts/values";
import { assertMay, type Context, inProject } from "../context";
import { NotFound } from "../errors";
import { parse } from "../parse";
import { differences } from "./differences";
import type { DraftKept } from "./draft-row";
import { readDraft } from "./read-draft";
import { citeSources, supersededSources } from "./sources";

/** One value with its draft, its revisions newest first, what each changed, their sources and signatures. */
export async function readValue(context: Context, given: { valueId: string }): Promise<ValueDetail> {
  assertMay(context, "project:read");
  const { valueId } = parse(readValueInput, given);

  return inProject(context, async (tx) => {
    const head = await readHead(tx, context, valueId);
    const revisions = await readRevisions(tx, context, valueId);
    const draft = await readDraftOf(tx, context, valueId, head.groundUnit.soil);
    return { ...head, draft, revisions };
  });
}

async function readHead(tx: Transaction, context: Context, valueId: ValueId) {
  const rows = await tx.execute<{
    id: ValueId;
    reference: string;
    revision: number;
    currentRevisionId: ValueRevisionId | null;
    zone: { id: ZoneId; name: string };
    groundUnit: { id: GroundUnitId; code: string; name: string; soil: string };
    footings: { notPoured: number; poured: number };
  }>(sql`
    select v.id, v.reference, v.revision, v.current_revision_id as "currentRevisionId",
      json_build_object('id', z.id, 'name', z.name) as zone,
      json_build_object('id', u.id, 'code', u.code, 'name', u.name, 'soil', u.soil) as "groundUnit",
      (select json_build_object('notPoured', count(*) filter (where f.stage <> 'poured'),
          'poured', count(*) filter (where f.stage = 'poured'))
        from footing f where f.project_id = v.project_id and f.value_id = v.id) as footings
    from bearing_value v
    join zone z on z.project_id = v.project_id and z.id = v.zone_id
    join ground_unit u on u.project_id = v.project_id and u.id = v.ground_unit_id
    where v.project_id = ${context.projectId} and v.id = ${valueId}`);
  const head = rows.rows[0];
  if (!head) throw new NotFound("There is no such bearing value in this project.");
  return head;
}

async function readDraftOf(
  tx: Transaction,
  context: Context,
  valueId: ValueId,
  soil: string,
): Promise<ValueDraft | null> {
  const rows = await tx.execute<{
    kept: DraftKept;
    preparedBy: { id: PersonId; name: string };
    revision: number;
    changedAt: string;
    today: string;
  }>(sql`
    select d.content as kept, json_build_object('id', p.id, 'name', p.name) as "preparedBy", d.revision,
      d.changed_at as "changedAt", to_char(now() at time zone 'UTC', 'YYYY-MM-DD') as today
    from bearing_value_draft d join person p on p.id = d.prepared_by
    where d.project_id = ${context.projectId} and d.value_id = ${valueId}`);
  const row = rows.rows[0];
  if (!row) return null;
  const { problems, findings, netAllowable_kPa } = readDraft(row.kept.fields, { soil, today: row.today });
  const sources = await citeDraft(tx, context, row.kept);
  return {
    content: row.kept.fields,
    preparedBy: row.preparedBy,
    revision: row.revision,
    changedAt: new Date(row.changedAt).toISOString(),
    problems,
    findings: [...findings, ...supersededSources(sources)],
    netAllowable_kPa,
    sources,
  };
}

async function citeDraft(tx: Transaction, context: Context, kept: DraftKept): Promise<CitedSource[]> {
  const sources = kept.fields.sources ?? [];
  if (sources.length === 0) return [];
  const cited = await citeSources(
    tx,
    context,
    sources.map(({ documentRevisionId }) => documentRevisionId),
  );
  return sources.flatMap((source) => {
    const of = cited.get(source.documentRevisionId);
    return of ? [{ ...of, ...source, confirmed: false }] : [];
  });
}

type RevisionRow = StatedFields & {
  id: ValueRevisionId;
  number: number;
  code: string;
  state: RevisionState;
  reasonCode: string;
  reason: string;
  contentHash: string;
  prepared: Signature;
  checked: Signature;
  issued: Signature | null;
  withdrawn: (Signature & { reason: string }) | null;
  sources: (Omit<CitedSource, "documentRevisionId"> & { documentRevisionId: DocumentRevisionId })[];
};

const signature = (person: string, at: string) =>
  sql.raw(`
  case when ${person}.id is not null then json_build_object('personId', ${person}.id, 'name', ${person}.name,
    'qualification', ${person}.qualification, 'at', ${at}) end`);

/** The revisions of a value, newest first, each compared with the one before it. */
async function readRevisions(tx: Transaction, context: Context, valueId: ValueId): Promise<ValueRevision[]> {
  const rows = await tx.execute<RevisionRow>(sql`
    select r.id, r.number, r.code, s.state, r.reason_code as "reasonCode", r.reason, r.content_hash as "contentHash",
      ${signature("pp", "r.prepared_at")} as prepared, ${signature("pc", "r.checked_at")} as checked,
      ${signature("pi", "s.issued_at")} as issued,
      case when pw.id is not null then json_build_object('personId', pw.id, 'name', pw.name,
        'qualification', pw.qualification, 'at', s.withdrawn_at, 'reason', s.withdrawal_reason) end as withdrawn,
      ${sql.raw(fieldColumns)},
      coalesce((select json_agg(json_build_object('documentRevisionId', c.document_revision_id, 'documentId', d.id,
          'reference', d.reference, 'title', d.title, 'code', dr.code,
          'supersededBy', case when d.current_revision_id is distinct from dr.id then dn.code end,
          'confirmed', exists (select from source_confirmation k where k.project_id = c.project_id
            and k.value_revision_id = c.value_revision_id and k.document_revision_id = d.current_revision_id),
          'page', c.page, 'clause', c.clause, 'note', c.note, 'holes', c.holes) order by c.ordinal)
        from value_source c
        join document_revision dr on dr.project_id = c.project_id and dr.id = c.document_revision_id
        join document d on d.project_id = c.project_id and d.id = dr.document_id
        left join document_revision dn on dn.project_id = c.project_id and dn.id = d.current_revision_id
        where c.project_id = r.project_id and c.value_revision_id = r.id), '[]') as sources
    from bearing_value_revision r
    join bearing_value_revision_state s on s.project_id = r.project_id and s.value_revision_id = r.id
    join person pp on pp.id = r.prepared_by
    join person pc on pc.id = r.checked_by
    left join person pi on pi.id = s.issued_by
    left join person pw on pw.id = s.withdrawn_by
    where r.project_id = ${context.projectId} and r.value_id = ${valueId}
    order by r.number desc`);
  const stated = rows.rows.map(statedRevision);
  return stated.map((revision, at) => {
    const before = stated[at + 1];
    return { ...revision, differences: before ? differences(before, revision) : [] };
  });
}

const columns: Record<keyof StatedFields, string> = {
  netAllowable_kPa: "net_allowable_kpa",
  given: "given",
  givenBasis: "given_basis",
  given_kPa: "given_kpa",
  givenOverburden_kPa: "given_overburden_kpa",
  factorConvention: "factor_convention",
  factorOfSafety: "factor_of_safety",
  comparedWith: "compared_with",
  loadBasis: "load_basis",
  governedBy: "governed_by",
  settlementLimit_mm: "settlement_limit_mm",
  settlementPredicted_mm: "settlement_predicted_mm",
  minBreadth_m: "min_breadth_m",
  maxBreadth_m: "max_breadth_m",
  minFoundingDepth_m: "min_founding_depth_m",
  highestFoundingLevel_m: "highest_founding_level_m",
  lowestFoundingLevel_m: "lowest_founding_level_m",
  groundwaterLevel_m: "groundwater_level_m",
  groundwaterBasis: "groundwater_basis",
  soilUnitWeight_kNm3: "soil_unit_weight_knm3",
  drainage: "drainage",
  transientIncrease: "transient_increase",
  transientFactor: "transient_factor",
  accidentalFactor: "accidental_factor",
  neighbours: "neighbours",
  conditions: "conditions",
  basis: "basis",
  confirmBy: "confirm_by",
  confirmWho: "confirm_who",
  purpose: "purpose",
};
const fieldNames = Object.keys(columns) as (keyof StatedFields)[];
const fieldColumns = fieldNames.map((name) => `r.${columns[name]} as "${name}"`).join(", ");

function statedRevision(row: RevisionRow): Omit<ValueRevision, "differences"> {
  const fields = Object.fromEntries(fieldNames.map((name) => [name, row[name]])) as unknown as StatedFields;
  const { id, number, code, state, sources, reasonCode, reason, contentHash } = row;
  const { prepared, checked, issued, withdrawn } = row;
  return {
    id,
    number,
    code,
    state,
    fields,
    sources,
    reasonCode,
    reason,
    contentHash,
    prepared,
    checked,
    issued,
    withdrawn,
  };
}
