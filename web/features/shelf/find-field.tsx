import { Search } from 'lucide-react';
import { useRef } from 'react';
import { useKeys } from '../../lib/use-keys.ts';
import { Icon } from '../../ui/icon.tsx';
import { KeyCaps } from '../../ui/key-cap.tsx';

/** Finds a pattern as one types; `/` goes there, Esc empties it. */
export function FindField({ value, onChange }: { value: string; onChange: (words: string) => void }) {
  const ref = useRef<HTMLInputElement>(null);
  useKeys({ '/': () => ref.current?.focus() });
  return (
    <label className="field relative flex h-[30px]! w-[240px]! items-center gap-2 max-sm:h-11! focus-within:outline-2 focus-within:outline-offset-1 focus-within:outline-woad max-sm:w-auto! max-sm:min-w-0 max-sm:grow">
      <Icon of={Search} size={16} />
      <span className="sr-only">Find a pattern</span>
      <input
        ref={ref}
        type="search"
        className="min-w-0 grow bg-transparent font-sans text-[15px] outline-none [&::-webkit-search-cancel-button]:hidden"
        placeholder="Find a pattern"
        aria-keyshortcuts="/"
        value={value}
        onChange={(event) => onChange(event.target.value)}
        onKeyDown={(event) => {
          if (event.key === 'Escape') onChange('');
        }}
      />
      <KeyCaps keys={['/']} />
    </label>
  );
}
