import { useCallback, useEffect, useMemo, useRef, useState } from 'react';
import type { Repair } from '#crochet';
import type { RingLine } from '#crochet/shape';
import { type Asked, type Change, type Counted, type PieceRows, type Reply, type Request } from './worker/protocol.ts';

/** What came of a count, with the text it was made of. */
export interface Result {
  readonly of: Asked;
  readonly seq: number;
  readonly counted: Omit<Counted, 'pieces'>;
  readonly pieces: readonly { readonly id: string; readonly start: number; readonly rows: PieceRows }[];
  readonly ms: number;
}

export interface Counting {
  readonly result: Result | null;
  /** How many pieces of a long text are done; null while none is counted, or it is quick. */
  readonly progress: { readonly done: number; readonly of: number } | null;
  readonly isBusy: boolean;
  readonly hasFailed: boolean;
  readonly repairs: { readonly lineId: string; readonly seq: number; readonly of: readonly Repair[] } | null;
  readonly drawn: { readonly pieceId: string; readonly lines: readonly RingLine[] } | null;
  readonly house: { readonly seq: number; readonly changes: readonly Change[] } | null;
  readonly ask: (
    request: { kind: 'repairs'; lineId: string } | { kind: 'draw'; pieceId: string } | { kind: 'house' },
  ) => void;
  readonly again: () => void;
}

type Told = Pick<Counting, 'result' | 'progress' | 'repairs' | 'drawn' | 'house'>;
const NOTHING: Told = { result: null, progress: null, repairs: null, drawn: null, house: null };

/** Rows that were not told again are those of the count before. */
function joinResult(
  before: Result | null,
  { seq, counted, ms }: Extract<Reply, { kind: 'counted' }>,
  of: Asked,
): Result {
  const known = new Map(before?.pieces.map(({ id, rows }) => [id, rows]));
  const { pieces, ...rest } = counted;
  return {
    of,
    seq,
    ms,
    counted: rest,
    pieces: pieces.flatMap(({ id, start, rows }) => {
      const own = rows ?? known.get(id);
      return own ? [{ id, start, rows: own }] : [];
    }),
  };
}

function hear(told: Told, reply: Reply, asked: Asked): Told {
  switch (reply.kind) {
    case 'progress':
      return { ...told, progress: { done: reply.done, of: reply.of } };
    case 'counted':
      return { ...told, progress: null, result: joinResult(told.result, reply, asked) };
    case 'repairs':
      return { ...told, repairs: { lineId: reply.lineId, seq: reply.seq, of: reply.repairs } };
    case 'draw':
      return { ...told, drawn: { pieceId: reply.pieceId, lines: reply.lines } };
    case 'house':
      return { ...told, house: { seq: reply.seq, changes: reply.changes } };
  }
}

const openWorker = () =>
  new Worker(new URL('./worker/count-worker.ts', import.meta.url), { type: 'module', name: 'count' });

/** Counts a text in a thread of its own, anew with every change; what is asked of it answers when it comes. */
export function useCounting(asked: Asked): Counting {
  const [told, setTold] = useState<Told>(NOTHING);
  const [sent, setSent] = useState(0);
  const [failed, setFailed] = useState(0);
  const [starts, setStarts] = useState(0);
  const worker = useRef<Worker | null>(null);
  const seq = useRef(0);
  const texts = useRef(new Map<number, Asked>());
  const post = useCallback((request: Request) => worker.current?.postMessage(request), []);

  useEffect(() => {
    const own = openWorker();
    worker.current = own;
    own.onmessage = ({ data }: MessageEvent<Reply>) => {
      const of = texts.current.get(data.seq);
      if (data.kind === 'counted')
        for (const old of [...texts.current.keys()]) if (old < data.seq) texts.current.delete(old);
      if (of) setTold((before) => hear(before, data, of));
    };
    own.onerror = () => setFailed(seq.current);
    return () => own.terminate();
  }, [starts]);

  useEffect(() => {
    seq.current += 1;
    texts.current.set(seq.current, asked);
    setSent(seq.current);
    post({ kind: 'count', seq: seq.current, asked });
  }, [asked, post, starts]);

  const ask = useCallback<Counting['ask']>((request) => post({ ...request, seq: seq.current }), [post]);
  const again = useCallback(() => {
    setFailed(0);
    setTold(NOTHING);
    setStarts((n) => n + 1);
  }, []);
  return useMemo(
    () => ({
      ...told,
      isBusy: (told.result?.seq ?? 0) < sent,
      hasFailed: failed > 0 && failed >= sent,
      ask,
      again,
    }),
    [told, sent, failed, ask, again],
  );
}
