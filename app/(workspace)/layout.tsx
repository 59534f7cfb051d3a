import type { ReactNode } from "react";
import { pagePerson } from "@/lib/http/page";

/** Pages for those who are signed in. Each page asks again for itself: a layout is not made anew at every step. */
export default async function WorkspaceLayout({ children }: { children: ReactNode }) {
  await pagePerson("/projects");
  return children;
}
