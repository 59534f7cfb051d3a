import { spawn } from "node:child_process";
import { mkdirSync, openSync, readFileSync, rmSync } from "node:fs";
import { createServer } from "node:net";
import { join } from "node:path";
import { local, readLocal, root, writeLocal } from "./folders.mjs";

/** When the process began, in clock ticks since boot: with the pid it names one process for good. Linux only. */
export function startTicks(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, "utf8");
    const fields = stat.slice(stat.lastIndexOf(")") + 2).split(" ");
    // A zombie has ended; only its parent has not heard yet.
    return fields[0] === "Z" ? undefined : fields[19];
  } catch {
    return undefined;
  }
}

/** The record of a process that we started under this name, if that very process still runs. */
export function running(name) {
  const record = readLocal(`run/${name}.json`);
  return record && startTicks(record.pid) === record.ticks ? record : undefined;
}

/** Notes a process as ours, with what others need to know of it (its port, say). */
export function note(name, pid, facts = {}) {
  writeLocal(`run/${name}.json`, { pid, ticks: startTicks(pid), ...facts });
}

/** Forgets a process; harmless when there was none. */
export function forget(name) {
  rmSync(join(local, "run", `${name}.json`), { force: true });
}

/** Starts a process that outlives this one, its output in `.local/log/<name>.log`, and notes it as ours. */
export function startDetached(name, command, args, { env, facts } = {}) {
  mkdirSync(join(local, "log"), { recursive: true });
  const log = openSync(join(local, "log", `${name}.log`), "a", 0o600);
  const child = spawn(command, args, { cwd: root, detached: true, stdio: ["ignore", log, log], env });
  let ended = false;
  child.once("exit", () => {
    ended = true;
  });
  child.once("error", () => {
    ended = true;
  });
  child.unref();
  if (child.pid) note(name, child.pid, facts);
  return { pid: child.pid, ended: () => ended };
}

/** Ends the process that we started under this name, and no other. Says whether there was one. */
export async function end(name, { signal = "SIGTERM", patience_ms = 15_000 } = {}) {
  const record = running(name);
  if (record) {
    process.kill(record.pid, signal);
    const given = Date.now();
    while (startTicks(record.pid) === record.ticks) {
      if (Date.now() - given > patience_ms) {
        process.kill(record.pid, "SIGKILL");
        await pause(200);
        break;
      }
      await pause(50);
    }
  }
  forget(name);
  return Boolean(record);
}

/** The first port from `from` upwards on which `count` neighbouring loopback ports are free. */
export async function freePort(from, count = 1) {
  for (let port = from; port < from + 2_000; port += 1) {
    let free = 0;
    while (free < count && (await isFree(port + free))) free += 1;
    if (free === count) return port;
  }
  throw new Error(`No free port was found from ${from} upwards.`);
}

function isFree(port) {
  return new Promise((answer) => {
    const probe = createServer();
    probe.once("error", () => answer(false));
    probe.listen({ port, host: "127.0.0.1", exclusive: true }, () => probe.close(() => answer(true)));
  });
}

/** Waits until `ready` answers truthily; throws `complaint` when `ended` says that nothing will come, or time is up. */
export async function until(ready, { ended = () => false, patience_ms = 60_000, complaint }) {
  const begun = Date.now();
  for (;;) {
    const answer = await ready();
    if (answer) return answer;
    if (ended() || Date.now() - begun > patience_ms) throw new Error(complaint);
    await pause(60);
  }
}

export const pause = (time_ms) => new Promise((done) => setTimeout(done, time_ms));
