import { beforeAll, describe, expect, it } from "vitest";
import { hashPassword } from "@/lib/services/accounts/passwords";
import { chooseLink } from "@/lib/services/links/choose-link";
import { makePad, padInput } from "../services/footings/schedule";
import { buildWorld, issuedRevision, openValue, type World } from "../services/values/register-world";
import { freshDatabase } from "../support/database";
import { type Browser, built, type RunningServer, signedInBrowser, startServer } from "../support/server";
import { asSuperuser, auditVerbs, lookInto, PASSWORD, stored } from "../support/site";

describe.runIf(built)("footings and checks over HTTP", () => {
  let server: RunningServer;
  let world: World;
  let neighbour: World;
  let structural: Browser;
  let reader: Browser;
  let stranger: Browser;
  const at = (path: string, of = world) => `/api/projects/${of.projectId}/${path}`;

  beforeAll(async () => {
    lookInto((await freshDatabase()).superuserUrl);
    world = await buildWorld("A-01");
    neighbour = await buildWorld("A-02");
    const hash = await hashPassword(PASSWORD);
    await asSuperuser((db) => db.query("update person set password_hash = $1", [hash]));
    server = await startServer();
    structural = await signedInBrowser(server.origin, world.structural.person.email, PASSWORD);
    reader = await signedInBrowser(server.origin, world.reader.person.email, PASSWORD);
    stranger = await signedInBrowser(server.origin, neighbour.structural.person.email, PASSWORD);
  });

  it("registers, reads with an ETag, and changes only for the one who saw what counts", async () => {
    const made = await structural.json(at("footings"), "POST", padInput("H1"));
    expect(made.status).toBe(201);
    const { id } = (await made.json()) as { id: string };
    const read = await structural.fetch(at(`footings/${id}`));
    expect(read.headers.get("etag")).toBe('"1"');
    const { loads: _, ...pad } = padInput("H1", { breadth_m: 2.2 });
    const change = (headers: Record<string, string>) =>
      structural.json(at(`footings/${id}`), "PUT", pad, headers);
    expect((await change({})).status).toBe(428);
    expect((await change({ "if-match": '"7"' })).status).toBe(412);
    expect((await change({ "if-match": '"1"' })).status).toBe(200);
    const [row] = await stored<{ n: number }>(
      "select count(*)::int as n from footing_revision where footing_id = $1",
      [id],
    );
    expect(row?.n).toBe(2);
  });

  it("gives the same answer to the same key and registers once", async () => {
    const key = { "idempotency-key": "register-H2-once" };
    const [first, second] = [
      await structural.json(at("footings"), "POST", padInput("H2"), key),
      await structural.json(at("footings"), "POST", padInput("H2"), key),
    ];
    expect([first.status, second.status]).toEqual([201, 201]);
    expect(await second.json()).toEqual(await first.json());
  });

  it("takes no bearing pressure into a check, whatever it is called", async () => {
    const footingId = await makePad(world, "H3");
    const before = await auditVerbs(world.projectId);
    for (const field of ["netAllowable_kPa", "value", "pressure", "valueRevisionId", "snapshot"]) {
      const answer = await structural.json(at("checks"), "POST", { footingIds: [footingId], [field]: 500 });
      expect([field, answer.status]).toEqual([field, 400]);
      expect(((await answer.json()) as { fields: object }).fields).toHaveProperty(field);
    }
    expect(await auditVerbs(world.projectId)).toEqual(before);
  });

  it("checks with the revision in force and lets every member read the check, and no neighbour", async () => {
    const valueId = await openValue(world);
    await issuedRevision(world, valueId);
    const footingId = await makePad(world, "H4");
    await chooseLink(world.structural, {
      footingIds: [footingId],
      valueId,
      reason: "The gravel is the same in TP4",
    });
    const run = await structural.json(at("checks"), "POST", { footingIds: [footingId] });
    expect(run.status).toBe(201);
    const { checkId } = (await run.json()) as { checkId: string };
    const kept = await reader.fetch(at(`checks/${checkId}`));
    expect(await kept.json()).toMatchObject({ netAllowable_kPa: 250, standing: "current" });
    expect((await stranger.fetch(at(`checks/${checkId}`))).status).toBe(404);
    expect((await stranger.fetch(at(`checks/${checkId}`, neighbour))).status).toBe(404);
    expect((await stranger.fetch(at(`footings/${footingId}`, neighbour))).status).toBe(404);
    expect((await reader.json(at("checks"), "POST", { footingIds: [footingId] })).status).toBe(403);
  });

  it("refuses a file that is too large before reading it, and a filter that is none in its field", async () => {
    const large = await structural.json(at("footings/import/preview"), "POST", {
      content: "x".repeat(17_100_000),
    });
    expect(large.status).toBe(413);
    const filter = await structural.fetch(at("footings?stage=built"));
    expect([filter.status, ((await filter.json()) as { fields: object }).fields]).toEqual([
      400,
      { stage: expect.any(String) },
    ]);
  });

  it("shows what a file would do and writes only what was shown", async () => {
    const content =
      "mark,easting,northing,breadth,length,thickness,ground level,founding level\r\nH9,150,150,2,2,0.5,11.2,10\r\n";
    const preview = await structural.json(at("footings/import/preview"), "POST", { content });
    const { fingerprint, counts } = (await preview.json()) as { fingerprint: string; counts: object };
    expect(counts).toMatchObject({ new: 1, inError: 0 });
    const changed = content.replace("H9,150", "H9,151");
    expect(
      (await structural.json(at("footings/import"), "POST", { content: changed, fingerprint })).status,
    ).toBe(409);
    expect((await structural.json(at("footings/import"), "POST", { content, fingerprint })).status).toBe(200);
    const list = await reader.fetch(at("footings?search=H9"));
    expect(await list.json()).toMatchObject({
      counts: { total: 1 },
      items: [{ mark: "H9", easting_m: 150 }],
    });
  });
});
