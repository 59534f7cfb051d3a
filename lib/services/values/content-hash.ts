import { sha256 } from "../context";

/** SHA-256 of a content in its one canonical writing: keys sorted at every depth, no spaces. Both signatures stand under it. */
export const contentHash = (content: unknown): string => sha256(canonical(content));

/** JSON with sorted keys; an absent field is left out, as JSON does. */
export function canonical(content: unknown): string {
  if (Array.isArray(content)) return `[${content.map((item) => canonical(item ?? null)).join(",")}]`;
  if (content === null || typeof content !== "object") return JSON.stringify(content) ?? "null";
  const entries = Object.entries(content).filter(([, value]) => value !== undefined);
  entries.sort(([a], [b]) => (a < b ? -1 : 1));
  return `{${entries.map(([key, value]) => `${JSON.stringify(key)}:${canonical(value)}`).join(",")}}`;
}
