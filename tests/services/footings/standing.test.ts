import { randomUUID } from "node:crypto";
import { type SQL, sql } from "drizzle-orm";
import { beforeAll, beforeEach, describe, expect, it } from "vitest";
import { client } from "@/db/client";
import type { FootingId, ValueId } from "@/lib/contracts/ids";
import { runChecks } from "@/lib/services/checks/run-checks";
import { listFootings } from "@/lib/services/footings/list-footings";
import { chooseLink } from "@/lib/services/links/choose-link";
import { freshDatabase } from "../../support/database";
import { lookInto, stored } from "../../support/site";
import {
  addReport,
  buildWorld,
  inside,
  issuedRevision,
  openValue,
  type World,
} from "../values/register-world";
import { makePad } from "./schedule";

let world: World;
let valueId: ValueId;
let moved: FootingId;
beforeAll(async () => {
  lookInto((await freshDatabase()).superuserUrl);
});

/** Two footings checked on one value; what is moved under the first must leave the second as it was, where it can. */
beforeEach(async () => {
  world = await buildWorld(`S-${randomUUID().slice(0, 8)}`);
  valueId = await openValue(world);
  await issuedRevision(world, valueId);
  await hole("BH1", 100);
  moved = await makePad(world, "F1");
  const other = await makePad(world, "F2", { easting_m: 300 });
  await chooseLink(world.structural, {
    footingIds: [moved, other],
    valueId,
    reason: "The zone's own gravel",
  });
  await runChecks(world.structural, { footingIds: [moved, other] });
});

async function hole(name: string, easting_m: number): Promise<string> {
  const [id, revision] = [randomUUID(), randomUUID()];
  await act(sql`insert into hole (project_id, id, name) values (${world.projectId}, ${id}, ${name})`);
  await holeRevision(id, revision, 1, easting_m);
  await act(sql`update hole set current_revision_id = ${revision} where id = ${id}`);
  return id;
}
const holeRevision = (id: string, revision: string, number: number, easting_m: number) =>
  act(sql`insert into hole_revision (project_id, id, hole_id, number, kind, easting_m, northing_m, recorded_by)
    values (${world.projectId}, ${revision}, ${id}, ${number}, 'CP', ${easting_m}, 100, ${world.preparer.person.id})`);
const act = (statement: SQL) => inside(world, (tx) => tx.execute(statement).then(() => undefined));
const reasons = async (): Promise<Record<string, string[]>> => {
  const { items } = await listFootings(world.reader, {});
  return Object.fromEntries(
    items.map(({ mark, check }) => [mark, check?.standing === "affected" ? check.reasons : []]),
  );
};

describe("the standing of a check", () => {
  it("is current while nothing has moved", async () => {
    expect(await reasons()).toEqual({ F1: [], F2: [] });
  });

  it("is affected by a link that is taken away or goes to another value, and by no other footing's link", async () => {
    const link = (to: ValueId | null) =>
      chooseLink(world.structural, {
        footingIds: [moved],
        valueId: to,
        reason: "TP4 was beside another footing",
      });
    await link(null);
    expect(await reasons()).toEqual({ F1: ["footing no longer linked to a value"], F2: [] });
    await link(valueId);
    expect(await reasons()).toEqual({ F1: [], F2: [] });
  });

  it("is affected by a revision of its value, in the codes of both", async () => {
    await issuedRevision(world, valueId, {
      given: "240 kPa",
      reasonCode: "error",
      reason: "A slip in the first issue",
    });
    expect(await reasons()).toEqual({
      F1: ["bearing value revised P01 → P02"],
      F2: ["bearing value revised P01 → P02"],
    });
  });

  it("is affected by a value that has no revision in force any more", async () => {
    await act(sql`update bearing_value set current_revision_id = null where id = ${valueId}`);
    expect((await reasons()).F1).toEqual(["bearing value P01 withdrawn"]);
  });

  it("is affected by a zone that is drawn anew", async () => {
    const drawn = randomUUID();
    await act(sql`insert into zone_revision (project_id, id, zone_id, number, ring_m, drawn_by)
      values (${world.projectId}, ${drawn}, ${world.zoneId}, 2, '[[0,0],[400,0],[400,400]]', ${world.preparer.person.id})`);
    await act(sql`update zone set current_revision_id = ${drawn} where id = ${world.zoneId}`);
    expect((await reasons()).F1).toEqual(["zone boundary moved"]);
  });

  it("is affected by a source of its value that is superseded, until a geotechnical engineer confirms the value", async () => {
    const [source] = await stored<{ document: string; revision: string }>(
      "select document_id as document, value_revision_id as revision from value_source s join document_revision d on d.id = s.document_revision_id where s.project_id = $1",
      [world.projectId],
    );
    const next = randomUUID();
    await inside(world, async (tx) => {
      await addReport(tx, world, randomUUID() as never, "GIR-99", "P01");
      await tx.execute(sql`insert into document_revision (project_id, id, document_id, number, code, status, received_on,
          file_name, media_type, size_bytes, sha256, object_key, uploaded_by)
        select project_id, ${next}, document_id, 2, 'P02', status, received_on, file_name, media_type, size_bytes, sha256,
          ${`documents/${next}`}, uploaded_by from document_revision where document_id = ${source?.document}`);
    });
    expect((await reasons()).F1).toEqual([]);
    await act(sql`update document set current_revision_id = ${next} where id = ${source?.document}`);
    expect(await reasons()).toEqual({
      F1: ["source GIR-01 superseded P01 → P02"],
      F2: ["source GIR-01 superseded P01 → P02"],
    });
    await act(sql`insert into source_confirmation (project_id, value_revision_id, document_revision_id, reason, confirmed_by)
      values (${world.projectId}, ${source?.revision}, ${next}, 'Only the cover was changed', ${world.preparer.person.id})`);
    expect(await reasons()).toEqual({ F1: [], F2: [] });
  });

  it("is affected by the log of a hole near it, and not by one too far to have been used", async () => {
    const [near] = await stored<{ id: string }>("select id from hole where project_id = $1", [
      world.projectId,
    ]);
    const far = await hole("BH9", 400);
    for (const id of [near?.id ?? "", far]) {
      const next = randomUUID();
      await holeRevision(id, next, 2, id === far ? 401 : 101);
      await act(sql`update hole set current_revision_id = ${next} where id = ${id}`);
    }
    expect(await reasons()).toEqual({ F1: ["log of BH1 revised"], F2: [] });
  });

  it("is affected by an inspection after it that found other ground, and not by one that found it as expected", async () => {
    const inspect = (footingId: FootingId, asExpected: boolean) =>
      act(sql`insert into inspection (project_id, footing_id, as_expected, description, accepted, inspected_at, inspected_by)
        values (${world.projectId}, ${footingId}, ${asExpected}, 'seen', ${asExpected}, now(), ${world.structural.person.id})`);
    const [other] = await stored<{ id: FootingId }>(
      "select id from footing where mark = 'F2' and project_id = $1",
      [world.projectId],
    );
    await inspect(moved, false);
    await inspect(other?.id as FootingId, true);
    expect(await reasons()).toEqual({ F1: ["inspection found other ground"], F2: [] });
  });

  it("is affected by other criteria, in both numbers", async () => {
    await act(sql`insert into criteria (project_id, number, sliding_factor, overturning_factor, uplift_factor,
        interface_angle_deg, adhesion_kpa, permanent_within_middle_third, transient_min_contact_ratio,
        accidental_min_contact_ratio, reason, set_by)
      select project_id, 2, 2, overturning_factor, uplift_factor, interface_angle_deg, adhesion_kpa,
        permanent_within_middle_third, transient_min_contact_ratio, accidental_min_contact_ratio, 'agreed', set_by
      from criteria where project_id = ${world.projectId} and number = 1`);
    await act(sql`update project set current_criteria = 2 where id = ${world.projectId}`);
    expect((await reasons()).F1).toEqual(["criteria changed 1 → 2"]);
  });

  it("is affected by a corrected method, and by nothing of a neighbour's", async () => {
    const neighbour = await buildWorld(`N-${randomUUID().slice(0, 8)}`);
    await issuedRevision(neighbour, await openValue(neighbour));
    expect(await reasons()).toEqual({ F1: [], F2: [] });
    const seen = await client().database.transaction(async (tx) => {
      await tx.execute(
        sql`select set_config('app.project_id', ${world.projectId}, true), set_config('app.engine', '99', true)`,
      );
      return tx.execute<{ standing: string; codes: string[]; reasons: string[] }>(
        sql`select standing, reason_codes as codes, reasons from check_standing`,
      );
    });
    expect(seen.rows.map(({ standing, codes }) => [standing, codes])).toEqual([
      ["affected", ["method"]],
      ["affected", ["method"]],
    ]);
    expect(seen.rows[0]?.reasons[0]).toMatch(/^method corrected .+ → 99$/);
  });

  it("filters the list exactly as it is shown", async () => {
    await chooseLink(world.structural, {
      footingIds: [moved],
      valueId: null,
      reason: "TP4 was beside another footing",
    });
    const marks = async (standing: "affected" | "current") =>
      (await listFootings(world.reader, { standing })).items.map(({ mark }) => mark);
    expect([await marks("affected"), await marks("current")]).toEqual([["F1"], ["F2"]]);
  });
});
