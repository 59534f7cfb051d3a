import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { PersonId, ValueId, ValueRevisionId } from "@/lib/contracts/ids";
import type { Context } from "../context";
import { NotFound } from "../errors";

export type LockedValue = {
  id: ValueId;
  reference: string;
  revision: number;
  currentRevisionId: ValueRevisionId | null;
  zone: string;
  groundUnit: string;
};

export type RevisionSeen = {
  id: ValueRevisionId;
  number: number;
  code: string;
  netAllowable_kPa: number | null;
  reason: string;
  preparedBy: PersonId;
  checkedBy: PersonId;
  preparer: string;
  checker: string;
  /** Who issued it and when, if it was issued; who withdrew it, if it was withdrawn. */
  issuer: string | null;
  issuedAt: string | null;
  withdrawer: string | null;
  /** A later revision of the same value, checked or issued: then this one has had its time. */
  later: string | null;
};

/** Locks the value's entry until commit: whoever else issues, withdraws, links or checks it waits here. */
export async function lockValue(tx: Transaction, context: Context, valueId: ValueId): Promise<LockedValue> {
  const rows = await tx.execute<LockedValue>(sql`
    select v.id, v.reference, v.revision, v.current_revision_id as "currentRevisionId", z.name as zone, u.name as "groundUnit"
    from bearing_value v
    join zone z on z.project_id = v.project_id and z.id = v.zone_id
    join ground_unit u on u.project_id = v.project_id and u.id = v.ground_unit_id
    where v.project_id = ${context.projectId} and v.id = ${valueId}
    for update of v`);
  const value = rows.rows[0];
  if (!value) throw new NotFound("There is no such bearing value in this project.");
  return value;
}

/** Reads, under that lock, the revision to act on and the one in force (the same row when they are one). */
export async function seeRevisions(
  tx: Transaction,
  context: Context,
  value: LockedValue,
  revisionId: ValueRevisionId,
): Promise<{ wanted: RevisionSeen; inForce: RevisionSeen | null }> {
  const rows = await tx.execute<RevisionSeen>(sql`
    select r.id, r.number, r.code, r.net_allowable_kpa as "netAllowable_kPa", r.reason, r.prepared_by as "preparedBy",
      r.checked_by as "checkedBy", pp.name as preparer, pc.name as checker, pi.name as issuer,
      i.issued_at as "issuedAt", pw.name as withdrawer,
      (select l.code from bearing_value_revision l where l.project_id = r.project_id and l.value_id = r.value_id
        and l.number > r.number order by l.number desc limit 1) as later
    from bearing_value_revision r
    join person pp on pp.id = r.prepared_by
    join person pc on pc.id = r.checked_by
    left join revision_issue i on i.project_id = r.project_id and i.value_revision_id = r.id
    left join person pi on pi.id = i.issued_by
    left join revision_withdrawal w on w.project_id = r.project_id and w.value_revision_id = r.id
    left join person pw on pw.id = w.withdrawn_by
    where r.project_id = ${context.projectId} and r.value_id = ${value.id}
      and (r.id = ${revisionId} or r.id = ${value.currentRevisionId})`);
  const wanted = rows.rows.find(({ id }) => id === revisionId);
  if (!wanted) throw new NotFound("There is no such revision of this value.");
  return { wanted, inForce: rows.rows.find(({ id }) => id === value.currentRevisionId) ?? null };
}

/** "14:05 UTC on 2026-12-01", for sentences that say who was first. */
export const when = (moment: string): string => {
  const iso = new Date(moment).toISOString();
  return `${iso.slice(11, 16)} UTC on ${iso.slice(0, 10)}`;
};

/** "BV-03 Terrace gravel, Zone B". */
export const nameOf = (value: LockedValue): string => `${value.reference} ${value.groundUnit}, ${value.zone}`;

/** A net pressure as titles give it. */
export const pressureOf = (revision: RevisionSeen): string =>
  revision.netAllowable_kPa === null ? "a table" : String(Number(revision.netAllowable_kPa.toPrecision(4)));
