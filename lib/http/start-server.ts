import { env } from "@/lib/env";
import { startRelay } from "@/lib/mail/relay";
import { watchPeers } from "./peer";

/** What a server process does beside answering: it cleans what comes in, and sends the mail that waits. Refuses to start on settings that contradict each other. */
export function startServer(): void {
  const { APP_ORIGIN, NEXTAUTH_URL, TRUSTED_PROXIES = "" } = env();
  if (new URL(APP_ORIGIN).origin !== new URL(NEXTAUTH_URL).origin)
    throw new Error("APP_ORIGIN and NEXTAUTH_URL name two different sites. They are one: see .env.example.");
  watchPeers(
    TRUSTED_PROXIES.split(",")
      .map((address) => address.trim())
      .filter(Boolean),
  );
  startRelay();
}
