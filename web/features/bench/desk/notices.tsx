import { X } from 'lucide-react';
import { IconButton } from '../../../ui/button.tsx';
import { useDesk } from './use-desk.ts';

/** What happened by itself and is worth a line: somebody else's change put together with one's own, say. */
export function Notices() {
  const { bench } = useDesk();
  if (bench.notices.length === 0) return null;
  return (
    <div role="status" className="flex-none border-b border-rule bg-sheet">
      {bench.notices.map(({ id, words }) => (
        <p key={id} className="bar flex items-center justify-between gap-3 py-1 pr-2 pl-5">
          {words}
          <IconButton icon={X} label="Put this away" onClick={() => bench.dismissNotice(id)} />
        </p>
      ))}
    </div>
  );
}
