import { inject } from "vitest";

/*
 * What the code under test reads from its environment. DATABASE_URL is left out: a test file that wants a database
 * asks for one (tests/support/database.ts) and has it alone.
 */
const {
  DATABASE_URL: _app,
  DATABASE_OWNER_URL: _owner,
  DATABASE_ADMIN_URL: _admin,
  ...rest
} = inject("environment");
for (const [name, value] of Object.entries(rest)) if (value) process.env[name] = value;
process.env.AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED = "true";
process.env.HOLDGROUND_FAULTS ??= "planted";
