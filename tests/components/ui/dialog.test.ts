// @vitest-environment node
import { existsSync } from "node:fs";
import { join } from "node:path";
import { type Browser, chromium, type Page } from "playwright-core";
import { build } from "vite";
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from "vitest";

const CHROMIUM = "/usr/bin/chromium";
const present = existsSync(CHROMIUM);
if (!present) console.info(`The dialogs are not tried: there is no Chromium at ${CHROMIUM}.`);

const root = join(import.meta.dirname, "../../..");

/** The page as one script. */
async function scriptOf(file: string): Promise<string> {
  const built = await build({
    configFile: false,
    root,
    logLevel: "error",
    mode: "development",
    resolve: { alias: { "@": root } },
    define: { "process.env.NODE_ENV": JSON.stringify("development") },
    build: {
      write: false,
      minify: false,
      lib: { entry: join(import.meta.dirname, file), formats: ["iife"], name: "page" },
    },
  });
  const [answer] = Array.isArray(built) ? built : [built];
  const chunk = answer && "output" in answer ? answer.output.find(({ type }) => type === "chunk") : undefined;
  if (chunk?.type !== "chunk") throw new Error(`${file} gave no script.`);
  return chunk.code;
}

// The browser's own dialog is what is used, and only a browser has it.
describe.runIf(present)("a dialog in Chromium", () => {
  let browser: Browser;
  let script: string;
  let page: Page;
  beforeAll(async () => {
    script = await scriptOf("dialog-page.tsx");
    browser = await chromium.launch({ executablePath: CHROMIUM, args: ["--no-sandbox"] });
  }, 60_000);
  afterAll(() => browser?.close());
  beforeEach(async () => {
    page = await browser.newPage();
    await page.setContent("<!doctype html><title>Dialogs</title>");
    await page.addScriptTag({ content: script });
  });
  afterEach(() => page.close());

  const open = async (name: string) => {
    await page.getByRole("button", { name: `Open ${name}` }).click();
    await page.getByRole("dialog").waitFor();
  };
  const focused = () => page.evaluate(() => document.activeElement?.textContent);
  const shown = () => page.getByRole("dialog").count();
  const asked = () => page.locator("output").textContent();

  it.each(["kept", "mounted"])("closes with Escape, once, and gives the focus back (%s)", async (name) => {
    await open(name);
    await page.keyboard.press("Escape");
    await page.getByRole("dialog").waitFor({ state: "detached" });
    expect(await focused()).toBe(`Open ${name}`);
    expect(await asked()).toBe("1");
  });

  it("keeps the focus within while it is open", async () => {
    await open("kept");
    const reached: (string | null | undefined)[] = [];
    for (let step = 0; step < 6; step += 1) {
      await page.keyboard.press("Tab");
      // Between two rounds the focus is at the browser's own bar, for which the body stands.
      reached.push(
        await page.evaluate(() => {
          const at = document.activeElement;
          return at === document.body ? "bar" : at?.closest("dialog") ? "dialog" : at?.textContent;
        }),
      );
    }
    expect(reached).toContain("dialog");
    expect(reached.filter((place) => place !== "dialog" && place !== "bar")).toEqual([]);
  });

  it("stays, with what was typed, however often Escape is pressed while something is stored", async () => {
    await open("held");
    await page.getByLabel("Reason").fill("Loads of issue C");
    for (let press = 0; press < 4; press += 1) {
      await page.keyboard.press("Escape");
      await page.waitForTimeout(50);
    }
    expect(await shown()).toBe(1);
    expect(await asked()).toBe("0");
    expect(await page.getByLabel("Reason").inputValue()).toBe("Loads of issue C");
    await page.getByRole("button", { name: "Stored" }).click();
    await page.getByRole("dialog").waitFor({ state: "detached" });
    expect(await focused()).toBe("Open held");
  });
});
