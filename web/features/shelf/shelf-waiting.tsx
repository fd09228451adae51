import { COLUMNS } from './columns.ts';

/** Rows on their way: their height is kept, and dash bars stand where words will. */
export function ShelfWaiting() {
  return (
    <main className="grow bg-sheet" role="status" aria-label="The shelf is being fetched">
      <div className="h-[45px] border-b border-rule bg-chalk" />
      {[52, 68, 44, 60].map((share) => (
        <div key={share} className={`h-[75px] border-b border-feint pl-5 max-sm:px-3 ${COLUMNS}`}>
          <span className="size-[58px] rounded-full border-[1.2px] border-dashed border-feint" />
          <span>
            <span className="dash-bar" style={{ width: `${share}%` }} />
            <span className="dash-bar mt-3" style={{ width: `${share - 16}%` }} />
          </span>
          <span className="dash-bar w-3/5 max-sm:hidden" />
          <span className="dash-bar max-sm:hidden" style={{ width: `${share - 8}%` }} />
        </div>
      ))}
    </main>
  );
}
