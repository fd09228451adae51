import { readPattern, type Terms } from '#crochet';

/** Reads a written pattern in a thread of its own, so that the page stays alive under a long one. */
self.onmessage = ({ data }: MessageEvent<{ text: string; terms: Terms | null }>) => {
  self.postMessage({ read: readPattern(data.text, data.terms ?? undefined) });
};
