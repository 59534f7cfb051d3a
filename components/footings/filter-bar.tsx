"use client";

import type { FormEvent } from "react";
import type { FootingFilter } from "@/lib/client/use-footings";
import { stageTitles } from "@/lib/contracts/footing-words";
import type { FootingChoices, FootingCounts } from "@/lib/contracts/footings";

type Props = {
  filter: FootingFilter;
  choices: FootingChoices;
  counts: FootingCounts | null;
  onChange: (filter: FootingFilter) => void;
};

const sorts = [
  ["mark", "mark"],
  ["utilisation", "utilisation"],
  ["required", "required value"],
  ["level", "founding level"],
  ["stage", "stage"],
] as const;

/** What the list is narrowed to. Everything stands in the address, so that a view can be kept and passed on. */
export function FilterBar({ filter, choices, counts, onChange }: Props) {
  const set = (name: string, value: string) => {
    const { [name]: _, ...rest } = filter;
    onChange(value === "" ? rest : { ...rest, [name]: value });
  };
  const choose = (
    name: string,
    label: string,
    options: readonly (readonly [value: string, title: string])[],
  ) => (
    <label className="block">
      <span className="block text-ink-2">{label}</span>
      <select
        name={name}
        value={filter[name] ?? ""}
        onChange={(event) => set(name, event.target.value)}
        className="mt-0.5 max-w-44 border border-field bg-sheet px-2 py-1"
      >
        <option value="">any</option>
        {options.map(([value, title]) => (
          <option key={value} value={value}>
            {title}
          </option>
        ))}
      </select>
    </label>
  );
  const onSubmit = (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    const typed = new FormData(event.currentTarget);
    const next: FootingFilter = { ...filter };
    for (const name of ["search", "utilisationFrom", "utilisationTo"]) {
      const value = String(typed.get(name) ?? "").trim();
      if (value === "") delete next[name];
      else next[name] = value;
    }
    onChange(next);
  };
  const narrowed = Object.keys(filter).some((name) => name !== "sort" && name !== "descending");

  return (
    <search className="mt-4 block">
      <form onSubmit={onSubmit} className="flex flex-wrap items-end gap-x-4 gap-y-2">
        <label className="block">
          <span className="block text-ink-2">Mark or grid reference</span>
          <input
            key={filter.search ?? ""}
            name="search"
            type="search"
            defaultValue={filter.search ?? ""}
            maxLength={100}
            className="mt-0.5 w-44 border border-field bg-sheet px-2 py-1"
          />
        </label>
        {choose("verdict", "Verdict", [
          ["passes", `passes${counted(counts?.passes)}`],
          ["fails", `fails${counted(counts?.fails)}`],
          ["outside conditions", `outside conditions${counted(counts?.outside)}`],
        ])}
        {choose("standing", "Standing", [
          ["current", "current"],
          ["affected", `affected${counted(counts?.affected)}`],
          ["unchecked", `no check yet${counted(counts?.unchecked)}`],
        ])}
        {choose("stage", "Stage", Object.entries(stageTitles))}
        {choose(
          "zoneId",
          "Zone",
          choices.zones.map(({ id, name }) => [id, name] as const),
        )}
        {choose(
          "groundUnitId",
          "Ground unit",
          choices.groundUnits.map(({ id, code, name }) => [id, `${code} ${name}`] as const),
        )}
        {choose(
          "valueId",
          "Bearing value",
          choices.values.map(({ id, label }) => [id, label] as const),
        )}
        {choose("linked", "Linked", [
          ["yes", "to a value"],
          ["no", `to none${counted(counts?.unlinked)}`],
        ])}
        {choose(
          "ownerId",
          "Owner",
          choices.owners.map(({ id, name }) => [id, name] as const),
        )}
        <fieldset className="flex items-end gap-1">
          <legend className="text-ink-2">Utilisation</legend>
          <input
            key={`from ${filter.utilisationFrom ?? ""}`}
            name="utilisationFrom"
            aria-label="Utilisation from"
            inputMode="decimal"
            defaultValue={filter.utilisationFrom ?? ""}
            className="w-16 border border-field bg-sheet px-2 py-1 text-right tabular-nums"
          />
          <span aria-hidden="true">to</span>
          <input
            key={`to ${filter.utilisationTo ?? ""}`}
            name="utilisationTo"
            aria-label="Utilisation to"
            inputMode="decimal"
            defaultValue={filter.utilisationTo ?? ""}
            className="w-16 border border-field bg-sheet px-2 py-1 text-right tabular-nums"
          />
        </fieldset>
        <label className="block">
          <span className="block text-ink-2">Order</span>
          <select
            name="sort"
            value={filter.sort ?? "mark"}
            onChange={(event) => set("sort", event.target.value === "mark" ? "" : event.target.value)}
            className="mt-0.5 border border-field bg-sheet px-2 py-1"
          >
            {sorts.map(([value, title]) => (
              <option key={value} value={value}>
                {title}
              </option>
            ))}
          </select>
        </label>
        <label className="flex items-center gap-1.5 py-1">
          <input
            type="checkbox"
            checked={filter.descending === "yes"}
            onChange={(event) => set("descending", event.target.checked ? "yes" : "")}
          />
          largest first
        </label>
        <button type="submit" className="border border-field px-3 py-1">
          Search
        </button>
        {narrowed && (
          <button type="button" className="py-1 underline" onClick={() => onChange({})}>
            Show all
          </button>
        )}
      </form>
    </search>
  );
}

const counted = (count: number | undefined): string =>
  count === undefined ? "" : ` (${count.toLocaleString("en-GB")})`;
