import type { Span } from '#crochet';

/** One change of a text: at `at`, `out` is taken away and `in` put in its place. Offsets are UTF-16 units. */
export interface Patch {
  readonly at: number;
  readonly out: string;
  readonly in: string;
}

/** The smallest stretch in which two texts differ; null where they are alike. */
export function patchBetween(before: string, after: string): Patch | null {
  if (before === after) return null;
  const most = Math.min(before.length, after.length);
  let head = 0;
  while (head < most && before.charCodeAt(head) === after.charCodeAt(head)) head += 1;
  let tail = 0;
  while (
    tail < most - head &&
    before.charCodeAt(before.length - 1 - tail) === after.charCodeAt(after.length - 1 - tail)
  )
    tail += 1;
  return { at: head, out: before.slice(head, before.length - tail), in: after.slice(head, after.length - tail) };
}

export const applyPatch = (text: string, patch: Patch): string =>
  text.slice(0, patch.at) + patch.in + text.slice(patch.at + patch.out.length);

export const reversed = (patch: Patch): Patch => ({ at: patch.at, out: patch.in, in: patch.out });

/** Where a stretch of the text stands after a change; null where the change touches it. */
export function moveSpan({ start, end }: Span, patch: Patch | null): Span | null {
  if (!patch || end <= patch.at) return { start, end };
  const by = patch.in.length - patch.out.length;
  if (start >= patch.at + patch.out.length) return { start: start + by, end: end + by };
  return null;
}

/** Many changes made at once, each told by its place in the text as it was. They must not overlap. */
export function applyChanges(text: string, changes: readonly { readonly span: Span; readonly text: string }[]): string {
  let out = '';
  let at = 0;
  for (const change of [...changes].sort((a, b) => a.span.start - b.span.start)) {
    if (change.span.start < at) continue;
    out += text.slice(at, change.span.start) + change.text;
    at = change.span.end;
  }
  return out + text.slice(at);
}
