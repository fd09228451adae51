import { applyPatch, type Patch, patchBetween, reversed } from './patch.ts';

/** What was written, step by step, so that every one of them can be taken back: typing as well as repairs. */

interface Step {
  readonly patch: Patch;
  /** What the step was, for the one who takes it back; empty for typing. */
  readonly what: string;
  readonly atMs: number;
}

export interface History {
  readonly text: string;
  readonly done: readonly Step[];
  readonly undone: readonly Step[];
}

/** Letters typed one after another within this time are one step. */
const TOGETHER_MS = 1_000;
const MOST = 500;

export const startHistory = (text: string): History => ({ text, done: [], undone: [] });

/** Whether a patch goes on where the last one ended, so that both are one stroke of typing. */
function joins(last: Step | undefined, next: Step): boolean {
  if (last?.what !== '' || next.what !== '' || next.atMs - last.atMs > TOGETHER_MS) return false;
  const isTyping =
    next.patch.out === '' && last.patch.out === '' && next.patch.at === last.patch.at + last.patch.in.length;
  const isErasing =
    next.patch.in === '' && last.patch.in === '' && next.patch.at + next.patch.out.length === last.patch.at;
  return isTyping || isErasing;
}

const join = (a: Patch, b: Patch): Patch =>
  b.out === '' ? { at: a.at, out: '', in: a.in + b.in } : { at: b.at, out: b.out + a.out, in: '' };

/**
 * The text after a change.
 * @param what empty for typing; else its name: "R9 mended".
 */
export function write(history: History, text: string, what: string, atMs: number): History {
  const patch = patchBetween(history.text, text);
  if (!patch) return history;
  const step: Step = { patch, what, atMs };
  const last = history.done.at(-1);
  const done =
    last && joins(last, step)
      ? [...history.done.slice(0, -1), { ...step, patch: join(last.patch, patch) }]
      : [...history.done, step].slice(-MOST);
  return { text, done, undone: [] };
}

/** Takes the last step back; where it happened, for the caret to go there. */
export function undo(history: History): { history: History; caret: number; what: string } | null {
  const step = history.done.at(-1);
  if (!step) return null;
  const back = reversed(step.patch);
  return {
    history: {
      text: applyPatch(history.text, back),
      done: history.done.slice(0, -1),
      undone: [...history.undone, step],
    },
    caret: back.at + back.in.length,
    what: step.what,
  };
}

export function redo(history: History): { history: History; caret: number; what: string } | null {
  const step = history.undone.at(-1);
  if (!step) return null;
  return {
    history: {
      text: applyPatch(history.text, step.patch),
      done: [...history.done, step],
      undone: history.undone.slice(0, -1),
    },
    caret: step.patch.at + step.patch.in.length,
    what: step.what,
  };
}
