import { randomUUID } from "node:crypto";
import { eq, sql } from "drizzle-orm";
import { client, closeClient } from "@/db/client";
import * as t from "@/db/schema";
import type { Role } from "@/lib/access/policy";
import { commonPractice } from "@/lib/contracts/common-practice";
import type { DocumentRevisionId, PersonId, ProjectId } from "@/lib/contracts/ids";
import type { DraftContent } from "@/lib/contracts/values";
import { hashPassword } from "@/lib/services/accounts/passwords";
import { audit } from "@/lib/services/audit";
import { runChecks } from "@/lib/services/checks/run-checks";
import { type Context, inProject } from "@/lib/services/context";
import { beginUpload } from "@/lib/services/documents/begin-upload";
import { finishUpload } from "@/lib/services/documents/finish-upload";
import { createFooting } from "@/lib/services/footings/create-footing";
import { recordStage } from "@/lib/services/footings/record-stage";
import { createHole } from "@/lib/services/holes/create-hole";
import { confirmLinks } from "@/lib/services/links/confirm-links";
import { suggestLinks } from "@/lib/services/links/suggest-links";
import { createProject } from "@/lib/services/projects/create-project";
import { issueRevision } from "@/lib/services/revisions/issue-revision";
import { createUnit } from "@/lib/services/units/create-unit";
import { checkDraft } from "@/lib/services/values/check-draft";
import { createValue } from "@/lib/services/values/create-value";
import { saveDraft } from "@/lib/services/values/save-draft";
import { startDraft } from "@/lib/services/values/start-draft";
import { createZone } from "@/lib/services/zones/create-zone";
import demo from "./accounts.json";
import { documents, type SeedDocument, secondRevision } from "./documents";
import { footings } from "./footings";
import { logOf } from "./logs";
import { pdf } from "./pdf";
import { holes, project, type SeedZone, units, zones } from "./site";

/*
 * The demonstration project, planted through the same verbs that people use: nothing in it could not have been done by
 * hand. Runs once for each database; a second run finds the project and leaves it alone.
 */

const criteria = { ...commonPractice, interfaceAngle_deg: 26 };

async function people(): Promise<Map<string, PersonId>> {
  const passwordHash = await hashPassword(demo.password);
  const rows = demo.accounts.map(({ email, name, roles }) => ({
    email,
    name,
    passwordHash,
    siteAdministrator: roles.length === 0,
  }));
  await client().database.insert(t.person).values(rows).onConflictDoNothing();
  const found = await client().database.select({ id: t.person.id, email: t.person.email }).from(t.person);
  return new Map(found.map((person) => [person.email, person.id]));
}

async function plant(): Promise<string> {
  const ids = await people();
  const account = (role: string) => {
    const found = demo.accounts.find((person) => person.role.startsWith(role));
    if (!found) throw new Error(`accounts.json has no ${role}.`);
    return { id: ids.get(found.email) as PersonId, name: found.name, email: found.email };
  };
  const administrator = account("site administrator");
  const lead = account("project lead");
  const visitor = {
    person: { ...administrator, siteAdministrator: true },
    sessionId: null,
    address: "seed",
    requestId: randomUUID(),
  };
  const made = await createProject(visitor, {
    ...project,
    leadName: lead.name,
    leadEmail: lead.email,
    criteria,
  });
  const projectId = made.id as ProjectId;
  const context = (person: typeof lead, role: Role): Context => ({
    person,
    projectId,
    roles: [role],
    requestId: randomUUID(),
  });
  const asLead = context(lead, "lead");
  const preparer = context(account("geotechnical engineer (prepares"), "geotechnical");
  const checker = context(account("geotechnical engineer (checks"), "geotechnical");
  const structural = context(account("structural"), "structural");
  await inProject(asLead, async (tx) => {
    await tx.insert(t.membership).values(
      demo.accounts.flatMap(({ email, roles }) =>
        roles
          .filter((role) => role !== "lead")
          .map((role) => ({
            projectId,
            personId: ids.get(email) as PersonId,
            role: role as Role,
            grantedBy: lead.id,
          })),
      ),
    );
  });

  const revisions = new Map<string, DocumentRevisionId>();
  const documentIds = new Map<string, string>();
  for (const document of documents) {
    const kept = await upload(document.kind === "loads" ? structural : preparer, document);
    revisions.set(document.reference, kept.documentRevisionId);
    documentIds.set(document.reference, kept.documentId);
  }

  const unitIds = new Map<string, string>();
  for (const [position, unit] of units.entries())
    unitIds.set(unit.code, (await createUnit(preparer, { ...unit, position })).id);
  for (const [at, place] of holes.entries())
    await createHole(preparer, {
      ...logOf(place, unitIds),
      sourceRevisionId: revisions.get(place.day > "2025-06" ? "FR-02" : "FR-01"),
      sourcePage: 1 + (at % 2),
    });

  const zoneIds = new Map<string, string>();
  for (const zone of zones) {
    const drawn = await createZone(preparer, {
      name: zone.name,
      groundUnitIds: [unitIds.get(zone.unit)],
      ring_m: zone.ring_m,
      boundary: zone.boundary,
      reason: "First drawn from GIR-01.",
    });
    zoneIds.set(zone.name, drawn.id);
  }

  const values = new Map<string, string>();
  const issue = async (zone: SeedZone, content: DraftContent) => {
    const valueId = values.get(zone.name) as string;
    const { revision } = await startDraft(preparer, { valueId });
    const saved = await saveDraft(preparer, { valueId, revision, content });
    const checked = await checkDraft(checker, { valueId, revision: saved.revision, confirmed: [] });
    await issueRevision(asLead, { valueId, revisionId: checked.revisionId, revision: checked.revision });
  };
  for (const zone of zones) {
    const { id } = await createValue(preparer, {
      zoneId: zoneIds.get(zone.name) as string,
      groundUnitId: unitIds.get(zone.unit) as string,
      reference: zone.value.reference,
    });
    values.set(zone.name, id);
    await issue(zone, contentOf(zone, revisions));
  }

  const pads = footings({ ...criteria });
  const footingIds: { id: string }[] = [];
  for (const pad of pads) {
    const { id } = await createFooting(structural, {
      mark: pad.mark,
      gridReference: pad.gridReference,
      ownerId: structural.person.id,
      ...pad.fields,
      loads: { loadBasis: "characteristic-full", source: "LD-01 P02", combinations: pad.combinations },
    });
    footingIds.push({ id });
  }
  // Three pads of the last row were added late and wait for their links; the rest take what their zones propose.
  const { suggestions } = await suggestLinks(structural, {
    footingIds: footingIds.slice(0, 117).map(({ id }) => id),
  });
  const zoneOf = new Map(
    [...values].map(([name, id]) => [id, zones.find((zone) => zone.name === name) ?? null]),
  );
  const linked = suggestions.flatMap(({ footingId, valueId }) =>
    valueId === null
      ? []
      : [{ id: footingId as string, valueId: valueId as string, zone: zoneOf.get(valueId) ?? null }],
  );
  await confirmLinks(structural, { links: linked.map(({ id, valueId }) => ({ footingId: id, valueId })) });
  await runChecks(structural, { all: true });
  await buildSome(structural, linked);

  // What came later: looser gravel and higher water in the east, firm clay on top in the south-east, a newer letter.
  const [, , east, west, , southEast] = zones as [SeedZone, SeedZone, SeedZone, SeedZone, SeedZone, SeedZone];
  await issue(east, {
    ...contentOf(east, revisions),
    given: "255 kPa",
    groundwaterLevel_m: 9.4,
    groundwaterBasis: "Highest winter reading in BH09, LT-01",
    reasonCode: "new-hole",
    reason: "The gravel around BH09 is looser than the first tests showed, and water stands 0.4 m higher.",
    sources: [
      source(revisions, "GIR-01", east.value.page, east.value.clause, east.value.holes),
      source(revisions, "FR-02", 2, "3.2", ["BH09"]),
    ],
  });
  await issue(southEast, {
    ...contentOf(southEast, revisions),
    given: "140 kPa",
    reasonCode: "new-hole",
    reason: "The top metre of the clay is firm only in BH13.",
    sources: [
      source(revisions, "GIR-01", southEast.value.page, southEast.value.clause, southEast.value.holes),
      source(revisions, "FR-02", 2, "3.1", ["BH13", "BH14"]),
    ],
  });
  const answered = linked.filter(({ zone }) => zone === southEast).slice(0, 9);
  await runChecks(structural, { footingIds: answered.map(({ id }) => id) });
  await upload(preparer, secondRevision, documentIds.get("LT-01"));
  await inProject(asLead, (tx) =>
    audit(tx, asLead, {
      verb: "demo:planted",
      subject: `project/${projectId}`,
      detail: { footings: pads.length },
    }),
  );
  return `${made.number} with ${holes.length} holes, ${zones.length} zones, ${pads.length} footings (${west.name} rests on a superseded letter)`;
}

const source = (
  revisions: ReadonlyMap<string, DocumentRevisionId>,
  reference: string,
  page: number,
  clause: string,
  named: string[],
) => ({
  documentRevisionId: revisions.get(reference) as DocumentRevisionId,
  page,
  clause,
  note: "",
  holes: named,
});

function contentOf(zone: SeedZone, revisions: ReadonlyMap<string, DocumentRevisionId>): DraftContent {
  const { value } = zone;
  return {
    given: `${value.net_kPa} kPa`,
    givenBasis: "net",
    factorConvention: "net-over-factor",
    factorOfSafety: 3,
    comparedWith: "maximum",
    loadBasis: "characteristic-full",
    governedBy: value.governedBy,
    settlementLimit_mm: 25,
    settlementPredicted_mm: value.governedBy === "settlement" ? 20 : 15,
    minBreadth_m: value.minBreadth_m,
    maxBreadth_m: value.maxBreadth_m,
    minFoundingDepth_m: value.cover_m,
    highestFoundingLevel_m: value.highest_m,
    lowestFoundingLevel_m: value.lowest_m,
    groundwaterLevel_m: value.water_m,
    groundwaterBasis: value.preliminary
      ? "Standpipe of BH10, LT-01"
      : "GIR-01, design level until a winter of readings",
    soilUnitWeight_kNm3: 18,
    drainage: value.drainage,
    transientIncrease: "none",
    conditions:
      zone.unit === "4"
        ? "Blind within four hours of opening. Remove softened clay."
        : "Remove all made ground and alluvium.",
    basis: "recommended",
    purpose: value.preliminary ? "preliminary" : "for-design",
    reasonCode: "first",
    reason: "First value from the ground investigation report.",
    sources: [
      source(revisions, "GIR-01", value.page, value.clause, value.holes),
      ...(value.preliminary ? [source(revisions, "LT-01", 1, "", ["BH10"])] : []),
    ],
  };
}

/** Uploads one document as a browser does: asks for the request, sends the bytes to the store, lets them be verified. */
async function upload(context: Context, document: SeedDocument, documentId?: string) {
  const bytes = await pdf(document, document.pages);
  const ticket = await beginUpload(context, {
    fileName: `${document.reference}-${document.code}.pdf`,
    size_bytes: bytes.byteLength,
  });
  const sent = await fetch(ticket.url, {
    method: "PUT",
    headers: { "content-type": ticket.mediaType },
    body: new Uint8Array(bytes),
  });
  if (!sent.ok)
    throw new Error(`The store refused ${document.reference}: ${sent.status} ${await sent.text()}`);
  const { reference, title, kind, author, code, status, receivedOn, limitations } = document;
  return finishUpload(context, {
    uploadId: ticket.uploadId,
    ...(documentId ? { documentId } : { reference, title, kind }),
    author,
    code,
    status,
    receivedOn,
    limitations: limitations ?? "",
  });
}

/** Some pads of the gravel in the east and centre are on their way; a few are poured. */
async function buildSome(context: Context, linked: { id: string; zone: SeedZone | null }[]) {
  const passing = await inProject(context, (tx) =>
    tx.execute<{ id: string }>(sql`select f.id from footing f join footing_check c
      on c.project_id = f.project_id and c.id = f.latest_check_id where f.project_id = ${context.projectId} and c.verdict = 'passes'`),
  );
  const ready = new Set(passing.rows.map((row) => row.id));
  const days = {
    issued: "2025-08-04",
    excavated: "2025-09-22",
    "formation-accepted": "2025-09-23",
    poured: "2025-09-24",
  } as const;
  const east = linked.filter(
    ({ id, zone }) => ready.has(id) && (zone?.name === "Zone C" || zone?.name === "Zone B"),
  );
  for (const [at, { id }] of east.slice(0, 14).entries())
    for (const stage of ["issued", "excavated", "formation-accepted", "poured"] as const) {
      if (stage === "excavated" && at >= 9) break;
      if (stage === "formation-accepted" && at >= 7) break;
      if (stage === "poured" && at >= 5) break;
      const [row] = await inProject(context, (tx) =>
        tx
          .select({ revision: t.footing.revision })
          .from(t.footing)
          .where(eq(t.footing.id, id as never)),
      );
      await recordStage(context, {
        footingId: id,
        revision: row?.revision,
        stage,
        reachedOn: days[stage],
        note: "",
      });
    }
}

/** Whether the project is there, and whole: the record of its planting is the last thing written. */
async function found(): Promise<"none" | "whole" | "cut short"> {
  const [there] = await client().database.transaction(async (tx) => {
    await tx.execute(sql`select set_config('app.door', 'verifier', true)`);
    return tx.select({ id: t.project.id }).from(t.project).where(eq(t.project.number, project.number));
  });
  if (!there) return "none";
  const planted = await client().database.transaction(async (tx) => {
    await tx.execute(sql`select set_config('app.project_id', ${there.id}, true)`);
    return tx
      .select({ seq: t.auditEvent.seq })
      .from(t.auditEvent)
      .where(eq(t.auditEvent.verb, "demo:planted"));
  });
  return planted.length > 0 ? "whole" : "cut short";
}

try {
  const state = await found();
  if (state === "cut short")
    throw new Error(
      "An earlier planting of the demonstration was cut short. Run npm run reset to make it anew.",
    );
  process.stdout.write(state === "whole" ? `${project.number} is there already\n` : `${await plant()}\n`);
} finally {
  await closeClient();
}
