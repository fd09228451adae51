import { Button } from '../ui/button.tsx';
import { PieceMap } from './piece-map.tsx';
import { placeText, stepName, stepTotal } from './steps.ts';
import { TermsLine } from './terms-line.tsx';
import { TickRing } from './tick-ring.tsx';
import { useWatch } from './use-watch.ts';

/** Long instructions step down, and never below a size that can be read from across a table. */
const sizeOf = (text: string) => (text.length <= 24 ? 'large' : text.length <= 48 ? 'middle' : 'small');

/** The line being worked, large; the one big deed under it; the map of the piece. */
export function Work() {
  const { step, state } = useWatch();
  const { line } = step;
  const text = line.text[state.terms];
  const total = stepTotal(step, state.terms);
  const note = line.note[state.terms];
  const isRange = line.from !== null && line.to !== null && line.to > line.from;
  return (
    <>
      <div aria-live="polite">
        <p className="watch-where">
          <b>{placeText(step)}</b>
          {isRange && <span>in {line.label}</span>}
          {total !== '' && /^\d+$/.test(total) && <span className="watch-unit">stitches</span>}
        </p>
        <p className={`watch-now watch-now-${line.kind} watch-now-${sizeOf(text)}`}>
          <span>{text}</span> <strong className="tn">{total}</strong>
        </p>
      </div>
      <TermsLine />
      {note !== '' && <p className="watch-note">{note}</p>}
      <TickButton />
      <PieceMap />
    </>
  );
}

/** Ticks off the step and goes on. At a step that is done it only goes on. */
function TickButton() {
  const { step, state, act, next } = useWatch();
  const isDone = state.done.has(step.key);
  const isAll = isDone && !next;
  return (
    <div className="watch-tick-row">
      <Button kind="primary" className="watch-tick" keys={['Enter']} onClick={() => act({ kind: 'tick' })}>
        <TickRing stitches={step.line.count ?? 12} size={32} />
        {isAll ? 'All ticked' : isDone ? `On from ${stepName(step)}` : `Tick off ${stepName(step)}`}
      </Button>
      {isDone && (
        <Button kind="quiet" onClick={() => act({ kind: 'mark', keys: [step.key], done: false })}>
          Take the tick off {stepName(step)}
        </Button>
      )}
    </div>
  );
}
