import { randomUUID } from "node:crypto";
import { beforeAll, describe, expect, it } from "vitest";
import { acceptInvitation, readInvitation } from "@/lib/services/accounts/invitation";
import { signIn } from "@/lib/services/accounts/sign-in";
import { inProject } from "@/lib/services/context";
import { cancelInvitation } from "@/lib/services/members/cancel-invitation";
import { changeMember } from "@/lib/services/members/change-member";
import { inviteMember } from "@/lib/services/members/invite-member";
import { listMembers } from "@/lib/services/members/list-members";
import { removeMember } from "@/lib/services/members/remove-member";
import { rolesInProject } from "@/lib/services/members/roles-in-project";
import { freshDatabase } from "../../support/database";
import {
  asSuperuser,
  auditVerbs,
  lookInto,
  makePerson,
  makeSite,
  PASSWORD,
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
  site = await makeSite("M-01");
  neighbour = await makeSite("M-02");
});

const rolesOf = (personId: string) => rolesInProject(personId as never, site.projectId);

describe("an invitation", () => {
  it("makes an account for the address it was mailed to, with the roles it named", async () => {
    await inviteMember(site.lead, {
      email: "New.Person@example.test",
      roles: ["structural", "geotechnical"],
    });
    const token = await tokenMailedTo("new.person@example.test");
    expect(await readInvitation(token)).toEqual({
      email: "new.person@example.test",
      projectId: site.projectId,
      project: "M-01 Weir depot M-01",
      roles: ["geotechnical", "structural"],
      needsAccount: true,
    });
    const joined = await acceptInvitation(visitor(), { token, name: "New Person", password: PASSWORD });
    expect(joined).toEqual({ projectId: site.projectId, email: "new.person@example.test", signIn: true });
    const session = await signIn({
      email: joined.email,
      password: PASSWORD,
      address: "10.3.0.1",
      requestId: "test",
    });
    expect(await rolesOf(session.id)).toEqual(["geotechnical", "structural"]);
    expect(await rolesInProject(session.id, neighbour.projectId)).toEqual([]);
    expect((await auditVerbs(site.projectId)).slice(-2)).toEqual(["member:invite", "member:join"]);
  });

  it("is used up once, and not by looking at it", async () => {
    await inviteMember(site.lead, { email: "once@example.test", roles: ["reader"] });
    const token = await tokenMailedTo("once@example.test");
    for (let n = 0; n < 5; n += 1) await readInvitation(token);
    const given = { token, name: "Once Only", password: PASSWORD };
    const outcomes = await Promise.allSettled([
      acceptInvitation(visitor(), given),
      acceptInvitation(visitor(), given),
    ]);
    expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    expect((await refusalOf(readInvitation(token))).status).toBe(400);
  });

  it("is not used up when name or password is missing", async () => {
    await inviteMember(site.lead, { email: "missing@example.test", roles: ["reader"] });
    const token = await tokenMailedTo("missing@example.test");
    expect(Object.keys((await refusalOf(acceptInvitation(visitor(), { token }))).fields)).toEqual([
      "name",
      "password",
    ]);
    expect((await acceptInvitation(visitor(), { token, name: "Came Back", password: PASSWORD })).signIn).toBe(
      true,
    );
  });

  it("to somebody with an account is accepted by that person signed in, by nobody else", async () => {
    const person = await makePerson("Held Account");
    const other = await makePerson("Other Account");
    await inviteMember(site.lead, { email: person.email, roles: ["reader"] });
    const token = await tokenMailedTo(person.email);
    expect(
      (await refusalOf(acceptInvitation(visitor(), { token, name: "X", password: PASSWORD }))).status,
    ).toBe(401);
    expect((await refusalOf(acceptInvitation(visitor(other), { token }))).status).toBe(403);
    expect(await rolesOf(other.id)).toEqual([]);
    await acceptInvitation(visitor(person), { token });
    expect(await rolesOf(person.id)).toEqual(["reader"]);
    const [row] = await stored<{ name: string }>("select name from person where id = $1", [person.id]);
    expect(row?.name).toBe("Held Account");
  });

  it("cannot be used after seven days, after it was withdrawn, or after a newer one", async () => {
    const accept = (token: string) =>
      acceptInvitation(visitor(), { token, name: "Late Person", password: PASSWORD });
    await inviteMember(site.lead, { email: "late@example.test", roles: ["reader"] });
    const first = await tokenMailedTo("late@example.test");
    const { id } = await inviteMember(site.lead, { email: "late@example.test", roles: ["reader"] });
    const second = await tokenMailedTo("late@example.test");
    expect((await refusalOf(accept(first))).status).toBe(400);
    await cancelInvitation(site.lead, { invitationId: id });
    expect((await refusalOf(accept(second))).status).toBe(400);
    await inviteMember(site.lead, { email: "late@example.test", roles: ["reader"] });
    const third = await tokenMailedTo("late@example.test");
    await asSuperuser((db) =>
      db.query("update one_time_link set expires_at = now() - interval '1 second' where used_at is null"),
    );
    expect((await refusalOf(accept(third))).status).toBe(400);
  });

  it("goes to an address, not to a line that a mail server reads as two", async () => {
    for (const email of [
      "a@evil.example,b@example.test",
      '"a@evil.example"@example.test',
      "a@example.test\r\nBcc: b@evil.example",
    ])
      expect((await refusalOf(inviteMember(site.lead, { email, roles: ["reader"] }))).fields).toHaveProperty(
        "email",
      );
  });

  it("is not made for a member, without a role, or by anybody but a project lead", async () => {
    expect(
      (await refusalOf(inviteMember(site.lead, { email: site.reader.person.email, roles: ["lead"] }))).code,
    ).toBe("conflict");
    expect(
      (await refusalOf(inviteMember(site.lead, { email: "x@example.test", roles: [] }))).fields,
    ).toHaveProperty("roles");
    expect(
      (await refusalOf(inviteMember(site.lead, { email: "x@example.test", roles: ["owner"] }))).status,
    ).toBe(400);
    for (const context of [site.geotechnical, site.structural, site.reader])
      expect(
        (await refusalOf(inviteMember(context, { email: "x@example.test", roles: ["lead"] }))).status,
      ).toBe(403);
    expect(await stored("select 1 from one_time_link where email = 'x@example.test'")).toHaveLength(0);
  });

  it("of another project cannot be withdrawn", async () => {
    const { id } = await inviteMember(neighbour.lead, { email: "far@example.test", roles: ["reader"] });
    expect((await refusalOf(cancelInvitation(site.lead, { invitationId: id }))).status).toBe(404);
    expect((await listMembers(neighbour.lead)).invitations.map((open) => open.id)).toContain(id);
  });
});

describe("members", () => {
  it("are listed with addresses for the lead, without for others but their own", async () => {
    const seen = await listMembers(site.reader);
    expect(seen.invitations).toEqual([]);
    expect(seen.members.filter(({ email }) => email !== null).map(({ id }) => id)).toEqual([
      site.reader.person.id,
    ]);
    const { members, invitations } = await listMembers(site.lead);
    expect(members.every(({ email }) => email !== null)).toBe(true);
    expect(members.map(({ id }) => id)).not.toContain(neighbour.reader.person.id);
    expect(invitations.every(({ mail }) => mail === "waiting")).toBe(true);
  });

  it("hold several roles, and other ones from the next request on", async () => {
    const id = site.structural.person.id;
    await changeMember(site.lead, {
      memberId: id,
      roles: ["structural", "geotechnical"],
      seenRoles: ["structural"],
    });
    expect(await rolesOf(id)).toEqual(["geotechnical", "structural"]);
    await changeMember(site.lead, {
      memberId: id,
      roles: ["structural"],
      seenRoles: ["geotechnical", "structural"],
    });
    expect(await rolesOf(id)).toEqual(["structural"]);
    const [event] = await stored<{ verb: string; detail: string }>(
      "select verb, detail from audit_event where project_id = $1 order by seq desc limit 1",
      [site.projectId],
    );
    expect([event?.verb, JSON.parse(event?.detail ?? "")]).toEqual([
      "member:change",
      { before: ["geotechnical", "structural"], after: ["structural"] },
    ]);
  });

  it("are not changed by a lead who saw other roles", async () => {
    const id = site.structural.person.id;
    const refusal = await refusalOf(
      changeMember(site.lead, { memberId: id, roles: ["lead"], seenRoles: ["reader"] }),
    );
    expect(refusal.status).toBe(412);
    expect(await rolesOf(id)).toEqual(["structural"]);
  });

  it("keep at least one lead, even when two leads remove each other at once", async () => {
    const onlyLead = { memberId: neighbour.lead.person.id };
    expect((await refusalOf(removeMember(neighbour.lead, onlyLead))).code).toBe("conflict");
    expect(
      (await refusalOf(changeMember(neighbour.lead, { ...onlyLead, roles: ["reader"], seenRoles: ["lead"] })))
        .code,
    ).toBe("conflict");
    const second = neighbour.geotechnical;
    await changeMember(neighbour.lead, {
      memberId: second.person.id,
      roles: ["lead"],
      seenRoles: ["geotechnical"],
    });
    const outcomes = await Promise.allSettled([
      removeMember(neighbour.lead, { memberId: second.person.id }),
      removeMember({ ...second, roles: ["lead"] }, onlyLead),
    ]);
    expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    const leads = await stored("select 1 from membership where project_id = $1 and role = 'lead'", [
      neighbour.projectId,
    ]);
    expect(leads).toHaveLength(1);
  });

  it("lose the project at once when they are removed, whatever they still hold in hand", async () => {
    const context = site.reader;
    await removeMember(site.lead, { memberId: context.person.id });
    expect(await rolesOf(context.person.id)).toEqual([]);
    expect((await refusalOf(inProject(context, async () => "inside"))).status).toBe(404);
    expect((await refusalOf(listMembers(context))).status).toBe(404);
    expect((await auditVerbs(site.projectId)).at(-1)).toBe("member:remove");
  });

  it("of another project cannot be named", async () => {
    const memberId = neighbour.structural.person.id;
    expect((await refusalOf(removeMember(site.lead, { memberId }))).status).toBe(404);
    expect(
      (await refusalOf(changeMember(site.lead, { memberId, roles: ["lead"], seenRoles: [] }))).status,
    ).toBe(404);
    expect((await refusalOf(removeMember(site.lead, { memberId: randomUUID() }))).status).toBe(404);
    expect(await rolesInProject(memberId, neighbour.projectId)).toEqual(["structural"]);
  });

  it("cannot be given what the form does not hold", async () => {
    const refusal = await refusalOf(
      changeMember(site.lead, {
        memberId: site.structural.person.id,
        roles: ["structural"],
        seenRoles: ["structural"],
        projectId: neighbour.projectId,
        siteAdministrator: true,
      }),
    );
    expect(Object.keys(refusal.fields).sort()).toEqual(["projectId", "siteAdministrator"]);
  });
});
