import { cx } from '../../lib/class-names.ts';
import { PatternState } from '../../parts/pattern-state.tsx';
import type { ShelfPattern } from '#contract/shelf';
import { inState, STATES, type StateFilter } from './shelf-view.ts';

const WORDS: Readonly<Record<ShelfPattern['state'], string>> = {
  reading: 'reading',
  drafting: 'drafting',
  'in-proof': 'in proof',
  published: 'published',
};

/** Every state with how many are in it; pressing one shows those alone. */
export function StateTabs({
  patterns,
  chosen,
  onChoose,
}: {
  patterns: readonly ShelfPattern[];
  chosen: StateFilter;
  onChoose: (state: StateFilter) => void;
}) {
  const button = (state: StateFilter, children: React.ReactNode) => (
    <button
      key={state}
      type="button"
      aria-pressed={chosen === state}
      onClick={() => onChoose(state)}
      className={cx(
        'relative inline-flex h-[45px] items-center whitespace-nowrap',
        chosen === state
          ? 'font-bold after:absolute after:inset-x-0 after:-bottom-px after:h-2 after:border-y-[1.5px] after:border-woad'
          : 'hover:text-woad',
      )}
    >
      {children}
    </button>
  );
  return (
    <div role="group" aria-label="State" className="flex items-center gap-x-6.5 max-sm:gap-x-5">
      {button('all', `All ${patterns.length}`)}
      {STATES.map((state) =>
        button(
          state,
          <PatternState state={state}>
            {WORDS[state]} {inState(patterns, state).length}
          </PatternState>,
        ),
      )}
    </div>
  );
}
