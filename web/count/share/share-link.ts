import type { Terms } from '#crochet';

/** What a link carries: the text, and what the person chose beside it. It stands behind the `#`, which is never sent. */
export interface Shared {
  readonly text: string;
  readonly terms: Terms | null;
  readonly base: number | null;
}

/** Longest text that is counted, or taken from a link, in UTF-16 units. */
export const MOST_TEXT = 1_000_000;
/** Programs for mail and messages begin to cut links at about this length. */
export const LONG_LINK = 8_000;
/** Longer ones are refused by browsers' address bars and by most programs. */
export const MOST_LINK = 32_000;

const toBase64Url = (bytes: Uint8Array): string => {
  let binary = '';
  for (let i = 0; i < bytes.length; i += 8_192) binary += String.fromCharCode(...bytes.subarray(i, i + 8_192));
  return btoa(binary).replaceAll('+', '-').replaceAll('/', '_').replace(/=+$/, '');
};

function fromBase64Url(text: string): Uint8Array<ArrayBuffer> | null {
  try {
    return Uint8Array.from(atob(text.replaceAll('-', '+').replaceAll('_', '/')), (c) => c.charCodeAt(0));
  } catch {
    return null;
  }
}

async function deflate(bytes: Uint8Array<ArrayBuffer>): Promise<Uint8Array> {
  const stream = new Blob([bytes]).stream().pipeThrough(new CompressionStream('deflate-raw'));
  return new Uint8Array(await new Response(stream).arrayBuffer());
}

/** Stops at the longest text there may be, so that a short link cannot swell into gigabytes. */
async function inflate(bytes: Uint8Array<ArrayBuffer>): Promise<Uint8Array | null> {
  const reader = new Blob([bytes]).stream().pipeThrough(new DecompressionStream('deflate-raw')).getReader();
  const parts: Uint8Array[] = [];
  let size = 0;
  try {
    for (;;) {
      const { done, value } = await reader.read();
      if (done) break;
      size += value.length;
      if (size > MOST_TEXT * 3) {
        await reader.cancel();
        return null;
      }
      parts.push(value);
    }
  } catch {
    return null;
  }
  const all = new Uint8Array(size);
  let at = 0;
  for (const part of parts) {
    all.set(part, at);
    at += part.length;
  }
  return all;
}

/** `z=…` where the browser can press it together and that makes it shorter, else `t=…`; then what was chosen. */
export async function toFragment({ text, terms, base }: Shared): Promise<string> {
  const bytes = new TextEncoder().encode(text);
  const plain = `t=${toBase64Url(bytes)}`;
  const pressed = typeof CompressionStream === 'undefined' ? plain : `z=${toBase64Url(await deflate(bytes))}`;
  return `#${pressed.length < plain.length ? pressed : plain}${terms ? `&terms=${terms}` : ''}${base === null ? '' : `&base=${base}`}`;
}

/**
 * Reads a fragment back.
 * @returns null where there is none; `broken` where it cannot be read, as when the link was cut on its way.
 */
export async function fromFragment(fragment: string): Promise<Shared | 'broken' | null> {
  const match = /^#([zt])=([\w-]+)(.*)$/.exec(fragment);
  if (!match) return /^#[zt]=/.test(fragment) ? 'broken' : null;
  const bytes = fromBase64Url(match[2]!);
  if (!bytes) return 'broken';
  const opened = match[1] === 't' ? bytes : typeof DecompressionStream === 'undefined' ? null : await inflate(bytes);
  if (!opened) return 'broken';
  let text: string;
  try {
    text = new TextDecoder('utf-8', { fatal: true }).decode(opened);
  } catch {
    return 'broken';
  }
  if (text.length > MOST_TEXT) return 'broken';
  const rest = new URLSearchParams(match[3]!.replace(/^&/, ''));
  const terms = rest.get('terms');
  const base = Number(rest.get('base'));
  return {
    text,
    terms: terms === 'US' || terms === 'UK' ? terms : null,
    base: Number.isInteger(base) && base > 0 && base < 100_000 ? base : null,
  };
}
