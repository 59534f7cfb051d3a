import { type ChildProcess, spawn } from "node:child_process";
import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import { afterEach, describe, expect, it } from "vitest";
import { writeLocal } from "@/scripts/local/folders.mjs";
import { oneAtATime } from "@/scripts/local/lock.mjs";
import { end, forget, freePort, note, running, startTicks } from "@/scripts/local/processes.mjs";

const name = `test-${process.pid}`;
const children: ChildProcess[] = [];

function sleeper(): ChildProcess & { pid: number } {
  const child = spawn("sleep", ["60"]);
  children.push(child);
  return child as ChildProcess & { pid: number };
}

afterEach(() => {
  forget(name);
  for (const child of children.splice(0)) child.kill("SIGKILL");
});

describe("a process that was started here", () => {
  it("is known by pid and start, and ended by name", async () => {
    const child = sleeper();
    note(name, child.pid, { port: 4000 });
    expect(running(name)).toMatchObject({ pid: child.pid, port: 4000 });
    expect(await end(name)).toBe(true);
    expect(startTicks(child.pid)).toBeUndefined();
    expect(running(name)).toBeUndefined();
  });

  it("is not mistaken for a stranger that has been given its pid: the stranger lives on", async () => {
    const stranger = sleeper();
    writeLocal(`run/${name}.json`, { pid: stranger.pid, ticks: "1" });
    expect(running(name)).toBeUndefined();
    expect(await end(name)).toBe(false);
    expect(startTicks(stranger.pid)).toBeDefined();
  });

  it("is killed when it does not heed the signal", async () => {
    const deaf = spawn("sh", ["-c", "trap '' TERM; echo ready; while :; do sleep 0.1; done"]);
    children.push(deaf);
    await new Promise((heard) => deaf.stdout?.once("data", heard));
    note(name, deaf.pid as number);
    expect(await end(name, { patience_ms: 300 })).toBe(true);
    expect(startTicks(deaf.pid as number)).toBeUndefined();
  });

  it("is nothing when no such process was ever started", async () => {
    expect(await end(name)).toBe(false);
  });
});

describe("a port", () => {
  it("is passed over when somebody listens on it, alone or among neighbours", async () => {
    const server = createServer();
    const from = await freePort(45_000, 3);
    await new Promise<void>((listening) => server.listen(from + 1, "127.0.0.1", listening));
    const { port } = server.address() as AddressInfo;
    expect(await freePort(port)).toBeGreaterThan(port);
    expect(await freePort(port - 1, 2)).toBeGreaterThan(port);
    await new Promise((closed) => server.close(closed));
  });
});

describe("one at a time", () => {
  it("lets the second begin only when the first has ended, even with a failure", async () => {
    const order: string[] = [];
    const first = oneAtATime(name, async () => {
      order.push("first begins");
      await new Promise((done) => setTimeout(done, 250));
      order.push("first ends");
      throw new Error("as it happens");
    }).catch(() => {});
    const second = oneAtATime(name, async () => {
      order.push("second begins");
    });
    await Promise.all([first, second]);
    expect(order).toEqual(["first begins", "first ends", "second begins"]);
  });

  it("does not wait for a holder that was killed", async () => {
    const lock = `${import.meta.dirname}/../../scripts/local/lock.mjs`;
    const held = `import(${JSON.stringify(lock)}).then(({ oneAtATime }) => oneAtATime("${name}", () => {
      console.log("held"); return new Promise(() => setInterval(() => {}, 1000)); }))`;
    const holder = spawn(process.execPath, ["-e", held]);
    children.push(holder);
    await new Promise((heard) => holder.stdout?.once("data", heard));
    await expect(oneAtATime(name, async () => "in", { patience_ms: 200 })).rejects.toThrow(/busy/);
    holder.kill("SIGKILL");
    expect(await oneAtATime(name, async () => "in", { patience_ms: 5_000 })).toBe("in");
  });
});
