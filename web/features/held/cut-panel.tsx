import { useState } from 'react';
import { type NewCut, type Shift } from '#contract/held';
import { formatMoment, parseMoment } from '../../lib/time.ts';
import { Arrow } from '../../ui/icon.tsx';
import { Button } from '../../ui/button.tsx';
import { Field, TickBox } from '../../ui/field.tsx';
import { Switch } from '../../ui/switch.tsx';
import { type HeldDeeds } from './held.queries.ts';

interface CutPanelProps {
  cut: NewCut;
  deeds: HeldDeeds;
  isBusy: boolean;
  onDone: (words: string) => void;
}

const some = (n: number, one: string) => `${n} ${n === 1 ? one : `${one}s`}`;

/** "7.2 s earlier", "stays". */
export function shiftWords(byMs: number): string {
  const tenths = Math.round(Math.abs(byMs) / 100);
  if (tenths === 0) return 'where it was';
  return `${(tenths / 10).toFixed(1)} s ${byMs < 0 ? 'earlier' : 'later'}`;
}

/** Below this share of words in common it is no other cut of the same recording. */
const ANOTHER = 0.2;

function Shifts({ shifts, lost }: { shifts: readonly Shift[]; lost: number }) {
  return (
    <ul className="my-2">
      {shifts.map(({ fromMs, byMs }) => (
        <li key={fromMs} className="flex justify-between border-b border-feint py-1">
          <span>from {formatMoment(fromMs)}</span>
          <b>{shiftWords(byMs)}</b>
        </li>
      ))}
      {lost > 0 && (
        <li className="py-1 font-medium">
          {some(lost, 'moment')} {lost === 1 ? 'falls' : 'fall'} into what was cut out.
        </li>
      )}
    </ul>
  );
}

function Part({ part, cut, deeds, isBusy, onDone }: CutPanelProps & { part: NewCut['parts'][number] }) {
  const [removeCutOut, setRemove] = useState(true);
  const lost = part.moments.filter(({ wouldMs }) => wouldMs === null);
  const held = isBusy ? { notYet: 'One moment.' } : {};
  const take = (how: 'words' | 'stand') =>
    deeds.cut.mutate(
      { lastChange: cut.lastChange, ...(how === 'words' ? { how, removeCutOut } : { how }) },
      {
        onSuccess: ({ taken }) =>
          onDone(how === 'words' ? `${some(taken, 'moment')} followed` : 'The moments stay where they are'),
      },
    );
  if (part.found < ANOTHER) {
    return (
      <p className="pb-2">
        Hardly a word of <b>{part.fileName}</b> is in <b>{cut.newestFileName}</b>: this seems to be another recording.
        Add it as a recording of its own on the page before, and part two adds its own moments.
      </p>
    );
  }
  return (
    <>
      <p>
        {some(part.moments.length, 'moment')} stand by the words of <b>{part.fileName}</b>. In{' '}
        <b>{cut.newestFileName}</b> these words come:
      </p>
      <Shifts shifts={part.shifts} lost={lost.length} />
      <details className="mb-2">
        <summary className="link inline-block cursor-pointer">Each moment</summary>
        <ul className="mt-1.5">
          {part.moments.map(({ markId, name, isMs, wouldMs }) => (
            <li key={markId} className="flex items-baseline gap-2 border-b border-feint py-0.5">
              <b className="w-14">{name}</b>
              <span>{formatMoment(isMs)}</span>
              <Arrow />
              <span>{wouldMs === null ? 'cut out' : formatMoment(wouldMs)}</span>
            </li>
          ))}
        </ul>
      </details>
      {cut.mayTake && (
        <>
          {lost.length > 0 && (
            <TickBox
              className="mb-2"
              label={`Take away the ${lost.length === 1 ? 'moment that was' : `${lost.length} moments that were`} cut out`}
              checked={removeCutOut}
              onChange={({ target }) => setRemove(target.checked)}
            />
          )}
          <div className="flex flex-wrap gap-2">
            <Button kind="primary" onClick={() => take('words')} {...held}>
              Let the moments follow
            </Button>
            <Button kind="quiet" onClick={() => take('stand')} {...held}>
              They stand right
            </Button>
          </div>
        </>
      )}
    </>
  );
}

/** Moves every moment from one on by as much as was typed. */
function ByHand({ cut, deeds, isBusy, onDone }: CutPanelProps) {
  const [by, setBy] = useState('');
  const [from, setFrom] = useState('0:00');
  const [way, setWay] = useState<'earlier' | 'later'>('earlier');
  const byMs = parseMoment(by);
  const fromMs = parseMoment(from);
  const isReady = byMs !== null && byMs > 0 && fromMs !== null;
  const move = () =>
    isReady &&
    deeds.cut.mutate(
      { how: 'hand', lastChange: cut.lastChange, byMs: way === 'earlier' ? -byMs : byMs, fromMs },
      { onSuccess: ({ taken }) => onDone(`${some(taken, 'moment')} moved`) },
    );
  const notYet = isBusy ? 'One moment.' : isReady ? undefined : 'Type by how much, as in 7.2 or 1:04.';
  return (
    <div className="border-t border-feint pt-3">
      <h3 className="mb-2 font-bold">By hand</h3>
      <div className="flex flex-wrap items-end gap-3">
        <div className="w-24">
          <Field
            label="By"
            placeholder="7.2"
            inputMode="decimal"
            value={by}
            onChange={({ target }) => setBy(target.value)}
          />
        </div>
        <Switch
          label="Which way"
          value={way}
          options={[
            { value: 'earlier', label: 'earlier' },
            { value: 'later', label: 'later' },
          ]}
          onChange={setWay}
        />
        <div className="w-24">
          <Field label="From" value={from} onChange={({ target }) => setFrom(target.value)} />
        </div>
        <Button onClick={move} notYet={notYet}>
          Move
        </Button>
      </div>
    </div>
  );
}

/** Moments of a recording that came in a new cut: what moved by how much, before it is taken. */
export function CutPanel(props: CutPanelProps) {
  const { cut } = props;
  return (
    <section aria-labelledby="cut-heading" className="border-t border-rule">
      <header className="panel-head bg-chalk">
        <h2 id="cut-heading" className="h-panel">
          A new cut
        </h2>
        <span className="small ml-auto text-walnut2">{some(cut.moments, 'moment')}</span>
      </header>
      <div className="flex flex-col gap-3 px-3.5 py-3">
        {cut.parts.length === 0 && (
          <p className="text-walnut2">
            {cut.moments === 0
              ? 'No moments yet. When there are, and a new cut or a better transcript comes, they follow their words.'
              : 'Every moment stands by the newest words. When a new cut or a better transcript comes, what moved is shown here.'}
          </p>
        )}
        {cut.parts.map((part) => (
          <div key={part.transcriptId}>
            <Part {...props} part={part} />
          </div>
        ))}
        {cut.mayTake && cut.moments > 0 && <ByHand {...props} />}
      </div>
    </section>
  );
}
