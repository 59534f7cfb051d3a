import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { explainCheck } from "@/lib/check/explain-check";
import type { FootingCheckResult } from "@/lib/check/input";
import {
  type CheckDetail,
  type CheckSnapshot,
  type ReadCheckInput,
  readCheckInput,
} from "@/lib/contracts/checks";
import type { ValueRevisionId } from "@/lib/contracts/ids";
import { contactOutline } from "@/lib/methods/base-pressure/index";
import { assertMay, type Context, inProject } from "../context";
import { NotFound } from "../errors";
import { parse } from "../parse";
import { selectChecks } from "./check-rows";

/** One stored check whole: what it was given, every figure and step, where its value comes from, how it stands now. */
export async function readCheck(context: Context, given: ReadCheckInput): Promise<CheckDetail> {
  assertMay(context, "project:read");
  const { checkId } = parse(readCheckInput, given);
  return inProject(context, async (tx) => {
    const [row] = await selectChecks(tx, context, sql`c.id = ${checkId}`, 1);
    if (!row) throw new NotFound("There is no such check in this project.");
    const stored = await tx.execute<{ snapshot: CheckSnapshot; result: FootingCheckResult }>(sql`
      select snapshot, result from footing_check where project_id = ${context.projectId} and id = ${checkId}`);
    const [whole] = stored.rows;
    if (!whole) throw new Error("A check that was listed is not stored.");
    const { footing } = whole.snapshot.input;
    return {
      ...row,
      ...whole,
      explained: explainCheck(whole.snapshot.input, whole.result),
      contactPolygons_m: whole.result.combinations.map(
        ({ baseVertical_kN, momentB_kNm, momentL_kNm }) =>
          contactOutline({
            breadth_m: footing.breadth_m,
            length_m: footing.length_m,
            vertical_kN: baseVertical_kN,
            momentB_kNm,
            momentL_kNm,
          }).contactPolygon_m,
      ),
      value: await pinnedValue(tx, context, row.valueRevisionId),
    };
  });
}

/** The pinned revision in the words that a reader of the check needs beside its figures. */
async function pinnedValue(
  tx: Transaction,
  context: Context,
  id: ValueRevisionId,
): Promise<CheckDetail["value"]> {
  const { rows } = await tx.execute<CheckDetail["value"]>(sql`
    select z.name as zone, 'Unit ' || u.code || ', ' || u.name as "groundUnit", u.soil, r.basis, r.conditions, r.given,
      r.given_basis as "givenBasis", r.governed_by as "governedBy",
      coalesce((select json_agg(json_build_object('reference', d.reference, 'code', dr.code, 'page', s.page,
          'clause', s.clause) order by s.ordinal)
        from value_source s
        join document_revision dr on dr.project_id = s.project_id and dr.id = s.document_revision_id
        join document d on d.project_id = s.project_id and d.id = dr.document_id
        where s.project_id = r.project_id and s.value_revision_id = r.id), '[]'::json) as sources
    from bearing_value_revision r
    join bearing_value v on v.project_id = r.project_id and v.id = r.value_id
    join zone z on z.project_id = v.project_id and z.id = v.zone_id
    join ground_unit u on u.project_id = v.project_id and u.id = v.ground_unit_id
    where r.project_id = ${context.projectId} and r.id = ${id}`);
  const [value] = rows;
  if (!value) throw new Error("A check without the revision that it pins.");
  return value;
}
