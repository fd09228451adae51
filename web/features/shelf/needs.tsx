import { Link } from 'react-router-dom';
import type { ShelfPattern } from '#contract/shelf';
import { paths } from '../../lib/paths.ts';
import { VerdictLabel } from '../../parts/verdict-mark.tsx';
import { Waiting } from '../../parts/thread/winding.tsx';
import { groupNeeds } from './shelf-view.ts';

/** What a pattern wants next, as the thing itself and not as a number on a badge. */
export function Needs({ pattern }: { pattern: ShelfPattern }) {
  const { state, needs, lastMarked, unmarked, lines } = pattern;
  if (state === 'reading') {
    return (
      <span className="inline-flex items-center gap-3 text-walnut2">
        <Waiting label="Being read" />
        the transcript is being read
      </span>
    );
  }
  if (needs.length > 0) {
    return (
      <ul className="flex flex-wrap gap-x-4.5 gap-y-1">
        {groupNeeds(needs).map(({ verdict, lineId, words }) => (
          <li key={verdict}>
            <Link to={paths.bench(pattern.id, lineId)} className="hover:underline">
              <VerdictLabel verdict={verdict}>, {words}</VerdictLabel>
            </Link>
          </li>
        ))}
      </ul>
    );
  }
  if (lines === 0) return <>No lines yet.</>;
  if (state === 'drafting' && lastMarked !== null) return <>No moment marked after {lastMarked}.</>;
  if (state === 'drafting' && unmarked > 0) {
    return <>{unmarked === 1 ? 'One round has' : `${unmarked} rounds have`} no moment yet.</>;
  }
  if (state === 'drafting') return <>Ready for proof</>;
  if (state === 'in-proof') return <>With the editor</>;
  return <span className="text-walnut2">Nothing waiting</span>;
}
