import { inject } from "vitest";

/*
 * What the code under test reads from its environment. In the database project DATABASE_URL is left out: a test file
 * that wants a database asks for one (tests/support/database.ts) and has it alone. Browser tests have the server's.
 */
const environment: Record<string, string | undefined> = { ...inject("environment") };
if (!environment.HOLDGROUND_TEST_ORIGIN) {
  for (const name of ["DATABASE_URL", "DATABASE_OWNER_URL", "DATABASE_ADMIN_URL"]) {
    delete environment[name];
    delete process.env[name];
  }
  environment.HOLDGROUND_FAULTS = process.env.HOLDGROUND_FAULTS ?? "planted";
}
for (const [name, value] of Object.entries(environment)) if (value) process.env[name] = value;
process.env.AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED = "true";
