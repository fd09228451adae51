import { ArrowDown } from 'lucide-react';
import { VerdictLabel } from '../../../parts/verdict-mark.tsx';
import { Button, IconButton } from '../../../ui/button.tsx';
import { tallyVerdicts } from '../desk/bench-count.ts';
import { useDesk } from '../desk/use-desk.ts';
import { walkFaults } from '../desk/walking.ts';

/** How many lines came out how, worst first, and the way to the next that wants a look. */
export function Tally({ checksId }: { checksId: string }) {
  const desk = useDesk();
  const tally = tallyVerdicts(desk.pattern.lines, desk.counts);
  const n = desk.pattern.lines.length;
  const left = tally.filter(({ verdict }) => verdict !== 'agrees').reduce((sum, one) => sum + one.n, 0);
  return (
    <div className="panel-head flex-wrap gap-x-5 gap-y-1 bg-chalk py-1 max-sm:min-h-11 max-sm:gap-x-2 max-sm:px-3 max-sm:py-0 max-sm:tracking-[-0.1px]">
      <b className="max-sm:hidden">
        {n} {n === 1 ? 'line' : 'lines'}
      </b>
      <ul aria-label="Verdicts" className="contents">
        {tally.map(({ verdict, n: many }) => (
          <li
            key={verdict}
            className={verdict === 'agrees' || verdict === 'no-total' ? 'max-sm:hidden' : 'max-sm:[&>span]:gap-1'}
          >
            <VerdictLabel verdict={verdict}>
              <b className="ml-1.5 text-walnut">{many}</b>
            </VerdictLabel>
          </li>
        ))}
      </ul>
      <span className="grow" />
      <Button
        kind="quiet"
        size="row"
        keys={['C']}
        aria-expanded={desk.isChecking}
        aria-controls={desk.isChecking ? checksId : undefined}
        className="-mx-2 text-walnut2! max-sm:[&_kbd]:hidden"
        onClick={() => desk.showChecks(!desk.isChecking)}
      >
        Checks <b className="text-walnut">{desk.checks.open.length}</b>
      </Button>
      {left > 0 && (
        <>
          <Button
            kind="quiet"
            size="row"
            keys={['N']}
            className="-mr-2 text-walnut2! max-sm:hidden"
            onClick={() => walkFaults(desk)}
          >
            Next
          </Button>
          <IconButton
            icon={ArrowDown}
            label="Next line to look at"
            className="-mr-2 min-w-9! text-woad sm:hidden"
            onClick={() => walkFaults(desk)}
          />
        </>
      )}
    </div>
  );
}
