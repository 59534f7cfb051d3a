import { randomUUID } from "node:crypto";
import { sql } from "drizzle-orm";
import { checkFooting } from "@/lib/check/check-footing";
import { ENGINE_VERSION } from "@/lib/check/version";
import type { CheckId, FootingId, ValueId } from "@/lib/contracts/ids";
import { gatherForFootings } from "@/lib/services/checks/gather";
import { storeChecks } from "@/lib/services/checks/store-checks";
import { toCheckInput } from "@/lib/services/checks/to-input";
import { inside, type World } from "./register-world";

type Loads = { vertical_kN: number; stage?: string; mark?: string };

/**
 * Links square pads of 2 m, 0.5 m thick, founded 1 m under ground at 10 m, to a value: 24 kN/m³ concrete, 18 kN/m³
 * backfill and soil, so that a central load N needs N/4 + 12 + 9 − 18 = N/4 + 3 kPa net, worked by hand. Each has as many
 * combinations of that load as asked for. Three statements whatever the number.
 */
export async function addPads(
  world: World,
  valueId: ValueId | null,
  pads: Loads[],
  combinations = 1,
): Promise<FootingId[]> {
  const ids = pads.map(() => randomUUID() as FootingId);
  const marks = pads.map(({ mark }, at) => mark ?? `P${String(at + 1).padStart(5, "0")}`);
  const loads = pads.map(({ vertical_kN }) =>
    JSON.stringify(
      Array.from({ length: combinations }, (_, at) => ({
        name: `C${at + 1}`,
        duration: "permanent",
        vertical_kN,
        momentB_kNm: 0,
        momentL_kNm: 0,
        horizontalB_kN: 0,
        horizontalL_kN: 0,
      })),
    ),
  );
  const person = world.structural.person.id;
  await inside(world, async (tx) => {
    await tx.execute(sql`
      insert into footing (project_id, id, mark, owner_id, stage, value_id)
      select ${world.projectId}::uuid, n.id, n.mark, ${person}::uuid, n.stage, ${valueId}::uuid
      from unnest(${sql.param(ids)}::uuid[], ${sql.param(marks)}::text[],
        ${sql.param(pads.map(({ stage }) => stage ?? "designed"))}::text[]) as n(id, mark, stage)`);
    await tx.execute(sql`
      with sized as (
        insert into footing_revision (project_id, footing_id, number, easting_m, northing_m, breadth_m, length_m,
          thickness_m, ground_level_m, founding_level_m, load_height_m, recorded_by)
        select ${world.projectId}::uuid, n.id, 1, 100, 100, 2, 2, 0.5, 11, 10, 0.5, ${person}::uuid
        from unnest(${sql.param(ids)}::uuid[]) as n(id) returning id, footing_id),
      loaded as (
        insert into load_set (project_id, footing_id, number, combinations, load_basis, recorded_by)
        select ${world.projectId}::uuid, n.id, 1, n.loads::jsonb, 'characteristic-full', ${person}::uuid
        from unnest(${sql.param(ids)}::uuid[], ${sql.param(loads)}::text[]) as n(id, loads) returning id, footing_id)
      update footing f set current_revision_id = sized.id, current_load_set_id = loaded.id
      from sized join loaded on loaded.footing_id = sized.footing_id
      where f.project_id = ${world.projectId} and f.id = sized.footing_id`);
  });
  return ids;
}

/** Checks footings against the value that they are linked to, as the check verb stores it. */
export async function checkPads(world: World, ids: readonly FootingId[]): Promise<void> {
  await inside(world, async (tx) => {
    const context = world.structural;
    const { footings, terms, criteria } = await gatherForFootings(tx, context, ids);
    const made = footings.map((footing) => {
      const stated = footing.valueRevisionId ? terms.get(footing.valueRevisionId) : undefined;
      if (!stated || !footing.loadSetId || !footing.combinations || !footing.zoneRevisionId)
        throw new Error(`${footing.mark} cannot be checked.`);
      const input = toCheckInput({ ...footing, combinations: footing.combinations }, stated, criteria);
      const result = checkFooting(input);
      return {
        id: randomUUID() as CheckId,
        footingId: footing.id,
        footingRevisionId: footing.footingRevisionId,
        loadSetId: footing.loadSetId,
        valueId: stated.valueId,
        valueRevisionId: stated.valueRevisionId,
        valueKind: stated.kind,
        netAllowable_kPa: stated.netAllowable_kPa,
        criteriaNumber: criteria.number,
        zoneRevisionId: footing.zoneRevisionId,
        holeRevisionIds: [],
        engineVersion: ENGINE_VERSION,
        verdict: result.verdict,
        utilisation: result.utilisation,
        utilisationBearing: result.utilisationBearing,
        requiredNet_kPa: result.requiredNet_kPa,
        maxPressure_kPa: result.maxPressure_kPa,
        minContactRatio: result.minContactRatio,
        factorSliding: result.factorSliding,
        factorOverturning: result.factorOverturning,
        factorUplift: result.factorUplift,
        governingCombination: result.governingCombination ?? "",
        snapshot: JSON.stringify(input),
        result: JSON.stringify(result),
      };
    });
    await storeChecks(tx, context, made);
  });
}
