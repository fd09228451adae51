import { cx } from '../lib/class-names.ts';

/** A person's initials in a circle: "Ismay T." becomes It. */
export function initialsOf(name: string): string {
  const [first = '', second = ''] = name.trim().split(/\s+/u);
  return (first.slice(0, 1) + (second || first.slice(1)).slice(0, 1).toLowerCase()).slice(0, 2);
}

/** Whoever shows it says the name in words too. */
export function Initials({ name, size = 28 }: { name: string; size?: 22 | 28 }) {
  return (
    <span
      aria-hidden
      className={cx(
        'grid flex-none place-items-center rounded-full border border-edge bg-chalk font-medium text-walnut',
        size === 28 ? 'size-[28px] text-[14px]' : 'size-[22px] text-[12px] leading-none',
      )}
    >
      {initialsOf(name)}
    </span>
  );
}
