import { X } from 'lucide-react';
import { useEffect, useRef, useState } from 'react';
import { cx } from '../../../lib/class-names.ts';
import { IconButton } from '../../../ui/button.tsx';
import { TickBox } from '../../../ui/field.tsx';
import { useDesk } from '../desk/use-desk.ts';
import { LeftCheckRow } from './left-check-row.tsx';
import { OpenCheck } from './open-check.tsx';

/** The automatic checks over the whole pattern, worst first, each with its way to the line and its deed. */
export function ChecksPanel({ id }: { id: string }) {
  const { checks, showChecks } = useDesk();
  const { open, advice, left, isToy } = checks;
  const [wantsAdvice, setWantsAdvice] = useState(!isToy);
  const panel = useRef<HTMLElement>(null);
  // Whoever asks for the list is taken to it; what was settled is gone, so the hand goes back to the list's head.
  const takeUp = () => panel.current?.focus();
  useEffect(takeUp, []);
  const shown = wantsAdvice ? advice : [];
  return (
    <section
      id={id}
      ref={panel}
      tabIndex={-1}
      aria-labelledby={`${id}-heading`}
      className="flex max-h-[46%] flex-none flex-col border-b border-rule bg-chalk outline-none focus-visible:shadow-[inset_0_2px_var(--color-woad)] max-sm:max-h-none"
    >
      <div className="flex flex-none flex-wrap items-center gap-x-3 gap-y-1 border-b border-rule px-3.5 py-1.5">
        <h3 id={`${id}-heading`} className="h-panel">
          Automatic checks
        </h3>
        <span role="status" className="text-walnut2">
          {open.length} open, {left.length} left
        </span>
        <IconButton
          icon={X}
          label="Close the checks"
          className={cx('ml-auto sm:order-last', advice.length > 0 && 'sm:ml-0')}
          onClick={() => showChecks(false)}
        />
        {advice.length > 0 && (
          <span className="max-sm:order-last max-sm:w-full sm:ml-auto">
            <TickBox
              checked={wantsAdvice}
              onChange={(event) => setWantsAdvice(event.target.checked)}
              label={`Advice too (${advice.length})`}
            />
          </span>
        )}
      </div>
      <ul className="min-h-0 overflow-y-auto" aria-label="Findings">
        {open.map((check) => (
          <OpenCheck key={`${check.kind} ${check.subject}`} check={check} onSettled={takeUp} />
        ))}
        {shown.map((check) => (
          <OpenCheck key={`${check.kind} ${check.subject}`} check={check} onSettled={takeUp} />
        ))}
        {left.map((one) => (
          <LeftCheckRow key={one.left.id} check={one.check} left={one.left} onSettled={takeUp} />
        ))}
        {open.length + shown.length + left.length === 0 && (
          <li className="px-3.5 py-2.5 text-walnut2">Nothing is open.</li>
        )}
      </ul>
    </section>
  );
}
