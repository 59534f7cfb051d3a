import { randomUUID } from "node:crypto";
import { sql } from "drizzle-orm";
import { client, type Transaction } from "@/db/client";
import * as t from "@/db/schema";
import type { Role } from "@/lib/access/policy";
import type {
  DocumentRevisionId,
  GroundUnitId,
  PersonId,
  ProjectId,
  ValueId,
  ValueRevisionId,
  ZoneId,
} from "@/lib/contracts/ids";
import type { DraftContent } from "@/lib/contracts/values";
import { type Context, enter } from "@/lib/services/context";
import { issueRevision } from "@/lib/services/revisions/issue-revision";
import { checkDraft } from "@/lib/services/values/check-draft";
import { createValue } from "@/lib/services/values/create-value";
import { saveDraft } from "@/lib/services/values/save-draft";
import { startDraft } from "@/lib/services/values/start-draft";

/** One project with its people, a zone that carries one unit, a report, and criteria. */
export type World = {
  projectId: ProjectId;
  preparer: Context;
  checker: Context;
  issuer: Context;
  lead: Context;
  structural: Context;
  reader: Context;
  zoneId: ZoneId;
  groundUnitId: GroundUnitId;
  documentRevisionId: DocumentRevisionId;
};

/** Acts in a project as the application does, past the verbs: for what other people's verbs would have stored. */
export async function inside<Result>(
  world: World,
  act: (tx: Transaction) => Promise<Result>,
): Promise<Result> {
  return client().database.transaction(async (tx) => {
    await enter(tx, world.projectId, world.lead.person.id);
    return act(tx);
  });
}

/** Builds a project; call it twice for a neighbour that must never be seen. */
export async function buildWorld(number: string, soil = "gravel"): Promise<World> {
  const projectId = randomUUID() as ProjectId;
  const member = async (name: string, role: Role): Promise<Context> => {
    const email = `${name.toLowerCase().replace(/\W+/g, ".")}.${number.toLowerCase()}@example.test`;
    const [person] = await client().database.insert(t.person).values({ name, email }).returning();
    if (!person) throw new Error("no person");
    return {
      person: { id: person.id as PersonId, name, email },
      projectId,
      roles: [role],
      requestId: randomUUID(),
    };
  };
  const people = {
    preparer: await member("Ines Halloran", "geotechnical"),
    checker: await member("Tom Okafor", "geotechnical"),
    issuer: await member("Greta Lind", "geotechnical"),
    lead: await member("Paul Varga", "lead"),
    structural: await member("Sara Brandt", "structural"),
    reader: await member("Noor Aziz", "reader"),
  };
  const zoneId = randomUUID() as ZoneId;
  const groundUnitId = randomUUID() as GroundUnitId;
  const documentRevisionId = randomUUID() as DocumentRevisionId;
  const world: World = { projectId, ...people, zoneId, groundUnitId, documentRevisionId };
  await inside(world, async (tx) => {
    await tx.execute(sql`insert into project (id, number, title, grid_name, datum_name)
      values (${projectId}, ${number}, 'Test site', 'Site grid', 'Site datum')`);
    for (const { person, roles } of Object.values(people))
      await tx.execute(
        sql`insert into membership (project_id, person_id, role) values (${projectId}, ${person.id}, ${roles[0]})`,
      );
    await tx.insert(t.criteria).values({
      projectId,
      number: 1,
      slidingFactor: 1.5,
      overturningFactor: 1.5,
      upliftFactor: 1.1,
      interfaceAngle_deg: 25,
      adhesion_kPa: 0,
      permanentWithinMiddleThird: true,
      transientMinContactRatio: 0.5,
      accidentalMinContactRatio: 0.5,
      reason: "as agreed at the outset",
      setBy: people.lead.person.id,
    });
    await tx
      .insert(t.groundUnit)
      .values({ projectId, id: groundUnitId, code: "2", name: "Terrace gravel", soil });
    const zoneRevisionId = randomUUID() as never;
    await tx
      .insert(t.zone)
      .values({ projectId, id: zoneId, name: "Zone B", currentRevisionId: zoneRevisionId });
    await tx.insert(t.zoneRevision).values({
      projectId,
      id: zoneRevisionId,
      zoneId,
      number: 1,
      ring_m: [
        [0, 0],
        [500, 0],
        [500, 500],
        [0, 500],
      ],
      drawnBy: people.preparer.person.id,
    });
    await tx.insert(t.zoneGroundUnit).values({ projectId, zoneId, groundUnitId });
    await addReport(tx, world, documentRevisionId, "GIR-01", "P01");
  });
  return world;
}

/** Registers a report with one revision of it. */
export async function addReport(
  tx: Transaction,
  world: World,
  revisionId: DocumentRevisionId,
  reference: string,
  code: string,
): Promise<string> {
  const documentId = randomUUID() as never;
  await tx.insert(t.document).values({
    projectId: world.projectId,
    id: documentId,
    reference,
    title: "Ground investigation report",
    kind: "report",
    currentRevisionId: revisionId,
  });
  await tx.insert(t.documentRevision).values({
    projectId: world.projectId,
    id: revisionId,
    documentId,
    number: 1,
    code,
    status: "S4",
    receivedOn: "2026-01-12",
    fileName: "report.pdf",
    mediaType: "application/pdf",
    size_bytes: 1000,
    sha256: "0".repeat(64),
    objectKey: `documents/${randomUUID()}`,
    uploadedBy: world.preparer.person.id,
  });
  return documentId;
}

/** A draft that lacks nothing. */
export const completeDraft = (world: World, over: Partial<DraftContent> = {}): DraftContent => ({
  given: "250 kPa",
  givenBasis: "net",
  factorConvention: "net-over-factor",
  factorOfSafety: 3,
  comparedWith: "maximum",
  loadBasis: "characteristic-full",
  governedBy: "settlement",
  settlementLimit_mm: 25,
  groundwaterBasis: "Not met to 12 m in BH1 to BH6",
  soilUnitWeight_kNm3: 18,
  drainage: "drained",
  transientIncrease: "none",
  basis: "recommended",
  purpose: "preliminary",
  reasonCode: "first",
  reason: "First value from the investigation report",
  sources: [
    {
      documentRevisionId: world.documentRevisionId,
      page: 34,
      clause: "7.2",
      note: "",
      holes: ["BH1", "BH2"],
    },
  ],
  ...over,
});

/** A zone of its own, so that a test meets no other's value. */
export async function freshPlace(world: World): Promise<{ zoneId: ZoneId; groundUnitId: GroundUnitId }> {
  const zoneId = randomUUID() as ZoneId;
  const { groundUnitId, projectId } = world;
  const drawn = randomUUID();
  await inside(world, async (tx) => {
    await tx.execute(sql`insert into zone (project_id, id, name, current_revision_id)
      values (${projectId}, ${zoneId}, ${`Zone ${zoneId}`}, ${drawn})`);
    await tx.execute(sql`insert into zone_revision (project_id, id, zone_id, number, ring_m, drawn_by)
      values (${projectId}, ${drawn}, ${zoneId}, 1, '[[0,0],[1,0],[1,1]]', ${world.preparer.person.id})`);
    await tx.execute(sql`insert into zone_ground_unit (project_id, zone_id, ground_unit_id)
      values (${projectId}, ${zoneId}, ${groundUnitId})`);
  });
  return { zoneId, groundUnitId };
}

/** Opens a value; answers its id. */
export async function openValue(world: World): Promise<ValueId> {
  return (await createValue(world.preparer, { zoneId: world.zoneId, groundUnitId: world.groundUnitId })).id;
}

/** Drafts and checks a revision of a value; answers what issuing it needs. */
export async function checkedRevision(
  world: World,
  valueId: ValueId,
  over: Partial<DraftContent> = {},
): Promise<{ valueId: ValueId; revisionId: ValueRevisionId; revision: number; code: string }> {
  const { revision } = await startDraft(world.preparer, { valueId });
  const saved = await saveDraft(world.preparer, { valueId, revision, content: completeDraft(world, over) });
  return checkDraft(world.checker, { valueId, revision: saved.revision });
}

/** Drafts, checks and issues a revision. */
export async function issuedRevision(world: World, valueId: ValueId, over: Partial<DraftContent> = {}) {
  const { revisionId, revision } = await checkedRevision(world, valueId, over);
  return issueRevision(world.issuer, { valueId, revisionId, revision });
}

/** Rows of a count query in the project. */
export async function countOf(world: World, table: string): Promise<number> {
  const rows = await inside(world, (tx) =>
    tx.execute<{ n: number }>(sql`select count(*)::int as n from ${sql.identifier(table)}`),
  );
  return rows.rows[0]?.n ?? -1;
}
