import { ChevronDown, ChevronUp, X } from 'lucide-react';
import { type RefObject } from 'react';
import { IconButton } from '../../../ui/button.tsx';

/** Looks for words in what was said: how many there are, the one before, the next. */
export function FindBar(props: {
  needle: string;
  count: number;
  at: number;
  field: RefObject<HTMLInputElement | null>;
  onType: (needle: string) => void;
  onWalk: (way: 1 | -1) => void;
  onClose: () => void;
}) {
  const { needle, count, at, field, onType, onWalk, onClose } = props;
  return (
    <search className="flex grow items-center gap-1.5">
      <input
        ref={field}
        autoFocus
        aria-label="Find in the transcript"
        value={needle}
        className="field field-row min-w-0 grow"
        onChange={(event) => onType(event.target.value)}
        onKeyDown={(event) => {
          if (event.key === 'Enter') onWalk(event.shiftKey ? -1 : 1);
          if (event.key === 'Escape') onClose();
        }}
      />
      <span role="status" className="small tn whitespace-nowrap text-walnut2">
        {needle.trim() === '' ? '' : count === 0 ? 'not said' : `${at + 1} of ${count}`}
      </span>
      <IconButton icon={ChevronUp} label="The one before" onClick={() => onWalk(-1)} />
      <IconButton icon={ChevronDown} label="The next" onClick={() => onWalk(1)} />
      <IconButton icon={X} label="Close the search" onClick={onClose} />
    </search>
  );
}
