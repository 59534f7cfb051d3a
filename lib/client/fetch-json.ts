import type { Refused } from "./send";

/** A refusal of the server as an error: its sentence is the message, its fields stand beside theirs. */
export class Problem extends Error {
  constructor(readonly refused: Refused) {
    super(refused.detail);
  }
  get fields(): Record<string, string> {
    return this.refused.fields;
  }
}

/** Reads JSON of this site; throws a `Problem` with a sentence for the person, also when the server cannot be reached. */
export async function fetchJson<Body>(path: string, signal?: AbortSignal): Promise<Body> {
  const answer = await fetch(path, { headers: { accept: "application/json" }, signal }).catch(
    (error: unknown) => {
      if (signal?.aborted) throw error;
      return null;
    },
  );
  const body = await answer?.json().catch(() => null);
  if (answer?.ok && body !== undefined) return body as Body;
  throw new Problem({
    status: answer?.status ?? 0,
    code: String(body?.code ?? "unreachable"),
    detail: String(body?.detail ?? "The server cannot be reached just now. Please try again."),
    fields: body?.fields ?? {},
  });
}
