import { existsSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { parseEnv } from "node:util";
import { root } from "./folders.mjs";

/**
 * The environment as given: the process's own variables, then those of a `.env` file beside package.json. A variable
 * that is empty counts as not given.
 */
export function givenEnvironment() {
  const file = join(root, ".env");
  const kept = existsSync(file) ? parseEnv(readFileSync(file, "utf8")) : {};
  const filled = (variables) => Object.entries(variables).filter(([, value]) => value !== "");
  return Object.fromEntries([...filled(kept), ...filled(process.env)]);
}
