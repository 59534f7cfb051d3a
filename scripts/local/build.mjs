import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { root } from "./folders.mjs";
import { run } from "./packages.mjs";

const folders = ["app", "components", "db", "lib", "public"];
const files =
  /^(package-lock\.json|tsconfig\.json|instrumentation\.ts|proxy\.ts|(next|postcss|tailwind)\.config\.\w+)$/;
const stamp = join(root, ".next", "holdground-sources");

/** One figure for everything that goes into the build: it changes when any of it does. */
export function sourcesHash() {
  const hash = createHash("sha256");
  const add = (path) =>
    hash
      .update(`${path}\0`)
      .update(readFileSync(join(root, path)))
      .update("\0");
  for (const name of readdirSync(root).sort()) if (files.test(name)) add(name);
  for (const folder of folders) {
    if (!existsSync(join(root, folder))) continue;
    const below = readdirSync(join(root, folder), { recursive: true, withFileTypes: true });
    const paths = below.filter((entry) => entry.isFile()).map((entry) => join(entry.parentPath, entry.name));
    for (const path of paths.sort()) add(path.slice(root.length + 1));
  }
  return hash.digest("hex");
}

/** The sources that the present build was made of; undefined when there is no whole build. */
export function builtFrom() {
  return existsSync(stamp) ? readFileSync(stamp, "utf8") : undefined;
}

/** Builds for production unless the present build was made of these very sources. */
export async function ensureBuild() {
  const hash = sourcesHash();
  if (builtFrom() === hash) return "nothing changed";
  await run([process.execPath, next, "build"], "", { env: { ...process.env, ...quiet } }).catch((error) => {
    throw new Error(`The build failed:\n${error.message}`);
  });
  writeFileSync(stamp, hash);
  return "built";
}

/** Next's command, run by the Node that runs us. */
export const next = join(root, "node_modules", "next", "dist", "bin", "next");
export const tsx = join(root, "node_modules", "tsx", "dist", "cli.mjs");

export const quiet = {
  NO_COLOR: "1",
  NEXT_TELEMETRY_DISABLED: "1",
  AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: "true",
};
