/** The ledger's columns: print, pattern, state, needs, lines, stitches, touched, more. On a phone a row is a small page. */
export const COLUMNS =
  'grid items-center grid-cols-[92px_minmax(170px,250px)_138px_minmax(0,1fr)_62px_84px_104px_44px] ' +
  'max-lg:grid-cols-[72px_minmax(150px,1fr)_120px_minmax(0,1.4fr)_54px_76px_44px] ' +
  'max-sm:grid-cols-[72px_minmax(0,1fr)] max-sm:gap-y-1.5';
