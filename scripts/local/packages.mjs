import { spawn, spawnSync } from "node:child_process";
import { existsSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { isRoot, root } from "./folders.mjs";
import { postgresPrograms } from "./postgres.mjs";
import { storeIsInstalled } from "./store.mjs";

/** Refuses a Node that cannot run this, in one sentence. */
export function checkNode() {
  const [major, minor] = process.versions.node.split(".").map(Number);
  if (major < 20 || (major === 20 && minor < 19))
    throw new Error(
      `Node 20.19 or newer is needed, and this is ${process.versions.node}: please install a newer one.`,
    );
  if (process.platform !== "linux")
    throw new Error(
      "The local services run on Debian Linux. Elsewhere use docker/compose.yaml, or set DATABASE_URL, S3_* and SMTP_URL.",
    );
}

/** Installs the Debian packages that are missing among those asked for. Answers with what it did. */
export async function ensurePackages({ database, store, browser }) {
  const missing = [];
  if (database && !postgresPrograms()) missing.push("postgresql");
  if (store && !storeIsInstalled()) missing.push("python3-swift");
  if (browser && !existsSync("/usr/bin/chromium")) missing.push("chromium");
  if (missing.length === 0) return "all there";
  const asAdmin = administrator();
  const byHand = `apt-get install --no-install-recommends ${missing.join(" ")}`;
  if (!asAdmin || !existsSync("/usr/bin/apt-get"))
    throw new Error(
      `Missing: ${missing.join(", ")}. This account may not install packages here; as root, please run: ${byHand}`,
    );
  if (missing.includes("postgresql")) await keepClusterAway(asAdmin);
  const quiet = ["env", "DEBIAN_FRONTEND=noninteractive", "apt-get", "-qq", "-o", "DPkg::Lock::Timeout=600"];
  // The lists may be there already, and the mirror away: only the install itself decides.
  await run([...asAdmin, ...quiet, "update"]).catch(() => {});
  await run([...asAdmin, ...quiet, "install", "-y", "--no-install-recommends", ...missing]).catch((error) => {
    throw new Error(`Debian's packages could not be installed (${byHand}):\n${error.message}`);
  });
  return `installed ${missing.join(", ")}`;
}

/** How to act as root: nothing to add, or sudo; undefined when neither is to be had. */
function administrator() {
  if (isRoot) return [];
  if (spawnSync("sudo", ["-n", "true"], { stdio: "ignore" }).status === 0) return ["sudo", "-n"];
  const canAsk = process.stdin.isTTY && spawnSync("sudo", ["-V"], { stdio: "ignore" }).status === 0;
  return canAsk ? ["sudo"] : undefined;
}

/** Debian makes a cluster of its own when PostgreSQL is installed, unless it is told not to beforehand. */
async function keepClusterAway(asAdmin) {
  const folder = "/etc/postgresql-common/createcluster.d";
  await run([...asAdmin, "mkdir", "-p", folder]);
  await run([...asAdmin, "tee", `${folder}/holdground.conf`], "create_main_cluster = false\n");
}

/** Installs the node modules when they are missing or differ from the lock file. */
export async function ensureModules() {
  if (modulesMatchLock()) return "as locked";
  const npm = process.env.npm_execpath ? [process.execPath, process.env.npm_execpath] : ["npm"];
  // A NODE_ENV of production must not leave out what the build needs.
  await run([...npm, "ci", "--include=dev", "--no-audit", "--no-fund", "--loglevel=error"]).catch((error) => {
    throw new Error(`npm ci failed:\n${error.message}`);
  });
  return "installed";
}

/** Compares what npm wrote down when it installed with what the lock file asks for, package by package. */
export function modulesMatchLock(folder = root) {
  const installed = packagesOf(join(folder, "node_modules", ".package-lock.json"));
  const locked = packagesOf(join(folder, "package-lock.json"));
  if (!installed || !locked) return false;
  for (const [path, wanted] of Object.entries(locked)) {
    if (path === "" || wanted.link) continue;
    const found = installed[path];
    if (!found && !wanted.optional && !wanted.peer) return false;
    if (found && found.version !== wanted.version) return false;
  }
  return true;
}

function packagesOf(path) {
  try {
    return JSON.parse(readFileSync(path, "utf8")).packages;
  } catch {
    return undefined;
  }
}

/** Runs a command to its end; rejects with the last of what it said. */
export function run([command, ...args], input, options = {}) {
  return new Promise((done, refuse) => {
    const child = spawn(command, args, { cwd: root, stdio: ["pipe", "pipe", "pipe"], ...options });
    let said = "";
    const hear = (chunk) => {
      said = (said + chunk).slice(-6_000);
    };
    child.stdout.on("data", hear);
    child.stderr.on("data", hear);
    child.once("error", refuse);
    child.once("close", (code) =>
      code === 0 ? done(said) : refuse(new Error(said.trim() || `${command} ended (${code})`)),
    );
    child.stdin.end(input ?? "");
  });
}
