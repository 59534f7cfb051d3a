import { writeFileSync } from "node:fs";
import type { Reporter } from "vitest/node";

/** Ends a run with one plain line of counts. A file that could not be loaded has no tests to count, so it is one failure. */
export default class CountReporter implements Reporter {
  onTestRunEnd: Reporter["onTestRunEnd"] = (modules, errors) => {
    const counts = { passed: 0, failed: errors.length, skipped: 0 };
    for (const module of modules) {
      for (const test of module.children.allTests()) {
        const { state } = test.result();
        if (state === "passed") counts.passed += 1;
        else if (state === "failed") counts.failed += 1;
        else counts.skipped += 1;
      }
      if (module.errors().length > 0) counts.failed += 1;
      for (const suite of module.children.allSuites()) if (suite.errors().length > 0) counts.failed += 1;
    }
    const kept = process.env.HOLDGROUND_COUNTS;
    if (kept) writeFileSync(kept, JSON.stringify(counts));
    // npm test adds its own checks and prints the sum.
    else console.log(`${counts.passed} passed, ${counts.failed} failed, ${counts.skipped} skipped`);
  };
}
