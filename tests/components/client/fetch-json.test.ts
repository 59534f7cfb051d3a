// @vitest-environment node
import { createServer, type IncomingMessage, type ServerResponse } from "node:http";
import type { AddressInfo } from "node:net";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { type Asked, fetchJson, Problem } from "@/lib/client/fetch-json";

type Heard = { method?: string; headers: IncomingMessage["headers"]; body: string };
let heard: Heard | undefined;
let answer: (response: ServerResponse) => void;
let server: ReturnType<typeof createServer>;
let url: string;

beforeEach(async () => {
  heard = undefined;
  answer = (response) => response.end("{}");
  server = createServer(async (request, response) => {
    let body = "";
    for await (const part of request) body += part;
    heard = { method: request.method, headers: request.headers, body };
    answer(response);
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  url = `http://127.0.0.1:${(server.address() as AddressInfo).port}/api`;
});
afterEach(() => {
  server.closeAllConnections();
  server.close();
});

const problemOf = async (asked?: Asked, at = url): Promise<Problem> => {
  const thrown = await fetchJson(at, asked).then(
    () => new Error("it was answered"),
    (error: unknown) => error,
  );
  if (!(thrown instanceof Problem)) throw thrown;
  return thrown;
};
const refuse = (status: number, body: string, type = "application/problem+json") => {
  answer = (response) => response.writeHead(status, { "content-type": type }).end(body);
};

describe("asking this site for JSON", () => {
  it("reads without a body and answers with what came", async () => {
    answer = (response) => response.end('{"items":[1]}');
    expect(await fetchJson(url)).toEqual({ items: [1] });
    expect(heard).toMatchObject({ method: "GET", body: "" });
    expect(heard?.headers).not.toHaveProperty("content-type");
    expect(heard?.headers).not.toHaveProperty("if-match");
  });

  it("sends the body, the revision that was seen and the key of the act", async () => {
    await fetchJson(url, { method: "PUT", body: { breadth_m: 2.4 }, ifMatch: 0, idempotencyKey: "k-1" });
    expect(heard).toMatchObject({ method: "PUT", body: '{"breadth_m":2.4}' });
    expect(heard?.headers).toMatchObject({
      "content-type": "application/json",
      "if-match": '"0"',
      "idempotency-key": "k-1",
    });
  });

  it("answers null where there is no content", async () => {
    answer = (response) => response.writeHead(204).end();
    expect(await fetchJson(url, { method: "DELETE" })).toBeNull();
  });
});

describe("a refusal", () => {
  it("carries status, kind, sentence, fields, and what else the answer held", async () => {
    refuse(
      409,
      JSON.stringify({
        type: "urn:holdground:conflict",
        title: "conflict",
        status: 409,
        code: "conflict",
        detail: "Somebody issued P03 meanwhile.",
        fields: { revision: "You saw 2, it is 3." },
        current: { revision: 3 },
        requestId: "r-1",
      }),
    );
    const problem = await problemOf({ method: "POST", body: {} });
    expect(problem).toMatchObject({
      status: 409,
      code: "conflict",
      message: "Somebody issued P03 meanwhile.",
    });
    expect(problem.fields).toEqual({ revision: "You saw 2, it is 3." });
    expect(problem.extra).toEqual({ current: { revision: 3 }, requestId: "r-1" });
  });

  it("says a sentence of ours where the answer is a page of some proxy", async () => {
    refuse(502, "<html>Bad gateway</html>", "text/html");
    expect(await problemOf()).toMatchObject({
      status: 502,
      code: "failed",
      detail: "Something went wrong on the server's side. Please try again.",
    });
  });

  it("takes nothing for done that could not be read", async () => {
    refuse(200, '{"items":[1', "application/json");
    expect(await problemOf()).toMatchObject({ status: 200, code: "unreadable" });
  });

  it("says that the server cannot be reached, and that what was typed is kept", async () => {
    await new Promise((resolve) => server.close(resolve));
    expect(await problemOf()).toMatchObject({ status: 0, code: "unreachable" });
    expect((await problemOf({ method: "POST", body: {} })).detail).toContain("What you typed is still here");
  });

  it("is not what a request is that was given up", async () => {
    answer = () => {};
    const giveUp = new AbortController();
    const asked = fetchJson(url, { signal: giveUp.signal });
    setTimeout(() => giveUp.abort(), 20);
    await expect(asked).rejects.toMatchObject({ name: "AbortError" });
    await expect(fetchJson(url, giveUp.signal)).rejects.toMatchObject({ name: "AbortError" });
  });
});
