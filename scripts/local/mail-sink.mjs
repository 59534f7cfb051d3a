import { mkdirSync, readdirSync, readFileSync, renameSync, rmSync, writeFileSync } from "node:fs";
import { createServer } from "node:http";
import { join } from "node:path";
import { SMTPServer } from "smtp-server";
import { readMessage } from "./read-message.mjs";

/*
 * A mail server that delivers nothing: each message it is given is kept as a file (.eml as it came, .json as read) and
 * shown on a plain page. Started by scripts/local/mail.mjs: mail-sink.mjs FOLDER SMTP-PORT HTTP-PORT
 */
const [folder, smtpPort, httpPort] = [process.argv[2], Number(process.argv[3]), Number(process.argv[4])];
mkdirSync(folder, { recursive: true, mode: 0o700 });

const ending = /^(\d{6})-[\w-]+\.json$/;
let count = Math.max(0, ...readdirSync(folder).map((name) => Number(ending.exec(name)?.[1] ?? 0)));

function keep(raw, envelope) {
  count += 1;
  const name = `${String(count).padStart(6, "0")}-${Date.now().toString(36)}`;
  const message = { number: count, received: new Date().toISOString(), envelope, ...readMessage(raw) };
  writeFileSync(join(folder, `${name}.eml`), raw, { encoding: "latin1", mode: 0o600 });
  // Named last and at once: whoever sees the .json sees a whole message.
  writeFileSync(join(folder, `.${name}`), JSON.stringify(message, null, 2), { mode: 0o600 });
  renameSync(join(folder, `.${name}`), join(folder, `${name}.json`));
}

function messages(to) {
  const names = readdirSync(folder).filter((name) => ending.test(name));
  const all = names.sort().map((name) => JSON.parse(readFileSync(join(folder, name), "utf8")));
  return to ? all.filter((message) => message.envelope.to.includes(to)) : all;
}

const smtp = new SMTPServer({
  authOptional: true,
  disabledCommands: ["STARTTLS", "AUTH"],
  disableReverseLookup: true,
  size: 10_000_000,
  logger: false,
  onData(stream, session, done) {
    const chunks = [];
    stream.on("data", (chunk) => chunks.push(chunk));
    stream.on("end", () => {
      if (stream.sizeExceeded)
        return done(Object.assign(new Error("The message is too large."), { responseCode: 552 }));
      const { mailFrom, rcptTo } = session.envelope;
      keep(Buffer.concat(chunks).toString("latin1"), {
        from: mailFrom ? mailFrom.address : "",
        to: rcptTo.map((recipient) => recipient.address),
      });
      done();
    });
  },
});
smtp.on("error", (error) => console.error(error.message));

const pages = createServer((request, response) => {
  const url = new URL(request.url ?? "/", "http://sink");
  const to = url.searchParams.get("to") ?? undefined;
  const own =
    request.headers.host === `127.0.0.1:${httpPort}` || request.headers.host === `localhost:${httpPort}`;
  if (!own) return answer(response, 403, "text/plain", "Ask for this page at 127.0.0.1.");
  if (
    request.method === "DELETE" &&
    url.pathname === "/messages" &&
    request.headers["x-mail-sink"] === "empty"
  ) {
    for (const name of readdirSync(folder)) rmSync(join(folder, name));
    return answer(response, 204, "text/plain", "");
  }
  if (request.method !== "GET") return answer(response, 405, "text/plain", "This server only shows mail.");
  if (url.pathname === "/messages")
    return answer(response, 200, "application/json", JSON.stringify(messages(to)));
  if (url.pathname === "/") return answer(response, 200, "text/html", page(messages(to)));
  answer(response, 404, "text/plain", "There is nothing here.");
});

function answer(response, status, type, body) {
  response.writeHead(status, {
    "content-type": `${type}; charset=utf-8`,
    "content-security-policy": "default-src 'none'; style-src 'unsafe-inline'",
    "x-content-type-options": "nosniff",
    "cache-control": "no-store",
  });
  response.end(body);
}

function page(all) {
  const shown = all
    .reverse()
    .map(
      (message) => `<article><h2>${plain(message.subject)}</h2>
<p>To ${plain(message.envelope.to.join(", "))}, from ${plain(message.from)}, ${plain(message.received)}</p>
<pre>${linked(plain(message.text))}</pre></article>`,
    )
    .join("\n");
  return `<!doctype html><html lang="en"><meta charset="utf-8"><title>Mail kept here</title>
<style>body{font:16px/1.5 sans-serif;max-width:52rem;margin:2rem auto;padding:0 1rem}article{border-top:1px solid #999}
h2{font-size:1.1rem;margin:.8rem 0 0}p{margin:.2rem 0;color:#555}pre{white-space:pre-wrap;font:inherit}</style>
<h1>Mail kept here</h1><p>${all.length} messages; nothing leaves this machine.</p>${shown}</html>`;
}

const plain = (text) => text.replace(/[&<>"']/g, (sign) => `&#${sign.charCodeAt(0)};`);
const linked = (text) => text.replace(/https?:\/\/[^\s<>"]+/g, (url) => `<a href="${url}">${url}</a>`);

smtp.listen(smtpPort, "127.0.0.1");
pages.listen(httpPort, "127.0.0.1");
for (const signal of ["SIGTERM", "SIGINT"]) process.on(signal, () => process.exit(0));
