import { containerOfName, whyUnplayable } from '#contract/clip-facts';
import { CLIP_BYTES, FIRST_BYTES, type ClipStart } from '#contract/uploads';
import { formatBytes } from '../../../lib/time.ts';

/** SHA-256 in hexadecimal, by the browser itself. */
export async function digestOf(bytes: Blob): Promise<string> {
  const hash = await crypto.subtle.digest('SHA-256', await bytes.arrayBuffer());
  return Array.from(new Uint8Array(hash), (byte) => byte.toString(16).padStart(2, '0')).join('');
}

const INSECURE =
  'A clip can only be sent over a secure connection. Open this page with https:// in front of its address, or ask ' +
  'whoever runs it to.';

/**
 * What speaks against a file, before a byte of it is sent; null when nothing does. The reader of films is fetched
 * when it is first needed, and reads only the few places where a file describes itself.
 */
export async function whyNotSend(file: File): Promise<string | null> {
  if (!globalThis.isSecureContext) return INSECURE;
  if (!containerOfName(file.name)) return 'A clip is a file that ends in .mp4, .webm or .mov.';
  if (file.size === 0) return 'This file is empty.';
  if (file.size > CLIP_BYTES)
    return `A clip may have ${formatBytes(CLIP_BYTES)}; this one has ${formatBytes(file.size)}.`;
  const { readFilm } = await import('./film-reader.ts');
  try {
    return whyUnplayable(await readFilm(file));
  } catch {
    return 'This file is no film, or it breaks off before its end. Export the recording again and choose that file.';
  }
}

/** The four facts that say "the same file", on any day. */
export async function factsOf(file: File): Promise<ClipStart> {
  return {
    name: file.name,
    size: file.size,
    lastModified: file.lastModified,
    firstMiBSha256: await digestOf(file.slice(0, FIRST_BYTES)),
  };
}
