import { cleanup, fireEvent, render, screen, within } from "@testing-library/react";
import axe from "axe-core";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { sheetAt, sheets } from "@/components/sheet/sheets";
import { Workspace } from "@/components/sheet/workspace";
import { AtAddress } from "../at-address";

const facts = {
  number: "HG-2041",
  title: "Alder Reach",
  grid: "Alder Reach grid",
  datum: "Ordnance datum",
  units: "m · kN · kPa",
  roles: ["Geotechnical engineer", "Project lead"],
  person: "Marit Oyelaran",
  siteAdministrator: false,
};

let went: string[];
beforeEach(() => {
  went = [];
  window.localStorage.clear();
});
afterEach(cleanup);

const open = (address: string, siteAdministrator = false) =>
  render(
    <AtAddress address={address} went={(to) => went.push(to)}>
      <Workspace projectId="p1" facts={{ ...facts, siteAdministrator }}>
        <h1>Sheet</h1>
        <input aria-label="Breadth" />
        <input type="checkbox" aria-label="Drained" />
        <textarea aria-label="Reason" />
        <select aria-label="Zone" />
      </Workspace>
    </AtAddress>,
  );

const key = (name: string, on: Element | Document = document.body, more = {}) =>
  fireEvent.keyDown(on, { key: name, ...more });

describe("the index of sheets", () => {
  it("marks the sheet that is open, also from a page below it", () => {
    open("/projects/p1/footings/f12");
    const index = screen.getByRole("navigation", { name: "Index of sheets" });
    const links = within(index)
      .getAllByRole("link")
      .filter((link) => link.getAttribute("aria-current") === "page");
    expect(links.map((link) => link.textContent)).toEqual(["5Footings"]);
  });

  it("gives each sheet a number and a page of its own", () => {
    expect(new Set(sheets.map(({ number }) => number)).size).toBe(sheets.length);
    expect(new Set(sheets.map(({ path }) => path)).size).toBe(sheets.length);
    expect(sheetAt("/projects/p1/values/v2")?.name).toBe("Bearing values");
    expect(sheetAt("/projects")).toBeUndefined();
    expect(sheetAt("/projects/p1/valuesets")).toBeUndefined();
  });
});

describe("the digit keys", () => {
  it.each(sheets.map(({ number, path }) => [number, path]))("%i goes to %s", (number, path) => {
    open("/projects/p1/settings");
    key(String(number));
    expect(went).toEqual([`/projects/p1/${path}`]);
  });

  it("stay out of what is typed or chosen", () => {
    open("/projects/p1/settings");
    for (const name of ["Breadth", "Reason", "Zone"]) key("5", screen.getByLabelText(name));
    expect(went).toEqual([]);
    key("5", screen.getByLabelText("Drained"));
    expect(went).toEqual(["/projects/p1/footings"]);
  });

  it("leave other shortcuts, held keys and unknown digits alone", () => {
    open("/projects/p1/settings");
    for (const more of [{ ctrlKey: true }, { metaKey: true }, { altKey: true }, { repeat: true }])
      key("5", document.body, more);
    key("9");
    key("0");
    expect(went).toEqual([]);
  });

  it("wait while a dialog asks for an answer", () => {
    open("/projects/p1/settings");
    const dialog = document.createElement("dialog");
    dialog.setAttribute("open", "");
    document.body.append(dialog);
    key("5");
    dialog.remove();
    expect(went).toEqual([]);
  });

  it("can be turned off, and stay off on the next page", () => {
    const { unmount } = open("/projects/p1/settings");
    fireEvent.click(screen.getByLabelText("Digit keys go to the sheets"));
    key("5");
    unmount();
    open("/projects/p1/values");
    expect((screen.getByLabelText("Digit keys go to the sheets") as HTMLInputElement).checked).toBe(false);
    key("5");
    expect(went).toEqual([]);
    fireEvent.click(screen.getByLabelText("Digit keys go to the sheets"));
    key("5");
    expect(went).toEqual(["/projects/p1/footings"]);
  });
});

describe("the title block", () => {
  const said = () => {
    const block = screen.getByRole("complementary", { name: "Title block" });
    const cells = [...block.querySelectorAll("dl > div")];
    return Object.fromEntries(
      cells.map((cell) => [cell.querySelector("dt")?.textContent, cell.querySelector("dd")?.textContent]),
    );
  };

  it("says project, sheet, grid, datum, units, moment, role and person", () => {
    open("/projects/p1/values/v2");
    expect(said()).toEqual({
      Project: "HG-2041 Alder Reach",
      "Site grid": "Alder Reach grid",
      Units: "m · kN · kPa",
      Role: "Geotechnical engineer, Project lead",
      Sheet: "4 Bearing values",
      Datum: "Ordnance datum",
      "As of": "Now",
      "Signed in": "Marit OyelaranSign out",
    });
  });

  it("prints the moment of printing in place of now", () => {
    open("/projects/p1/values");
    fireEvent(window, new Event("beforeprint"));
    expect(said()["As of"]).toMatch(/^\d{4}-\d{2}-\d{2} \d{2}:\d{2}$/);
    fireEvent(window, new Event("afterprint"));
    expect(said()["As of"]).toBe("Now");
  });

  it("shows the way to the people of the site to its administrator alone", () => {
    const { unmount } = open("/projects/p1/values");
    expect(screen.queryByRole("link", { name: "People" })).toBeNull();
    unmount();
    open("/projects/p1/values", true);
    expect(screen.getByRole("link", { name: "People" }).getAttribute("href")).toBe("/people");
  });
});

describe("the frame", () => {
  it("begins with the way past the index, and passes the accessibility rules", async () => {
    const { container } = open("/projects/p1/footings");
    const first = container.querySelector("a");
    expect(first?.getAttribute("href")).toBe("#sheet");
    expect(document.getElementById("sheet")?.tagName).toBe("MAIN");
    expect(container.querySelectorAll("[style]")).toHaveLength(0);
    const { violations } = await axe.run(container, { rules: { "color-contrast": { enabled: false } } });
    expect(violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html}`)).toEqual([]);
  });
});
