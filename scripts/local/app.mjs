import { spawn } from "node:child_process";
import { next, quiet } from "./build.mjs";
import { root } from "./folders.mjs";
import { end, forget, note, startDetached, until } from "./processes.mjs";

/** Serves the production build, apart from this process, its output in `.local/log/<name>.log`. Waits until it answers. */
export async function startApp({ name, port, env }) {
  const args = [next, "start", "-H", "127.0.0.1", "-p", String(port)];
  const full = { ...process.env, ...quiet, ...env, NODE_ENV: "production" };
  const app = startDetached(name, process.execPath, args, { env: full, facts: { port } });
  try {
    await untilServed(port, app.ended, `The application did not start; see .local/log/${name}.log.`);
  } catch (error) {
    await end(name);
    throw error;
  }
  return { pid: app.pid, stop: () => end(name) };
}

/** Serves in the foreground until a signal comes; `started` is called once it answers. Answers with the exit code. */
export async function serve({ name, command, port, env, facts, started }) {
  const args = [next, command, "-H", "127.0.0.1", "-p", String(port)];
  const full = {
    ...process.env,
    ...quiet,
    ...env,
    NODE_ENV: command === "dev" ? "development" : "production",
  };
  const child = spawn(process.execPath, args, {
    cwd: root,
    env: full,
    stdio: ["ignore", "inherit", "inherit"],
  });
  note(name, child.pid, { port, ...facts });
  let ended = false;
  const exit = new Promise((done) =>
    child.once("close", (code, signal) => {
      ended = true;
      done(code ?? (signal ? 0 : 1));
    }),
  );
  for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"])
    process.on(signal, () => ended || child.kill("SIGTERM"));
  const answers = untilServed(port, () => ended, "The application did not start.").then(started);
  await Promise.race([answers, exit]);
  const code = await exit;
  forget(name);
  return code;
}

/** Whether the application answers on this port with anything but a refusal of its own. */
export async function isServed(port) {
  try {
    const response = await fetch(`http://127.0.0.1:${port}/sign-in`, {
      redirect: "manual",
      signal: AbortSignal.timeout(20_000),
    });
    return response.status < 500;
  } catch {
    return false;
  }
}

async function untilServed(port, ended, complaint) {
  await until(() => isServed(port), { ended, patience_ms: 90_000, complaint });
}
