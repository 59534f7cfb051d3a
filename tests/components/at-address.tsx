import { AppRouterContext } from "next/dist/shared/lib/app-router-context.shared-runtime";
import {
  PathnameContext,
  SearchParamsContext,
} from "next/dist/shared/lib/hooks-client-context.shared-runtime";
import type { ReactNode } from "react";

type Router = NonNullable<Parameters<typeof AppRouterContext.Provider>[0]["value"]>;

/** Puts what is rendered at an address, with a router that only writes down where it was sent. */
export function AtAddress({
  address,
  went,
  children,
}: {
  address: string;
  went: (to: string) => void;
  children: ReactNode;
}) {
  const stay = () => {};
  const router = {
    push: went,
    replace: went,
    back: stay,
    forward: stay,
    refresh: stay,
    prefetch: stay,
    bfcacheId: "",
  } as unknown as Router;
  const { pathname, searchParams } = new URL(address, "http://localhost");
  return (
    <AppRouterContext.Provider value={router}>
      <PathnameContext.Provider value={pathname}>
        <SearchParamsContext.Provider value={searchParams}>{children}</SearchParamsContext.Provider>
      </PathnameContext.Provider>
    </AppRouterContext.Provider>
  );
}
