import { useId, useState } from 'react';
import { printTotals, readTotals, type Totals } from '#crochet';
import { cx } from '../../../lib/class-names.ts';

const figuresOf = (totals: Totals | null) => (totals ? printTotals(totals) : '');

/**
 * A total as somebody types it: `24`, or `12 dc, 4 ch-2 sps`. What cannot be read as a count stays in the field and is said so;
 * the line keeps the total it had.
 */
export function TotalField(props: {
  name: string;
  voice: 'said' | 'written';
  totals: Totals | null;
  isOdd: boolean;
  readOnly: boolean;
  className?: string;
  onChange: (totals: Totals | null) => void;
}) {
  const { name, voice, totals, isOdd, readOnly, className, onChange } = props;
  const errorId = useId();
  const [draft, setDraft] = useState<string | null>(null);
  const shown = draft ?? figuresOf(totals);
  const isBad = draft !== null && draft.trim() !== '' && readTotals(draft) === null;
  return (
    <span className="relative block">
      <input
        aria-label={`Total ${voice}, ${name}`}
        aria-invalid={isBad}
        aria-describedby={isBad ? errorId : undefined}
        value={shown}
        readOnly={readOnly}
        inputMode="text"
        size={Math.max(2, shown.length)}
        placeholder="–"
        className={cx(
          'field tn text-right',
          voice === 'said' && 'italic',
          isOdd && !isBad && 'border-madder! font-bold text-madder',
          className,
        )}
        onFocus={(event) => event.target.select()}
        onChange={(event) => {
          setDraft(event.target.value);
          const read = readTotals(event.target.value);
          if (read || event.target.value.trim() === '') onChange(read);
        }}
        onBlur={() => !isBad && setDraft(null)}
        onKeyDown={(event) => event.key === 'Escape' && setDraft(null)}
      />
      {isBad && (
        <span
          id={errorId}
          role="alert"
          className="small absolute top-full right-0 z-10 mt-1 border border-madder bg-sheet px-2 py-1 whitespace-nowrap text-madder"
        >
          Not a count. A whole number, like 24.
        </span>
      )}
    </span>
  );
}
