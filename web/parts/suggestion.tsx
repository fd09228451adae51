import { type ReactNode } from 'react';
import type { Repair } from '#crochet';
import { Button } from '../ui/button.tsx';
import { Arrow } from '../ui/icon.tsx';

/** One offer at a time, best first: the wording, what it fits, and why in one line. Used with Ctrl+Enter; it can be undone. */
export function Suggestion({
  repair,
  lineName,
  onUse,
  children,
}: {
  repair: Pick<Repair, 'text' | 'sentence' | 'fits'>;
  lineName: string | null;
  onUse: () => void;
  /** Another way, where there is one. */
  children?: ReactNode;
}) {
  const { text, sentence, fits } = repair;
  return (
    <div className="suggestion flex flex-wrap items-center gap-x-3 gap-y-1.5 px-3.5! py-1.5!">
      <div className="min-w-[min(100%,220px)] flex-1">
        <p>
          {lineName && <b className="mr-2">{lineName}</b>}
          <span className="h-piece mr-2.5 break-words">{text}</span>
          <b className="whitespace-nowrap">
            fits: {fits.base}
            <Arrow />
            {fits.count}
          </b>
        </p>
        <p className="small">{sentence}</p>
      </div>
      {children}
      <Button kind="primary" keys={['Ctrl', 'Enter']} className="h-[34px]! max-sm:h-11!" onClick={onUse}>
        Use this
      </Button>
    </div>
  );
}
