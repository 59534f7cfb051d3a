import { randomUUID } from "node:crypto";
import pg from "pg";
import { client } from "@/db/client";
import * as t from "@/db/schema";
import type { Role } from "@/lib/access/policy";
import type { PersonId, ProjectId } from "@/lib/contracts/ids";
import { hashPassword } from "@/lib/services/accounts/passwords";
import type { SignedIn } from "@/lib/services/accounts/session-holder";
import type { Visitor } from "@/lib/services/accounts/visitor";
import type { Context } from "@/lib/services/context";
import { createProject } from "@/lib/services/projects/create-project";

export const PASSWORD = "grey heron over the weir";

/** Somebody outside any project, from an address of this machine. */
export const visitor = (person: SignedIn | null = null, over: Partial<Visitor> = {}): Visitor => ({
  person,
  sessionId: null,
  address: "127.0.0.1",
  requestId: randomUUID(),
  ...over,
});

/** A person with an open account, past the verbs. */
export async function makePerson(
  name: string,
  options: { email?: string; password?: string | null; siteAdministrator?: boolean } = {},
): Promise<SignedIn> {
  const { password = PASSWORD, siteAdministrator = false } = options;
  const email = options.email ?? `${name.toLowerCase().replace(/\W+/g, ".")}@example.test`;
  const [row] = await client()
    .database.insert(t.person)
    .values({
      name,
      email,
      siteAdministrator,
      passwordHash: password === null ? null : await hashPassword(password),
    })
    .returning({ id: t.person.id });
  if (!row) throw new Error("no person");
  return { id: row.id, name, email, siteAdministrator };
}

export const projectInput = (number: string, leadEmail: string, over: Record<string, unknown> = {}) => ({
  number,
  title: `Weir depot ${number}`,
  gridName: "Depot grid",
  datumName: "Site datum, +0.00 = 21.350 m above the gauge",
  unitSystem: "si",
  leadName: "Lead Person",
  leadEmail,
  criteria: {
    slidingFactor: 1.5,
    overturningFactor: 1.5,
    upliftFactor: 1.1,
    interfaceAngle_deg: 25,
    adhesion_kPa: 0,
    permanentWithinMiddleThird: true,
    transientMinContactRatio: 0.5,
    accidentalMinContactRatio: 0.5,
    nearestHoleLimit_m: 25,
  },
  ...over,
});

export type Site = {
  projectId: ProjectId;
  administrator: SignedIn;
  lead: Context;
  geotechnical: Context;
  structural: Context;
  reader: Context;
};

/** A project opened by a site administrator with one person a role. Made twice, the second is the neighbour. */
export async function makeSite(number: string): Promise<Site> {
  const administrator = await makePerson(`Admin ${number}`, { siteAdministrator: true });
  const leadPerson = await makePerson(`Lead ${number}`);
  const { id: projectId } = await createProject(
    visitor(administrator),
    projectInput(number, leadPerson.email),
  );
  const contextOf = (person: SignedIn, role: Role): Context => ({
    person,
    projectId,
    roles: [role],
    requestId: randomUUID(),
  });
  const site = { projectId, administrator, lead: contextOf(leadPerson, "lead") } as Site;
  for (const role of ["geotechnical", "structural", "reader"] as const) {
    const person = await makePerson(`${role} ${number}`);
    await asSuperuser((db) =>
      db.query("insert into membership (project_id, person_id, role) values ($1, $2, $3)", [
        projectId,
        person.id,
        role,
      ]),
    );
    site[role] = contextOf(person, role);
  }
  return site;
}

let superuserUrl = "";

/** Names the database that `asSuperuser` looks into. */
export const lookInto = (url: string): void => {
  superuserUrl = url;
};

/** Past every rule: to see what is really stored, or to break it on purpose. */
export async function asSuperuser<Result>(act: (db: pg.Client) => Promise<Result>): Promise<Result> {
  const db = new pg.Client({ connectionString: superuserUrl });
  await db.connect();
  try {
    return await act(db);
  } finally {
    await db.end();
  }
}

/** The rows of a query past every rule. */
export const stored = async <Row>(query: string, values: unknown[] = []): Promise<Row[]> =>
  asSuperuser(async (db) => (await db.query(query, values)).rows as Row[]);

/** The token in the newest letter to an address. */
export async function tokenMailedTo(email: string): Promise<string> {
  const [letter] = await stored<{ body: string }>(
    "select body from outbox where recipient = $1 order by created_at desc, id limit 1",
    [email],
  );
  const token = /\/(?:invitation|reset)\/([A-Za-z0-9_-]{43})/.exec(letter?.body ?? "")?.[1];
  if (!token) throw new Error(`No link was mailed to ${email}.`);
  return token;
}

/** The audit verbs of a project, oldest first. */
export const auditVerbs = async (projectId: string): Promise<string[]> =>
  (
    await stored<{ verb: string }>("select verb from audit_event where project_id = $1 order by seq", [
      projectId,
    ])
  ).map(({ verb }) => verb);

/** What a promise was refused with; fails when it was not. */
export async function refusalOf(
  promise: Promise<unknown>,
): Promise<{ code: string; status: number; fields: Record<string, string> }> {
  try {
    await promise;
  } catch (error) {
    const {
      code,
      status,
      fields = {},
    } = error as { code: string; status: number; fields?: Record<string, string> };
    if (typeof status !== "number") throw error;
    return { code, status, fields };
  }
  throw new Error("It was not refused.");
}

export type { PersonId };
