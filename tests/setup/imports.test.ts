import { spawnSync } from "node:child_process";
import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { dirname, join } from "node:path";
import { describe, expect, it } from "vitest";
import { faultsOf } from "@/scripts/check-imports.mjs";

const root = `${import.meta.dirname}/../..`;
const asGiven = (path: string) => path;
const faults = (path: string, source: string) => faultsOf(path, source, asGiven).join("\n");

/** What Biome says to this source if it stood at that path, under the repository's own settings. */
function lint(path: string, source: string): string {
  const folder = mkdtempSync(join(tmpdir(), "holdground-lint-"));
  try {
    const settings = JSON.parse(readFileSync(`${root}/biome.json`, "utf8"));
    delete settings.vcs;
    writeFileSync(join(folder, "biome.json"), JSON.stringify(settings));
    mkdirSync(dirname(join(folder, path)), { recursive: true });
    writeFileSync(join(folder, path), source);
    const run = spawnSync(`${root}/node_modules/.bin/biome`, ["lint", "--colors=off", path], {
      cwd: folder,
      encoding: "utf8",
    });
    if (run.status === 0) return "";
    return (run.stdout + run.stderr).replace(/\s+/g, " ");
  } finally {
    rmSync(folder, { recursive: true });
  }
}

describe("the direction of imports", () => {
  it.each([
    ["components/footings/list.tsx", `import { client } from "@/db/client";`, "db/client"],
    ["components/footings/list.tsx", `import type { Database } from "../../db/client";`, "db/client"],
    [
      "components/footings/list.tsx",
      `const x = await import("@/lib/services/context");`,
      "lib/services/context",
    ],
    ["components/footings/list.tsx", `export * from "@/lib/services/context";`, "lib/services/context"],
    ["app/api/projects/route.ts", `import { client } from "@/db/client";`, "db/client"],
    ["app/api/projects/route.ts", `import { Button } from "@/components/ui/button";`, "components/ui/button"],
    ["lib/services/values/issue.ts", `import { keys } from "@/lib/client/keys";`, "lib/client/keys"],
    ["lib/client/keys.ts", `import { handle } from "../http/handle";`, "lib/http/handle"],
    [
      "lib/methods/bearing/index.ts",
      `import { checkFooting } from "@/lib/check/check-footing";`,
      "lib/check",
    ],
    ["lib/check/check-footing.ts", `import { x } from "@/lib/contracts/values";`, "lib/contracts/values"],
    ["lib/contracts/values.ts", `type X = import("@/db/client").Database;`, "db/client"],
    ["lib/reports/pdf/sheet.ts", `import { client } from "@/db/client";`, "db/client"],
  ])("refuses in %s: %s", (path, source, named) => {
    expect(faults(path, source)).toMatch(new RegExp(`${path} imports .*${named}`));
  });

  it.each([
    [
      "components/footings/list.tsx",
      `import { Button } from "../ui/button"; import { keys } from "@/lib/client/keys";`,
    ],
    ["app/(workspace)/page.tsx", `import { readValue } from "@/lib/services/values/read-value";`],
    [
      "lib/services/values/issue.ts",
      `import { client } from "@/db/client"; import { createHash } from "node:crypto";`,
    ],
    ["lib/check/check-footing.ts", `import { x } from "@/lib/methods/index"; import { z } from "zod";`],
  ])("leaves alone in %s: %s", (path, source) => {
    expect(faults(path, source)).toBe("");
  });

  it.each(["leaflet", "react-leaflet", "leaflet/dist/leaflet.css", "@geoman-io/leaflet-geoman-free"])(
    "keeps %s in components/plan",
    (library) => {
      expect(faults("components/ui/map.tsx", `import "${library}";`)).toContain("components/plan alone");
      expect(faults("app/layout.tsx", `await import("${library}");`)).toContain("components/plan alone");
      expect(faults("components/plan/canvas.tsx", `import "${library}";`)).toBe("");
    },
  );

  it.each(["node:fs", "crypto", "pg", "drizzle-orm/pg-core", "react", "next/headers"])(
    "keeps %s out of pure folders",
    (library) => {
      expect(faults("lib/geometry/polygon.ts", `import x from "${library}";`)).toContain(
        "lib/geometry is pure",
      );
    },
  );

  it.each(["Date.now()", "new Date()", "Math.random()", "crypto.randomUUID()", "performance.now()"])(
    "keeps the clock and chance out of pure folders: %s",
    (call) => {
      expect(faults("lib/check/check-footing.ts", `export const x = ${call};`)).toContain(
        "no clock and no chance",
      );
      expect(faults("lib/services/context.ts", `export const x = ${call};`)).toBe("");
    },
  );

  it("lets a pure folder read a date that it is given", () => {
    expect(faults("lib/exchange/ags/read.ts", `export const x = (t: string) => new Date(t).getTime();`)).toBe(
      "",
    );
  });
});

describe("text that would be read as HTML", () => {
  it.each([
    "layer.bindPopup(`<b>$" + "{mark}</b>`);",
    'layer.bindTooltip("Footing " + mark);',
    "layer.bindPopup(mark);",
    "layer.setPopupContent(feature.properties.name);",
    "popup.setContent(text);",
    "L.divIcon({ html: `<i>$" + "{mark}</i>` });",
    "element.innerHTML = mark;",
    'element.insertAdjacentHTML("beforeend", mark);',
    "document.write(mark);",
  ])("is refused: %s", (call) => {
    expect(faults("components/plan/layer.ts", call)).toMatch(
      /components\/plan\/layer\.ts (calls|sets|gives)/,
    );
  });

  it.each([
    "layer.bindPopup(document.createTextNode(mark));",
    "layer.bindTooltip(labelNode);",
    "layer.bindPopup(footingElement(mark));",
    'L.divIcon({ html: "<svg></svg>" });',
    "L.divIcon({ className: mark });",
    "element.textContent = mark;",
  ])("is not seen in: %s", (call) => {
    expect(faults("components/plan/layer.ts", call)).toBe("");
  });
});

describe("Biome", () => {
  it("says in one sentence what a component may import", () => {
    const said = lint(
      "components/footings/list.tsx",
      `import { client } from "@/db/client";\n\nexport const x = client;\n`,
    );
    expect(said).toContain("A component imports components, lib/client, lib/contracts and the pure folders");
  });

  it("says so of Leaflet outside components/plan, and lets it be inside", () => {
    const source = `import L from "leaflet";\n\nexport const x = L;\n`;
    expect(lint("components/ui/map.tsx", source)).toContain("Leaflet is imported in components/plan alone.");
    expect(lint("components/plan/map.tsx", source)).not.toContain("Leaflet is imported");
  });

  it("keeps process.env in lib/env.ts", () => {
    const source = `export const x = process.env.DATABASE_URL;\n`;
    expect(lint("lib/services/context.ts", source)).toContain("noProcessEnv");
    expect(lint("lib/env.ts", source)).toBe("");
  });

  it.each(["it.only", "it.skip", "describe.only"])("refuses %s in a test", (call) => {
    const source = `import { describe, it } from "vitest";\n\n${call}("is here", () => {});\nexport { describe, it };\n`;
    expect(lint("tests/check/x.test.ts", source)).toMatch(/noFocusedTests|noSkippedTests/);
  });

  it("is the only formatter: there are no settings of another", () => {
    const manifest = readFileSync(`${root}/package.json`, "utf8");
    expect(manifest).not.toMatch(/prettier|eslint/);
  });
});
