import { ChevronLeft, ChevronRight } from 'lucide-react';
import { Button } from '../ui/button.tsx';
import { stepName } from './steps.ts';
import { TickRing } from './tick-ring.tsx';
import { useWatch } from './use-watch.ts';

/** Under the thumb on a phone: back, tick off, on. */
export function Dock() {
  const { step, state, before, next, show, act } = useWatch();
  const isDone = state.done.has(step.key);
  const name = stepName(step);
  return (
    <div className="watch-dock" role="group" aria-label="Where you are">
      <Button size="dock" icon={ChevronLeft} disabled={!before} onClick={() => before && show(before)}>
        {before ? stepName(before) : ''}
        <span className="sr-only">{before ? ', back to it' : 'This is the first'}</span>
      </Button>
      <button type="button" className="watch-dock-tick" onClick={() => act({ kind: 'tick' })}>
        {/* A new ring for each step: its marker goes round once as the step before was ticked. */}
        <TickRing key={step.key} stitches={step.line.count ?? 12} size={66}>
          {step.round === null ? '' : String(step.round)}
        </TickRing>
        <span>{isDone ? (next ? `On from ${name}` : 'All ticked') : `Tick off ${name}`}</span>
      </button>
      <Button size="dock" disabled={!next} onClick={() => next && show(next)}>
        {next ? stepName(next) : ''}
        <span className="sr-only">{next ? ', on to it' : 'This is the last'}</span>
        <ChevronRight size={18} strokeWidth={1.4} aria-hidden />
      </Button>
    </div>
  );
}
