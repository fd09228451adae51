/** A mail as it came over SMTP, taken apart as far as the mailbox shows it. */
export interface ReadMail {
  readonly from: string;
  readonly to: string;
  readonly subject: string;
  readonly messageId: string;
  readonly text: string;
}

function decodeQuotedPrintable(text: string): Buffer {
  const joined = text.replace(/=\r?\n/g, '');
  const bytes = joined.replace(/=([0-9A-Fa-f]{2})/g, (_all, hex: string) =>
    String.fromCharCode(Number.parseInt(hex, 16)),
  );
  return Buffer.from(bytes, 'latin1');
}

function decodeBody(body: string, encoding: string): string {
  if (encoding === 'base64') return Buffer.from(body, 'base64').toString('utf8');
  if (encoding === 'quoted-printable') return decodeQuotedPrintable(body).toString('utf8');
  return Buffer.from(body, 'latin1').toString('utf8');
}

/** RFC 2047: `=?utf-8?Q?…?=` in a header. */
function decodeHeader(value: string): string {
  const joined = value.replace(/\?=\s+=\?/g, '?==?');
  return joined.replace(/=\?[^?]+\?([bq])\?([^?]*)\?=/gi, (_all, how: string, text: string) =>
    how.toLowerCase() === 'b'
      ? Buffer.from(text, 'base64').toString('utf8')
      : decodeQuotedPrintable(text.replaceAll('_', ' ')).toString('utf8'),
  );
}

function split(part: string): { headers: Map<string, string>; body: string } {
  const end = /\r?\n\r?\n/.exec(part);
  const head = (end ? part.slice(0, end.index) : part).replace(/\r?\n[ \t]+/g, ' ');
  const headers = new Map(
    head.split(/\r?\n/).map((line) => {
      const colon = line.indexOf(':');
      return [line.slice(0, colon).toLowerCase(), line.slice(colon + 1).trim()];
    }),
  );
  return { headers, body: end ? part.slice(end.index + end[0].length) : '' };
}

function findText(part: string): string | null {
  const { headers, body } = split(part);
  const type = headers.get('content-type') ?? 'text/plain';
  const boundary = /boundary="?([^";]+)"?/i.exec(type)?.[1];
  if (boundary !== undefined) {
    const parts = body.split(`--${boundary}`).slice(1, -1);
    return parts.map((each) => findText(each.replace(/^\r?\n/, ''))).find((text) => text !== null) ?? null;
  }
  if (!type.toLowerCase().startsWith('text/plain')) return null;
  return decodeBody(body, (headers.get('content-transfer-encoding') ?? '').toLowerCase());
}

/** Reads a mail with a plain text body, alone or beside an HTML one. */
export function readMail(raw: Buffer): ReadMail {
  const source = raw.toString('latin1');
  const { headers } = split(source);
  const header = (name: string) => decodeHeader(headers.get(name) ?? '');
  return {
    from: header('from'),
    to: header('to'),
    subject: header('subject'),
    messageId: header('message-id'),
    text: (findText(source) ?? '').replaceAll('\r\n', '\n').trimEnd(),
  };
}
