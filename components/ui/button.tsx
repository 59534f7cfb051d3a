import Link from "next/link";
import type { ButtonHTMLAttributes, ComponentProps, ReactNode } from "react";

export type ButtonKind = "main" | "plain" | "danger" | "text";

const kinds: Record<ButtonKind, string> = {
  main: "border border-action bg-action px-3 py-1.5 text-on-action hover:brightness-110 print:text-ink",
  plain: "border border-field bg-sheet px-3 py-1.5 text-ink hover:border-ink",
  danger:
    "border border-fails bg-sheet px-3 py-1.5 text-fails-text hover:border-2 hover:px-[11px] hover:py-[5px]",
  text: "px-0.5 py-1.5 text-ink underline",
};

const look = (kind: ButtonKind, more = "") =>
  `inline-flex min-h-8 items-center justify-center gap-2 text-left aria-disabled:opacity-60 disabled:opacity-60 ${kinds[kind]} ${more}`;

type Props = Omit<ButtonHTMLAttributes<HTMLButtonElement>, "disabled"> & {
  /** `main` once on a sheet, `plain` for the rest, `danger` for what cannot be taken back, `text` within a line. */
  kind?: ButtonKind;
  /** Work is going on: the button keeps its place and its focus and does nothing more. */
  busy?: boolean;
  /** Why it cannot be pressed now; read aloud with the button, shown when the pointer rests on it. */
  unavailable?: string;
};

/** A button. It stays reachable while it cannot be pressed, so that the reason can be read. */
export function Button({
  kind = "plain",
  busy = false,
  unavailable,
  type = "button",
  className,
  onClick,
  children,
  ...rest
}: Props) {
  const off = busy || unavailable !== undefined;
  return (
    <button
      {...rest}
      type={type}
      aria-disabled={off || undefined}
      aria-busy={busy || undefined}
      title={unavailable ?? rest.title}
      onClick={(event) => {
        if (off) event.preventDefault();
        else onClick?.(event);
      }}
      className={look(kind, className)}
    >
      {children}
      {busy && <span role="status">…</span>}
      {unavailable && <span className="sr-only">, {unavailable}</span>}
    </button>
  );
}

/** A way to another sheet that looks like a button. */
export function ButtonLink({
  kind = "plain",
  className,
  children,
  ...rest
}: Omit<ComponentProps<typeof Link>, "className"> & {
  kind?: ButtonKind;
  className?: string;
  children: ReactNode;
}) {
  return (
    <Link {...rest} className={look(kind, className)}>
      {children}
    </Link>
  );
}
