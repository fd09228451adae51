/** HTML that has been escaped, or was written by us; only this goes into a page as it is. */
export class Html {
  readonly text: string;
  constructor(text: string) {
    this.text = text;
  }
}

const SIGNS: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };

export const escapeHtml = (text: string): string => text.replace(/[&<>"']/g, (sign) => SIGNS[sign] ?? sign);

type Part = Html | string | number | null | undefined | false | readonly Part[];

function partText(part: Part): string {
  if (part instanceof Html) return part.text;
  if (part === null || part === undefined || part === false) return '';
  if (typeof part === 'object') return part.map(partText).join('');
  return escapeHtml(String(part));
}

/** A piece of a page: everything put in is escaped unless it is itself a piece of a page. */
export function html(strings: TemplateStringsArray, ...parts: readonly Part[]): Html {
  return new Html(strings.reduce((text, string, i) => text + partText(parts[i - 1] ?? '') + string));
}

/** Data for the page's script, safe inside a script element: it cannot close it, whatever it holds. */
export function jsonScript(id: string, value: unknown): Html {
  const text = JSON.stringify(value)
    .replace(/</g, '\\u003c')
    .replace(/\u2028/g, '\\u2028')
    .replace(/\u2029/g, '\\u2029');
  return new Html(`<script type="application/json" id="${escapeHtml(id)}">${text}</script>`);
}
