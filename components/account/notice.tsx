import type { ReactNode } from "react";

/** A sentence above a form: what went wrong, or what was done. Read out when it appears. */
export function Notice({ kind, children }: { kind: "refused" | "done"; children: ReactNode }) {
  return (
    <p
      role={kind === "refused" ? "alert" : "status"}
      className={`mt-4 border-l-4 py-1 pl-3 ${kind === "refused" ? "border-fails" : "border-passes"}`}
    >
      {children}
    </p>
  );
}
