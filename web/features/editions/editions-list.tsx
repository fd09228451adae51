import { useState } from 'react';
import type { Edition } from '#contract/editions';
import { cx } from '../../lib/class-names.ts';
import { formatTouched } from '../../lib/time.ts';
import { Button } from '../../ui/button.tsx';
import { ErrorNote } from '../../ui/notes.tsx';
import { Field } from '../../ui/field.tsx';
import { useWithdraw } from './editions.queries.ts';

const stateOf = (edition: Edition) =>
  edition.withdrawnAt !== null ? 'withdrawn' : edition.isCurrent ? 'current' : 'replaced';

/** Every edition with its number, newest first; the chosen one's errata and files stand beside. */
export function EditionsList({
  editions,
  chosen,
  onChoose,
}: {
  editions: readonly Edition[];
  chosen: number;
  onChoose: (number: number) => void;
}) {
  return (
    <ol>
      {editions.map((edition) => {
        const state = stateOf(edition);
        return (
          <li
            key={edition.number}
            className={cx('border-b border-feint', edition.number === chosen && 'bar bg-woadwash')}
          >
            <button
              type="button"
              className="flex w-full gap-4 px-3.5 py-3 text-left"
              aria-pressed={edition.number === chosen}
              onClick={() => onChoose(edition.number)}
            >
              <span className="w-7 font-serif text-[30px] leading-9 font-semibold">{edition.number}</span>
              <span className="grow">
                <b className="block">{formatTouched(edition.publishedAt)}</b>
                <span className="block text-walnut2">
                  {edition.lines} lines{edition.publishedBy ? `, published by ${edition.publishedBy}` : ''}
                </span>
                <span className="block">
                  {edition.errata.length === 0
                    ? edition.number === 1
                      ? 'First print'
                      : 'Nothing told'
                    : `${edition.errata.length} told`}
                </span>
              </span>
              <span className={state === 'current' ? 'ruled-off h-fit font-bold' : 'text-walnut2'}>{state}</span>
            </button>
          </li>
        );
      })}
    </ol>
  );
}

/** Takes an edition back, or brings it back: asked once, in place, with the reason that its page will say. */
export function WithdrawRow({ patternId, edition }: { patternId: string; edition: Edition }) {
  const withdraw = useWithdraw(patternId);
  const [isAsking, setAsking] = useState(false);
  const [reason, setReason] = useState('');
  const isOut = edition.withdrawnAt === null;
  const trouble = withdraw.isError && <ErrorNote what="Nothing changed.">{withdraw.error.message}</ErrorNote>;
  if (!isOut) {
    return (
      <div className="grid gap-2">
        <p>
          <b>Withdrawn.</b> Its page says: <span className="wr">{edition.withdrawnReason}</span>
        </p>
        {trouble}
        <span>
          <Button
            disabled={withdraw.isPending}
            onClick={() => withdraw.mutate({ number: edition.number, reason: null })}
          >
            Bring edition {edition.number} back
          </Button>
        </span>
      </div>
    );
  }
  if (!isAsking) {
    return (
      <Button kind="harm" onClick={() => setAsking(true)}>
        Withdraw edition {edition.number}
      </Button>
    );
  }
  return (
    <form
      className="grid max-w-[560px] gap-2"
      onSubmit={(event) => {
        event.preventDefault();
        withdraw.mutate({ number: edition.number, reason }, { onSuccess: () => setAsking(false) });
      }}
    >
      <Field
        label="Why, for those who come with its sheet in hand"
        required
        maxLength={500}
        value={reason}
        onChange={({ target }) => setReason(target.value)}
        hint="Its page stays at its address, says this, and leads to the current edition. The clip is no longer played there."
      />
      {trouble}
      <span className="flex gap-2">
        <Button kind="harm" type="submit" disabled={withdraw.isPending || reason.trim() === ''}>
          Withdraw it
        </Button>
        <Button kind="quiet" onClick={() => setAsking(false)}>
          Keep it out
        </Button>
      </span>
    </form>
  );
}
