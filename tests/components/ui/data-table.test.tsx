import { cleanup, fireEvent, render, screen, within } from "@testing-library/react";
import { useState } from "react";
import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from "vitest";
import { type Column, DataTable } from "@/components/ui/data-table";
import { sortRows } from "@/components/ui/sort-rows";

afterEach(cleanup);

type Pad = { mark: string; breadth_m: number; utilisation: number | null };
const pads: Pad[] = [
  { mark: "F10", breadth_m: 2.4, utilisation: 0.91 },
  { mark: "F2", breadth_m: 1.8, utilisation: null },
  { mark: "F1", breadth_m: 3, utilisation: 1.04 },
];
const columns: Column<Pad>[] = [
  {
    id: "mark",
    head: "Mark",
    cell: ({ mark }) => <a href={`/footings/${mark}`}>{mark}</a>,
    namesRow: true,
    sortBy: ({ mark }) => mark,
  },
  {
    id: "breadth",
    head: "Breadth",
    unit: "m",
    kind: "figure",
    cell: ({ breadth_m }) => breadth_m.toFixed(2),
    sortBy: ({ breadth_m }) => breadth_m,
  },
  {
    id: "utilisation",
    head: "Utilisation",
    kind: "figure",
    cell: ({ utilisation }) => utilisation?.toFixed(2) ?? "—",
    sortBy: ({ utilisation }) => utilisation,
  },
];

function Schedule({ rows = pads, onEnd }: { rows?: Pad[]; onEnd?: () => void }) {
  const [chosen, setChosen] = useState<Set<string>>(new Set());
  return (
    <>
      <DataTable
        label="Schedule"
        columns={columns}
        rows={rows}
        rowKey={({ mark }) => mark}
        rowLabel={({ mark }) => `footing ${mark}`}
        chosen={chosen}
        onChosen={setChosen}
        onEnd={onEnd}
      />
      <output>{[...chosen].join(" ")}</output>
    </>
  );
}

const marks = () => screen.getAllByRole("rowheader").map((cell) => cell.textContent);
const press = (name: RegExp) => fireEvent.click(screen.getByRole("button", { name }));
const box = (mark: string) => screen.getByLabelText(`Choose footing ${mark}`);
const chosen = () => screen.getByRole("status").textContent;

describe("a table", () => {
  it("is a table with a name, heads with their unit once, and rows that are named by their mark", () => {
    render(<Schedule />);
    const table = screen.getByRole("table", { name: "Schedule" });
    expect(within(table).getByRole("columnheader", { name: "Breadth m" })).toBeTruthy();
    expect(marks()).toEqual(["F10", "F2", "F1"]);
  });

  it("orders marks as people count, up and then down, and says which way", () => {
    render(<Schedule />);
    press(/^Mark/);
    expect(marks()).toEqual(["F1", "F2", "F10"]);
    expect(screen.getByRole("columnheader", { name: "Mark" }).getAttribute("aria-sort")).toBe("ascending");
    press(/^Mark/);
    expect(marks()).toEqual(["F10", "F2", "F1"]);
    expect(screen.getByRole("columnheader", { name: "Mark" }).getAttribute("aria-sort")).toBe("descending");
  });

  it("keeps a footing without a check last, whichever way utilisation is ordered", () => {
    render(<Schedule />);
    press(/^Utilisation/);
    expect(marks()).toEqual(["F10", "F1", "F2"]);
    press(/^Utilisation/);
    expect(marks()).toEqual(["F1", "F10", "F2"]);
  });

  it("leaves the order to the page that asked for it, and tells it what was pressed", () => {
    const onSort = vi.fn();
    render(
      <DataTable
        label="Schedule"
        columns={columns}
        rows={pads}
        rowKey={({ mark }) => mark}
        sort={{ column: "mark", descending: false }}
        onSort={onSort}
      />,
    );
    expect(marks()).toEqual(["F10", "F2", "F1"]);
    press(/^Mark/);
    expect(onSort).toHaveBeenCalledWith({ column: "mark", descending: true });
  });
});

describe("rows that can be chosen", () => {
  it("takes one, then all between it and the one chosen with Shift", () => {
    render(<Schedule />);
    fireEvent.click(box("F10"));
    expect(chosen()).toBe("F10");
    fireEvent.click(box("F1"), { shiftKey: true });
    expect(chosen()).toBe("F10 F2 F1");
    fireEvent.click(box("F2"));
    expect(chosen()).toBe("F10 F1");
  });

  it("has one box in the Tab order and walks to the others with the arrows", () => {
    render(<Schedule />);
    expect([box("F10"), box("F2"), box("F1")].map((one) => one.tabIndex)).toEqual([0, -1, -1]);
    box("F10").focus();
    fireEvent.keyDown(box("F10"), { key: "ArrowDown" });
    expect(document.activeElement).toBe(box("F2"));
    fireEvent.keyDown(box("F2"), { key: "End" });
    expect(document.activeElement).toBe(box("F1"));
    fireEvent.keyDown(box("F1"), { key: "ArrowDown" });
    expect(document.activeElement).toBe(box("F1"));
    expect([box("F10"), box("F2"), box("F1")].map((one) => one.tabIndex)).toEqual([-1, -1, 0]);
    expect(chosen()).toBe("");
  });

  it("takes the row it starts from and the rows passed when walked with Shift", () => {
    render(<Schedule />);
    box("F10").focus();
    fireEvent.keyDown(box("F10"), { key: "ArrowDown", shiftKey: true });
    expect(chosen()).toBe("F10 F2");
    fireEvent.keyDown(box("F2"), { key: "ArrowDown", shiftKey: true });
    expect(chosen()).toBe("F10 F2 F1");
  });

  it("reaches back to the footing chosen last, wherever a new order has put it", () => {
    render(<Schedule />);
    fireEvent.click(box("F10"));
    press(/^Mark/);
    expect(marks()).toEqual(["F1", "F2", "F10"]);
    fireEvent.click(box("F2"), { shiftKey: true });
    expect(chosen()).toBe("F10 F2");
  });

  it("walks along the marks when the focus stands on a mark", () => {
    render(<Schedule />);
    screen.getByRole("link", { name: "F10" }).focus();
    fireEvent.keyDown(screen.getByRole("link", { name: "F10" }), { key: "ArrowDown" });
    expect(document.activeElement).toBe(screen.getByRole("link", { name: "F2" }));
  });

  it("chooses all with Ctrl+A and with the box in the head, which also chooses none", () => {
    render(<Schedule />);
    fireEvent.keyDown(box("F2"), { key: "a", ctrlKey: true });
    expect(chosen()).toBe("F10 F2 F1");
    fireEvent.click(screen.getByLabelText("Choose all 3 shown"));
    expect(chosen()).toBe("");
    fireEvent.click(screen.getByLabelText("Choose all 3 shown"));
    expect(chosen()).toBe("F10 F2 F1");
  });
});

describe("a long table", () => {
  // jsdom lays nothing out: every element is 640 px high here, which is a window of twenty rows.
  const height = Object.getOwnPropertyDescriptor(Element.prototype, "clientHeight");
  beforeAll(() =>
    Object.defineProperty(Element.prototype, "clientHeight", { get: () => 640, configurable: true }),
  );
  afterAll(() => {
    if (height) Object.defineProperty(Element.prototype, "clientHeight", height);
  });

  const many = Array.from({ length: 1000 }, (_, at) => ({ ...pads[0], mark: `F${at + 1}` }) as Pad);

  it("keeps some rows in the page, counts all, and prints all", () => {
    render(<Schedule rows={many} />);
    expect(marks().length).toBeLessThan(100);
    expect(marks()[0]).toBe("F1");
    expect(screen.getByRole("table").getAttribute("aria-rowcount")).toBe("1001");
    fireEvent(window, new Event("beforeprint"));
    expect(marks()).toHaveLength(1000);
    fireEvent(window, new Event("afterprint"));
    expect(marks().length).toBeLessThan(100);
  });

  it("puts no style into the markup, which the page's policy would drop", () => {
    const { container } = render(<Schedule rows={many} />);
    expect(container.querySelectorAll("[style]")).toHaveLength(0);
    expect(container.querySelector("tbody td[height]")).not.toBeNull();
  });

  it("can be passed without going through its rows", () => {
    render(<Schedule rows={many} />);
    press(/Past the table/);
    expect(document.activeElement?.textContent).toBe("End of Schedule");
  });

  it("asks for more near the end of what has been read, and not before", () => {
    const onEnd = vi.fn();
    const { rerender } = render(<Schedule rows={many} onEnd={onEnd} />);
    expect(onEnd).not.toHaveBeenCalled();
    rerender(<Schedule rows={pads} onEnd={onEnd} />);
    expect(onEnd).toHaveBeenCalled();
  });
});

describe("a table without rows", () => {
  const bare = { label: "Schedule", columns, rows: [], rowKey: ({ mark }: Pad) => mark };

  it("keeps the place of rows being read and says that it is busy", () => {
    render(<DataTable {...bare} loading empty="There is no footing yet." />);
    expect(screen.getByRole("table").getAttribute("aria-busy")).toBe("true");
    expect(screen.queryByText("There is no footing yet.")).toBeNull();
  });

  it("says that there is none once they have been read", () => {
    render(<DataTable {...bare} empty="There is no footing yet." />);
    expect(screen.getByText("There is no footing yet.")).toBeTruthy();
  });

  it("says what went wrong instead of saying that there is none", () => {
    render(<DataTable {...bare} error="They could not be read." empty="There is no footing yet." />);
    expect(screen.getByText("They could not be read.")).toBeTruthy();
    expect(screen.queryByText("There is no footing yet.")).toBeNull();
  });
});

describe("rows in order", () => {
  it("leaves rows that say the same as they were, in both directions", () => {
    const rows = ["a", "b", "c"];
    expect(sortRows(rows, () => 1, false)).toEqual(rows);
    expect(sortRows(rows, () => 1, true)).toEqual(rows);
  });

  it("orders figures by size and not by their first digit", () => {
    expect(sortRows([150, 90, 1000, Number.NaN], (row) => row, false)).toEqual([90, 150, 1000, Number.NaN]);
  });
});
