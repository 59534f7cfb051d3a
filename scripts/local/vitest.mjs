import { spawn } from "node:child_process";
import { mkdirSync, readFileSync, rmSync } from "node:fs";
import { join } from "node:path";
import { local, root } from "./folders.mjs";

/** Runs vitest with its output shown; answers with its counts. A run that ends without counts is one failure. */
export async function runVitest(args, env = {}) {
  mkdirSync(local, { recursive: true });
  const counts = join(local, `counts-${process.pid}.json`);
  rmSync(counts, { force: true });
  const vitest = join(root, "node_modules", "vitest", "vitest.mjs");
  const child = spawn(process.execPath, [vitest, "run", ...args], {
    cwd: root,
    env: { ...process.env, ...env, HOLDGROUND_COUNTS: counts },
    stdio: ["ignore", "inherit", "inherit"],
  });
  const code = await new Promise((done) => {
    child.once("error", () => done(1));
    child.once("close", (ended) => done(ended ?? 1));
  });
  const read = readCounts(counts);
  // Vitest fails a run for more reasons than a failed test, an error between tests for one.
  if (code !== 0 && read.failed === 0) read.failed = 1;
  return read;
}

function readCounts(path) {
  try {
    return JSON.parse(readFileSync(path, "utf8"));
  } catch {
    return { passed: 0, failed: 1, skipped: 0 };
  } finally {
    rmSync(path, { force: true });
  }
}

/** Prints the one line that CI reads, as the last of all, and sets the exit code. */
export function conclude({ passed, failed, skipped }) {
  process.exitCode = failed > 0 ? 1 : 0;
  console.log(`${passed} passed, ${failed} failed${skipped > 0 ? `, ${skipped} skipped` : ""}`);
}
