"use client";

import { useEffect, useState } from "react";
import { flushSync } from "react-dom";

/** True while the page is being printed, so that all of it can be in the page. */
export function usePrinting(): boolean {
  const [printing, setPrinting] = useState(false);
  useEffect(() => {
    // The browser takes its picture as soon as the listeners have run: the page must be whole by then.
    const begin = () => flushSync(() => setPrinting(true));
    const end = () => flushSync(() => setPrinting(false));
    window.addEventListener("beforeprint", begin);
    window.addEventListener("afterprint", end);
    return () => {
      window.removeEventListener("beforeprint", begin);
      window.removeEventListener("afterprint", end);
    };
  }, []);
  return printing;
}
