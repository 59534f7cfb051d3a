/** What the server answers when it refuses: a sentence, and one for each field. */
export type Refused = {
  status: number;
  code: string;
  detail: string;
  fields: Record<string, string>;
  retryAfter_s?: number;
};
export type Answer<Body> = { done: true; body: Body } | { done: false; refused: Refused };

const unreachable: Refused = {
  status: 0,
  code: "unreachable",
  detail: "The server cannot be reached just now. What you typed is still here; please try again.",
  fields: {},
};

/**
 * Sends a form as JSON, with the revision that its writer saw where there is one. Never throws: a lost connection is an
 * answer too, and what was typed stays.
 */
export async function send<Body>(
  path: string,
  method: string,
  body?: Record<string, unknown>,
  revision?: number,
): Promise<Answer<Body>> {
  const headers: Record<string, string> = { "content-type": "application/json" };
  if (revision !== undefined) headers["if-match"] = `"${revision}"`;
  return answered(await fetch(path, { method, headers, body: JSON.stringify(body ?? {}) }).catch(() => null));
}

/** Signs in as the plain form does, and answers with where to go. */
export async function sendSignIn(fields: {
  email: string;
  password: string;
  callbackUrl: string;
}): Promise<Answer<{ url: string }>> {
  const body = new URLSearchParams({ ...fields, json: "true" });
  return answered(await fetch("/api/auth/callback/credentials", { method: "POST", body }).catch(() => null));
}

async function answered<Body>(answer: Response | null): Promise<Answer<Body>> {
  if (answer?.status === 204) return { done: true, body: null as Body };
  const body = await answer?.json().catch(() => null);
  if (!answer || body === null || body === undefined) return { done: false, refused: unreachable };
  if (answer.ok) return { done: true, body };
  return {
    done: false,
    refused: {
      status: answer.status,
      code: String(body.code ?? "failed"),
      detail: String(body.detail ?? "Something went wrong on our side. Nothing was changed."),
      fields: body.fields ?? {},
      retryAfter_s: body.retryAfter_s,
    },
  };
}
