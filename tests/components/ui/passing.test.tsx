import { act, cleanup, fireEvent, render, screen } from "@testing-library/react";
import axe from "axe-core";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { PressureFigure } from "@/components/figures/pressure-figure";
import type { PressureGiven } from "@/components/figures/pressure-layout";
import { FigureFrame } from "@/components/ui/figure-frame";
import { KeyHint } from "@/components/ui/key-hint";
import { Menu } from "@/components/ui/menu";
import { savedSvg } from "@/components/ui/saved-svg";
import { Toasts, tell } from "@/components/ui/toast";

afterEach(cleanup);

describe("a menu", () => {
  const onWithdraw = vi.fn();
  const open = () => {
    onWithdraw.mockClear();
    const { container } = render(
      <>
        <button type="button">Elsewhere</button>
        <Menu label="More" items={[{ key: "withdraw", label: "Withdraw", onChoose: onWithdraw }]} />
      </>,
    );
    const fold = container.querySelector("details") as HTMLDetailsElement;
    fold.open = true;
    screen.getByRole("button", { name: "Withdraw" }).focus();
    return fold;
  };
  const word = () => screen.getByText("More");

  it("folds with Escape and gives the focus back to its word", () => {
    const fold = open();
    fireEvent.keyDown(screen.getByRole("button", { name: "Withdraw" }), { key: "Escape" });
    expect(fold.open).toBe(false);
    expect(document.activeElement).toBe(word());
    expect(onWithdraw).not.toHaveBeenCalled();
  });

  it("does what was chosen once, after it has folded", () => {
    const fold = open();
    onWithdraw.mockImplementationOnce(() => {
      expect(fold.open).toBe(false);
      expect(document.activeElement).toBe(word());
    });
    fireEvent.click(screen.getByRole("button", { name: "Withdraw" }));
    expect(onWithdraw).toHaveBeenCalledOnce();
  });

  it("folds when something else is pressed or reached, and not when pressed within", () => {
    const fold = open();
    fireEvent.pointerDown(screen.getByRole("button", { name: "Withdraw" }));
    expect(fold.open).toBe(true);
    fireEvent.pointerDown(screen.getByRole("button", { name: "Elsewhere" }));
    expect(fold.open).toBe(false);
    fold.open = true;
    screen.getByRole("button", { name: "Withdraw" }).focus();
    act(() => screen.getByRole("button", { name: "Elsewhere" }).focus());
    expect(fold.open).toBe(false);
  });
});

describe("what is said in passing", () => {
  beforeEach(() => {
    vi.useFakeTimers();
  });
  afterEach(() => {
    act(() => vi.advanceTimersByTime(60_000));
    vi.useRealTimers();
  });

  it("has its place before anything is said, or it would not be read aloud", () => {
    render(<Toasts />);
    const place = screen.getByRole("status");
    expect(place.textContent).toBe("");
    act(() => tell("Footing F12 is linked."));
    expect(screen.getByRole("status")).toBe(place);
    expect(place.textContent).toBe("Footing F12 is linked.");
  });

  it("goes after eight seconds, counted anew for each thing said", () => {
    render(<Toasts />);
    act(() => tell("F1 is checked."));
    act(() => vi.advanceTimersByTime(7_000));
    act(() => tell("F2 is checked."));
    act(() => vi.advanceTimersByTime(7_900));
    expect(screen.getByRole("status").textContent).toBe("F2 is checked.");
    act(() => vi.advanceTimersByTime(200));
    expect(screen.getByRole("status").textContent).toBe("");
  });

  it("stays while the focus rests on it, and goes when it is closed", () => {
    render(<Toasts />);
    act(() => tell("F1 is checked."));
    act(() => screen.getByRole("button", { name: "Close" }).focus());
    act(() => vi.advanceTimersByTime(60_000));
    expect(screen.getByRole("status").textContent).toBe("F1 is checked.");
    fireEvent.click(screen.getByRole("button", { name: "Close" }));
    expect(screen.getByRole("status").textContent).toBe("");
  });
});

describe("a drawing that is taken along", () => {
  const pad: PressureGiven = {
    breadth_m: 2,
    length_m: 2,
    thickness_m: 0.5,
    groundLevel_m: 10,
    foundingLevel_m: 9,
    groundwaterLevel_m: null,
    vertical_kN: 400,
    eccentricityB_m: 0,
    eccentricityL_m: 0,
    distribution: "uniform",
    cornerPressures_kPa: [100, 100, 100, 100],
    maxPressure_kPa: 100,
    minPressure_kPa: 100,
    contactRatio: 1,
    contactPolygon_m: [],
  };
  const frame = () =>
    render(
      <FigureFrame caption="Base pressure of F12" fileName="F12-base-pressure">
        <PressureFigure given={pad} soil="clay" />
      </FigureFrame>,
    );

  it("carries its colours, its size and its sentence, and is whole as XML", () => {
    const { container } = frame();
    const saved = savedSvg(container.querySelector("svg") as SVGSVGElement);
    const read = new DOMParser().parseFromString(saved, "image/svg+xml");
    expect(read.querySelector("parsererror")).toBeNull();
    expect(saved).not.toContain("var(");
    expect(saved).toContain("#1B2326");
    expect(saved.match(/xmlns="/g)).toHaveLength(1);
    expect(read.documentElement.getAttribute("viewBox")).toMatch(/^0 0 \d+ \d+$/);
    expect(read.querySelector("title")?.textContent).toContain("Pad of 2.00 by 2.00 m");
  });

  it("leaves the drawing on the sheet as it is", () => {
    const { container } = frame();
    const before = container.innerHTML;
    savedSvg(container.querySelector("svg") as SVGSVGElement);
    expect(container.innerHTML).toBe(before);
    expect(before).toContain("var(--ink");
  });

  it("says so when the browser lets nothing be copied", async () => {
    frame();
    fireEvent.click(screen.getByRole("button", { name: "Copy" }));
    expect(await screen.findByText("The browser did not let it be copied. Save it instead.")).toBeTruthy();
  });
});

describe("these parts", () => {
  it("pass the accessibility rules that can be judged without a layout", async () => {
    const { container } = render(
      <main>
        <Menu label="More" items={[{ key: "export", label: "Export", href: "/projects" }]} />
        <KeyHint keys={["Shift", "↓"]} />
        <Toasts />
        <FigureFrame caption="A square" fileName="square">
          <svg viewBox="0 0 1 1" role="img" aria-label="A square" />
        </FigureFrame>
      </main>,
    );
    const { violations } = await axe.run(container, { rules: { "color-contrast": { enabled: false } } });
    expect(violations.map(({ id }) => id)).toEqual([]);
  });
});
