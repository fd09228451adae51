import { type ReactNode } from 'react';
import { type Totals } from '#crochet';
import { formatClock } from '../../../lib/time.ts';
import { Figures } from '../../../parts/totals.tsx';
import { Button } from '../../../ui/button.tsx';
import { type Conflict, type Fields } from '../data/bench-types.ts';
import { useDesk } from '../desk/use-desk.ts';
import { conflictTitle, fieldWords } from './clash-words.ts';

/** Two saved the same row: both wordings with their totals, side by side. Nothing is lost until one is taken. */
export function ClashBox({ conflict }: { conflict: Conflict }) {
  const { bench, pick } = useDesk();
  const { savedBy, savedAt, theirs, kind, rowId } = conflict;
  const who = savedBy ?? 'Somebody';
  const when = savedAt ? ` at ${formatClock(savedAt)}` : '';
  return (
    <div role="alert" className="error-box mx-3.5 my-2.5">
      <p className="mb-2">
        <b className="text-madder">
          {theirs
            ? `${who} saved ${conflictTitle(conflict)}${when} while you wrote it.`
            : `${who} deleted ${conflictTitle(conflict)}${when}.`}
        </b>{' '}
        Both are kept until you take one.
      </p>
      <div className="grid gap-3 sm:grid-cols-2">
        <Side title="Theirs" row={theirs} conflict={conflict}>
          <Button size="row" onClick={() => bench.resolve(conflict.id, 'theirs')}>
            Take theirs
          </Button>
        </Side>
        <Side title="Mine" row={conflict.mine} conflict={conflict}>
          <Button
            size="row"
            onClick={() => {
              bench.resolve(conflict.id, 'mine');
              if (kind === 'line') pick(rowId, true);
            }}
          >
            Keep mine
          </Button>
        </Side>
      </div>
    </div>
  );
}

/** One side: of a line its instruction and total as they would stand, of other rows each field that clashes. */
function Side({
  title,
  row,
  conflict,
  children,
}: {
  title: string;
  row: Fields | null;
  conflict: Conflict;
  children: ReactNode;
}) {
  const clashing = conflict.fields.filter((field) => field.clashes);
  const isLine = conflict.kind === 'line' && row !== null;
  return (
    <div className="flex flex-col border border-feint bg-field p-2.5">
      <p className="label">{title}</p>
      {isLine && (
        <p className="wr mb-2 flex justify-between gap-3">
          <span className="min-w-0 break-words">{printValue(row.text)}</span>
          <span className="tn">
            <Figures totals={(row.written ?? null) as Totals | null} />
          </span>
        </p>
      )}
      {row === null && <p className="mb-2 text-walnut2">It is gone.</p>}
      {row !== null &&
        clashing
          .filter(({ field }) => !isLine || (field !== 'text' && field !== 'written'))
          .map(({ field }) => (
            <p key={field} className="mb-2 break-words">
              <span className="text-walnut2">{fieldWords(field)}: </span>
              {printValue(row[field])}
            </p>
          ))}
      <div className="mt-auto">{children}</div>
    </div>
  );
}

function printValue(value: unknown): ReactNode {
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'string' || typeof value === 'number') return value === '' ? 'nothing' : String(value);
  return value === null || value === undefined ? 'nothing' : <Figures totals={value as Totals} />;
}
