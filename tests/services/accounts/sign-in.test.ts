import { beforeAll, describe, expect, it } from "vitest";
import { changePassword } from "@/lib/services/accounts/change-password";
import { endSession, signOutEverywhere } from "@/lib/services/accounts/end-sessions";
import { setAccountOpen } from "@/lib/services/accounts/people";
import { sessionHolder } from "@/lib/services/accounts/session-holder";
import { type NewSession, signIn } from "@/lib/services/accounts/sign-in";
import { wait_s } from "@/lib/services/accounts/throttle";
import { freshDatabase } from "../../support/database";
import { asSuperuser, lookInto, makePerson, PASSWORD, refusalOf, stored, visitor } from "../../support/site";

let address = 10;
/** A place nobody has come from yet. */
const elsewhere = () => {
  address += 1;
  return `10.0.0.${address}`;
};
const attempt = (email: string, password: string, from = elsewhere()) =>
  signIn({ email, password, address: from, requestId: "test" });
const held = ({ id, sessionVersion, sessionId }: NewSession) => ({ personId: id, sessionVersion, sessionId });
const age = (sql: string, session: NewSession) =>
  asSuperuser((db) => db.query(`update person_session set ${sql} where id = $1`, [session.sessionId]));

beforeAll(async () => lookInto((await freshDatabase()).superuserUrl));

describe("signing in", () => {
  it("opens a session for the right password, however the address is written", async () => {
    const person = await makePerson("Ada Thorne");
    const session = await attempt("  ADA.Thorne@example.test", PASSWORD);
    expect(session.id).toBe(person.id);
    expect(await sessionHolder(held(session))).toEqual(person);
    expect(await stored("select verb from site_event where person_id = $1", [person.id])).toEqual([
      { verb: "account:sign-in" },
    ]);
  });

  it("refuses a wrong password, an absent account, a shut one and one without a password in the same words", async () => {
    await makePerson("Ben Rooke");
    await makePerson("Cara Noble", { password: null });
    const shut = await makePerson("Dan Shaw");
    await asSuperuser((db) => db.query("update person set disabled_at = now() where id = $1", [shut.id]));
    const messages = await Promise.all(
      [
        attempt("ben.rooke@example.test", "not the password"),
        attempt("nobody@example.test", PASSWORD),
        attempt("cara.noble@example.test", PASSWORD),
        attempt("cara.noble@example.test", ""),
        attempt("dan.shaw@example.test", PASSWORD),
        attempt('"a@evil.example"@example.test', PASSWORD),
      ].map((tried) =>
        tried.then(
          () => "signed in",
          (error: Error) => error.message,
        ),
      ),
    );
    expect(new Set(messages)).toEqual(new Set(["E-mail or password is not right."]));
  });

  it("takes as long for an absent account as for a wrong password", async () => {
    await makePerson("Eve Marsh");
    const time = async (email: string) => {
      const began = performance.now();
      await attempt(email, "not the password").catch(() => {});
      return performance.now() - began;
    };
    const present: number[] = [];
    const absent: number[] = [];
    // Interleaved, and cleared in between, so that neither side meets another machine or the throttle.
    for (let round = 0; round < 40; round += 1) {
      if (round % 2 === 0)
        present.push(await time("eve.marsh@example.test"), await time("eve.marsh@example.test"));
      else
        absent.push(await time(`nobody.${round}@example.test`), await time(`nobody.${round}@example.test`));
      await asSuperuser((db) => db.query("delete from sign_in_attempt where account like 'eve%'"));
    }
    const median = (times: number[]) => times.sort((a, b) => a - b)[Math.floor(times.length / 2)] ?? 0;
    // The hash is most of the time. Without it an absent account would answer in a tenth; noise here is below a half.
    expect(median(absent) / median(present)).toBeGreaterThan(0.6);
    expect(median(absent) / median(present)).toBeLessThan(1.67);
  });
});

describe("guessing", () => {
  it("waits longer each time, a minute at most", () => {
    expect([4, 5, 6, 7, 10, 11, 500].map((failures) => wait_s(failures, 5))).toEqual([
      0, 1, 2, 4, 32, 60, 60,
    ]);
  });

  it("is slowed for the account, from however many places it comes", async () => {
    await makePerson("Finn Lowe");
    const outcomes = [];
    for (let n = 0; n < 20; n += 1)
      outcomes.push((await refusalOf(attempt("finn.lowe@example.test", `guess ${n}`))).code);
    expect(outcomes.slice(0, 10)).toEqual(Array(10).fill("signed-out"));
    expect(outcomes.slice(10)).toContain("throttled");
  });

  it("does not slow the account's owner at the usual place", async () => {
    const home = elsewhere();
    await makePerson("Gwen Ash");
    await attempt("gwen.ash@example.test", PASSWORD, home);
    for (let n = 0; n < 14; n += 1) await attempt("gwen.ash@example.test", `guess ${n}`).catch(() => {});
    expect((await refusalOf(attempt("gwen.ash@example.test", PASSWORD))).code).toBe("throttled");
    expect((await attempt("gwen.ash@example.test", PASSWORD, home)).name).toBe("Gwen Ash");
  });

  it("is slowed for one place over many accounts, and leaves those at home there alone", async () => {
    const office = elsewhere();
    await makePerson("Hugh Vale");
    await attempt("hugh.vale@example.test", PASSWORD, office);
    const codes = [];
    for (let n = 0; n < 22; n += 1)
      codes.push((await refusalOf(attempt(`spray.${n}@example.test`, "guess", office))).code);
    expect(codes.slice(0, 20)).toEqual(Array(20).fill("signed-out"));
    expect(codes.slice(20)).toContain("throttled");
    expect((await attempt("hugh.vale@example.test", PASSWORD, office)).name).toBe("Hugh Vale");
  });

  it("lets the rightful person in again after the wait", async () => {
    await makePerson("Ida Frost");
    for (let n = 0; n < 11; n += 1) await attempt("ida.frost@example.test", `guess ${n}`).catch(() => {});
    await asSuperuser((db) =>
      db.query(
        "update sign_in_attempt set at = at - interval '61 seconds' where account = 'ida.frost@example.test'",
      ),
    );
    expect((await attempt("ida.frost@example.test", PASSWORD)).name).toBe("Ida Frost");
  });

  it("is worth no more when many tries come at once", async () => {
    await makePerson("Jon Reed");
    const codes = await Promise.all(
      Array.from({ length: 40 }, (_, n) =>
        attempt("jon.reed@example.test", `guess ${n}`).then(
          () => "in",
          (error: { code: string }) => error.code,
        ),
      ),
    );
    expect(codes.filter((code) => code === "signed-out").length).toBeLessThanOrEqual(12);
    expect(codes.filter((code) => code === "throttled").length).toBeGreaterThanOrEqual(28);
  });
});

describe("a session", () => {
  it("ends when its person signs out, and no other does", async () => {
    await makePerson("Kit Dale");
    const one = await attempt("kit.dale@example.test", PASSWORD);
    const two = await attempt("kit.dale@example.test", PASSWORD);
    await endSession(one.sessionId, one.id, "test");
    expect(await sessionHolder(held(one))).toBeNull();
    expect(await sessionHolder(held(two))).not.toBeNull();
  });

  it("ends everywhere when the person says so", async () => {
    const person = await makePerson("Lea Moss");
    const sessions = [
      await attempt("lea.moss@example.test", PASSWORD),
      await attempt("lea.moss@example.test", PASSWORD),
    ];
    await signOutEverywhere(visitor(person));
    for (const session of sessions) expect(await sessionHolder(held(session))).toBeNull();
  });

  it("ends at once when the account is shut, and its old cookie does not come back with it", async () => {
    const administrator = await makePerson("Mia Administrator", { siteAdministrator: true });
    const person = await makePerson("Ned Carr");
    const session = await attempt("ned.carr@example.test", PASSWORD);
    await setAccountOpen(visitor(administrator), { personId: person.id, open: false });
    expect(await sessionHolder(held(session))).toBeNull();
    await setAccountOpen(visitor(administrator), { personId: person.id, open: true });
    expect(await sessionHolder(held(session))).toBeNull();
  });

  it("survives a new password in the browser that set it, and ends in the others", async () => {
    const person = await makePerson("Oda Birch");
    const [here, there] = [
      await attempt("oda.birch@example.test", PASSWORD),
      await attempt("oda.birch@example.test", PASSWORD),
    ];
    await changePassword(visitor(person, { sessionId: here.sessionId }), {
      currentPassword: PASSWORD,
      password: "otter under the bridge",
    });
    expect(await sessionHolder(held(here))).not.toBeNull();
    expect(await sessionHolder(held(there))).toBeNull();
    expect((await refusalOf(attempt("oda.birch@example.test", PASSWORD))).code).toBe("signed-out");
    expect((await attempt("oda.birch@example.test", "otter under the bridge")).id).toBe(person.id);
  });

  it("keeps the old password when the one asked for is wrong", async () => {
    const person = await makePerson("Pia Stone");
    const refusal = await refusalOf(
      changePassword(visitor(person), {
        currentPassword: "something else",
        password: "otter under the bridge",
      }),
    );
    expect(refusal.fields).toHaveProperty("currentPassword");
    expect((await attempt("pia.stone@example.test", PASSWORD)).id).toBe(person.id);
  });

  it("ends after eight hours unused, to the second", async () => {
    await makePerson("Quin Wood");
    const session = await attempt("quin.wood@example.test", PASSWORD);
    await age("seen_at = now() - interval '8 hours' + interval '5 seconds'", session);
    expect(await sessionHolder(held(session), false)).not.toBeNull();
    await age("seen_at = now() - interval '8 hours' - interval '1 second'", session);
    expect(await sessionHolder(held(session))).toBeNull();
  });

  it("ends a day after sign-in, used or not", async () => {
    await makePerson("Rae Holm");
    const session = await attempt("rae.holm@example.test", PASSWORD);
    await age("started_at = now() - interval '24 hours' + interval '5 seconds'", session);
    expect(await sessionHolder(held(session))).not.toBeNull();
    await age("started_at = now() - interval '24 hours' - interval '1 second'", session);
    expect(await sessionHolder(held(session))).toBeNull();
  });

  it("counts a request as use, and an open stream not", async () => {
    await makePerson("Sol Brook");
    const session = await attempt("sol.brook@example.test", PASSWORD);
    await age("seen_at = now() - interval '1 hour'", session);
    const seen = async () =>
      (
        await stored<{ recent: boolean }>(
          "select seen_at > now() - interval '1 minute' as recent from person_session where id = $1",
          [session.sessionId],
        )
      )[0]?.recent;
    await sessionHolder(held(session), false);
    expect(await seen()).toBe(false);
    await sessionHolder(held(session));
    expect(await seen()).toBe(true);
  });

  it("belongs to its person and its version only", async () => {
    await makePerson("Tess Fell");
    const other = await makePerson("Una Crag");
    const session = await attempt("tess.fell@example.test", PASSWORD);
    expect(await sessionHolder({ ...held(session), personId: other.id })).toBeNull();
    expect(await sessionHolder({ ...held(session), sessionVersion: session.sessionVersion + 1 })).toBeNull();
    expect(await sessionHolder({ ...held(session), sessionId: "' or true --" })).toBeNull();
  });
});
