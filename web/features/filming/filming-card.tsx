import { ChevronLeft, ChevronRight } from 'lucide-react';
import { useMemo, useState } from 'react';
import { type Pattern } from '#contract/patterns';
import { cx } from '../../lib/class-names.ts';
import { paths } from '../../lib/paths.ts';
import { type KeyMap, useKeys } from '../../lib/use-keys.ts';
import { PHONE, useMedia } from '../../lib/use-media.ts';
import { Icon } from '../../ui/icon.tsx';
import { LinkButton } from '../../ui/link-button.tsx';
import { EmptyPaper } from '../../ui/notes.tsx';
import { CardHead } from './card-head.tsx';
import { type CardLine, cardOf, lineAtNumber, linesToRead } from './card-lines.ts';
import { CardList } from './card-list.tsx';
import { CardNow } from './card-now.tsx';
import { CardPrint } from './card-print.tsx';
import { AWAKE_WORDS, useAwake } from './use-awake.ts';
import { SIZES, useKeptCard } from './use-card.ts';
import { useFullScreen } from './use-full-screen.ts';
import { useLight } from './use-light.ts';
import { useOnline } from './use-online.ts';
import { useTypedNumber } from './use-typed-number.ts';

const FIGURES = ['0', '1', '2', '3', '4', '5', '6', '7', '8', '9'];

/** Held in the hand it is read from nearer. */
const ON_PHONE = 0.6;

/** Every key that goes on, and every one that goes back: hands, and the pedals of a music stand. */
const ON = ['ArrowRight', 'ArrowDown', 'PageDown', 'Space', 'Enter'];
const BACK = ['ArrowLeft', 'ArrowUp', 'PageUp', 'Shift+Space', 'Backspace'];

const keysFor = (names: readonly string[], act: () => void): KeyMap =>
  Object.fromEntries(names.map((name) => [name, act]));

/** A written pattern to be read to the camera: one line large, the next under it. It needs no connection once open. */
export function FilmingCard({ pattern }: { pattern: Pattern }) {
  const pieces = useMemo(() => cardOf(pattern), [pattern]);
  const lines = useMemo(() => linesToRead(pieces), [pieces]);
  const [kept, keep] = useKeptCard(pattern.id);
  const [hasList, setList] = useState(false);
  const [isDark, turnLight] = useLight();
  const { turn } = useFullScreen();
  const isPhone = useMedia(PHONE);
  const found = lines.findIndex(({ id }) => id === kept.lineId);
  const at = Math.max(0, found);
  const line = lines[at];
  const piece = pieces.find(({ id }) => id === line?.pieceId);

  const goTo = (to: CardLine | undefined) => to && keep({ lineId: to.id });
  const setSize = (size: number) => keep({ size: Math.min(SIZES.length - 1, Math.max(0, size)) });
  const number = useTypedNumber((n) => goTo(lineAtNumber(lines, n, line?.pieceId)));
  const goOn = () => number.go() || goTo(lines[at + 1]);
  const goBack = () => goTo(lines[at - 1]);
  const keys: KeyMap = {
    ...keysFor(ON, goOn),
    ...keysFor(BACK, goBack),
    Home: () => goTo(lines[0]),
    End: () => goTo(lines.at(-1)),
    '+': () => setSize(kept.size + 1),
    '=': () => setSize(kept.size + 1),
    '-': () => setSize(kept.size - 1),
    L: () => setList(!hasList),
    D: turnLight,
    F: () => turn?.(),
    ...Object.fromEntries(FIGURES.map((figure) => [figure, () => number.type(figure)])),
  };
  useKeys(keys);

  return (
    <div className={cx('flex h-dvh flex-col bg-chalk text-walnut print:h-auto', isDark && 'dark')}>
      <CardHead
        patternId={pattern.id}
        title={pattern.title}
        terms={pattern.terms}
        place={line ? `${at + 1} of ${lines.length}` : ''}
        size={kept.size}
        isDark={isDark}
        hasList={hasList}
        onSize={setSize}
        onLight={turnLight}
        onList={() => setList(!hasList)}
      />
      {line && piece ? (
        <main className="flex min-h-0 grow print:hidden">
          <div className={cx('relative flex min-h-0 min-w-0 grow flex-col', hasList && 'max-sm:hidden')}>
            {number.typed !== '' && (
              <p
                role="status"
                className="absolute top-3 right-[5vw] rounded-2 bg-cloth px-4 py-2 text-[22px] leading-7 text-white"
              >
                Go to <b>{number.typed}</b>
              </p>
            )}
            <CardNow
              line={line}
              piece={piece}
              next={lines[at + 1]}
              size={SIZES[kept.size]! * (isPhone ? ON_PHONE : 1)}
            />
            <Turn at={at} lines={lines} onBack={goBack} onNext={() => goTo(lines[at + 1])} />
          </div>
          {hasList && (
            <CardList
              pieces={pieces}
              lineId={line.id}
              onGo={(lineId) => {
                keep({ lineId });
                if (isPhone) setList(false);
              }}
            />
          )}
        </main>
      ) : (
        <main className="grow print:hidden">
          <EmptyPaper
            title="Nothing to read yet"
            action={
              <LinkButton kind="primary" to={paths.bench(pattern.id)}>
                Write it at the bench
              </LinkButton>
            }
          >
            <p>The card shows what is written, round by round, large enough to read from where you film.</p>
          </EmptyPaper>
        </main>
      )}
      <CardPrint title={pattern.title} terms={pattern.terms} pieces={pieces} />
    </div>
  );
}

interface TurnProps {
  at: number;
  lines: readonly CardLine[];
  onBack: () => void;
  onNext: () => void;
}

/** Two keys as wide as a hand that holds yarn, and between them how the card stands. */
function Turn({ at, lines, onBack, onNext }: TurnProps) {
  const awake = AWAKE_WORDS[useAwake()];
  const isOnline = useOnline();
  const before = lines[at - 1];
  const next = lines[at + 1];
  return (
    <div className="grid flex-none grid-cols-[minmax(120px,1fr)_minmax(0,2fr)_minmax(180px,1.6fr)] items-center gap-4 border-t border-rule px-[5vw] py-3 max-sm:grid-cols-[1fr_1.6fr] max-sm:gap-3 max-sm:px-3.5 max-sm:pb-[max(12px,env(safe-area-inset-bottom))]">
      <button
        type="button"
        className="btn btn-dock"
        aria-keyshortcuts="ArrowLeft PageUp"
        aria-disabled={!before}
        onClick={onBack}
      >
        <Icon of={ChevronLeft} />
        <span className="sr-only">Before: </span>
        {before?.name ?? 'First'}
      </button>
      <p role="status" className="small text-center text-walnut2 max-sm:order-last max-sm:col-span-2">
        {isOnline ? awake : `Off line: the card goes on. ${awake}`}
      </p>
      <button
        type="button"
        className={cx('btn btn-dock', next && 'btn-primary')}
        aria-keyshortcuts="ArrowRight PageDown Space Enter"
        aria-disabled={!next}
        onClick={onNext}
      >
        <span className="sr-only">Next: </span>
        {next?.name ?? 'Last line'}
        {next && <Icon of={ChevronRight} />}
      </button>
    </div>
  );
}
