import { randomUUID } from "node:crypto";
import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import { ENGINE_VERSION } from "@/lib/check/version";
import {
  type NotChecked,
  type RunChecksAnswer,
  type RunChecksInput,
  runChecksInput,
} from "@/lib/contracts/checks";
import type { CheckId, FootingId, ValueId } from "@/lib/contracts/ids";
import { audit } from "../audit";
import { answerByCheck } from "../changes/answer-by-check";
import { assertMay, type Context, inProject } from "../context";
import { Conflict, NotFound } from "../errors";
import { faultPoint } from "../faults";
import { parse } from "../parse";
import { type Gathered, type GatheredFooting, gatherForFootings, type ValueTerms } from "./gather";
import { gatherHoles, type HoleGrid, holeGrid, holesNear } from "./holes-near";
import { runCheck, snapshotOf } from "./run-check";
import { type MadeCheck, storeChecks } from "./store-checks";

/** Ten thousand footings are four statements of this many; the JSON of one lies well below what a statement may hold. */
const BATCH = 2500;
/** How many footings that could not be checked an answer names. */
const NAMED = 1000;

/**
 * Checks one footing, a selection, or all that are linked, each against the revision of its value that is in force.
 * Stores every check with its snapshot and pins, and answers the open consequences of those footings. A footing that
 * has no applicable value, or no loads, is named with the reason and the others go on.
 */
export async function runChecks(context: Context, given: RunChecksInput): Promise<RunChecksAnswer> {
  assertMay(context, "check:run");
  const { footingIds } = parse(runChecksInput, given);

  return inProject(context, async (tx) => {
    const ids = await holdStill(tx, context, footingIds);
    const gathered = await gatherForFootings(tx, context, ids);
    const grid = holeGrid(await gatherHoles(tx, context), gathered.criteria.nearestHoleLimit_m);
    await faultPoint("check:gathered");

    const counts = { passes: 0, fails: 0, "outside conditions": 0 };
    const notChecked: NotChecked[] = [];
    const kept: { footingId: FootingId; checkId: CheckId }[] = [];
    for (let from = 0; from < gathered.footings.length; from += BATCH) {
      const made: MadeCheck[] = [];
      for (const footing of gathered.footings.slice(from, from + BATCH)) {
        const check = checkOne(footing, gathered, grid);
        if (typeof check === "string") {
          notChecked.push({ footingId: footing.id, mark: footing.mark, reason: check });
          continue;
        }
        made.push(check);
        counts[check.verdict] += 1;
        kept.push({ footingId: check.footingId, checkId: check.id });
      }
      await storeChecks(tx, context, made);
      await faultPoint("check:batch");
    }
    const answered = await answerByCheck(tx, context, kept);
    await faultPoint("check:answered");
    const [first] = kept;
    await audit(tx, context, {
      verb: "check:run",
      subject: kept.length === 1 && first ? `footing/${first.footingId}` : `project/${context.projectId}`,
      detail: {
        asked: footingIds ? footingIds.length : "all",
        checked: kept.length,
        counts,
        answered,
        notChecked: notChecked.slice(0, NAMED).map(({ mark, reason }) => ({ mark, reason })),
        ...(kept.length === 1 && first ? { checkId: first.checkId } : {}),
      },
    });
    return {
      checked: kept.length,
      counts,
      answered,
      notCheckedCount: notChecked.length,
      notChecked: notChecked.slice(0, NAMED),
      checkId: kept.length === 1 && first ? first.checkId : null,
    };
  });
}

/**
 * Holds still what the checks will pin: the criteria in force, the footings, and the entries of their values. Whoever
 * issues a revision or changes a footing meanwhile waits, and then finds these checks made.
 */
async function holdStill(
  tx: Transaction,
  context: Context,
  asked: readonly FootingId[] | undefined,
): Promise<FootingId[]> {
  await tx.execute(sql`select 1 from project where id = ${context.projectId} for share`);
  const wanted = asked ? [...new Set(asked)] : undefined;
  const which = wanted ? sql`id = any(${sql.param(wanted)}::uuid[])` : sql`value_id is not null`;
  const { rows } = await tx.execute<{ id: FootingId; valueId: ValueId | null }>(sql`
    select id, value_id as "valueId" from footing where project_id = ${context.projectId} and ${which}
    order by id for no key update`);
  if (wanted && rows.length < wanted.length)
    throw new NotFound("One of these footings is not in this project.");
  if (rows.length === 0)
    throw new Conflict("No footing is linked to a bearing value yet. Link footings first.");
  const values = [...new Set(rows.map(({ valueId }) => valueId))].filter((id) => id !== null);
  await tx.execute(sql`
    select 1 from bearing_value where project_id = ${context.projectId} and id = any(${sql.param(values)}::uuid[])
    order by id for share`);
  return rows.map(({ id }) => id);
}

/** The check of one footing with its pins, or a sentence that says why there can be none. */
function checkOne(footing: GatheredFooting, gathered: Gathered, grid: HoleGrid): MadeCheck | string {
  const { valueId, valueRevisionId, zoneRevisionId, loadSetId, loadBasis, combinations } = footing;
  if (!valueId) return "No applicable value: the footing is linked to no bearing value.";
  const terms: ValueTerms | undefined = valueRevisionId ? gathered.terms.get(valueRevisionId) : undefined;
  if (!valueRevisionId || !terms)
    return "No applicable value: the bearing value has no revision in force (never issued, or withdrawn).";
  if (!zoneRevisionId) return "No applicable value: the zone of the bearing value has no boundary.";
  if (!loadSetId || loadBasis === null || combinations === null)
    return "The footing has no load combinations yet.";
  const near = holesNear(grid, footing);
  const snapshot = snapshotOf(
    { ...footing, combinations, loadBasis },
    terms,
    gathered.criteria,
    near.map(({ hole }) => hole.name),
  );
  const result = runCheck(snapshot);
  return {
    id: randomUUID() as CheckId,
    footingId: footing.id,
    footingRevisionId: footing.footingRevisionId,
    loadSetId,
    valueId,
    valueRevisionId,
    valueKind: terms.kind,
    netAllowable_kPa: terms.netAllowable_kPa,
    criteriaNumber: gathered.criteria.number,
    zoneRevisionId,
    holeRevisionIds: near.map(({ hole }) => hole.revisionId),
    engineVersion: ENGINE_VERSION,
    verdict: result.verdict,
    utilisation: finite(result.utilisation),
    utilisationBearing: finite(result.utilisationBearing),
    requiredNet_kPa: finite(result.requiredNet_kPa),
    maxPressure_kPa: finite(result.maxPressure_kPa),
    minContactRatio: finite(result.minContactRatio),
    factorSliding: finite(result.factorSliding),
    factorOverturning: finite(result.factorOverturning),
    factorUplift: finite(result.factorUplift),
    governingCombination: result.governingCombination ?? "",
    snapshot: JSON.stringify(snapshot),
    result: JSON.stringify(result),
  };
}

/** A figure that has no number (nothing applied, no equilibrium) is kept as none. */
const finite = (figure: number | null | undefined): number | null =>
  typeof figure === "number" && Number.isFinite(figure) ? figure : null;
