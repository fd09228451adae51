import { useEffect, useRef, useState } from 'react';
import type { PatternText, Terms } from '#crochet';
import { type Entry, tellApart } from './told-apart.ts';

export interface Reading {
  readonly text: string;
  readonly read: PatternText;
  readonly entries: readonly Entry[];
}

const QUIET_MS = 150;

/** The text told apart; null until it has been read. A newer text takes the place of one that is being read. */
export function useReading(text: string, terms: Terms | null): { reading: Reading | null; isBusy: boolean } {
  const [reading, setReading] = useState<Reading | null>(null);
  const worker = useRef<Worker | null>(null);
  useEffect(
    () => () => {
      worker.current?.terminate();
      worker.current = null;
    },
    [],
  );
  useEffect(() => {
    if (text.trim() === '') return undefined;
    const timer = setTimeout(() => {
      worker.current?.terminate();
      const own = new Worker(new URL('./read-worker.ts', import.meta.url), { type: 'module', name: 'read' });
      worker.current = own;
      own.onmessage = ({ data }: MessageEvent<{ read: PatternText }>) =>
        setReading({ text, read: data.read, entries: tellApart(text, data.read) });
      own.postMessage({ text, terms });
    }, QUIET_MS);
    return () => clearTimeout(timer);
  }, [text, terms]);
  const isEmpty = text.trim() === '';
  return { reading: isEmpty ? null : reading, isBusy: !isEmpty && reading?.text !== text };
}
