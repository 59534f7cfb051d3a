/** Headers that every answer carries, whatever it is. */
export const answerHeaders = {
  "strict-transport-security": "max-age=63072000; includeSubDomains",
  "x-content-type-options": "nosniff",
  // Not "no-referrer": with it browsers hide the Origin of our own forms, by which we know them.
  "referrer-policy": "same-origin",
  "cross-origin-opener-policy": "same-origin",
  "cross-origin-resource-policy": "same-origin",
  "permissions-policy": "camera=(self), geolocation=(self), microphone=(), payment=(), usb=()",
  "x-frame-options": "DENY",
} as const;

/**
 * What a page may load: scripts and styles of this answer's nonce, data from this site and the document store, nothing
 * else. Development needs eval for React's messages, inline styles and a socket for reloading.
 */
export function contentSecurityPolicy(given: { nonce: string; store: string; development: boolean }): string {
  const store = new URL(given.store).origin;
  const { nonce, development } = given;
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${development ? " 'unsafe-eval'" : ""}`,
    development ? "style-src 'self' 'unsafe-inline'" : `style-src 'self' 'nonce-${nonce}'`,
    `img-src 'self' data: blob: ${store}`,
    "font-src 'self'",
    `connect-src 'self' ${store}${development ? " ws:" : ""}`,
    "worker-src 'self' blob:",
    "frame-src 'none'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join("; ");
}
