/** What a mail says; the same words go out as plain text and as HTML. */
export interface Letter {
  readonly subject: string;
  readonly greeting: string;
  readonly paragraphs: readonly string[];
  readonly link?: { readonly label: string; readonly url: string };
  /** Why the person gets this mail, in one sentence. */
  readonly reason: string;
}

const ESCAPES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};
const escape = (text: string) => text.replace(/[&<>"']/g, (char) => ESCAPES[char] ?? char);

/** A header is one line: whatever was typed into a name must not begin another. */
const oneLine = (text: string) => text.replace(/\s+/gu, ' ').trim();

/** Mail readers know tables and inline styles; these are the faces and inks of the house as far as they reach. */
const SERIF = "font-family:Georgia,'Times New Roman',serif";
const SANS = 'font-family:Arial,Helvetica,sans-serif';
const table = (rows: string, more = '') =>
  `<table role="presentation" cellpadding="0" cellspacing="0" border="0" style="border-collapse:collapse${more}">${rows}</table>`;
const row = (style: string, inner: string) => `<tr><td style="${style}">${inner}</td></tr>`;
const EMPTY = 'font-size:0;line-height:0';

/** A filled cell with the ruled-off line near its foot. */
function buttonCell(label: string, url: string): string {
  const words = `<a href="${escape(url)}" style="color:#fbfcfa;text-decoration:none">${escape(label)}</a>`;
  const look = `padding:11px 20px 8px;border-bottom:1px solid #bcd8ea;${SANS};font-size:15px;line-height:20px;font-weight:bold`;
  const foot = row(`${EMPTY};height:3px`, '&nbsp;');
  return table(`${row(look, words)}${foot}`, ';background:#1f5078');
}

/** Sets a letter as the two bodies of a mail: cloth above, the title ruled off, one button, the reason at the foot. */
export function setLetter(letter: Letter): { subject: string; text: string; html: string } {
  const { subject, greeting, paragraphs, link, reason } = letter;
  const text = [greeting, ...paragraphs, ...(link ? [`${link.label}:\n${link.url}`] : []), `– Roundelay`, reason];
  const words = `${SERIF};font-size:16px;line-height:25px;color:#2b221b`;
  const rows = [
    row(`border-top:4px solid #173850;padding-top:22px;${EMPTY}`, '&nbsp;'),
    row(`${SERIF};font-size:28px;line-height:34px;color:#2b221b;font-weight:bold;padding-bottom:14px`, escape(subject)),
    row(`border-top:1px solid #2b221b;border-bottom:1px solid #2b221b;height:4px;${EMPTY}`, '&nbsp;'),
    row(`${words};padding-top:16px`, escape(greeting)),
    ...paragraphs.map((paragraph) => row(`${words};padding-top:10px`, escape(paragraph))),
    ...(link ? [row('padding-top:20px', buttonCell(link.label, link.url))] : []),
    row(`${SANS};font-size:14px;line-height:20px;color:#5a5047;padding:22px 0 24px`, `Roundelay. ${escape(reason)}`),
  ];
  return {
    subject: oneLine(subject),
    text: `${text.join('\n\n')}\n`,
    html: `<!doctype html><html lang="en"><body style="margin:0;padding:24px 16px;background:#fff">${table(rows.join(''), ';width:100%;max-width:600px')}</body></html>`,
  };
}
