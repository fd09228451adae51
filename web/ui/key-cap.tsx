import { ArrowDown, ArrowLeft, ArrowRight, ArrowUp, type LucideIcon } from 'lucide-react';

/** Neither face has arrows, so those on a cap are drawn. */
const ARROWS: Readonly<Record<string, LucideIcon>> = { '←': ArrowLeft, '→': ArrowRight, '↑': ArrowUp, '↓': ArrowDown };
const ARROW_NAMES: Readonly<Record<string, string>> = { '←': 'Left', '→': 'Right', '↑': 'Up', '↓': 'Down' };

/** One key as it looks on the keyboard. */
export function KeyCap({ name }: { name: string }) {
  const Arrow = ARROWS[name];
  if (!Arrow) return <kbd className="key">{name}</kbd>;
  return (
    <kbd className="key inline-flex! items-center justify-center">
      <Arrow size={11} strokeWidth={1.6} aria-hidden />
      <span className="sr-only">{ARROW_NAMES[name]}</span>
    </kbd>
  );
}

/** Keys sit in the button they press. For the eye only: the button's `aria-keyshortcuts` says the same. */
export function KeyCaps({ keys }: { keys: readonly string[] }) {
  return (
    <span className="inline-flex gap-1 max-sm:hidden" aria-hidden>
      {keys.map((key) => (
        <KeyCap key={key} name={key} />
      ))}
    </span>
  );
}
