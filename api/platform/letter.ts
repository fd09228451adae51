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

/** Sets a letter as the two bodies of a mail. */
export function setLetter(letter: Letter): { subject: string; text: string; html: string } {
  const { greeting, paragraphs, link, reason } = letter;
  const text = [greeting, ...paragraphs, ...(link ? [`${link.label}:\n${link.url}`] : []), `– Roundelay`, reason];
  const html = [
    `<p>${escape(greeting)}</p>`,
    ...paragraphs.map((paragraph) => `<p>${escape(paragraph)}</p>`),
    ...(link ? [`<p><a href="${escape(link.url)}">${escape(link.label)}</a></p>`] : []),
    `<p>– Roundelay</p>`,
    `<p style="color:#6b645b;font-size:14px">${escape(reason)}</p>`,
  ];
  return {
    subject: oneLine(letter.subject),
    text: `${text.join('\n\n')}\n`,
    html: `<!doctype html><html lang="en"><body style="font:16px/1.5 Georgia,serif;color:#26221e;max-width:36em">${html.join('')}</body></html>`,
  };
}
