import { type Repair } from '#crochet';
import { Button } from '../../../ui/button.tsx';
import { Arrow } from '../../../ui/icon.tsx';

/** One offer at a time, best first: the wording, what it fits, and why in one line. Used with Ctrl+Enter; it can be undone. */
export function Suggestion({
  repair,
  lineName,
  onUse,
}: {
  repair: Repair;
  lineName: string | null;
  onUse: () => void;
}) {
  const { text, sentence, fits } = repair;
  return (
    <div className="suggestion flex items-center gap-3 px-3.5! py-1.5!">
      <div className="min-w-0 grow">
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
      <Button kind="primary" keys={['Ctrl', 'Enter']} className="h-[34px]! max-sm:h-11!" onClick={onUse}>
        Use this
      </Button>
    </div>
  );
}
