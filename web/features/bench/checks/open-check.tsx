import { useState } from 'react';
import { Link } from 'react-router-dom';
import { type Check } from '#crochet';
import { paths } from '../../../lib/paths.ts';
import { Button } from '../../../ui/button.tsx';
import { Field } from '../../../ui/field.tsx';
import { useDesk } from '../desk/use-desk.ts';
import { leaveCheck, mendCheck } from './check-deeds.ts';
import { CheckWords } from './check-refs.tsx';

/** One open finding: where it is, what it says, the deed that mends it, and leaving it as it is. */
export function OpenCheck({ check, onSettled }: { check: Check; onSettled: () => void }) {
  const desk = useDesk();
  const [isLeaving, setLeaving] = useState(false);
  const { mend, place } = check;
  const { mayEdit, id } = desk.pattern;
  return (
    <li className="grid grid-cols-[24px_minmax(0,1fr)] gap-x-1 border-b border-feint px-3.5 py-2">
      <span aria-hidden className="mt-[3px] size-3.5 rounded-[2px] border border-edge bg-field" />
      <div>
        <CheckWords check={check} />
        {isLeaving ? (
          <LeaveForm
            onCancel={() => setLeaving(false)}
            onLeave={(reason) => {
              leaveCheck(desk, check, reason);
              onSettled();
            }}
          />
        ) : (
          <div className="mt-0.5 flex flex-wrap items-center gap-x-4.5 gap-y-1">
            {mend && mayEdit && (
              <button
                type="button"
                className="link"
                onClick={() => {
                  mendCheck(desk, mend);
                  onSettled();
                }}
              >
                {mend.words}
              </button>
            )}
            {place === 'sheet' && (
              <Link className="link" to={paths.sheet(id)}>
                To the sheet
              </Link>
            )}
            {mayEdit && !check.isAdvice && (
              <button type="button" className="link" onClick={() => setLeaving(true)}>
                Leave as it is
              </button>
            )}
          </div>
        )}
      </div>
    </li>
  );
}

/** Why it stays; the reason is the studio's own. */
function LeaveForm({ onLeave, onCancel }: { onLeave: (reason: string) => void; onCancel: () => void }) {
  const [reason, setReason] = useState('');
  const isSaid = reason.trim() !== '';
  return (
    <form
      className="mt-1.5 flex flex-wrap items-end gap-x-2.5 gap-y-1.5"
      onSubmit={(event) => {
        event.preventDefault();
        if (isSaid) onLeave(reason.trim());
      }}
      onKeyDown={(event) => {
        if (event.key !== 'Escape') return;
        event.stopPropagation();
        onCancel();
      }}
    >
      <div className="min-w-[220px] grow">
        <Field
          label="It stays as it is, because"
          autoFocus
          maxLength={500}
          value={reason}
          onChange={(event) => setReason(event.target.value)}
        />
      </div>
      <Button type="submit" notYet={isSaid ? undefined : 'Say in a few words why it stays'}>
        Leave it
      </Button>
      <Button kind="quiet" onClick={onCancel}>
        Cancel
      </Button>
    </form>
  );
}
