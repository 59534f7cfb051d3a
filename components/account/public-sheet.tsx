import type { ReactNode } from "react";

/** A sheet for those who are not signed in: the name of the register, a heading, and what to do. */
export function PublicSheet({ title, children }: { title: string; children: ReactNode }) {
  return (
    <main className="mx-auto flex min-h-dvh max-w-xl flex-col justify-center p-6">
      <div className="border border-rule bg-sheet p-8">
        <p className="text-sm text-ink-2">Holdground, the ground register that footings answer to</p>
        <h1 className="mt-1 text-xl">{title}</h1>
        {children}
      </div>
    </main>
  );
}
