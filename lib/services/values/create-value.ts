import { sql } from "drizzle-orm";
import * as t from "@/db/schema";
import { type CreateValueInput, createValueInput } from "@/lib/contracts/values";
import { audit } from "../audit";
import { assertMay, type Context, inProject } from "../context";
import { Conflict, Invalid } from "../errors";
import { parse } from "../parse";

/** Opens the register's entry for one ground unit in one zone that carries it; refuses a second one for the pair. */
export async function createValue(context: Context, given: CreateValueInput) {
  assertMay(context, "value:draft");
  const { zoneId, groundUnitId, reference } = parse(createValueInput, given);

  return inProject(context, async (tx) => {
    // References are numbered by one hand at a time, so that two new entries never ask for the same number.
    await tx.execute(
      sql`select pg_advisory_xact_lock(hashtextextended(${`references ${context.projectId}`}, 0))`,
    );
    const found = await tx.execute<{
      zone: boolean;
      unit: boolean;
      carried: boolean;
      taken: string | null;
      same: boolean;
      next: string;
    }>(sql`
      select exists (select from zone where project_id = ${context.projectId} and id = ${zoneId}) as zone,
        exists (select from ground_unit where project_id = ${context.projectId} and id = ${groundUnitId}) as unit,
        exists (select from zone_ground_unit where project_id = ${context.projectId} and zone_id = ${zoneId}
          and ground_unit_id = ${groundUnitId}) as carried,
        (select reference from bearing_value where project_id = ${context.projectId} and zone_id = ${zoneId}
          and ground_unit_id = ${groundUnitId}) as taken,
        exists (select from bearing_value where project_id = ${context.projectId} and reference = ${reference ?? null}) as same,
        'BV-' || lpad((1 + coalesce(max(substring(reference from '^BV-(\\d{1,6})$')::int), 0))::text, 2, '0') as next
      from bearing_value where project_id = ${context.projectId}`);
    const seen = found.rows[0];
    if (!seen?.zone)
      throw new Invalid("One field needs another look.", {
        zoneId: "There is no such zone in this project.",
      });
    if (!seen.unit)
      throw new Invalid("One field needs another look.", {
        groundUnitId: "There is no such ground unit in this project.",
      });
    if (!seen.carried)
      throw new Invalid("One field needs another look.", {
        groundUnitId:
          "This zone does not carry that ground unit. Add the unit to the zone first, or choose another.",
      });
    if (seen.taken)
      throw new Conflict(
        `${seen.taken} already is the value of this ground unit in this zone. Revise that one.`,
        {
          reference: seen.taken,
        },
      );
    if (seen.same) throw new Conflict(`Another value already goes by the reference ${reference}.`);

    const [row] = await tx
      .insert(t.bearingValue)
      .values({ projectId: context.projectId, zoneId, groundUnitId, reference: reference ?? seen.next })
      .returning({
        id: t.bearingValue.id,
        reference: t.bearingValue.reference,
        revision: t.bearingValue.revision,
      });
    if (!row) throw new Error("An inserted value was not returned.");
    await audit(tx, context, {
      verb: "value:create",
      subject: `value/${row.id}`,
      detail: { ...row, zoneId, groundUnitId },
    });
    return row;
  });
}
