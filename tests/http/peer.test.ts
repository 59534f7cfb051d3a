import { describe, expect, it } from "vitest";
import { cleanRequest, PEER_HEADER } from "@/lib/http/peer";

const cleaned = (remoteAddress: string, headers: Record<string, string>, trusted: string[] = []) => {
  const request = { headers: { ...headers }, socket: { remoteAddress } };
  cleanRequest(request as never, trusted);
  return request.headers as Record<string, string>;
};

describe("the peer of a request", () => {
  it("is the socket's, whatever the client says of itself", () => {
    const headers = cleaned("127.0.0.9", {
      "x-forwarded-for": "10.9.8.7",
      "x-real-ip": "10.9.8.7",
      [PEER_HEADER]: "10.9.8.7",
    });
    expect(headers).toEqual({ [PEER_HEADER]: "127.0.0.9" });
  });

  it("is what the trusted proxy added, not what the client wrote before it", () => {
    const headers = cleaned("::ffff:10.0.0.2", { "x-forwarded-for": "1.1.1.1, 192.0.2.7" }, ["10.0.0.2"]);
    expect(headers[PEER_HEADER]).toBe("192.0.2.7");
  });

  it("is the proxy itself when it adds nothing that is an address", () => {
    expect(cleaned("10.0.0.2", { "x-forwarded-for": "unknown" }, ["10.0.0.2"])[PEER_HEADER]).toBe("10.0.0.2");
  });

  it("loses the headers by which a client could pass for the framework", () => {
    const headers = cleaned(
      "10.0.0.2",
      { "x-middleware-subrequest": "proxy", "x-forwarded-host": "evil.example", accept: "*/*" },
      ["10.0.0.2"],
    );
    expect(headers).toEqual({ accept: "*/*", [PEER_HEADER]: "10.0.0.2" });
  });
});
