import { randomUUID } from "node:crypto";
import { sql } from "drizzle-orm";
import { client } from "@/db/client";
import type { ValueId } from "@/lib/contracts/ids";
import { listFootings } from "@/lib/services/footings/list-footings";
import { issueRevision } from "@/lib/services/revisions/issue-revision";
import { addPads, checkPads } from "@/tests/services/values/footings-in-bulk";
import {
  buildWorld,
  checkedRevision,
  freshPlace,
  inside,
  issuedRevision,
  openValue,
  type World,
} from "@/tests/services/values/register-world";
import { type Comparison, compare } from "./measure";

async function linked(world: World, count: number, prefix: string): Promise<ValueId> {
  const place = await freshPlace(world);
  const valueId = await openValue({ ...world, ...place });
  await issuedRevision(world, valueId);
  for (let from = 0; from < count; from += 10_000) {
    const pads = Array.from({ length: Math.min(10_000, count - from) }, (_, at) => ({
      vertical_kN: 500 + ((from + at) % 500),
      mark: `${prefix}${String(from + at).padStart(7, "0")}`,
    }));
    await checkPads(world, await addPads(world, valueId, pads, 8));
  }
  return valueId;
}

/** Issuing a revision that touches 10,000 footings against a bare INSERT … SELECT of as many rows into the same table. */
async function issue(count: number, repetitions: number): Promise<Comparison> {
  const world = await buildWorld(`ISSUE-${count}`);
  const valueId = await linked(world, count, "I");
  let next = await checkedRevision(world, valueId);
  let at = 0;
  let peak_MB = 0;
  const result = await compare({
    what: `issue of a revision with ${count} linked footings × 8 combinations against INSERT … SELECT of ${count} rows into the same table`,
    goal: "at most 3 ×",
    repetitions,
    before: async () => {
      if (at % 2 === 0) next = await checkedRevision(world, valueId, { given: `${200 + (at % 80)} kPa` });
      at += 1;
      await client().pool.query("select 1");
      globalThis.gc?.();
    },
    ours: async () => {
      await issueRevision(world.issuer, { valueId, revisionId: next.revisionId, revision: next.revision });
      peak_MB = Math.max(peak_MB, process.memoryUsage().rss / 1e6);
    },
    bare: () =>
      inside(world, async (tx) => {
        const change = await tx.execute<{ id: string }>(sql`
          insert into change (project_id, id, kind, subject_id, title, reason, made_by)
          values (${world.projectId}, ${randomUUID()}, 'value-issued', ${valueId}, 'bare', 'bare', ${world.lead.person.id})
          returning id`);
        await tx.execute(sql`
          insert into consequence (project_id, change_id, footing_id, check_id, outcome, verdict_before, verdict_after,
            utilisation_before, utilisation_after, required_net_kpa, stage)
          select c.project_id, ${change.rows[0]?.id}::uuid, c.footing_id, c.id, 'holds', c.verdict, c.verdict,
            c.utilisation, c.utilisation, c.required_net_kpa, f.stage
          from footing f join footing_check c on c.project_id = f.project_id and c.id = f.latest_check_id
          where f.project_id = ${world.projectId} and f.value_id = ${valueId}`);
      }),
  });
  return { ...result, note: `${result.note} peak memory of this process ${peak_MB.toFixed(0)} MB`.trim() };
}

/** The first page of affected footings, through the verb, against the bare indexed query for as many rows. */
async function affected(): Promise<Comparison> {
  const world = await buildWorld("AFFECTED");
  const valueId = await linked(world, 100_000, "A");
  await issuedRevision(world, valueId, { given: "200 kPa" });
  await inside(world, (tx) => tx.execute(sql`select 1`));
  const owner = process.env.DATABASE_OWNER_URL;
  if (!owner) throw new Error("DATABASE_OWNER_URL is not set.");
  const { Client } = (await import("pg")).default;
  const maintenance = new Client({ connectionString: owner });
  await maintenance.connect();
  await maintenance.query("vacuum analyze");
  await maintenance.end();
  return compare({
    what: "first 50 affected of 100,000 footings through the verb against the bare indexed query",
    goal: "at most 2 × (asked for at 1,000,000)",
    repetitions: 21,
    warmUps: 3,
    ours: async () => {
      await listFootings(world.structural, { valueId, standing: "affected", limit: 50, counts: "no" });
    },
    bare: () =>
      inside(world, async (tx) => {
        await tx.execute(sql`select f.id, f.mark, c.verdict, c.utilisation, c.required_net_kpa, c.value_revision_id
          from footing f join footing_check c on c.project_id = f.project_id and c.id = f.latest_check_id
          join bearing_value v on v.project_id = f.project_id and v.id = f.value_id
          where f.project_id = ${world.projectId} and f.value_id = ${valueId}
            and c.value_revision_id is distinct from v.current_revision_id
          order by f.mark collate natural_order, f.id limit 50`);
      }),
  });
}

export async function register(large: boolean): Promise<Comparison[]> {
  const results = [await issue(10_000, 9)];
  if (large) results.push(await issue(100_000, 3));
  results.push(await affected());
  return results;
}
