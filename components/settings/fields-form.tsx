"use client";

import { useRouter } from "next/navigation";
import { type FormEvent, useRef, useState } from "react";
import { Notice } from "@/components/account/notice";
import { TextField } from "@/components/account/text-field";
import { type Refused, send } from "@/lib/client/send";

/** One field of a form of settings. `name` may have a dot: "criteria.slidingFactor" goes into an object of its own. */
export type SettingsField = {
  name: string;
  label: string;
  kind: "text" | "number" | "choice" | "yes-no";
  value: string | number | boolean | null;
  unit?: string;
  hint?: string;
  options?: readonly (readonly [value: string, label: string])[];
  /** An empty number is sent as none. */
  optional?: boolean;
};
export type FieldGroup = { title?: string; note?: string; fields: SettingsField[] };

type Props = {
  path: string;
  method: "POST" | "PATCH";
  revision?: number;
  groups: FieldGroup[];
  submit: string;
  said: string;
  /** Sends only what was changed, as a PATCH wants it. */
  onlyChanged?: boolean;
  /** Fields that are emptied once it was taken, such as the reason of this one change. */
  empties?: readonly string[];
  /** Where to go afterwards; "{id}" stands for the id in the answer. */
  goTo?: string;
};

/** A form of settings: sends what is in it, keeps what was typed when it is refused, and says what is wrong where it is. */
export function FieldsForm({
  path,
  method,
  revision,
  groups,
  submit,
  said,
  onlyChanged,
  empties = [],
  goTo,
}: Props) {
  const router = useRouter();
  const form = useRef<HTMLFormElement>(null);
  const [busy, setBusy] = useState(false);
  const [refused, setRefused] = useState<Refused>();
  const [done, setDone] = useState(false);
  /** The revision that the last answer gave: a second change may come before the page has been read anew. */
  const given = useRef(0);
  const fields = groups.flatMap((group) => group.fields);

  const onSubmit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    if (busy) return;
    setBusy(true);
    setDone(false);
    const body = bodyOf(fields, new FormData(event.currentTarget), onlyChanged ?? false);
    const seen = revision === undefined ? undefined : Math.max(revision, given.current);
    const answer = await send<{ id?: string; revision?: number }>(path, method, body, seen);
    setBusy(false);
    setRefused(answer.done ? undefined : answer.refused);
    if (answer.done) {
      setDone(true);
      given.current = answer.body?.revision ?? 0;
      for (const name of empties) {
        const input = form.current?.elements.namedItem(name);
        if (input instanceof HTMLInputElement) input.value = "";
      }
      if (goTo) router.push(goTo.replace("{id}", answer.body?.id ?? ""));
      router.refresh();
    } else {
      const wrong = fields.find(({ name }) => answer.refused.fields[name]);
      if (wrong) form.current?.querySelector<HTMLElement>(`[name="${wrong.name}"]`)?.focus();
    }
  };

  return (
    <form ref={form} method="post" action={path} onSubmit={onSubmit} noValidate className="max-w-3xl">
      {groups.map((group) => (
        <fieldset key={group.title ?? ""} className="mt-6">
          {group.title && <legend className="text-sm font-semibold">{group.title}</legend>}
          {group.note && <p className="mt-1 text-sm text-ink-2">{group.note}</p>}
          <div className="grid gap-x-6 sm:grid-cols-2">
            {group.fields.map((field) => (
              <Field key={field.name} field={field} problem={refused?.fields[field.name]} />
            ))}
          </div>
        </fieldset>
      ))}
      {refused && <Notice kind="refused">{refused.detail}</Notice>}
      {done && <Notice kind="done">{said}</Notice>}
      <button type="submit" aria-disabled={busy} className="mt-5 bg-action px-4 py-2 text-on-action">
        {busy ? "One moment …" : submit}
      </button>
    </form>
  );
}

function Field({ field, problem }: { field: SettingsField; problem?: string }) {
  const { name, kind, unit, hint, value } = field;
  const label = unit ? `${field.label} (${unit})` : field.label;
  if (kind === "text" || kind === "number")
    return (
      <TextField
        name={name}
        label={label}
        hint={hint}
        problem={problem}
        defaultValue={value === null ? "" : String(value)}
        inputMode={kind === "number" ? "decimal" : undefined}
        autoComplete="off"
      />
    );
  const options =
    kind === "yes-no"
      ? ([
          ["yes", "Yes"],
          ["no", "No"],
        ] as const)
      : (field.options ?? []);
  const chosen = kind === "yes-no" ? (value === null ? "" : value ? "yes" : "no") : String(value ?? "");
  return (
    <div className="mt-4">
      <label className="block text-sm" htmlFor={name}>
        {label}
      </label>
      <select
        id={name}
        name={name}
        defaultValue={chosen}
        aria-invalid={problem ? true : undefined}
        aria-describedby={problem || hint ? `${name}-note` : undefined}
        className="mt-1 block w-full border border-rule bg-sheet px-2 py-1.5"
      >
        {chosen === "" && <option value="">Choose</option>}
        {options.map(([option, title]) => (
          <option key={option} value={option}>
            {title}
          </option>
        ))}
      </select>
      {(problem || hint) && (
        <p id={`${name}-note`} className={`mt-1 text-sm ${problem ? "text-fails-text" : "text-ink-2"}`}>
          {problem ?? hint}
        </p>
      )}
    </div>
  );
}

/** What the form holds, each field in its kind. What is no number is sent as typed: the server says so beside it. */
function bodyOf(fields: SettingsField[], typed: FormData, onlyChanged: boolean): Record<string, unknown> {
  const body: Record<string, unknown> = {};
  for (const field of fields) {
    const value = valueTyped(field, String(typed.get(field.name) ?? ""));
    if (value === undefined || (onlyChanged && value === field.value)) continue;
    const [outer = "", inner] = field.name.split(".");
    if (inner === undefined) body[outer] = value;
    else body[outer] = { ...(body[outer] as object | undefined), [inner]: value };
  }
  return body;
}

function valueTyped({ kind, optional }: SettingsField, typed: string): unknown {
  const text = typed.trim();
  if (kind === "yes-no") return text === "" ? undefined : text === "yes";
  if (kind === "choice") return text === "" ? undefined : text;
  if (kind === "text") return typed;
  if (text === "") return optional ? null : undefined;
  return /^[-+]?(\d+\.?\d*|\.\d+)(e[-+]?\d+)?$/i.test(text) ? Number(text) : text;
}
