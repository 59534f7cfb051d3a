import { randomUUID } from "node:crypto";
import { type SQL, sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import type { FootingId, FootingRevisionId } from "@/lib/contracts/ids";
import type { Context } from "../context";
import { type Geometry, geometryNames, type PlannedFooting } from "./import-plan";

const columns: Record<keyof Geometry, SQL> = {
  easting_m: sql`easting_m`,
  northing_m: sql`northing_m`,
  orientation_deg: sql`orientation_deg`,
  breadth_m: sql`breadth_m`,
  length_m: sql`length_m`,
  thickness_m: sql`thickness_m`,
  groundLevel_m: sql`ground_level_m`,
  foundingLevel_m: sql`founding_level_m`,
  loadHeight_m: sql`load_height_m`,
  concreteUnitWeight_kNm3: sql`concrete_unit_weight_knm3`,
  backfillUnitWeight_kNm3: sql`backfill_unit_weight_knm3`,
};

type Stored = {
  footingId: FootingId;
  revisionId: FootingRevisionId;
  number: number;
  mark: string;
  note: string;
  geometry: Geometry;
};

/** Writes the new footings and the next revisions of the changed ones: three statements whatever the number. */
export async function storeFootings(
  tx: Transaction,
  context: Context,
  plan: { added: readonly PlannedFooting[]; changed: readonly PlannedFooting[]; source: string },
): Promise<void> {
  const stored = (row: PlannedFooting): Stored => ({
    footingId: row.before?.id ?? (randomUUID() as FootingId),
    revisionId: randomUUID() as FootingRevisionId,
    number: (row.before?.number ?? 0) + 1,
    mark: row.mark,
    note: [row.note, plan.source && `Imported from ${plan.source}.`].filter(Boolean).join(" "),
    geometry: row.geometry,
  });
  const added = plan.added.map(stored);
  const changed = plan.changed.map(stored);
  if (added.length > 0)
    await tx.execute(sql`
      insert into footing (project_id, owner_id, id, mark, current_revision_id)
      select ${context.projectId}::uuid, ${context.person.id}::uuid, n.*
      from unnest(${ids(added, "footingId")}::uuid[], ${sql.param(added.map(({ mark }) => mark))}::text[],
        ${ids(added, "revisionId")}::uuid[]) as n`);
  const all = [...added, ...changed];
  if (all.length > 0)
    await tx.execute(sql`
      insert into footing_revision (project_id, recorded_by, id, footing_id, number, note,
        ${sql.join(
          geometryNames.map((name) => columns[name]),
          sql`, `,
        )})
      select ${context.projectId}::uuid, ${context.person.id}::uuid, n.*
      from unnest(${ids(all, "revisionId")}::uuid[], ${ids(all, "footingId")}::uuid[],
        ${sql.param(all.map(({ number }) => number))}::int[], ${sql.param(all.map(({ note }) => note))}::text[],
        ${sql.join(
          geometryNames.map((name) => sql`${sql.param(all.map(({ geometry }) => geometry[name]))}::float8[]`),
          sql`, `,
        )}) as n`);
  if (changed.length > 0)
    await tx.execute(sql`
      update footing f set current_revision_id = n.revision_id, revision = f.revision + 1
      from unnest(${ids(changed, "footingId")}::uuid[], ${ids(changed, "revisionId")}::uuid[]) as n(footing_id, revision_id)
      where f.project_id = ${context.projectId} and f.id = n.footing_id`);
}

const ids = (rows: readonly Stored[], name: "footingId" | "revisionId") =>
  sql.param(rows.map((row) => row[name]));
