import { type ChosenWords } from './choose-words.ts';
import { Fragment, memo } from 'react';
import { cx } from '../../../lib/class-names.ts';
import { formatMoment } from '../../../lib/time.ts';
import { KnotShape } from '../../../parts/thread/strands.tsx';
import { type Caption, type Stretch, stretchesOf, type WordSense } from './captions.ts';

export interface CaptionRowProps {
  caption: Caption;
  senses: ReadonlyMap<number, WordSense>;
  isSpoken: boolean;
  isPast: boolean;
  /** One caption at a time is a stop of the Tab key: the spoken one, which Page Up and Page Down walk. */
  isStop: boolean;
  /** A line's moment begins here: its knot stands in the margin. */
  knot: 'chosen' | 'other' | null;
  /** The line in hand: its words are drawn stronger. */
  lineId: string | null;
  /** The found words, while somebody looks for some. */
  found: 'here' | 'elsewhere' | null;
  /** Words that somebody chose, where some of them are here. */
  chosen: ChosenWords | null;
  onSeek: (toMs: number) => void;
  onSense: (lineId: string, atMs: number) => void;
}

/** A caption as it was spoken: its time goes there, its underlined words lead to the line they are evidence of. */
export const CaptionRow = memo(function CaptionRow(props: CaptionRowProps) {
  const { caption, senses, isSpoken, isPast, isStop, knot, found, chosen, onSeek } = props;
  return (
    <li
      data-caption={caption.id}
      aria-current={isSpoken ? 'true' : undefined}
      className={cx(
        'grid grid-cols-[50px_18px_1fr] py-[5px] pr-4 pl-3.5',
        // A recording of hours has thousands of captions: those out of sight are not drawn.
        '[contain-intrinsic-size:auto_54px] [content-visibility:auto]',
        isSpoken && 'bar bg-woadwash',
        found === 'here' && 'bg-weldwash',
      )}
    >
      <button
        type="button"
        tabIndex={isStop ? 0 : -1}
        className="small self-start text-left leading-[22px]! text-walnut3 hover:text-woad max-sm:min-h-11"
        onClick={() => onSeek(caption.startMs)}
      >
        {formatMoment(caption.startMs)}
      </button>
      <span>
        {knot && (
          <svg width="9" height="12" viewBox="-4.5 0 9 12" className="mt-[5px]" role="img" aria-label="marked here">
            <KnotShape y={6} colour={knot === 'chosen' ? 'var(--color-now)' : 'var(--color-edge)'} />
          </svg>
        )}
      </span>
      <p className={cx('said', isPast && 'text-walnut2')}>
        {stretchesOf(caption.words, senses, chosen).map((stretch, i) => (
          <Fragment key={i}>
            {i > 0 && ' '}
            <StretchOfWords stretch={stretch} {...props} />
          </Fragment>
        ))}
      </p>
    </li>
  );
});

const CHOSEN = 'bg-weldfill text-walnut';

/** A drawn selection ends with a click that means nothing else. */
const isChoosing = () => document.getSelection()?.isCollapsed === false;

const ROLES: Record<WordSense['role'], string> = {
  announcement: 'where its round is named',
  work: 'what it is worked from',
  total: 'its total',
  unread: 'not understood',
};

/** Words of one sense: evidence is a button to its line, the rest goes to its place in the clip. */
function StretchOfWords({ stretch, caption, isStop, lineId, onSeek, onSense }: { stretch: Stretch } & CaptionRowProps) {
  const text = stretch.words.map((word) => word.text).join(' ');
  const { sense } = stretch;
  const first = stretch.words[0];
  if (!sense || !first) {
    return (
      <span
        data-at={stretch.at}
        className={cx('cursor-pointer', stretch.isChosen && CHOSEN)}
        onClick={() => isChoosing() || onSeek(momentOfWord(caption, first?.text ?? ''))}
      >
        {text}
      </span>
    );
  }
  // A link, not a button: links break over lines as words do.
  return (
    <a
      href={`?line=${sense.lineId}`}
      title={ROLES[sense.role]}
      data-at={stretch.at}
      draggable={false}
      tabIndex={isStop ? 0 : -1}
      className={cx(
        'hover:text-woad',
        sense.role === 'unread' ? 'tack' : 'border-b border-woad',
        sense.lineId === lineId && sense.role !== 'unread' && 'border-b-2',
        stretch.isChosen && CHOSEN,
      )}
      onClick={(event) => {
        event.preventDefault();
        if (isChoosing()) return;
        onSense(sense.lineId, momentOfWord(caption, first.text));
      }}
    >
      {text}
    </a>
  );
}

/** When a word was spoken, as near as a caption tells: its share of the caption by length. */
function momentOfWord(caption: Caption, word: string): number {
  const at = Math.max(0, caption.text.indexOf(word));
  return Math.round(caption.startMs + (caption.endMs - caption.startMs) * (at / Math.max(1, caption.text.length)));
}
