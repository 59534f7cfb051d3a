import { existsSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { root } from "./local/folders.mjs";

const documents = ["README.md", "DEVELOPERS.md"];
/** Made when the product runs, so not in a fresh checkout. */
const madeLater = /^(\.local|\.next|node_modules|reports|\.env$)/;

/** Paths, npm commands and files that a document names but that are not there, as sentences. */
export function missingFrom(text, { exists, commands }) {
  const missing = [];
  for (const name of namedPaths(text)) {
    // Of a pattern such as tests/<area>/*.test.ts the part before the first variable piece must exist.
    const fixed = name.split("/").slice(0, firstVariable(name)).join("/");
    if (fixed && !madeLater.test(fixed) && !exists(fixed))
      missing.push(`names ${name}, which does not exist`);
  }
  for (const [, command] of text.matchAll(/\bnpm run (?:-s )?([a-z][\w:-]*)/g))
    if (!commands.includes(command))
      missing.push(`names npm run ${command}, which package.json does not have`);
  return missing;
}

function firstVariable(name) {
  const at = name.split("/").findIndex((piece) => /[*<>{}[\]…]|\.\.\./.test(piece));
  return at < 0 ? undefined : at;
}

/** Whatever is set as code or linked, has no blanks, and looks like a path of this repository. */
function namedPaths(text) {
  const prose = text.replace(/^```[\s\S]*?^```/gm, "");
  const coded = [...prose.matchAll(/`([^`\n]+)`/g)].map(([, inside]) => inside);
  const linked = [...prose.matchAll(/\]\(([^)#\s]+)(?:#[^)]*)?\)/g)].map(([, target]) => target);
  const ofBlocks = [...text.matchAll(/^```[^\n]*\n([\s\S]*?)^```/gm)].flatMap(([, block]) =>
    [...block.matchAll(/(?:^|[\s"'=])((?:\.\/)?(?:[\w.-]+\/)+[\w.-]+\.\w+)/gm)].map(([, path]) => path),
  );
  const names = [...coded, ...linked, ...ofBlocks].map((name) =>
    name.replace(/^\.\//, "").replace(/[,.;:]+$/, ""),
  );
  return [...new Set(names)].filter(looksLikePath).map((name) => name.replace(/\/$/, ""));
}

/** A file by its ending, a folder by its slash, or anything below a folder of this repository; `and/or` is neither. */
function looksLikePath(name) {
  if (/^\w+:|^[/@]|\s|\(|=|^\.\.\//.test(name)) return false;
  if (/\.(md|json|ts|tsx|mjs|yaml|yml|py|sql|css|svg)$/.test(name)) return true;
  return /^[\w.-]+\/$/.test(name) || (name.includes("/") && existsSync(join(root, name.split("/")[0])));
}

/** Looks through the documents of the checkout; answers with one sentence for each fault. */
export function checkDocuments() {
  const commands = Object.keys(JSON.parse(readFileSync(join(root, "package.json"), "utf8")).scripts);
  return documents.flatMap((document) => {
    const path = join(root, document);
    if (!existsSync(path)) return [`${document} does not exist.`];
    const exists = (name) => existsSync(join(root, name));
    return missingFrom(readFileSync(path, "utf8"), { exists, commands }).map(
      (fault) => `${document} ${fault}.`,
    );
  });
}

if (process.argv[1] === import.meta.filename) {
  const faults = checkDocuments();
  for (const fault of faults) console.error(fault);
  if (faults.length === 0) console.log("Every path that the documents name exists.");
  process.exitCode = faults.length > 0 ? 1 : 0;
}
