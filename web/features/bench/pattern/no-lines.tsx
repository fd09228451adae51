import { Plus } from 'lucide-react';
import { Link } from 'react-router-dom';
import { paths } from '../../../lib/paths.ts';
import { Button } from '../../../ui/button.tsx';
import { EmptyPaper } from '../../../ui/notes.tsx';
import { useDesk } from '../desk/use-desk.ts';

/** Nothing written yet: the first step stands on the first line. */
export function NoLines() {
  const { pattern, bench, pick } = useDesk();
  if (!pattern.mayEdit) return <EmptyPaper title="Nothing written yet" />;
  const begin = () => {
    const pieceId = bench.add('piece', { name: 'Body' });
    pick(bench.add('line', { pieceId, kind: 'round', from: 1, to: 1, text: '' }), true);
  };
  return (
    <EmptyPaper
      title="Begin with the ring"
      action={
        <div className="flex flex-wrap items-center gap-4.5">
          <Button kind="primary" icon={Plus} onClick={begin}>
            Write R1
          </Button>
          <Link to={paths.recording(pattern.id)} className="link">
            Read it from a recording
          </Link>
        </div>
      }
    >
      Lines are written in the trade’s shorthand, as <i>6 sc in magic ring</i>, and counted as you type.
    </EmptyPaper>
  );
}
