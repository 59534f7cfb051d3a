/**
 * Reads a mail as it went over the wire: headers decoded, and its text. Knows what our mails and ordinary clients use
 * (folded headers, encoded words, quoted-printable, base64, multiparts); anything else is given as it stands.
 */
export function readMessage(raw) {
  const { headers, body } = split(raw);
  return {
    messageId: headers.get("message-id") ?? "",
    from: decodeWords(headers.get("from") ?? ""),
    to: decodeWords(headers.get("to") ?? ""),
    subject: decodeWords(headers.get("subject") ?? ""),
    date: headers.get("date") ?? "",
    text: textOf(headers, body, "text/plain") ?? "",
    html: textOf(headers, body, "text/html") ?? "",
  };
}

function split(raw) {
  const at = raw.search(/\r?\n\r?\n/);
  const head = at < 0 ? raw : raw.slice(0, at);
  const body = at < 0 ? "" : raw.slice(at).replace(/^\r?\n\r?\n/, "");
  const headers = new Map();
  for (const line of head.replace(/\r?\n[ \t]+/g, " ").split(/\r?\n/)) {
    const colon = line.indexOf(":");
    if (colon > 0) headers.set(line.slice(0, colon).toLowerCase(), line.slice(colon + 1).trim());
  }
  return { headers, body };
}

function textOf(headers, body, wanted) {
  const type = headers.get("content-type") ?? "text/plain";
  if (/^multipart\//i.test(type)) {
    const boundary = /boundary="?([^";]+)"?/i.exec(type)?.[1];
    if (!boundary) return undefined;
    for (const part of body.split(`--${boundary}`).slice(1)) {
      if (part.startsWith("--")) break;
      const inner = split(part.replace(/^\r?\n/, ""));
      const text = textOf(inner.headers, inner.body, wanted);
      if (text !== undefined) return text;
    }
    return undefined;
  }
  if (!type.toLowerCase().startsWith(wanted)) return undefined;
  return decodeBody(body, (headers.get("content-transfer-encoding") ?? "").toLowerCase());
}

function decodeBody(body, encoding) {
  if (encoding === "base64") return Buffer.from(body, "base64").toString("utf8");
  if (encoding === "quoted-printable")
    return quotedPrintable(body.replace(/=\r?\n/g, "")).replace(/\r\n/g, "\n");
  return body.replace(/\r\n/g, "\n");
}

/** Raw text holds one character per byte (latin1) or is ASCII; the result is what those bytes say in UTF-8. */
function quotedPrintable(text) {
  const bytes = text.replace(/=([0-9A-Fa-f]{2})/g, (_, hex) => String.fromCharCode(Number.parseInt(hex, 16)));
  return Buffer.from(bytes, "latin1").toString("utf8");
}

function decodeWords(header) {
  const joined = header.replace(/(=\?[^?]+\?[BQbq]\?[^?]*\?=)\s+(?==\?)/g, "$1");
  return joined.replace(/=\?([^?]+)\?([BQbq])\?([^?]*)\?=/g, (_, charset, kind, text) => {
    const bytes =
      kind.toUpperCase() === "B"
        ? Buffer.from(text, "base64")
        : Buffer.from(
            text
              .replace(/_/g, " ")
              .replace(/=([0-9A-Fa-f]{2})/g, (_match, hex) => String.fromCharCode(Number.parseInt(hex, 16))),
            "latin1",
          );
    return bytes.toString(/^utf-?8$/i.test(charset) ? "utf8" : "latin1");
  });
}
