import { useDesk } from '../use-desk.ts';

const SHOWN = 200;

/** What is no line of work is not counted, and not lost: it can be looked at. */
export function Notes() {
  const { counting } = useDesk();
  const counted = counting.result?.counted;
  if (!counted || (counted.notes.length === 0 && counted.title === null)) return null;
  const words = [...(counted.title === null ? [] : [counted.title]), ...counted.notes];
  return (
    <details className="border-b border-feint px-3.5 py-2 text-walnut2 print:hidden">
      <summary className="cursor-pointer">
        {words.length} {words.length === 1 ? 'line' : 'lines'} of title, materials and notes, not counted
      </summary>
      <ul className="py-1.5">
        {words.slice(0, SHOWN).map((line, i) => (
          <li key={i} className="wr text-[15px]!">
            {line}
          </li>
        ))}
        {words.length > SHOWN && <li>and {words.length - SHOWN} more</li>}
      </ul>
    </details>
  );
}
