import { ChevronLeft, ChevronRight, Play } from 'lucide-react';
import { Button } from '../../../ui/button.tsx';
import { Icon } from '../../../ui/icon.tsx';
import { lineName } from '../desk/line-name.ts';
import { type Desk, useDesk } from '../desk/use-desk.ts';
import { hearLine, spanToHear } from '../desk/walking.ts';

/** Line before, hear this one, line after: above the safe area, under the thumb. */
export function PhoneDock() {
  const desk = useDesk();
  const { lines } = desk.pattern;
  const at = lines.findIndex((line) => line.id === desk.lineId);
  const before = lines[at - 1];
  const here = lines[at];
  const after = lines[at + 1];
  const go = (lineId: string) => () => {
    desk.pick(lineId, true);
    desk.goTo(lineId);
  };
  const canHear = here !== undefined && spanToHear(desk, here.id) !== null;
  return (
    <nav
      aria-label="Lines"
      className="sticky bottom-0 z-20 grid grid-cols-[84px_1fr_84px] gap-2 border-t border-rule bg-sheet px-3.5 pt-2.5 pb-[max(10px,env(safe-area-inset-bottom))]"
    >
      <Button
        size="dock"
        className="gap-1! px-0! text-[15px]!"
        {...(before ? { onClick: go(before.id) } : { notYet: 'This is the first line' })}
      >
        <Icon of={ChevronLeft} />
        {before ? nameOf(before) : ''}
      </Button>
      <Button
        size="dock"
        icon={Play}
        {...(canHear
          ? { onClick: () => hearLine(desk) }
          : { notYet: here ? 'This line has no moment' : 'No line is open' })}
      >
        Hear {here ? nameOf(here) : 'it'}
      </Button>
      <Button
        size="dock"
        className="gap-1! px-0! text-[15px]!"
        {...(after ? { onClick: go(after.id) } : { notYet: 'This is the last line' })}
      >
        {after ? nameOf(after) : ''}
        <Icon of={ChevronRight} />
      </Button>
    </nav>
  );
}

const nameOf = (line: Desk['pattern']['lines'][number]) => lineName(line) || line.kind;
