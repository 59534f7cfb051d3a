import { beforeAll, describe, expect, it } from "vitest";
import { acceptInvitation } from "@/lib/services/accounts/invitation";
import { findPeople, setAccountOpen } from "@/lib/services/accounts/people";
import { changeProject } from "@/lib/services/projects/change-project";
import { createProject } from "@/lib/services/projects/create-project";
import { myProjects } from "@/lib/services/projects/my-projects";
import { listCriteria, projectFacts } from "@/lib/services/projects/project-facts";
import { exportAudit, readAudit } from "@/lib/services/projects/read-audit";
import { freshDatabase } from "../../support/database";
import {
  asSuperuser,
  auditVerbs,
  lookInto,
  makePerson,
  makeSite,
  PASSWORD,
  projectInput,
  refusalOf,
  type Site,
  stored,
  tokenMailedTo,
  visitor,
} from "../../support/site";

let site: Site;
let neighbour: Site;
beforeAll(async () => {
  lookInto((await freshDatabase()).superuserUrl);
  site = await makeSite("P-01");
  neighbour = await makeSite("P-02");
});

describe("opening a project", () => {
  it("is done by a site administrator, who is no member of it", async () => {
    expect(await auditVerbs(site.projectId)).toEqual(["project:create"]);
    expect((await myProjects(visitor(site.administrator))).projects).toEqual([]);
    expect(
      (await myProjects(visitor(site.lead.person as never))).projects.map(({ number, roles }) => [
        number,
        roles,
      ]),
    ).toEqual([["P-01", ["lead"]]]);
  });

  it("is refused to everybody else", async () => {
    expect(
      (
        await refusalOf(
          createProject(visitor(site.lead.person as never), projectInput("X", "x@example.test")),
        )
      ).status,
    ).toBe(403);
    expect((await refusalOf(createProject(visitor(), projectInput("X", "x@example.test")))).status).toBe(401);
  });

  it("needs the name of its grid and of its datum before anything else", async () => {
    for (const missing of ["gridName", "datumName"] as const) {
      for (const value of [undefined, "", "   "]) {
        const refusal = await refusalOf(
          createProject(
            visitor(site.administrator),
            projectInput("X-1", "x@example.test", { [missing]: value }),
          ),
        );
        expect(refusal.fields).toHaveProperty(missing);
      }
    }
    await expect(
      asSuperuser((db) => db.query("update project set datum_name = ' ' where number = 'P-01'")),
    ).rejects.toThrow(/project_has_grid_and_datum/);
  });

  it("needs every criterion stated: none is filled in", async () => {
    const { criteria, ...rest } = projectInput("X-2", "x@example.test");
    for (const name of Object.keys(criteria)) {
      const left = Object.fromEntries(Object.entries(criteria).filter(([other]) => other !== name));
      const refusal = await refusalOf(
        createProject(visitor(site.administrator), { ...rest, criteria: left }),
      );
      expect(Object.keys(refusal.fields)).toEqual([`criteria.${name}`]);
    }
  });

  it("refuses figures that no project has", async () => {
    for (const over of [
      { gridScale: 0 },
      { gridScale: "1" },
      { gridScale: Number.NaN },
      { gridRotation_deg: Number.POSITIVE_INFINITY },
      { epsgCode: 27700.5 },
      { epsgCode: -1 },
      { unitSystem: "imperial" },
      { number: "x".repeat(41) },
      { title: "a\0b" },
      { projectId: "7d9f3c1e-0000-4000-8000-000000000000" },
      { currentCriteria: 9 },
    ])
      expect(
        Object.keys(
          (
            await refusalOf(
              createProject(visitor(site.administrator), projectInput("X-3", "x@example.test", over)),
            )
          ).fields,
        ),
      ).toEqual(Object.keys(over));
    expect(await stored("select 1 from project where number like 'X-%'")).toHaveLength(0);
  });

  it("makes an account for a lead who has none, with a link to choose a password", async () => {
    const { id } = await createProject(
      visitor(site.administrator),
      projectInput("P-03", "first.lead@example.test", { leadName: "First Lead" }),
    );
    const token = await tokenMailedTo("first.lead@example.test");
    await acceptInvitation(visitor(), { token, name: "First Lead", password: PASSWORD });
    const [row] = await stored<{ id: string }>(
      "select p.id from person p join membership m on m.person_id = p.id where m.project_id = $1",
      [id],
    );
    expect(
      (await myProjects(visitor({ id: row?.id } as never))).projects.map(({ number }) => number),
    ).toEqual(["P-03"]);
  });

  it("says when the number is taken", async () => {
    const refusal = await refusalOf(
      createProject(visitor(site.administrator), projectInput("P-01", "x@example.test")),
    );
    expect([refusal.status, Object.keys(refusal.fields)]).toEqual([409, ["number"]]);
  });
});

describe("the settings of a project", () => {
  it("are read by every member, with criteria and own roles", async () => {
    const facts = await projectFacts(site.reader);
    expect(facts).toMatchObject({
      number: "P-01",
      gridName: "Depot grid",
      currentCriteria: 1,
      revision: 1,
      roles: ["reader"],
    });
    expect(facts.criteria).toMatchObject({
      number: 1,
      interfaceAngle_deg: 25,
      setBy: site.administrator.name,
    });
    expect((await listCriteria(site.reader)).criteria).toEqual([facts.criteria]);
  });

  it("are changed by the lead who saw the newest, and written down with before and after", async () => {
    const after = await changeProject(site.lead, { title: "Weir depot, north yard", revision: 1 });
    expect([after.title, after.revision, after.gridName]).toEqual([
      "Weir depot, north yard",
      2,
      "Depot grid",
    ]);
    const old = await refusalOf(changeProject(site.lead, { title: "Another", revision: 1 }));
    expect(old.status).toBe(412);
    expect((await refusalOf(changeProject(site.lead, { title: "Another" }))).status).toBe(428);
    const [event] = await stored<{ detail: string }>(
      "select detail from audit_event where project_id = $1 order by seq desc limit 1",
      [site.projectId],
    );
    expect(JSON.parse(event?.detail ?? "")).toEqual({
      before: { title: "Weir depot P-01" },
      after: { title: "Weir depot, north yard" },
      reason: "",
    });
  });

  it("are not changed by other roles, nor by fields that are not settings", async () => {
    for (const context of [site.geotechnical, site.structural, site.reader])
      expect((await refusalOf(changeProject(context, { title: "X", revision: 2 }))).status).toBe(403);
    const refusal = await refusalOf(
      changeProject(site.lead, { title: "X", revision: 2, id: neighbour.projectId, currentCriteria: 7 }),
    );
    expect(Object.keys(refusal.fields).sort()).toEqual(["currentCriteria", "id"]);
    expect((await projectFacts(site.lead)).title).toBe("Weir depot, north yard");
    expect((await projectFacts(neighbour.lead)).revision).toBe(1);
  });

  it("take another datum without a word while there is no ground, and with a reason afterwards", async () => {
    expect((await changeProject(site.lead, { datumName: "Port datum", revision: 2 })).datumName).toBe(
      "Port datum",
    );
    await asSuperuser((db) =>
      db.query("insert into hole (project_id, name) values ($1, 'BH1')", [site.projectId]),
    );
    const refusal = await refusalOf(changeProject(site.lead, { datumName: "Site datum", revision: 3 }));
    expect(refusal.fields).toHaveProperty("reason");
    const after = await changeProject(site.lead, {
      datumName: "Site datum",
      reason: "The survey named the wrong one",
      revision: 3,
    });
    expect(after.datumName).toBe("Site datum");
  });

  it("take one of two changes made at once", async () => {
    const { revision } = await projectFacts(site.lead);
    const outcomes = await Promise.allSettled([
      changeProject(site.lead, { client: "One", revision }),
      changeProject(site.lead, { client: "Two", revision }),
    ]);
    expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
  });
});

describe("the audit trail", () => {
  it("is searched and paged from the newest back, in this project alone", async () => {
    const all = await readAudit(site.lead, {});
    expect(all.events[0]?.seq).toBe(all.events.length);
    expect(all.events.every(({ detail }) => JSON.stringify(detail).includes(neighbour.projectId))).toBe(
      false,
    );
    const first = await readAudit(site.lead, { limit: "2" });
    expect(first.events).toHaveLength(2);
    const second = await readAudit(site.lead, { limit: "2", before: String(first.next) });
    expect(second.events[0]?.seq).toBe((first.events[1]?.seq ?? 0) - 1);
    expect((await readAudit(site.lead, { search: "port DATUM" })).events.length).toBeGreaterThan(0);
    expect((await readAudit(site.lead, { search: "P-02" })).events).toEqual([]);
    expect((await readAudit(site.lead, { search: "%" })).events).toEqual([]);
  });

  it("is not read by readers", async () => {
    expect((await refusalOf(readAudit(site.reader, {}))).status).toBe(403);
    expect((await refusalOf(exportAudit(site.reader))).status).toBe(403);
  });

  it("leaves as CSV whole, with nothing that a spreadsheet would run", async () => {
    const { revision } = await projectFacts(site.lead);
    await changeProject(site.lead, { client: '=HYPERLINK("http://evil.example")', revision });
    const text = await (await exportAudit(site.lead)).text();
    const lines = text.trimEnd().split("\r\n");
    expect(lines).toHaveLength(1 + (await auditVerbs(site.projectId)).length);
    expect(lines[1]).toContain("project:change");
    expect(lines.every((line) => !/(^|,)"?[=+@]/.test(line))).toBe(true);
  });
});

describe("people", () => {
  it("are found, and their accounts shut, by a site administrator only", async () => {
    const person = await makePerson("Found Person");
    expect(
      (await findPeople(visitor(site.administrator), { search: "found pers" })).people.map(({ id }) => id),
    ).toEqual([person.id]);
    expect((await refusalOf(findPeople(visitor(site.lead.person as never), {}))).status).toBe(403);
    expect(
      (await refusalOf(setAccountOpen(visitor(person), { personId: site.administrator.id, open: false })))
        .status,
    ).toBe(403);
    expect(
      (
        await refusalOf(
          setAccountOpen(visitor(site.administrator), { personId: site.administrator.id, open: false }),
        )
      ).code,
    ).toBe("conflict");
  });
});
