import { Archive, ArchiveRestore, Copy, Ellipsis, Trash2, Undo2, type LucideIcon } from 'lucide-react';
import { useEffect, useId, useRef, useState } from 'react';
import type { ShelfPart } from '#contract/shelf';
import { IconButton } from '../../ui/button.tsx';
import { Icon } from '../../ui/icon.tsx';
import type { ShelfStep } from './shelf.queries.ts';

export type RowAction = ShelfStep | 'duplicate';

const ACTIONS: Readonly<Record<ShelfPart, readonly RowAction[]>> = {
  shelf: ['duplicate', 'archive', 'bin'],
  archive: ['unarchive', 'duplicate', 'bin'],
  bin: ['restore'],
};
const WORDS: Readonly<Record<RowAction, readonly [LucideIcon, string]>> = {
  duplicate: [Copy, 'Duplicate'],
  archive: [Archive, 'To the archive'],
  unarchive: [ArchiveRestore, 'Back to the shelf'],
  bin: [Trash2, 'Into the bin'],
  restore: [Undo2, 'Restore'],
};

/** Closes a menu when the focus or a click goes elsewhere, or with Esc. */
function useClose(isOpen: boolean, close: () => void) {
  const ref = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (!isOpen) return;
    const elsewhere = (event: Event) => {
      if (event.target instanceof Node && !ref.current?.contains(event.target)) close();
    };
    document.addEventListener('pointerdown', elsewhere);
    document.addEventListener('focusin', elsewhere);
    return () => {
      document.removeEventListener('pointerdown', elsewhere);
      document.removeEventListener('focusin', elsewhere);
    };
  }, [isOpen, close]);
  return ref;
}

/** What can be done with a pattern as a whole. Nothing here is asked about first: all of it can be undone. */
export function RowActions({
  title,
  part,
  onAct,
}: {
  title: string;
  part: ShelfPart;
  onAct: (action: RowAction) => void;
}) {
  const [isOpen, setOpen] = useState(false);
  const [close] = useState(() => () => setOpen(false));
  const ref = useClose(isOpen, close);
  const listId = useId();
  const opener = () => ref.current?.querySelector<HTMLElement>('[aria-expanded]');
  return (
    <div
      ref={ref}
      className="relative"
      onKeyDown={(event) => {
        if (event.key !== 'Escape' || !isOpen) return;
        event.preventDefault();
        setOpen(false);
        opener()?.focus();
      }}
    >
      <IconButton
        icon={Ellipsis}
        label={`More for ${title}`}
        aria-expanded={isOpen}
        aria-controls={listId}
        onClick={() => setOpen(!isOpen)}
      />
      {isOpen && (
        <ul
          id={listId}
          className="absolute top-full right-0 z-10 mt-1 min-w-[190px] rounded-2 border border-edge bg-sheet py-1"
        >
          {ACTIONS[part].map((action) => {
            const [icon, words] = WORDS[action];
            return (
              <li key={action}>
                <button
                  type="button"
                  className="flex w-full items-center gap-2.5 px-3 py-1.5 text-left hover:bg-woadwash focus-visible:-outline-offset-2 max-sm:min-h-11"
                  onClick={() => {
                    setOpen(false);
                    opener()?.focus();
                    onAct(action);
                  }}
                >
                  <Icon of={icon} size={16} />
                  {words}
                </button>
              </li>
            );
          })}
        </ul>
      )}
    </div>
  );
}
