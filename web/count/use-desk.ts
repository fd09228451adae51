import { createContext, useCallback, useContext, useEffect, useMemo, useRef, useState } from 'react';
import { useToast } from '../ui/toast.tsx';
import { findRow, nextToLook, type Placed, placedRows, rowAt } from './find-row.ts';
import { type Offer, totalChanges, totalOffer } from './offers.ts';
import { applyChanges, moveSpan, patchBetween, type Patch } from './text/patch.ts';
import { type Counting, useCounting } from './use-counting.ts';
import { useText, type Written } from './use-text.ts';
import { type Change } from './worker/protocol.ts';

/** One page, one state: the text, what the count says of it, and the line in hand. */
export interface CountDesk {
  readonly written: Written;
  readonly counting: Counting;
  readonly placed: readonly Placed[];
  /** What has changed in the text since it was counted; null: nothing. */
  readonly patch: Patch | null;
  readonly open: Placed | undefined;
  /** Offers for the open line, best first; empty while none is known. */
  readonly offers: readonly Offer[];
  /** Takes a line in hand; `follow` also shows it in the text. */
  readonly pick: (lineId: string | null, follow?: boolean) => void;
  readonly pickAt: (caret: number) => void;
  readonly walk: (way?: 1 | -1) => void;
  readonly takeOffer: (offer: Offer) => void;
  readonly writeTotals: () => void;
  readonly takeHouseStyle: () => void;
  readonly replaceAll: (text: string, what: string) => void;
  readonly stepBack: () => void;
  readonly stepOn: () => void;
  /** A stretch of the text to be shown and marked; counts up with each wish. */
  readonly wish: { readonly n: number; readonly start: number; readonly end: number } | null;
}

const DeskContext = createContext<CountDesk | null>(null);
export const DeskProvider = DeskContext.Provider;

/** @throws Error outside of the page */
export function useDesk(): CountDesk {
  const desk = useContext(DeskContext);
  if (!desk) throw new Error('useDesk belongs inside the count page');
  return desk;
}

const HOUSE_AFTER_MS = 500;
/** Longer texts are put into house style only when somebody asks. */
const HOUSE_UP_TO = 60_000;

/** Asks the counting thread for what only the open line, the open piece or a quiet moment needs. */
function useQuestions(counting: Counting, open: Placed | undefined, textLength: number): void {
  const { ask, result } = counting;
  const seq = result?.seq;
  const needsRepair = open !== undefined && ['unread', 'does-not-fit', 'differs'].includes(open.row.verdict);
  const lineId = open?.row.id;
  const pieceId = open?.pieceId ?? result?.pieces[0]?.id;
  useEffect(() => {
    if (seq !== undefined && needsRepair && lineId !== undefined) ask({ kind: 'repairs', lineId });
  }, [ask, seq, needsRepair, lineId]);
  useEffect(() => {
    if (seq !== undefined && pieceId !== undefined) ask({ kind: 'draw', pieceId });
  }, [ask, seq, pieceId]);
  useEffect(() => {
    if (seq === undefined || textLength > HOUSE_UP_TO) return;
    const timer = setTimeout(() => ask({ kind: 'house' }), HOUSE_AFTER_MS);
    return () => clearTimeout(timer);
  }, [ask, seq, textLength]);
}

export function useNewDesk(): CountDesk {
  const written = useText();
  const { text, terms, base } = written;
  const counting = useCounting(useMemo(() => ({ text, terms, base }), [text, terms, base]));
  const { result } = counting;
  const tell = useToast();
  const [openId, setOpenId] = useState<string | null>(null);
  const [wish, setWish] = useState<CountDesk['wish']>(null);
  const placed = useMemo(() => placedRows(result), [result]);
  const patch = useMemo(() => patchBetween(result?.of.text ?? text, text), [result, text]);
  const open = findRow(placed, openId);
  useQuestions(counting, open, text.length);

  const show = useCallback(
    (start: number, end: number) => setWish((before) => ({ n: (before?.n ?? 0) + 1, start, end })),
    [],
  );
  const pick = (lineId: string | null, follow = false) => {
    setOpenId(lineId);
    const row = findRow(placed, lineId);
    const span = row && moveSpan({ start: row.bodyStart, end: row.bodyEnd }, patch);
    if (follow && span) show(span.start, span.end);
  };
  const caret = useRef(0);
  const pickAt = (at: number) => {
    caret.current = at;
    setOpenId(rowAt(placed, at, patch)?.row.id ?? null);
  };
  // A line that is new under the caret is taken in hand as soon as it is counted.
  useEffect(() => {
    setOpenId((id) => (id !== null && findRow(placed, id) ? id : (rowAt(placed, caret.current, null)?.row.id ?? null)));
  }, [placed]);

  const undoWith = (what: string) => () => {
    written.undo();
    tell(`${what}, taken back`);
  };
  /** Writes changes told by places of the counted text; false where somebody has written over one of them since. */
  const change = (changes: readonly Change[], what: string): boolean => {
    const moved = changes.flatMap(({ span, text: words }) => {
      const now = moveSpan(span, patch);
      return now ? [{ span: now, text: words }] : [];
    });
    if (moved.length === 0 || moved.length < changes.length) return false;
    written.write(applyChanges(text, moved), what);
    tell(what, undoWith(what));
    return true;
  };
  const takeOffer = ({ lineId, text: words }: Offer) => {
    const at = findRow(placed, lineId);
    if (!at) return;
    const name = at.row.name || 'The line';
    if (!change([{ span: { start: at.bodyStart, end: at.bodyEnd }, text: words }], `${name} set to ${words}`))
      tell('The line was written over meanwhile. It is being counted again.');
  };
  const totals = totalOffer;
  const mending =
    open && counting.repairs?.lineId === open.row.id && counting.repairs.seq === result?.seq ? counting.repairs.of : [];
  const figure = open ? totals(open.row) : null;
  return {
    written,
    counting,
    placed,
    patch,
    open,
    offers: figure ? [figure] : mending,
    pick,
    pickAt,
    walk: (way = 1) => {
      const next = nextToLook(placed, openId, way);
      if (next) pick(next.row.id, true);
    },
    takeOffer,
    writeTotals: () => {
      const changes = totalChanges(placed);
      change(changes, `${changes.length} ${changes.length === 1 ? 'total' : 'totals'} written`);
    },
    takeHouseStyle: () => {
      const changes = counting.house?.seq === result?.seq ? (counting.house?.changes ?? []) : [];
      change(changes, `${changes.length} ${changes.length === 1 ? 'line' : 'lines'} put into house style`);
    },
    replaceAll: (next, what) => {
      written.write(next, what);
      tell(what, undoWith(what));
    },
    stepBack: () => {
      const step = written.undo();
      if (step) show(step.caret, step.caret);
    },
    stepOn: () => {
      const step = written.redo();
      if (step) show(step.caret, step.caret);
    },
    wish,
  };
}
