"use client";

import { type FormEvent, type ReactNode, useRef, useState } from "react";
import { type Answer, type Refused, send, sendSignIn } from "@/lib/client/send";
import { Notice } from "./notice";
import { TextField } from "./text-field";

export type FieldOfForm = {
  name: string;
  label: string;
  type?: "text" | "email" | "password";
  autoComplete?: string;
  hint?: string;
  defaultValue?: string;
  minLength?: number;
  maxLength?: number;
  optional?: boolean;
};

/** What follows when the form was taken: a page, a sentence, or a sign-in with what was typed and then a page. */
export type Afterwards =
  | { kind: "go"; to: string }
  | { kind: "say"; sentence: string }
  | { kind: "sign-in"; email: string; to: string }
  | { kind: "enter" };

type Props = {
  action: string;
  method?: "POST" | "PATCH";
  fields: FieldOfForm[];
  hidden?: Record<string, string>;
  submit: string;
  afterwards: Afterwards;
  children?: ReactNode;
};

/**
 * A form of the account pages. Its element posts to the same address, so that it works before the scripts have run and
 * never puts what was typed into an address. Afterwards it sends the same by itself, keeps what was typed and puts what
 * is wrong beside the field.
 */
export function AccountForm({
  action,
  method = "POST",
  fields,
  hidden = {},
  submit,
  afterwards,
  children,
}: Props) {
  const form = useRef<HTMLFormElement>(null);
  const [busy, setBusy] = useState(false);
  const [refused, setRefused] = useState<Refused>();
  const [said, setSaid] = useState("");

  const onSubmit = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    if (busy) return;
    setBusy(true);
    setRefused(undefined);
    setSaid("");
    const typed = Object.fromEntries(
      [...new FormData(event.currentTarget)].map(([name, value]) => [name, String(value)]),
    );
    const answer: Answer<unknown> =
      afterwards.kind === "enter"
        ? await sendSignIn(typed as { email: string; password: string; callbackUrl: string })
        : await send(action, method, typed);
    const problem = answer.done ? await follow(afterwards, typed, answer.body) : answer.refused;
    setBusy(false);
    if (problem) {
      setRefused(problem);
      const wrong = fields.find(({ name }) => problem.fields[name]);
      form.current
        ?.querySelector<HTMLInputElement>(wrong ? `[name="${wrong.name}"]` : "[type=password]")
        ?.focus();
    } else if (afterwards.kind === "say") {
      setSaid(afterwards.sentence);
      form.current?.reset();
    }
  };

  const elsewhere = Object.entries(refused?.fields ?? {}).filter(
    ([name]) => !fields.some((field) => field.name === name),
  );
  return (
    <form ref={form} method="post" action={action} onSubmit={onSubmit} noValidate className="max-w-md">
      {refused && (
        <Notice kind="refused">
          {[refused.detail, ...elsewhere.map(([, sentence]) => sentence)].join(" ")}
        </Notice>
      )}
      {said && <Notice kind="done">{said}</Notice>}
      {Object.entries(hidden).map(([name, value]) => (
        <input key={name} type="hidden" name={name} value={value} />
      ))}
      {fields.map(({ optional, type = "text", ...field }) => (
        <TextField
          key={field.name}
          {...field}
          type={type}
          required={!optional}
          problem={refused?.fields[field.name]}
        />
      ))}
      {children}
      <button type="submit" aria-disabled={busy} className="mt-5 bg-action px-4 py-2 text-on-action">
        {busy ? "One moment …" : submit}
      </button>
    </form>
  );
}

/** Goes on after the form; answers with a refusal when the sign-in that should follow was refused. */
async function follow(
  afterwards: Afterwards,
  typed: Record<string, string>,
  body: unknown,
): Promise<Refused | undefined> {
  // A whole load, not a soft one: what was cached for the person before must go.
  if (afterwards.kind === "go") window.location.assign(afterwards.to);
  if (afterwards.kind === "enter") window.location.assign((body as { url: string }).url);
  if (afterwards.kind === "sign-in") {
    const { email, to } = afterwards;
    const entered = await sendSignIn({ email, password: typed.password ?? "", callbackUrl: to });
    if (!entered.done) return entered.refused;
    window.location.assign(entered.body.url);
  }
  return undefined;
}
