/**
 * The path of an address on this site, or "/" for any other: what may follow a sign-in. Takes a path or a whole address
 * of this very origin; refuses other origins and schemes, names before an @, backslashes, control characters and
 * anything that a browser would read as another host.
 */
export function ownPath(wanted: string | null | undefined, origin: string): string {
  if (!wanted || wanted.length > 2000 || /[\\\p{Cc}]/u.test(wanted)) return "/";
  const own = new URL(origin).origin;
  let url: URL;
  try {
    url = new URL(wanted, own);
  } catch {
    return "/";
  }
  if (url.origin !== own || url.username !== "" || url.password !== "") return "/";
  if (url.pathname.startsWith("//") || url.pathname.startsWith("/api/")) return "/";
  return url.pathname + url.search + url.hash;
}
