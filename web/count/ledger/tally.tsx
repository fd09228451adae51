import { ArrowDown } from 'lucide-react';
import { useMemo } from 'react';
import { VerdictLabel, VERDICTS } from '../../parts/verdict-mark.tsx';
import { Button } from '../../ui/button.tsx';
import { isCounted, wantsLook } from '../find-row.ts';
import { canWriteTotal } from '../offers.ts';
import { useDesk } from '../use-desk.ts';

/** How many lines came out how, worst first, the way to the next that wants a look, and what is offered for all of them. */
export function Tally() {
  const { placed, walk } = useDesk();
  const { tally, n, asks, looks } = useMemo(() => {
    const rows = placed.map(({ row }) => row).filter(isCounted);
    return {
      n: rows.length,
      asks: rows.filter((row) => row.asks.length > 0).length,
      looks: rows.filter(wantsLook).length,
      tally: VERDICTS.map((verdict) => ({ verdict, n: rows.filter((row) => row.verdict === verdict).length })).filter(
        (one) => one.n > 0,
      ),
    };
  }, [placed]);
  return (
    <div className="panel-head flex-wrap gap-x-5 gap-y-1 bg-chalk py-1 print:border-t">
      <h2 className="h-panel">{n === 0 ? 'Worked out' : `${n} ${n === 1 ? 'line' : 'lines'}`}</h2>
      <ul aria-label="Verdicts" className="contents">
        {tally.map(({ verdict, n: many }) => (
          <li key={verdict}>
            <VerdictLabel verdict={verdict}>
              <b className="ml-1.5 text-walnut">{many}</b>
            </VerdictLabel>
          </li>
        ))}
        {asks > 0 && (
          <li className="text-weld">
            to ask<b className="ml-1.5 text-walnut">{asks}</b>
          </li>
        )}
      </ul>
      {looks > 0 && (
        <Button
          kind="quiet"
          size="row"
          icon={ArrowDown}
          keys={['N']}
          className="ml-auto print:hidden"
          onClick={() => walk()}
        >
          Next
        </Button>
      )}
    </div>
  );
}

/** Offers for the whole text, each one change that can be undone. */
export function WholeOffers() {
  const { placed, counting, patch, writeTotals, takeHouseStyle } = useDesk();
  const missing = useMemo(() => placed.filter(({ row }) => canWriteTotal(row)).length, [placed]);
  const { house, result, isBusy } = counting;
  const styled = house && house.seq === result?.seq ? house.changes.length : 0;
  if (isBusy || patch || (missing < 2 && styled === 0)) return null;
  return (
    <div className="flex flex-wrap items-center gap-x-4 gap-y-1 border-b border-feint px-3.5 py-1.5 print:hidden">
      {missing > 1 && (
        <Button size="row" onClick={writeTotals}>
          Write {missing} missing totals
        </Button>
      )}
      {styled > 0 && (
        <Button size="row" onClick={takeHouseStyle}>
          House style for {styled} {styled === 1 ? 'line' : 'lines'}
        </Button>
      )}
      <span className="small text-walnut2">Each is one change. Undo takes it back.</span>
    </div>
  );
}
