/** Keys sit in the button they press. For the eye only: the button's `aria-keyshortcuts` says the same. */
export function KeyCaps({ keys }: { keys: readonly string[] }) {
  return (
    <span className="inline-flex gap-1 max-sm:hidden" aria-hidden>
      {keys.map((key) => (
        <kbd key={key} className="key">
          {key}
        </kbd>
      ))}
    </span>
  );
}
