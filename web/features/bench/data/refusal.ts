import { ProblemError, UnreachableError } from '../../../lib/http.ts';
import type { Fields } from './bench-types.ts';

/** What a failed save means for what was to be saved. */
export type Refusal =
  | { readonly is: 'stale'; readonly row: Fields; readonly by: string | null; readonly at: string | null }
  | { readonly is: 'gone' }
  | { readonly is: 'refused'; readonly why: string }
  | { readonly is: 'signed-out'; readonly why: string }
  | { readonly is: 'later'; readonly why: string; readonly afterMs: number | null };

const words = (value: unknown): string | null => (typeof value === 'string' && value !== '' ? value : null);

/** Reads an error of `send` as what is to be done about it: ask the person, give it back, or try again later. */
export function readRefusal(error: unknown): Refusal {
  if (error instanceof UnreachableError) return { is: 'later', why: 'The server does not answer.', afterMs: null };
  if (!(error instanceof ProblemError)) return { is: 'refused', why: 'The answer could not be read.' };
  const { problem } = error;
  const { status, retryAfter } = problem as typeof problem & { retryAfter?: unknown };
  const present = problem.present as Fields | undefined;
  if (status === 412 && present) {
    return { is: 'stale', row: present, by: words(problem.savedBy), at: words(problem.savedAt) };
  }
  if (status === 404) return { is: 'gone' };
  if (status === 401) return { is: 'signed-out', why: 'Your session has ended. Sign in again.' };
  if (status === 429 || error.kind === 'still-running') {
    return {
      is: 'later',
      why: 'Too many saves at once.',
      afterMs: typeof retryAfter === 'number' ? retryAfter * 1_000 : null,
    };
  }
  if (status >= 500) return { is: 'later', why: 'The server cannot save at the moment.', afterMs: null };
  const field = problem.errors?.[0]?.detail;
  return { is: 'refused', why: problem.detail ?? field ?? `${problem.title}.` };
}
