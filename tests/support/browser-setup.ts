import type { TestProject } from "vitest/node";
import { startTestServer, type TestServerEnvironment } from "@/scripts/local/test-server.mjs";

/** Gives the browser tests the server that npm test has started, or starts one when they are run by themselves. */
export default async function setup(project: TestProject): Promise<(() => Promise<void>) | undefined> {
  const given = process.env.HOLDGROUND_TEST_SERVER;
  if (given) {
    project.provide("environment", JSON.parse(given) as TestServerEnvironment);
    return undefined;
  }
  const server = await startTestServer();
  project.provide("environment", server.env);
  return server.stop;
}
