/** Checks an AGS 4 file: prints one finding a line as JSON, and ends with 1 where there is an error. */
import { readdirSync, readFileSync, statSync } from "node:fs";
import { dirname, join } from "node:path";
import { readAgs } from "../lib/exchange/ags/read";
import { validateAgs } from "../lib/exchange/ags/validate";

const usage = "Usage: npm run -s ags:check FILE.ags";

function run(args: readonly string[]): number {
  const [path, ...more] = args;
  if (path === undefined || more.length > 0) {
    process.stderr.write(`${usage}\n`);
    return 2;
  }
  let bytes: Uint8Array;
  try {
    bytes = readFileSync(path);
  } catch (error) {
    process.stderr.write(
      `The file cannot be opened: ${error instanceof Error ? error.message : String(error)}\n`,
    );
    return 2;
  }
  const attached = filesBeside(path);
  const report = validateAgs(readAgs(bytes), attached === null ? {} : { attached });
  for (const finding of report.findings) process.stdout.write(`${JSON.stringify(finding)}\n`);
  return report.counts.error > 0 ? 1 : 0;
}

/** The files delivered in FILE/<set>/<name> beside the data file; null where there is no such folder. */
function filesBeside(path: string): Set<string> | null {
  const folder = join(dirname(path), "FILE");
  if (!statSync(folder, { throwIfNoEntry: false })?.isDirectory()) return null;
  const found = new Set<string>();
  for (const set of readdirSync(folder, { withFileTypes: true })) {
    if (!set.isDirectory()) continue;
    for (const name of readdirSync(join(folder, set.name))) found.add(`${set.name}/${name}`);
  }
  return found;
}

process.exitCode = run(process.argv.slice(2));
