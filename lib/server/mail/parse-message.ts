export interface ParsedMessage {
  readonly from: string;
  readonly to: string;
  readonly subject: string;
  readonly text: string;
}

interface Part {
  readonly headers: ReadonlyMap<string, string>;
  readonly body: string;
}

/**
 * Reads a letter as our own mailer writes it (RFC 5322, 2045 to 2047): plain text, alone or as the first text of a
 * multipart. `source` holds one character for each byte (latin1).
 */
export function parseMessage(source: string): ParsedMessage {
  const whole = partOf(source);
  const header = (name: string) => decodeWords(whole.headers.get(name) ?? "");
  return { from: header("from"), to: header("to"), subject: header("subject"), text: textOf(whole) };
}

function partOf(source: string): Part {
  const lines = source.replaceAll("\r\n", "\n");
  const gap = lines.indexOf("\n\n");
  const head = gap < 0 ? lines : lines.slice(0, gap);
  const headers = new Map<string, string>();
  // A header goes on in the next line when that begins with a blank.
  for (const line of head.replace(/\n[ \t]+/g, " ").split("\n")) {
    const colon = line.indexOf(":");
    if (colon > 0) headers.set(line.slice(0, colon).toLowerCase(), line.slice(colon + 1).trim());
  }
  return { headers, body: gap < 0 ? "" : lines.slice(gap + 2) };
}

function textOf(part: Part): string {
  const type = part.headers.get("content-type") ?? "text/plain";
  const boundary = /^multipart\//i.test(type) ? /boundary="?([^";]+)"?/i.exec(type)?.[1] : undefined;
  if (boundary) {
    const inner = part.body.split(`--${boundary}`).slice(1, -1).map((each) => partOf(each.replace(/^\n/, "")));
    const chosen = inner.find((each) => /^(text\/plain|multipart\/)/i.test(each.headers.get("content-type") ?? "text/plain"));
    return chosen ? textOf(chosen) : "";
  }
  const charset = /charset="?([^";\s]+)"?/i.exec(type)?.[1] ?? "utf-8";
  return decodeBytes(bodyBytes(part), charset).trimEnd();
}

function bodyBytes(part: Part): Buffer {
  const encoding = (part.headers.get("content-transfer-encoding") ?? "7bit").toLowerCase();
  if (encoding === "base64") return Buffer.from(part.body, "base64");
  if (encoding === "quoted-printable") return quotedBytes(part.body.replace(/=[ \t]*\n/g, ""));
  return Buffer.from(part.body, "latin1");
}

/** `=C3=A9` are the bytes of é. */
function quotedBytes(text: string): Buffer {
  return Buffer.from(
    text.replace(/=([0-9A-Fa-f]{2})/g, (_, hex: string) => String.fromCharCode(Number.parseInt(hex, 16))),
    "latin1",
  );
}

/** `=?utf-8?Q?Caf=C3=A9?=` in headers; blanks between two such words do not count. */
function decodeWords(value: string): string {
  const joined = value.replace(/(\?=)\s+(=\?)/g, "$1$2");
  const words = joined.replace(/=\?([^?]+)\?([BbQq])\?([^?]*)\?=/g, (_, charset: string, kind: string, text: string) =>
    decodeBytes(kind.toUpperCase() === "B" ? Buffer.from(text, "base64") : quotedBytes(text.replaceAll("_", " ")), charset),
  );
  // Without encoded words a header may be UTF-8 as it stands.
  return words === value && /[\u0080-\u00ff]/.test(value) ? decodeBytes(Buffer.from(value, "latin1"), "utf-8") : words;
}

function decodeBytes(bytes: Buffer, charset: string): string {
  try {
    return new TextDecoder(charset).decode(bytes);
  } catch {
    return bytes.toString("latin1");
  }
}
