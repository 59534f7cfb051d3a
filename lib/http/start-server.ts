import { env } from "@/lib/env";
import { startRelay } from "@/lib/mail/relay";
import { watchPeers } from "./peer";

/** What a server process does beside answering: it cleans what comes in, and sends the mail that waits. */
export function startServer(): void {
  const { APP_ORIGIN, TRUSTED_PROXIES } = env();
  // next-auth reads its own address from here alone; it is the configured one, never that of a request.
  process.env.NEXTAUTH_URL = APP_ORIGIN;
  watchPeers(
    TRUSTED_PROXIES.split(",")
      .map((address) => address.trim())
      .filter(Boolean),
  );
  startRelay();
}
