import { existsSync, readFileSync } from "node:fs";
import { join, resolve } from "node:path";

const root = process.env.HOLDGROUND_SHARED ?? resolve(import.meta.dirname, "../../../shared");
const folder = join(root, "ags");

/** True when the outside test material lies where the tests may read it. It is never part of the project. */
export const sharedFilesPresent = existsSync(join(folder, "findings.json"));

if (!sharedFilesPresent) {
  console.info(
    "Tests on outside AGS files are left out: set HOLDGROUND_SHARED to the folder that holds them.",
  );
}

/** The bytes of one file of the outside test material. */
export function sharedFile(...path: string[]): Uint8Array {
  return readFileSync(join(folder, ...path));
}
