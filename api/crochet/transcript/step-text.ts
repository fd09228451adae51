const LEADS = /^(?:(?:now|then|so|and|okay|ok|right|well|but|um|uh|alright)(?![\p{L}'’-])[,.…]*\s*)+/iu;

/** A step's words as a sentence: without the little words before it, with a capital and a full stop. */
export function stepText(spoken: string): string {
  const bare = spoken.replace(LEADS, '').replace(/[\s,;:–—-]+$/u, '');
  const text = bare === '' ? spoken : bare;
  const first = String.fromCodePoint(text.codePointAt(0) ?? 32);
  return `${first.toUpperCase()}${text.slice(first.length)}${/[.!?…]["'”’)\]]*$/u.test(text) ? '' : '.'}`;
}
