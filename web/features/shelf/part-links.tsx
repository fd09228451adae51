import { Link } from 'react-router-dom';
import type { Shelf, ShelfPart } from '#contract/shelf';

const NAMES: Readonly<Record<ShelfPart, string>> = { shelf: 'Shelf', archive: 'Archive', bin: 'Bin' };
const to = (part: ShelfPart) => (part === 'shelf' ? '/' : `/?part=${part}`);

/** The way to what was put aside, and back. */
export function PartLinks({ shelf }: { shelf: Shelf }) {
  const counts: Readonly<Record<ShelfPart, number | null>> = {
    shelf: null,
    archive: shelf.archived,
    bin: shelf.binned,
  };
  const parts = (['shelf', 'archive', 'bin'] as const).filter(
    (part) => part !== shelf.part && (part === 'shelf' || counts[part] !== 0),
  );
  if (parts.length === 0) return null;
  return (
    <nav aria-label="Put aside" className="flex gap-5 py-2">
      {parts.map((part) => (
        <Link key={part} to={to(part)} className="link">
          {NAMES[part]}
          {counts[part] !== null && ` ${counts[part]}`}
        </Link>
      ))}
    </nav>
  );
}
