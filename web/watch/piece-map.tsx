import { useCallback, useMemo } from 'react';
import { PHONE, useMedia } from '../lib/use-media.ts';
import { useWidth } from '../lib/use-width.ts';
import { type RingLine } from '#crochet/shape';
import { RingMap } from '../parts/ring-map/ring-map.tsx';
import { Staff } from '../parts/ring-map/staff.tsx';
import { Neighbours } from './neighbours.tsx';
import { stepTotal, type Step } from './steps.ts';
import { useWatch } from './use-watch.ts';

const LARGEST_PX = 420;
const PHONE_PX = 212;

/** Rounds and rows of the piece and copy being worked; each round of a range is a ring of its own. */
const countedSteps = (steps: readonly Step[], { piece, copy }: Step) =>
  steps.filter((step) => step.piece === piece && step.copy === copy && step.round !== null && step.line.count !== null);

const countOf = ({ line, round }: Step) => line.rounds?.find(({ n }) => n === round)?.count ?? line.count;

function toRing(step: Step, done: ReadonlySet<string>): RingLine {
  return {
    id: step.key,
    label: String(step.round ?? ''),
    counts: [countOf(step)],
    // What goes out has been settled; a maker is shown where they are, not how the count came out.
    verdict: 'agrees',
    walk: step.line.walk,
    isDone: done.has(step.key),
  };
}

/** Where in the piece one is, and the way to anywhere in it: its ring map, or its staff where it is worked in rows. */
export function PieceMap() {
  const { steps, step, state, show } = useWatch();
  const [measure, width] = useWidth();
  const isPhone = useMedia(PHONE);
  const counted = useMemo(() => countedSteps(steps, step), [steps, step]);
  const lines = useMemo(() => counted.map((one) => toRing(one, state.done)), [counted, state.done]);
  const find = useCallback((key: string) => counted.find((one) => one.key === key), [counted]);
  const nameOf = useCallback(
    (key: string) => {
      const one = find(key);
      const total = one && stepTotal(one, state.terms);
      return one
        ? `${one.piece.worked === 'rows' ? 'Row' : 'Round'} ${one.round}, ${total === '' ? 'no total' : `${total} stitches`}${state.done.has(key) ? ', done' : ''}`
        : '';
    },
    [find, state.terms, state.done],
  );
  const open = useCallback(
    (key: string) => {
      const one = find(key);
      if (one) show(one);
    },
    [find, show],
  );
  const isRows = step.piece.worked === 'rows';
  const size = isPhone ? PHONE_PX : Math.min(LARGEST_PX, width);
  const title = `${step.piece.name}, ${counted.length} ${isRows ? 'rows' : 'rounds'}`;
  return (
    <div className="watch-map" ref={measure}>
      <div className="watch-map-and-next">
        {counted.length > 0 && size > 0 && (
          <div className="watch-map-picture">
            {isRows ? (
              <Staff
                lines={lines}
                openId={step.key}
                width={size}
                name={title}
                nameOf={nameOf}
                onOpen={open}
                isMirrored={state.mirrored}
              />
            ) : (
              <RingMap
                lines={lines}
                openId={step.key}
                size={size}
                name={title}
                nameOf={nameOf}
                onOpen={open}
                openWeight={isPhone ? 4 : 3.2}
                isMirrored={state.mirrored}
              />
            )}
          </div>
        )}
        {isPhone && <Neighbours />}
      </div>
      <MapFoot counted={counted} isRows={isRows} />
    </div>
  );
}

/** How far one is, and the other pieces. */
function MapFoot({ counted, isRows }: { counted: readonly Step[]; isRows: boolean }) {
  const { edition, steps, step, state, show } = useWatch();
  const done = counted.filter(({ key }) => state.done.has(key)).length;
  return (
    <div className="watch-map-foot">
      {counted.length > 0 && (
        <p>
          <b>
            {done} of {counted.length}
          </b>{' '}
          {isRows ? 'rows' : 'rounds'} done.
        </p>
      )}
      {counted.length > 0 && !isRows && <span>Rings are in working order, not in size.</span>}
      {edition.pieces.length > 1 && (
        <nav aria-label="Pieces" className="watch-pieces">
          {edition.pieces.map((piece) => {
            const first =
              steps.find((one) => one.piece === piece && !state.done.has(one.key)) ??
              steps.find((one) => one.piece === piece);
            const isHere = piece === step.piece;
            return (
              <button
                key={piece.id}
                type="button"
                className={isHere ? 'ruled-off font-bold' : 'link'}
                disabled={!first}
                aria-current={isHere ? 'true' : undefined}
                onClick={() => first && !isHere && show(first)}
              >
                {piece.name}
              </button>
            );
          })}
        </nav>
      )}
    </div>
  );
}
