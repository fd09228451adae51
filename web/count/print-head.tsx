import { Mark } from '../parts/mark.tsx';
import { useDesk } from './use-desk.ts';

/** On paper alone: what was counted, and in which terms. */
export function PrintHead() {
  const { counting } = useDesk();
  const counted = counting.result?.counted;
  if (!counted) return null;
  return (
    <div className="hidden items-baseline gap-3 pb-2 print:flex">
      <Mark size={22} />
      <p className="h-page">{counted.title ?? 'A written pattern'}</p>
      <p>{counted.terms} terms. Counted with Roundelay.</p>
    </div>
  );
}
