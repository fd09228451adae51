import { type KeyboardEvent, useEffect, useMemo, useRef } from 'react';
import { cx } from '../../lib/class-names.ts';
import { useDesk } from '../use-desk.ts';
import { stretchesOf, UNDERLAY_UP_TO } from './underlay.ts';

const FACE = 'count-face wr col-start-1 row-start-1 px-4 py-3 break-words whitespace-pre-wrap';

/** Keys that act while somebody writes: the field's own undo would know nothing of repairs. */
function useTextKeys(): (event: KeyboardEvent<HTMLTextAreaElement>) => void {
  const desk = useDesk();
  return (event) => {
    if (event.nativeEvent.isComposing) return;
    const isCtrl = event.ctrlKey || event.metaKey;
    const key = event.key.toLowerCase();
    const act =
      isCtrl && key === 'z' && !event.shiftKey
        ? desk.stepBack
        : isCtrl && (key === 'y' || (key === 'z' && event.shiftKey))
          ? desk.stepOn
          : event.key === 'F8'
            ? () => desk.walk(event.shiftKey ? -1 : 1)
            : null;
    if (!act) return;
    event.preventDefault();
    act();
  };
}

/**
 * The text as it is written, underlined to the letter where something is wrong. The same words lie twice over each other:
 * in a text area without ground, and under it, without colour, with the underlining; so caret, selection and screen
 * readers are the browser's own. A long text lies there once, and is underlined in the ledger alone.
 */
export function TextField({ describedBy }: { describedBy: string }) {
  const { written, placed, patch, open, pickAt, wish } = useDesk();
  const { text } = written;
  const field = useRef<HTMLTextAreaElement>(null);
  const under = useRef<HTMLDivElement>(null);
  const press = useTextKeys();
  const isLong = text.length > UNDERLAY_UP_TO;
  const openId = open?.row.id ?? null;
  const stretches = useMemo(
    () => (isLong ? [] : stretchesOf(text, placed, openId, patch)),
    [isLong, text, placed, openId, patch],
  );

  useEffect(() => {
    const area = field.current;
    if (!area || !wish) return;
    area.setSelectionRange(wish.start, wish.end);
    if (isLong)
      area.scrollTop = (area.scrollHeight * wish.start) / Math.max(1, area.value.length) - area.clientHeight / 3;
    else under.current?.querySelector('.count-open')?.scrollIntoView({ block: 'nearest' });
  }, [wish, isLong]);

  return (
    <div className={cx('count-paper relative grid', isLong ? 'h-full' : 'min-h-full')}>
      {!isLong && (
        <div ref={under} aria-hidden className={cx(FACE, 'pointer-events-none text-transparent select-none')}>
          {stretches.map((stretch, i) => (
            <span key={i} className={cx(stretch.isOpen && 'count-open', stretch.mark)}>
              {stretch.text}
            </span>
          ))}
          {'\u200b'}
        </div>
      )}
      <textarea
        ref={field}
        aria-label="The pattern as written"
        aria-describedby={describedBy}
        value={text}
        rows={1}
        spellCheck={false}
        autoCapitalize="off"
        autoComplete="off"
        placeholder={'Paste a line or a whole pattern here.\n\nR1: 6 sc in magic ring (6)\nR2: inc x 6 (12)'}
        className={cx(
          FACE,
          'size-full resize-none bg-transparent outline-none',
          isLong ? 'overflow-auto' : 'overflow-hidden',
        )}
        onChange={(event) => {
          written.write(event.target.value);
          pickAt(event.target.selectionStart);
        }}
        onSelect={(event) =>
          document.activeElement === event.currentTarget && pickAt(event.currentTarget.selectionStart)
        }
        onKeyDown={press}
      />
    </div>
  );
}
