import type { Browser } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { open, openChromium, type Reader, signedIn } from "./chromium";

/*
 * The main job, by role, in Chromium against the production build and the demonstration project: a value is lowered by
 * one geotechnical engineer, checked by another, issued by the project lead; the structural engineer sees what is
 * affected and re-checks; the lead reads what is left.
 */
let browser: Browser;
let preparer: Reader;
let checker: Reader;
let lead: Reader;
let structural: Reader;
let reader: Reader;

beforeAll(async () => {
  browser = await openChromium();
  preparer = await signedIn(browser, "goran");
  checker = await signedIn(browser, "nadia");
  lead = await signedIn(browser, "petra");
  structural = await signedIn(browser, "sigrid");
  reader = await signedIn(browser, "remy");
});
afterAll(async () => {
  await browser?.close();
});

const toValue = async (who: Reader, reference: string) => {
  const page = await open(who, "values");
  await page.getByRole("link", { name: reference, exact: true }).click();
  await page.getByRole("heading", { level: 1 }).filter({ hasText: reference }).waitFor();
  return page;
};

describe("a value is lowered", () => {
  it("is drafted by a geotechnical engineer, who cannot check the own draft", async () => {
    const page = await toValue(preparer, "BV-02");
    await page.getByRole("button", { name: "Revise the value" }).click();
    const figure = page.getByLabel("Pressure as the report gives it");
    await figure.fill("205 kPa");
    await page.getByRole("radio", { name: "Plate or other field test" }).check();
    await page
      .getByLabel("Reason, for everyone who relies on the value")
      .fill("The plate tests at F79 and F81 settled more than the report expected.");
    await page.getByText("You prepared this draft").waitFor();
    await page.getByText("Everything typed is saved").waitFor();
    expect(await page.getByRole("button", { name: "Check BV-02" }).count()).toBe(0);
    // What the draft would do is told while it is typed, before anything is written.
    await page
      .getByText(/now fail/)
      .first()
      .waitFor();
  });

  it("keeps what was typed after the page is loaded again", async () => {
    const page = await toValue(preparer, "BV-02");
    const figure = page.getByLabel("Pressure as the report gives it");
    await figure.waitFor();
    expect(await figure.inputValue()).toBe("205 kPa");
  });

  it("is checked by another geotechnical engineer and issued by neither of the two", async () => {
    const page = await toValue(checker, "BV-02");
    await page.getByRole("button", { name: "Check BV-02" }).click();
    await page.getByText("You have signed this revision already").waitFor();
    const issuing = await toValue(lead, "BV-02");
    await issuing.getByRole("button", { name: "Issue BV-02 C02" }).click();
    await issuing.getByText(/C02 is in force/).waitFor();
  });

  it("shows every footing that relied on it as affected, with the reason", async () => {
    const page = await open(structural, "footings?standing=affected");
    await page.getByText("bearing value revised C01 → C02").first().waitFor();
  });

  it("is re-checked for a selection by the structural engineer, and no longer shows as affected", async () => {
    const page = await open(structural, "footings?standing=affected&verdict=passes");
    const rows = page.getByRole("row").filter({ hasText: "BV-02" });
    await rows.first().waitFor();
    const mark = (await rows.first().getByRole("link").first().textContent()) ?? "";
    await rows.first().getByRole("link").first().click();
    await page.getByRole("heading", { level: 1 }).filter({ hasText: mark }).waitFor();
    await page.getByText("bearing value revised C01 → C02").first().waitFor();
    await page.getByRole("button", { name: /check again/i }).click();
    await page.getByText("bearing value revised C01 → C02").first().waitFor({ state: "hidden" });
  });

  it("stands on the project lead's page with what it did and what is still open", async () => {
    const page = await open(lead, "revisions");
    await page.getByRole("link", { name: /BV-02 .*C01 → C02, 260 → 205 kPa net/ }).click();
    await page.getByText("now fails").first().waitFor();
    await page
      .getByText(/without an answer|no answer yet|unanswered/i)
      .first()
      .waitFor();
  });
});

describe("what a role may not do is not offered", () => {
  it("gives a reader no button that changes anything", async () => {
    const page = await open(reader, "footings");
    await page.getByRole("link", { name: "F1", exact: true }).waitFor();
    for (const name of [/new footing/i, /import/i, /check all/i])
      expect(await page.getByRole("link", { name }).count()).toBe(0);
    const value = await toValue(reader, "BV-01");
    expect(await value.getByRole("button", { name: /revise|issue|withdraw/i }).count()).toBe(0);
  });

  it("offers no field for a bearing pressure on a footing's page", async () => {
    const page = await open(structural, "footings");
    await page.getByRole("link", { name: "F1", exact: true }).click();
    await page.getByRole("heading", { level: 1 }).filter({ hasText: "F1" }).waitFor();
    const labels = await page.locator("label").allInnerTexts();
    expect(labels.filter((label) => /bearing|allowable/i.test(label))).toEqual([]);
  });
});

it("leaves the browser nothing to complain of", () => {
  for (const who of [preparer, checker, lead, structural, reader]) expect(who.complaints).toEqual([]);
});
