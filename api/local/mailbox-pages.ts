import type { KeptMail } from './mailbox.ts';

const ESCAPES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};
const escape = (text: string) => text.replace(/[&<>"']/g, (char) => ESCAPES[char] ?? char);
const time = (at: Date) => at.toISOString().slice(11, 19);

function page(title: string, body: string): string {
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8"><meta name="viewport" content="width=device-width">
<title>${escape(title)}</title>
<style>
  body { font: 17px/1.5 Georgia, serif; color: #26221e; background: #faf7f1; max-width: 44rem; margin: 2rem auto; padding: 0 1rem; }
  ul { list-style: none; padding: 0; border-top: 1px solid #d9d2c5; }
  li { border-bottom: 1px solid #d9d2c5; padding: .6rem 0; }
  a { color: #1f4f6b; }
  small { color: #5c554c; }
  pre { font: inherit; white-space: pre-wrap; overflow-wrap: anywhere; background: #fff; border: 1px solid #d9d2c5; padding: 1rem; }
</style>
</head>
<body>${body}</body>
</html>
`;
}

/** Every mail, the newest first. */
export function mailListPage(mails: readonly KeptMail[]): string {
  const items = mails
    .toReversed()
    .map(
      ({ id, subject, to, at }) =>
        `<li><a href="/mails/${id}">${escape(subject)}</a><br><small>to ${escape(to)}, ${time(at)} UTC</small></li>`,
    );
  const list = items.length > 0 ? `<ul>${items.join('')}</ul>` : '<p>No mail has come yet.</p>';
  return page('Mailbox', `<h1>Mailbox</h1><p>What Roundelay sends lands here and nowhere else.</p>${list}`);
}

/** One mail, with its links to follow. */
export function mailPage(mail: KeptMail): string {
  const text = escape(mail.text).replace(/https?:\/\/[^\s<]+/g, (url) => `<a href="${url}">${url}</a>`);
  return page(
    mail.subject,
    `<p><a href="/">All mail</a></p><h1>${escape(mail.subject)}</h1>
<p><small>from ${escape(mail.from)} to ${escape(mail.to)}, ${time(mail.at)} UTC</small></p><pre>${text}</pre>`,
  );
}
