import { sql } from "drizzle-orm";
import type { Transaction } from "@/db/client";
import {
  type FootingDetail,
  type FootingGeometry,
  type FootingLoads,
  type LinkEvent,
  type ReadFootingInput,
  readFootingInput,
  type StageEvent,
} from "@/lib/contracts/footings";
import type { FootingId } from "@/lib/contracts/ids";
import { isAnswered, lastAnswer } from "../changes/answered";
import { selectChecks } from "../checks/check-rows";
import { gatherCriteria } from "../checks/gather";
import { gatherHoles, holeGrid, holesNear } from "../checks/holes-near";
import { assertMay, type Context, inProject } from "../context";
import { NotFound } from "../errors";
import { isoMoment } from "../iso-moment";
import { parse } from "../parse";
import { selectFootings } from "./footing-rows";
import { holdsOf } from "./hold";

/** One footing with the whole of its history: sizes, loads, links, stages, checks, and what waits for an answer. */
export async function readFooting(context: Context, given: ReadFootingInput): Promise<FootingDetail> {
  assertMay(context, "project:read");
  const { footingId } = parse(readFootingInput, given);

  return inProject(context, async (tx) => {
    const [item] = await selectFootings(tx, context, [footingId]);
    if (!item) throw new NotFound("There is no such footing in this project.");
    const { concrete, issue } = await holdsOf(tx, context, footingId);
    return {
      ...item,
      geometry: await geometryHistory(tx, context, footingId),
      loads: await loadHistory(tx, context, footingId),
      links: await linkHistory(tx, context, footingId),
      stageEvents: await stageHistory(tx, context, footingId),
      checks: await selectChecks(tx, context, sql`c.footing_id = ${footingId}`, 200),
      openConsequences: await openConsequences(tx, context, footingId),
      holesNear: await near(tx, context, item),
      hold: concrete ?? issue,
    };
  });
}

async function geometryHistory(tx: Transaction, context: Context, id: FootingId): Promise<FootingGeometry[]> {
  const { rows } = await tx.execute<FootingGeometry>(sql`
    select g.number, g.easting_m, g.northing_m, g.orientation_deg, g.breadth_m, g.length_m, g.thickness_m,
      g.ground_level_m as "groundLevel_m", g.founding_level_m as "foundingLevel_m", g.load_height_m as "loadHeight_m",
      g.concrete_unit_weight_knm3 as "concreteUnitWeight_kNm3", g.backfill_unit_weight_knm3 as "backfillUnitWeight_kNm3",
      g.note, p.name as "recordedBy", ${isoMoment(sql`g.recorded_at`)} as "recordedAt"
    from footing_revision g join person p on p.id = g.recorded_by
    where g.project_id = ${context.projectId} and g.footing_id = ${id} order by g.number desc limit 200`);
  return rows;
}

async function loadHistory(tx: Transaction, context: Context, id: FootingId): Promise<FootingLoads[]> {
  const { rows } = await tx.execute<FootingLoads>(sql`
    select l.id, l.number, l.load_basis as "loadBasis", l.source, l.combinations, p.name as "recordedBy",
      ${isoMoment(sql`l.recorded_at`)} as "recordedAt"
    from load_set l join person p on p.id = l.recorded_by
    where l.project_id = ${context.projectId} and l.footing_id = ${id} order by l.number desc limit 50`);
  return rows;
}

async function linkHistory(tx: Transaction, context: Context, id: FootingId): Promise<LinkEvent[]> {
  const { rows } = await tx.execute<LinkEvent>(sql`
    select l.number, case when v.id is not null then json_build_object('id', v.id, 'reference', v.reference) end as value,
      l.how, l.reason, p.name as "linkedBy", ${isoMoment(sql`l.linked_at`)} as "linkedAt"
    from footing_link l join person p on p.id = l.linked_by
    left join bearing_value v on v.project_id = l.project_id and v.id = l.value_id
    where l.project_id = ${context.projectId} and l.footing_id = ${id} order by l.number desc limit 200`);
  return rows;
}

async function stageHistory(tx: Transaction, context: Context, id: FootingId): Promise<StageEvent[]> {
  const { rows } = await tx.execute<StageEvent>(sql`
    select e.number, e.stage, e.reached_on as "reachedOn", e.note, p.name as "recordedBy",
      ${isoMoment(sql`e.recorded_at`)} as "recordedAt"
    from stage_event e join person p on p.id = e.recorded_by
    where e.project_id = ${context.projectId} and e.footing_id = ${id} order by e.number desc limit 200`);
  return rows;
}

async function openConsequences(tx: Transaction, context: Context, id: FootingId) {
  const { rows } = await tx.execute<FootingDetail["openConsequences"][number]>(sql`
    select q.id, q.change_id as "changeId", h.title, q.outcome, ${isoMoment(sql`h.made_at`)} as "madeAt"
    from consequence q
    join change h on h.project_id = q.project_id and h.id = q.change_id
    ${lastAnswer}
    where q.project_id = ${context.projectId} and q.footing_id = ${id} and not ${isAnswered}
    order by h.seq desc limit 50`);
  return rows;
}

async function near(tx: Transaction, context: Context, at: { easting_m: number; northing_m: number }) {
  const { nearestHoleLimit_m } = await gatherCriteria(tx, context);
  const holes = await gatherHoles(tx, context);
  return holesNear(holeGrid(holes, nearestHoleLimit_m), at).map(({ hole, distance_m }) => ({
    id: hole.id,
    name: hole.name,
    distance_m,
  }));
}
