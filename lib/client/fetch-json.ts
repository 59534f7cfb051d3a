import type { Refused } from "./send";

/** A refusal as an error: its sentence is the message, the sentences of its fields stand beside theirs. */
export class Problem extends Error {
  /** The HTTP status; 0 when the server was not reached at all. */
  readonly status: number;
  /** What kind of refusal: `invalid`, `forbidden`, `not-found`, `conflict`, `throttled`, `unreachable`, `failed`. */
  readonly code: string;
  /** One sentence for the person: what is wrong and, where it is known, what would be right. */
  readonly detail: string;
  /** A sentence for each field that was refused, by the field's name. */
  readonly fields: Record<string, string>;
  /** Whatever else the answer carried, such as both versions of a conflict. */
  readonly extra: Record<string, unknown>;

  constructor(readonly refused: Refused & { extra?: Record<string, unknown> }) {
    super(refused.detail);
    this.name = "Problem";
    this.status = refused.status;
    this.code = refused.code;
    this.detail = refused.detail;
    this.fields = refused.fields;
    this.extra = refused.extra ?? {};
  }
}

/** How a request is made; without any of it the address is read. */
export type Asked = {
  method?: "GET" | "POST" | "PUT" | "PATCH" | "DELETE";
  /** Sent as JSON. */
  body?: unknown;
  /** The revision that the writer saw; a newer one answers with a conflict. */
  ifMatch?: number;
  /** The same key twice does the thing once. */
  idempotencyKey?: string;
  signal?: AbortSignal;
};

/**
 * Asks this site for JSON and answers with it; `null` for an answer without content. Throws a `Problem` with a sentence
 * for the person, also when the server cannot be reached; a request given up through its signal throws `AbortError`.
 */
export async function fetchJson<Body>(url: string, asked: Asked | AbortSignal = {}): Promise<Body> {
  const given = asked instanceof AbortSignal ? { signal: asked } : asked;
  const answer = await fetch(url, request(given)).catch((error: unknown) => {
    if (given.signal?.aborted) throw error;
    throw unreachable(given.method ?? "GET");
  });
  if (answer.status === 204) return null as Body;

  const body: unknown = await answer.json().catch((error: unknown) => {
    if (given.signal?.aborted) throw error;
    return undefined;
  });
  if (answer.ok && body !== undefined) return body as Body;
  throw refusalIn(answer, body);
}

function request({ method = "GET", body, ifMatch, idempotencyKey, signal }: Asked): RequestInit {
  const headers: Record<string, string> = { accept: "application/json" };
  if (body !== undefined) headers["content-type"] = "application/json";
  if (ifMatch !== undefined) headers["if-match"] = `"${ifMatch}"`;
  if (idempotencyKey !== undefined) headers["idempotency-key"] = idempotencyKey;
  return { method, headers, signal, body: body === undefined ? undefined : JSON.stringify(body) };
}

function refusalIn(answer: Response, body: unknown): Problem {
  if (!isRecord(body))
    return new Problem({
      status: answer.status,
      code: answer.ok ? "unreadable" : "failed",
      detail: answer.ok
        ? "The server's answer could not be read. Please try again."
        : "Something went wrong on the server's side. Please try again.",
      fields: {},
    });
  const { type: _, title: __, status: ___, code, detail, fields, retryAfter_s, ...extra } = body;
  return new Problem({
    status: answer.status,
    code: typeof code === "string" ? code : "failed",
    detail: typeof detail === "string" ? detail : "Something went wrong on the server's side.",
    fields: sentences(fields),
    retryAfter_s: typeof retryAfter_s === "number" ? retryAfter_s : undefined,
    extra,
  });
}

const unreachable = (method: string): Problem =>
  new Problem({
    status: 0,
    code: "unreachable",
    detail:
      method === "GET"
        ? "The server cannot be reached just now. Please try again."
        : "The server cannot be reached just now. What you typed is still here; please try again.",
    fields: {},
  });

const isRecord = (value: unknown): value is Record<string, unknown> =>
  typeof value === "object" && value !== null && !Array.isArray(value);

const sentences = (fields: unknown): Record<string, string> =>
  isRecord(fields)
    ? Object.fromEntries(Object.entries(fields).map(([name, sentence]) => [name, String(sentence)]))
    : {};
