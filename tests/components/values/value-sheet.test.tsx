import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import type { Rights } from "@/components/values/sign-actions";
import { ValueSheet } from "@/components/values/value-sheet";
import type { GroundUnitId, PersonId, ValueId, ZoneId } from "@/lib/contracts/ids";
import type { ValueDetail, ValueDraft } from "@/lib/contracts/values";

const draft: ValueDraft = {
  content: { given: "3000 kPa" },
  preparedBy: { id: "ines" as PersonId, name: "Ines Halloran" },
  revision: 4,
  changedAt: "2026-03-01T10:00:00.000Z",
  problems: {},
  findings: [
    { code: "unusual-pressure", field: "given", sentence: "Is the unit right?", source: "BS 8004:1986" },
  ],
  netAllowable_kPa: 3000,
  sources: [],
};
const value: ValueDetail = {
  id: "v" as ValueId,
  reference: "BV-03",
  revision: 2,
  zone: { id: "z" as ZoneId, name: "Zone B" },
  groundUnit: { id: "u" as GroundUnitId, code: "2", name: "Terrace gravel", soil: "gravel" },
  currentRevisionId: null,
  draft,
  revisions: [],
  footings: { notPoured: 0, poured: 0 },
};

let sent: { path: string; body: unknown; ifMatch: string | null }[];
beforeEach(() => {
  sent = [];
  vi.stubGlobal("fetch", async (path: string, init: RequestInit = {}) => {
    if (init.method !== "POST") return Response.json(path.includes("preview") ? null : value);
    sent.push({
      path,
      body: JSON.parse(String(init.body)),
      ifMatch: new Headers(init.headers).get("if-match"),
    });
    return Response.json({ code: "P01" }, { status: 201 });
  });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const show = (rights: Partial<Rights>, over: Partial<ValueDetail> = {}) =>
  render(
    <QueryClientProvider
      client={new QueryClient({ defaultOptions: { queries: { retry: false, staleTime: 1e9 } } })}
    >
      <ValueSheet
        projectId="p"
        initial={{ ...value, ...over }}
        documents={[]}
        rights={{ personId: "tom", draft: true, check: true, issue: true, withdraw: true, ...rights }}
      />
    </QueryClientProvider>,
  );

describe("the sheet of a value", () => {
  it("opens another's draft for reading, so that nobody loses the right to check by a slip", () => {
    show({});
    expect(screen.queryByLabelText("Pressure as the report gives it")).toBeNull();
    expect(screen.getByText("3000 kPa")).toBeTruthy();
    fireEvent.click(screen.getByRole("button", { name: "Write in this draft" }));
    expect(screen.getByLabelText("Pressure as the report gives it")).toHaveProperty("value", "3000 kPa");
  });

  it("sends the check only when each unusual point has been confirmed, on the revision that was read", async () => {
    show({});
    const button = screen.getByRole("button", { name: "Check BV-03" });
    fireEvent.click(button);
    expect(sent).toEqual([]);
    fireEvent.click(screen.getByRole("checkbox"));
    fireEvent.click(button);
    fireEvent.click(button);
    expect(sent).toEqual([
      { path: "/api/projects/p/values/v/check", body: { confirmed: ["unusual-pressure"] }, ifMatch: '"4"' },
    ]);
  });

  it("tells the preparer who can check, and offers no check", () => {
    show({ personId: "ines" });
    expect(screen.queryByRole("button", { name: "Check BV-03" })).toBeNull();
    expect(screen.getByText(/another geotechnical engineer checks it/)).toBeTruthy();
  });

  it("offers a reader nothing to press and says who writes", () => {
    show({ draft: false, check: false, issue: false, withdraw: false }, { draft: null });
    expect(screen.queryAllByRole("button")).toEqual([]);
    expect(screen.getByText(/geotechnical engineer writes the next revision/)).toBeTruthy();
  });
});
