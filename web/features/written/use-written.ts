import { useState } from 'react';
import type { Terms } from '#crochet';
import { MOST_WRITTEN_LINES } from '#contract/written';
import { ProblemError, UnreachableError } from '../../lib/http.ts';
import { toWritten } from './to-pattern.ts';
import { useReading } from './use-reading.ts';
import { useTold } from './use-told.ts';
import { sendWritten } from './written.queries.ts';

const MOST_TEXT = 1_000_000;

/** What the count page keeps of its text in this browser, for those who come from there. */
export function textFromCount(): string {
  try {
    const kept: unknown = JSON.parse(localStorage.getItem('roundelay.count') ?? 'null');
    return typeof kept === 'object' && kept !== null && 'text' in kept && typeof kept.text === 'string'
      ? kept.text
      : '';
  } catch {
    return '';
  }
}

const wordsOf = (error: unknown): string =>
  error instanceof ProblemError
    ? error.message
    : error instanceof UnreachableError
      ? 'The connection was lost. Your text is still here: try again.'
      : 'Something went wrong on our side. Your text is still here: try again.';

const ownId = () => (globalThis.isSecureContext ? crypto.randomUUID() : null);

/** A written pattern on its way in: text, reading, what was decided, and sending it once. */
export function useWritten(studioId: string, first: string) {
  const [text, setText] = useState(first);
  const [typedTitle, setTitle] = useState<string | null>(null);
  const [chosenTerms, setTerms] = useState<Terms | null>(null);
  const [id] = useState(ownId);
  const [error, setError] = useState<string | null>(null);
  const [isSending, setSending] = useState(false);
  const isTooLong = text.length > MOST_TEXT;
  const { reading, isBusy } = useReading(isTooLong ? '' : text, chosenTerms);
  const told = useTold(reading);
  const title = typedTitle ?? reading?.read.title ?? '';
  const terms = chosenTerms ?? reading?.read.terms ?? 'US';
  const lines = told.entries.filter(({ role }) => role === 'line' || role === 'step').length;
  const why = isTooLong
    ? 'This text is longer than a million characters. Take a part out, and bring it in after.'
    : lines > MOST_WRITTEN_LINES
      ? 'More than 3,000 lines. Bring the pieces in as several patterns.'
      : text.trim() === ''
        ? 'Paste the pattern first.'
        : isBusy || !reading
          ? 'It is being read.'
          : lines === 0
            ? 'There is no round, row or step in it yet.'
            : told.open > 0
              ? `${told.open} to confirm first.`
              : title.trim() === ''
                ? 'Give it a name first.'
                : id === null
                  ? 'Bringing a pattern in needs https.'
                  : null;
  /** @returns the id of the pattern that was made, or null where it was not */
  const make = async (): Promise<string | null> => {
    if (why !== null || !reading || id === null || isSending) return null;
    setSending(true);
    setError(null);
    try {
      const about = { id, studioId, title: title.trim(), terms };
      return (await sendWritten(toWritten(told.entries, reading.read, about))).id;
    } catch (err) {
      setError(wordsOf(err));
      return null;
    } finally {
      setSending(false);
    }
  };
  return {
    text,
    setText,
    title,
    setTitle,
    terms,
    setTerms,
    chosenTerms,
    reading,
    isBusy,
    told,
    why,
    error,
    isSending,
    make,
  };
}
