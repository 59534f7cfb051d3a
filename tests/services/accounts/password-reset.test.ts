import { beforeAll, describe, expect, it } from "vitest";
import { requestPasswordReset } from "@/lib/services/accounts/request-password-reset";
import { resetPassword } from "@/lib/services/accounts/reset-password";
import { sessionHolder } from "@/lib/services/accounts/session-holder";
import { signIn } from "@/lib/services/accounts/sign-in";
import { freshDatabase } from "../../support/database";
import {
  asSuperuser,
  lookInto,
  makePerson,
  PASSWORD,
  refusalOf,
  stored,
  tokenMailedTo,
  visitor,
} from "../../support/site";

const NEW = "otter under the bridge";
const attempt = (email: string, password: string) =>
  signIn({ email, password, address: "10.1.1.1", requestId: "test" });
const links = (email: string) => stored("select 1 from one_time_link where email = $1", [email]);

beforeAll(async () => lookInto((await freshDatabase()).superuserUrl));

describe("a forgotten password", () => {
  it("is set anew with the link from the mail, which ends every session and works once", async () => {
    const person = await makePerson("Ada Thorne");
    const session = await attempt(person.email, PASSWORD);
    await requestPasswordReset(visitor(), { email: person.email });
    const token = await tokenMailedTo(person.email);
    expect(await resetPassword(visitor(), { token, password: NEW })).toEqual({ email: person.email });
    const held = {
      personId: session.id,
      sessionVersion: session.sessionVersion,
      sessionId: session.sessionId,
    };
    expect(await sessionHolder(held)).toBeNull();
    expect((await attempt(person.email, NEW)).id).toBe(person.id);
    expect(
      (await refusalOf(resetPassword(visitor(), { token, password: "heron over the water" }))).status,
    ).toBe(400);
    expect((await attempt(person.email, NEW)).id).toBe(person.id);
  });

  it("gets the same answer for an address that nobody has, and no link", async () => {
    const person = await makePerson("Ben Rooke");
    const known = await requestPasswordReset(visitor(), { email: person.email });
    const unknown = await requestPasswordReset(visitor(), { email: "nobody@example.test" });
    expect(unknown).toEqual(known);
    expect(await links("nobody@example.test")).toHaveLength(0);
    expect(await stored("select 1 from outbox where recipient = 'nobody@example.test'")).toHaveLength(0);
  });

  it("answers after the same time either way", async () => {
    const person = await makePerson("Cara Noble");
    const time = async (email: string) => {
      const began = performance.now();
      await requestPasswordReset(visitor(null, { address: "10.1.2.3" }), { email });
      return performance.now() - began;
    };
    const present = [];
    const absent = [];
    for (let round = 0; round < 4; round += 1) {
      present.push(await time(person.email));
      absent.push(await time(`nobody.${round}@example.test`));
    }
    const median = (times: number[]) => times.sort((a, b) => a - b)[1] ?? 0;
    expect(Math.abs(median(present) / median(absent) - 1)).toBeLessThan(0.05);
  });

  it("cannot be set with a link that is eleven minutes old", async () => {
    const person = await makePerson("Dan Shaw");
    await requestPasswordReset(visitor(), { email: person.email });
    const token = await tokenMailedTo(person.email);
    await asSuperuser((db) =>
      db.query("update one_time_link set expires_at = expires_at - interval '11 minutes' where email = $1", [
        person.email,
      ]),
    );
    expect((await refusalOf(resetPassword(visitor(), { token, password: NEW }))).status).toBe(400);
    expect((await attempt(person.email, PASSWORD)).id).toBe(person.id);
  });

  it("is set by one of two who use the link at once", async () => {
    const person = await makePerson("Eve Marsh");
    await requestPasswordReset(visitor(), { email: person.email });
    const token = await tokenMailedTo(person.email);
    const outcomes = await Promise.allSettled(
      ["first password here", "second password here"].map((password) =>
        resetPassword(visitor(), { token, password }),
      ),
    );
    expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
  });

  it("keeps the link when the new password is refused", async () => {
    const person = await makePerson("Finn Lowe");
    await requestPasswordReset(visitor(), { email: person.email });
    const token = await tokenMailedTo(person.email);
    for (const password of ["short", "aaaaaaaaaaaaaaa", "password1234"])
      expect((await refusalOf(resetPassword(visitor(), { token, password }))).fields).toHaveProperty(
        "password",
      );
    expect(await resetPassword(visitor(), { token, password: NEW })).toEqual({ email: person.email });
  });

  it("sends at most five links an hour to one address, and says nothing of it", async () => {
    const person = await makePerson("Gwen Ash");
    for (let n = 0; n < 7; n += 1)
      await requestPasswordReset(visitor(null, { address: `10.2.0.${n}` }), { email: person.email });
    expect(await links(person.email)).toHaveLength(5);
  });

  it("stores no token, and mails it to the stored address and to nobody else", async () => {
    const person = await makePerson("Hugh Vale");
    await requestPasswordReset(visitor(), { email: " HUGH.vale@Example.Test" });
    const token = await tokenMailedTo(person.email);
    const rows = await stored<{ all: string }>(
      "select l::text as all from one_time_link l where email = $1",
      [person.email],
    );
    expect(rows[0]?.all).not.toContain(token);
    for (const email of [
      '"hugh.vale@example.test"@evil.example',
      "hugh.vale@example.test,x@evil.example",
      "hugh.vale＠example.test",
    ])
      expect((await refusalOf(requestPasswordReset(visitor(), { email }))).fields).toHaveProperty("email");
    expect(
      await stored(
        "select distinct recipient from outbox where recipient like '%vale%' or recipient like '%evil%'",
      ),
    ).toEqual([{ recipient: person.email }]);
  });

  it("builds its link from the configured address", async () => {
    const person = await makePerson("Ida Frost");
    await requestPasswordReset(visitor(), { email: person.email });
    const [letter] = await stored<{ body: string }>("select body from outbox where recipient = $1", [
      person.email,
    ]);
    expect(letter?.body).toContain(`${process.env.APP_ORIGIN}/reset/`);
  });
});
