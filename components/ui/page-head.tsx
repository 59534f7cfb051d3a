import Link from "next/link";
import type { ReactNode } from "react";

type Props = {
  title: ReactNode;
  /** The sheet above, such as the schedule of footings above one footing. */
  up?: { href: string; label: string };
  /** Signs beside the title: state of a value, standing of a check. */
  signs?: ReactNode;
  /** One or two sentences under the title. */
  children?: ReactNode;
  /** Buttons, the main one last. */
  actions?: ReactNode;
};

/** The heading of a sheet: where it lies, what it is, what can be done with it. */
export function PageHead({ title, up, signs, children, actions }: Props) {
  return (
    <header className="mb-5 flex flex-wrap items-end justify-between gap-x-8 gap-y-3">
      <div className="min-w-0">
        {up && (
          <p className="text-ink-2" data-screen-only>
            <Link href={up.href} className="underline">
              {up.label}
            </Link>{" "}
            <span aria-hidden="true">/</span>
          </p>
        )}
        <div className="flex flex-wrap items-center gap-x-4 gap-y-1">
          <h1 className="text-xl break-words">{title}</h1>
          {signs}
        </div>
        {children && <div className="mt-1 max-w-prose text-ink-2">{children}</div>}
      </div>
      {actions && (
        <div className="flex flex-wrap gap-3" data-screen-only>
          {actions}
        </div>
      )}
    </header>
  );
}
