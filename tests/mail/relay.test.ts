import { randomUUID } from "node:crypto";
import { createServer, type Server, type Socket } from "node:net";
import { sql } from "drizzle-orm";
import { SMTPServer, type SMTPServerOptions } from "smtp-server";
import { afterEach, beforeAll, beforeEach, describe, expect, it } from "vitest";
import { letterOf, type Waiting } from "@/lib/mail/letter";
import { backOff_s, type MailServer, mailServer, sendWaiting } from "@/lib/mail/relay";
import { inProject, throughDoor } from "@/lib/services/context";
import { removeMember } from "@/lib/services/members/remove-member";
import { type Letter, queueMail } from "@/lib/services/outbox";
import { freshDatabase } from "../support/database";
import { asSuperuser, lookInto, makeSite, type Site, stored } from "../support/site";

const FROM = "Holdground <register@holdground.example>";
let site: Site;
let sink: SMTPServer | undefined;
let transport: MailServer | undefined;
let received: { to: string[]; from: string; text: string; id: string }[] = [];

beforeAll(async () => {
  lookInto((await freshDatabase()).superuserUrl);
  site = await makeSite("L-01");
});
beforeEach(async () => {
  received = [];
  await asSuperuser((db) => db.query("delete from outbox"));
});
afterEach(async () => {
  transport?.close();
  await new Promise<void>((done) => (sink ? sink.close(() => done()) : done()));
  sink = undefined;
});

/** A real mail server on loopback that keeps what it takes. */
async function openSink(over: SMTPServerOptions = {}, port = 0): Promise<number> {
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ["STARTTLS"],
    logger: false,
    onData(stream, session, done) {
      const parts: Buffer[] = [];
      stream.on("data", (part: Buffer) => parts.push(part));
      stream.on("end", () => {
        const text = Buffer.concat(parts).toString("utf8");
        received.push({
          to: session.envelope.rcptTo.map(({ address }) => address),
          from: session.envelope.mailFrom ? session.envelope.mailFrom.address : "",
          text,
          id: /^Message-ID: (.*)$/im.exec(text)?.[1] ?? "",
        });
        done();
      });
    },
    ...over,
  });
  server.on("error", () => {});
  sink = server;
  await new Promise<void>((listening) => server.listen(port, "127.0.0.1", () => listening()));
  const address = server.server.address();
  return typeof address === "object" && address ? address.port : 0;
}
const through = (port: number): MailServer => {
  transport?.close();
  transport = mailServer(`smtp://127.0.0.1:${port}`);
  return transport;
};
const queue = (letters: Partial<Letter>[]) =>
  inProject(site.lead, (tx) =>
    queueMail(
      tx,
      site.lead,
      letters.map((letter) => ({
        key: randomUUID(),
        recipient: "mira@office.example",
        subject: "A subject",
        body: "A body",
        ...letter,
      })),
    ),
  );
const due = () =>
  asSuperuser((db) => db.query("update outbox set next_attempt_at = now() where sent_at is null"));
const outbox = () =>
  stored<{ sent: boolean; failure: string | null; attempts: number }>(
    "select sent_at is not null as sent, failure, attempts from outbox order by created_at, id",
  );

describe("the mail relay", () => {
  it("sends each waiting letter once, to its one recipient", async () => {
    const port = await openSink();
    await queue([
      { recipient: "a@office.example" },
      { recipient: "b@office.example" },
      { recipient: "c@office.example" },
    ]);
    expect(await sendWaiting(through(port), FROM)).toEqual({ sent: 3, delayed: 0, failed: 0 });
    expect(await sendWaiting(through(port), FROM)).toEqual({ sent: 0, delayed: 0, failed: 0 });
    expect(received.map(({ to }) => to.join()).sort()).toEqual([
      "a@office.example",
      "b@office.example",
      "c@office.example",
    ]);
    expect(received.every(({ from }) => from === "register@holdground.example")).toBe(true);
  });

  it("loses nothing while the server is down, and sends all when it is back, each once", async () => {
    const port = await openSink();
    await new Promise<void>((done) => sink?.close(() => done()));
    sink = undefined;
    await queue(
      Array.from({ length: 500 }, (_, n) => ({ key: `j01/${n}`, recipient: `p${n}@office.example` })),
    );
    const down = await sendWaiting(through(port), FROM);
    expect(down.sent).toBe(0);
    expect(down.failed).toBe(0);
    expect((await outbox()).filter(({ sent, failure }) => !sent && failure === null)).toHaveLength(500);
    await openSink({}, port);
    await due();
    expect((await sendWaiting(through(port), FROM)).sent).toBe(500);
    expect(new Set(received.flatMap(({ to }) => to)).size).toBe(500);
    expect(received).toHaveLength(500);
  });

  it("sends again under the same Message-ID when the server took a letter and never said so", async () => {
    let cut = true;
    let raw: Socket | undefined;
    const port = await openSink({
      onConnect: (_session, done) => done(),
      onData(stream, session, done) {
        const parts: Buffer[] = [];
        stream.on("data", (part: Buffer) => parts.push(part));
        stream.on("end", () => {
          const text = Buffer.concat(parts).toString("utf8");
          received.push({
            to: session.envelope.rcptTo.map(({ address }) => address),
            from: "",
            text,
            id: /^Message-ID: (.*)$/im.exec(text)?.[1] ?? "",
          });
          if (cut) raw?.destroy();
          else done();
        });
      },
    });
    sink?.server.on("connection", (socket: Socket) => {
      raw = socket;
    });
    await queue([{ key: "cut" }]);
    expect((await sendWaiting(through(port), FROM)).delayed).toBe(1);
    cut = false;
    await due();
    expect((await sendWaiting(through(port), FROM)).sent).toBe(1);
    expect(received).toHaveLength(2);
    expect(received[0]?.id).toMatch(/^<[0-9a-f]{40}@holdground\.example>$/);
    expect(received[1]?.id).toBe(received[0]?.id);
  });

  it("records a refusal for good, tries again after a passing one, and lets the others go", async () => {
    const codes: Record<string, number> = {
      "gone@office.example": 550,
      "full@office.example": 450,
      "busy@office.example": 421,
    };
    const port = await openSink({
      onRcptTo(address, _session, done) {
        const code = codes[address.address];
        done(code ? Object.assign(new Error("Not now"), { responseCode: code }) : undefined);
      },
    });
    await queue([...Object.keys(codes), "fine@office.example"].map((recipient) => ({ recipient })));
    expect(await sendWaiting(through(port), FROM)).toEqual({ sent: 1, delayed: 2, failed: 1 });
    expect(received.map(({ to }) => to.join())).toEqual(["fine@office.example"]);
    const [gone] = await stored<{ failure: string }>(
      "select failure from outbox where recipient = 'gone@office.example'",
    );
    expect(gone?.failure).toContain("550");
    const waiting = await stored<{ recipient: string }>(
      "select recipient from outbox where sent_at is null and failure is null and next_attempt_at > now() order by 1",
    );
    expect(waiting.map(({ recipient }) => recipient)).toEqual(["busy@office.example", "full@office.example"]);
  });

  it("waits longer after each try, five minutes at most, and gives up after five days", async () => {
    expect([1, 2, 3, 6, 7, 40].map(backOff_s)).toEqual([5, 10, 20, 160, 300, 300]);
    const port = await openSink({
      onRcptTo: (_address, _session, done) =>
        done(Object.assign(new Error("Try later"), { responseCode: 451 })),
    });
    await queue([{}]);
    await asSuperuser((db) => db.query("update outbox set created_at = now() - interval '5 days 1 minute'"));
    expect((await sendWaiting(through(port), FROM)).failed).toBe(1);
    expect((await outbox())[0]?.failure).toContain("451");
  });

  it("does not wait for a server that says nothing: its letter is only delayed", async () => {
    const silent: Server = createServer(() => {});
    await new Promise<void>((listening) => silent.listen(0, "127.0.0.1", () => listening()));
    const address = silent.address();
    await queue([{}]);
    const began = performance.now();
    expect(
      await sendWaiting(through(typeof address === "object" && address ? address.port : 0), FROM),
    ).toMatchObject({ delayed: 1 });
    expect(performance.now() - began).toBeLessThan(25_000);
    silent.close();
  });

  it("shares the letters between two relays and sends none twice", async () => {
    const port = await openSink();
    await queue(Array.from({ length: 120 }, (_, n) => ({ recipient: `q${n}@office.example` })));
    const [one, two] = [mailServer(`smtp://127.0.0.1:${port}`), mailServer(`smtp://127.0.0.1:${port}`)];
    const [a, b] = await Promise.all([sendWaiting(one, FROM), sendWaiting(two, FROM)]);
    one.close();
    two.close();
    expect(a.sent + b.sent).toBe(120);
    expect(received).toHaveLength(120);
  });

  it("takes up a letter again that a relay claimed and died with", async () => {
    const port = await openSink();
    await queue([{ key: "orphan" }]);
    await asSuperuser((db) =>
      db.query("update outbox set attempts = 1, next_attempt_at = now() + interval '120 seconds'"),
    );
    expect((await sendWaiting(through(port), FROM)).sent).toBe(0);
    await due();
    expect((await sendWaiting(through(port), FROM)).sent).toBe(1);
  });

  it("sends nothing that was queued by a transaction that failed", async () => {
    const port = await openSink();
    await inProject(site.lead, async (tx) => {
      await queueMail(tx, site.lead, [
        { key: "rolled back", recipient: "a@office.example", subject: "s", body: "b" },
      ]);
      throw new Error("back");
    }).catch(() => {});
    expect((await sendWaiting(through(port), FROM)).sent).toBe(0);
    expect(received).toEqual([]);
  });

  it("queues a message once under one key", async () => {
    await queue([{ key: "same" }]);
    await queue([{ key: "same" }]);
    expect(await outbox()).toHaveLength(1);
  });

  it("tells a person nothing of a project that the person has left, nor a shut account", async () => {
    const port = await openSink();
    const { id, email } = site.reader.person;
    await queue([{ recipientId: id, recipient: email }]);
    await removeMember(site.lead, { memberId: id });
    expect((await sendWaiting(through(port), FROM)).failed).toBe(1);
    const shut = site.structural.person;
    await queue([{ recipientId: shut.id, recipient: shut.email }]);
    await asSuperuser((db) => db.query("update person set disabled_at = now() where id = $1", [shut.id]));
    expect((await sendWaiting(through(port), FROM)).failed).toBe(1);
    expect(received).toEqual([]);
  });

  it("keeps line breaks, other recipients and endless lines out of envelope and headers", async () => {
    const port = await openSink();
    await queue([
      { subject: "Zone B\r\nBcc: evil@evil.example\r\n\r\nBody" },
      { subject: `"quoted" Bcc: x@evil.example ${"long ".repeat(400)}` },
      {
        subject: "Größe ≤ 1,0 · Σ",
        body: "First line\r\n.\r\nRCPT TO:<evil@evil.example>\r\nBcc: evil@evil.example",
      },
      { recipient: "a@office.example\r\nBcc: evil@evil.example" },
      { recipient: "a@office.example,evil@evil.example" },
      { recipient: '"evil@evil.example"@office.example' },
    ]);
    expect(await sendWaiting(through(port), FROM)).toEqual({ sent: 3, delayed: 0, failed: 3 });
    expect(received.map(({ to }) => to)).toEqual(Array(3).fill(["mira@office.example"]));
    for (const { text } of received) {
      const head = text.slice(0, text.indexOf("\r\n\r\n"));
      expect(head).not.toMatch(/^(bcc|cc):/im);
      expect(head.split("\r\n").every((line) => line.length <= 998)).toBe(true);
      expect(head.match(/^(To|Subject|Message-ID):/gim)).toHaveLength(3);
    }
    expect(received.map(({ text }) => text).join()).toContain("RCPT TO:<evil@evil.example>");
  });
});

describe("a letter", () => {
  const row: Waiting = {
    id: "1",
    projectId: null,
    messageKey: "change/1/2",
    recipientId: null,
    recipient: "a@office.example",
    subject: "s",
    body: "b",
    attempts: 1,
  };

  it("has a Message-ID that stands on its key alone", () => {
    expect(letterOf({ ...row, attempts: 9, body: "other" }, FROM)?.messageId).toBe(
      letterOf(row, FROM)?.messageId,
    );
    expect(letterOf({ ...row, messageKey: "change/1/3" }, FROM)?.messageId).not.toBe(
      letterOf(row, FROM)?.messageId,
    );
  });

  it("is not made for an address in another form than the stored one", () => {
    expect(letterOf({ ...row, recipient: "A@office.example" }, FROM)).toBeNull();
  });
});

/** The relay's own door is used above throughout; this one shows that it opens the outbox and nothing else. */
describe("the relay's door", () => {
  it("sees letters and no project", async () => {
    const seen = await throughDoor("relay", async (tx) => ({
      projects: (await tx.execute(sql`select 1 from project`)).rowCount,
      events: (await tx.execute(sql`select 1 from audit_event`)).rowCount,
    }));
    expect(seen).toEqual({ projects: 0, events: 0 });
  });
});
