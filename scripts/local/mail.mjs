import { join } from "node:path";
import { local } from "./folders.mjs";
import { end, forget, freePort, running, startDetached, until } from "./processes.mjs";

/** Starts the mail sink of that name if it is down. Answers with its SMTP address, its page and its folder. */
export async function ensureMailSink(name) {
  const folder = join(local, name);
  let record = running(name);
  if (record && !(await answers(record.pagePort))) {
    await end(name);
    record = undefined;
  }
  const started = !record;
  if (!record) {
    const port = await freePort(51_025, 2);
    record = { port, pagePort: port + 1 };
    const script = join(import.meta.dirname, "mail-sink.mjs");
    const args = [script, folder, String(record.port), String(record.pagePort)];
    const sink = startDetached(name, process.execPath, args, { facts: record });
    try {
      await until(() => answers(record.pagePort), {
        ended: sink.ended,
        complaint: `The mail sink did not start; see .local/log/${name}.log.`,
      });
    } catch (error) {
      forget(name);
      throw error;
    }
  }
  return {
    url: `smtp://127.0.0.1:${record.port}`,
    page: `http://127.0.0.1:${record.pagePort}/`,
    folder,
    started,
  };
}

async function answers(port) {
  try {
    const response = await fetch(`http://127.0.0.1:${port}/messages?to=nobody`, {
      signal: AbortSignal.timeout(3_000),
    });
    return response.ok;
  } catch {
    return false;
  }
}
