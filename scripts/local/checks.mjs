import { spawn } from "node:child_process";
import { join } from "node:path";
import { next, quiet } from "./build.mjs";
import { root } from "./folders.mjs";

const bin = (name) => join(root, "node_modules", ".bin", name);
const node = process.execPath;

/** What is looked at without running the product: each is one check, and all are made even when one fails. */
export const standingChecks = [
  { title: "Format and lint", commands: [[bin("biome"), "ci", "--colors=off", "--max-diagnostics=60", "."]] },
  {
    title: "Types",
    commands: [
      [node, next, "typegen"],
      [bin("tsc"), "--noEmit", "-p", "."],
    ],
  },
  { title: "Paths in the documents", commands: [[node, "scripts/check-paths.mjs"]] },
  { title: "Direction of imports", commands: [[node, "scripts/check-imports.mjs"]] },
];

/** Makes one check; on a failure prints what its tool said. Answers whether it passed. */
export async function passes({ title, commands }) {
  const begun = Date.now();
  for (const command of commands) {
    const { code, said } = await hear(command);
    if (code === 0) continue;
    console.log(`${said.trimEnd()}\n  FAILED  ${title}`);
    return false;
  }
  console.log(`  passed  ${title} (${((Date.now() - begun) / 1000).toFixed(1)} s)`);
  return true;
}

function hear([command, ...args]) {
  return new Promise((done) => {
    const child = spawn(command, args, {
      cwd: root,
      env: { ...process.env, ...quiet },
      stdio: ["ignore", "pipe", "pipe"],
    });
    let said = "";
    const add = (chunk) => {
      said += chunk;
    };
    child.stdout.on("data", add);
    child.stderr.on("data", add);
    child.once("error", (error) => done({ code: 1, said: said + error.message }));
    child.once("close", (code) => done({ code, said }));
  });
}
