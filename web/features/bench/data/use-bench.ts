import { useQueryClient, useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useEffect, useMemo, useState, useSyncExternalStore } from 'react';
import { placeTotal, printTotals } from '#crochet';
import type { Pattern } from '#contract/patterns';
import { benchApi } from './bench-api.ts';
import { BenchStore } from './bench-store.ts';
import type { Bench, BenchActions } from './bench-types.ts';
import { patternQuery } from './bench.queries.ts';
import { useLive } from './use-live.ts';
import { keepDrafts } from './kept-drafts.ts';

/** After the last save, before what the server works out from it is read. */
const SETTLE_MS = 800;

/** A store whose saves and whose reading of the whole keep out of each other's way. */
function openStore(client: QueryClient, pattern: Pattern): BenchStore {
  const { queryKey } = patternQuery(pattern.id);
  let settle: ReturnType<typeof setTimeout> | undefined;
  return new BenchStore(pattern, {
    api: benchApi(pattern.id),
    drafts: keepDrafts(pattern.id, pattern.me.id),
    now: Date.now,
    onSend: () => {
      clearTimeout(settle);
      void client.cancelQueries({ queryKey, exact: true });
    },
    onIdle: () => {
      settle = setTimeout(() => void client.invalidateQueries({ queryKey, exact: true }), SETTLE_MS);
    },
  });
}

function actionsOf(store: BenchStore): BenchActions {
  return {
    add: (kind, fields) => store.add(kind, { ...fields }),
    edit: (kind, id, fields) => store.edit(kind, id, { ...fields }),
    remove: (kind, id) => store.remove(kind, id),
    editPattern: (fields) => store.edit('pattern', store.snapshot().pattern.id, { ...fields }),
    setWritten(lineId, totals) {
      const { pattern, lineCounts } = store.snapshot();
      const line = pattern.lines.find(({ id }) => id === lineId);
      const span = lineCounts.get(lineId)?.writtenSpan;
      if (!line || !span) store.edit('line', lineId, { written: totals });
      else
        store.edit('line', lineId, { text: placeTotal(line.text, span, totals && printTotals(totals)), written: null });
    },
    asOneDeed: (work) => store.asOneDeed(work),
    flush: () => store.flush(),
    undo: () => store.undo('undo'),
    redo: () => store.undo('redo'),
    resolve: (conflictId, how) => store.resolve(conflictId, how),
    retry: () => store.retry(),
    dismissNotice: (id) => store.dismissNotice(id),
  };
}

/** Runs a store while its page is open: what waits is sent before the page goes out of sight. */
function useStoreLife(store: BenchStore): void {
  useEffect(() => {
    void store.open();
    const flush = () => {
      if (document.visibilityState === 'hidden') void store.flush();
    };
    document.addEventListener('visibilitychange', flush);
    window.addEventListener('online', store.retry);
    return () => {
      document.removeEventListener('visibilitychange', flush);
      window.removeEventListener('online', store.retry);
      void store.flush().finally(store.close);
    };
  }, [store]);
}

/**
 * A pattern on the bench: what it holds with every change of one's own in it, its count as one types, how saving
 * stands, and everything that can be done with it. Suspends until the pattern is there; an error goes to the page's
 * boundary. Others' saves come in by themselves. Give the component that calls it the pattern's id as its key.
 */
export function useBench(patternId: string): Bench {
  const client = useQueryClient();
  const { data } = useSuspenseQuery({ ...patternQuery(patternId), refetchOnWindowFocus: false });
  const [store] = useState(() => openStore(client, data));
  useStoreLife(store);
  const company = useLive(store, patternId);
  useEffect(() => store.receive(data), [store, data]);
  const snapshot = useSyncExternalStore(store.subscribe, store.snapshot);
  const actions = useMemo(() => actionsOf(store), [store]);
  return { ...snapshot, ...actions, ...company };
}
