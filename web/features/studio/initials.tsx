/** A person's initials in a circle: "Ismay T." becomes It. */
export function initialsOf(name: string): string {
  const [first = '', second = ''] = name.trim().split(/\s+/u);
  return (first.slice(0, 1) + (second || first.slice(1)).slice(0, 1).toLowerCase()).slice(0, 2);
}

export function Initials({ name }: { name: string }) {
  return (
    <span
      aria-hidden
      className="grid size-[28px] place-items-center rounded-full border border-edge text-[14px] font-medium text-walnut"
    >
      {initialsOf(name)}
    </span>
  );
}
