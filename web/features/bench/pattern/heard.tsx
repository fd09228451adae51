import { Play } from 'lucide-react';
import { type Evidence } from '#contract/rows';
import { cx } from '../../../lib/class-names.ts';
import { Button } from '../../../ui/button.tsx';
import { useDesk } from '../desk/use-desk.ts';
import { hearLine, spanToHear } from '../desk/walking.ts';

const HEARD_ROLES: readonly Evidence['role'][] = ['work', 'unread', 'total'];

/** What was heard for the open line, word for word, what was not understood tacked; and the button that plays it. */
export function Heard({ lineId }: { lineId: string }) {
  const desk = useDesk();
  const heard = desk.pattern.evidence
    .filter((one) => one.lineId === lineId && HEARD_ROLES.includes(one.role))
    .sort((a, b) => a.firstWord - b.firstWord || b.lastWord - a.lastWord)
    // A total is often heard inside the words of the work: said once, it stands once.
    .filter(
      (one, i, all) => !all.slice(0, i).some((other) => other.lastWord >= one.lastWord && other.role !== 'unread'),
    );
  const span = spanToHear(desk, lineId);
  if (heard.length === 0 && !span) return null;
  return (
    <div className="flex min-h-[37px] items-center gap-3">
      <p className="said min-w-0 grow">
        {heard.length > 0 && (
          <>
            “
            {heard.map(({ id, words, role }, i) => (
              <span key={id}>
                {i > 0 && ' '}
                <span className={cx(role === 'unread' && 'tack')}>{words}</span>
              </span>
            ))}
            ”
          </>
        )}
      </p>
      {span && (
        <Button size="row" icon={Play} keys={['P']} onClick={() => hearLine(desk)} className="[&>svg]:size-[13px]">
          Hear it
        </Button>
      )}
    </div>
  );
}
