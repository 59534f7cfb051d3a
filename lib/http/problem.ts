import { type Refusal, Throttled } from "@/lib/services/errors";

/** The answer to a refusal (RFC 9457): what kind, a sentence, the fields; never a stack or a query. */
export function problem(refusal: Refusal, requestId: string): Response {
  const headers: Record<string, string> = {
    "content-type": "application/problem+json",
    "cache-control": "private, no-store",
    "x-request-id": requestId,
  };
  if (refusal instanceof Throttled) headers["retry-after"] = String(refusal.retryAfter_s);
  const { code, status, message, extra } = refusal;
  const body = {
    type: `urn:holdground:${code}`,
    title: code,
    status,
    code,
    detail: message,
    requestId,
    ...extra,
  };
  return new Response(JSON.stringify(body), { status, headers });
}
