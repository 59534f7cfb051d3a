import { spawnSync } from "node:child_process";
import { createHash, randomBytes } from "node:crypto";
import {
  chmodSync,
  existsSync,
  lstatSync,
  mkdirSync,
  readFileSync,
  renameSync,
  writeFileSync,
} from "node:fs";
import { dirname, join } from "node:path";
import { fileURLToPath } from "node:url";

/** The folder of the checkout. */
export const root = dirname(dirname(dirname(fileURLToPath(import.meta.url))));

/** Where everything lives that this checkout makes for itself: records, passwords, logs, mail. */
export const local = join(root, ".local");

export const isRoot = process.getuid?.() === 0;

let state;

/**
 * Where the database and the store keep their data: `.local`, or a folder under /var/tmp when the checkout lies below
 * a folder that the accounts they run as may not enter (root's home, for one).
 */
export function stateFolder() {
  if (state) return state;
  mkdirSync(local, { recursive: true, mode: 0o755 });
  if (!isRoot || reachableByOthers(local)) state = local;
  else {
    state = join("/var/tmp", `holdground-${createHash("sha256").update(root).digest("hex").slice(0, 12)}`);
    mkdirSync(state, { recursive: true, mode: 0o755 });
    const made = lstatSync(state);
    if (!made.isDirectory() || made.uid !== 0)
      throw new Error(
        `${state} belongs to someone else: remove it, or move the checkout to a folder others can enter.`,
      );
  }
  return state;
}

function reachableByOthers(folder) {
  const asNobody = ["--reuid=65534", "--regid=65534", "--clear-groups", "test", "-x", folder];
  return spawnSync("setpriv", asNobody, { stdio: "ignore" }).status === 0;
}

/** Reads a JSON file below `.local`; undefined when it is missing or was cut short. */
export function readLocal(name) {
  const path = join(local, name);
  if (!existsSync(path)) return undefined;
  try {
    return JSON.parse(readFileSync(path, "utf8"));
  } catch {
    return undefined;
  }
}

/** Writes a JSON file below `.local`, readable by its owner alone, whole or not at all. */
export function writeLocal(name, content) {
  const path = join(local, name);
  mkdirSync(dirname(path), { recursive: true });
  const draft = `${path}.${process.pid}`;
  writeFileSync(draft, `${JSON.stringify(content, null, 2)}\n`, { mode: 0o600 });
  chmodSync(draft, 0o600);
  renameSync(draft, path);
}

/** The generated password of that name: made at first use, then kept in `.local/secrets.json`. Call under the lock. */
export function secret(name) {
  const secrets = readLocal("secrets.json") ?? {};
  if (!secrets[name]) {
    secrets[name] = randomBytes(24).toString("base64url");
    writeLocal("secrets.json", secrets);
  }
  return secrets[name];
}
