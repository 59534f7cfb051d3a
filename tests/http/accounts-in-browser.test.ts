import { existsSync } from "node:fs";
import { type Browser as Chromium, chromium, type Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { freshDatabase } from "../support/database";
import { built, type RunningServer, startServer } from "../support/server";
import { lookInto, makePerson, makeSite, PASSWORD, type Site, stored, tokenMailedTo } from "../support/site";

const executablePath = process.env.HOLDGROUND_CHROMIUM ?? "/usr/bin/chromium";
const present = existsSync(executablePath);
if (!present)
  console.warn(`There is no ${executablePath}: the account pages are not opened in a browser here.`);

describe.runIf(built && present)("the account pages in Chromium", () => {
  let server: RunningServer;
  let site: Site;
  let chrome: Chromium;
  /** Violations of the content security policy and errors of scripts, in any page that was opened. */
  const violations: string[] = [];

  beforeAll(async () => {
    lookInto((await freshDatabase()).superuserUrl);
    site = await makeSite("E-01");
    server = await startServer();
    chrome = await chromium.launch({
      executablePath,
      args: [
        "--no-sandbox",
        "--disable-gpu",
        "--disable-quic",
        "--no-first-run",
        "--disable-background-networking",
      ],
    });
  });
  afterAll(async () => {
    await chrome?.close();
    expect(violations).toEqual([]);
  });

  async function open(options: { scripts?: boolean } = {}): Promise<Page> {
    const context = await chrome.newContext({ javaScriptEnabled: options.scripts ?? true });
    const page = await context.newPage();
    page.on("console", (message) => {
      if (/Content Security Policy|hydrat/i.test(message.text())) violations.push(message.text());
    });
    page.on("pageerror", (error) => violations.push(String(error)));
    page.on("request", (request) => {
      if (new URL(request.url()).origin !== server.origin) violations.push(`asked ${request.url()}`);
    });
    return page;
  }
  async function go(page: Page, path: string): Promise<void> {
    await page.goto(server.origin + path);
    await quiet(page);
  }
  async function signIn(page: Page, email: string, path: string): Promise<void> {
    await go(page, path);
    await page.getByLabel("E-mail").fill(email);
    await page.getByLabel("Password").fill(PASSWORD);
    // A sheet of a project never lets the network be idle: it listens for changes, from when its scripts run.
    const ready = path.startsWith("/projects/")
      ? page.waitForResponse((answer) => answer.url().endsWith("/events"))
      : undefined;
    await page.getByRole("button", { name: "Sign in", exact: true }).click();
    await page.waitForURL(server.origin + path);
    await (ready ?? quiet(page));
  }
  const settings = () => `/projects/${site.projectId}/settings`;

  it("sign in before any script has run, and put nothing that was typed into an address", async () => {
    const page = await open({ scripts: false });
    await page.goto(server.origin + settings());
    expect(page.url()).toBe(`${server.origin}/sign-in?callbackUrl=${encodeURIComponent(settings())}`);
    const email = site.lead.person.email;
    for (const password of ["a wrong word", PASSWORD]) {
      await page.getByLabel("E-mail").fill(email);
      await page.getByLabel("Password").fill(password);
      await page.getByRole("button", { name: "Sign in", exact: true }).click();
      expect(decodeURIComponent(page.url())).not.toMatch(/wrong|heron|lead\.e/);
      if (password !== PASSWORD)
        expect(await page.getByRole("alert").textContent()).toBe("E-mail or password is not right.");
    }
    expect(page.url()).toBe(server.origin + settings());
    const cookies = await page.context().cookies();
    const session = cookies.find(({ name }) => name === "__Host-holdground.session");
    expect(session).toMatchObject({ secure: true, httpOnly: true, sameSite: "Lax", path: "/" });
    await page.context().close();
  });

  it("keep what was typed when a sign-in is refused, and say why", async () => {
    const page = await open();
    await go(page, "/sign-in");
    await page.getByLabel("E-mail").fill(site.lead.person.email);
    await page.getByLabel("Password").fill("a wrong word");
    await page.getByRole("button", { name: "Sign in", exact: true }).click();
    await expect
      .poll(() => page.locator("form").getByRole("alert").textContent())
      .toBe("E-mail or password is not right.");
    expect(await page.getByLabel("E-mail").inputValue()).toBe(site.lead.person.email);
    await page.context().close();
  });

  it("change settings, show what is wrong beside the field, and show typed markup as text", async () => {
    const page = await open();
    await signIn(page, site.lead.person.email, settings());
    await page.getByLabel("Title", { exact: true }).fill("");
    await page.getByRole("button", { name: "Save the settings" }).click();
    await expect.poll(() => page.locator("#title-note").textContent()).toBe("A title is needed.");
    await page.getByLabel("Title", { exact: true }).fill("North <img src=x onerror=alert(1)> yard");
    await page.getByRole("button", { name: "Save the settings" }).click();
    await page.getByText("The settings are saved.").waitFor();
    await page.getByRole("button", { name: "Save the settings" }).waitFor();
    expect(await page.getByRole("button", { name: "Save the settings" }).count()).toBe(1);
    await page.getByLabel("Client").fill("Harbour board");
    await page.getByRole("button", { name: "Save the settings" }).click();
    await expect
      .poll(() => stored("select client, title, revision from project where id = $1", [site.projectId]))
      .toEqual([{ client: "Harbour board", title: "North <img src=x onerror=alert(1)> yard", revision: 3 }]);
    await page.context().close();
  });

  it("change a member's roles in place", async () => {
    const page = await open();
    await signIn(page, site.lead.person.email, settings());
    const line = page.getByRole("listitem").filter({ hasText: site.structural.person.name });
    await line.getByLabel("Geotechnical engineer").check();
    await line.getByRole("button", { name: /Change roles/ }).click();
    await page.getByText("has other roles from the next request on").waitFor();
    // Read anew, the line is made again with the new roles as what it holds.
    const box = line.getByLabel("Geotechnical engineer");
    await expect.poll(() => box.evaluate((input) => (input as HTMLInputElement).defaultChecked)).toBe(true);
    await expect.poll(() => line.count()).toBe(1);
    expect(await line.getByLabel("Geotechnical engineer").isChecked()).toBe(true);
    await line.getByRole("button", { name: "Remove" }).click();
    await line.getByRole("button", { name: "Yes, remove" }).click();
    await expect.poll(() => line.count()).toBe(0);
    await page.context().close();
  });

  it("invite by mail, make the account with the link, and lead into the project", async () => {
    const lead = await open();
    await signIn(lead, site.lead.person.email, settings());
    const form = lead.locator("form").filter({ hasText: "Invite somebody" });
    await form.getByLabel("E-mail").fill("invited@example.test");
    await form.getByLabel("Reader").check();
    await form.getByRole("button", { name: "Send the invitation" }).click();
    await lead.getByRole("listitem").filter({ hasText: "invited@example.test" }).waitFor();
    const token = await tokenMailedTo("invited@example.test");
    const page = await open();
    await go(page, `/invitation/${token}`);
    await page.getByLabel(/Your name/).fill("Invited Person");
    await page.getByLabel("A password").fill("short");
    await page.getByRole("button", { name: "Make the account and join" }).click();
    await expect.poll(() => page.locator("#password[aria-invalid]").count()).toBe(1);
    expect(await page.getByLabel(/Your name/).inputValue()).toBe("Invited Person");
    await page.getByLabel("A password").fill(PASSWORD);
    await page.getByRole("button", { name: "Make the account and join" }).click();
    await page.waitForURL(new RegExp(`/projects/${site.projectId}`));
    expect(
      await stored(
        "select role from membership m join person p on p.id = m.person_id where p.email = 'invited@example.test'",
      ),
    ).toEqual([{ role: "reader" }]);
    await lead.context().close();
    await page.context().close();
  });

  it("set a new password with the mailed link, once", async () => {
    const person = await makePerson("Forgetful Person");
    const page = await open();
    await go(page, "/reset");
    await page.getByLabel("E-mail").fill(person.email);
    await page.getByRole("button", { name: "Send the link" }).click();
    await page.getByRole("status").waitFor();
    const link = `/reset/${await tokenMailedTo(person.email)}`;
    await page.request.head(server.origin + link);
    await go(page, link);
    await page.getByLabel("New password").fill("otter under the bridge");
    await page.getByRole("button", { name: "Set the password" }).click();
    await page.waitForURL(/\/sign-in\?done=reset/);
    await go(page, link);
    expect(await page.getByRole("heading").textContent()).toBe("This link cannot be used");
    await page.context().close();
  });

  it("open a project for its administrator only when everything is stated", async () => {
    const page = await open();
    await signIn(page, site.administrator.email, "/projects");
    await page.getByText("Open a project").click();
    for (const [label, text] of [
      ["Number", "E-77"],
      ["Title", "Lock gate"],
      ["Name of the site grid", "Lock grid"],
      ["Vertical datum", "Lock datum"],
      ["Name", "Gate Lead"],
      ["E-mail", "gate.lead@example.test"],
    ] as const)
      await page.getByLabel(label, { exact: true }).fill(text);
    await page.getByRole("button", { name: "Open the project" }).click();
    await expect
      .poll(() =>
        page
          .locator("[aria-invalid]")
          .evaluateAll((fields) => fields.map((field) => field.getAttribute("name"))),
      )
      .toEqual(["unitSystem", "criteria.interfaceAngle_deg"]);
    await page.getByLabel("Units shown").selectOption("si");
    await page.getByLabel(/Angle of friction/).fill("24");
    await page.getByRole("button", { name: "Open the project" }).click();
    await page.getByText("The project is open").waitFor();
    expect(
      await stored(
        "select grid_name, interface_angle_deg from project j join criteria c on c.project_id = j.id where j.number = 'E-77'",
      ),
    ).toEqual([{ grid_name: "Lock grid", interface_angle_deg: 24 }]);
    await page.context().close();
  });

  it("show nothing of the project after signing out, not by the back button either", async () => {
    const page = await open();
    await signIn(page, site.lead.person.email, settings());
    await go(page, "/account");
    await page.getByRole("button", { name: "Sign out", exact: true }).click();
    await page.waitForURL(/\/sign-in/);
    for (let back = 0; back < 2; back += 1) {
      await page.goBack();
      await quiet(page);
      expect(page.url()).toContain("/sign-in");
      expect(await page.content()).not.toContain("Depot grid");
    }
    expect(
      await page.evaluate(() => Object.keys(localStorage).length + Object.keys(sessionStorage).length),
    ).toBe(0);
    await page.context().close();
  });

  it("show text typed at a stranger's address as nothing that is there", async () => {
    const page = await open();
    await signIn(page, site.reader.person.email, "/projects");
    const answer = await page.goto(`${server.origin}/projects/${"-".repeat(36)}/settings`);
    expect(answer?.status()).toBe(404);
    expect(await page.getByRole("heading").textContent()).toBe("There is nothing at this address");
    await page.context().close();
  });
});

/** Loaded and woken: the stream of live changes keeps a project's page from ever being idle. */
async function quiet(page: Page): Promise<void> {
  await page.waitForLoadState("load");
  await page.waitForTimeout(700);
}
