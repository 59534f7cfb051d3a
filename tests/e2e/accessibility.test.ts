import { readFileSync } from "node:fs";
import { createRequire } from "node:module";
import type { Browser } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { open, openChromium, origin, type Reader, settled, signedIn } from "./chromium";

const axe = readFileSync(createRequire(import.meta.url).resolve("axe-core/axe.min.js"), "utf8");

type Violation = { id: string; impact: string | null; nodes: { target: string[] }[] };

/** Serious and critical findings of an accessibility scan (WCAG 2.2 AA) of what the page shows now. */
async function findings(reader: Reader): Promise<string[]> {
  // As high as the page is long: what only lies under the title block until it is scrolled is not covered.
  const { width } = reader.page.viewportSize() ?? { width: 1440 };
  const long = await reader.page.evaluate(() => document.documentElement.scrollHeight);
  await reader.page.setViewportSize({ width, height: Math.min(16_000, long + 200) });
  await reader.page.waitForTimeout(300);
  const found = await scan(reader);
  await reader.page.setViewportSize({ width, height: 900 });
  return found;
}

async function scan(reader: Reader): Promise<string[]> {
  // Evaluated in the page's own world, past its content policy, which is what keeps scripts of others out.
  await reader.page.evaluate(axe);
  const violations = (await reader.page.evaluate(`axe.run(document, {
    runOnly: ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"],
    resultTypes: ["violations"],
  }).then((found) => found.violations)`)) as Violation[];
  return violations
    .filter(({ impact }) => impact === "serious" || impact === "critical")
    .map(
      ({ id, nodes }) =>
        `${id}: ${nodes
          .map(({ target }) => target.join(" "))
          .slice(0, 3)
          .join("; ")}`,
    );
}

const sheets = ["plan", "holes", "documents", "values", "footings", "footings/new", "revisions", "settings"];

let browser: Browser;
beforeAll(async () => {
  browser = await openChromium();
});
afterAll(async () => {
  await browser?.close();
});

describe.each([
  ["wide and light", 1440, "light"],
  ["narrow and dark", 390, "dark"],
] as const)("%s", (_name, width, scheme) => {
  let lead: Reader;
  beforeAll(async () => {
    lead = await signedIn(browser, "petra", { width, scheme });
  });

  it.each(sheets)("the sheet %s has no serious finding", async (sheet) => {
    await open(lead, sheet);
    expect(await findings(lead)).toEqual([]);
  });

  it("nor has the page of a footing, a value, a hole and a revision", async () => {
    for (const [sheet, link] of [
      ["footings", "F1"],
      ["values", "BV-03"],
      ["holes", "BH01"],
    ] as const) {
      const page = await open(lead, sheet);
      await page.getByRole("link", { name: link, exact: true }).first().click();
      await page.getByRole("heading", { level: 1 }).filter({ hasText: link }).waitFor();
      await settled(page);
      expect(await findings(lead), link).toEqual([]);
    }
    const page = await open(lead, "revisions");
    await page.getByRole("link", { name: /BV-03/ }).first().click();
    await page.waitForURL(/revisions\/[0-9a-f-]{36}/);
    await settled(page);
    expect(await findings(lead)).toEqual([]);
  });

  it("nor has the list of projects", async () => {
    await lead.page.goto(`${origin()}/projects`);
    expect(await findings(lead)).toEqual([]);
  });
});
