import type { ServiceEnvironment } from "./services.mjs";

export type TestServerEnvironment = ServiceEnvironment & {
  APP_ORIGIN: string;
  NEXTAUTH_URL: string;
  HOLDGROUND_TEST_ORIGIN: string;
};

export function startTestServer(): Promise<{ env: TestServerEnvironment; stop: () => Promise<void> }>;
