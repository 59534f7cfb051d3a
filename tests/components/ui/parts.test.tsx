import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import axe from "axe-core";
import { useState } from "react";
import { afterEach, describe, expect, it, vi } from "vitest";
import { Button } from "@/components/ui/button";
import { Caution } from "@/components/ui/caution";
import { Checkbox } from "@/components/ui/checkbox";
import { Choice } from "@/components/ui/choice";
import { DataTable } from "@/components/ui/data-table";
import { DefinitionList } from "@/components/ui/definition-list";
import { Empty } from "@/components/ui/empty";
import { ErrorNote } from "@/components/ui/error-note";
import { Notice } from "@/components/ui/notice";
import { NumberInput } from "@/components/ui/number-input";
import { PageHead } from "@/components/ui/page-head";
import { Progress } from "@/components/ui/progress";
import { Select } from "@/components/ui/select";
import { Skeleton } from "@/components/ui/skeleton";
import { Tabs } from "@/components/ui/tabs";
import { TextInput } from "@/components/ui/text-input";
import { Textarea } from "@/components/ui/textarea";
import { Problem } from "@/lib/client/fetch-json";

afterEach(cleanup);

function Leaves() {
  const [chosen, setChosen] = useState("conditions");
  return (
    <Tabs
      label="Value"
      chosen={chosen}
      onChoose={setChosen}
      tabs={[
        { id: "conditions", label: "Conditions", content: <p>Stated conditions</p> },
        { id: "sources", label: "Sources", content: <p>Reports and holes</p> },
        { id: "revisions", label: "Revisions", count: 12, content: <p>P01 to P12</p> },
      ]}
    />
  );
}

describe("tabs", () => {
  it("are walked with the arrows, round the ends, and show only the chosen leaf", () => {
    render(<Leaves />);
    const tab = (name: RegExp) => screen.getByRole("tab", { name });
    tab(/Conditions/).focus();
    fireEvent.keyDown(tab(/Conditions/), { key: "ArrowLeft" });
    expect(document.activeElement).toBe(tab(/Revisions/));
    expect(screen.getByRole("tabpanel", { name: /Revisions/ }).textContent).toBe("P01 to P12");
    fireEvent.keyDown(tab(/Revisions/), { key: "Home" });
    expect(document.activeElement).toBe(tab(/Conditions/));
    expect(screen.queryByText("P01 to P12")).toBeNull();
    expect(screen.getAllByRole("tab").map((one) => one.tabIndex)).toEqual([0, -1, -1]);
  });
});

describe("a button that cannot be pressed", () => {
  it("stays reachable, says why, and does nothing", () => {
    const onClick = vi.fn();
    render(
      <Button onClick={onClick} unavailable="whoever prepared it cannot check it">
        Check
      </Button>,
    );
    const button = screen.getByRole("button", { name: "Check, whoever prepared it cannot check it" });
    button.focus();
    expect(document.activeElement).toBe(button);
    fireEvent.click(button);
    expect(onClick).not.toHaveBeenCalled();
  });

  it("sends no form while what was sent before is under way", () => {
    const onSubmit = vi.fn((event: { preventDefault: () => void }) => event.preventDefault());
    const form = (busy: boolean) => (
      <form onSubmit={onSubmit}>
        <Button type="submit" busy={busy}>
          Save
        </Button>
      </form>
    );
    const { rerender } = render(form(true));
    fireEvent.click(screen.getByRole("button"));
    expect(onSubmit).not.toHaveBeenCalled();
    rerender(form(false));
    fireEvent.click(screen.getByRole("button"));
    expect(onSubmit).toHaveBeenCalledOnce();
  });
});

describe("what went wrong", () => {
  const problem = new Problem({
    status: 422,
    code: "invalid",
    detail: "Two fields need another look.",
    fields: { breadth_m: "The breadth is at least 0.3 m.", mark: "F12 is taken." },
  });

  it("is said in the server's sentence, with the fields that stand nowhere else", () => {
    render(<ErrorNote problem={problem} fieldsShown={["mark"]} />);
    const note = screen.getByRole("alert");
    expect(note.textContent).toContain("Two fields need another look.");
    expect(note.textContent).toContain("The breadth is at least 0.3 m.");
    expect(note.textContent).not.toContain("F12 is taken.");
  });

  it("keeps the inner words of a fault to itself", () => {
    render(<ErrorNote problem={new Error("select * from person")} />);
    expect(screen.getByRole("alert").textContent).toBe(
      "Something went wrong on our side. Nothing was changed.",
    );
  });

  it("is not there when nothing went wrong", () => {
    render(<ErrorNote problem={null} />);
    expect(screen.queryByRole("alert")).toBeNull();
  });
});

describe("progress", () => {
  it("is unknown rather than nought while nobody knows how far it is, and never past the end", () => {
    const { rerender } = render(<Progress label="Checking" done={null} />);
    expect(screen.getByLabelText("Checking").hasAttribute("value")).toBe(false);
    rerender(<Progress label="Checking" done={50} total={200} />);
    expect(screen.getByText("25 %")).toBeTruthy();
    rerender(<Progress label="Checking" done={201} total={200} />);
    expect(screen.getByText("100 %")).toBeTruthy();
  });
});

describe("all parts together", () => {
  it("pass the accessibility rules that can be judged without a layout", async () => {
    const nothing = () => {};
    const { container } = render(
      <main>
        <PageHead
          title="Footings"
          up={{ href: "/projects", label: "Projects" }}
          actions={<Button>New</Button>}
        >
          Twelve footings.
        </PageHead>
        <Leaves />
        <TextInput label="Mark" hint="As drawn." error="F12 is taken." />
        <NumberInput label="Pressure" unit="kPa" value={null} onChange={nothing} />
        <Textarea label="Reason" optional />
        <Select label="Zone" placeholder="Choose" options={[{ value: "a", label: "A" }]} />
        <Choice
          label="Given as"
          hint="As the report says."
          answers={[{ value: "net", label: "Net", hint: "Above overburden." }]}
          value={null}
          onChange={nothing}
        />
        <Checkbox label="Drained" hint="Long-term." />
        <Notice kind="done">Issued.</Notice>
        <Notice title="Two are poured.">They need a reason.</Notice>
        <ErrorNote problem={new Error("x")} onRetry={nothing} />
        <Progress label="Uploading" done={4} onCancel={nothing} />
        <Skeleton />
        <Empty title="None yet." action={<Button kind="main">New</Button>}>
          Import first.
        </Empty>
        <DefinitionList
          facts={[
            { term: "Breadth", unit: "m", value: "2.40" },
            { term: "Checked by", value: null },
          ]}
        />
        <DataTable
          label="Schedule"
          columns={[
            { id: "mark", head: "Mark", cell: (row: string) => row, namesRow: true, sortBy: (row) => row },
          ]}
          rows={["F1", "F2"]}
          rowKey={(row) => row}
          rowLabel={(row) => row}
          chosen={new Set(["F1"])}
          onChosen={nothing}
        />
        <Caution />
      </main>,
    );
    // Colours need a layout: they were scanned in Chromium, in light and dark.
    const { violations, passes } = await axe.run(container, {
      rules: { "color-contrast": { enabled: false } },
    });
    expect(violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html}`)).toEqual([]);
    expect(passes.length).toBeGreaterThan(20);
  });
});
