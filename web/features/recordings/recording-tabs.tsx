import { Plus } from 'lucide-react';
import type { Recording } from '#contract/recordings';
import { cx } from '../../lib/class-names.ts';
import { Button } from '../../ui/button.tsx';

interface RecordingTabsProps {
  recordings: readonly Recording[];
  chosenId: string | undefined;
  onChoose: (id: string) => void;
  /** Left out for those who may not add. */
  onAdd?: (() => void) | undefined;
}

/** The recordings of a pattern, where there is more than one, and the way to another. */
export function RecordingTabs({ recordings, chosenId, onChoose, onAdd }: RecordingTabsProps) {
  if (recordings.length === 0) return null;
  return (
    <div className="flex min-h-[42px] flex-wrap items-center gap-x-5 border-b border-rule px-6 max-sm:px-4">
      {recordings.length > 1 && (
        <div role="group" aria-label="Recordings of this pattern" className="flex flex-wrap gap-x-5">
          {recordings.map(({ id, number, title }) => (
            <button
              key={id}
              type="button"
              aria-pressed={id === chosenId}
              onClick={() => onChoose(id)}
              className={cx(
                'relative h-[42px] max-w-[220px] truncate',
                id === chosenId
                  ? 'font-bold after:absolute after:inset-x-0 after:-bottom-px after:h-1.5 after:border-y-[1.5px] after:border-woad'
                  : 'text-walnut2 hover:text-walnut',
              )}
            >
              {number}. {title}
            </button>
          ))}
        </div>
      )}
      {onAdd && (
        <span className="ml-auto flex items-center gap-3">
          <Button kind="quiet" icon={Plus} onClick={onAdd}>
            Add another recording
          </Button>
          <span className="small text-walnut2 max-sm:hidden">part two, or the ears on another day</span>
        </span>
      )}
    </div>
  );
}
