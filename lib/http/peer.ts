import { subscribe } from "node:diagnostics_channel";
import type { IncomingMessage } from "node:http";
import { isIP } from "node:net";

/** Carries the true peer of a request from the socket to the handlers; what a client sends under this name is dropped. */
export const PEER_HEADER = "x-holdground-peer";

const plain = (address: string) => address.replace(/^::ffff:(?=\d+\.)/, "");

/**
 * Cleans each incoming request before anything reads it. The peer is the socket's own address; behind a proxy that the
 * operator trusts it is the last entry that this proxy added to X-Forwarded-For. Headers by which a client could pass
 * for the proxy or for the framework itself are removed.
 */
export function cleanRequest(
  request: Pick<IncomingMessage, "headers" | "socket">,
  trusted: readonly string[],
): void {
  const { headers } = request;
  const socket = plain(request.socket.remoteAddress ?? "");
  const behindProxy = trusted.includes(socket);
  const forwarded = String(headers["x-forwarded-for"] ?? "")
    .split(",")
    .at(-1)
    ?.trim();
  const peer = behindProxy && forwarded && isIP(plain(forwarded)) ? plain(forwarded) : socket;
  for (const name of Object.keys(headers)) {
    if (name === PEER_HEADER || name.startsWith("x-middleware-") || name === "x-real-ip")
      delete headers[name];
    if (name.startsWith("x-forwarded-") && !(behindProxy && name !== "x-forwarded-host"))
      delete headers[name];
  }
  headers[PEER_HEADER] = peer || "unknown";
}

const watched = globalThis as { holdgroundPeers?: true };

/** Cleans every request of this process's HTTP servers from now on. */
export function watchPeers(trusted: readonly string[]): void {
  if (watched.holdgroundPeers) return;
  watched.holdgroundPeers = true;
  subscribe("http.server.request.start", (message) =>
    cleanRequest((message as { request: IncomingMessage }).request, trusted),
  );
}

/** The peer's address of a request. */
export const peerOf = (headers: Headers): string => headers.get(PEER_HEADER) ?? "unknown";
