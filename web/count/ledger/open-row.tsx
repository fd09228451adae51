import { useState } from 'react';
import { MarkedText } from '../../parts/marked-text.tsx';
import { Suggestion } from '../../parts/suggestion.tsx';
import { cx } from '../../lib/class-names.ts';
import { Button } from '../../ui/button.tsx';
import { isCounted } from '../find-row.ts';
import { useDesk } from '../use-desk.ts';
import { type Row } from '../worker/protocol.ts';
import { GRID, VerdictCell, WorkedCell, WrittenCell } from './row-cells.tsx';

/** What the line works into and what it makes, in words: "Works into 24, makes 18." */
function Worked({ row }: { row: Row }) {
  if (!isCounted(row) || row.count === null) return null;
  const kinds = Object.entries(row.made);
  const made = kinds.length > 1 ? ` (${kinds.map(([kind, n]) => `${n} ${kind}`).join(', ')})` : '';
  return (
    <p className="text-walnut2">
      {row.base !== null && `Works into ${row.base}. `}Makes {row.count}
      {made}.
    </p>
  );
}

function Offers({ row }: { row: Row }) {
  const { offers, takeOffer, placed, counting, patch } = useDesk();
  const [shown, setShown] = useState(0);
  const offer = offers[shown % Math.max(1, offers.length)];
  if (!offer || counting.isBusy || patch) return null;
  const other = offer.lineId === row.id ? undefined : placed.find((one) => one.row.id === offer.lineId)?.row.name;
  return (
    <div className="pb-2">
      <Suggestion repair={offer} lineName={other ?? null} onUse={() => takeOffer(offer)}>
        {offers.length > 1 && (
          <Button kind="quiet" onClick={() => setShown(shown + 1)}>
            Another way
          </Button>
        )}
      </Suggestion>
    </div>
  );
}

/** The line in hand: what is wrong, what has to be asked, and what would mend it. */
export function OpenRow({ row, onClose }: { row: Row; onClose: () => void }) {
  const { pick } = useDesk();
  const isWrong = row.verdict === 'unread' || row.verdict === 'does-not-fit' || row.verdict === 'differs';
  return (
    <section
      aria-label={`${row.name || row.kind}, open`}
      data-line={row.id}
      tabIndex={-1}
      className="bar relative z-[1] -mt-px border-y-[1.5px] border-woad bg-sheet outline-offset-[-2px]"
    >
      <div className={cx(GRID, !isCounted(row) && row.kind !== 'foundation' && 'count-quiet')}>
        <span className="count-name truncate font-bold">{row.name}</span>
        <span className="count-words wr text-[17px]!">
          <MarkedText text={row.text} count={row} />
        </span>
        <WrittenCell row={row} />
        <WorkedCell row={row} />
        <VerdictCell row={row} />
      </div>
      <div className="count-indent flex flex-col gap-1.5 pt-1 pb-1.5">
        {row.message && isCounted(row) && isWrong && (
          <p role="status" className={row.verdict === 'unread' ? 'text-weld' : 'text-madder'}>
            {row.message}
          </p>
        )}
        {!isWrong && <Worked row={row} />}
        {row.asks.map((ask) => (
          <p key={ask.text} className="border-l-4 border-double border-weld pl-2.5">
            <b className="text-weld">To ask:</b> {ask.text}
          </p>
        ))}
        {row.uncertain && <p className="text-walnut2">{row.uncertain}</p>}
      </div>
      <div className="count-indent">
        <Offers key={row.id} row={row} />
      </div>
      <div className="flex min-h-[36px] items-center justify-end gap-x-2 border-t border-feint px-3.5 py-1 print:hidden">
        <Button kind="quiet" size="row" onClick={() => pick(row.id, true)}>
          Show in the text
        </Button>
        <Button size="row" onClick={onClose}>
          Close
        </Button>
      </div>
    </section>
  );
}
