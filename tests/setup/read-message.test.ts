import { createTransport } from "nodemailer";
import { describe, expect, it } from "vitest";
import { readMessage } from "@/scripts/local/read-message.mjs";

/** The bytes that our own mail library would send, one character each. */
async function sent(mail: Record<string, unknown>): Promise<string> {
  const transport = createTransport({ streamTransport: true, buffer: true });
  const { message } = await transport.sendMail({
    from: "register@site.example",
    to: "lead@site.example",
    ...mail,
  });
  return (message as Buffer).toString("latin1");
}

describe("a kept mail", () => {
  it.each([
    ["plain", "Value revised: P02 issued.\nSee the register."],
    ["not ASCII", "Für Zone Ä gilt σ ≤ 150 kPa, Größe 2,4 m × 2,4 m.\n\nGründung wird geprüft."],
    ["long lines", `${"The footing stands on it. ".repeat(40)}\nEnd.`],
    ["signs that encodings use", "a = b; =3D; 100 %; _x_ ?= <tag> & so on\n.\n..leading dots"],
  ])("reads as it was written: %s", async (_kind, text) => {
    const read = readMessage(await sent({ subject: "Revision", text }));
    expect(read.text.replace(/\r\n/g, "\n").trimEnd()).toBe(text);
    expect(read.to).toBe("lead@site.example");
  });

  it("gives a subject of any length and script", async () => {
    const subject =
      "Geänderter Wert für „Zone Ä – Süd“: 150 → 120 kPa, 14 Fundamente betroffen, σ ≤ 120 kPa überall";
    expect(readMessage(await sent({ subject, text: "x" })).subject).toBe(subject);
  });

  it("gives text and HTML of a mail that has both", async () => {
    const read = readMessage(await sent({ subject: "Both", text: "prüfen", html: "<p>prüfen</p>" }));
    expect([read.text.trim(), read.html.trim()]).toEqual(["prüfen", "<p>prüfen</p>"]);
  });

  it("keeps the message's own id, by which a repeated delivery is known", async () => {
    const read = readMessage(await sent({ subject: "Once", text: "x", messageId: "<a.1@register.example>" }));
    expect(read.messageId).toBe("<a.1@register.example>");
  });
});
