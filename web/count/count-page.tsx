import { useKeys } from '../lib/use-keys.ts';
import { CountStrip } from './count-strip.tsx';
import { Ledger } from './ledger/ledger.tsx';
import { PrintHead } from './print-head.tsx';
import { SidePanel } from './side-panel.tsx';
import { TextPanel } from './text/text-panel.tsx';
import { DeskProvider, useNewDesk } from './use-desk.ts';

/** The text, what it works out to, and what that makes: the eyes run from left to right in the order of the work. */
export function CountPage() {
  const desk = useNewDesk();
  const { offers, takeOffer, walk, stepBack, stepOn, counting, patch } = desk;
  useKeys({
    'Ctrl+Enter': () => {
      const [best] = offers;
      if (best && !counting.isBusy && !patch) takeOffer(best);
    },
    N: () => walk(),
    'Shift+N': () => walk(-1),
    F8: () => walk(),
    'Shift+F8': () => walk(-1),
    'Ctrl+Z': stepBack,
    'Ctrl+Shift+Z': stepOn,
    'Ctrl+Y': stepOn,
  });
  return (
    <DeskProvider value={desk}>
      <div className="count-page">
        <CountStrip />
        <PrintHead />
        <main id="page" className="count-main">
          <TextPanel />
          <Ledger />
          <SidePanel />
        </main>
        <footer className="flex flex-none flex-wrap items-center gap-x-4 gap-y-1 border-t border-rule bg-chalk px-4 py-1.5 text-walnut2 print:hidden">
          <span>Works without a network once it has been opened.</span>
          <span className="max-lg:hidden">
            <kbd className="key">F8</kbd> next line to look at, <kbd className="key">Ctrl</kbd>{' '}
            <kbd className="key">Enter</kbd> take what is offered
          </span>
          <a href="/new/written?from=count" className="link ml-auto">
            Make it a pattern of yours
          </a>
        </footer>
      </div>
    </DeskProvider>
  );
}
