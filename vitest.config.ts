import { defineConfig } from "vitest/config";

const inDatabase = ["services", "api", "database", "faults", "storage", "mail", "http", "access", "scripts"];
const databaseTests = inDatabase.map((folder) => `tests/${folder}/**/*.test.{ts,tsx}`);
const withServices = [...databaseTests, "tests/**/*.services.test.ts"];
const browserTests = ["tests/e2e/**/*.test.ts"];
const componentTests = ["tests/components/**/*.test.{ts,tsx}"];

export default defineConfig({
  resolve: { alias: { "@": import.meta.dirname } },
  oxc: { jsx: { runtime: "automatic" } },
  test: {
    reporters: ["default", "./tests/support/count-reporter.ts"],
    projects: [
      {
        extends: true,
        test: {
          name: "pure",
          // Whatever no other project claims, so that no test file can lie outside all of them.
          include: ["tests/**/*.test.{ts,tsx}"],
          exclude: [...withServices, ...browserTests, ...componentTests],
          testTimeout: 30_000,
          sequence: { groupOrder: 0 },
        },
      },
      {
        extends: true,
        test: {
          name: "components",
          include: componentTests,
          environment: "jsdom",
          testTimeout: 20_000,
          sequence: { groupOrder: 1 },
        },
      },
      {
        extends: true,
        test: {
          name: "database",
          include: withServices,
          globalSetup: "tests/support/global-setup.ts",
          setupFiles: "tests/support/environment.ts",
          testTimeout: 60_000,
          hookTimeout: 120_000,
          sequence: { groupOrder: 2 },
        },
      },
      {
        extends: true,
        test: {
          name: "browser",
          include: browserTests,
          globalSetup: "tests/support/browser-setup.ts",
          setupFiles: "tests/support/environment.ts",
          // One browser at a time, after everything else: what it waits for must not wait for other tests.
          fileParallelism: false,
          sequence: { groupOrder: 3 },
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
    ],
  },
});
