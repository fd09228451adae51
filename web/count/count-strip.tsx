import { Link2, Printer, Redo2, Undo2 } from 'lucide-react';
import { useState } from 'react';
import { Mark } from '../parts/mark.tsx';
import { Button, IconButton } from '../ui/button.tsx';
import { ShareDialog } from './share/share-dialog.tsx';
import { useDesk } from './use-desk.ts';

/** The head of the page: what it is, what it promises, and what can be done with the whole. */
export function CountStrip() {
  const { written, stepBack, stepOn } = useDesk();
  const [isSharing, setSharing] = useState(false);
  const isEmpty = written.text.trim() === '';
  return (
    <header className="flex min-h-[52px] flex-none flex-wrap items-center gap-x-3.5 gap-y-1 border-b border-rule bg-chalk px-4 py-1 print:hidden">
      <a href="/" aria-label="Roundelay, to the sign-in" className="flex-none">
        <Mark size={34} />
      </a>
      <h1 className="h-page">Count</h1>
      <p id="count-promise" className="text-walnut2 max-sm:order-last max-sm:w-full max-sm:pb-1">
        Nothing you write here leaves this browser.
      </p>
      <div className="ml-auto flex items-center gap-x-2">
        <IconButton
          icon={Undo2}
          label="Undo"
          aria-keyshortcuts="Control+Z"
          aria-disabled={!written.canUndo}
          className="aria-disabled:text-walnut3"
          onClick={stepBack}
        />
        <IconButton
          icon={Redo2}
          label="Redo"
          aria-keyshortcuts="Control+Shift+Z"
          aria-disabled={!written.canRedo}
          className="aria-disabled:text-walnut3"
          onClick={stepOn}
        />
        <IconButton icon={Printer} label="Print" className="max-sm:hidden" onClick={() => window.print()} />
        <Button
          icon={Link2}
          onClick={() => setSharing(true)}
          {...(isEmpty ? { notYet: 'There is nothing written yet.' } : {})}
        >
          Share
        </Button>
      </div>
      <ShareDialog isOpen={isSharing} onClose={() => setSharing(false)} />
    </header>
  );
}
