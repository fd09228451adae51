import { useCallback, useEffect, useMemo, useRef, useState } from 'react';
import type { Terms } from '#crochet';
import { type History, redo, startHistory, undo, write } from './text/history.ts';
import { keep, kept } from './share/kept-text.ts';
import { fromFragment, type Shared } from './share/share-link.ts';

const KEPT_AFTER_MS = 400;

export interface Written {
  readonly text: string;
  readonly terms: Terms | null;
  readonly base: number | null;
  readonly canUndo: boolean;
  readonly canRedo: boolean;
  /** A link was opened that could not be read. */
  readonly isBroken: boolean;
  readonly write: (text: string, what?: string) => void;
  /** Where the caret belongs after the step, and what the step was; null where there is none. */
  readonly undo: () => { caret: number; what: string } | null;
  readonly redo: () => { caret: number; what: string } | null;
  readonly setTerms: (terms: Terms | null) => void;
  readonly setBase: (base: number | null) => void;
}

/** The text that is written, with its history. It comes from the link if there is one, else from the last visit. */
export function useText(): Written {
  const [history, setHistory] = useState<History>(() => startHistory(kept()?.text ?? ''));
  const [chosen, setChosen] = useState(() => {
    const { terms = null, base = null } = kept() ?? {};
    return { terms, base };
  });
  const [isBroken, setBroken] = useState(false);
  const latest = useRef(history);
  const put = useCallback((next: History) => {
    latest.current = next;
    setHistory(next);
  }, []);
  const writeText = useCallback(
    (text: string, what = '') => put(write(latest.current, text, what, performance.now())),
    [put],
  );

  useEffect(() => {
    const open = () =>
      void fromFragment(location.hash).then((shared: Shared | 'broken' | null) => {
        setBroken(shared === 'broken');
        if (shared === null || shared === 'broken') return;
        // What stood here before comes back by undo.
        writeText(shared.text, 'The text of the link');
        setChosen({ terms: shared.terms, base: shared.base });
      });
    open();
    window.addEventListener('hashchange', open);
    return () => window.removeEventListener('hashchange', open);
  }, [writeText]);

  const { text } = history;
  useEffect(() => {
    const timer = setTimeout(() => keep({ text, ...chosen }), KEPT_AFTER_MS);
    return () => clearTimeout(timer);
  }, [text, chosen]);
  useEffect(() => {
    const keepNow = () => keep({ text: latest.current.text, ...chosen });
    window.addEventListener('pagehide', keepNow);
    return () => window.removeEventListener('pagehide', keepNow);
  }, [chosen]);

  const step = useCallback(
    (way: typeof undo) => {
      const stepped = way(latest.current);
      if (!stepped) return null;
      put(stepped.history);
      return { caret: stepped.caret, what: stepped.what };
    },
    [put],
  );
  return useMemo(
    () => ({
      text,
      ...chosen,
      isBroken,
      canUndo: history.done.length > 0,
      canRedo: history.undone.length > 0,
      write: writeText,
      undo: () => step(undo),
      redo: () => step(redo),
      setTerms: (terms) => setChosen((before) => ({ ...before, terms })),
      setBase: (base) => setChosen((before) => ({ ...before, base })),
    }),
    [text, chosen, isBroken, history, writeText, step],
  );
}
