import { type Browser, type BrowserContext, chromium, type Page } from "playwright-core";
import demo from "@/db/seed/accounts.json";

const flags = [
  "--no-sandbox",
  "--disable-gpu",
  "--disable-quic",
  "--no-first-run",
  "--disable-background-networking",
  "--disable-component-update",
  "--disable-sync",
];

/** Debian's Chromium, without a window. */
export const openChromium = (): Promise<Browser> =>
  chromium.launch({ executablePath: "/usr/bin/chromium", args: flags });

export type Reader = {
  page: Page;
  context: BrowserContext;
  /** What the browser complained of: console errors, exceptions in pages, answers with 5xx. */
  complaints: string[];
  /** Address of a sheet of the demonstration project. */
  sheet: (path: string) => string;
};

export const origin = (): string => {
  const found = process.env.HOLDGROUND_TEST_ORIGIN;
  if (!found) throw new Error("HOLDGROUND_TEST_ORIGIN is not set: run npm test.");
  return found;
};

/** A browser of its own for one person of the demonstration, signed in through the sign-in page. */
export async function signedIn(
  browser: Browser,
  who: string,
  options: { width?: number; scheme?: "light" | "dark" } = {},
): Promise<Reader> {
  const account = demo.accounts.find(({ email }) => email.startsWith(`${who}.`));
  if (!account) throw new Error(`The demonstration has no ${who}.`);
  const context = await browser.newContext({
    viewport: { width: options.width ?? 1440, height: 900 },
    colorScheme: options.scheme ?? "light",
  });
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on("console", (message) => {
    if (message.type() === "error") complaints.push(message.text());
  });
  page.on("pageerror", (error) => complaints.push(error.message));
  page.on("response", (response) => {
    if (response.status() >= 500) complaints.push(`${response.status()} ${response.url()}`);
  });
  await page.goto(`${origin()}/sign-in`);
  await page.locator('input[name="email"]').fill(account.email);
  await page.locator('input[name="password"]').fill(demo.password);
  await page.locator('button[type="submit"]').click();
  await page.waitForURL(/\/projects/);
  const project = page.locator('a[href^="/projects/"]').filter({ hasText: "Millrace" }).first();
  const href = await project.getAttribute("href");
  const base = /\/projects\/[0-9a-f-]{36}/.exec(href ?? "")?.[0];
  if (!base) throw new Error(`${who} sees no demonstration project.`);
  return { page, context, complaints, sheet: (path) => `${origin()}${base}/${path}` };
}

/** Opens a sheet and waits until its first answer has come. The stream of live changes never lets a page be idle. */
export async function open(reader: Reader, path: string): Promise<Page> {
  await reader.page.goto(reader.sheet(path), { waitUntil: "load" });
  await settled(reader.page);
  return reader.page;
}

/** Waits until nothing on the page says that it is still loading. */
export async function settled(page: Page): Promise<void> {
  await page.getByRole("heading", { level: 1 }).first().waitFor();
  await page.waitForFunction(() => document.querySelector('[aria-busy="true"]') === null);
  await page.waitForTimeout(300);
}
