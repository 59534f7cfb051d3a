import { randomUUID } from "node:crypto";
import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import {
  type AcceptLoadImportInput,
  acceptLoadImportInput,
  type ImportAnswer,
  type ImportPreview,
  type PreviewLoadImportInput,
  previewLoadImportInput,
} from "@/lib/contracts/footings";
import { readLoadsCsv } from "@/lib/exchange/csv/loads";
import { audit } from "../audit";
import { recordChange } from "../changes/record-change";
import { assertMay, type Context, inProject, sha256 } from "../context";
import { Conflict, Invalid } from "../errors";
import { faultPoint } from "../faults";
import { previewOf } from "../footings/import-footings";
import { holdRegister } from "../footings/import-register";
import { parse } from "../parse";
import { type LoadPlan, type LoadsRegistered, type PlannedLoads, planLoadImport } from "./load-plan";

/** Shows what a file of load combinations would do to the footings it names. Nothing is written. */
export async function previewLoadImport(
  context: Context,
  given: PreviewLoadImportInput,
): Promise<ImportPreview> {
  assertMay(context, "footing:write");
  const { content, loadBasis } = parse(previewLoadImportInput, given);
  const reading = readLoadsCsv(content);
  return inProject(context, async (tx) => {
    const plan = planLoadImport(reading, await gatherLoads(tx, context), loadBasis);
    return previewOf(reading, plan, fingerprintOf(content, loadBasis, plan));
  });
}

/** Takes a file of load combinations into the register, whole or not at all. */
export async function acceptLoadImport(
  context: Context,
  given: AcceptLoadImportInput,
): Promise<ImportAnswer> {
  assertMay(context, "footing:write");
  const { content, fileName, loadBasis, source, fingerprint, reason } = parse(acceptLoadImportInput, given);
  const reading = readLoadsCsv(content);
  if (reading.refused) throw new Invalid(reading.refused, { content: reading.refused });

  return inProject(context, async (tx) => {
    await holdRegister(tx, context);
    const plan = planLoadImport(reading, await gatherLoads(tx, context), loadBasis);
    if (fingerprintOf(content, loadBasis, plan) !== fingerprint)
      throw new Conflict("The register has changed since the preview. Look at what the file would do now.");
    if (plan.inError > 0)
      throw new Invalid(
        `${plan.inError} ${plan.inError === 1 ? "row is" : "rows are"} in error. Nothing was written.`,
        {
          content:
            "Correct the rows in error: without one of its combinations a footing would be checked for too little.",
        },
      );
    const written = plan.rows.filter(({ what }) => what !== "unchanged");
    await storeLoads(tx, context, written, { loadBasis, source: source || fileName });
    await faultPoint("import:loads");
    const checked = written.flatMap(({ before }) => (before.hasCheck ? [before.id] : []));
    if (checked[0])
      await recordChange(tx, context, {
        kind: "loads-changed",
        subjectId: checked[0],
        title: `Loads of ${checked.length} checked ${checked.length === 1 ? "footing" : "footings"} changed by import${fileName ? ` of ${fileName}` : ""}`,
        reason: reason || `Imported${fileName ? ` from ${fileName}` : ""}.`,
        footingIds: checked,
      });
    const answer = {
      new: written.filter(({ what }) => what === "new").length,
      changed: written.filter(({ what }) => what === "changed").length,
      unchanged: plan.rows.length - written.length,
      leftOut: 0,
    };
    await audit(tx, context, {
      verb: "loads:import",
      subject: `project/${context.projectId}`,
      detail: {
        fileName,
        sha256: sha256(content),
        loadBasis,
        source,
        ...answer,
        reason,
        marks: written.map(({ mark }) => mark),
      },
    });
    return answer;
  });
}

/** One statement: every footing with its loads in force. */
async function gatherLoads(tx: Transaction, context: Context): Promise<LoadsRegistered[]> {
  const { rows } = await tx.execute<LoadsRegistered>(sql`
    select f.id, f.mark, l.id as "loadSetId", coalesce(l.number, 0) as number, l.load_basis as "loadBasis",
      coalesce(l.combinations, '[]'::jsonb) as combinations, f.latest_check_id is not null as "hasCheck"
    from footing f left join load_set l on l.project_id = f.project_id and l.id = f.current_load_set_id
    where f.project_id = ${context.projectId} order by f.mark collate natural_order`);
  return rows;
}

/** Writes the next load set of each footing and points to it: two statements whatever the number. */
async function storeLoads(
  tx: Transaction,
  context: Context,
  planned: readonly PlannedLoads[],
  given: { loadBasis: string; source: string },
): Promise<void> {
  if (planned.length === 0) return;
  const setIds = planned.map(() => randomUUID());
  const footingIds = sql.param(planned.map(({ before }) => before.id));
  await tx.execute(sql`
    insert into load_set (project_id, recorded_by, load_basis, source, id, footing_id, number, combinations)
    select ${context.projectId}::uuid, ${context.person.id}::uuid, ${given.loadBasis}, ${given.source}, n.id, n.footing_id,
      n.number, n.combinations::jsonb
    from unnest(${sql.param(setIds)}::uuid[], ${footingIds}::uuid[],
      ${sql.param(planned.map(({ before }) => before.number + 1))}::int[],
      ${sql.param(planned.map(({ combinations }) => JSON.stringify(combinations)))}::text[])
      as n(id, footing_id, number, combinations)`);
  await tx.execute(sql`
    update footing f set current_load_set_id = n.load_set_id, revision = f.revision + 1
    from unnest(${footingIds}::uuid[], ${sql.param(setIds)}::uuid[]) as n(footing_id, load_set_id)
    where f.project_id = ${context.projectId} and f.id = n.footing_id`);
}

function fingerprintOf(content: string, loadBasis: string, plan: LoadPlan): string {
  const rows = plan.rows.map(({ mark, what, before, changes }) => [mark, what, before.loadSetId, changes]);
  return sha256(JSON.stringify([sha256(content), loadBasis, rows, plan.inError]));
}
