import type { Browser } from "playwright-core";
import { afterAll, beforeAll, expect, it } from "vitest";
import { openChromium, origin, type Reader, signedIn } from "./chromium";

let browser: Browser;
let reader: Reader;
beforeAll(async () => {
  browser = await openChromium();
  reader = await signedIn(browser, "remy");
});
afterAll(async () => {
  await browser?.close();
});

it("an address that names nothing shows a page of our own, and the content policy blocks none of it", async () => {
  await reader.page.goto(`${origin()}/nothing/here`, { waitUntil: "load" });
  await reader.page.getByRole("heading", { level: 1 }).waitFor();
  await reader.page.waitForTimeout(500);
  expect(reader.complaints.filter((complaint) => /Content Security Policy/i.test(complaint))).toEqual([]);
});
