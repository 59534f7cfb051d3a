import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { modulesMatchLock } from "@/scripts/local/packages.mjs";

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "holdground-modules-"));
  mkdirSync(join(folder, "node_modules"));
});
afterEach(() => rmSync(folder, { recursive: true }));

const lock = (packages: object) =>
  writeFileSync(join(folder, "package-lock.json"), JSON.stringify({ packages }));
const installed = (packages: object) =>
  writeFileSync(join(folder, "node_modules", ".package-lock.json"), JSON.stringify({ packages }));

const locked = {
  "": { name: "holdground" },
  "node_modules/zod": { version: "4.6.7" },
  "node_modules/@next/swc-win32": { version: "16.4.6", optional: true },
};

describe("installed modules", () => {
  it("match the lock file when each locked package is there in its version, and an optional one for another machine is not", () => {
    lock(locked);
    installed({ "node_modules/zod": { version: "4.6.7" } });
    expect(modulesMatchLock(folder)).toBe(true);
  });

  it("do not match when a version differs, a package is missing, or npm never finished", () => {
    lock(locked);
    expect(modulesMatchLock(folder)).toBe(false);
    installed({ "node_modules/zod": { version: "4.6.6" } });
    expect(modulesMatchLock(folder)).toBe(false);
    installed({});
    expect(modulesMatchLock(folder)).toBe(false);
    writeFileSync(join(folder, "node_modules", ".package-lock.json"), '{"packages": {');
    expect(modulesMatchLock(folder)).toBe(false);
  });
});
