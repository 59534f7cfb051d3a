import { randomUUID } from "node:crypto";
import { sql } from "drizzle-orm";
import type pg from "pg";
import { client } from "@/db/client";
import type { CreateFootingInput, LoadCombination } from "@/lib/contracts/footings";
import type { FootingId } from "@/lib/contracts/ids";
import { createFooting } from "@/lib/services/footings/create-footing";
import { inside, type World } from "../values/register-world";

export const combination = (over: Partial<LoadCombination> = {}): LoadCombination => ({
  name: "G + Q",
  duration: "permanent",
  vertical_kN: 600,
  momentB_kNm: 30,
  momentL_kNm: 0,
  horizontalB_kN: 10,
  horizontalL_kN: 0,
  ...over,
});

/** A pad of 2.0 m by 2.4 m in the middle of the world's zone, founded 1.2 m down, on two combinations. */
export const padInput = (mark: string, over: Partial<CreateFootingInput> = {}): CreateFootingInput => ({
  mark,
  easting_m: 100,
  northing_m: 100,
  breadth_m: 2,
  length_m: 2.4,
  thickness_m: 0.6,
  groundLevel_m: 11.2,
  foundingLevel_m: 10,
  loads: {
    loadBasis: "characteristic-full",
    source: "Frame model, issue 2",
    combinations: [combination(), combination({ name: "G + W", duration: "transient", momentB_kNm: 60 })],
  },
  ...over,
});

/** Registers a pad as the structural engineer does. */
export const makePad = async (
  world: World,
  mark: string,
  over: Partial<CreateFootingInput> = {},
): Promise<FootingId> => (await createFooting(world.structural, padInput(mark, over))).id;

/**
 * Registers many pads at once, past the verbs: `combinations` each, linked to a value where one is given. For tests of
 * how much work an action takes.
 */
export async function makeMany(
  world: World,
  count: number,
  given: { valueId?: string; combinations?: number } = {},
): Promise<void> {
  const { valueId = null, combinations = 8 } = given;
  const loads = Array.from({ length: combinations }, (_, i) =>
    combination({
      name: `C${i + 1}`,
      duration: i % 3 === 0 ? "permanent" : "transient",
      momentB_kNm: 10 + 5 * i,
    }),
  );
  const salt = randomUUID().slice(0, 4);
  await inside(world, (tx) =>
    tx.execute(sql`
      with pad as (
        insert into footing (project_id, mark, owner_id, current_revision_id, current_load_set_id, value_id)
        select ${world.projectId}, ${`M${salt}-`} || i, ${world.structural.person.id}, gen_random_uuid(), gen_random_uuid(),
          ${valueId}::uuid
        from generate_series(1, ${count}::int) i returning *),
      size as (
        insert into footing_revision (project_id, id, footing_id, number, easting_m, northing_m, breadth_m, length_m,
          thickness_m, ground_level_m, founding_level_m, load_height_m, recorded_by)
        select project_id, current_revision_id, id, 1, 10 + (row_number() over ())::int % 400, 100, 2, 2.4, 0.6, 11.2,
          10, 0.6, owner_id from pad)
      insert into load_set (project_id, id, footing_id, number, combinations, load_basis, recorded_by)
      select project_id, current_load_set_id, id, 1, ${JSON.stringify(loads)}::jsonb, 'characteristic-full', owner_id
      from pad`),
  );
}

/** Counts the statements that reach the database while something is done. */
export async function statementsOf(act: () => Promise<unknown>): Promise<string[]> {
  const seen: string[] = [];
  const { pool } = client();
  const spy = (connection: pg.PoolClient) => {
    const watched = connection as pg.PoolClient & { plain?: pg.PoolClient["query"] };
    const plain = watched.plain ?? connection.query;
    watched.plain = plain;
    connection.query = ((...given: unknown[]) => {
      const [first] = given;
      seen.push(typeof first === "string" ? first : String((first as { text?: string }).text));
      return (plain as (...all: unknown[]) => unknown).apply(connection, given);
    }) as typeof connection.query;
  };
  pool.on("acquire", spy);
  try {
    await act();
  } finally {
    pool.off("acquire", spy);
  }
  return seen;
}
