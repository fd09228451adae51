import { type ReactNode } from 'react';
import type { Shelf, ShelfPattern } from '#contract/shelf';
import { COLUMNS } from './columns.ts';
import type { RowAction } from './row-actions.tsx';
import { ShelfRow } from './shelf-row.tsx';
import { groupPatterns } from './shelf-view.ts';

/** Column names for the eye; every figure says its own to a screen reader. */
function Heads() {
  return (
    <div aria-hidden className={`h-[31px] border-b border-rule bg-sheet pl-5 text-walnut2 max-sm:hidden ${COLUMNS}`}>
      <span />
      <span>Pattern</span>
      <span>State</span>
      <span>Needs</span>
      <span className="text-right">lines</span>
      <span className="text-right">stitches</span>
      <span className="text-right max-lg:hidden">touched</span>
      <span />
    </div>
  );
}

function Group({ name, count, children }: { name: string | null; count: number; children: ReactNode }) {
  return (
    <section>
      {name !== null && (
        <h2 className="flex h-[34px] items-center border-b border-rule px-5 font-serif text-[16px] font-semibold max-sm:px-3">
          {name}
          <span className="ml-2.5 font-sans text-[15px] font-normal text-walnut2">{count}</span>
        </h2>
      )}
      <ul>{children}</ul>
    </section>
  );
}

/** A ledger, not cards: what waits for you first, then in hand, then at rest. The archive and the bin are one list. */
export function ShelfLedger({
  shelf,
  patterns,
  onAct,
}: {
  shelf: Shelf;
  patterns: readonly ShelfPattern[];
  onAct: (pattern: ShelfPattern, action: RowAction) => void;
}) {
  const groups = shelf.part === 'shelf' ? groupPatterns(patterns) : [{ group: 'all', name: null, patterns }];
  return (
    <div className="relative">
      <div
        aria-hidden
        className="double-before pointer-events-none absolute inset-y-0 right-[294px] z-[1] max-lg:right-[174px] max-sm:hidden"
      />
      <Heads />
      {groups.map(({ group, name, patterns: some }) => (
        <Group key={group} name={name} count={some.length}>
          {some.map((pattern) => (
            <ShelfRow
              key={pattern.id}
              pattern={pattern}
              part={shelf.part}
              {...(shelf.mayManage && { onAct: (action: RowAction) => onAct(pattern, action) })}
            />
          ))}
        </Group>
      ))}
    </div>
  );
}
