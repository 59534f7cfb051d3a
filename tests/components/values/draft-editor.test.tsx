import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { cleanup, fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { DraftEditor } from "@/components/values/draft-editor";
import type { RevisionPreview } from "@/lib/contracts/changes";
import type { PersonId } from "@/lib/contracts/ids";
import type { DraftContent, ValueDraft } from "@/lib/contracts/values";

const preview: RevisionPreview = {
  netAllowable_kPa: null,
  currentNet_kPa: 250,
  how: "stored required values",
  linked: 0,
  unchecked: 0,
  counts: { holds: 0, "now fails": 0, "still fails": 0, recovers: 0, "outside conditions": 0 },
  excavatedAffected: 0,
  pouredAffected: 0,
  firstToFail: null,
  curve: [],
  worst: [],
};

type Saved = { ifMatch: string | null; content: DraftContent };
let saves: Saved[];
let refuse: { status: number; body: object } | null;

// The browser's side alone is under test: what it sends, and what it does with an answer.
beforeEach(() => {
  saves = [];
  refuse = null;
  vi.stubGlobal("fetch", async (path: string, init: RequestInit = {}) => {
    if (path.includes("/preview")) return Response.json(preview);
    const headers = new Headers(init.headers);
    saves.push({ ifMatch: headers.get("if-match"), content: JSON.parse(String(init.body)).content });
    if (refuse) return Response.json(refuse.body, { status: refuse.status });
    return Response.json({ revision: saves.length + 1 });
  });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const show = (over: Partial<ValueDraft> = {}) => {
  const draft: ValueDraft = {
    content: {},
    preparedBy: { id: "p" as PersonId, name: "Ines Halloran" },
    revision: 1,
    changedAt: "2026-03-01T10:00:00Z",
    problems: {},
    findings: [],
    netAllowable_kPa: null,
    sources: [],
    ...over,
  };
  return render(
    <QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}>
      <DraftEditor projectId="p" valueId="v" draft={draft} documents={[]} />
    </QueryClientProvider>,
  );
};
const figure = () => screen.getByLabelText("Pressure as the report gives it");

describe("the form of a draft", () => {
  it("offers net or gross, load basis and transient increase with nothing chosen beforehand", () => {
    show();
    for (const name of [
      "Net or gross in the report",
      "Loads it goes with",
      "Increase for short-term loads",
    ]) {
      const radios = within(screen.getByRole("group", { name })).getAllByRole("radio");
      expect(radios.length).toBeGreaterThan(1);
      for (const radio of radios) expect(radio).toHaveProperty("checked", false);
    }
  });

  it("asks for the overburden of a gross figure, and of that alone", () => {
    show();
    expect(screen.queryByLabelText(/Overburden taken off/)).toBeNull();
    fireEvent.click(screen.getByRole("radio", { name: /^Gross/ }));
    expect(screen.getByLabelText(/Overburden taken off/)).toBeTruthy();
    fireEvent.click(screen.getByRole("radio", { name: /^Net:/ }));
    expect(screen.queryByLabelText(/Overburden taken off/)).toBeNull();
  });

  it("saves what is typed by itself, once for several keystrokes, on the revision that was seen", async () => {
    show({ revision: 7 });
    for (const value of ["2", "25", "250 kPa"]) fireEvent.change(figure(), { target: { value } });
    await waitFor(() => expect(screen.getByText(/Everything typed is saved/)).toBeTruthy(), {
      timeout: 4000,
    });
    expect(saves).toEqual([{ ifMatch: '"7"', content: { given: "250 kPa" } }]);
    fireEvent.change(figure(), { target: { value: "240 kPa" } });
    await waitFor(() => expect(saves).toHaveLength(2), { timeout: 4000 });
    expect(saves[1]?.ifMatch).toBe('"2"');
  });

  it("keeps what was typed when another has written meanwhile, and says so", async () => {
    refuse = { status: 412, body: { code: "superseded", detail: "The draft was changed meanwhile." } };
    show();
    fireEvent.change(figure(), { target: { value: "180 kPa" } });
    await waitFor(() => expect(screen.getByRole("alert").textContent).toContain("changed meanwhile"), {
      timeout: 4000,
    });
    expect(figure()).toHaveProperty("value", "180 kPa");
    expect(screen.getByText(/Not saved/)).toBeTruthy();
  });

  it("shows what is wrong beside the field that was filled, and what is missing only when asked", () => {
    show({
      content: { given: "2 ton" },
      problems: { given: "Say metric, short or long ton.", loadBasis: "Say which loads it goes with." },
    });
    expect(screen.getByText("Say metric, short or long ton.")).toBeTruthy();
    expect(screen.queryByText("Say which loads it goes with.")).toBeNull();
    fireEvent.click(screen.getByRole("button", { name: "What is still missing?" }));
    expect(screen.getByText("Say which loads it goes with.")).toBeTruthy();
    expect(screen.getByText(/2 fields need another look/)).toBeTruthy();
  });

  it("asks about an unusual figure with where the doubt comes from", () => {
    show({
      findings: [
        {
          code: "unusual-pressure",
          field: "given",
          sentence: "Is the unit right?",
          source: "BS 8004:1986 table 1",
        },
      ],
    });
    expect(screen.getByText(/Is the unit right/).textContent).toContain("BS 8004:1986 table 1");
  });
});
